"""Small things that several worked runs share."""
import numpy as np

US = 1e-6


def decibels(x):
    """Transmission of a loss in dB."""
    return 10 ** (-x / 10)


def every_pair(d, rate):
    """Pure dephasing at one rate for every pair of levels."""
    return rate * (np.ones((d, d)) - np.eye(d))


def with_level_zero(d, rate):
    """Pure dephasing of level 0 with each other level, none between the others."""
    matrix = np.zeros((d, d))
    matrix[0, 1:] = matrix[1:, 0] = rate
    return matrix


def at_checkpoint(table, name, n, label, looked, heralded=1.0):
    table.add(name, n, "checkpoint", {"label": label}, looked.fidelity() / looked.weight)
    table.add(name, n, "kept", {"label": label}, heralded * looked.weight)


def clicked(table):
    """(probability that everybody saw something, distribution of those copies)"""
    kept = {k: p for k, p in table.items() if None not in k}
    seen = sum(kept.values())
    return seen, {k: p / seen for k, p in kept.items()}
