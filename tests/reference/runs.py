"""Whole runs worked by hand: each schedule is derived in comments, in microseconds, and the noise put where it says.

A run is a script with its conditions file in tests/reference/cases or protocols; the script is not read here.
"""
import numpy as np

import dense
import library
import noise
import outcomes
import preparation
from pairs import bell
from schedule import US, at_checkpoint, clicked, decibels, every_pair
from tables import Table

RUN_LEGEND = """\
# columns:   name,N,kind,parameters,value
#   name: the script, NAME.protocol beside NAME.conditions.json, from the root of the project
#   kind: success, yield, checkpoint (a fidelity), kept (fraction kept up to that checkpoint) or report
#   parameters: label=LABEL of the checkpoint or report; script=NAME where the conditions have no script of their own"""


def build():
    table = Table("runs", "Figures of whole runs whose schedule is worked by hand", "computed by dense density matrices", RUN_LEGEND)
    waits(table)
    held(table)
    interface(table)
    turned(table)
    library.removal(table)
    library.removal_stored(table)
    library.sharing(table)
    library.intercepted(table)
    library.pair(table)
    return table


def waits(table):
    """Lengths 1, 2, 4 km at 2e8 m/s: arrivals Ada 5, Ben 10, Cyd 20.

    Cyd detects from 20 to 25 and announces at 25. Message to Ada: 5 km, 25 + 1, arrives 51. To Ben: 6 km, 30 + 1, arrives 56.
    Ada is idle 5 -> 51 = 46, operation 51 -> 53. Ben is idle 10 -> 56 = 46, operation 56 -> 58.
    Checkpoint at 58: on the copy Ada waits 5 more. Ada detects 53 -> 58, Ben 58 -> 63: 5 each.
    """
    generator = dense.lindblad(3, 3, [(0, 1, 1 / (200 * US)), (0, 2, 1 / (400 * US))], every_pair(3, 1 / 1e-3))
    detector = {"confusion": dense.confusion_matrix(3, 0.01), "efficiency": 0.92, "dark": 1e-3}
    state = dense.start(3, names=("Ada", "Ben", "Cyd"))
    for party, flight in (("Ada", 5), ("Ben", 10), ("Cyd", 20)):
        for channel in (dense.flow(generator, flight * US), dense.dephasing(3, 3, 0.02), dense.depolarising(3, 3, 0.01)):
            state = state.after(party, channel)
    heralded = decibels(0.2 * 1 + 1) * decibels(0.2 * 2 + 1) * decibels(0.2 * 4 + 1)

    state = state.after("Cyd", dense.flow(generator, 5 * US))
    corrected = []
    for k, rest in dense.measure(state, "Cyd", dense.fourier(3), **detector):
        if k is None:
            continue
        unitary = dense.over_rotated(dense.complement(dense.fourier(3), k, 3), 0.02)
        for party in ("Ada", "Ben"):
            rest = rest.after(party, dense.flow(generator, (46 + 2) * US)).after_unitary(party, unitary)
            rest = rest.after(party, dense.depolarising(3, 3, 0.003))
        corrected.append(rest)
    rest = dense.total(corrected)

    name, looked = "tests/reference/cases/waits", rest.after("Ada", dense.flow(generator, 5 * US))
    at_checkpoint(table, name, 3, "after removal", looked, heralded)
    table.add(name, 3, "report", {"label": "chsh"}, bell(looked.rho / looked.weight, 3))
    for party in ("Ada", "Ben"):
        rest = rest.after(party, dense.flow(generator, 5 * US))
    seen, kept = clicked(dense.outcome_table(rest, {"Ada": "level", "Ben": "level"}, **detector))
    table.add(name, 3, "yield", {}, heralded * seen)
    table.add(name, 3, "success", {}, sum(p for k, p in kept.items() if k[0] != k[1]))
    table.add(name, 3, "report", {"label": "Ada reads 0"}, sum(p for k, p in kept.items() if k[0] == 0))


def held(table):
    """Lengths 3, 1, 2 km at 2e8 m/s: arrivals Ada 15, Ben 5, Cyd 10. The levels' own decay acts in flight alone.

    Cyd detects 10 -> 14 and sends at 14. To Ada: 5 km, 25 + 2, arrives 41. To Ben: 3 km, 15 + 2, arrives 31.
    The wait of 3 ends long before (Ada 18, Ben 8). Ada is idle 15 -> 41, operation to 42: 27 held. Ben 5 -> 31, to 32: 27 held.
    Checkpoint at 42: on the copy Ben waits 10 more. Ada detects 42 -> 46, Ben 32 -> 36: 4 each.
    Held: rate 1/300 us from 0 to 1, T2 = 500 us of level 0 with each other, hence 1/T2 - 1/(2 * 300 us) of pure dephasing.
    """
    flying = dense.lindblad(3, 4, [(0, 2, 4000.0)])
    pure = 1 / (500 * US) - 1 / (600 * US)
    t2 = np.array([[0, pure, pure], [pure, 0, 0], [pure, 0, 0]])
    holding = dense.lindblad(3, 4, [(0, 1, 1 / (300 * US))], t2, depolarising_rate=200.0)
    plain, faulty = {"efficiency": 0.95}, {"efficiency": 0.95, "confusion": dense.confusion_matrix(3, 0.02), "dark": 0.01}

    state = dense.start(3, sink=True, white=0.03, names=("Ada", "Ben", "Cyd"))
    for party, flight in (("Ada", 15), ("Ben", 5), ("Cyd", 10)):
        state = state.after(party, dense.flow(flying, flight * US)).after(party, dense.phase_noise(3, 4, 0.1))
    state = state.after("Cyd", dense.depolarising(3, 4, 0.02)).after("Ada", dense.loss(3, 4, (0.9, 0.8, 0.7)))

    state = state.after("Cyd", dense.flow(holding, 4 * US))
    kept, clicks = [], 0.0
    for basis in ("level", "fourier"):
        for k, rest in dense.measure(state, "Cyd", dense.basis(basis, 3), **plain):
            clicks += 0 if k is None else rest.weight / 2
            if k is None or not k < 2:
                continue
            unitary = dense.complement(dense.basis(basis, 3), k, 3)
            for party in ("Ada", "Ben"):
                rest = rest.after(party, dense.flow(holding, 27 * US)).after_unitary(party, unitary)
                rest = rest.after(party, dense.depolarising(3, 4, 0.01))
            kept.append(rest.scaled(0.5))
    rest = dense.total(kept)

    name = "tests/reference/cases/held"
    at_checkpoint(table, name, 3, "pair", rest.after("Ben", dense.flow(holding, 10 * US)))
    table.check("Cyd clicks", clicks, 0.95)
    for party in ("Ada", "Ben"):
        rest = rest.after(party, dense.flow(holding, 4 * US))
    pairs = {}
    for v, left in dense.measure(rest, "Ada", dense.basis("fourier-on-2", 3), **plain):
        for w, nothing in dense.measure(left, "Ben", dense.basis("fourier-on-2", 3), **faulty):
            pairs[v, w] = nothing.weight
    seen, good = clicked(pairs)
    table.add(name, 3, "yield", {}, seen)
    table.add(name, 3, "success", {}, sum(p for k, p in good.items() if k[0] != k[1]))
    table.add(name, 3, "report", {"label": "Ada reads 2"}, sum(p for k, p in good.items() if k[0] == 2))


def interface(table):
    """Behind the interface no level decays on the way. Held qudits decay again while they are detected, 10 each."""
    holding = dense.lindblad(3, 3, [(0, 1, 1 / (50 * US)), (1, 2, 1 / (150 * US))])
    matrix = np.array([[0.97, 0.02, 0.01], [0.03, 0.95, 0.02], [0.0, 0.04, 0.96]])
    state = dense.start(3, white=0.04, names=("Ada", "Ben", "Cyd"))
    for party in state.parties:
        for channel in (dense.depolarising(3, 3, 0.02), dense.dephasing(3, 3, 0.05), dense.flow(holding, 10 * US)):
            state = state.after(party, channel)
    heralded = 0.8 ** 3 * decibels(2) * decibels(2) * decibels(1)

    triples = {}
    for a, one in dense.measure(state, "Ada", dense.fourier(3), efficiency=0.9, dark=0.005):
        for b, two in dense.measure(one, "Ben", dense.fourier(3), confusion=matrix, efficiency=0.9, dark=0.005):
            for c, three in dense.measure(two, "Cyd", dense.fourier(3), efficiency=0.9, dark=0.005):
                triples[a, b, c] = three.weight
    seen, kept = clicked(triples)

    name = "tests/reference/cases/interface"
    table.add(name, 3, "yield", {}, heralded * seen)
    table.add(name, 3, "success", {}, sum(p for k, p in kept.items() if len(set(k)) == 3))
    for label, value in figures(kept).items():
        table.add(name, 3, "report", {"label": label}, value)


def figures(kept):
    """The reports of cases/interface.protocol."""
    def probability(condition):
        return sum(p for k, p in kept.items() if condition(*k))

    def mean_of_b(condition):
        return sum(k[1] * p for k, p in kept.items() if condition(*k)) / probability(condition)

    return {
        "Ada draws 0": probability(lambda a, b, c: a == 0),
        "Ada draws 0 when Ben drew 1": probability(lambda a, b, c: a == 0 and b == 1) / probability(lambda a, b, c: b == 1),
        "mean of Ben": mean_of_b(lambda a, b, c: True),
        "mean of Ben when Ada drew 2": mean_of_b(lambda a, b, c: a == 2),
        "guess": outcomes.guess(kept, [0], [1]),
        "information": outcomes.information(kept, [0], [1, 2]),
        "one zero": probability(lambda a, b, c: (a, b, c).count(0) == 1),
    }


def turned(table):
    """Flights of 10 and nothing else that takes time: no qudit is ever held."""
    thermal = dense.lindblad(3, 4, [(0, 2, 6000.0), (2, 0, 1500.0)])
    operators = [np.diag([1, 0.8, 0.6]), 0.6 * dense.unit(3, 0, 1), 0.8j * dense.unit(3, 1, 2)]
    ket = preparation.step(preparation.step(np.array([1.0]), 2), 3, 0.05, 0.1)
    state = dense.embed(0.99 * np.outer(ket, ket.conj()) + 0.01 * np.eye(27) / 27, 3, 4, ("Ada", "Ben", "Cyd"))
    for party in state.parties:
        state = state.after(party, dense.flow(thermal, 10 * US))
    state = state.after_unitary("Ada", noise.rotation("0-1:0.2", 3))
    state = state.after("Ben", dense.loss(3, 4, (1.0, 0.95, 1.0))).after_unitary("Ben", noise.rotation("clock:0.3", 3))
    state = state.after("Cyd", dense.dephasing(3, 4, 0.04))
    state = state.after("Cyd", dense.kraus_channel([*map(wide, operators), dense.unit(4, 3, 3)]))

    shift = np.roll(np.eye(3), 1, axis=0)
    clock = np.diag(np.exp(2j * np.pi * 2 * np.arange(3) / 3))
    swap = np.eye(3)[[2, 1, 0]]
    for party, unitary in (("Ada", shift), ("Ada", clock), ("Ben", dense.fourier(3))):
        state = applied(state, party, unitary)
    branches = [(k, applied(rest, "Ben", swap if k == 0 else dense.fourier(3).conj().T))
                for k, rest in dense.measure(state, "Cyd", np.eye(3)) if k is not None]

    name = "tests/reference/cases/turned"
    at_checkpoint(table, name, 3, "turned", dense.total([rest for _, rest in branches]))
    triples = {}
    for k, rest in branches:
        for v, last in dense.measure(rest, "Ada", dense.phased(3, 1), efficiency=0.9):
            triples |= {(k, v, w): nothing.weight for w, nothing in dense.measure(last, "Ben", dense.phased(3, 1))}
    seen, kept = clicked(triples)
    one = {key: p for key, p in kept.items() if key[0] == 1}
    table.add(name, 3, "yield", {}, seen)
    table.add(name, 3, "success", {}, sum(p for (_, v, w), p in kept.items() if v != w))
    table.add(name, 3, "report", {"label": "sum is 2 when Cyd saw 1"},
              sum(p for (_, v, w), p in one.items() if (v + w) % 3 == 2) / sum(one.values()))
    table.add(name, 3, "report", {"label": "distance"}, sum(abs(v - w) * p for (_, v, w), p in kept.items()))


def wide(operator):
    """An operator on three levels that gives nothing on the sink."""
    matrix = np.zeros((4, 4), complex)
    matrix[:3, :3] = operator
    return matrix


def applied(state, party, unitary):
    """A local unitary and its depolarising."""
    return state.after_unitary(party, unitary).after(party, dense.depolarising(3, 4, 0.01))
