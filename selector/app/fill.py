"""Generic parts of an E series: what could be bought, never counted as stock."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass
from decimal import Decimal
from pathlib import Path

from selector.app.changes import figure_text
from selector.app.kinds import kind_named
from selector.app.parts import refuse_unknown_fields
from selector.catalogue import open_catalogue
from selector.catalogue.merge import Conflict, Merge
from selector.errors import Fault, InputRefused, UsageRefused
from selector.parts import Part, columns, read_part
from selector.report.answers.changed import PartsChanged
from selector.series import values_between
from selector.units import FRACTION, Quantity, QuantityError, parse
from selector.units import shown as shown_figure

VALUE_OF = {"shunt": "resistance", "resistor": "resistance", "capacitor": "capacitance"}
SOURCE = "generic part of {series}"
_OURS = ("part", "quantity", "generic", "source", "typical", "assumed")
_LETTERS = {
    "resistance": ((6, "M"), (3, "k"), (0, "R")),
    "capacitance": ((0, "F"), (-3, "m"), (-6, "u"), (-9, "n"), (-12, "p")),
}


@dataclass(frozen=True, slots=True)
class Span:
    """The values of a series from `low` to `high`, as a person writes them."""

    series: str
    low: str
    high: str


def fill(kind: str, span: Span, fields: Mapping[str, str], catalogue: Path | None = None) -> PartsChanged:
    """Add a generic part for each value of a span; those that are there already stay.

    Raises
    ------
    UsageRefused
        A kind that is not filled, a series or field that is not there, a bound that is no value.
    InputRefused
        A figure that cannot be, or a part of such a code with other figures; nothing is changed then.
    """
    parts = generic_parts(kind, span, fields)
    with open_catalogue(catalogue, write=True) as opened:
        planned = opened.merge(parts, dry_run=True)
        _refuse_conflicts(planned)
        done = opened.merge(parts) if planned.new else planned
        _refuse_conflicts(done)
    return PartsChanged("added", done.new, same=len(done.same))


def generic_parts(kind: str, span: Span, fields: Mapping[str, str]) -> tuple[Part, ...]:
    """Return the parts that `fill` adds, by rising value."""
    wanted = kind_named(kind, VALUE_OF)
    name = VALUE_OF[wanted]
    refuse_unknown_fields(wanted, fields)
    ours = [field for field in fields if field in (*_OURS, name)]
    if ours:
        raise UsageRefused(Fault(field, "is set by fill itself", "leave it out") for field in ours)
    quantity = next(column.quantity for column in columns(wanted) if column.name == name)
    if quantity is None:
        raise UsageRefused(Fault("", f"a {wanted} has no value", "name another kind"))
    values = values_between(span.series, _bound("--from", span.low, quantity), _bound("--to", span.high, quantity))
    if not values:
        raise UsageRefused(
            Fault("--from", f"no value of {span.series} lies from {span.low} to {span.high}", "give a wider span")
        )
    own = {"generic": True, "source": SOURCE.format(series=span.series), **fields}
    first = read_part(wanted, {**own, "part": "generic", name: values[0]}, where="", bare=False)
    tolerance = shown_figure(getattr(first, "tolerance", 0.0), FRACTION).replace(" ", "")
    return tuple(
        read_part(
            wanted,
            {**own, "part": f"{wanted}-{span.series}-{value_code(value, name)}-{tolerance}", name: value},
            where=f"{wanted} {value_code(value, name)}",
        )
        for value in values
    )


def value_code(value: float, name: str) -> str:
    """Return a value with a letter in the place of its decimal mark: 4k99, 0R05, 100n.

    Source: IEC 60062, clause 4 (from memory); kilo is k, as the SI writes it.
    """
    letters = _LETTERS[name]
    decimal = Decimal(repr(value))
    exponent, letter = next((each for each in letters if decimal >= Decimal(1).scaleb(each[0])), letters[-1])
    whole, _, rest = f"{decimal.scaleb(-exponent):f}".partition(".")
    return f"{whole}{letter}{rest.rstrip('0')}"


def _bound(option: str, text: str, quantity: Quantity) -> float:
    """Return one end of the span."""
    try:
        return parse(text, quantity)
    except QuantityError as refused:
        raise UsageRefused(Fault(option, refused.what, refused.remedy)) from refused


def _refuse_conflicts(merge: Merge) -> None:
    """Raise where the catalogue has parts of these codes with other figures."""
    if merge.conflicts:
        raise InputRefused(map(_conflict, merge.conflicts))


def _conflict(conflict: Conflict) -> Fault:
    first = conflict.differences[0]
    before = figure_text(first, first.before)
    had = f"with {first.field} {before}" if before else f"without {first.field}"
    remedy = f"remove it first: selector parts remove {conflict.part}"
    return Fault(f"{conflict.kind} {conflict.part}", f"is in the catalogue {had}", remedy)
