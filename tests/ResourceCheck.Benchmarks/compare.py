"""Times kernels of ResourceCheck and their SciPy twins in one run and prints the ratios: compare.py [CASE ...].

Needs a Release build: dotnet build -c Release. The twins are the shortest form that a careful physicist writes. A twin whose figure
differs from the tool's is an error, so that the ratio compares equal work.
"""
import itertools
import pathlib
import statistics
import subprocess
import sys
import time

import numpy as np
from scipy.sparse import csr_matrix
from scipy.sparse.linalg import expm_multiply

HERE = pathlib.Path(__file__).parent
REPETITIONS = 3


def couplings(places, dipole):
    """gamma and Omega over Gamma of one transition: Lehmberg, Phys. Rev. A 2, 883 (1970)."""
    n = len(places)
    gamma, omega = np.eye(n), np.zeros((n, n))
    for i, k in itertools.combinations(range(n), 2):
        r = places[i] - places[k]
        c2 = (dipole @ r) ** 2 / (r @ r) / (dipole @ dipole)
        x = 2 * np.pi * np.linalg.norm(r)
        s, c = np.sin(x), np.cos(x)
        gamma[i, k] = gamma[k, i] = 1.5 * ((1 - c2) * s / x + (1 - 3 * c2) * (c / x ** 2 - s / x ** 3))
        omega[i, k] = omega[k, i] = 0.75 * (-(1 - c2) * c / x + (1 - 3 * c2) * (s / x ** 2 + c / x ** 3))
    return gamma, omega


def storage_ring_8():
    """No-photon probability on the N! arrangements of levels: sparse generator, expm_multiply."""
    n, spacing, t = 8, 0.1, 2.0
    angles = 2 * np.pi * np.arange(n) / n
    places = spacing / (2 * np.sin(np.pi / n)) * np.stack([np.cos(angles), np.sin(angles), 0 * angles], axis=1)
    pairs = [couplings(places, np.array([np.cos(j), np.sin(j), 0.3 * j])) for j in range(1, n)]
    words = np.array(list(itertools.permutations(range(n))))  # words[w, i]: level of emitter i
    place = n ** np.arange(n - 1, -1, -1)
    keys = words @ place
    rows, columns, values = [np.arange(len(words))], [np.arange(len(words))], [np.full(len(words), -0.5j * (n - 1))]
    excited = np.argmin(words, axis=1)
    for i in range(n):
        w = np.flatnonzero(words[:, i] != 0)
        j, k = words[w, i], excited[w]
        g = np.array([p[0] for p in pairs])[j - 1, i, k]
        o = np.array([p[1] for p in pairs])[j - 1, i, k]
        rows.append(np.searchsorted(keys, keys[w] - j * place[i] + j * place[k]))
        columns.append(w)
        values.append(o - 0.5j * g)
    h = csr_matrix((np.concatenate(values), (np.concatenate(rows), np.concatenate(columns))), shape=(len(words),) * 2)
    signs = np.array([(-1.0) ** (np.array([w[a] > w[b] for a, b in itertools.combinations(range(n), 2)]).sum()) for w in words.tolist()])
    ket = signs / np.sqrt(len(words))

    def run():
        return np.linalg.norm(expm_multiply(-1j * t * h, ket.astype(complex))) ** 2

    return run


TWINS = {"storage-ring-8": storage_ring_8}


def main(names):
    built = sorted(HERE.glob("bin/Release/*/ResourceCheck.Benchmarks.dll"))
    if not built:
        sys.exit("build first: dotnet build -c Release")
    lines = subprocess.run(["dotnet", built[-1], *names], check=True, capture_output=True, text=True).stdout.splitlines()
    print(f"{'case':20} {'tool':>10} {'SciPy':>10} {'ratio':>7}")
    for line in lines:
        name, seconds, figure = line.split()
        run = TWINS[name]()
        times = []
        for _ in range(REPETITIONS):
            start = time.perf_counter()
            twin = run()
            times.append(time.perf_counter() - start)
        if abs(twin - float(figure)) > 1e-9 * max(1, abs(twin)):
            sys.exit(f"{name}: the tool finds {figure}, the twin {twin!r}")
        mine, other = float(seconds), statistics.median(times)
        print(f"{name:20} {mine:8.4f} s {other:8.4f} s {other / mine:6.1f}x")


main(sys.argv[1:])
