"""Changes of parts, with their figures as text."""

from __future__ import annotations

from typing import TYPE_CHECKING

from selector.parts import columns
from selector.report.answers.changed import FieldChange
from selector.units import exact

if TYPE_CHECKING:
    from selector.catalogue.merge import Change

Figure = str | int | float | bool | tuple[str, ...] | None


def field_change(change: Change) -> FieldChange:
    """Return a change with its figures as text."""
    before, after = figure_text(change, change.before), figure_text(change, change.after)
    return FieldChange(change.kind, change.part, change.field, before, after)


def figure_text(change: Change, figure: Figure) -> str:
    """Return one figure of a change as a stock file would state it; empty where there is none."""
    if figure is None:
        return ""
    if isinstance(figure, bool):
        return "yes" if figure else "no"
    if isinstance(figure, tuple):
        return ", ".join(figure)
    quantity = next(column.quantity for column in columns(change.kind) if column.name == change.field)
    return exact(float(figure), quantity) if quantity is not None and not isinstance(figure, str) else str(figure)
