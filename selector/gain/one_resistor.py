"""Gain of an instrumentation amplifier set by one resistor between two of its pins."""

from __future__ import annotations

from typing import ClassVar

from selector.gain.law import Law, LawFigures, Stage
from selector.real import Real


class OneResistor(Law):
    """G = gain_base + gain_resistance / (Rg + Ron); Rg is switched, at the inputs' common mode."""

    name: ClassVar[str] = "one-resistor"
    figures: ClassVar[tuple[str, ...]] = ("gain_base", "gain_resistance")
    switched_name: ClassVar[str | None] = "Rg"
    switch_on_inputs: ClassVar[bool] = True
    least_switched_ohm: ClassVar[float] = 100.0

    def gain(self, figures: LawFigures, common_ohm: Real, switched_ohm: Real, on_ohm: Real) -> Real:
        """Return gain_base + gain_resistance / (Rg + Ron) in V/V."""
        del common_ohm
        return figures.gain_base + figures.gain_resistance_ohm / (switched_ohm + on_ohm)

    def switched_ohm(self, figures: LawFigures, gain: Real, common_ohm: Real, on_ohm: Real) -> Real:
        """Return gain_resistance / (G - gain_base) - Ron, ohm."""
        del common_ohm
        return figures.gain_resistance_ohm / (gain - figures.gain_base) - on_ohm

    def switched_sensitivity(self, stage: Stage) -> Real:
        """Return -(1 - gain_base/G) Rg / (Rg + Ron)."""
        return -self._set_share(stage) * stage.switched_ohm / stage.branch_ohm

    def leakage_v(self, stage: Stage, leakage_a: Real) -> Real:
        """Return I gain_resistance / G, V: both ends of the open channel leak."""
        return leakage_a * stage.figures.gain_resistance_ohm / stage.gain

    def noise_ohm(self, stage: Stage) -> Real:
        """Return (Rg + Ron) (1 - gain_base/G)^2, ohm."""
        return stage.branch_ohm * self._set_share(stage) ** 2

    @staticmethod
    def _set_share(stage: Stage) -> Real:
        return 1.0 - stage.figures.gain_base / stage.gain
