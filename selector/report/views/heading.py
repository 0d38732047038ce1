"""What was asked for, in one line under the title."""

from __future__ import annotations

from selector.spec import Spec
from selector.units import CURRENT, VOLTAGE, shown


def heading_of(spec: Spec) -> tuple[str, ...]:
    """Return the title, where there is one, and the gist of a spec."""
    current = spec.current
    span = f"{shown(current.min, CURRENT)} to {shown(current.max, CURRENT)}"
    ways = " both ways" if current.two_way else ""
    supply = shown(spec.supply.voltage, VOLTAGE)
    gist = f"{span}{ways}, {spec.sense.side} side, {supply} supply, {spec.converter.bits} bit, {spec.accuracy.method}"
    return (spec.title, gist) if spec.title else (gist,)
