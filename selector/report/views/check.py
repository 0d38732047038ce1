"""A given design against a spec: every limit, and every error term at every judged current."""

from __future__ import annotations

from collections.abc import Iterator
from functools import partial
from math import fsum, isclose

from selector.candidate import Candidate, Point, Verdict
from selector.limits import LIMITS
from selector.report.answers.check import Checked
from selector.report.document import Block, Column, Document, Lines, Table
from selector.report.told import Json, Records, Told
from selector.report.views.candidate import bill_block, cautions_block, filter_text, name_of, ranges_block
from selector.report.views.data import candidate_data, spec_data
from selector.report.views.heading import heading_of
from selector.report.words import UNKNOWN, per_cent
from selector.units import CURRENT, RATIO, Quantity, shown

_QUANTITIES: dict[str, Quantity | None] = {limit.name: limit.quantity for limit in LIMITS}
_POINTS_ABREAST = 5
_LEAST_PER_CENT = 0.001


def told(answer: Checked) -> Told:
    """Return the answer of `check`, told."""
    return Told(partial(_data, answer), partial(_document, answer), partial(_records, answer))


def _data(answer: Checked) -> dict[str, Json]:
    return {
        "schema": "selector.check/1",
        "spec": spec_data(answer.spec),
        "candidate": None if answer.offer is None else candidate_data(answer.offer),
        "meets": answer.judged.meets,
        "limits": [
            {
                "limit": each.limit,
                "meets": each.meets,
                "value": each.value,
                "allowed": each.allowed,
                "margin": each.margin,
            }
            for each in answer.judged.verdicts
        ],
    }


def _document(answer: Checked) -> Document:
    return Document((Lines((*heading_of(answer.spec), _gist(answer))), _limits(answer), *_figures(answer)))


def _gist(answer: Checked) -> str:
    candidate = None if answer.offer is None else answer.offer.candidate
    subject = "The design" if candidate is None else name_of(candidate)
    if answer.judged.meets:
        return f"{subject} meets all limits."
    failed = [each.limit for each in answer.judged.verdicts if each.meets is False]
    return f"{subject} does not meet: {', '.join(failed)}." if failed else f"{subject} cannot be judged in full."


def _limits(answer: Checked) -> Table:
    columns = (
        Column("limit"),
        Column("value", "right"),
        Column("allowed", "right"),
        Column("margin", "right"),
        Column("meets"),
    )
    return Table(columns, tuple(_limit(each) for each in answer.judged.verdicts))


def _limit(verdict: Verdict) -> tuple[str, ...]:
    quantity = _QUANTITIES.get(verdict.limit) or RATIO
    figures = (UNKNOWN if each is None else shown(each, quantity) for each in (verdict.value, verdict.allowed))
    margin = UNKNOWN if verdict.margin is None else per_cent(verdict.margin)
    return (verdict.limit, *figures, margin, _meets(verdict.meets))


def _meets(meets: bool | None) -> str:  # noqa: FBT001 - three answers, the third is None
    return "not judged" if meets is None else "yes" if meets else "NO"


def _figures(answer: Checked) -> Iterator[Block]:
    """Yield the ranges, the error terms and the bill, as far as the figures exist."""
    if answer.offer is None:
        yield Lines(("Its error has no figures: see the limits that it does not meet.",))
        return
    candidate = answer.offer.candidate
    yield ranges_block(candidate)
    yield Lines((filter_text(candidate),))
    for start in range(0, len(candidate.points), _POINTS_ABREAST):
        yield terms_block(candidate, candidate.points[start : start + _POINTS_ABREAST])
    yield bill_block(answer.offer)
    yield cautions_block(answer.offer)


def terms_block(candidate: Candidate, points: tuple[Point, ...]) -> Table:
    """Return every term that is not zero at some of the points, with the whole error and what is allowed."""
    names = dict.fromkeys(term.name for point in points for term in point.terms if term.amount_a != 0.0)
    amounts = [{term.name: term.amount_a for term in point.terms} for point in points]
    rows = [
        (name, *(_amount(each.get(name, 0.0), point) for each, point in zip(amounts, points, strict=True)))
        for name in names
    ]
    rows.append(("error", *(_amount(point.error_a, point) for point in points)))
    rows.append(("allowed", *(_amount(point.allowed_a, point) for point in points)))
    ranged = len(candidate.ranges) > 1
    heads = (
        Column(shown(point.current_a, CURRENT), "right", f"range {point.range}" if ranged else "") for point in points
    )
    return Table((Column("error term"), *heads), tuple(rows), heading=_heading(points))


def _heading(points: tuple[Point, ...]) -> str:
    """Return what the terms are, and how they make the error where that is not their sum."""
    summed = all(isclose(fsum(term.amount_a for term in point.terms), point.error_a, rel_tol=1e-6) for point in points)
    whole = "" if summed else "; limits, which add in squares"
    return f"error, in % of the reading{whole}"


def _amount(amount_a: float, point: Point) -> str:
    """Return an amount in per cent of the reading, in A where there is no current."""
    if point.current_a <= 0.0:
        return shown(amount_a, CURRENT)
    share = 100.0 * amount_a / point.current_a
    return "< 0.001" if 0.0 < share < _LEAST_PER_CENT else shown(share, RATIO)


def _records(answer: Checked) -> Records:
    rows = (
        (each.limit, each.meets, each.value, each.allowed, _unit(each.limit), each.margin)
        for each in answer.judged.verdicts
    )
    return Records(("limit", "meets", "value", "allowed", "unit", "margin [1]"), tuple(rows))


def _unit(limit: str) -> str:
    quantity = _QUANTITIES.get(limit)
    return "" if quantity is None else quantity.unit
