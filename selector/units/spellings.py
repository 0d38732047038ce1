"""How units are spelled: prefixes, units of each quantity, letter codes. Data only.

Texts stand here as they are after `characters.plain`: micro is `u`, the ohm sign `ohm`, the degree sign `deg`, the root
sign `rt`, and there are no spaces.
"""

from __future__ import annotations

from dataclasses import dataclass

from selector.units.quantities import (
    AMPERE_PER_KELVIN,
    CAPACITANCE,
    CONDUCTANCE,
    CURRENT,
    CURRENT_NOISE,
    DECIBEL,
    ENERGY,
    FRACTION,
    FREQUENCY,
    INDUCTANCE,
    LSB,
    PER_KELVIN,
    POWER,
    RATIO,
    RESISTANCE,
    SLEW_RATE,
    TEMPERATURE,
    TEMPERATURE_DIFFERENCE,
    THERMAL_RESISTANCE,
    TIME,
    VOLT_PER_KELVIN,
    VOLTAGE,
    VOLTAGE_NOISE,
)
from selector.units.quantity import Quantity

PREFIXES: dict[str, int] = {
    "a": -18,
    "f": -15,
    "p": -12,
    "n": -9,
    "u": -6,
    "m": -3,
    "k": 3,
    "M": 6,
    "G": 9,
    "T": 12,
    # capitals that lists in capitals write, and that no prefix up to tera has
    "P": -12,
    "N": -9,
    "U": -6,
    "K": 3,
}

SMALL = "afpPnNuUm"
KILO = "kK"


@dataclass(frozen=True, slots=True)
class Spelling:
    """One way to write a unit: its text, its size as a power of ten, the prefixes it takes."""

    text: str
    exponent: int = 0
    prefixes: str = ""


def _each(texts: str, prefixes: str = "", exponent: int = 0) -> tuple[Spelling, ...]:
    """Return one spelling for each word of `texts`."""
    return tuple(Spelling(text, exponent, prefixes) for text in texts.split())


_ROOT_HERTZ = ("rtHz", "rt(Hz)", "sqrt(Hz)", "sqrtHz", "rootHz", "Hz^0.5", "Hz^(1/2)", "Hz^1/2")

UNITS: dict[Quantity, tuple[Spelling, ...]] = {
    RESISTANCE: _each("ohm Ohm ohms Ohms R", SMALL + KILO + "MGT"),
    CAPACITANCE: _each("F", SMALL),
    INDUCTANCE: _each("H", SMALL),
    VOLTAGE: _each("V Vpp Vp-p Vdc VDC", SMALL + KILO),
    CURRENT: _each("A", SMALL + KILO),
    POWER: _each("W", SMALL + KILO),
    ENERGY: _each("J Ws W*s", SMALL + KILO),
    TIME: _each("s", SMALL),
    FREQUENCY: _each("Hz", "um" + KILO + "MGT"),
    TEMPERATURE: _each("degC C"),
    TEMPERATURE_DIFFERENCE: (*_each("K", SMALL), *_each("degC C")),
    FRACTION: (
        *_each("1"),
        *_each("%", exponent=-2),
        *_each("‰", exponent=-3),
        *_each("ppm", exponent=-6),
        *_each("ppb", exponent=-9),
    ),
    PER_KELVIN: (
        *_each("1/K /K 1/degC /degC"),
        *_each("%/K %/degC %/C", exponent=-2),
        *_each("‰/K ‰/degC ‰/C", exponent=-3),
        *_each("ppm/K ppm/degC ppm/C ppm", exponent=-6),
        *_each("ppb/K ppb/degC ppb/C", exponent=-9),
    ),
    VOLT_PER_KELVIN: _each("V/K V/degC V/C", SMALL),
    AMPERE_PER_KELVIN: _each("A/K A/degC A/C", SMALL),
    THERMAL_RESISTANCE: (*_each("K/W", "m" + KILO), *_each("degC/W C/W"), *_each("K/mW degC/mW C/mW", exponent=3)),
    DECIBEL: _each("dB"),
    VOLTAGE_NOISE: _each(" ".join("V/" + root for root in _ROOT_HERTZ), SMALL),
    CURRENT_NOISE: _each(" ".join("A/" + root for root in _ROOT_HERTZ), SMALL),
    SLEW_RATE: (
        *_each("V/s", SMALL + KILO + "M"),
        *_each("V/ms", "um" + KILO, exponent=3),
        *_each("V/us", "um" + KILO, exponent=6),
        *_each("V/ns", "m", exponent=9),
    ),
    CONDUCTANCE: _each("S A/V", SMALL),
    RATIO: _each("1 V/V"),
    LSB: _each("LSB"),
}

# Quantities whose unit may be left out behind a prefix: `2.2u` of a capacitance.
PREFIX_ALONE: tuple[Quantity, ...] = (
    RESISTANCE,
    CAPACITANCE,
    INDUCTANCE,
    VOLTAGE,
    CURRENT,
    POWER,
    ENERGY,
    TIME,
    FREQUENCY,
    CONDUCTANCE,
)

# The letters that may stand alone. Small a and f are left out: they are as well ampere and farad in small letters.
ALONE = "pnumkMGT"
ALONE_IN_CAPITALS: dict[Quantity, str] = {RESISTANCE: "K", CAPACITANCE: "PNU", INDUCTANCE: "PNU"}
