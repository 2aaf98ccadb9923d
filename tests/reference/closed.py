"""Closed forms of local noise on |S_N>, each for strengths that differ from party to party.

Written from their definitions and used only to be held against the dense matrices; nothing here feeds a table.
"""
from itertools import combinations
from math import comb, exp, factorial, log2

import numpy as np


def exactly(p):
    """e_k(p): probability that exactly k of the independent events of probabilities p happen."""
    e = np.array([1.0])
    for x in p:
        e = np.convolve(e, [1 - x, x])
    return e


def mixed_discriminant(matrices):
    """D(A_1 ... A_N) = (1/N!) sum_T (-1)^(N-|T|) det sum_{i in T} A_i. Bapat, Linear Algebra Appl. 126, 107 (1989)."""
    n = len(matrices)
    subsets = (t for size in range(1, n + 1) for t in combinations(range(n), size))
    return sum((-1) ** (n - len(t)) * np.linalg.det(sum(matrices[i] for i in t)) for t in subsets) / factorial(n)


def fidelity_depolarising(p):
    n = len(p)
    return sum(e / (comb(n, k) * n ** k) for k, e in enumerate(exactly(p)))


def fidelity_dephasing(x):
    n = len(x)
    return sum(e * factorial(n - m) / factorial(n) for m, e in enumerate(exactly(x)))


def fidelity_decay(total):
    """total[i]: total decay rate times time of level 0 of qudit i, in any branching."""
    return np.mean([exp(-g / 2) for g in total]) ** 2


def fidelity_unitaries(unitaries):
    return abs(mixed_discriminant(unitaries)) ** 2


def fidelity_white(w, n):
    return 1 - w + w / n ** n


def all_distinct_decay(total):
    return np.mean([exp(-g) for g in total])


def all_distinct_depolarising(p):
    n = len(p)
    return sum(e * factorial(k) / n ** k for k, e in enumerate(exactly(p)))


def removal_depolarising(before, after):
    """Last party leaves; before[i] acts on every qudit, after[i] on those who stay, behind the correction."""
    n = len(before)
    joint = [1 - (1 - p) * (1 - q) for p, q in zip(before, after)]
    gone = before[-1]
    return sum(e / n ** k * ((1 - gone) / comb(n - 1, k) + gone / comb(n, k + 1)) for k, e in enumerate(exactly(joint)))


def transmission_on_one(eta):
    """Fidelity of the arrived when one qudit passes a level-dependent loss."""
    return np.mean(np.sqrt(eta)) ** 2 / np.mean(eta)


def binary_entropy(p):
    """h(p) in bits."""
    return 0.0 if p <= 0 or p >= 1 else -p * log2(p) - (1 - p) * log2(1 - p)
