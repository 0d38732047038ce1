"""Gain of one amplifier with four resistors that subtract the two sense lines."""

from __future__ import annotations

from math import sqrt
from typing import ClassVar

from selector.gain.law import Law, LawFigures, Stage
from selector.real import Real


class Difference(Law):
    """G = R2 / R1, two alike of each; not switchable, since both branches would have to change alike."""

    name: ClassVar[str] = "difference"
    common_name: ClassVar[str | None] = "R1"
    switched_name: ClassVar[str | None] = "R2"
    switchable: ClassVar[bool] = False
    copies: ClassVar[int] = 2
    by_feedback: ClassVar[bool] = True

    def gain(self, figures: LawFigures, common_ohm: Real, switched_ohm: Real, on_ohm: Real) -> Real:
        """Return R2 / R1 in V/V."""
        del figures, on_ohm
        return switched_ohm / common_ohm

    def switched_ohm(self, figures: LawFigures, gain: Real, common_ohm: Real, on_ohm: Real) -> Real:
        """Return G R1, ohm."""
        del figures, on_ohm
        return gain * common_ohm

    def common_sensitivity(self, stage: Stage) -> Real:
        """Return -1."""
        return -1.0 + 0.0 * stage.gain

    def switched_sensitivity(self, stage: Stage) -> Real:
        """Return 1."""
        return 1.0 + 0.0 * stage.gain

    def bias_v(self, stage: Stage) -> Real:
        """Return Ios R1, V: equal bias currents meet equal resistances."""
        return stage.figures.offset_current_a * stage.common_ohm

    def noise_ohm(self, stage: Stage) -> Real:
        """Return 2 (R1 + R2 / G^2), ohm."""
        return 2.0 * (stage.common_ohm + stage.switched_ohm / stage.gain**2)

    def current_noise_ohm(self, stage: Stage) -> Real:
        """Return sqrt(2) R1, ohm: two independent currents, referred to the input."""
        return sqrt(2.0) * stage.common_ohm

    def noise_gain(self, gain: Real) -> Real:
        """Return 1 + G."""
        return 1.0 + gain

    def common_mode_v(self, gain: Real, voltage_v: Real, zero_v: Real) -> Real:
        """Return (G V + Vz) / (1 + G), V: the divider to the reference."""
        return (gain * voltage_v + zero_v) / (1.0 + gain)

    def load_siemens(self, stage: Stage) -> Real:
        """Return 1 / (R1 + R2), S."""
        return self.bus_siemens(stage)

    def shunt_load_siemens(self, stage: Stage, *, high_side: bool) -> Real:
        """Return 1 / R1 on the high side, 1 / (R1 + R2) on the low side, S."""
        return 1.0 / stage.common_ohm if high_side else self.bus_siemens(stage)

    def bus_siemens(self, stage: Stage) -> Real:
        """Return 1 / (R1 + R2), S."""
        return 1.0 / (stage.common_ohm + stage.switched_ohm)

    def mismatch_factor(self, gain: Real) -> Real:
        """Return 2 / (1 + G): two ratios, each off by the sum of its resistors' inequalities."""
        return 2.0 / (1.0 + gain)
