"""A small shunt without a stated inductance at a high bandwidth."""

from __future__ import annotations

from selector.bill.caution import Caution
from selector.candidate import Candidate, Conditions
from selector.units import FREQUENCY, shown

SMALL_OHM = 10e-3  # below it a few nanohenry matter; common practice, no source
FAST_HZ = 10e3


def _texts(candidate: Candidate, conditions: Conditions) -> tuple[str, ...]:
    """The reading rises where the inductance's voltage nears that of the resistance."""
    shunt = candidate.design.shunts[-1]
    if shunt.inductance is not None or shunt.resistance >= SMALL_OHM or conditions.bandwidth_hz <= FAST_HZ:
        return ()
    return (
        (
            f"Shunt {shunt.part} states no inductance: at {shown(conditions.bandwidth_hz, FREQUENCY)} a few nanohenry "
            "may raise its reading."
        ),
    )


CAUTION = Caution("inductance", _texts)
