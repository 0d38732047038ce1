"""Parts that were looked for."""

from __future__ import annotations

from functools import partial

from selector.report.answers.found import PartsFound
from selector.report.document import Column, Document, Lines, Table
from selector.report.figures import main_figures
from selector.report.told import Json, Records, Told
from selector.report.views.data import part_data
from selector.report.words import UNKNOWN, many, number


def told(answer: PartsFound) -> Told:
    """Return what was found, told."""
    return Told(partial(_data, answer), partial(_document, answer), partial(_records, answer))


def _data(answer: PartsFound) -> dict[str, Json]:
    found: list[Json] = [{"why": each.why, "score": each.score, "part": part_data(each.part)} for each in answer.found]
    return {"schema": "selector.parts-find/1", "text": answer.text, "found": found}


def _document(answer: PartsFound) -> Document:
    gist = f'{many(len(answer.found), "part")} like "{answer.text}"'
    columns = (Column("kind"), Column("part"), Column("figures"), Column("have", "right"), Column("found by"))
    rows = (
        (
            each.part.kind,
            each.part.part,
            each.part.description or main_figures(each.part),
            UNKNOWN if each.part.quantity is None else number(each.part.quantity),
            each.why,
        )
        for each in answer.found
    )
    return Document(
        (Lines((gist if answer.found else f'No part is like "{answer.text}".',)), Table(columns, tuple(rows)))
    )


def _records(answer: PartsFound) -> Records:
    headings = ("kind", "part", "description", "quantity", "why", "score")
    rows = (
        (each.part.kind, each.part.part, each.part.description, each.part.quantity, each.why, each.score)
        for each in answer.found
    )
    return Records(headings, tuple(rows))
