"""The template of a kind: a stock file with every heading, and rows to write one's own parts over."""

from __future__ import annotations

import csv
import io

from selector.errors import Fault, UsageRefused
from selector.guard import guarded
from selector.ingest.examples import EXAMPLES
from selector.ingest.headings import KIND, nearest
from selector.parts import KINDS, Column, columns

_NOT_BY_HAND = ("source", "generic", "typical", "assumed")


def template(kind: str) -> str:
    """Return a CSV of one kind: headings with the unit of numbers that have none, and examples (one per gain law).

    Raises
    ------
    UsageRefused
        There is no such kind.
    """
    if kind not in KINDS:
        raise UsageRefused(
            Fault("", f'"{kind}" is no kind of part', nearest(kind, KINDS) or f"kinds: {', '.join(KINDS)}")
        )
    by_hand = [column for column in columns(kind) if column.name not in _NOT_BY_HAND]
    text = io.StringIO()
    writer = csv.writer(text, lineterminator="\r\n")
    writer.writerow([KIND, *map(_heading, by_hand)])
    for example in EXAMPLES.get(kind, ()):
        writer.writerow([kind, *(guarded(example.get(column.name, "")) for column in by_hand)])
    return text.getvalue()


def _heading(column: Column) -> str:
    """Return a field's heading with the unit that people use for it."""
    unit = column.quantity.heading if column.quantity is not None else ""
    return f"{column.name} [{unit}]" if unit else column.name
