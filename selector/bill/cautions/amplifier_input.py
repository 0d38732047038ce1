"""Whether the amplifier's input stands the overload is not known."""

from __future__ import annotations

from selector.bill.caution import Caution
from selector.candidate import Candidate, Conditions
from selector.units import CURRENT, VOLTAGE, shown


def _texts(candidate: Candidate, conditions: Conditions) -> tuple[str, ...]:
    """The spec states an overload and the amplifier no `input_max`."""
    amplifier, shunt = candidate.design.amplifier, candidate.design.shunts[-1]
    if conditions.overload_a == 0.0 or amplifier.input_max is not None:
        return ()
    drop_v = conditions.largest_current_a * shunt.resistance * (1.0 + shunt.tolerance)
    return (
        (
            f"{amplifier.part} states no input_max: see that it stands {shown(drop_v, VOLTAGE)} between its inputs at "
            f"{shown(conditions.largest_current_a, CURRENT)}."
        ),
    )


CAUTION = Caution("amplifier input", _texts)
