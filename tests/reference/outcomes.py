"""Statistics of outcomes: all distinct, leaders, secret sharing with sifting, interception, faulty detectors."""
from itertools import product
from math import log2

import numpy as np

import dense
import noise
from local_noise import distinct
from tables import Table


ROUNDING = 1e-15  # probabilities that are zero but for rounding; they add less than 1e-12 bits


def build():
    table = Table("outcomes", "Probabilities of outcomes, of copies in which everybody saw something; seen: fraction of those copies",
                  "computed by dense density matrices; secret sharing after Cabello, Phys. Rev. Lett. 89, 100402 (2002)")
    for n in (3, 4):
        distinct_values(table, n)
        detectors(table, n)
        sharing(table, n)
        intercepted(table, n)
    return table


def distinct_values(table, n):
    printed = {3: ("0.816222222222", "0.879153835385"), 4: ("0.735421875000", "0.864048064808")}[n]
    for basis in ("level", "fourier", "phased-1"):
        p = {"depolarising": 0.1, "basis": basis}
        table.add(f"distinct-depolarising-{basis}", n, "all-distinct", p, distinct(noise.noisy(n, {"depolarising": 0.1}), basis), printed=printed[0])
    jumps = noise.equal_decay(n, 0.2)
    state = noise.noisy(n, {"jumps": jumps})
    table.add("distinct-decay-level", n, "all-distinct", {"jumps": jumps, "basis": "level"}, distinct(state, "level"),
              printed="0.818730753078", closed=np.exp(-0.2))
    table.add("distinct-decay-fourier", n, "all-distinct", {"jumps": jumps, "basis": "fourier"}, distinct(state, "fourier"), printed=printed[1])


def detectors(table, n):
    """Confusion, inefficiency and dark counts at every detector, on a decayed state with unheralded loss."""
    eta = tuple(0.9 - 0.1 * a for a in range(n))
    cases = {
        "confusion": ({}, {"confusion": 0.04}),
        "inefficient": ({"depolarising": 0.1}, {"efficiency": 0.9}),
        "dark": ({"depolarising": 0.1}, {"efficiency": 0.9, "dark": 0.02}),
        "all": ({"jumps": noise.equal_decay(n, 0.2)}, {"confusion": 0.03, "efficiency": 0.85, "dark": 0.01}),
        "unheralded-loss": ({"transmission": [eta] * n}, {}),
        "unheralded-loss-dark": ({"depolarising": 0.05, "transmission": [eta] * n}, {"efficiency": 0.95, "confusion": 0.02, "dark": 0.03}),
    }
    for name, (before, detection) in cases.items():
        for basis in ("level", "fourier"):
            detector_rows(table, f"detector-{name}-{basis}", n, before, detection, basis)


def detector_rows(table, name, n, before, detection, basis):
    probabilities = dense.outcome_table(noise.noisy(n, before), {p: basis for p in range(n)}, **detector(detection, n))
    seen = {k: p for k, p in probabilities.items() if None not in k}
    weight = sum(seen.values())
    parameters = {**before, **{f"detection.{k}": v for k, v in detection.items()}, "basis": basis}
    table.check(f"{name} N={n} probabilities add up to", sum(probabilities.values()), 1.0)
    table.add(name, n, "seen", parameters, weight)
    table.add(name, n, "all-distinct", parameters, sum(p for k, p in seen.items() if len(set(k)) == n) / weight)
    table.add(name, n, "one-leader", parameters, sum(p for k, p in seen.items() if k.count(0) == 1) / weight)
    table.add(name, n, "first-leads", parameters, sum(p for k, p in seen.items() if k[0] == 0) / weight)
    table.add(name, n, "guess-first-from-second", parameters, guess({k: p / weight for k, p in seen.items()}, [0], [1]))


def detector(detection, n):
    ready = dict(detection)
    if "confusion" in ready:
        ready["confusion"] = dense.confusion_matrix(n, ready["confusion"])
    return ready


def marginal(table, places):
    """Distribution of the outcomes at some places."""
    out = {}
    for seen, p in table.items():
        key = tuple(seen[i] for i in places)
        out[key] = out.get(key, 0.0) + p
    return out


def guess(table, target, known):
    """Best probability of naming the target when the known values are seen."""
    joint = marginal(table, list(known) + list(target))
    best = {}
    for key, p in joint.items():
        side = key[:len(known)]
        best[side] = max(best.get(side, 0.0), p)
    return sum(best.values())


def information(table, left, right):
    """Mutual information in bits."""
    joint, a, b = marginal(table, list(left) + list(right)), marginal(table, left), marginal(table, right)
    return sum(p * log2(p / (a[k[:len(left)]] * b[k[len(left):]])) for k, p in joint.items() if p > ROUNDING)


def symbol_error(table, n):
    """The first party deals; the error is that its value is not the one missing from all the others'."""
    return sum(p for seen, p in table.items() if seen[0] != dense.missing(seen[1:], n))


def sifted(state, bases, **detection):
    """(probability that all picked the same, outcome distribution of those copies) with independent uniform picks."""
    n, kept = len(state.parties), {}
    for picks in product(bases, repeat=n):
        if len(set(picks)) == 1:
            for seen, p in dense.outcome_table(state, dict(zip(state.parties, picks)), **detection).items():
                if None not in seen:
                    kept[seen] = kept.get(seen, 0.0) + p / len(bases) ** n
    weight = sum(kept.values())
    return weight, {k: p / weight for k, p in kept.items()}


def sharing(table, n):
    noises = {
        "ideal": ({}, {}),
        "depolarising": ({"depolarising": 0.1}, {}),
        "mixed": ({"white": 0.02, "jumps": noise.equal_decay(n, 0.1), "dephasing": 0.05, "depolarising": [0.01 * (i + 1) for i in range(n)]},
                  {"confusion": 0.02, "efficiency": 0.9, "dark": 0.01}),
    }
    for name, (before, detection) in noises.items():
        weight, kept = sifted(noise.noisy(n, before), ("level", "fourier"), **detector(detection, n))
        parameters = {**before, **{f"detection.{k}": v for k, v in detection.items()}, "bases": "level,fourier"}
        sharing_rows(table, f"sharing-{name}", n, parameters, weight, kept, ideal=name == "ideal")


def sharing_rows(table, name, n, parameters, weight, kept, ideal):
    table.add(name, n, "yield", parameters, weight, closed=2.0 ** (1 - n) if ideal else None)
    table.add(name, n, "symbol-error", parameters, symbol_error(kept, n), closed=0.0 if ideal else None)
    for k in range(1, n):
        table.add(f"{name}-{k}-of-{n - 1}", n, "guess-dealer", parameters, guess(kept, [0], list(range(1, k + 1))),
                  closed=1 / (n - k) if ideal else None)
        table.add(f"{name}-{k}-of-{n - 1}", n, "information-dealer", parameters, information(kept, [0], list(range(1, k + 1))),
                  closed=log2(n / (n - k)) if ideal else None)


def intercepted(table, n):
    """One party's qudit measured in flight in a random one of two bases and sent on, before the noise of the way."""
    cases = {"ideal": {}, "depolarising": {"depolarising": 0.05}}
    for name, before in cases.items():
        for victim in (0, n - 1):
            kept = intercepted_sifted(n, victim, before)
            parameters = {**before, "victim": victim, "bases": "level,fourier"}
            table.add(f"intercept-{name}-{victim}", n, "symbol-error", parameters, symbol_error(kept, n),
                      closed=(n - 1) / (2 * n) if not before else None)
            table.add(f"intercept-{name}-{victim}", n, "guess-victim-by-outsider", parameters, guess(outsider_view(n, victim, before), [0], [1, 2, 3]))


def resent(n, victim, eve):
    """[(outcome, state sent on)]"""
    vectors = dense.basis(eve, n)
    state = dense.start(n)
    projectors = [np.outer(vectors[:, k], vectors[:, k].conj()) for k in range(n)]
    return [state.after(victim, dense.kraus_channel([p])) for p in projectors]


def behind(state, before):
    for party in state.parties:
        state = state.after(party, noise.channel(noise.of_party(before, party), state.d, state.D))
    return state


def intercepted_sifted(n, victim, before):
    kept = {}
    for eve in ("level", "fourier"):
        state = behind(dense.total(resent(n, victim, eve)), before)
        for seen, p in sifted(state, ("level", "fourier"))[1].items():
            kept[seen] = kept.get(seen, 0.0) + p / 2
    return kept


def outsider_view(n, victim, before):
    """Joint distribution of the victim's value, the outsider's basis and value, and the announced basis, of kept copies."""
    view = {}
    for e, eve in enumerate(("level", "fourier")):
        for g, state in enumerate(resent(n, victim, eve)):
            state = behind(state, before)
            for b, name in enumerate(("level", "fourier")):
                for k, rest in dense.measure(state, victim, dense.basis(name, n)):
                    view[k, e, g, b] = rest.weight / 4
    return view
