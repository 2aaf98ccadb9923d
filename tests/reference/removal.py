"""Removal of the last party, once or down to a pair, after noise and with noise behind the correction."""
import closed
import dense
import noise
from tables import Table

LEVEL_DECAY = {(3, 0.1): "0.904837418036", (3, 0.5): "0.606530659713", (4, 0.1): "0.904837418036", (4, 0.5): "0.606530659713"}
FOURIER_DECAY = {(3, 0.1): "0.920697848363", (3, 0.5): "0.672108883094", (4, 0.1): "0.912767633200", (4, 0.5): "0.639319771403"}
DEPOLARISED = {(3, 0.05): "0.888263888889", (3, 0.1): "0.786111111111", (4, 0.1): "0.694126562500"}


def build():
    table = Table("removal", "Fidelity with the smaller antisymmetric state when the last party measures, announces and the others correct",
                  "computed by dense density matrices; parameters 'after.*' act on those who stay, behind their correction")
    for n in (3, 4):
        depolarising(table, n)
        decay(table, n)
        choice(table, n)
        mixed(table, n)
        pair(table, n)
    row(table, "removal-depolarising", 5, {"depolarising": [0.02, 0.05, 0.1, 0.2, 0.3], "basis": "fourier"},
        closed=closed.removal_depolarising([0.02, 0.05, 0.1, 0.2, 0.3], [0.0] * 4))
    return table


def leave(state, party, basis, m=None):
    """[(outcome, corrected state of the others)] when the party measures and leaves; m: size of the Fourier basis."""
    vectors = dense.basis(basis, state.d)
    branches = []
    for k, rest in dense.measure(state, party, vectors):
        correction = dense.complement(vectors, k, m or state.d)
        for other in rest.parties:
            rest = rest.after_unitary(other, correction)
        branches.append((k, rest))
    return branches


def removed(state, basis, after=None):
    """The state of those who stay, averaged over outcomes."""
    rest = dense.total([s for _, s in leave(state, state.parties[-1], basis)])
    for party in rest.parties:
        if after:
            rest = rest.after(party, noise.channel(noise.of_party(after, party), state.d, state.D))
    return rest


def row(table, name, n, parameters, **checks):
    before = {k: v for k, v in parameters.items() if k != "basis" and not k.startswith("after.")}
    after = {k[6:]: v for k, v in parameters.items() if k.startswith("after.")}
    rest = removed(noise.noisy(n, before), parameters["basis"], after)
    table.add(name, n, "removal", parameters, rest.fidelity(), **checks)


def depolarising(table, n):
    for basis in ("level", "fourier", "phased-1"):
        for p in (0.05, 0.1):
            row(table, f"removal-depolarising-{p}-{basis}", n, {"depolarising": p, "basis": basis}, printed=DEPOLARISED.get((n, p)),
                closed=closed.removal_depolarising([p] * n, [0.0] * (n - 1)))
        before, after = [0.05, 0.1, 0.02, 0.2][-n:], [0.03, 0.15, 0.3][:n - 1]
        row(table, f"removal-depolarising-before-and-after-{basis}", n,
            {"depolarising": before, "after.depolarising": after, "basis": basis},
            closed=closed.removal_depolarising(before, after))


def decay(table, n):
    for basis, printed in (("level", LEVEL_DECAY), ("fourier", FOURIER_DECAY), ("phased-1", {})):
        for gamma_t in (0.1, 0.5):
            row(table, f"removal-decay-{gamma_t}-{basis}", n, {"jumps": noise.equal_decay(n, gamma_t), "basis": basis},
                printed=printed.get((n, gamma_t)))


def choice(table, n):
    """Level removal under decay by what the leaver saw: after level 0 nothing has decayed."""
    parameters = {"jumps": noise.equal_decay(n, 0.5), "basis": "level"}
    branches = leave(noise.noisy(n, {"jumps": parameters["jumps"]}), n - 1, "level")
    zero = branches[0][1]
    other = dense.total([s for _, s in branches[1:]])
    printed = ("0.2022", None, "0.5068") if n == 3 else (None, None, None)
    table.add("removal-sees-0", n, "probability", parameters, zero.weight, printed=printed[0])
    table.add("removal-sees-0", n, "removal", parameters, zero.fidelity() / zero.weight, closed=1.0)
    table.add("removal-sees-other", n, "removal", parameters, other.fidelity() / other.weight, printed=printed[2])


def mixed(table, n):
    """Several kinds of noise, different at each party, before the measurement and behind the correction."""
    parameters = {
        "white": 0.03,
        "jumps": [tuple(f"0>{b}:{0.05 * b + 0.02 * i:.15g}" for b in range(1, n)) for i in range(n)],
        "dephasing": [0.02 * (i + 1) for i in range(n)], "depolarising": [0.01 * (i + 1) for i in range(n)],
        "after.rotation": [f"0-1:{0.1 * (i + 1):.15g}" for i in range(n - 1)],
        "after.dephasing": [0.05 * i for i in range(n - 1)],
    }
    for basis in ("level", "fourier", "phased-1"):
        row(table, f"removal-mixed-{basis}", n, {**parameters, "basis": basis})


def pair(table, n):
    noises = {"depolarising": {"depolarising": 0.05}, "decay": {"jumps": noise.equal_decay(n, 0.2)},
              "mixed": {"jumps": noise.equal_decay(n, 0.1), "dephasing": 0.02, "depolarising": [0.01 * (i + 1) for i in range(n)]}}
    printed = {(3, "depolarising"): ("0.888263888889", None, None), (3, "decay"): ("0.848942294232", None, None),
               (4, "depolarising"): ("0.855101822917", "0.024375", "0.868845591774")}
    for kind, parameters in noises.items():
        everything, leaked, kept = down_to_a_pair(noise.noisy(n, parameters))
        marks = printed.get((n, kind), (None, None, None))
        table.add(f"pair-{kind}", n, "pair", parameters, everything, printed=marks[0])
        table.add(f"pair-{kind}", n, "leak-probability", parameters, leaked, printed=marks[1])
        table.add(f"pair-{kind}", n, "pair-without-leaks", parameters, kept, printed=marks[2])


def down_to_a_pair(state):
    """Pair fidelity of all copies, probability that a leaver saw a leaked level, pair fidelity of the other copies."""
    clean, leaky = [state], []
    for m in range(len(state.parties), 2, -1):
        clean, leaky = step(clean, leaky, m)
    whole, good = dense.total(clean + leaky), dense.total(clean)
    return whole.fidelity(), 1 - good.weight, good.fidelity() / good.weight


def step(clean, leaky, m):
    """Party m-1 leaves, Fourier on the m levels that a flawless copy still uses; an outcome beyond them is a leak."""
    sorted_out = {True: [], False: []}
    for was_clean, states in ((True, clean), (False, leaky)):
        for state in states:
            for k, rest in leave(state, m - 1, f"fourier-on-{m}", m):
                sorted_out[was_clean and k < m].append(rest)
    return sorted_out[True], sorted_out[False]
