"""Small random catalogues and specs, from a seed: every law, method and limit in turn, ties on purpose."""

from __future__ import annotations

from random import Random
from typing import TYPE_CHECKING

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


def catalogue(
    seed: int, *, resistors: tuple[int, int] = (2, 6), most: int = 3, changes: Fields | None = None
) -> tuple[Spec, dict[str, tuple[Part, ...]]]:
    """Return a spec and a catalogue; `resistors` bounds their number, `most` the number of ranges.

    `changes` holds entries that the spec has in any case; one of None is taken out.
    """
    random = Random(seed)
    entries = entries_of(random, most) | (changes or {})
    entries = {key: value for key, value in entries.items() if value is not None}
    target_ohm = entries["limits.burden"] / entries["current.max"]
    laws = [random.choice(LAWS) for _ in range(random.randint(1, 3))]
    values = resistances(random, laws, 0.8 * entries["converter.reference"] / entries["limits.burden"])
    rows = {
        "resistor": [resistor_row(random, number, values) for number in range(random.randint(*resistors))],
        "capacitor": [capacitor_row(random, number) for number in range(random.randint(1, 3))],
        "switch": [switch_row(random, number) for number in range(random.choice([0, 1, 1, 2, 2]))],
        "shunt": [shunt_row(random, number, target_ohm) for number in range(random.randint(1, 3))],
        "amplifier": [amplifier_row(random, number, law) for number, law in enumerate(laws)],
    }
    return spec_of(entries), stock_of(random, rows)
