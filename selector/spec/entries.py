"""Every entry of a spec in SI numbers, with its defaults resolved."""

from __future__ import annotations

from collections.abc import Mapping

from selector.spec.keys import KEYS, SECTIONS
from selector.spec.model import Spec
from selector.spec.named_lists import NamedLists
from selector.spec.rules import Value, values_of

Plain = float | int | str | bool | None
Listed = list[str] | list[dict[str, float | None]] | dict[str, list[str]]
Entries = dict[str, "Plain | dict[str, Plain | Listed]"]


def entries(spec: Spec) -> Entries:
    """Return all entries by table and key in the order of KEYS: SI units, degC, LSB, fractions; None where absent.

    `output.high` is the supply where the spec states none.
    """
    values: Mapping[str, Value] = {**values_of(spec), "output.high": spec.output_high_v}
    tables: dict[str, dict[str, Plain | Listed]] = {section: {} for section in SECTIONS}
    for key in KEYS.values():
        if key.section:
            tables[key.section][key.leaf] = _plain(values[key.name])
    return {"title": spec.title, **tables}


def _plain(value: Value) -> Plain | Listed:
    if isinstance(value, NamedLists):
        return {name: list(codes) for name, codes in value.items()}
    if not isinstance(value, tuple):
        return value
    codes = [each for each in value if isinstance(each, str)]
    bands = [
        {"up_to": each.up_to, "reading": each.reading, "floor": each.floor}
        for each in value
        if not isinstance(each, str)
    ]
    return bands or codes
