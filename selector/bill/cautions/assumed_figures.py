"""Figures that were assumed when a stock file was loaded."""

from __future__ import annotations

from selector.bill.caution import Caution
from selector.bill.parts_of import parts_of
from selector.candidate import Candidate, Conditions


def _texts(candidate: Candidate, _conditions: Conditions) -> tuple[str, ...]:
    """One sentence for each part with assumed figures, which names the fields."""
    return tuple(
        f"{part.part}: {', '.join(part.assumed)} assumed at loading; look it up for the part that you have."
        for part in parts_of(candidate.design)
        if part.assumed
    )


CAUTION = Caution("assumed figures", _texts)
