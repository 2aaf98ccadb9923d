"""Verdicts of the list protocols at named attacks, from polynomials in the counts: lists.py [--check].

Independent of the engine: every cell of positions is a polynomial whose exponents are the counts that the tests look at,
built up one position after the other; verdicts are sums of coefficients. Nothing is split, merged or drawn. Writes lists.csv,
or compares with it to 1e-9 relative. Takes about half a minute.
"""
import math
import sys
from fractions import Fraction
from itertools import permutations, product

import numpy as np

from tables import Table, stored_values, told

TOLERANCE = 1e-9
A, B, C, T1, T2 = Fraction(1, 4), Fraction(3, 40), Fraction(42, 100), Fraction(6, 100), Fraction(1, 4)
LIAR_B, LIAR_T1, LIAR_TC, LIAR_T3 = Fraction(1, 10), Fraction(5, 100), Fraction(14, 100), Fraction(3, 10)

PRINTED = {
    ("honest", 0, 150): 2.4262163320e-2, ("honest", .02, 150): 5.0368381247e-2, ("honest", 0, 300): 1.4055113536e-3,
    ("honest", .02, 300): 3.6059443913e-3, ("honest", .05, 300): 1.3906832068e-1,
    ("forges", 0, 150): 9.5489119660e-2, ("forges", .02, 150): 1.0174065210e-1, ("forges", 0, 300): 1.2717512174e-2,
    ("forges", .02, 300): 1.2032077242e-2, ("forges", .05, 300): 7.9732570880e-2,
    ("splits", 0, 150): 1.5533298243e-1, ("splits", .02, 150): 1.1264667916e-1, ("splits", 0, 300): 9.0227455662e-2,
    ("splits", .02, 300): 5.8103589605e-2, ("splits", .05, 300): 3.6640237254e-2,
}
ATTACKS = {(0, 150): (38, 0, 7, 4), (.02, 150): (38, 0, 7, 2), (0, 300): (84, 0, 15, 11), (.02, 300): (84, 0, 15, 7), (.05, 300): (84, 0, 13, 1)}
LIARS = {(0, 150): ((40, 7, 0, 5), .18408203125, (15, 7), .24532776694), (0, 300): ((80, 0, 14, 9), .081716299057, (30, 13), .13464083558),
         (.02, 300): ((80, 0, 14, 2), .035558044575, (30, 13), .11944488016)}
NOISE_FREE = {150: (.10465065169, (38, 0, 7), .13614460434), 300: (.012880324054, (84, 0, 15), .077472849508)}


def copy(noise):
    """{(s, r0, r1): probability}; each qutrit's level becomes uniform with its own probability."""
    law = {t: 0.0 for t in product(range(3), repeat=3)}
    for sent in permutations(range(3)):
        for seen in law:
            law[seen] += math.prod((1 - p) * (a == b) + p / 3 for a, b, p in zip(sent, seen, noise)) / 6
    return law


def given(law, holds):
    whole = math.fsum(w for t, w in law.items() if holds(*t))
    return {t: w / whole for t, w in law.items() if holds(*t)}


def counts(cells, marks, limits):
    """Joint law of counts. cells: (number, law of one position); marks: functions of (cell, s, r0, r1), counts above a limit are dropped."""
    total = np.zeros([limit + 1 for limit in limits])
    total[(0,) * len(limits)] = 1
    for index, (number, law) in enumerate(cells):
        steps = {}
        for triple, weight in law.items():
            step = tuple(int(mark(index, *triple)) for mark in marks)
            steps[step] = steps.get(step, 0) + weight
        for _ in range(number):
            total = sum(weight * moved(total, step) for step, weight in steps.items())
    return total


def moved(array, step):
    out = np.zeros_like(array)
    target = tuple(slice(s, None) for s in step)
    source = tuple(slice(None, n - s) for s, n in zip(step, array.shape))
    out[target] = array[source]
    return out


def binomial(m, n, p):
    return math.comb(m, n) * p ** n * (1 - p) ** (m - n)


def honest(m, noise, a=A, c=C, t=T1):
    """Some honest receiver rejects: the list's size is off, or one of two counts of wrong positions is."""
    law = copy(noise)
    kept, cell = math.fsum(w for (s, *_), w in law.items() if s == 0), given(law, lambda s, *_: s == 0)
    failure = []
    for n in range(m + 1):
        size = binomial(m, n, kept)
        if a * m <= n <= c * m:
            limit = math.floor(t * n)
            both = counts([(n, cell)], [lambda _, s, r0, r1: r0 == 0, lambda _, s, r0, r1: r1 == 0], [limit, limit]).sum()
            failure.append(size * (1 - both))
        else:
            failure.append(size)
    return math.fsum(failure)


def rejects(m, noise, who, t=T1):
    law = copy(noise)
    kept, cell = math.fsum(w for (s, *_), w in law.items() if s == 0), given(law, lambda s, *_: s == 0)
    wrong = math.fsum(w for triple, w in cell.items() if triple[who] == 0)
    accepted = [binomial(m, n, kept) * math.fsum(binomial(n, e, wrong) for e in range(math.floor(t * n) + 1))
                for n in range(math.ceil(A * m), math.floor(C * m) + 1)]
    return 1 - math.fsum(accepted)


def forges(m, noise, size):
    law = given(copy(noise), lambda s, r0, r1: r0 == 0 and s != 0)
    wrong = math.fsum(w for (s, r0, r1), w in law.items() if r1 != 2)
    passed = math.fsum(binomial(size, e, wrong) for e in range(math.floor(T2 * size) + 1)) if size >= B * m else 0
    rejected = rejects(m, noise, 2)
    return rejected + (1 - rejected) * passed


def two_sets(noise, attack, second):
    """Cells of the two sets of a sender that splits: first only with s = 0, 1, 2; both with s = 0; second only with s = 1."""
    n, k1, k2, o = attack
    law = copy(noise)
    of = [given(law, lambda s, *_, v=v: s == v) for v in range(3)]
    return [(n - k1 - k2 - o, of[0]), (k1, of[1]), (k2, of[2]), (o, of[0]), (second - o, of[1])]


def splits(m, noise, attack, second):
    return conflict(m, noise, attack, second, T1, T1, lambda k, w, _: not (k >= B * m and w <= T2 * k),
                    [lambda i, s, r0, r1: i < 3 and r0 == 1, lambda i, s, r0, r1: i < 3 and r0 == 1 and r1 != 2, lambda *_: 0])


def sender_lies(m, noise, attack, second):
    return conflict(m, noise, attack, second, LIAR_T1, LIAR_T1, lambda k, w, z: not (k >= LIAR_B * m and w <= LIAR_TC * k and z >= LIAR_T3 * k),
                    [lambda i, *_: i < 3, lambda i, s, r0, r1: i < 3 and r1 == 0, lambda i, s, r0, r1: i < 3 and r1 == 2])


def conflict(m, noise, attack, second, t_first, t_second, harmful, evidence):
    """Both receivers accept their sets and the evidence, three counts on the first set alone, decides for the cheat."""
    n = attack[0]
    if not (A * m <= n <= C * m and A * m <= second <= C * m):
        return 0.0
    cells = two_sets(noise, attack, second)
    first, last = math.floor(t_first * n), math.floor(t_second * second)
    marks = [lambda i, s, r0, r1: i < 4 and r0 == 0, *evidence]
    alone = counts(cells[:3], marks, [first] + [sum(c for c, _ in cells[:3])] * 2 + [sum(c for c, _ in cells[:3]) if evidence[2](0, 0, 2, 2) else 0])
    shared = counts([(0, {})] * 3 + cells[3:], [marks[0], lambda i, s, r0, r1: r1 == 1], [first, last]).sum(axis=1)
    bad = np.array([[[harmful(k, w, z) for z in range(alone.shape[3])] for w in range(alone.shape[2])] for k in range(alone.shape[1])])
    by_errors = (alone * bad).sum(axis=(1, 2, 3))
    return math.fsum(by_errors[e] * shared[f] for e in range(first + 1) for f in range(first + 1 - e))


def forwarder_lies(m, noise, size, own):
    law = copy(noise)
    cells = [(own, given(law, lambda s, b, c: s != 0 and b == 0)), (size - own, given(law, lambda s, b, c: s != 0 and b == 1))]
    table = counts(cells, [lambda _, s, b, c: c == 1, lambda _, s, b, c: c == 2], [size, size])
    passed = math.fsum(table[w, z] for w in range(size + 1) for z in range(size + 1) if w <= LIAR_TC * size and z >= LIAR_T3 * size)
    rejected = rejects(m, noise, 2, LIAR_T1)
    return rejected + (1 - rejected) * (passed if size >= LIAR_B * m else 0)


def build():
    table = Table("lists", "Detectable broadcast and liar detection at named attacks, cheats holding enough positions of each value", (
        "M. Fitzi, N. Gisin and U. Maurer, Phys. Rev. Lett. 87, 217901 (2001), and A. Cabello, Phys. Rev. Lett. 89, 100402 (2002), "
        "with thresholds of our own"), "# columns:   name,N,kind,parameters,value; p: depolarising of each qutrit; attack: n,k1,k2,o or size,own")
    for m, p in [(60, 0), (60, .02), (150, 0), (150, .02), (300, 0), (300, .02), (300, .05)]:
        add(table, "detectable-broadcast", "honest", m, p, (), honest(m, [p] * 3), PRINTED.get(("honest", p, m)))
        best = max(range(math.ceil(B * m), math.ceil(B * m) + 8), key=lambda k: forges(m, [p] * 3, k))
        add(table, "detectable-broadcast", "forges", m, p, (best,), forges(m, [p] * 3, best), PRINTED.get(("forges", p, m)))
    for (p, m), attack in ATTACKS.items():
        add(table, "detectable-broadcast", "splits", m, p, attack, splits(m, [p] * 3, attack, math.floor(C * m)), PRINTED["splits", p, m])
    for attack in [(80, 2, 6, 3), (90, 1, 10, 0)]:
        add(table, "detectable-broadcast", "splits", 300, .03, attack, splits(300, [.03] * 3, attack, math.floor(C * 300)), None)
    for m, (forged, attack, split) in NOISE_FREE.items():
        best = max(forges(m, [.02, 0, .02], k) for k in range(math.ceil(B * m), math.ceil(B * m) + 8))
        table.checks.append((f"noise-free forger, M={m}", best, forged, TOLERANCE))
        best = max(splits(m, [0, .02, .02], (*attack, o), math.floor(C * m)) for o in range(12))
        table.checks.append((f"noise-free splitter, M={m}", best, split, TOLERANCE))
    for (p, m), (sender, lied, (size, own), forwarded) in LIARS.items():
        add(table, "liar-detection", "sender lies", m, p, sender, sender_lies(m, [p] * 3, sender, math.floor(C * m)), lied)
        add(table, "liar-detection", "forwarder lies", m, p, (size, own), forwarder_lies(m, [p] * 3, size, own), forwarded)
        add(table, "liar-detection", "honest", m, p, (), honest(m, [p] * 3, t=LIAR_T1), None)
    return table


def add(table, name, kind, m, p, attack, value, printed):
    table.add(name, 3, kind, {"M": m, "p": p, "attack": tuple(attack)}, value)
    if printed is not None:
        table.checks.append((f"{name} {kind}, p={p}, M={m}", value, printed, TOLERANCE))


def compared(table):
    stored = stored_values(table.path) if table.path.exists() else {}
    for *key, value in table.rows:
        kept = stored.pop(tuple(key), None)
        yield kept is not None and abs(value - kept) <= TOLERANCE * abs(kept), f"{key}: computed {value:.15g}, stored {kept}"
    for key in stored:
        yield False, f"{key} is stored and no longer computed"


def main(arguments):
    if any(a != "--check" for a in arguments):
        print("usage: lists.py [--check]", file=sys.stderr)
        return 2
    table = build()
    findings = [(abs(value - expected) <= tolerance * abs(expected), f"{what}: computed {value:.12g}, printed {expected:.12g}")
                for what, value, expected, tolerance in table.checks]
    if "--check" in arguments:
        findings += list(compared(table))
    else:
        table.path.write_text(table.text().replace("tests/reference/recompute.py", "tests/reference/lists.py"), encoding="utf-8")
    return told(findings)


if __name__ == "__main__":
    sys.exit(main(sys.argv[1:]))
