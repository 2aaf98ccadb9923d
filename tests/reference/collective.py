"""Collective decay by plain matrices: collective.py [--check] writes or compares collective.csv. Takes about half a minute.

Every emitter has d levels; transition j leads from level 0 to level j. H = sum_j sum_ik (Omega^j_ik - i gamma^j_ik/2) s^j+_i s^j_k
and drho/dt = -i (H rho - rho H+) + sum_j sum_ik gamma^j_ik s^j_i rho s^j+_k: Lehmberg, Phys. Rev. A 2, 883 (1970).
"""
import itertools
import sys
from decimal import Decimal, getcontext

import numpy as np
from scipy.sparse import csr_matrix, identity, kron
from scipy.sparse.linalg import expm_multiply

import dense
from tables import Table, told

LEGEND = """\
# columns:   name,N,kind,parameters,value
#   parameters: key=value;key=value. positions: emitters parted by |, coordinates in wavelengths of transition 1 by commas;
#   dipoles, rates, wavelengths: one entry for each transition, parted by |; start: levels of a product, or a named state;
#   time in the unit that the rates are given in."""

Z = (0.0, 0.0, 1.0)
GENERAL = [(0, 0, 0), (0.21, 0.05, 0.1), (-0.1, 0.3, 0.02)]
UNEVEN = [*GENERAL, (0.15, -0.2, 0.25)]


def build():
    table = Table("collective", "Collective decay of emitters side by side", "plain matrices and SciPy's expm_multiply; "
                  "formulas of Lehmberg, Phys. Rev. A 2, 883 (1970)", LEGEND)
    pair_couplings(table)
    triangles(table)
    darkness(table)
    storage(table)
    photons(table)
    relaxation(table)
    return table


def pair_couplings(table):
    """gamma and Omega of one pair with 40 digits, so that cancellation at small distance shows."""
    for xi, c in itertools.product((1e-6, 1e-3, 0.01, 0.1, 0.7, 1.4999, 1.5001, 3.0, 20.0), (0.0, 0.5, 1.0)):
        gamma, omega = precise(xi, c)
        parameters = {"xi": xi, "cosine": c}
        table.add("pair", 2, "shared-decay", parameters, gamma)
        table.add("pair", 2, "exchange-shift-times-cube", parameters, omega * xi ** 3)


def precise(xi, c):
    """Both couplings over Gamma, computed with 60 digits."""
    getcontext().prec = 60
    x, c2 = Decimal(float(xi)), Decimal(float(c)) ** 2
    s, k = series(x, 1), series(x, 0)
    gamma = Decimal("1.5") * ((1 - c2) * s / x + (1 - 3 * c2) * (k / x ** 2 - s / x ** 3))
    omega = Decimal("0.75") * (-(1 - c2) * k / x + (1 - 3 * c2) * (s / x ** 2 + k / x ** 3))
    return float(gamma), float(omega)


def series(x, first):
    """cos x (first = 0) or sin x (first = 1) by their power series."""
    term, total, n = x ** first if first else Decimal(1), Decimal(0), first
    while abs(term) > Decimal("1e-58") or n < 4:
        total += term
        term *= -x * x / ((n + 1) * (n + 2))
        n += 2
    return total


def polygon(n, side):
    radius = side / (2 * np.sin(np.pi / n))
    return [(radius * np.cos(2 * np.pi * i / n), radius * np.sin(2 * np.pi * i / n), 0.0) for i in range(n)]


def chain(n, spacing):
    return [(i * spacing, 0.0, 0.0) for i in range(n)]


class Emitters:
    """Couplings and operators of N emitters; `point` has gamma = Gamma for all pairs and no shifts."""

    def __init__(self, positions, dipoles, rates, wavelengths=None, point=False):
        self.n, self.d = len(positions), len(rates) + 1
        self.rates, wavelengths = rates, wavelengths or [1.0] * len(rates)
        places = np.array(positions, float)
        self.parameters = {"dipoles": listed(dipoles), "rates": "|".join(f"{r:.15g}" for r in rates),
                           "wavelengths": "|".join(f"{w:.15g}" for w in wavelengths)}
        self.gamma, self.omega = [], []
        for rate, dipole, wavelength in zip(rates, dipoles, wavelengths):
            gamma, omega = rate * np.eye(self.n), np.zeros((self.n, self.n))
            for i, k in itertools.permutations(range(self.n), 2):
                g, o = (1.0, 0.0) if point else self.pair(places[i] - places[k], np.array(dipole), wavelength)
                gamma[i, k], omega[i, k] = rate * g, rate * o
            self.gamma.append(gamma)
            self.omega.append(omega)

    @staticmethod
    def pair(separation, dipole, wavelength):
        distance = np.linalg.norm(separation)
        return precise(2 * np.pi * distance / wavelength, dipole @ separation / (distance * np.linalg.norm(dipole)))

    def lower(self, i, j):
        """|j><0| of emitter i."""
        one = csr_matrix(([1.0], ([j], [0])), (self.d, self.d))
        return kron(kron(identity(self.d ** i), one), identity(self.d ** (self.n - 1 - i)), format="csr")

    def effective(self):
        size = self.d ** self.n
        h = csr_matrix((size, size), dtype=complex)
        for j, (gamma, omega) in enumerate(zip(self.gamma, self.omega), 1):
            lower = [self.lower(i, j) for i in range(self.n)]
            for i, k in itertools.product(range(self.n), repeat=2):
                h = h + (omega[i, k] - 0.5j * gamma[i, k]) * (lower[i].T @ lower[k])
        return h

    def without_photon(self, ket, time):
        return expm_multiply(-1j * time * self.effective(), ket.astype(complex))

    def liouvillian(self):
        h, one = self.effective(), identity(self.d ** self.n)
        total = -1j * (kron(h, one) - kron(one, h.conj()))
        for j, gamma in enumerate(self.gamma, 1):
            lower = [self.lower(i, j) for i in range(self.n)]
            for i, k in itertools.product(range(self.n), repeat=2):
                total = total + gamma[i, k] * kron(lower[i], lower[k])
        return csr_matrix(total)

    def evolved(self, rho, time):
        return expm_multiply(time * self.liouvillian(), rho.reshape(-1).astype(complex)).reshape(rho.shape)


def listed(vectors):
    return "|".join(",".join(f"{x:.15g}" for x in v) for v in vectors)


def product(levels, d):
    ket = np.zeros((d,) * len(levels))
    ket[tuple(levels)] = 1.0
    return ket.reshape(-1)


def all_plus(n):
    return np.abs(dense.antisymmetric(n))


def rate(emitters, ket):
    h = emitters.effective()
    return float(np.real(ket.conj() @ (1j * (h - h.conj().T)) @ ket))


def triangles(table):
    """The equilateral triangle: |S_3> is an eigenvector, its rate is sum_j Gamma_j (1 - g_j)."""
    printed = {0.3: "1.1733", 0.1: "0.1546", 0.05: "0.0393"}
    for side in (0.3, 0.1, 0.05):
        emitters = Emitters(polygon(3, side), [Z, Z], [1.0, 1.0])
        parameters = {"shape": "ring", "spacing": side, **emitters.parameters}
        table.add("triangle", 3, "rate", parameters, rate(emitters, dense.antisymmetric(3)), printed=printed[side])
        table.add("triangle", 3, "symmetric-rate", parameters, rate(emitters, all_plus(3)))
        stored(table, "triangle", emitters, parameters, 1.5)
    emitters = Emitters(polygon(3, 0.1), [Z, Z], [1.0, 1.0], [1.0, 0.7])
    parameters = {"shape": "ring", "spacing": 0.1, **emitters.parameters}
    table.add("triangle-two-wavelengths", 3, "rate", parameters, rate(emitters, dense.antisymmetric(3)), printed="0.231621440349")
    stored(table, "triangle-two-wavelengths", emitters, parameters, 1.5)


def darkness(table):
    """All emitters at one point: |S_N> does not decay, with all signs + it decays at first twice as fast as independent emitters."""
    for n in (2, 3, 4):
        emitters = Emitters([Z] * n, [Z] * (n - 1), [1.0 + 0.1 * j for j in range(n - 1)], point=True)
        parameters = {"shape": "point", **emitters.parameters}
        table.add("point", n, "rate", parameters, rate(emitters, dense.antisymmetric(n)), closed=0.0)
        table.add("point", n, "symmetric-rate", parameters, rate(emitters, all_plus(n)), closed=2 * sum(emitters.rates))
    emitters = Emitters([Z] * 2, [Z] * 2, [1.0, 0.4], point=True)
    table.add("two-three-level", 2, "rate", {"shape": "point", **emitters.parameters},
              rate(emitters, (product((0, 1), 3) - product((1, 0), 3)) / np.sqrt(2)), closed=0.4)


def stored(table, name, emitters, parameters, time, printed=(None, None)):
    """No-photon probability and fidelity of |S_N> and of its counterpart."""
    for label, ket, digits in (("", dense.antisymmetric(emitters.n), printed), ("symmetric-", all_plus(emitters.n), (None, None))):
        after = emitters.without_photon(ket, time)
        table.add(name, emitters.n, f"{label}no-photon", {**parameters, "time": time}, np.vdot(after, after).real, printed=digits[0])
        table.add(name, emitters.n, f"{label}fidelity", {**parameters, "time": time}, abs(np.vdot(ket, after)) ** 2, printed=digits[1])


def storage(table):
    emitters = Emitters(GENERAL, [Z, (1, 1, 0)], [1.0, 0.7])
    stored(table, "general", emitters, {"positions": listed(GENERAL), **emitters.parameters}, 2.0,
           printed=("0.123855361114", "0.115611030730"))
    emitters = Emitters(UNEVEN, [Z, (1, 1, 0), (0.3, -1, 2)], [1.0, 0.7, 1.3], [1.0, 0.8, 1.1])
    stored(table, "general", emitters, {"positions": listed(UNEVEN), **emitters.parameters}, 1.2)
    for n, spacing in ((3, 0.08), (4, 0.15), (5, 0.1)):
        emitters = Emitters(chain(n, spacing), [Z] * (n - 1), [1.0] * (n - 1))
        stored(table, "chain", emitters, {"shape": "chain", "spacing": spacing, **emitters.parameters}, 0.8)
    emitters = Emitters(polygon(5, 0.1), [Z, Z, (1, 0, 0), (0, 1, 0)], [1.0, 1.0, 0.8, 0.8])
    stored(table, "ring", emitters, {"shape": "ring", "spacing": 0.1, **emitters.parameters}, 0.8)


def photons(table):
    """Entries of the density operator after storage, photons included."""
    emitters = Emitters(GENERAL, [Z, (1, 1, 0)], [1.0, 0.7])
    for start in ("S", "0,0,1", "0,0,0"):
        ket = dense.antisymmetric(3) if start == "S" else product(tuple(map(int, start.split(","))), 3)
        entries(table, "general", emitters, {"positions": listed(GENERAL), **emitters.parameters, "start": start}, ket, 0.9)
    emitters = Emitters(UNEVEN, [Z, (1, 1, 0)], [1.0, 0.7])
    entries(table, "uneven-four", emitters, {"positions": listed(UNEVEN), **emitters.parameters, "start": "0,0,0,1"},
            product((0, 0, 0, 1), 3), 0.6)


def entries(table, name, emitters, parameters, ket, time):
    """Populations of every basis state together with the purity fix the state well."""
    rho = emitters.evolved(np.outer(ket, ket.conj()), time)
    table.check(f"{name} {parameters['start']}: trace", np.trace(rho).real, 1.0)
    parameters = {**parameters, "time": time}
    table.add(name, emitters.n, "purity", parameters, np.sum(np.abs(rho) ** 2))
    table.add(name, emitters.n, "sum-of-real-parts", parameters, rho.real.sum())
    table.add(name, emitters.n, "weighted-imaginary-parts", parameters, weighted(rho))
    for index in range(0, rho.shape[0], 4):
        table.add(name, emitters.n, f"population-{index}", parameters, rho[index, index].real)


def weighted(rho):
    """Sum of Im rho_rc times (r - c), which changes with every imaginary part."""
    r, c = np.indices(rho.shape)
    return float(np.sum(rho.imag * (r - c)))


def relaxation(table):
    """Population of |S_3> while a start decays."""
    point = Emitters([Z] * 3, [Z] * 2, [1.0, 1.0], point=True)
    for bystander, end in ((2, 1 / 3), (1, 0.0)):
        ket = (product((0, 1, bystander), 3) - product((1, 0, bystander), 3)) / np.sqrt(2)
        for time in (0.5, 60.0):
            closed = {"closed": end} if time == 60.0 else {}
            table.add("pair-start", 3, "population", {"shape": "point", **point.parameters, "start": f"pair,{bystander}", "time": time},
                      population(point.evolved(np.outer(ket, ket), time)), **closed)
    row = Emitters(chain(3, 0.3), [Z] * 2, [1.0, 1.0])
    rho, grid = np.outer(product((0, 0, 0), 3), product((0, 0, 0), 3)), 0.05
    followed = []
    for step in range(1, 41):
        rho = row.evolved(rho, grid)
        followed.append(population(rho))
        if step % 4 == 0:
            table.add("inverted-chain", 3, "population",
                      {"shape": "chain", "spacing": 0.3, **row.parameters, "start": "0,0,0", "time": step * grid}, followed[-1])
    table.check("inverted chain: largest population", max(followed), 0.017, 0.001)


def population(rho):
    ket = dense.antisymmetric(3)
    return float(np.real(ket @ rho @ ket))


def main(arguments):
    from recompute import asserted, compared, write
    if any(a != "--check" for a in arguments):
        print("usage: collective.py [--check]", file=sys.stderr)
        return 2
    table = build()
    findings = list(asserted(table))
    if "--check" in arguments:
        findings += compared(table)
    else:
        write([table])
    return told(findings)


if __name__ == "__main__":
    sys.exit(main(sys.argv[1:]))
