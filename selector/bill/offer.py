"""A candidate with its bill and the cautions it earns."""

from __future__ import annotations

from selector.bill.cautions import CAUTIONS
from selector.bill.line import Offer
from selector.bill.lines import bill_lines
from selector.candidate import Candidate, Conditions


def cautions_of(candidate: Candidate, conditions: Conditions) -> tuple[str, ...]:
    """Return the cautions that a candidate earns under the conditions of its spec, in the order of CAUTIONS."""
    return tuple(text for caution in CAUTIONS for text in caution.texts(candidate, conditions))


def offer_of(candidate: Candidate, conditions: Conditions, boards: int) -> Offer:
    """Return a candidate as it is handed to a person, with the bill for `boards` boards."""
    return Offer(candidate, boards, bill_lines(candidate.design, boards), cautions_of(candidate, conditions))
