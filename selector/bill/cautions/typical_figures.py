"""Figures that are typical ones, not limits."""

from __future__ import annotations

from selector.bill.caution import Caution
from selector.bill.parts_of import parts_of
from selector.candidate import Candidate, Conditions


def _texts(candidate: Candidate, _conditions: Conditions) -> tuple[str, ...]:
    """One sentence for each part with typical figures, which names the fields."""
    return tuple(
        f"{part.part}: {', '.join(part.typical)} from typical figures, not from limits."
        for part in parts_of(candidate.design)
        if part.typical
    )


CAUTION = Caution("typical figures", _texts)
