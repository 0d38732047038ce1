"""Amplifiers, with the gain law each follows."""

from __future__ import annotations

from typing import Annotated, ClassVar

from selector.gain import LAWS
from selector.parts.base import Part, Text
from selector.parts.holds import FLAG, amount, choice, decibels, fraction, signed, temperature, value
from selector.parts.law_figures import buffered_gain_capacitor, figures_of_the_law
from selector.parts.rules import Rule, not_below
from selector.units import (
    AMPERE_PER_KELVIN,
    CONDUCTANCE,
    CURRENT,
    CURRENT_NOISE,
    FREQUENCY,
    PER_KELVIN,
    RATIO,
    RESISTANCE,
    SLEW_RATE,
    VOLT_PER_KELVIN,
    VOLTAGE,
    VOLTAGE_NOISE,
)

Volt = Annotated[float, amount(VOLTAGE)]
MaybeVolt = Annotated[float | None, amount(VOLTAGE)]


class Amplifier(Part):
    """An amplifier: V, A, Hz, dB, V/K, A/K, V/sqrt(Hz), A/sqrt(Hz), degC; limits, not typical figures.

    `swing_high` is the distance from the positive supply, `swing_low` the lowest output above ground.
    """

    kind: ClassVar[str] = "amplifier"
    rules: ClassVar[tuple[Rule, ...]] = (
        figures_of_the_law,
        buffered_gain_capacitor,
        not_below("common_mode_max", "common_mode_min"),
        not_below("supply_max", "supply_min"),
        not_below("temp_max", "temp_min"),
        not_below("resistance_max", "resistance_min"),
    )

    gain_law: Annotated[str, choice(*LAWS)]
    gain: Annotated[float | None, value(RATIO)] = None
    gain_base: Annotated[float, amount(RATIO)] = 1.0
    gain_resistance: Annotated[float | None, value(RESISTANCE)] = None
    gain_factor: Annotated[float | None, value(RATIO)] = None
    transconductance: Annotated[float | None, value(CONDUCTANCE)] = None
    offset: Volt
    offset_drift: Annotated[float, amount(VOLT_PER_KELVIN)]
    output_offset: Volt = 0.0
    output_offset_drift: Annotated[float, amount(VOLT_PER_KELVIN)] = 0.0
    bias_current: Annotated[float, amount(CURRENT)]
    bias_current_drift: Annotated[float | None, amount(AMPERE_PER_KELVIN)] = None
    offset_current: Annotated[float | None, amount(CURRENT)] = None
    output_bias_current: Annotated[float, amount(CURRENT)] = 0.0
    cmrr: Annotated[float, decibels()]
    psrr: Annotated[float, decibels()]
    gain_error: Annotated[float, fraction()] = 0.0
    gain_drift: Annotated[float, amount(PER_KELVIN)] = 0.0
    nonlinearity: Annotated[float, fraction()] = 0.0
    open_loop_gain: Annotated[float | None, decibels()] = None
    noise_density: Annotated[float, value(VOLTAGE_NOISE)]
    output_noise_density: Annotated[float, amount(VOLTAGE_NOISE)] = 0.0
    current_noise_density: Annotated[float, amount(CURRENT_NOISE)] = 0.0
    low_frequency_noise: Volt = 0.0
    gain_bandwidth: Annotated[float | None, value(FREQUENCY)] = None
    bandwidth: Annotated[float | None, value(FREQUENCY)] = None
    swing_high: Volt
    swing_low: Volt
    common_mode_min: Annotated[float, signed(VOLTAGE)]
    common_mode_max: MaybeVolt = None
    common_mode_top_gap: MaybeVolt = None
    common_mode_test: Volt = 0.0
    supply_test: Annotated[float | None, value(VOLTAGE)] = None
    input_max: Annotated[float | None, value(VOLTAGE)] = None
    slew_rate: Annotated[float | None, value(SLEW_RATE)] = None
    buffered: Annotated[bool, FLAG] = False
    gain_capacitor: Annotated[bool, FLAG] = False
    supply_min: Volt
    supply_max: Annotated[float, value(VOLTAGE)]
    supply_current: Annotated[float, amount(CURRENT)]
    temp_min: Annotated[float, temperature()]
    temp_max: Annotated[float, temperature()]
    reference_pin: Annotated[bool, FLAG] = False
    resistance_min: Annotated[float | None, value(RESISTANCE)] = None
    resistance_max: Annotated[float | None, value(RESISTANCE)] = None
    package: Text = ""

    @property
    def offset_current_a(self) -> float:
        """Return the difference of the two input currents, A: the bias current where the part states none."""
        return self.bias_current if self.offset_current is None else self.offset_current
