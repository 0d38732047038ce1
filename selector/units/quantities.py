"""Every quantity that a spec, a part or a result has."""

from __future__ import annotations

from collections.abc import Mapping
from types import MappingProxyType

from selector.units.quantity import Quantity

RESISTANCE = Quantity("resistance", "ohm", bare_in_stock=True, example="4.7 kohm", heading="ohm")
CAPACITANCE = Quantity("capacitance", "F", bare_in_stock=True, example="100 nF", heading="F")
INDUCTANCE = Quantity("inductance", "H", bare_in_stock=False, example="5 nH", heading="H")
VOLTAGE = Quantity("voltage", "V", bare_in_stock=True, example="100 mV", heading="V")
CURRENT = Quantity("current", "A", bare_in_stock=True, example="60 mA", heading="A")
POWER = Quantity("power", "W", bare_in_stock=True, example="1/8 W", heading="W", fractions=True)
ENERGY = Quantity("energy", "J", bare_in_stock=False, example="50 mJ", heading="J")
TIME = Quantity("time", "s", bare_in_stock=False, example="10 ms", heading="s")
FREQUENCY = Quantity("frequency", "Hz", bare_in_stock=False, example="10 kHz", heading="Hz")
TEMPERATURE = Quantity("temperature", "degC", bare_in_stock=True, example="25 degC", heading="degC")
TEMPERATURE_DIFFERENCE = Quantity("temperature difference", "K", bare_in_stock=False, example="1 K", heading="K")
FRACTION = Quantity("fraction", "1", bare_in_stock=False, example="0.1 %", heading="%", plus_minus=True)
PER_KELVIN = Quantity(
    "temperature coefficient", "1/K", bare_in_stock=False, example="25 ppm/K", heading="ppm/K", plus_minus=True
)
VOLT_PER_KELVIN = Quantity(
    "voltage drift", "V/K", bare_in_stock=False, example="0.1 uV/K", heading="V/K", plus_minus=True
)
AMPERE_PER_KELVIN = Quantity(
    "current drift", "A/K", bare_in_stock=False, example="10 pA/K", heading="A/K", plus_minus=True
)
THERMAL_RESISTANCE = Quantity("thermal resistance", "K/W", bare_in_stock=False, example="340 K/W", heading="K/W")
DECIBEL = Quantity("ratio in dB", "dB", bare_in_stock=True, example="110 dB", heading="dB")
VOLTAGE_NOISE = Quantity("voltage noise density", "V/rtHz", bare_in_stock=False, example="8 nV/rtHz", heading="V/rtHz")
CURRENT_NOISE = Quantity("current noise density", "A/rtHz", bare_in_stock=False, example="5 fA/rtHz", heading="A/rtHz")
SLEW_RATE = Quantity("slew rate", "V/s", bare_in_stock=False, example="0.5 V/us", heading="V/s")
CONDUCTANCE = Quantity("conductance", "S", bare_in_stock=False, example="1 mS", heading="S")
COUNT = Quantity("whole number", "", bare_in_stock=True, example="12", heading="", whole=True)
RATIO = Quantity("plain number", "", bare_in_stock=True, example="100", heading="")
LSB = Quantity(
    "figure in LSB", "LSB", bare_in_stock=False, example="0.5 LSB", heading="LSB", plus_minus=True, fractions=True
)
MONEY = Quantity("price", "", bare_in_stock=True, example="0.38", heading="")

QUANTITIES: Mapping[str, Quantity] = MappingProxyType(
    {
        quantity.name: quantity
        for quantity in (
            RESISTANCE,
            CAPACITANCE,
            INDUCTANCE,
            VOLTAGE,
            CURRENT,
            POWER,
            ENERGY,
            TIME,
            FREQUENCY,
            TEMPERATURE,
            TEMPERATURE_DIFFERENCE,
            FRACTION,
            PER_KELVIN,
            VOLT_PER_KELVIN,
            AMPERE_PER_KELVIN,
            THERMAL_RESISTANCE,
            DECIBEL,
            VOLTAGE_NOISE,
            CURRENT_NOISE,
            SLEW_RATE,
            CONDUCTANCE,
            COUNT,
            RATIO,
            LSB,
            MONEY,
        )
    }
)
