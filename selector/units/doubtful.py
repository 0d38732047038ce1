"""Units that a person knows and that are refused, with what to say to each. Data only.

`{}` stands for the number as it was written.
"""

from __future__ import annotations

from selector.units.quantities import (
    CAPACITANCE,
    COUNT,
    CURRENT,
    ENERGY,
    FRACTION,
    FREQUENCY,
    INDUCTANCE,
    MONEY,
    POWER,
    RATIO,
    TEMPERATURE,
    TIME,
    VOLTAGE,
)
from selector.units.quantity import Quantity

# (both readings, remedy) of a unit that has two.
TWO_READINGS: dict[tuple[Quantity, str], tuple[str, str, str]] = {
    (TIME, "m"): ("{} ms", "{} minutes", "write {} ms, or the time in s"),
    (CAPACITANCE, "f"): ("{} fF", "{} F", "write the one that is meant"),
    **{
        (quantity, "K"): (f"{{}} k{quantity.unit}", "{} kelvin", f"write {{}} k{quantity.unit}")
        for quantity in (VOLTAGE, CURRENT, POWER, ENERGY, FREQUENCY)
    },
}

# (what it is, remedy) of a unit that has one reading, which is not taken.
NOT_TAKEN: dict[tuple[Quantity, str], tuple[str, str]] = {
    (TEMPERATURE, "K"): ("is in kelvin", 'a temperature is wanted in degC, for example "25 degC"'),
    (TEMPERATURE, "k"): ("is in kelvin", 'a temperature is wanted in degC, for example "25 degC"'),
    (TEMPERATURE, "F"): ("is in degrees Fahrenheit", 'a temperature is wanted in degC, for example "25 degC"'),
    (TEMPERATURE, "degF"): ("is in degrees Fahrenheit", 'a temperature is wanted in degC, for example "25 degC"'),
    (TIME, "min"): ("is in minutes", 'a time is wanted in s, for example "60 s"'),
    (TIME, "h"): ("is in hours", 'a time is wanted in s, for example "3600 s"'),
    (VOLTAGE, "Vrms"): ("is an rms figure", 'a peak-to-peak figure is wanted, for example "1 mVpp"'),
    (CAPACITANCE, "MFD"): ("is in MFD, which may be milli or micro", 'write it like "10 uF"'),
    (FRACTION, "K"): ("has a K, which is kilo, kelvin or 10 %", "write it like 0.1 %, or the tolerance letter K alone"),
    (INDUCTANCE, "R"): ("has a letter of resistance", 'write it like "4.7 uH" or 4u7'),
}

# Quantities without a unit: what to do with whatever stands behind the number.
NO_UNIT: dict[Quantity, str] = {
    COUNT: "write the number alone",
    RATIO: "write the number alone",
    MONEY: "write the number alone; the currency has a field of its own",
}
