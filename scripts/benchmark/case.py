"""One search, measured in a process of its own: `python -m scripts.benchmark.case --tightness tight --most 2`."""

from __future__ import annotations

import argparse
import json
import resource
import sys
import time
from collections.abc import Mapping, Sequence
from dataclasses import asdict, dataclass, field
from pathlib import Path

from scripts.benchmark.catalogue import TIGHTNESSES, Sizes, Tightness, catalogue, spec
from scripts.benchmark.yardstick import enumerated
from selector.parts import Part
from selector.search import search
from selector.spec import Spec

MOST_MEMORY_B = 6 * 2**30  # a search that wants more fails alone, and not with the machine
OUT_OF_MEMORY = 3
EVERY_PAIR = 0
TOP = 5


@dataclass(frozen=True, slots=True)
class Case:
    """What is searched: a spec, the number of ranges, the catalogue, and how long a list is wanted (0: every pair).

    With `yardstick` the same is enumerated by the yardstick; it knows one range only.
    """

    tightness: Tightness = "middling"
    most: int = 3
    sizes: Sizes = field(default_factory=Sizes)
    near: bool = False
    top: int = TOP
    yardstick: bool = False

    def arguments(self) -> list[str]:
        """Return the arguments of this module that stand for the case."""
        sizes = [f"--{name}={count}" for name, count in asdict(self.sizes).items()]
        flags = [f"--{name}" for name in ("near", "yardstick") if getattr(self, name)]
        return [f"--tightness={self.tightness}", f"--most={self.most}", f"--top={self.top}", *sizes, *flags]


@dataclass(frozen=True, slots=True)
class Outcome:
    """What came of a case: wall time, s; peak memory, MB; combinations there are; those in the list.

    A time is infinite where the case took longer than it was given, or more memory.
    """

    seconds: float
    peak_mb: float
    nominal: int
    found: int

    @property
    def nominal_per_s(self) -> float:
        """Return the combinations that there are by the time it took."""
        return self.nominal / self.seconds


def case_of(arguments: Sequence[str]) -> Case:
    """Return the case that arguments stand for."""
    parser = argparse.ArgumentParser(prog="python -m scripts.benchmark.case", description=__doc__)
    parser.add_argument("--tightness", choices=TIGHTNESSES, default="middling")
    parser.add_argument("--most", type=int, default=3, help="most ranges (3)")
    parser.add_argument("--top", type=int, default=TOP, help="length of the list, 0 for every pair (5)")
    parser.add_argument("--near", action="store_true", help="shunts and amplifiers that differ by 0.2 %% at most")
    parser.add_argument("--yardstick", action="store_true", help="enumerate with numpy, with one range")
    for name, count in asdict(Sizes()).items():
        parser.add_argument(f"--{name}", type=int, default=count, help=f"how many {name} ({count})")
    given = vars(parser.parse_args(arguments))
    sizes = Sizes(**{name: given.pop(name) for name in asdict(Sizes())})
    return Case(sizes=sizes, **given)


def run(case: Case) -> Outcome:
    """Run a case in this process; what makes the catalogue is not in its time."""
    stock = catalogue(near=case.near, **asdict(case.sizes))
    wanted = spec(case.tightness, case.most)
    begin = time.perf_counter()
    nominal, found = (_enumerate if case.yardstick else _search)(case, wanted, stock)
    return Outcome(time.perf_counter() - begin, peak_mb(), nominal, found)


def _search(case: Case, wanted: Spec, stock: Mapping[str, tuple[Part, ...]]) -> tuple[int, int]:
    found = search(wanted, stock, top=None if case.top == EVERY_PAIR else case.top)
    return found.searched.combinations, len(found.candidates)


def _enumerate(case: Case, wanted: Spec, stock: Mapping[str, tuple[Part, ...]]) -> tuple[int, int]:
    del case
    done = enumerated(wanted, stock)
    return done.judged, len(done.ranks)


def peak_mb(process: int | None = None) -> float:
    """Return the most memory that a process, this one where none is given, has held so far, MB; as Linux tells it.

    Linux counts it anew for each program; `getrusage` would hold that of the program that started it too.
    """
    status = Path("/proc", str(process or "self"), "status").read_text(encoding="ascii")
    line = next(line for line in status.splitlines() if line.startswith("VmHWM:"))
    return int(line.split()[1]) * 1024 / 1e6


def main() -> int:
    """Run the case of the command line and print its outcome as JSON; 3 where the memory is not enough."""
    case = case_of(sys.argv[1:])
    resource.setrlimit(resource.RLIMIT_AS, (MOST_MEMORY_B, MOST_MEMORY_B))
    try:
        outcome = run(case)
    except MemoryError:
        return OUT_OF_MEMORY
    sys.stdout.write(json.dumps(asdict(outcome)) + "\n")
    return 0


if __name__ == "__main__":
    sys.exit(main())
