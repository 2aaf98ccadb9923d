"""Two parties: CHSH value, Werner mixtures, key fraction, and the pair that removal leaves."""

from math import sqrt

import numpy as np
from scipy.optimize import brentq, minimize

import closed
import dense
import noise
from removal import leave
from tables import Table

PAULI = [np.array(m, complex) for m in ([[0, 1], [1, 0]], [[0, -1j], [1j, 0]], [[1, 0], [0, -1]])]


def build():
    table = Table("pairs", "Largest |CHSH| (bell), pair fidelity, outcome errors and asymptotic key fraction of pairs",
                  "computed by dense density matrices; CHSH for Werner mixtures 2 sqrt(2) v, Phys. Rev. A 40, 4277 (1989); "
                  "key fraction 1-h(Q_level)-h(Q_fourier), zero at equal rates of 11.0 %, Phys. Rev. Lett. 85, 441 (2000)")
    werner(table)
    key_limit(table)
    locally_damaged(table)
    for n in (3, 4):
        pair_from_many(table, n)
    return table


def bell(rho, levels):
    """Largest |CHSH| of two qudits over projective settings on levels 0 and 1, any other outcome counted as +1.

    An observable is a . sigma on levels 0 and 1 and one elsewhere. With T, r, s, w the correlations of sigma (x) sigma,
    sigma (x) rest, rest (x) sigma, rest (x) rest, the value is a.(T(b+b') + 2r) + a'.T(b-b') + 2 s.b + 2w, and the
    best a, a' are along their factors; b and b' are searched. The other sign of all four correlations counts as well.
    """
    rest = np.diag([0.0] * 2 + [1.0] * (levels - 2))
    sigma = [pad(m, levels) for m in PAULI]

    def mean(a, b):
        return float(np.trace(rho @ np.kron(a, b)).real)

    t = np.array([[mean(x, y) for y in sigma] for x in sigma])
    r, s, w = np.array([mean(x, rest) for x in sigma]), np.array([mean(rest, y) for y in sigma]), mean(rest, rest)

    return max(largest(t, r, s, w), largest(-t, -r, -s, -w))


def largest(t, r, s, w):
    def value(angles):
        b, c = direction(angles[:2]), direction(angles[2:])
        return np.linalg.norm(t @ (b + c) + 2 * r) + np.linalg.norm(t @ (b - c)) + 2 * s @ b + 2 * w

    starts = np.random.RandomState(5).uniform(0, np.pi, (24, 4))
    rough = max((minimize(lambda x: -value(x), start, method="BFGS").x for start in starts), key=value)
    options = {"xatol": 1e-10, "fatol": 1e-15, "maxiter": 4000, "maxfev": 4000}
    return value(minimize(lambda x: -value(x), rough, method="Nelder-Mead", options=options).x)


def direction(angles):
    theta, phi = angles
    return np.array([np.sin(theta) * np.cos(phi), np.sin(theta) * np.sin(phi), np.cos(theta)])


def pad(matrix, levels):
    wide = np.zeros((levels, levels), complex)
    wide[:2, :2] = matrix
    return wide


def werner(table):
    for v in (1.0, 0.9, 0.75, 1 / sqrt(2), 0.5):
        state = dense.start(2, white=1 - v)
        parameters = {"white": 1 - v}
        table.add(f"werner-{v:.4g}", 2, "bell", parameters, bell(state.rho, 2), closed=2 * sqrt(2) * v)
        table.add(f"werner-{v:.4g}", 2, "fidelity", parameters, state.fidelity(), closed=(1 + 3 * v) / 4)
        table.add(f"werner-{v:.4g}", 2, "key-fraction", parameters, key_fraction(state, ("level", "fourier")),
                  closed=1 - 2 * closed.binary_entropy((1 - v) / 2))


def error(state, basis):
    """Of the copies in which both saw 0 or 1, the fraction in which both saw the same: a singlet never does."""
    seen = dense.outcome_table(state, dict.fromkeys(state.parties, basis))
    fit = {k: p for k, p in seen.items() if max(k) < 2}
    return sum(p for k, p in fit.items() if k[0] == k[1]) / sum(fit.values())


def key_fraction(state, bases):
    return 1 - sum(closed.binary_entropy(error(state, b)) for b in bases)


def key_limit(table):
    q = brentq(lambda x: 1 - 2 * closed.binary_entropy(x), 0.05, 0.2, xtol=1e-15)
    table.add("key-limit", 2, "error-rate", {"key-fraction": 0}, q, printed="0.110")
    for rate in (0.01, 0.05, 0.1):
        state = dense.start(2, white=2 * rate)
        table.add(f"key-{rate}", 2, "key-fraction", {"white": 2 * rate}, key_fraction(state, ("level", "fourier")),
                  closed=1 - 2 * closed.binary_entropy(rate))


def locally_damaged(table):
    cases = {
        "decay": {"jumps": [("0>1:0.2",), ("0>1:0.5",)]},
        "dephasing": {"dephasing": [0.1, 0.3]},
        "depolarising": {"depolarising": [0.05, 0.1]},
        "rotation": {"rotation": ["0-1:0.3", "clock:0.4"]},
        "mixed": {"white": 0.02, "jumps": [("0>1:0.1",), ("0>1:0.05", "1>0:0.02")], "dephasing": 0.05, "depolarising": 0.02},
    }
    for name, parameters in cases.items():
        state = noise.noisy(2, parameters)
        table.add(f"pair-{name}", 2, "bell", parameters, bell(state.rho, 2))
        table.add(f"pair-{name}", 2, "key-fraction", parameters, key_fraction(state, ("level", "fourier")))


def pair_from_many(table, n):
    """All but two leave in the Fourier basis of the m levels still used, copies with an outcome of m or more are dropped;
    the two measure one basis of levels 0 and 1 and keep the copies in which both saw 0 or 1."""
    cases = {
        "ideal": {}, "depolarising": {"depolarising": 0.05}, "decay": {"jumps": noise.equal_decay(n, 0.2)},
        "mixed": {"white": 0.02, "jumps": noise.equal_decay(n, 0.1), "dephasing": 0.02, "depolarising": [0.01 * (i + 1) for i in range(n)]},
    }
    for name, parameters in cases.items():
        state = pair_of(noise.noisy(n, parameters))
        ideal = name == "ideal"
        table.add(f"many-{name}", n, "leakless", parameters, state.weight, closed=1.0 if ideal else None)
        state = state.scaled(1 / state.weight)
        table.add(f"many-{name}", n, "pair", parameters, state.fidelity(), closed=1.0 if ideal else None)
        table.add(f"many-{name}", n, "bell", parameters, bell(state.rho, n), closed=2 * sqrt(2) if ideal else None)
        for basis in ("level", "fourier-on-2"):
            table.add(f"many-{name}-{basis}", n, "same-value", parameters, error(state, basis), closed=0.0 if ideal else None)
        table.add(f"many-{name}", n, "key-fraction", parameters, key_fraction(state, ("level", "fourier-on-2")),
                  closed=1.0 if ideal else None)


def pair_of(state):
    for m in range(len(state.parties), 2, -1):
        state = dense.total([rest for k, rest in leave(state, m - 1, f"fourier-on-{m}", m) if k < m])
    return state
