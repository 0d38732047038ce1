"""Gain set by the ratio of a load resistor to an input resistor, times a factor of the part."""

from __future__ import annotations

from typing import ClassVar

from selector.gain.law import Law, LawFigures, Stage
from selector.real import Real


class TwoResistor(Law):
    """G = gain_factor (R2 + Ron) / R1; R1 is common to all ranges, R2 is switched at the output."""

    name: ClassVar[str] = "two-resistor"
    figures: ClassVar[tuple[str, ...]] = ("gain_factor",)
    common_name: ClassVar[str | None] = "R1"
    switched_name: ClassVar[str | None] = "R2"
    takes_gain_capacitor: ClassVar[bool] = True

    def gain(self, figures: LawFigures, common_ohm: Real, switched_ohm: Real, on_ohm: Real) -> Real:
        """Return gain_factor (R2 + Ron) / R1 in V/V."""
        return figures.gain_factor * (switched_ohm + on_ohm) / common_ohm

    def switched_ohm(self, figures: LawFigures, gain: Real, common_ohm: Real, on_ohm: Real) -> Real:
        """Return G R1 / gain_factor - Ron, ohm."""
        return gain * common_ohm / figures.gain_factor - on_ohm

    def common_sensitivity(self, stage: Stage) -> Real:
        """Return -1."""
        return -1.0 + 0.0 * stage.gain

    def switched_sensitivity(self, stage: Stage) -> Real:
        """Return R2 / (R2 + Ron)."""
        return stage.switched_ohm / stage.branch_ohm

    def bias_v(self, stage: Stage) -> Real:
        """Return Ib (Rs + R1) + Ibo (R2 + Ron) / G, V."""
        at_input_v = stage.figures.bias_a * (stage.shunt_ohm + stage.common_ohm)
        return at_input_v + stage.figures.output_bias_a * stage.branch_ohm / stage.gain

    def leakage_v(self, stage: Stage, leakage_a: Real) -> Real:
        """Return I (R2 + Ron) / G, V."""
        return leakage_a * stage.branch_ohm / stage.gain

    def noise_ohm(self, stage: Stage) -> Real:
        """Return R1 + (R2 + Ron) / G^2, ohm."""
        return stage.common_ohm + stage.branch_ohm / stage.gain**2

    def current_noise_ohm(self, stage: Stage) -> Real:
        """Return R1, ohm."""
        return stage.common_ohm + 0.0 * stage.gain

    def output_ohm(self, stage: Stage) -> Real:
        """Return R2 + Ron, ohm; 0 behind a buffer."""
        return stage.branch_ohm * (1.0 - stage.figures.buffered)

    def load_siemens(self, stage: Stage) -> Real:
        """Return 1 / (R2 + Ron), S."""
        return 1.0 / stage.branch_ohm
