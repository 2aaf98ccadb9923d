"""Preparation by exchange pulses: H = sum_{i<k} J_ik P_ik acts on |S_{m-1}> (x) |m-1>, then one phase on level m-1.

a = (exp(i m tau) + m - 1)/m and b = (exp(i m tau) - 1)/m are the amplitudes of level m-1 staying at the last qudit and of
it at each other one after the nominal time, up to a common phase; the phase of the last qudit's level m-1 is arg b - arg a.
"""
from functools import cache
from math import asin, sqrt

import numpy as np

import dense
from tables import Table


def build():
    table = Table("preparation", "Fidelity with |S_N> after exchange preparation 1 -> 2 -> ... -> N with errors",
                  "computed by dense state vectors; couplings list i-k:J of those that are not 1; errors are of the last step")
    printed = {(3, 0.05, 0.0): "0.995009367972", (3, 0.0, 0.1): "0.997779629012", (3, 0.05, 0.1): "0.996364701262",
               (4, 0.05, 0.0): "0.992524966690", (4, 0.0, 0.1): "0.998126561979", (4, 0.05, 0.1): "0.998107889964"}
    for n in (2, 3, 4):
        table.check(f"time of step {n}", pulse_time(n), {2: np.pi / 4, 3: 2 * np.pi / 9, 4: np.pi / 4}[n])
        row(table, "exact", n, closed=1.0)
        for time, phase in ((0.05, 0.0), (0.0, 0.1), (0.05, 0.1), (-0.03, 0.2)):
            row(table, "last-step", n, time, phase, printed=printed.get((n, time, phase)))
    row(table, "coupling", 3, couplings={(0, 2): 0.0}, printed="0.586824088833")
    row(table, "coupling", 3, 0.02, -0.1, {(0, 2): 0.9, (0, 1): 1.05})
    row(table, "coupling", 4, 0.02, -0.1, {(0, 3): 0.9, (1, 2): 1.05})
    every_step(table)
    return table


def row(table, name, n, time=0.0, phase=0.0, couplings=None, **checks):
    entries = tuple(f"{i}-{k}:{j:.15g}" for (i, k), j in (couplings or {}).items())
    ket = np.array([1.0])
    for m in range(2, n):
        ket = step(ket, m)
    ket = step(ket, n, time, phase, couplings)
    parameters = {"timeError": time, "phaseError": phase, **({"couplings": entries} if entries else {})}
    table.add(name, n, "prepared-fidelity", parameters, overlap(ket, n), **checks)


def every_step(table):
    """Errors in every step: the errors of the steps 1->2, 2->3, ... in order."""
    for n in (3, 4):
        times, phases = [0.02, -0.03, 0.04][:n - 1], [0.05, 0.1, -0.02][:n - 1]
        ket = np.array([1.0])
        for m in range(2, n + 1):
            ket = step(ket, m, times[m - 2], phases[m - 2])
        table.add("every-step", n, "prepared-fidelity", {"timeError": times, "phaseError": phases, "per": "step"}, overlap(ket, n))


def overlap(ket, n):
    return abs(np.vdot(dense.antisymmetric(n), ket)) ** 2


def pulse_time(m):
    return 2 / m * asin(sqrt(m) / 2)


def local_phase(m):
    turn = np.exp(1j * m * pulse_time(m))
    return np.angle((turn - 1) / m) - np.angle((turn + m - 1) / m)


@cache
def exchange(m, i, k):
    """The swap of qudits i and k of m qudits of m levels."""
    axes = list(range(m))
    axes[i], axes[k] = k, i
    one = np.eye(m ** m).reshape((m,) * (2 * m))
    return one.transpose(axes + list(range(m, 2 * m))).reshape(m ** m, m ** m)


def step(ket, m, time_error=0.0, phase_error=0.0, couplings=None):
    """From m-1 qudits of m-1 levels to m qudits of m levels."""
    wide = np.zeros((m,) * m, complex)
    wide[(slice(0, m - 1),) * (m - 1) + (m - 1,)] = ket.reshape((m - 1,) * (m - 1))
    strengths = {(i, k): 1.0 for i in range(m) for k in range(i + 1, m)} | (couplings or {})
    hamiltonian = sum(j * exchange(m, i, k) for (i, k), j in strengths.items())
    energies, modes = np.linalg.eigh(hamiltonian)
    moved = modes @ (np.exp(-1j * energies * (pulse_time(m) + time_error)) * (modes.T @ wide.reshape(-1)))
    return phased(moved, m, local_phase(m) + phase_error)


def phased(ket, m, phase):
    factors = np.ones(m, complex)
    factors[m - 1] = np.exp(1j * phase)
    return (ket.reshape(-1, m) * factors).reshape(-1)
