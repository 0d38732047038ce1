"""What the figures are, and what they are not."""

from __future__ import annotations

from selector.bill.caution import Caution
from selector.candidate import Candidate, Conditions


def _texts(_candidate: Candidate, _conditions: Conditions) -> tuple[str, ...]:
    """Always, and last."""
    return (
        (
            "Figures are limits computed from the data entered for these parts; measure a board before you rely on "
            "them. Follow local codes and licensed practice."
        ),
    )


CAUTION = Caution("measure first", _texts)
