"""Local noise from the parameters of a row, as channels of one qudit."""
import numpy as np
from scipy.linalg import expm

import dense


def jumps_of(text):
    """'0>1:0.1' as (0, 1, 0.1)."""
    levels, rate = text.split(":")
    return int(levels.split(">")[0]), int(levels.split(">")[1]), float(rate)


def dephase_of(entries, d):
    """'0-1:0.2' as the symmetric matrix of pure dephasing."""
    matrix = np.zeros((d, d))
    for entry in entries:
        levels, rate = entry.split(":")
        a, b = map(int, levels.split("-"))
        matrix[a, b] = matrix[b, a] = float(rate)
    return matrix


def rotation(entry, d):
    """'clock:0.3' is exp(-i 0.3 diag(0 ... d-1)); '0-2:0.3' the real rotation of a pair of levels."""
    kind, angle = entry.split(":")
    theta = float(angle)
    if kind == "clock":
        return np.diag(np.exp(-1j * theta * np.arange(d)))
    i, k = map(int, kind.split("-"))
    generator = -1j * (dense.unit(d, i, k) - dense.unit(d, k, i))
    return expm(-1j * theta * generator)


def kraus(entry, d, levels):
    """'shift:p' or 'damping:g' as Kraus operators that leave a lost qudit lost."""
    kind, p = entry.split(":")[0], float(entry.split(":")[1])
    if kind == "shift":
        operators = [np.sqrt(1 - p) * np.eye(d), np.sqrt(p) * np.roll(np.eye(d), 1, axis=0)]
    else:
        operators = [np.diag([np.sqrt(1 - p)] + [1.0] * (d - 1)), np.sqrt(p) * dense.unit(d, 1, 0)]
    wide = [np.pad(k, (0, levels - d)) for k in operators]
    return wide + [dense.unit(levels, s, s) for s in range(d, levels)]


def of_party(parameters, i):
    """Every key's value for party i."""
    own = {}
    for key, value in parameters.items():
        own[key] = value[i] if isinstance(value, list) else value
    return own


def channel(own, d, levels):
    """The channel of one party's noise parameters, in the acting order."""
    jumps = [jumps_of(e) for e in own.get("jumps", ())]
    dephase = dephase_of(own.get("dephase", ()), d)
    total = dense.flow(dense.lindblad(d, levels, jumps, dephase, None, own.get("depolarisingRate", 0.0)), 1.0)
    if "leakage" in own:
        total = dense.loss(d, levels, [1 - q for q in own["leakage"]]) @ total
    if "rotation" in own:
        total = dense.kraus_channel([dense.widen(rotation(own["rotation"], d), levels)]) @ total
    total = dense.phase_noise(d, levels, own.get("phaseNoise", 0.0)) @ total
    total = dense.dephasing(d, levels, own.get("dephasing", 0.0)) @ total
    total = dense.depolarising(d, levels, own.get("depolarising", 0.0)) @ total
    if "kraus" in own:
        total = dense.kraus_channel(kraus(own["kraus"], d, levels)) @ total
    if "transmission" in own:
        total = dense.loss(d, levels, own["transmission"]) @ total
    return total


def noisy(n, parameters, sink=False):
    """|S_n> (with parameters['white'] of white noise) behind every party's noise."""
    state = dense.start(n, sink or "transmission" in parameters, parameters.get("white", 0.0))
    for party in state.parties:
        state = state.after(party, channel(of_party(parameters, party), n, state.D))
    return state


def equal_decay(n, gamma_t):
    """Level 0 empties with total rate times time gamma_t, equally into every other level."""
    return tuple(f"0>{b}:{gamma_t / (n - 1):.15g}" for b in range(1, n))
