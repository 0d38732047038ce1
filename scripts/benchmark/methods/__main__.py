"""Measures every method on one small problem and prints a line for each: `python -m scripts.benchmark.methods`."""

from __future__ import annotations

import sys
import time
from collections.abc import Callable, Mapping

from scripts.benchmark.catalogue import catalogue, spec
from scripts.benchmark.methods.plain import by_plain_walk
from scripts.benchmark.methods.queries import by_duckdb, by_pandas
from scripts.benchmark.methods.tables import problem_of
from scripts.benchmark.table import Row, heading, line
from scripts.benchmark.yardstick import enumerated
from selector.gain import LAWS
from selector.parts import Amplifier, Part
from selector.search import search
from selector.search.shelf import shelf_of
from selector.spec import Spec

Stock = Mapping[str, tuple[Part, ...]]
LONG_S = 2.0
TURNS = 5
AGREE_FRAC = 1e-9


def problem() -> tuple[Spec, Stock]:
    """Return a spec and a catalogue with one range and amplifiers of one law: 30 000 combinations."""
    stock = catalogue(shunts=6, amplifiers=18, switches=1, resistors=9, capacitors=7)
    law = next(name for name, each in LAWS.items() if each.reads_own_ground)
    own = tuple(part for part in stock["amplifier"] if isinstance(part, Amplifier) and part.gain_law == law)
    return spec("loose", 1), {**stock, "amplifier": own}


def methods(wanted: Spec, stock: Stock) -> dict[str, Callable[[], float]]:
    """Return what each method is called, and what gives its best score."""
    return {
        "plain walk, one by one": lambda: by_plain_walk(wanted, stock),
        "pandas, cross join": lambda: by_pandas(problem_of(shelf_of(wanted, stock))),
        "DuckDB, one SQL query": lambda: by_duckdb(problem_of(shelf_of(wanted, stock))),
        "numpy, flat arrays": lambda: enumerated(wanted, stock).ranks[0][0],
        "selector": lambda: search(wanted, stock, top=1).candidates[0].score,
    }


def best_of(method: Callable[[], float]) -> tuple[float, float]:
    """Return the score that a method finds, and the best time of some turns, s; one turn where it takes long."""
    best_s = float("inf")
    for _ in range(TURNS):
        begin = time.perf_counter()
        score = method()
        best_s = min(best_s, time.perf_counter() - begin)
        if best_s > LONG_S:
            break
    return score, best_s


def main() -> int:
    """Measure and print; 1 where the methods do not agree."""
    wanted, stock = problem()
    count = enumerated(wanted, stock).judged
    _say(heading(f"{count} combinations, one range"))
    scores = []
    for name, method in methods(wanted, stock).items():
        score, seconds = best_of(method)
        scores.append(score)
        _say(line(Row("", name, f"{count / seconds:.3g} combinations/s ({seconds:.3f} s), score {score:.12f}")))
    apart = max(scores) / min(scores) - 1.0
    agree = apart <= AGREE_FRAC
    _say(line(Row("", "scores apart", f"{apart:.1g}", f"<= {AGREE_FRAC:g}", agree)))
    return 0 if agree else 1


def _say(text: str) -> None:
    sys.stdout.write(f"{text}\n")
    sys.stdout.flush()


if __name__ == "__main__":
    sys.exit(main())
