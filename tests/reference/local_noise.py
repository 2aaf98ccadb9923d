"""Fidelity, yield and all-distinct probability of |S_N> after local noise, with strengths that differ by party."""
import numpy as np

import closed
import dense
import noise
from tables import Table

UNEQUAL = {2: [0.03, 0.2], 3: [0.05, 0.1, 0.3], 4: [0.02, 0.1, 0.15, 0.4], 5: [0.01, 0.05, 0.1, 0.2, 0.3]}
PHYSICAL_SOURCE = "computed by dense density matrices; decay as in Nielsen and Chuang, Quantum Computation and Quantum " \
                  "Information (2000), ch. 8, generalised to d levels; forms asserted in closed.py"


def build():
    table = Table("local-noise", "Fidelity with |S_N> (not its root), yield and all-distinct probability after local noise",
                  PHYSICAL_SOURCE)
    for n in (2, 3, 4, 5):
        depolarising(table, n)
        dephasing(table, n)
    for n in (2, 3, 4):
        decay(table, n)
        frames(table, n)
        phase(table, n)
        white(table, n)
        combined(table, n)
    transmission(table)
    thermal(table)
    kraus(table)
    leakage(table)
    return table


def fidelity_row(table, name, n, parameters, **checks):
    """A fidelity of the copies that arrived; a yield of its own where copies may be lost."""
    state = noise.noisy(n, parameters)
    arrived = of_arrived(state)
    table.add(name, n, "fidelity", parameters, arrived.fidelity() / arrived.weight, **checks)
    return arrived


def of_arrived(state):
    for party in state.parties:
        kept = np.diag([1.0] * state.d + [0.0] * (state.D - state.d))
        state = dense.State(project(state, party, kept), state.parties, state.d, state.D)
    return state


def project(state, party, projector):
    return state.after(party, dense.kraus_channel([projector])).rho


def depolarising(table, n):
    printed = {3: "0.757037037037", 4: "0.674845703125"}
    equal = {"depolarising": 0.1}
    if n < 5:
        fidelity_row(table, "depolarising-equal", n, equal, printed=printed.get(n), closed=closed.fidelity_depolarising([0.1] * n))
    unequal = {"depolarising": UNEQUAL[n]}
    fidelity_row(table, "depolarising-unequal", n, unequal, closed=closed.fidelity_depolarising(UNEQUAL[n]))
    if n < 5:
        distinct_row(table, "depolarising-level", n, equal, "level", closed=closed.all_distinct_depolarising([0.1] * n))
        for basis in ("level", "fourier", "phased-1"):
            distinct_row(table, f"depolarising-unequal-{basis}", n, unequal, basis,
                         closed=closed.all_distinct_depolarising(UNEQUAL[n]))


def distinct_row(table, name, n, parameters, basis, **checks):
    table.add(name, n, "all-distinct", {**parameters, "basis": basis}, distinct(noise.noisy(n, parameters), basis), **checks)


def distinct(state, basis, **detection):
    """Probability that every party sees something and all outcomes differ."""
    table = dense.outcome_table(state, {p: basis for p in state.parties}, **detection)
    return sum(p for seen, p in table.items() if None not in seen and len(set(seen)) == len(seen))


def dephasing(table, n):
    if n < 5:
        fidelity_row(table, "dephasing-equal", n, {"dephasing": 0.1}, printed={4: "0.733204166667"}.get(n),
                     closed=closed.fidelity_dephasing([0.1] * n))
    fidelity_row(table, "dephasing-unequal", n, {"dephasing": UNEQUAL[n]}, closed=closed.fidelity_dephasing(UNEQUAL[n]))


def white(table, n):
    fidelity_row(table, "white", n, {"white": 0.02}, closed=closed.fidelity_white(0.02, n))


def decay(table, n):
    fidelity_row(table, "decay-equal", n, {"jumps": noise.equal_decay(n, 0.2)}, closed=np.exp(-0.2))
    branching = [tuple(f"0>{b}:{rate(i, b):.15g}" for b in range(1, n)) for i in range(n)]
    totals = [sum(rate(i, b) for b in range(1, n)) for i in range(n)]
    fidelity_row(table, "decay-branching-by-party", n, {"jumps": branching}, closed=closed.fidelity_decay(totals))
    distinct_row(table, "decay-branching-by-party", n, {"jumps": branching}, "level", closed=closed.all_distinct_decay(totals))
    distinct_row(table, "decay-branching-by-party-fourier", n, {"jumps": branching}, "fourier")
    if n > 2:
        cascade = tuple(f"{a}>{a + 1}:{0.3 - 0.05 * a:.15g}" for a in range(n - 1))
        fidelity_row(table, "decay-cascade", n, {"jumps": cascade})
        distinct_row(table, "decay-cascade", n, {"jumps": cascade}, "level")


def rate(i, b):
    """Rate times time of the branch 0 -> b at party i: nothing is symmetric."""
    return 0.05 * b + 0.02 * i


def frames(table, n):
    angles = [0.1 * (i + 1) for i in range(n)]
    for kind in ("clock", "0-1"):
        entries = [f"{kind}:{a:.15g}" for a in angles]
        unitaries = [noise.rotation(e, n) for e in entries]
        fidelity_row(table, f"frames-{kind}", n, {"rotation": entries}, closed=closed.fidelity_unitaries(unitaries))
        fidelity_row(table, f"frames-common-{kind}", n, {"rotation": f"{kind}:0.7"}, closed=1.0)
    mixed = [f"{'clock' if i % 2 else f'0-{n - 1}'}:{0.2 + 0.15 * i:.15g}" for i in range(n)]
    fidelity_row(table, "frames-mixed", n, {"rotation": mixed},
                 closed=closed.fidelity_unitaries([noise.rotation(e, n) for e in mixed]))


def phase(table, n):
    printed = {0.1: "0.980296695625", 0.2: "0.924593923451", 0.5: "0.645035685466"} if n == 3 else {}
    for sigma in (0.1, 0.2, 0.5):
        fidelity_row(table, f"phase-noise-{sigma}", n, {"phaseNoise": sigma}, printed=printed.get(sigma))
    fidelity_row(table, "phase-noise-unequal", n, {"phaseNoise": UNEQUAL[n]})


def combined(table, n):
    """Everything at once, so that the acting order shows."""
    parameters = {
        "white": 0.05,
        "jumps": [tuple(f"0>{b}:{rate(i, b):.15g}" for b in range(1, n)) for i in range(n)],
        "dephase": (f"0-1:0.02", *(f"0-{b}:0.02" for b in range(2, n))),
        "rotation": [f"0-1:{0.1 * i:.15g}" for i in range(n)],
        "phaseNoise": 0.1, "dephasing": 0.03, "depolarising": UNEQUAL[n],
    }
    fidelity_row(table, "combined", n, parameters)
    distinct_row(table, "combined-fourier", n, parameters, "fourier")
    distinct_row(table, "combined-phased", n, parameters, "phased-1")
    rates = {"jumps": noise.equal_decay(n, 0.3), "depolarisingRate": 0.1}
    fidelity_row(table, "decay-with-depolarising-rate", n, rates)


def transmission(table):
    eta, full = (1.0, 0.8, 0.5), (1.0, 1.0, 1.0)
    one = {"transmission": [full, full, eta]}
    arrived = fidelity_row(table, "transmission-one-flight", 3, one, closed=closed.transmission_on_one(eta))
    table.add("transmission-one-flight", 3, "yield", one, arrived.weight, closed=np.mean(eta))
    every = {"transmission": [eta, eta, eta]}
    arrived = fidelity_row(table, "transmission-every-flight", 3, every, closed=1.0)
    table.add("transmission-every-flight", 3, "yield", every, arrived.weight, closed=0.4)
    by_party = {"transmission": [(1.0, 0.9, 0.7), (0.6, 0.8, 0.9), (0.5, 0.5, 1.0)], "depolarising": 0.05}
    arrived = fidelity_row(table, "transmission-by-party", 3, by_party)
    table.add("transmission-by-party", 3, "yield", by_party, arrived.weight)
    four = {"transmission": [(0.9, 0.8, 0.7, 0.6)] * 2 + [(1.0, 1.0, 1.0, 1.0)] * 2}
    arrived = fidelity_row(table, "transmission-two-flights", 4, four)
    table.add("transmission-two-flights", 4, "yield", four, arrived.weight)


def thermal(table):
    """Exchange between two levels in both directions."""
    for n, jumps in ((2, ("0>1:0.3", "1>0:0.12")), (3, ("0>2:0.3", "2>0:0.12")), (4, ("1>3:0.3", "3>1:0.12"))):
        fidelity_row(table, "thermal-exchange", n, {"jumps": jumps})
        distinct_row(table, "thermal-exchange", n, {"jumps": jumps}, "level")


def kraus(table):
    """shift:p is sqrt(1-p) 1 and sqrt(p) X with X|l> = |l+1 mod d>; damping:g empties level 0 into level 1 with probability g."""
    for n in (2, 3, 4):
        fidelity_row(table, "kraus-shift", n, {"kraus": [f"shift:{0.05 * (i + 1):.15g}" for i in range(n)]})
        fidelity_row(table, "kraus-damping", n, {"kraus": [f"damping:{0.1 * (i + 1):.15g}" for i in range(n)]},
                     closed=closed.fidelity_decay([-np.log(1 - 0.1 * (i + 1)) for i in range(n)]))
        fidelity_row(table, "kraus-behind-depolarising", n, {"depolarising": 0.05, "kraus": "damping:0.2"})


def leakage(table):
    """Level a leaks into the sink with a probability per level, a lost qudit counting as fidelity 0; nothing is heralded."""
    for n in (2, 3, 4):
        parameters = {"leakage": [tuple(0.02 * (a + 1) + 0.01 * i for a in range(n)) for i in range(n)], "depolarising": 0.05}
        state = noise.noisy(n, parameters, sink=True)
        table.add("leakage-unheralded", n, "fidelity-unheralded", parameters, state.fidelity())
