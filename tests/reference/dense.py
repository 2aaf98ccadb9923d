"""Plain density matrices of several qudits, for reference values only.

A state is the full matrix on the tensor product of all qudits, first qudit most significant. Every qudit has `D`
levels: the `d` levels of the protocol and, where qudits can be lost, one further level `d` that no detector sees.
Channels of one qudit are D^2 x D^2 matrices that act on vec(rho) with index (row, column) -> row * D + column.
"""
from itertools import permutations
from math import factorial

import numpy as np
from scipy.linalg import expm, schur

NO_CLICK = None


def antisymmetric(n):
    """(1/sqrt(n!)) sum over permutations of sign times |pi(0) ... pi(n-1)>, on n qudits of n levels."""
    ket = np.zeros((n,) * n, complex)
    for order in permutations(range(n)):
        ket[order] = np.linalg.det(np.eye(n)[list(order)]) / np.sqrt(factorial(n))
    return ket.reshape(-1)


def antisymmetric_in(n, levels):
    """The antisymmetric state of n qudits on levels 0 ... n-1 of qudits that have `levels` levels."""
    ket = np.zeros((levels,) * n, complex)
    ket[(slice(0, n),) * n] = antisymmetric(n).reshape((n,) * n)
    return ket.reshape(-1)


class State:
    """An unnormalised density matrix; its trace is the probability of the history that led to it."""

    def __init__(self, rho, parties, d, levels):
        self.rho, self.parties, self.d, self.D = rho, tuple(parties), d, levels

    @property
    def weight(self):
        return float(np.trace(self.rho).real)

    def site(self, party):
        return self.parties.index(party)

    def blocks(self, party):
        """rho as an array with the party's row and column index set apart: left, row, right, left, column, right."""
        left = self.D ** self.site(party)
        right = self.D ** (len(self.parties) - 1 - self.site(party))
        return self.rho.reshape(left, self.D, right, left, self.D, right)

    def after(self, party, channel):
        """The state behind a channel on one party's qudit."""
        c = channel.reshape(self.D, self.D, self.D, self.D)
        out = np.einsum("abce,lcrmes->larmbs", c, self.blocks(party), optimize=True)
        return State(out.reshape(self.rho.shape), self.parties, self.d, self.D)

    def after_unitary(self, party, unitary):
        return self.after(party, kraus_channel([widen(unitary, self.D)]))

    def without(self, party, effect):
        """The unnormalised state of the others when the party's qudit gave the effect (a positive D x D matrix)."""
        out = np.einsum("ba,larmbs->lrms", effect, self.blocks(party), optimize=True)
        others = [p for p in self.parties if p != party]
        size = self.D ** len(others)
        return State(out.reshape(size, size), others, self.d, self.D)

    def reduced(self, parties):
        state = self
        for party in self.parties:
            if party not in parties:
                state = state.without(party, np.eye(self.D))
        return state

    def fidelity(self, parties=None):
        """<S|rho|S> with S the antisymmetric state of the parties on the lowest levels; not divided by the weight."""
        state = self if parties is None else self.reduced(parties)
        ket = antisymmetric_in(len(state.parties), self.D)
        return float((ket.conj() @ state.rho @ ket).real)

    def scaled(self, factor):
        return State(self.rho * factor, self.parties, self.d, self.D)


def total(states):
    """The sum of states of the same parties."""
    first = states[0]
    return State(sum(s.rho for s in states), first.parties, first.d, first.D)


def start(n, sink=False, white=0.0, names=None):
    """|S_n> with white noise mixed in, on qudits with a sink level or without."""
    ket = antisymmetric(n)
    rho = (1 - white) * np.outer(ket, ket.conj()) + white * np.eye(n ** n) / n ** n
    return embed(rho, n, n + 1 if sink else n, names or range(n))


def embed(rho, n, levels, names):
    """A density matrix on n qudits of n levels as a state of qudits with `levels` levels."""
    wide = np.zeros((levels,) * (2 * n), complex)
    wide[(slice(0, n),) * (2 * n)] = rho.reshape((n,) * (2 * n))
    return State(wide.reshape(levels ** n, levels ** n), names, n, levels)


# ---- channels -------------------------------------------------------------------------------------------------------

def widen(matrix, levels):
    """A matrix on the lowest levels, one on the others."""
    wide = np.eye(levels, dtype=complex)
    wide[:len(matrix), :len(matrix)] = matrix
    return wide


def kraus_channel(operators):
    """sum_k K (x) conj(K), which maps vec(rho) to vec(sum_k K rho K^dagger)."""
    return sum(np.kron(k, np.conj(k)) for k in operators)


def unit(levels, a, b):
    """|a><b|."""
    m = np.zeros((levels, levels), complex)
    m[a, b] = 1
    return m


def depolarising(d, levels, p):
    """rho -> (1-p) rho + p 1/d on the protocol's levels; a lost qudit stays lost."""
    replaced = [unit(levels, a, b) / np.sqrt(d) for a in range(d) for b in range(d)]
    replaced += [unit(levels, s, s) for s in range(d, levels)]
    return (1 - p) * np.eye(levels ** 2) + p * kraus_channel(replaced)


def schur_multiplier(factors, levels):
    """Element (a, b) of rho times factors[a, b]; one outside the given levels."""
    wide = np.ones((levels, levels), complex)
    wide[:len(factors), :len(factors)] = factors
    return np.diag(wide.reshape(-1))


def dephasing(d, levels, x):
    """Off-diagonal elements times 1 - x."""
    return schur_multiplier((1 - x) * np.ones((d, d)) + x * np.eye(d), levels)


def phase_noise(d, levels, sigma):
    """Element (a, b) times exp(-sigma^2 (a-b)^2 / 2)."""
    a = np.arange(d)
    return schur_multiplier(np.exp(-sigma ** 2 * (a[:, None] - a[None, :]) ** 2 / 2), levels)


def loss(d, levels, transmission):
    """Level a arrives with probability transmission[a], its amplitude times the root; else the qudit is in the sink."""
    operators = [widen(np.diag(np.sqrt(transmission)), levels)]
    operators += [np.sqrt(1 - transmission[a]) * unit(levels, d, a) for a in range(d) if transmission[a] < 1]
    return kraus_channel(operators)


def lindblad(d, levels, jumps=(), dephase=None, leakage=None, depolarising_rate=0.0):
    """Generator on vec(rho): jumps (a, b, rate) as |b><a|, pure dephasing matrix, leakage per level, depolarising rate.

    All act at once: the channel of a time t is the exponential of t times this matrix.
    """
    one = np.eye(levels)
    generator = np.zeros((levels ** 2, levels ** 2), complex)
    leaks = [(a, d, r) for a, r in enumerate(leakage or []) if r]
    for a, b, rate in list(jumps) + leaks:
        jump = np.sqrt(rate) * unit(levels, b, a)
        number = jump.conj().T @ jump
        generator += np.kron(jump, jump.conj()) - (np.kron(number, one) + np.kron(one, number.T)) / 2
    if dephase is not None:
        wide = np.zeros((levels, levels))
        wide[:d, :d] = dephase
        generator -= np.diag(wide.reshape(-1))
    return generator + depolarising_rate * (depolarising(d, levels, 1.0) - np.eye(levels ** 2))


def flow(generator, time):
    return expm(generator * time)


# ---- bases and local unitaries --------------------------------------------------------------------------------------

def fourier(m):
    """Column k is (1/sqrt m) sum_j exp(2 pi i jk/m) |j>."""
    j = np.arange(m)
    return np.exp(2j * np.pi * np.outer(j, j) / m) / np.sqrt(m)


def phased(d, j):
    """Column m is (1/sqrt d) sum_l q^(j l^2) exp(2 pi i ml/d) |l>, q = exp(2 pi i/d) for odd d, exp(pi i/d) for even d."""
    level = np.arange(d)
    q = np.exp((2j if d % 2 else 1j) * np.pi / d)
    return q ** (j * level[:, None] ** 2) * fourier(d)


def basis(name, d):
    """level, fourier, fourier-on-m, phased-j; the columns are the basis vectors."""
    if name == "level":
        return np.eye(d, dtype=complex)
    if name == "fourier":
        return fourier(d)
    if name.startswith("fourier-on-"):
        return widen(fourier(int(name[11:])), d)
    return phased(d, int(name[7:]))


def complement(vectors, k, m):
    """On the first m levels: vector k goes to level m-1, the others, in order, to levels 0 ... m-2; identity for k >= m."""
    if k is NO_CLICK or k >= m:
        return np.eye(len(vectors), dtype=complex)
    order = [j for j in range(m) if j != k] + [k] + list(range(m, len(vectors)))
    return vectors[:, order].conj().T


def over_rotated(unitary, epsilon):
    """U^(1+epsilon) by the principal logarithm, eigenvalue -1 at +pi."""
    triangle, vectors = schur(unitary, output="complex")
    angles = np.angle(np.diag(triangle))
    angles[np.isclose(angles, -np.pi, atol=1e-9)] = np.pi
    return (vectors * np.exp(1j * (1 + epsilon) * angles)) @ vectors.conj().T


# ---- measurement ----------------------------------------------------------------------------------------------------

def confusion_matrix(d, c):
    """1-c right, c/(d-1) each other outcome; the row is the true one."""
    return np.eye(d) * (1 - c) + (np.ones((d, d)) - np.eye(d)) * c / (d - 1)


def measure(state, party, vectors, confusion=None, efficiency=1.0, dark=0.0):
    """[(outcome, state of the others)], outcome NO_CLICK when nothing was seen. Confusion, efficiency, dark counts."""
    d, levels = state.d, state.D
    true = []
    for k in range(d):
        v = np.zeros(levels, complex)
        v[:d] = vectors[:, k]
        true.append(np.outer(v, v.conj()))
    lost = np.eye(levels) - sum(true)
    read = np.eye(d) if confusion is None else np.asarray(confusion)
    unseen = lost + (1 - efficiency) * sum(true)
    effects = [efficiency * sum(read[i, k] * true[i] for i in range(d)) + dark / d * unseen for k in range(d)]
    branches = [(k, state.without(party, effects[k])) for k in range(d)]
    if np.abs((1 - dark) * unseen).max() > 1e-15:
        branches.append((NO_CLICK, state.without(party, (1 - dark) * unseen)))
    return branches


def outcome_table(state, bases, **detection):
    """{outcomes in the order of the parties: probability} when every party measures its own basis."""
    table = {(): state}
    for party in state.parties:
        table = {seen + (k,): rest for seen, before in table.items()
                 for k, rest in measure(before, party, basis(bases[party], state.d), **detection)}
    return {seen: rest.weight for seen, rest in table.items()}


def missing(values, d):
    """The level that none of the values has, when exactly one is missing."""
    if any(v is NO_CLICK for v in values):
        return NO_CLICK
    absent = [v for v in range(d) if v not in values]
    return absent[0] if len(absent) == 1 else NO_CLICK
