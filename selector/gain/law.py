"""What a gain law is: its formula, its sensitivities and what it adds to the errors of a range.

Every method takes floats and arrays alike; arguments broadcast. The formulas are those of the circuit
theory of each network (Kirchhoff's laws with an ideal amplifier), worked out in the law's own file.
"""

from __future__ import annotations

from abc import ABC, abstractmethod
from dataclasses import dataclass
from typing import ClassVar

from selector.real import Real, magnitude


@dataclass(frozen=True, slots=True)
class LawFigures:
    """What a gain law reads of its amplifier; figures of other laws stand at 0.

    `buffered` is 1 where the output is driven by a stage of its own, else 0.
    """

    fixed_gain: Real = 0.0
    gain_base: Real = 1.0
    gain_resistance_ohm: Real = 0.0
    gain_factor: Real = 0.0
    transconductance_s: Real = 0.0
    buffered: Real = 0.0
    bias_a: Real = 0.0
    offset_current_a: Real = 0.0
    output_bias_a: Real = 0.0


@dataclass(frozen=True, slots=True)
class Stage:
    """The gain network of one range: shunt, common and switched resistor, closed switch, and the gain they give."""

    figures: LawFigures
    shunt_ohm: Real
    common_ohm: Real
    switched_ohm: Real
    on_ohm: Real
    gain: Real

    @property
    def branch_ohm(self) -> Real:
        """Return the switched resistor with its closed switch in series, ohm."""
        return self.switched_ohm + self.on_ohm


class Law(ABC):
    """A gain law with the properties most laws have; a law states where it differs."""

    name: ClassVar[str]
    figures: ClassVar[tuple[str, ...]] = ()  # amplifier fields that set its gain
    common_name: ClassVar[str | None] = None  # the resistor that all ranges share
    switched_name: ClassVar[str | None] = None  # the resistor of each range
    switchable: ClassVar[bool] = True
    copies: ClassVar[int] = 1  # alike resistors a board carries for each place
    reads_own_ground: ClassVar[bool] = False
    switch_on_inputs: ClassVar[bool] = False
    by_feedback: ClassVar[bool] = False  # open-loop gain limits the closed loop
    takes_gain_capacitor: ClassVar[bool] = False
    least_common_ohm: ClassVar[float] = 1e3
    least_switched_ohm: ClassVar[float] = 1e3
    most_ohm: ClassVar[float] = 1e6

    @abstractmethod
    def gain(self, figures: LawFigures, common_ohm: Real, switched_ohm: Real, on_ohm: Real) -> Real:
        """Return the nominal gain in V/V."""

    def switched_ohm(self, figures: LawFigures, gain: Real, common_ohm: Real, on_ohm: Real) -> Real:
        """Return the switched resistor that gives a gain beside a common one, ohm: `gain` turned round."""
        del figures
        return 0.0 * (gain + common_ohm + on_ohm)

    def common_sensitivity(self, stage: Stage) -> Real:
        """Return d ln G / d ln R of the common resistor."""
        return 0.0 * stage.gain

    def switched_sensitivity(self, stage: Stage) -> Real:
        """Return d ln G / d ln R of the switched resistor."""
        return 0.0 * stage.gain

    def on_sensitivity_per_ohm(self, stage: Stage) -> Real:
        """Return abs(d ln G / d Ron) in 1/ohm: the switch stands in series with the switched resistor."""
        return magnitude(self.switched_sensitivity(stage)) / stage.switched_ohm

    def bias_v(self, stage: Stage) -> Real:
        """Return the input-referred voltage of the bias currents, V."""
        return stage.figures.bias_a * stage.shunt_ohm

    def leakage_v(self, stage: Stage, leakage_a: Real) -> Real:
        """Return the input-referred voltage of a current that leaks through the open channels, V."""
        return 0.0 * leakage_a * stage.gain

    def noise_ohm(self, stage: Stage) -> Real:
        """Return the input-referred resistance whose thermal noise the network adds, ohm."""
        return 0.0 * stage.gain

    def current_noise_ohm(self, stage: Stage) -> Real:
        """Return the resistance through which the amplifier's current noise becomes input voltage, ohm."""
        return stage.shunt_ohm

    def noise_gain(self, gain: Real) -> Real:
        """Return the gain from the amplifier's own input to the output."""
        return gain

    def common_mode_v(self, gain: Real, voltage_v: Real, zero_v: Real) -> Real:
        """Return what the amplifier's own inputs see of a voltage on the sense lines, V."""
        return voltage_v + 0.0 * zero_v * gain

    def output_ohm(self, stage: Stage) -> Real:
        """Return the resistance behind which the output filter sees the output, ohm."""
        return 0.0 * stage.gain

    def load_siemens(self, stage: Stage) -> Real:
        """Return the conductance that the network puts on the output, S."""
        return 0.0 * stage.gain

    def shunt_load_siemens(self, stage: Stage, *, high_side: bool) -> Real:
        """Return the conductance by which the network takes current past the shunt's reading, S."""
        return 0.0 * stage.gain * high_side

    def bus_siemens(self, stage: Stage) -> Real:
        """Return the conductance of each branch from a sense line at bus voltage, S."""
        return 0.0 * stage.gain

    def mismatch_factor(self, gain: Real) -> Real:
        """Return how much of the common mode one unit of resistor inequality brings to the input, V/V."""
        return 0.0 * gain
