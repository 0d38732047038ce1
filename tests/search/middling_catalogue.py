"""Random catalogues of middling size, from a seed: 20 to 80 resistors, and gain networks that can be enumerated.

Every law, calibration, method and option of the small ones, with values that nearly agree, single weights, very wide
ranges, scarce filters, and a shelf of one resistor now and then.
"""

from __future__ import annotations

from dataclasses import dataclass, replace
from random import Random
from typing import TYPE_CHECKING

from selector.gain import LAWS as GAIN_LAWS
from selector.spec import spec_of
from tests.search.random_parts import (
    LAWS,
    amplifier_row,
    capacitor_row,
    resistances,
    resistor_row,
    shunt_row,
    stock_of,
    switch_row,
)
from tests.search.random_spec import entries_of

if TYPE_CHECKING:
    from selector.parts import Part
    from selector.spec import Spec
    from tests.search.random_parts import Fields

FEWEST, MOST = 20, 80  # resistors
FEW = 2  # shunts by amplifiers by switches: with no more of them, there are fewer ranges rather
MOST_NETWORKS = 5e5  # combinations of a shunt, an amplifier, a switch and gain resistors
WITHOUT_COMMON = tuple(law for law in LAWS if GAIN_LAWS[law].switchable and GAIN_LAWS[law].common_name is None)
WEIGHTS = ("rank.power", "rank.burden", "rank.headroom", "rank.error")
GOOD = {
    "reference_pin": True,
    "temp_max": 125.0,
    "offset": 2e-6,
    "offset_drift": 3e-8,
    "swing_low": 0.0005,
    "supply_current": 5e-5,
    "common_mode_top_gap": 0.0,
}  # of one amplifier, so that most catalogues have a candidate


@dataclass(frozen=True, slots=True)
class Size:
    """How many parts of each kind, the laws of the amplifiers, and the most ranges."""

    shunts: int
    laws: tuple[str, ...]
    switches: int
    resistors: int
    ranges: int

    def networks(self) -> int:
        """Return the nominal number of combinations without the filter."""
        total = 0
        for law in (GAIN_LAWS[name] for name in self.laws):
            for count in range(1, (self.ranges if law.switchable else 1) + 1):
                places = 0 if law.switched_name is None else count + (law.common_name is not None)
                total += self.shunts * (1 if count == 1 else self.switches) * self.resistors**places
        return total

    def smaller(self, random: Random) -> Size:
        """Return a size with less of something; with fewer ranges where little else can be less."""
        less = (
            *[replace(self, resistors=max(FEWEST, self.resistors * 7 // 8))] * 2,
            replace(self, shunts=max(1, self.shunts - 1)),
            replace(self, laws=self.laws[:-1] or self.laws),
            replace(self, switches=max(1, self.switches - 1)),
        )
        fewer = replace(self, ranges=self.ranges - 1)
        few = self.resistors == FEWEST and self.shunts * len(self.laws) * self.switches <= FEW
        return fewer if few else random.choice([size for size in less if size != self] or [fewer])


def middling(seed: int) -> tuple[Spec, dict[str, tuple[Part, ...]]]:
    """Return a spec and a catalogue."""
    random = Random(seed)
    size = _size(random)
    entries = entries_of(random, size.ranges)
    entries["ranges.most"] = size.ranges
    target_ohm = entries["limits.burden"] / entries["current.max"]
    gain = 0.8 * entries["converter.reference"] / entries["limits.burden"]
    values = resistances(
        random, list(size.laws), gain * random.choice([0.5, 1.0, 5.0]), each=random.choice([4, 12, 30])
    )
    rows = {
        "resistor": _resistors(random, size.resistors, values),
        "capacitor": [capacitor_row(random, number) for number in range(random.choice([1, 2, 4]))],
        "switch": [switch_row(random, number) for number in range(size.switches)],
        "shunt": [shunt_row(random, number, target_ohm) for number in range(size.shunts)],
        "amplifier": [amplifier_row(random, number, law) for number, law in enumerate(size.laws)],
    }
    rows["amplifier"][0] |= GOOD
    if all(GAIN_LAWS[law].reads_own_ground for law in size.laws):
        entries = {key: value for key, value in entries.items() if not key.startswith(("sense.", "output."))}
        entries["current.two_way"] = False
    _unusual(random, entries, size)
    return spec_of(entries), stock_of(random, rows)


def _size(random: Random) -> Size:
    ranges = random.choice([1, 2, 2, 3, 3, 4])
    if ranges == 4:  # one law without a common resistor, and few of all, is what can be enumerated
        size = Size(random.randint(1, 3), (random.choice(WITHOUT_COMMON),), 1, random.randint(FEWEST, 24), ranges)
    else:
        laws = random.choice([LAWS, LAWS, LAWS, WITHOUT_COMMON])
        size = Size(
            shunts=random.randint(2, 10),
            laws=tuple(random.choice(laws) for _ in range(random.choice([1, 2, 3, 4, 5]))),
            switches=random.randint(1, 3),
            resistors=random.randint(FEWEST, MOST),
            ranges=ranges,
        )
    most = MOST_NETWORKS if ranges == 4 else MOST_NETWORKS / 5.0 ** random.random()
    while size.networks() > most:
        size = size.smaller(random)
    return size


def _resistors(random: Random, count: int, values: list[float]) -> list[Fields]:
    """Return resistors of which some are alike but for tolerance and cost, and some nearly so."""
    rows = [resistor_row(random, number, values) for number in range(count)]
    for row in rows:
        if random.random() < 0.2:
            row["resistance"] *= random.choice([1.0 + 1e-12, 1.0 - 1e-9, 1.0 + 1e-6, 1.001])
    return rows


def _unusual(random: Random, entries: Fields, size: Size) -> None:
    """Change entries to what is rare in a small catalogue."""
    if random.random() < 0.15:
        only = random.choice(WEIGHTS)
        entries |= {name: float(name == only) for name in WEIGHTS}
    if min(size.shunts, len(size.laws)) == 1:
        entries["parts.boards"] = 1
        entries.pop("parts.avoid", None)
    if "limits.cost" in entries:
        entries["limits.cost"] *= random.choice([1.5, 2.0, 3.0])
    if "accuracy.bands" not in entries:
        entries["accuracy.floor"] *= random.choice([3.0, 10.0, 30.0])
        entries["accuracy.reading"] = min(0.9, entries["accuracy.reading"] * random.choice([1.0, 2.0]))
        if size.ranges > 1 and random.random() < 0.5:
            _widen(random, entries)
    entries["filter.resistance_max"] = random.choice([1e4, 1e5])
    if random.random() < 0.06:
        entries |= {"filter.resistance_min": 400.0, "filter.resistance_max": random.choice([600.0, 2e3])}
    if random.random() < 0.04:
        few = random.sample(range(size.resistors), random.choice([1, 2, 5]))
        entries["parts.only"] = {"resistor": [f"R{number}" for number in few]}


def _widen(random: Random, entries: Fields) -> None:
    """Let the currents span so much that one range does not do."""
    least_a = entries["current.max"] / random.choice([3e2, 3e2, 1e3, 1e3, 1e4])
    entries |= {
        "current.min": least_a,
        "accuracy.reading": random.choice([0.1, 0.3, 0.5]),
        "accuracy.floor": least_a * random.choice([0.1, 0.5, 1.0]),
    }
