package org.hullsum.mesh;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.BitSet;

/**
 * Reads a mesh, welds it and pairs its edges, once, in a fresh process: {@code FILE THREADS}.
 * Prints triangles, vertices, edges without a pair, seconds for reading and welding, seconds for
 * pairing, and the peak of resident memory in KiB where the system tells it.
 */
final class WeldAndPair {
  private WeldAndPair() {}

  public static void main(String[] arguments) throws Exception {
    int threads = Integer.parseInt(arguments[1]);
    long start = System.nanoTime();
    TriangleMesh mesh = MeshFile.read(Path.of(arguments[0]), threads).build(1);
    long welded = System.nanoTime();
    EdgePairing pairing = EdgePairing.of(mesh, new BitSet(), threads);
    long paired = System.nanoTime();
    int unpaired = 0;
    for (int h = 0; h < 3 * mesh.triangleCount(); h++) {
      unpaired += pairing.mate(h) < 0 ? 1 : 0;
    }
    System.out.println(
        String.join(
            ",",
            Integer.toString(mesh.triangleCount()),
            Integer.toString(mesh.vertexCount()),
            Integer.toString(unpaired),
            Double.toString((welded - start) * 1e-9),
            Double.toString((paired - welded) * 1e-9),
            peak()));
  }

  private static String peak() throws Exception {
    Path status = Path.of("/proc/self/status");
    if (!Files.exists(status)) {
      return "0";
    }
    return Files.readAllLines(status).stream()
        .filter(line -> line.startsWith("VmHWM"))
        .map(line -> line.replaceAll("[^0-9]", ""))
        .findFirst()
        .orElse("0");
  }
}
