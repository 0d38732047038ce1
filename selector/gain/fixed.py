"""Gain set inside the amplifier."""

from __future__ import annotations

from typing import ClassVar

from selector.gain.law import Law, LawFigures, Stage
from selector.real import Real


class Fixed(Law):
    """G = gain; no resistor sets it, so there is one range."""

    name: ClassVar[str] = "fixed"
    figures: ClassVar[tuple[str, ...]] = ("gain",)
    switchable: ClassVar[bool] = False

    def gain(self, figures: LawFigures, common_ohm: Real, switched_ohm: Real, on_ohm: Real) -> Real:
        """Return the gain in V/V that the part states."""
        return figures.fixed_gain + 0.0 * (common_ohm + switched_ohm + on_ohm)

    def on_sensitivity_per_ohm(self, stage: Stage) -> Real:
        """Return 0: there is no switch."""
        return 0.0 * stage.gain
