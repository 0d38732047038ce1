"""Parts of the catalogue: a table of several, every field of a single one."""

from __future__ import annotations

from functools import partial

from selector.parts import Part, cells_of
from selector.report.answers.parts import PartsListed
from selector.report.document import Column, Document, Lines, Table
from selector.report.figures import main_figures
from selector.report.told import Json, Records, Told
from selector.report.views.data import part_data
from selector.report.words import UNKNOWN, many, number, price


def told(answer: PartsListed) -> Told:
    """Return parts, told."""
    return Told(partial(_data, answer), partial(_document, answer), partial(_records, answer))


def _data(answer: PartsListed) -> dict[str, Json]:
    return {"schema": "selector.parts/1", "parts": [part_data(part) for part in answer.parts]}


def _document(answer: PartsListed) -> Document:
    if len(answer.parts) == 1:
        return Document((_fields(answer.parts[0]),))
    return Document((Lines((many(len(answer.parts), "part"),)), _list(answer.parts)))


def _fields(part: Part) -> Table:
    """Return every field that a part states."""
    rows = (("kind", part.kind), *cells_of(part).items())
    return Table((Column("field"), Column("value")), rows)


def _list(parts: tuple[Part, ...]) -> Table:
    columns = (
        Column("kind"),
        Column("part"),
        Column("figures"),
        Column("have", "right"),
        Column("where"),
        Column("unit", "right"),
    )
    return Table(columns, tuple(part_row(part) for part in parts))


def part_row(part: Part) -> tuple[str, ...]:
    """Return kind, code, main figures, quantity, location and cost of a part."""
    have = "generic" if part.generic else UNKNOWN if part.quantity is None else number(part.quantity)
    cost = price(part.unit_cost, part.currency)
    return (part.kind, part.part, main_figures(part), have, part.location or UNKNOWN, cost)


def _records(answer: PartsListed) -> Records | str:
    """Return the CSV that loads again, where the answer has it; else the fields that are stated, as texts."""
    if answer.csv_text is not None:
        return answer.csv_text
    cells = [cells_of(part) for part in answer.parts]
    names = tuple(dict.fromkeys(name for each in cells for name in each))
    rows = ((part.kind, *(each.get(name) for name in names)) for part, each in zip(answer.parts, cells, strict=True))
    return Records(("kind", *names), tuple(rows))
