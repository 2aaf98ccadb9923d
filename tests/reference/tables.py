"""Rows of reference tables: how they are written, read and compared."""
import math
from pathlib import Path

FOLDER = Path(__file__).parent
TOLERANCE = 1e-10

LEGEND = """\
# columns:   name,N,kind,parameters,value
#   parameters: key=value;key=value. A value with | lists the parties in order, without | it holds for each of them;
#   entries within one party are separated by commas.
#   Acting order of noise keys on a qudit: jumps, dephase and depolarisingRate together (rate times a time of 1 s),
#   then leakage, rotation, phaseNoise, dephasing, depolarising, kraus, transmission.
#   jumps a>b:rate; dephase a-b:rate; rotation clock:angle or i-k:angle (i goes to cos i + sin k); kraus shift:p or damping:g;
#   leakage and transmission: one probability per level."""


class Table:
    """Rows of one file, with the checks made while they were computed."""

    def __init__(self, name, about, source, legend=LEGEND):
        self.name, self.about, self.source, self.legend = name, about, source, legend
        self.rows, self.checks = [], []

    def add(self, name, n, kind, parameters, value, printed=None, closed=None):
        """A row; `printed` holds the digits that the design prints, `closed` the value of a closed form."""
        self.rows.append((name, n, kind, encode(parameters), flush(float(value))))
        what = f"{name} N={n} {kind}"
        if printed is not None:
            self.check(f"{what} against its printed value", value, float(printed), last_digit(printed))
        if closed is not None:
            self.check(f"{what} against its closed form", value, closed)

    def check(self, what, value, expected, tolerance=TOLERANCE):
        """A relation between values that has no row of its own."""
        self.checks.append((f"{self.name}: {what}", float(value), float(expected), tolerance))

    @property
    def path(self):
        return FOLDER / f"{self.name}.csv"

    def text(self):
        lines = [f"# {self.about}", self.legend, f"# source:    {self.source}",
                 "# precision: 15 significant digits printed, absolute error below 1e-12",
                 "# maker:     tests/reference/recompute.py", "name,N,kind,parameters,value"]
        lines += [f"{name},{n},{kind},{parameters},{value:.15g}" for name, n, kind, parameters, value in map(quoted, self.rows)]
        return "\n".join(lines) + "\n"


def last_digit(printed):
    """Half a unit of the last digit of a text such as 0.9808, and never less than what tables are held to."""
    return max(0.501 * 10.0 ** -len(printed.partition(".")[2]), TOLERANCE)


def quoted(row):
    """A cell that holds commas stands in quotes."""
    return tuple(f'"{cell}"' if isinstance(cell, str) and "," in cell else cell for cell in row)


def encode(parameters):
    return ";".join(f"{key}={cell(value)}" for key, value in parameters.items())


def cell(value):
    """A number, a text, a list over parties, or a tuple of entries of one party."""
    if isinstance(value, list):
        items = [cell(v) for v in value]
        return items[0] if len(set(items)) == 1 else "|".join(items)
    if isinstance(value, tuple):
        return ",".join(map(plain, value))
    return plain(value)


def flush(value):
    """Zero where only rounding is left."""
    return 0.0 if abs(value) < 1e-14 else value


def plain(value):
    return value if isinstance(value, str) else f"{value:.15g}"


def stored_values(path):
    """{(name, N, kind, parameters): value} of a stored table."""
    import csv
    lines = [line for line in path.read_text(encoding="utf-8").splitlines() if not line.startswith("#")]
    return {(r["name"], int(r["N"]), r["kind"], r["parameters"]): float(r["value"]) for r in csv.DictReader(lines)}


def near(value, expected, tolerance=TOLERANCE):
    return math.isfinite(value) and abs(value - expected) <= tolerance


def told(findings):
    """Prints what failed and how many passed; gives the exit code."""
    wrong = [text for passed, text in findings if not passed]
    print(*(f"FAILED {text}\n" for text in wrong), sep="", end="")
    print(f"{len(findings) - len(wrong)} passed, {len(wrong)} failed")
    return 1 if wrong else 0
