"""Makes the state files under tests/ResourceCheck.Tests/Resources/Fixtures and expected.csv beside them.

Why: array files must be read as NumPy writes them, in every type, order and version, and the figures of mixed states must agree with an
independent computation. Runs a few seconds; needs NumPy and SciPy. With --check it writes nothing and fails when a value differs by more
than 1e-11 from the stored one.
"""
import csv
import itertools
import math
import pathlib
import sys

import numpy as np
from numpy.lib import format as npy
from scipy.linalg import expm

FOLDER = pathlib.Path(__file__).resolve().parent.parent / "ResourceCheck.Tests" / "Resources" / "Fixtures"


def antisymmetric(n):
    ket = np.zeros((n,) * n, complex)
    for levels in itertools.permutations(range(n)):
        ket[levels] = np.linalg.det(np.eye(n)[list(levels)]) / math.sqrt(math.factorial(n))
    return ket.reshape(-1)


def random_density(rng, dimension, rank):
    a = rng.normal(size=(dimension, rank)) + 1j * rng.normal(size=(dimension, rank))
    rho = a @ a.conj().T
    return rho / np.trace(rho).real


def unitary(rng, n):
    return np.linalg.qr(rng.normal(size=(n, n)) + 1j * rng.normal(size=(n, n)))[0]


def kron(matrices):
    product = np.eye(1)
    for matrix in matrices:
        product = np.kron(product, matrix)
    return product


def negativity(rho, n, first):
    axes = list(range(2 * n))
    for party in first:
        axes[party], axes[n + party] = axes[n + party], axes[party]
    transposed = rho.reshape((n,) * (2 * n)).transpose(axes).reshape(rho.shape)
    return -sum(x for x in np.linalg.eigvalsh(transposed) if x < 0)


def distinct(populations, n):
    tensor = populations.reshape((n,) * n)
    return sum(tensor[levels] for levels in itertools.permutations(range(n)))


def deviation(rho, n):
    worst = 0
    for party in range(n):
        rest = [i for i in range(n) if i != party]
        tensor = rho.reshape((n,) * (2 * n)).transpose([party, *rest, n + party, *(n + i for i in rest)])
        reduced = np.trace(tensor.reshape(n, n ** (n - 1), n, n ** (n - 1)), axis1=1, axis2=3)
        worst = max(worst, np.abs(np.linalg.eigvalsh(reduced) - 1 / n).sum() / 2)
    return worst


def figures(rho, n):
    s = antisymmetric(n)
    values = np.linalg.eigvalsh(rho)
    fourier = np.exp(-2j * np.pi * np.outer(range(n), range(n)) / n) / math.sqrt(n)
    turn = kron([fourier] * n)
    yield "fidelity", (s.conj() @ rho @ s).real
    yield "purity", np.trace(rho @ rho).real
    yield "entropy in bits", -sum(x * math.log2(x) for x in values if x > 1e-15)
    yield "single parties from maximally mixed, largest trace distance", deviation(rho, n)
    yield "all levels distinct", distinct(np.diag(rho).real, n)
    yield "all Fourier outcomes distinct", distinct(np.diag(turn @ rho @ turn.conj().T).real, n)
    for size in range(1, n // 2 + 1):
        for first in itertools.combinations(range(n), size):
            if 2 * size < n or 0 in first:
                others = [str(i + 1) for i in range(n) if i not in first]
                yield f"negativity {', '.join(str(i + 1) for i in first)} | {', '.join(others)}", negativity(rho, n, first)


def save(path, array, version, fortran=False):
    array = np.asfortranarray(array) if fortran else np.ascontiguousarray(array)
    with open(path, "wb") as file:
        npy.write_array(file, array, version=version, allow_pickle=False)


def states():
    """Name, type, Fortran order, version, density or vector, parties."""
    rng = np.random.default_rng(7)
    rho2, rho3 = random_density(rng, 4, 3), random_density(rng, 27, 4)
    rho4 = 0.9 * np.outer(antisymmetric(4), antisymmetric(4)) + 0.1 * random_density(rng, 256, 5)
    real = random_density(rng, 27, 3).real
    turned = kron([unitary(rng, 3) for _ in range(3)]) @ antisymmetric(3)
    yield "c16-c-v1", "<c16", False, (1, 0), rho3, 3
    yield "c16-f-v1", "<c16", True, (1, 0), rho3, 3
    yield "c16-c-v2", "<c16", False, (2, 0), rho3, 3
    yield "c16-big-f", ">c16", True, (1, 0), rho3, 3
    yield "c8-c", "<c8", False, (1, 0), rho3, 3
    yield "c8-big-c", ">c8", False, (2, 0), rho2, 2
    yield "f8-f", "<f8", True, (1, 0), real, 3
    yield "f8-big-c", ">f8", False, (1, 0), real, 3
    yield "f4-big-f", ">f4", True, (1, 0), real, 3
    yield "vector-c16", "<c16", False, (1, 0), turned, 3
    yield "vector-f4", "<f4", False, (1, 0), antisymmetric(3).real, 3
    yield "four", "<c8", False, (1, 0), rho4, 4


def exchange(n, time_error, phase_error, missing=None):
    """The last pulse over all n^n amplitudes, with the swaps as matrices; steps before it are exact."""
    size = n ** n
    h = np.zeros((size, size))
    for i, k in itertools.combinations(range(n), 2):
        for index in range(size) if (i, k) != missing else ():
            levels = list(np.unravel_index(index, (n,) * n))
            levels[i], levels[k] = levels[k], levels[i]
            h[np.ravel_multi_index(levels, (n,) * n), index] += 1
    tau = 2 / n * math.asin(math.sqrt(n) / 2)
    inner = antisymmetric(n - 1).reshape((n - 1,) * (n - 1))
    start = np.zeros((n,) * n, complex)
    start[(slice(0, n - 1),) * (n - 1) + (n - 1,)] = inner
    ket = (expm(-1j * h * (tau + time_error)) @ start.reshape(-1)).reshape((n,) * n)
    turn = np.exp(1j * n * tau)
    phase = np.angle((turn - 1) / n) - np.angle((turn + n - 1) / n) + phase_error
    ket[..., n - 1] *= np.exp(1j * phase)
    return abs(antisymmetric(n) @ ket.reshape(-1)) ** 2


def exchange_values():
    for n in (3, 4):
        for errors in ((0.05, 0.0), (0.0, 0.1), (0.05, 0.1)):
            yield f"exchange {n}", f"{errors[0]} {errors[1]}", exchange(n, *errors)
    yield "exchange 3", "without J13", exchange(3, 0, 0, (0, 2))


def rows(write):
    for name, kind, fortran, version, array, n in states():
        stored = array.astype(kind)
        if write:
            save(FOLDER / f"{name}.npy", stored, version, fortran)
        exact = stored.astype(complex)
        if exact.ndim == 1:
            exact = np.outer(exact, exact.conj())
        exact = (exact + exact.conj().T) / 2
        for figure, value in figures(exact / np.trace(exact).real, n):
            yield name, figure, value
    yield from exchange_values()


def main():
    check = "--check" in sys.argv
    FOLDER.mkdir(exist_ok=True)
    found = [(name, figure, repr(float(value))) for name, figure, value in rows(not check)]
    path = FOLDER / "expected.csv"
    if not check:
        with open(path, "w", newline="") as file:
            file.write("# columns: file, figure, value      made by: tests/reference/make_state_fixtures.py\n")
            file.write("# source: definitions, evaluated by NumPy in double precision\n")
            csv.writer(file, lineterminator="\n").writerows(found)
        return
    with open(path, newline="") as file:
        stored = list(csv.reader(line for line in file if not line.startswith("#")))
    wrong = [(a, b) for a, b in zip(stored, found, strict=True) if a[:2] != list(b[:2]) or abs(float(a[2]) - float(b[2])) > 1e-11]
    if wrong:
        sys.exit(f"{len(wrong)} values differ, first {wrong[0]}")


if __name__ == "__main__":
    main()
