"""A line of a bill of materials, and a candidate with the bill and the cautions it earns."""

from __future__ import annotations

from dataclasses import dataclass

from selector.candidate import Candidate


@dataclass(frozen=True, slots=True)
class BillLine:
    """A part with its places joined by ", ", and pieces for all boards; what is not known is None."""

    use: str
    kind: str
    part: str
    description: str
    quantity: int
    on_hand: int | None
    unit_cost: float | None
    line_cost: float | None


@dataclass(frozen=True, slots=True)
class Offer:
    """A candidate as it is handed to a person: with its bill for `boards` boards, and its cautions in order."""

    candidate: Candidate
    boards: int
    bill: tuple[BillLine, ...]
    cautions: tuple[str, ...]
