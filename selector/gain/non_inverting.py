"""Gain set by two resistors around a non-inverting stage."""

from __future__ import annotations

from typing import ClassVar

from selector.gain.law import Law, LawFigures, Stage
from selector.real import Real


class NonInverting(Law):
    """G = 1 + Rf / (Rg + Ron); Rf is common to all ranges, Rg is switched.

    The stage reads against its own ground, so it serves the low side with its zero at ground only.
    """

    name: ClassVar[str] = "non-inverting"
    common_name: ClassVar[str | None] = "Rf"
    switched_name: ClassVar[str | None] = "Rg"
    reads_own_ground: ClassVar[bool] = True
    by_feedback: ClassVar[bool] = True
    least_switched_ohm: ClassVar[float] = 100.0

    def gain(self, figures: LawFigures, common_ohm: Real, switched_ohm: Real, on_ohm: Real) -> Real:
        """Return 1 + Rf / (Rg + Ron) in V/V."""
        del figures
        return 1.0 + common_ohm / (switched_ohm + on_ohm)

    def switched_ohm(self, figures: LawFigures, gain: Real, common_ohm: Real, on_ohm: Real) -> Real:
        """Return Rf / (G - 1) - Ron, ohm."""
        del figures
        return common_ohm / (gain - 1.0) - on_ohm

    def common_sensitivity(self, stage: Stage) -> Real:
        """Return 1 - 1/G."""
        return 1.0 - 1.0 / stage.gain

    def switched_sensitivity(self, stage: Stage) -> Real:
        """Return -(1 - 1/G) Rg / (Rg + Ron)."""
        return -(1.0 - 1.0 / stage.gain) * stage.switched_ohm / stage.branch_ohm

    def bias_v(self, stage: Stage) -> Real:
        """Return Ib (Rf || (Rg + Ron)) + Ib Rs, V: one input sees the network, the other the shunt."""
        return stage.figures.bias_a * self._feedback_ohm(stage) + stage.figures.bias_a * stage.shunt_ohm

    def leakage_v(self, stage: Stage, leakage_a: Real) -> Real:
        """Return I Rf / G, V: what leaks away from the summing point comes through Rf."""
        return leakage_a * stage.common_ohm / stage.gain

    def noise_ohm(self, stage: Stage) -> Real:
        """Return Rf || (Rg + Ron), ohm."""
        return self._feedback_ohm(stage)

    def current_noise_ohm(self, stage: Stage) -> Real:
        """Return Rf || (Rg + Ron), ohm."""
        return self._feedback_ohm(stage)

    def load_siemens(self, stage: Stage) -> Real:
        """Return 1 / (Rf + Rg + Ron), S."""
        return 1.0 / (stage.common_ohm + stage.switched_ohm + stage.on_ohm)

    @staticmethod
    def _feedback_ohm(stage: Stage) -> Real:
        return stage.common_ohm * stage.branch_ohm / (stage.common_ohm + stage.branch_ohm)
