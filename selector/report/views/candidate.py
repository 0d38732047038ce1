"""One candidate as blocks: its ranges, where its error comes from, its bill and its cautions."""

from __future__ import annotations

from collections.abc import Iterator
from math import fsum, sqrt

from selector.bill import BillLine, Offer
from selector.candidate import Candidate, Point, TermAmount
from selector.parts import Part
from selector.report.document import Bar, Bars, Block, Column, Lines, Notes, Table
from selector.report.figures import main_figures
from selector.report.words import UNKNOWN, error, many, number, or_unknown, price
from selector.spec import Spec
from selector.units import CURRENT, FREQUENCY, MONEY, RATIO, TIME, VOLTAGE, shown

_BARS = 5


def blocks_of(offer: Offer, spec: Spec) -> Iterator[Block]:
    """Yield the blocks of a candidate in the order in which they are read."""
    yield ranges_block(offer.candidate)
    yield Lines((filter_text(offer.candidate),))
    yield error_block(offer.candidate, spec)
    yield bill_block(offer)
    yield cautions_block(offer)


def cautions_block(offer: Offer) -> Notes:
    """Return the cautions."""
    return Notes("cautions", offer.cautions)


def ranges_block(candidate: Candidate) -> Table:
    """Return the ranges, each with its error at both borders and what is allowed there."""
    rows = []
    for place, each in enumerate(candidate.ranges, start=1):
        points = [point for point in candidate.points if point.range == place]
        rows.append(
            (
                str(place),
                shown(each.low_a, CURRENT),
                shown(each.high_a, CURRENT),
                shown(each.gain, RATIO),
                f"{shown(each.output_low_v, VOLTAGE)} to {shown(each.output_high_v, VOLTAGE)}",
                *(error(point.error_a, point.allowed_a, point.current_a) for point in (points[0], points[-1])),
            )
        )
    columns = (
        Column("range"),
        Column("from", "right"),
        Column("to", "right"),
        Column("gain", "right"),
        Column("output"),
        Column("error from", below="(allowed)"),
        Column("error to", below="(allowed)"),
    )
    return Table(columns, tuple(rows))


def filter_text(candidate: Candidate) -> str:
    """Return what the output filter does, range by range."""
    after = candidate.filter
    bandwidths = ", ".join(shown(each, FREQUENCY) for each in after.bandwidth_hz)
    settles = ", ".join(shown(each, TIME) for each in after.settle_s)
    ranges = " by range" if len(candidate.ranges) > 1 else ""
    return (
        f"Filter: corner {shown(after.cutoff_hz, FREQUENCY)}; bandwidth{ranges} {bandwidths}; "
        f"settles to half a count in {settles}."
    )


def limiting_point(candidate: Candidate) -> Point:
    """Return the judged point that uses most of what is allowed."""
    limiting = candidate.limiting
    at = [each for each in candidate.points if each.range == limiting.range and each.current_a == limiting.current_a]
    return max(at, key=lambda point: point.use)


def error_block(candidate: Candidate, spec: Spec) -> Bars:
    """Return the largest error terms at the point that limits, and the rest as one."""
    point = limiting_point(candidate)
    squares = spec.accuracy.method != "worst-case"

    def size(term: TermAmount) -> float:
        return term.standard_a if squares else term.amount_a

    terms = sorted((term for term in point.terms if size(term) > 0.0), key=size, reverse=True)
    bars = [Bar(term.name, _figure(size(term), point), size(term) / size(terms[0])) for term in terms[:_BARS]]
    rest = [size(term) for term in terms[_BARS:]]
    if rest:
        together = sqrt(fsum(each**2 for each in rest)) if squares else fsum(rest)
        bars.append(Bar(f"{len(rest)} more", _figure(together, point), None))
    of = "in % of the reading" if point.current_a > 0.0 else "in A"
    how = ", as standard uncertainties (they add in squares)" if squares else ""
    return Bars(f"where the error comes from at {shown(point.current_a, CURRENT)}, {of}{how}", tuple(bars))


def _figure(size_a: float, point: Point) -> str:
    return shown(100.0 * size_a / point.current_a, RATIO) if point.current_a > 0.0 else shown(size_a, CURRENT)


def bill_block(offer: Offer) -> Table:
    """Return the bill with its total."""
    places = offer.candidate.design.places()
    named = {(place.part.kind, place.part.part, place.part.description): place.part for place in places}
    currency = offer.candidate.currency
    rows = [_line(line, named.get((line.kind, line.part, line.description))) for line in offer.bill]
    costs = [line.line_cost for line in offer.bill if line.line_cost is not None]
    known = len(costs) == len(offer.bill) and offer.candidate.cost is not None
    total = price(fsum(costs), currency) if known else "unknown"
    rows.append(("total", "", "", "", "", "", total))
    columns = (
        Column("use"),
        Column("part"),
        Column("for"),
        Column("qty", "right"),
        Column("have", "right"),
        Column("unit", "right"),
        Column("line", "right"),
    )
    return Table(columns, tuple(rows), heading=f"bill for {many(offer.boards, 'board')}")


def _on_hand(line: BillLine) -> str:
    if line.on_hand is None:
        return UNKNOWN
    return f"{number(line.on_hand)} short" if line.on_hand < line.quantity else number(line.on_hand)


def _line(line: BillLine, part: Part | None) -> tuple[str, ...]:
    return (
        line.use,
        line.part,
        line.description if part is None else main_figures(part),
        number(line.quantity),
        _on_hand(line),
        or_unknown(line.unit_cost, MONEY),
        or_unknown(line.line_cost, MONEY),
    )


def name_of(candidate: Candidate) -> str:
    """Return a candidate by its shunt and amplifier."""
    return f"{' + '.join(shunt.part for shunt in candidate.design.shunts)} with {candidate.design.amplifier.part}"


def held_back(candidate: Candidate) -> str:
    """Return the term that is largest where the error uses most of what is allowed."""
    return f"{candidate.limiting.term}, {shown(candidate.limiting.current_a, CURRENT)}"
