"""The fields of each kind, their units, defaults and bounds."""

from __future__ import annotations

import csv
from pathlib import Path

import pytest

from selector.gain import LAWS
from selector.parts import KINDS, columns
from selector.units import COUNT

TABLE = Path(__file__).parent / "fields.csv"
COMMON = [
    "part",
    "description",
    "note",
    "unit_cost",
    "currency",
    "quantity",
    "location",
    "source",
    "generic",
    "typical",
    "assumed",
]


def rows() -> list[dict[str, str]]:
    """Return the table of fields of the interface."""
    with TABLE.open(encoding="utf-8", newline="") as file:
        return list(csv.DictReader(file))


def test_the_kinds_stand_in_their_order() -> None:
    """There are six kinds, in the order of the interface."""
    assert list(KINDS) == ["shunt", "resistor", "capacitor", "amplifier", "bypass", "switch"]


@pytest.mark.parametrize("kind", KINDS)
def test_the_fields_are_those_of_the_interface(kind: str) -> None:
    """A kind has the common fields, then its own, by name and in order, and no others.

    Source: interface.md, section 3, copied to fields.csv.
    Tolerance: none.
    """
    assert [column.name for column in columns(kind)] == [
        *COMMON,
        *(row["field"] for row in rows() if row["kind"] == kind),
    ]


@pytest.mark.parametrize("row", rows(), ids=lambda row: f"{row['kind']}.{row['field']}")
def test_each_field_has_its_unit_and_its_default(row: dict[str, str]) -> None:
    """A field is required, has the default or is absent, in the unit of the interface.

    Source: interface.md, section 3, copied to fields.csv.
    Tolerance: none.
    """
    column = next(column for column in columns(row["kind"]) if column.name == row["field"])
    assert column.required == (row["default"] == "*")
    if column.quantity is not None:
        assert (column.quantity.unit, column.default) == (
            row["unit"],
            float(row["default"]) if row["default"] not in ("", "*") else None,
        )
    assert column.sort == (row["sort"] or "quantity")


@pytest.mark.parametrize("kind", KINDS)
def test_only_temperatures_and_the_lowest_common_mode_may_be_negative(kind: str) -> None:
    """Every other figure has a bound at or above 0, and all have one above: 1 for fractions, else 1e15."""
    for column in columns(kind):
        if column.quantity is None:
            continue
        may = column.quantity.unit == "degC" or column.name == "common_mode_min"
        lowest = column.above if column.above is not None else column.least
        assert lowest is not None
        assert (lowest < 0) == may
        assert column.below == (1.0 if column.quantity.unit == "1" else 1e15)


def test_whole_numbers_and_choices() -> None:
    """Terminals are 2 or 4, channels at least 1, and gain laws those of the registry."""
    shunt, switch, amplifier = ({column.name: column for column in columns(kind)} for kind in _SOME)
    assert shunt["terminals"].choices == (2, 4)
    assert switch["channels"].least == 1
    assert switch["channels"].quantity is COUNT
    assert switch["channels"].whole
    assert amplifier["gain_law"].choices == tuple(LAWS)


_SOME = ("shunt", "switch", "amplifier")
