"""Sections of the spec that describe the circuit around the measurement."""

from __future__ import annotations

from typing import Annotated, Literal

from selector.spec.demand import Section
from selector.spec.holds import amount, choice, count, fraction, temperature, value
from selector.units import CURRENT, LSB, PER_KELVIN, RESISTANCE, TEMPERATURE_DIFFERENCE, VOLTAGE


class Supply(Section):
    """The supply of amplifier and range switch."""

    voltage: Annotated[float, value(VOLTAGE, "supply of amplifier and range switch", "3.3 V")]
    tolerance: Annotated[float, fraction("of the supply, either way", "5 %")] = 0.05


class Sense(Section):
    """Where the shunt lies."""

    side: Annotated[Literal["low", "high"], choice("shunt in the return or in the bus", "low", "high")] = "low"
    bus_min: Annotated[float | None, amount(VOLTAGE, "lowest bus voltage; needed at the high side", "3 V")] = None
    bus_nominal: Annotated[float | None, amount(VOLTAGE, "nominal bus voltage; needed at the high side", "3.3 V")] = (
        None
    )
    bus_max: Annotated[float | None, amount(VOLTAGE, "highest bus voltage; needed at the high side", "3.6 V")] = None
    lead: Annotated[float, amount(RESISTANCE, "copper in series with the shunt", "0 ohm")] = 0.0


class Output(Section):
    """The window in which the output must stay, and its zero."""

    low: Annotated[float, amount(VOLTAGE, "lowest output voltage to be used", "0 V")] = 0.0
    high: Annotated[float | None, value(VOLTAGE, "highest output voltage to be used, else the supply", "3.3 V")] = None
    zero: Annotated[float, amount(VOLTAGE, "output at no current", "0 V")] = 0.0
    zero_tolerance: Annotated[
        float | None, fraction("of zero to the converter's reference; needed where zero > 0", "0.1 %")
    ] = None
    zero_drift: Annotated[
        float | None, amount(PER_KELVIN, "of zero to the converter's reference; needed where zero > 0", "10 ppm/K")
    ] = None


class Converter(Section):
    """The converter that reads the output."""

    bits: Annotated[int, count("resolution", "12", 4, 32)]
    reference: Annotated[float, value(VOLTAGE, "reference, the input at full scale", "2.5 V")]
    reference_tolerance: Annotated[float, fraction("of the reference, either way", "0.1 %")] = 0.0
    reference_drift: Annotated[float, amount(PER_KELVIN, "of the reference", "10 ppm/K")] = 0.0
    offset: Annotated[float, amount(VOLTAGE, "largest offset, either way", "1 mV")] = 0.0
    inl: Annotated[float, amount(LSB, "integral nonlinearity", "1 LSB")] = 0.0
    gain_error: Annotated[float, fraction("largest gain error, either way", "0.1 %")] = 0.0
    noise: Annotated[float, amount(VOLTAGE, "standard deviation of one reading", "200 uV")] = 0.0
    input_current: Annotated[
        float, amount(CURRENT, "hot leakage plus sample rate x sampling capacitor x reference", "10 nA")
    ] = 0.0
    input_resistance: Annotated[float | None, value(RESISTANCE, "resistance of the input to ground", "1 Mohm")] = None
    input_max: Annotated[float | None, value(VOLTAGE, "highest voltage the pin stands", "3.6 V")] = None
    clamp_current: Annotated[float, amount(CURRENT, "current the pin's clamp stands", "1 mA")] = 0.0
    average: Annotated[int, count("readings averaged into one", "1", 1)] = 1


class Ambient(Section):
    """The temperatures around the board."""

    min: Annotated[float, temperature("lowest ambient temperature", "-20 degC")]
    nominal: Annotated[float, temperature("temperature of the parts' figures and of calibration", "25 degC")] = 25.0
    max: Annotated[float, temperature("highest ambient temperature", "50 degC")]
    gradient: Annotated[float, amount(TEMPERATURE_DIFFERENCE, "between the ends of the shunt", "1 K")] = 1.0
