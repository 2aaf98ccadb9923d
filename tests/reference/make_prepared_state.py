"""Makes the prepared states in protocols/data: make_prepared_state.py [--check].

What is modelled. The emitters are entangled step by step, 1 -> 2 -> ... -> N, by exchange pulses (see preparation.py).
Every pulse has a fixed calibration error and a shot-to-shot jitter of its time, of the local phase and of each coupling
strength; the state is the average over SHOTS shots and therefore mixed. Afterwards each emitter decays from level 0 on
its own, with unequal branches, and loses phase. No detector is involved: the file holds the state, not its tomography.

The numbers are common practice, no source. The seed is fixed and the generator is NumPy's frozen RandomState, so the
same files come out on every machine up to rounding; --check compares with the stored ones and writes nothing.
Runs for about ten seconds. File: complex128 density matrix, C order, first party most significant.
"""
import sys
from pathlib import Path

import numpy as np

import dense
import preparation

FOLDER = Path(__file__).parents[2] / "protocols" / "data"
SEED = 20_240_607
SHOTS = 400

TIME_OFFSET, TIME_JITTER = 0.010, 0.020      # units of the inverse coupling
PHASE_OFFSET, PHASE_JITTER = 0.020, 0.060    # rad
COUPLING_JITTER = 0.015                      # relative
DECAY = 0.020                                # total rate of level 0 times the time until the emitters are handed out
DEPHASING = 0.004                            # pure dephasing rate of each pair of levels times that time

FIDELITY = {3: 0.968858481, 4: 0.962584274}  # as printed by the last run; --check holds them to 1e-8


def main(arguments):
    if any(a != "--check" for a in arguments):
        print("usage: make_prepared_state.py [--check]", file=sys.stderr)
        return 2
    results = [make(n, "--check" in arguments) for n in (3, 4)]
    return 0 if all(results) else 1


def make(n, check):
    """Prepares, tells the figures of, and stores or compares one state; false when something does not fit."""
    state = aged(averaged(n, np.random.RandomState(SEED + n)))
    fidelity, purity = state.fidelity(), float(np.trace(state.rho @ state.rho).real)
    path = FOLDER / f"prepared-{n}.npy"
    print(f"{path.name}: fidelity {fidelity:.9f}, purity {purity:.9f}, lowest eigenvalue {np.linalg.eigvalsh(state.rho)[0]:.1e}")
    good = abs(fidelity - FIDELITY[n]) <= 1e-8 and abs(state.weight - 1) <= 1e-13
    if check:
        return good and np.abs(np.load(path, allow_pickle=False) - state.rho).max() <= 1e-12
    np.save(path, state.rho, allow_pickle=False)
    return good


def averaged(n, random):
    """The mean over shots of the pure states that faulty pulses give."""
    rho = np.zeros((n ** n, n ** n), complex)
    for _ in range(SHOTS):
        ket = np.array([1.0])
        for m in range(2, n + 1):
            ket = pulse(ket, m, random)
        rho += np.outer(ket, ket.conj()) / SHOTS
    return dense.State(rho, range(n), n, n)


def pulse(ket, m, random):
    """One step from m-1 to m emitters, with this shot's errors."""
    time = TIME_OFFSET + TIME_JITTER * random.normal()
    phase = PHASE_OFFSET + PHASE_JITTER * random.normal()
    couplings = {(i, k): 1 + COUPLING_JITTER * random.normal() for i in range(m) for k in range(i + 1, m)}
    return preparation.step(ket, m, time, phase, couplings)


def aged(state):
    """Independent decay of level 0, the nearer level favoured, and pure dephasing; then hermitian with trace one."""
    n = state.d
    shares = np.arange(n - 1, 0, -1) / (n * (n - 1) / 2)
    jumps = [(0, b + 1, DECAY * share) for b, share in enumerate(shares)]
    channel = dense.flow(dense.lindblad(n, n, jumps, DEPHASING * (np.ones((n, n)) - np.eye(n))), 1.0)
    for party in state.parties:
        state = state.after(party, channel)
    rho = (state.rho + state.rho.conj().T) / 2
    return dense.State(rho / np.trace(rho).real, state.parties, n, n)


if __name__ == "__main__":
    sys.exit(main(sys.argv[1:]))
