"""Power, burden and headroom of a design, read off its last range."""

from __future__ import annotations

from selector.candidate.operating import Operating, Pairing
from selector.real import Real


def shunt_power_w(at: Operating | Pairing) -> Real:
    """Return the largest power in the shunt, I_max^2 Rs (1 + tolerance), W."""
    return at.conditions.current_max_a**2 * at.shunt.most_ohm


def idle_power_w(at: Operating | Pairing) -> Real:
    """Return the power of shunt and amplifier without what the output drives, W: a lower bound of the power."""
    return shunt_power_w(at) + at.conditions.supply_max_v * at.amplifier.supply_a


def power_w(at: Operating) -> Real:
    """Return the largest power of a design from its last range, W.

    Shunt, amplifier, the current that the output drives into the gain network, and at the high side what two
    branches of a network draw from the bus.
    """
    conditions = at.conditions
    driven_a = (conditions.zero_v + at.transfer_ohm * conditions.current_max_a) * at.law.load_siemens(at.stage)
    bus_w = 2.0 * conditions.bus_max_v**2 * at.law.bus_siemens(at.stage)
    supplied_w = conditions.supply_max_v * (at.amplifier.supply_a + driven_a)
    return shunt_power_w(at) + supplied_w + bus_w


def headroom_frac(at: Operating) -> Real:
    """Return the share of the span that the last range leaves at the largest current."""
    return 1.0 - at.transfer_ohm * at.conditions.current_max_a / at.window.span_v


def use_headroom(at: Operating) -> Real:
    """Return (1 - headroom) / (1 - least headroom)."""
    return (1.0 - headroom_frac(at)) / (1.0 - at.conditions.headroom_limit_frac)
