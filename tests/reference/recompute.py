"""Recomputes every stored reference table with plain density matrices, or compares them: recompute.py [--check].

Written tables are compared in full with `--check`, to 1e-10. Both ways every printed value of the design and every
closed form is held against the dense result. Takes about a minute on two cores.
"""
import sys

import local_noise
import outcomes
import pairs
import preparation
import runs
import removal
import tolerance
from tables import near, stored_values, told

BUILDERS = [local_noise.build, removal.build, outcomes.build, pairs.build, preparation.build, runs.build, tolerance.build]


def main(arguments):
    if any(a != "--check" for a in arguments):
        print("usage: recompute.py [--check]", file=sys.stderr)
        return 2
    tables = [build() for build in BUILDERS]
    findings = [finding for table in tables for finding in asserted(table)]
    if "--check" in arguments:
        findings += [finding for table in tables for finding in compared(table)]
    else:
        write(tables)
    return told(findings)


def asserted(table):
    """Each check made while the table was computed."""
    for what, value, expected, tolerance in table.checks:
        yield near(value, expected, tolerance), f"{what}: computed {value:.15g}, expected {expected:.15g}"


def compared(table):
    """Each row against the stored one, and rows that only one side has."""
    stored = stored_values(table.path) if table.path.exists() else {}
    for *key, value in table.rows:
        kept = stored.pop(tuple(key), None)
        yield kept is not None and near(value, kept), f"{table.path.name}: {key}: computed {value:.15g}, stored {kept}"
    for key in stored:
        yield False, f"{table.path.name}: {key} is stored and no longer computed"


def write(tables):
    for table in tables:
        table.path.write_text(table.text(), encoding="utf-8")
        print(f"wrote {table.path.name}: {len(table.rows)} rows", file=sys.stderr)


if __name__ == "__main__":
    sys.exit(main(sys.argv[1:]))
