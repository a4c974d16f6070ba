#!/usr/bin/env python3
"""Runs peers' programs beside ours and prints one table of ratios.

    src/jmh/compare.py PEERS [GROUP...]

PEERS is the folder with the peers' programs; it is copied and built in a temporary folder.
GROUP is one of the files in src/jmh/groups, all of them by default. Needs Python 3, gcc and what
the peers need; build first with  mvn -q -P jmh -DskipTests test-compile.
"""
import importlib
import pathlib
import shutil
import sys
import tempfile

HERE = pathlib.Path(__file__).resolve().parent
sys.path.insert(0, str(HERE))


def main():
    if len(sys.argv) < 2:
        sys.exit(__doc__)
    peers = pathlib.Path(sys.argv[1])
    groups = sys.argv[2:] or sorted(p.stem for p in (HERE / "groups").glob("[a-z]*.py"))
    rows = []
    for group in groups:
        module = importlib.import_module("groups." + group)
        with tempfile.TemporaryDirectory() as folder:
            work = pathlib.Path(folder) / group
            shutil.copytree(peers / module.PEERS, work)
            for path in work.rglob("*"):
                path.chmod(0o755 if path.is_dir() else 0o644)
            rows += module.run(work, HERE.parent.parent)
    width = max(len(row[0]) for row in rows)
    print(f"{'what':{width}}  {'ours':>10}  {'peer':>10}  {'ratio':>6}  unit  peer is")
    for what, ours, peer, unit, name in rows:
        print(f"{what:{width}}  {ours:10.4g}  {peer:10.4g}  {ours / peer:6.2f}  {unit:4}  {name}")


main()
