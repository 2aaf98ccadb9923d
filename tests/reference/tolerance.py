"""Decay at which removal of one of N falls below a goal: roots of the dense reference by SciPy's brentq."""
import math

from scipy.optimize import brentq

import noise
from removal import removed
from tables import Table


def build():
    table = Table("tolerance", "Total decay, the sum of the branches' rates times the time, at which removal just meets a goal",
                  "dense density matrices and SciPy's brentq")
    for n in (3, 4):
        for basis in ("level", "fourier"):
            for goal in (0.9, 0.75):
                root = brentq(lambda x: removed(noise.noisy(n, {"jumps": noise.equal_decay(n, x)}), basis).fidelity() - goal, 1e-6, 2, xtol=1e-13)
                table.add(f"removal-{basis}", n, "tolerance", {"goal": goal}, root, closed=-math.log(goal) if basis == "level" else None)
    return table
