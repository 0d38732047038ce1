"""The recorded figures of the circuits: tests/reference/circuit.csv, and how they are recorded anew.

`python -m tests.circuit.record` runs every deck and writes the file; with a folder as argument it leaves the decks
there too. Columns: name (of a design in benches.py), quantity, value (of the circuit), tolerance (of ours against
it, a fraction, or the lowest and the highest), source (deck and simulator).
"""

from __future__ import annotations

import csv
import sys
from dataclasses import dataclass
from pathlib import Path

from tests.circuit import converter, dc, dynamics, four_resistors, noise
from tests.circuit.benches import Bench
from tests.circuit.measure import Measure
from tests.circuit.simulator import printed, version

FILE = Path(__file__).resolve().parents[1] / "reference" / "circuit.csv"
COLUMNS = ("name", "quantity", "value", "tolerance", "source")
MEASURES: dict[str, Measure] = {
    measure.quantity: measure for room in (dc, noise, dynamics, four_resistors, converter) for measure in room.MEASURES
}


@dataclass(frozen=True, slots=True)
class Recorded:
    """A figure of a circuit, and how far below and above it ours may lie, as fractions."""

    value: float
    below: float
    above: float


def recorded() -> dict[tuple[str, str], Recorded]:
    """Return every recorded figure by design and quantity."""
    with FILE.open(encoding="utf-8", newline="") as lines:
        return {(row["name"], row["quantity"]): _recorded(row) for row in csv.DictReader(lines)}


def _recorded(row: dict[str, str]) -> Recorded:
    lowest, _, highest = row["tolerance"].partition(" ")
    if highest:
        return Recorded(float(row["value"]), -float(lowest), float(highest))
    return Recorded(float(row["value"]), float(lowest), float(lowest))


def measured(measure: Measure, bench: Bench) -> float:
    """Return the figure that the circuit gives now."""
    return measure.figure(bench, printed(measure.deck(bench)))


def deck_name(measure: Measure, bench: Bench) -> str:
    """Return the file name of a deck."""
    return f"{bench.name}-{measure.quantity}.cir"


def main(arguments: list[str]) -> int:
    """Record every figure, and leave the decks in the folder that is named; return 0."""
    with FILE.open("w", encoding="utf-8", newline="") as lines:
        writer = csv.writer(lines, lineterminator="\n")
        writer.writerow(COLUMNS)
        for measure in MEASURES.values():
            for bench in measure.benches:
                if arguments:
                    (Path(arguments[0]) / deck_name(measure, bench)).write_text(measure.deck(bench), encoding="ascii")
                source = f"{deck_name(measure, bench)}, {version()}"
                value = f"{measured(measure, bench):.12e}"
                writer.writerow((bench.name, measure.quantity, value, _tolerance(measure), source))
    return 0


def _tolerance(measure: Measure) -> str:
    if measure.below == measure.above:
        return repr(measure.above)
    return f"{-measure.below!r} +{measure.above!r}"


if __name__ == "__main__":
    sys.exit(main(sys.argv[1:]))
