"""Gain of a part that puts out a current, set by its load resistor."""

from __future__ import annotations

from typing import ClassVar

from selector.gain.law import Law, LawFigures, Stage
from selector.real import Real


class CurrentOutput(Law):
    """G = transconductance (RL + Ron); RL is switched at the output."""

    name: ClassVar[str] = "current-output"
    figures: ClassVar[tuple[str, ...]] = ("transconductance",)
    switched_name: ClassVar[str | None] = "RL"

    def gain(self, figures: LawFigures, common_ohm: Real, switched_ohm: Real, on_ohm: Real) -> Real:
        """Return transconductance (RL + Ron) in V/V."""
        del common_ohm
        return figures.transconductance_s * (switched_ohm + on_ohm)

    def switched_ohm(self, figures: LawFigures, gain: Real, common_ohm: Real, on_ohm: Real) -> Real:
        """Return G / transconductance - Ron, ohm."""
        del common_ohm
        return gain / figures.transconductance_s - on_ohm

    def switched_sensitivity(self, stage: Stage) -> Real:
        """Return RL / (RL + Ron)."""
        return stage.switched_ohm / stage.branch_ohm

    def leakage_v(self, stage: Stage, leakage_a: Real) -> Real:
        """Return I (RL + Ron) / G, V."""
        return leakage_a * stage.branch_ohm / stage.gain

    def noise_ohm(self, stage: Stage) -> Real:
        """Return (RL + Ron) / G^2, ohm."""
        return stage.branch_ohm / stage.gain**2

    def output_ohm(self, stage: Stage) -> Real:
        """Return RL + Ron, ohm; 0 behind a buffer."""
        return stage.branch_ohm * (1.0 - stage.figures.buffered)

    def load_siemens(self, stage: Stage) -> Real:
        """Return 1 / (RL + Ron), S."""
        return 1.0 / stage.branch_ohm
