"""The combination that comes nearest where nothing fits: the search with the ranked limits lifted, against the walk."""

from __future__ import annotations

from random import Random
from typing import TYPE_CHECKING

from selector.search import search
from selector.search.standing import rank_of
from selector.spec import spec_of
from tests.search.random_parts import amplifier_row, capacitor_row, resistor_row, shunt_row, stock_of, switch_row
from tests.search.random_spec import entries_of
from tests.search.small import capacitor, part, resistor, spec, stock
from tests.search.walk import nearest

if TYPE_CHECKING:
    from selector.parts import Part
    from selector.spec import Spec

SEEDS = (75, 262, 302, 360, 391, *range(20))
RESISTORS = 8


def _crowded(seed: int) -> tuple[Spec, dict[str, tuple[Part, ...]]]:
    """Return a catalogue whose gains lie close together about the one that the headroom allows; little error is.

    With headroom lifted a last range may then have a larger gain than one below it.
    """
    random = Random(seed)
    entries = entries_of(random, 2)
    room = random.choice([0.3, 0.5, 0.6])
    taken_out = ("accuracy.bands", "limits.cost", "parts.avoid", "sense.bus_min", "sense.bus_nominal", "sense.bus_max")
    entries |= {
        "limits.headroom": room,
        "ranges.most": 2,
        "accuracy.reading": random.choice([1e-2, 3e-3, 1e-1]),
        "accuracy.floor": entries["current.min"] * random.choice([0.01, 0.03, 0.001]),
        "sense.side": "low",
        "current.two_way": False,
        "parts.from": "all",
    }
    entries = {key: one for key, one in entries.items() if key not in taken_out and not key.startswith("output.")}
    law = random.choice(["one-resistor", "current-output"])
    shunt = shunt_row(random, 0, entries["limits.burden"] / entries["current.max"])
    amplifier = amplifier_row(random, 0, law)
    allowed = (1.0 - room) * entries["converter.reference"] / (shunt["resistance"] * entries["current.max"])
    gains = [allowed * 2.2 ** random.uniform(-0.3, 1.5) for _ in range(RESISTORS)]
    ohms = [_ohm(law, gain) for gain in gains]
    rows = {
        "resistor": [resistor_row(random, number, [ohm]) for number, ohm in enumerate([*ohms, 1e3])],
        "capacitor": [capacitor_row(random, 0)],
        "switch": [switch_row(random, 0)],
        "shunt": [shunt],
        "amplifier": [amplifier],
    }
    return spec_of(entries), stock_of(random, rows)


def _ohm(law: str, gain: float) -> float:
    return float(f"{gain / 2e-4 if law == 'current-output' else 1e5 / (gain - 1.0):.3g}")


def test_nearest_combination_is_that_of_the_plain_walk() -> None:
    """Where nothing fits, the combination with the smallest largest use is the one that trying all of them finds."""
    wrong, seen = [], 0
    for seed in SEEDS:
        spec, stock = _crowded(seed)
        found = search(spec, stock, top=1).nothing_fits
        if found is not None:
            seen += 1
            close = None if found.nearest is None else rank_of(found.nearest.uses.largest(), found.nearest.design)
            wrong += [seed] if close != nearest(spec, stock) else []
    assert wrong == []
    assert seen > 15


def test_ties_of_the_nearest_are_not_judged_one_by_one() -> None:
    """Where the power alone is out of reach, all chains tie, and few of them are judged in full."""
    resistors = [resistor(f"R{number:03}", 100.0 * 1.06**number) for number in range(100)]
    amplifier = part("amplifier", gain_law="one-resistor", gain=None, gain_resistance=1e5)
    figures = {"on_resistance": 5.0, "on_resistance_spread": 1.0, "leakage": 1e-9, "supply_min": 1.6, "supply_max": 5.5}
    switch = part("switch", part="W", channels=4, **figures)
    parts = (amplifier, switch, *resistors, capacitor("C", 1e-7))
    found = search(spec(limits__power=1e-6, ranges__most=3), stock(*parts))
    assert found.nothing_fits is not None
    assert found.nothing_fits.nearest is not None
    assert found.searched.evaluated < 200
