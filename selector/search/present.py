"""A judged combination with every figure that is shown of it."""

from __future__ import annotations

from selector.budget import amounts, combined, judged, largest_term
from selector.candidate import Candidate, Point, cost_of
from selector.candidate.chain import Chain
from selector.candidate.result import FilterFiguresShown, Limiting, RangeFigures
from selector.candidate.uses import headroom_frac, power_w, shunt_power_w
from selector.limits import settle_s
from selector.physics.filters import bandwidth_hz, corner_hz
from selector.search.assess import uses_of
from selector.search.objective import Score


def present(chain: Chain, score: Score) -> Candidate:
    """Return the candidate of a completed chain."""
    last = chain.ranges[-1]
    uses = uses_of(chain)
    points = tuple(point for number, _ in enumerate(chain.ranges, start=1) for point in _points(chain, number))
    cost = cost_of(chain.design)
    return Candidate(
        design=chain.design,
        score=float(score.of(uses.power, uses.burden, uses.headroom, uses.error)),
        uses=uses,
        power_w=float(power_w(last)),
        burden_v=float(chain.pairing.burden_v),
        headroom_frac=float(headroom_frac(last)),
        shunt_power_w=float(shunt_power_w(last)),
        cost=cost,
        currency=None if cost is None else _currency(chain),
        ranges=_ranges(chain),
        filter=_filter(chain),
        points=points,
        limiting=_limiting(chain, points),
    )


def _ranges(chain: Chain) -> tuple[RangeFigures, ...]:
    zero_v = chain.pairing.conditions.zero_v
    return tuple(
        RangeFigures(
            gain=float(at.gain),
            low_a=float(at.low_a),
            high_a=float(at.high_a),
            output_low_v=float(zero_v + at.transfer_ohm * at.low_a),
            output_high_v=float(zero_v + at.transfer_ohm * at.high_a),
        )
        for at in chain.ranges
    )


def _points(chain: Chain, number: int) -> list[Point]:
    at = chain.ranges[number - 1]
    error = combined(at)
    return [
        Point(number, current_a, float(error.error_a(current_a)), allowed, amounts(at, current_a))
        for current_a, allowed in judged(at.conditions, float(at.low_a), float(at.high_a))
    ]


def _limiting(chain: Chain, points: tuple[Point, ...]) -> Limiting:
    worst = max(points, key=lambda point: point.use)
    return Limiting(worst.range, worst.current_a, worst.use, largest_term(chain.ranges[worst.range - 1], worst.terms))


def _filter(chain: Chain) -> FilterFiguresShown:
    design, last = chain.design, chain.ranges[-1]
    if design.filter_resistor is None or design.filter_capacitor is None:
        message = "a chain is presented with its filter"
        raise ValueError(message)
    nominal_ohm = design.filter_resistor.resistance + last.output_ohm
    return FilterFiguresShown(
        cutoff_hz=float(corner_hz(nominal_ohm, design.filter_capacitor.capacitance)),
        bandwidth_hz=tuple(float(bandwidth_hz(at.amplifier_pole_hz, at.filter.slow_hz)) for at in chain.ranges),
        settle_s=tuple(float(settle_s(at)) for at in chain.ranges),
    )


def _currency(chain: Chain) -> str | None:
    stated = {place.part.currency for place in chain.design.places() if place.part.currency is not None}
    return stated.pop() if len(stated) == 1 else None
