"""The bundled scenario: every part and every spec is one the program takes, and all that there is to show is in it."""

from __future__ import annotations

import csv
import re
from pathlib import Path

import pytest

from selector.gain import LAWS
from selector.parts import KINDS, Amplifier, Part, columns, read_part
from selector.spec import load_spec

DATA = Path(__file__).resolve().parents[2] / "data"
FILES = sorted((DATA / "parts").glob("*.csv"))
SPECS = sorted(DATA.glob("*.toml"))
HEADING = re.compile(r"(\w+)(?: \[(.+)\])?")


def read(path: Path) -> list[Part]:
    """Return the parts of one file, its headings taken as field and unit."""
    parts = []
    with path.open(newline="", encoding="utf-8") as lines:
        for number, row in enumerate(csv.DictReader(lines), start=2):
            cells = {}
            for heading, cell in row.items():
                matched = HEADING.fullmatch(heading)
                assert matched is not None, heading
                field, unit = matched.groups()
                if cell and field != "kind":
                    cells[field] = f"{cell} {unit}" if unit else cell
            parts.append(read_part(row["kind"], cells, where=f"{path.name} line {number}"))
    return parts


@pytest.mark.parametrize("path", FILES, ids=lambda path: path.stem)
def test_every_row_is_a_part_in_stock(path: Path) -> None:
    """Each row of a file is a part of one kind with a code of its own, a cost and a quantity."""
    parts = read(path)
    assert len({type(part) for part in parts}) == 1
    assert len({part.part for part in parts}) == len(parts)
    assert all(part.unit_cost and part.quantity and part.currency == "EUR" for part in parts)


@pytest.mark.parametrize("path", FILES, ids=lambda path: path.stem)
def test_headings_are_the_names_of_the_fields(path: Path) -> None:
    """A heading is the field's own name, with its unit where the field has one."""
    with path.open(newline="", encoding="utf-8") as lines:
        rows = list(csv.DictReader(lines))
    known = {column.name for column in columns(rows[0]["kind"])} | {"kind"}
    assert {heading.split(" [")[0] for heading in rows[0]} <= known


def test_scenario_has_every_kind_and_every_law() -> None:
    """The scenario has parts of each kind and amplifiers of each gain law."""
    parts = [part for path in FILES for part in read(path)]
    assert {part.kind for part in parts} == set(KINDS)
    assert {part.gain_law for part in parts if isinstance(part, Amplifier)} == set(LAWS)


@pytest.mark.parametrize("path", SPECS, ids=lambda path: path.stem)
def test_spec_is_taken(path: Path) -> None:
    """Each bundled spec is read without a fault and has a title."""
    assert load_spec(path).title
