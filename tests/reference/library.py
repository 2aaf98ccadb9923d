"""Runs of the protocol library under the conditions shipped with it, worked by hand like those of runs.py.

All conditions of the library but removal-stored: 2.04e8 m/s, 0.2 dB/km and 1 dB, heralded; depolarising 0.01 and dephasing 0.02 on the way;
operations of 2 us with 0.003 of depolarising; detectors of 5 us, efficiency 0.92, confusion 0.01, dark counts 1e-5;
messages at 2.04e8 m/s through the common source, 1 us of processing.
"""
from pathlib import Path

import numpy as np

import dense
import outcomes
from closed import binary_entropy
from collective import Emitters, polygon
from pairs import bell
from schedule import US, at_checkpoint, clicked, decibels, with_level_zero

DATA = Path(__file__).parents[2] / "protocols" / "data"
METRE_TIME = 1 / 2.04e8
MESSAGE = 1 * US
DETECTION, OPERATION = 5 * US, 2 * US


def detector(d):
    return {"confusion": dense.confusion_matrix(d, 0.01), "efficiency": 0.92, "dark": 1e-5}


def fibre(lengths):
    """Probability that all qudits arrive; lengths in km."""
    return np.prod([decibels(0.2 * x + 1) for x in lengths])


def arrived(state, km, flying):
    """Every qudit behind its flight: decay for length over speed, dephasing, depolarising."""
    for party in state.parties:
        for channel in (dense.flow(flying, km[party] * 1e3 * METRE_TIME), dense.dephasing(state.d, state.D, 0.02),
                        dense.depolarising(state.d, state.D, 0.01)):
            state = state.after(party, channel)
    return state


def holding_of_families(d):
    """waiting: 4 ms from 0 to 1, T2 = 5 ms of level 0 with each other level, depolarising at 20 /s; all at once."""
    pure = 1 / 5e-3 - 1 / (2 * 4e-3)
    return dense.lindblad(d, d, [(0, 1, 1 / 4e-3)], with_level_zero(d, pure), depolarising_rate=20.0)


def flying_of_families(d):
    """levels: 1 ms from 0 to 1, T2 = 1.5 ms of level 0 with each other level."""
    return dense.lindblad(d, d, [(0, 1, 1 / 1e-3)], with_level_zero(d, 1 / 1.5e-3 - 1 / 2e-3))


def removal(table):
    """Lengths 2.5, 3.4, 1.8, 6 km. No waiting section: the levels go on acting.

    Dov detects for 5 us from 6 km / v and announces. Party p, idle since l_p / v, has the word (6 km + l_p) / v + 1 us later.
    The flight l_p / v cancels: each is idle for 6 km / v + 5 us + 6 km / v + 1 us, then operates for 2 us. Ready at l_p / v
    plus that: Ben, the farthest, is last, and on the checkpoint's copy the others wait for the difference of lengths.
    """
    km = {"Ada": 2.5, "Ben": 3.4, "Cyd": 1.8, "Dov": 6.0}
    generator = dense.lindblad(4, 4, [(0, b, 1 / 3e-3) for b in (1, 2, 3)], with_level_zero(4, 1 / 1.5e-3 - 1 / 2e-3))
    prepared = 0.99 * np.load(DATA / "prepared-4.npy", allow_pickle=False) + 0.01 * np.eye(256) / 256
    state = dense.State(prepared, km, 4, 4)
    name = "protocols/removal"
    table.add(name, 4, "checkpoint", {"label": "prepared"}, state.fidelity())
    state = arrived(state, km, generator).after("Dov", dense.flow(generator, DETECTION))

    idle = 2 * 6e3 * METRE_TIME + DETECTION + MESSAGE
    corrected = []
    for k, rest in dense.measure(state, "Dov", dense.fourier(4), **detector(4)):
        if k is not None:
            for party in ("Ada", "Ben", "Cyd"):
                rest = rest.after(party, dense.flow(generator, idle + OPERATION))
                rest = rest.after_unitary(party, dense.complement(dense.fourier(4), k, 4))
                rest = rest.after(party, dense.depolarising(4, 4, 0.003))
            corrected.append(rest)
    rest = dense.total(corrected)

    looked = rest
    for party in ("Ada", "Cyd"):
        looked = looked.after(party, dense.flow(generator, (3.4 - km[party]) * 1e3 * METRE_TIME))
    at_checkpoint(table, name, 4, "after removal", looked, fibre(km.values()))
    for party in rest.parties:
        rest = rest.after(party, dense.flow(generator, DETECTION))
    seen, kept = clicked(dense.outcome_table(rest, dict.fromkeys(rest.parties, "level"), **detector(4)))
    table.add(name, 4, "yield", {}, fibre(km.values()) * seen)
    table.add(name, 4, "success", {}, sum(p for k, p in kept.items() if len(set(k)) == 3))
    table.add(name, 4, "report", {"label": "level beyond the smaller state"}, sum(p for k, p in kept.items() if 3 in k))


def removal_stored(table):
    """Removal of four emitters in a square of side 0.1 wavelengths: 5 ns side by side, then 2 km each, then the wait for Dov's word.

    Transitions alike, 6.07 MHz, dipoles normal. All arrive at 5 ns + 2 km / v behind an interface (efficiency 0.6, depolarising
    0.005) that levels do not decay behind. Dov detects for 5 us and announces; the word takes 4 km / v + 1 us; operations of 2 us.
    While held: T2 = 2 ms of level 0 with each other level, depolarising at 200 /s. Detectors of efficiency 0.92, nothing else.
    """
    rate = 2 * np.pi * 6.07e6
    square = Emitters(polygon(4, 0.1), [(0.0, 0.0, 1.0)] * 3, [rate] * 3)
    ket = dense.antisymmetric(4)
    state = dense.State(square.evolved(np.outer(ket, ket), 5e-9), ("Ada", "Ben", "Cyd", "Dov"), 4, 4)
    name = "protocols/removal-stored"
    script = {"script": "protocols/removal"}
    table.add(name, 4, "checkpoint", {**script, "label": "stored"}, state.fidelity())
    for party in state.parties:
        for channel in (dense.depolarising(4, 4, 0.005), dense.dephasing(4, 4, 0.01)):
            state = state.after(party, channel)
    heralded = (0.6 * decibels(0.4)) ** 4
    table.add(name, 4, "checkpoint", {**script, "label": "arrived"}, state.fidelity())
    table.add(name, 4, "kept", {**script, "label": "arrived"}, heralded)

    holding = dense.lindblad(4, 4, (), with_level_zero(4, 1 / 2e-3), depolarising_rate=200.0)
    state = state.after("Dov", dense.flow(holding, DETECTION))
    idle = DETECTION + 4e3 * METRE_TIME + MESSAGE
    corrected = []
    for k, rest in dense.measure(state, "Dov", dense.fourier(4), efficiency=0.92):
        if k is not None:
            for party in ("Ada", "Ben", "Cyd"):
                rest = rest.after(party, dense.flow(holding, idle + OPERATION))
                rest = rest.after_unitary(party, dense.complement(dense.fourier(4), k, 4))
            corrected.append(rest)
    rest = dense.total(corrected)
    looked = rest.fidelity() / rest.weight
    table.add(name, 4, "checkpoint", {**script, "label": "after removal"}, looked)
    table.add(name, 4, "kept", {**script, "label": "after removal"}, heralded * rest.weight)
    for party in rest.parties:
        rest = rest.after(party, dense.flow(holding, DETECTION))
    seen, kept = clicked(dense.outcome_table(rest, dict.fromkeys(rest.parties, "level"), efficiency=0.92))
    table.add(name, 4, "yield", script, heralded * seen)
    table.add(name, 4, "success", script, sum(p for k, p in kept.items() if len(set(k)) == 3))
    table.add(name, 4, "report", {**script, "label": "level beyond the smaller state"}, sum(p for k, p in kept.items() if 3 in k))


def sharing(table):
    """n = 3, lengths 2.5, 3.4, 1.8 km. Everybody measures on arrival: 5 us of holding each, then sifting."""
    km = {"Dealer": 2.5, "P[1]": 3.4, "P[2]": 1.8}
    state = arrived(dense.start(3, white=0.02, names=km), km, flying_of_families(3))
    shares(table, "protocols/secret-sharing", [(1.0, held(state, holding_of_families(3)))], fibre(km.values()))


def intercepted(table):
    """As sharing, with P[1]'s qudit measured and sent on before its flight, in a basis picked at random."""
    km = {"Dealer": 2.5, "P[1]": 3.4, "P[2]": 1.8}
    for name, white, noisy in (("ideal", 0.0, False), ("protocols/secret-sharing-intercepted", 0.02, True)):
        weighted = []
        for basis in ("level", "fourier"):
            vectors = dense.basis(basis, 3)
            projectors = [np.outer(v, v.conj()) for v in vectors.T]
            state = dense.start(3, white=white, names=km).after("P[1]", dense.kraus_channel(projectors))
            if noisy:
                state = held(arrived(state, km, flying_of_families(3)), holding_of_families(3))
            weighted.append((0.5, state))
        if noisy:
            shares(table, name, weighted, fibre(km.values()))
        else:
            error = outcomes.symbol_error(sifted(weighted, {})[1], 3)
            table.check("symbol error of an ideal interception", error, 1 / 3)


def held(state, holding):
    for party in state.parties:
        state = state.after(party, dense.flow(holding, DETECTION))
    return state


def sifted(weighted, detection):
    """(kept and seen fraction, outcome distribution) of copies in which all picked one of two bases alike."""
    kept = {}
    for weight, state in weighted:
        part, table = outcomes.sifted(state, ("level", "fourier"), **detection)
        for seen, p in table.items():
            kept[seen] = kept.get(seen, 0.0) + weight * part * p
    total = sum(kept.values())
    return total, {seen: p / total for seen, p in kept.items()}


def shares(table, name, weighted, heralded):
    kept_fraction, kept = sifted(weighted, detector(3))
    error = outcomes.symbol_error(kept, 3)
    table.add(name, 3, "yield", {}, heralded * kept_fraction)
    table.add(name, 3, "success", {}, 1 - error)
    table.add(name, 3, "report", {"label": "symbol error"}, error)
    if name.endswith("sharing"):
        table.add(name, 3, "report", {"label": "one guesses"}, outcomes.guess(kept, [0], [1]))
        table.add(name, 3, "report", {"label": "all guess"}, outcomes.guess(kept, [0], [1, 2]))
        table.add(name, 3, "report", {"label": "bits that one has"}, outcomes.information(kept, [0], [1]))


def pair(table):
    """n = 4, lengths 2.5, 3.4, 1.8, 6 km. v = 2.04e8 m/s; all times in km / v unless said.

    P[4] detects 6 -> 6 + 5 us, announces. Party p has the word at 12 + l_p + 6 us, operates to 12 + l_p + 8 us.
    P[3] then detects, 12 + 1.8 + 8 us -> 13.8 + 13 us, announces. P[1], P[2] have the word at 13.8 + 1.8 + l_p + 14 us =
    15.6 + l_p + 14 us; idle since 12 + l_p + 8 us: 3.6 + 6 us. They operate until 15.6 + l_p + 16 us.
    On the checkpoint's copy P[1] waits 0.9 more. Both then detect, 5 us each.
    """
    km = {"P[1]": 2.5, "P[2]": 3.4, "P[3]": 1.8, "P[4]": 6.0}
    holding, unit = holding_of_families(4), 1e3 * METRE_TIME
    state = arrived(dense.start(4, white=0.02, names=km), km, flying_of_families(4))
    states = [state]
    for leaver, m, idle in (("P[4]", 4, 12 * unit + 6 * US), ("P[3]", 3, 3.6 * unit + 6 * US)):
        states = [rest for before in states for rest in left(before, leaver, m, idle, holding)]
    rest = dense.total(states)

    name, heralded = "protocols/pair-from-many", fibre(km.values())
    looked = rest.after("P[1]", dense.flow(holding, 0.9 * unit))
    at_checkpoint(table, name, 4, "pair", looked, heralded)
    table.add(name, 4, "report", {"label": "Bell value"}, bell(looked.rho / looked.weight, 4))
    tested(table, name, held(rest, holding), heralded)


def left(state, leaver, m, idle, holding):
    """Those who stay, for each outcome below m."""
    state = state.after(leaver, dense.flow(holding, DETECTION))
    vectors = dense.basis(f"fourier-on-{m}", 4)
    for k, rest in dense.measure(state, leaver, vectors, **detector(4)):
        if k is not None and k < m:
            for party in rest.parties:
                rest = rest.after(party, dense.flow(holding, idle + OPERATION))
                rest = rest.after_unitary(party, dense.complement(vectors, k, m)).after(party, dense.depolarising(4, 4, 0.003))
            yield rest


def tested(table, name, state, heralded):
    """Both pick level or the Fourier basis of two levels; copies with the same pick and values below 2 are kept."""
    errors, fitting = {}, 0.0
    for basis in ("level", "fourier-on-2"):
        seen = dense.outcome_table(state, dict.fromkeys(state.parties, basis), **detector(4))
        fit = {k: p / 4 for k, p in seen.items() if None not in k and max(k) < 2}
        errors[basis] = (sum(p for k, p in fit.items() if k[0] == k[1]), sum(fit.values()))
        fitting += sum(fit.values())
    rates = [same / whole for same, whole in errors.values()]
    table.add(name, 4, "yield", {}, heralded * fitting)
    table.add(name, 4, "success", {}, 1 - sum(same for same, _ in errors.values()) / fitting)
    table.add(name, 4, "report", {"label": "level errors"}, rates[0])
    table.add(name, 4, "report", {"label": "Fourier errors"}, rates[1])
    table.add(name, 4, "report", {"label": "key fraction"}, 1 - sum(map(binary_entropy, rates)))
