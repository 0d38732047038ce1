"""Currents that rise steeply with temperature count in the error."""

from __future__ import annotations

from selector.bill.caution import Caution
from selector.budget import TERMS
from selector.candidate import Candidate, Conditions
from selector.units import TEMPERATURE, shown

_TERMS = tuple(term.name for term in TERMS if term.leakage)


def _texts(candidate: Candidate, conditions: Conditions) -> tuple[str, ...]:
    """Names the leakage terms that are not zero at some judged current."""
    present = {term.name for point in candidate.points for term in point.terms if term.amount_a != 0.0}
    named = [name for name in _TERMS if name in present]
    if not named:
        return ()
    hottest = shown(conditions.ambient_max_degc, TEMPERATURE)
    return (
        f"Leakage estimates double every 10 K ({', '.join(named)}): see that the figures entered hold at {hottest}.",
    )


CAUTION = Caution("leakage", _texts)
