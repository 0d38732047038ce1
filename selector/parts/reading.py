"""Parts from cells, with all faults at once, and cells from parts."""

from __future__ import annotations

from collections.abc import Iterator, Mapping

from selector.errors import Fault, InputRefused
from selector.parts.base import Part
from selector.parts.cells import LONGEST_SHOWN, cell_of, read_cell
from selector.parts.columns import columns, columns_of
from selector.parts.holds import Value
from selector.parts.kinds import KINDS
from selector.parts.rules import Wrong, nearest
from selector.units import QuantityError


def read_part(kind: str, cells: Mapping[str, object], *, where: str, bare: bool = True) -> Part:
    """Return the part that a row, a table or a command line gives.

    Parameters
    ----------
    kind
        One of KINDS.
    cells
        Field to text, number, truth or names; empty texts are absent. Numbers are SI (degC, dB).
    where
        The place to name in faults: `stock.csv line 14`.
    bare
        Whether a text may be a number without a unit in any field; if not, only where one unit is in use.

    Raises
    ------
    InputRefused
        With every fault: its `where` ends in the field's name.
    """
    values, wrong = _values(kind, cells, bare=bare)
    wrong += KINDS[kind].wrong_in(values)
    if wrong:
        raise InputRefused(_fault(each, where) for each in wrong)
    return KINDS[kind].model_validate({name: value for name, value in values.items() if value is not None})


def cells_of(part: Part) -> dict[str, str]:
    """Return the fields that a part states, as texts from which `read_part` makes an equal part.

    A field is stated where it is required, or differs from its default and does not follow from other fields.
    """
    derived = part.derived()
    stated = ((column, getattr(part, column.name)) for column in columns_of(type(part)) if column.name not in derived)
    return {
        column.name: cell_of(value, column)
        for column, value in stated
        if column.required or (value is not None and value != column.default)
    }


def kind_of(part: Part) -> str:
    """Return the name of a part's kind."""
    return part.kind


def _values(kind: str, cells: Mapping[str, object], *, bare: bool) -> tuple[dict[str, Value], list[Wrong]]:
    """Return the values of all fields that could be read, defaults included, and what is wrong with the others."""
    known = {column.name: column for column in columns(kind)}
    wrong = list(_unknown(cells, known, kind))
    values: dict[str, Value] = {}
    for name, column in known.items():
        try:
            value = read_cell(cells.get(name), column, bare=bare)
        except QuantityError as refused:
            wrong.append(Wrong(name, refused.what, refused.remedy))
            continue
        if value is None and column.required:
            example = f", for example {column.quantity.example}" if column.quantity else ""
            wrong.append(Wrong(name, "missing", f"every {kind} needs it{example}"))
            continue
        values[name] = column.default if value is None else value
    return values, wrong


def _unknown(cells: Mapping[str, object], known: Mapping[str, object], kind: str) -> Iterator[Wrong]:
    for name in cells:
        if name not in known:
            short = name if len(name) <= LONGEST_SHOWN else name[:LONGEST_SHOWN] + "..."
            remedy = nearest(short, known) or f"a part of kind {kind} has {', '.join(known)}"
            yield Wrong("", f'unknown field "{short}"', remedy)


def _fault(wrong: Wrong, where: str) -> Fault:
    return Fault(", ".join(filter(None, (where, wrong.field))), wrong.what, wrong.remedy)
