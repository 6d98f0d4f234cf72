#!/usr/bin/env python3
"""Times the sparse kernel beside SciPy's SuperLU on the very same matrices, in the same minute.

    mvn -q test-compile
    REFERENCE_BENCH=<folder of the reference scripts> solver/benchmark/sparse_kernel.py 1e4 1e5

For each size: export.py of that folder writes the matrices of a plane ring meshed by Gmsh, our
kernel and c_superlu.py (mmd_sym) factorise K + s² M + s B. Prints CPU seconds and ratios ours/theirs,
then the exponents of growth over the sizes. From 5e5 on the reference is left out (REFERENCE_LIMIT
raises that). Needs python3 with numpy and SciPy, gmsh, a JDK.
"""
import json
import math
import os
import subprocess
import sys
import tempfile
from pathlib import Path

HEAP = os.environ.get("HEAP", "4g")
LIMIT = float(os.environ.get("REFERENCE_LIMIT", "5e5"))


def main():
    if len(sys.argv) < 2 or "REFERENCE_BENCH" not in os.environ:
        sys.exit(__doc__)
    solver = Path(__file__).resolve().parent.parent
    reference = Path(os.environ["REFERENCE_BENCH"]).resolve()
    environment = dict(os.environ, RING_MESH="gmsh", PYTHONDONTWRITEBYTECODE="1")
    path = os.pathsep.join(str(solver / "target" / d) for d in ("test-classes", "classes"))
    rows = []
    with tempfile.TemporaryDirectory() as scratch:
        for size in sys.argv[1:]:
            matrix = os.path.join(scratch, "ring.bin")
            subprocess.run([sys.executable, "export.py", matrix, size, "gmsh"], cwd=reference,
                           env=environment, check=True)
            repetitions = str(max(4, min(60, int(2e6 / float(size)))))
            ours = run(["java", "-Xmx" + HEAP, "-cp", path,
                        "org.annulet.solver.sparse.SparseKernelBenchmark", matrix, repetitions],
                       solver, os.environ)[-1]
            print(json.dumps(ours))
            rows.append(ours)
            if float(size) < LIMIT:
                theirs = run([sys.executable, "c_superlu.py", scratch, size, "mmd_sym", "3"],
                             reference, environment)
                report(ours, min(t["factor_cpu"] for t in theirs),
                       min(t["solve_cpu"] for t in theirs), theirs[0]["nnzL"])
    for a, b in zip(rows, rows[1:]):
        grow = math.log(b["n"] / a["n"])
        print("%d to %d unknowns: numeric time ~ N^%.2f, memory ~ N^%.2f" % (
            a["n"], b["n"], math.log(b["complex"] / a["complex"]) / grow,
            math.log(b["bytes"] / a["bytes"]) / grow))


def report(ours, factor, solve, entries):
    print("n = %d: splu %.3f s, its solve %.4f s, entries of L %d; ours / theirs:" % (
        ours["n"], factor, solve, entries))
    for name in ("complex", "complex_cold", "analysis", "analysis_cold"):
        print("  %-24s %.3f" % (name, ours[name] / factor))
    for name in ("solve_complex", "solve_once_complex"):
        print("  %-24s %.3f" % (name, ours[name] / solve))
    print("  %-24s %.3f" % ("solve_complex_8 / 8", ours["solve_complex_8"] / 8 / solve))
    print("  %-24s %.3f" % ("entries of L", ours["entries"] / entries))


def run(command, folder, environment):
    done = subprocess.run(command, cwd=folder, env=environment, check=True, text=True,
                          stdout=subprocess.PIPE)
    return [json.loads(line) for line in done.stdout.splitlines() if line.startswith("{")]


if __name__ == "__main__":
    main()
