"""What a broken joint at the shunt does."""

from __future__ import annotations

from selector.bill.caution import Caution
from selector.candidate import Candidate, Conditions


def _texts(_candidate: Candidate, _conditions: Conditions) -> tuple[str, ...]:
    """Every candidate has a shunt that can come loose."""
    return ("Without its shunt (open joint) the output rises to the supply.",)


CAUTION = Caution("open shunt", _texts)
