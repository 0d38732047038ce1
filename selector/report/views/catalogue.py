"""What is in a catalogue."""

from __future__ import annotations

from functools import partial

from selector.report.answers.catalogue import CatalogueShown
from selector.report.document import Column, Document, Lines, Table
from selector.report.told import Json, Records, Told
from selector.report.words import many, number

_HEADINGS = ("kind", "parts", "stocked", "generic")


def told(answer: CatalogueShown) -> Told:
    """Return the facts of a catalogue, told."""
    return Told(partial(_data, answer), partial(_document, answer), partial(_records, answer))


def _data(answer: CatalogueShown) -> dict[str, Json]:
    return {
        "schema": "selector.catalogue/1",
        "path": answer.path,
        "version": answer.version,
        "kinds": [
            {"kind": each.kind, "parts": each.parts, "stocked": each.stocked, "generic": each.generic}
            for each in answer.kinds
        ],
        "size": answer.size_bytes,
        "changes": answer.changes,
        "changed": answer.changed,
    }


def _document(answer: CatalogueShown) -> Document:
    last = f", the last {answer.changed}" if answer.changed else ""
    facts = f"version {answer.version}, {number(answer.size_bytes)} bytes, {many(answer.changes, 'change')}{last}"
    columns = (Column("kind"), *(Column(name, "right") for name in _HEADINGS[1:]))
    rows = ((each.kind, number(each.parts), number(each.stocked), number(each.generic)) for each in answer.kinds)
    return Document((Lines((answer.path, facts)), Table(columns, tuple(rows))))


def _records(answer: CatalogueShown) -> Records:
    return Records(_HEADINGS, tuple((each.kind, each.parts, each.stocked, each.generic) for each in answer.kinds))
