"""Nearest preferred values of a value."""

from __future__ import annotations

from functools import partial

from selector.report.answers.series import SeriesShown
from selector.report.document import Column, Document, Lines, Table
from selector.report.told import Json, Records, Told
from selector.report.words import per_cent
from selector.units import shown

_DIGITS = 6


def told(answer: SeriesShown) -> Told:
    """Return preferred values, told."""
    return Told(partial(_data, answer), partial(_document, answer), partial(_records, answer))


def _data(answer: SeriesShown) -> dict[str, Json]:
    return {
        "schema": "selector.series/1",
        "value": answer.value,
        "unit": answer.quantity.unit,
        "series": answer.series,
        "nearest": [{"value": each.value, "deviation": each.deviation} for each in answer.nearest],
        "how": answer.how,
        "pairs": [
            {"first": each.first, "second": each.second, "value": each.value, "deviation": each.deviation}
            for each in answer.pairs
        ],
    }


def _document(answer: SeriesShown) -> Document:
    def text(value: float) -> str:
        return shown(value, answer.quantity, _DIGITS)

    nearest = tuple((text(each.value), _off(each.deviation)) for each in answer.nearest)
    pairs = tuple(
        (text(each.first), text(each.second), text(each.value), _off(each.deviation)) for each in answer.pairs
    )
    off = Column("off by", "right")
    return Document(
        (
            Lines((f"{text(answer.value)} in {answer.series}",)),
            Table((Column("nearest", "right"), off), nearest),
            Table(
                (Column("first", "right"), Column("second", "right"), Column("together", "right"), off),
                pairs,
                heading=f"two in {answer.how}",
            ),
        )
    )


def _off(deviation: float) -> str:
    """Return a deviation with its sign, `0 %` where there is none."""
    return f"+{per_cent(deviation)}" if deviation > 0.0 else per_cent(deviation)


def _records(answer: SeriesShown) -> Records:
    """Return single values and pairs in one table: a single value has no second."""
    unit = f" [{answer.quantity.unit}]" if answer.quantity.unit else ""
    singles = ((each.value, None, each.value, each.deviation) for each in answer.nearest)
    pairs = ((each.first, each.second, each.value, each.deviation) for each in answer.pairs)
    headings = (f"first{unit}", f"second{unit}", f"value{unit}", "deviation [1]")
    return Records(headings, (*singles, *pairs))
