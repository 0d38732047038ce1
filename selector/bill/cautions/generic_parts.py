"""Parts that stand for a series of values and lie in no drawer."""

from __future__ import annotations

from selector.bill.caution import Caution
from selector.bill.parts_of import parts_of
from selector.candidate import Candidate, Conditions


def _texts(candidate: Candidate, _conditions: Conditions) -> tuple[str, ...]:
    """One sentence that names them all."""
    named = [part.part for part in parts_of(candidate.design) if part.generic]
    return (f"Generic, not from stock: {', '.join(named)}.",) if named else ()


CAUTION = Caution("generic parts", _texts)
