"""Triangle meshes: reading, welding and pairing in a fresh process; the integrals over a mesh."""
import json
import statistics
import subprocess

PEERS = "mesh"
REPEATS = 5
STARTER = ["-XX:+UseSerialGC", "-XX:NewRatio=8"]


# In a process of its own: what a process held before it starts another counts as the other's peak.
SHUFFLE = """
import random, sys
data = open(sys.argv[1], "rb").read()
records = [data[84 + 50 * k: 134 + 50 * k] for k in range((len(data) - 84) // 50)]
random.Random(1).shuffle(records)
open(sys.argv[2], "wb").write(data[:84] + b"".join(records))
"""


def output(command, folder):
    return subprocess.run(command, cwd=folder, check=True, capture_output=True, text=True).stdout


def run(work, home):
    classpath = ":".join(
        [str(home / "target/classes"), str(home / "target/jmh-classes"),
         (home / "target/jmh.classpath").read_text()])
    output(["python3", "gen.py", "1e6", "1e7"], work)
    output(["g++", "-O3", "-march=native", "-std=c++17", "weld.cpp", "-o", "weld"], work)
    output(["gcc", "-O3", "-march=native", "-ffast-math", "flux.c", "-o", "flux", "-lm"], work)
    output(["python3", "-c", SHUFFLE, "mesh_1e7.stl", "mesh_1e7_shuffled.stl"], work)
    rows = []
    for name in ["mesh_1e6", "mesh_1e7", "mesh_1e7_shuffled"]:
        rows += welding(work, classpath, name)
    return rows + kernels(work, classpath)


def welding(work, classpath, name):
    """Whole processes, alternately; the best of the peer's variants, its own sum of times."""
    ours, memory = [], []
    peers = {variant: [] for variant in ["csr", "hash"]}
    peer_memory = {}
    java = ["java", *STARTER, "-cp", classpath, "org.hullsum.mesh.WeldAndPair", name + ".stl", "2"]
    timed = ["bash", "-c", "time -p " + " ".join(f"'{word}'" for word in java)]
    for _ in range(REPEATS):
        result = subprocess.run(timed, cwd=work, check=True, capture_output=True, text=True)
        ours.append(float(result.stderr.split("real")[1].split()[0]))
        memory.append(int(result.stdout.strip().split(",")[-1]) / 1024)
        for variant in peers:
            fields = output(["./weld", name + ".stl", variant], work).strip().split(",")
            peers[variant].append(float(fields[8].split()[1]))
            peer_memory[variant] = int(fields[9].split()[1])
    best = min(peers, key=lambda v: statistics.median(peers[v]))
    what = name.replace("mesh_", "weld and pair ").replace("_", " ")
    return [
        (what, statistics.median(ours), statistics.median(peers[best]), "s", "C++ " + best),
        (what + ", memory", statistics.median(memory), peer_memory[best], "MiB", "C++ " + best)]


def kernels(work, classpath):
    """Nanoseconds for each triangle; the peer adds up centroids or three points, without a bound."""
    lines = output(["./flux", "mesh_1e7", "c"], work).splitlines()
    peer = {line.split(",")[3]: float(line.split(",")[5]) for line in lines}
    output(["java", "-cp", classpath, "org.openjdk.jmh.Main", "MeshKernels", "-rf", "json", "-rff",
            "jmh.json", "-p", "file=mesh_1e7.stl"], work)
    count = int(lines[0].split(",")[2])
    ours = {b["benchmark"].split(".")[-1]: b["primaryMetric"]["score"] * 1e6 / count
            for b in json.loads((work / "jmh.json").read_text())}
    separate = peer["areavec-store"] + peer["const+volume"]
    return [
        ("area, closure, moments", ours["geometry"], separate, "ns", "C, two passes"),
        ("flux, linear field", ours["fluxOfALinearField"], peer["poly-centroid"], "ns", "C, centroid"),
        ("flux, cubic field", ours["fluxOfACubicField"], peer["poly-3pt"], "ns", "C, 3 points"),
        ("flux, smooth field", ours["fluxOfASmoothField"], peer["poly-3pt"], "ns", "C, 3 points")]
