"""Candidates, specs and parts as the JSON of interface.md, section 5."""

from __future__ import annotations

from typing import TYPE_CHECKING

from selector.parts import Part, columns
from selector.report.told import Json

if TYPE_CHECKING:  # parts are shown without specs, and both without the arrays that candidates bring along
    from selector.bill import BillLine, Offer
    from selector.candidate import Candidate, Design, Point
    from selector.spec import Spec


def spec_data(spec: Spec) -> dict[str, Json]:
    """Return every entry of a spec in SI numbers."""
    from selector.spec import entries  # noqa: PLC0415 - parts are shown without specs

    return {
        name: {key: _plain(value) for key, value in entry.items()} if isinstance(entry, dict) else entry
        for name, entry in entries(spec).items()
    }


def _plain(value: object) -> Json:
    """Return a value of a spec's entry: lists and tables go down to texts and numbers."""
    if isinstance(value, dict):
        return {str(key): _plain(each) for key, each in value.items()}
    if isinstance(value, list | tuple):
        return [_plain(each) for each in value]
    return value if value is None or isinstance(value, bool | int | float | str) else str(value)


def candidate_data(offer: Offer) -> dict[str, Json]:
    """Return a candidate with its bill and cautions."""
    candidate = offer.candidate
    uses, limiting, after = candidate.uses, candidate.limiting, candidate.filter
    return {
        "rank": candidate.rank,
        "score": candidate.score,
        "pareto": candidate.pareto,
        "uses": {"power": uses.power, "burden": uses.burden, "headroom": uses.headroom, "error": uses.error},
        "power": candidate.power_w,
        "burden": candidate.burden_v,
        "headroom": candidate.headroom_frac,
        "cost": candidate.cost,
        "currency": candidate.currency,
        "parts": parts_data(candidate.design),
        "ranges": ranges_data(candidate),
        "filter": {
            "cutoff": after.cutoff_hz,
            "bandwidth": list(after.bandwidth_hz),
            "settle": list(after.settle_s),
        },
        "errors": [point_data(point) for point in candidate.points],
        "transient": None,
        "limiting": {
            "range": limiting.range,
            "current": limiting.current_a,
            "use": limiting.use,
            "term": limiting.term,
        },
        "bill": [line_data(line) for line in offer.bill],
        "cautions": list(offer.cautions),
    }


def parts_data(design: Design) -> dict[str, Json]:
    """Return the codes of a design's parts by place."""
    return {
        "shunts": [shunt.part for shunt in design.shunts],
        "amplifier": design.amplifier.part,
        "switch": code_of(design.switch),
        "bypass": None,
        "common": code_of(design.common),
        "gain": None if design.gain is None else [resistor.part for resistor in design.gain],
        "gain_capacitors": [],
        "filter_resistor": code_of(design.filter_resistor),
        "filter_capacitor": code_of(design.filter_capacitor),
    }


def code_of(part: Part | None) -> str | None:
    """Return the code of a part, None where there is none."""
    return None if part is None else part.part


def ranges_data(candidate: Candidate) -> list[Json]:
    """Return gain, borders (A) and outputs (V) of every range."""
    return [
        {
            "gain": each.gain,
            "low": each.low_a,
            "high": each.high_a,
            "output_low": each.output_low_v,
            "output_high": each.output_high_v,
        }
        for each in candidate.ranges
    ]


def point_data(point: Point) -> dict[str, Json]:
    """Return a judged point with every term that is not zero, A."""
    return {
        "range": point.range,
        "current": point.current_a,
        "error": point.error_a,
        "allowed": point.allowed_a,
        "terms": {term.name: term.amount_a for term in point.terms if term.amount_a != 0.0},
    }


def line_data(line: BillLine) -> dict[str, Json]:
    """Return a line of a bill."""
    return {
        "use": line.use,
        "kind": line.kind,
        "part": line.part,
        "description": line.description,
        "quantity": line.quantity,
        "on_hand": line.on_hand,
        "unit_cost": line.unit_cost,
        "line_cost": line.line_cost,
    }


def part_data(part: Part) -> dict[str, Json]:
    """Return a part with its kind and every field of its kind, null where absent."""
    return {"kind": part.kind, **{column.name: _plain(getattr(part, column.name)) for column in columns(part.kind)}}
