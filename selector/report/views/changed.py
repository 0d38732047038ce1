"""Parts that were added, changed or removed."""

from __future__ import annotations

from functools import partial

from selector.report.answers.changed import FieldChange, PartsChanged
from selector.report.document import Column, Document, Lines, Table
from selector.report.told import Json, Records, Told
from selector.report.words import UNKNOWN, many, number

_PARTS_SHOWN = 20


def told(answer: PartsChanged) -> Told:
    """Return what was done, told."""
    return Told(partial(_data, answer), partial(_document, answer), partial(_records, answer))


def changes_data(changes: tuple[FieldChange, ...]) -> list[Json]:
    """Return changes of fields."""
    return [
        {"kind": each.kind, "part": each.part, "field": each.field, "from": each.before, "to": each.after}
        for each in changes
    ]


def changes_block(changes: tuple[FieldChange, ...]) -> Table:
    """Return changes of fields as a table."""
    columns = (Column("kind"), Column("part"), Column("field"), Column("from"), Column("to"))
    rows = ((each.kind, each.part, each.field, each.before or UNKNOWN, each.after or UNKNOWN) for each in changes)
    return Table(columns, tuple(rows))


def _data(answer: PartsChanged) -> dict[str, Json]:
    return {
        "schema": "selector.parts-change/1",
        "done": answer.done,
        "parts": [{"kind": kind, "part": part} for kind, part in answer.parts],
        "changes": changes_data(answer.changes),
        "same": answer.same,
    }


def _document(answer: PartsChanged) -> Document:
    gist = f"{many(len(answer.parts), 'part')} {answer.done}"
    same = f", {number(answer.same)} there already" if answer.same else ""
    rows = answer.parts[:_PARTS_SHOWN]
    more = len(answer.parts) - len(rows)
    return Document(
        (
            Lines((f"{gist}{same}",)),
            Table((Column("kind"), Column("part")), rows),
            Lines((f"and {number(more)} more",) if more else ()),
            changes_block(answer.changes),
        )
    )


def _records(answer: PartsChanged) -> Records:
    return Records(("done", "kind", "part"), tuple((answer.done, kind, part) for kind, part in answer.parts))
