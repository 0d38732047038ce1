"""Every entry of a spec, defaults resolved."""

from __future__ import annotations

from functools import partial

from selector.report.answers.spec import SpecShown
from selector.report.document import Column, Document, Table
from selector.report.told import Json, Records, Told
from selector.report.views.data import spec_data
from selector.report.words import UNKNOWN
from selector.spec import KEYS, Key, Spec
from selector.units import CURRENT, FRACTION, Quantity, exact


def told(answer: SpecShown) -> Told:
    """Return a spec, told."""
    return Told(partial(_data, answer), partial(_document, answer), partial(_records, answer))


def _data(answer: SpecShown) -> dict[str, Json]:
    return {"schema": "selector.spec/1", "spec": spec_data(answer.spec)}


def _document(answer: SpecShown) -> Document:
    columns = (Column("key", whole=True), Column("value"), Column("what it is"))
    return Document((Table(columns, tuple(_row(key, value) for key, value in _entries(answer.spec))),))


def _row(key: Key, value: Json) -> tuple[str, str, str]:
    return key.name, _text(value, key.holds.quantity), key.meaning


def _entries(spec: Spec) -> list[tuple[Key, Json]]:
    """Return every key with its value in SI units, in the order of KEYS."""
    data = spec_data(spec)
    found: list[tuple[Key, Json]] = []
    for key in KEYS.values():
        table = data[key.section] if key.section else data
        found.append((key, table[key.leaf] if isinstance(table, dict) else None))
    return found


def _text(value: Json, quantity: Quantity | None) -> str:
    """Return a value as it can be written in a spec; `-` where it is absent or empty."""
    if value is None or value in ("", [], {}):
        return UNKNOWN
    if isinstance(value, bool):
        return "true" if value else "false"
    if isinstance(value, int | float):
        return exact(float(value), quantity) if quantity else repr(value)
    if isinstance(value, dict):
        return "; ".join(f"{name}: {_text(each, None)}" for name, each in value.items())
    if isinstance(value, list):
        return ", ".join(_band(each) if isinstance(each, dict) else str(each) for each in value)
    return value


def _band(band: dict[str, Json]) -> str:
    """Return a band of the allowed-error table."""
    reading, floor, up_to = (band.get(name) for name in ("reading", "floor", "up_to"))
    ends = f"up to {_text(up_to, CURRENT)}" if up_to is not None else "above"
    return f"{ends}: {_text(reading, FRACTION)} + {_text(floor, CURRENT)}"


def _records(answer: SpecShown) -> Records:
    rows = (
        (key.name, _cell(value), key.holds.quantity.unit if key.holds.quantity else "", key.meaning)
        for key, value in _entries(answer.spec)
    )
    return Records(("key", "value", "unit", "meaning"), tuple(rows))


def _cell(value: Json) -> bool | int | float | str | None:
    return _text(value, None) if isinstance(value, list | dict) else value
