"""In which unit a figure of a given size is written. Data only."""

from __future__ import annotations

from dataclasses import dataclass

from selector.units.quantities import (
    AMPERE_PER_KELVIN,
    CAPACITANCE,
    CONDUCTANCE,
    CURRENT,
    CURRENT_NOISE,
    ENERGY,
    FRACTION,
    FREQUENCY,
    INDUCTANCE,
    PER_KELVIN,
    POWER,
    RESISTANCE,
    SLEW_RATE,
    TIME,
    VOLT_PER_KELVIN,
    VOLTAGE,
    VOLTAGE_NOISE,
)
from selector.units.quantity import Quantity
from selector.units.spellings import PREFIXES


@dataclass(frozen=True, slots=True)
class Step:
    """A unit to write in: its text, its power of ten, and the power of ten from which figures are written in it."""

    text: str
    exponent: int
    start: int


def _steps(unit: str, prefixes: str) -> tuple[Step, ...]:
    """Return the steps of a unit, largest first; `1` among the prefixes stands for none."""
    sizes = ((prefix.replace("1", ""), PREFIXES.get(prefix, 0)) for prefix in prefixes)
    return tuple(Step(prefix + unit, size, size) for prefix, size in sizes)


# Whatever is not named here is written in its own unit alone.
STEPS: dict[Quantity, tuple[Step, ...]] = {
    RESISTANCE: _steps("ohm", "GMk1mu"),
    CAPACITANCE: _steps("F", "1munp"),
    INDUCTANCE: _steps("H", "1munp"),
    VOLTAGE: _steps("V", "k1mun"),
    CURRENT: _steps("A", "k1munpf"),
    POWER: _steps("W", "k1munp"),
    ENERGY: _steps("J", "k1mun"),
    TIME: _steps("s", "1munp"),
    FREQUENCY: _steps("Hz", "GMk1m"),
    FRACTION: (Step("%", -2, -4), Step("ppm", -6, -7), Step("ppb", -9, -9)),
    PER_KELVIN: (Step("ppm/K", -6, -6),),
    VOLT_PER_KELVIN: _steps("V/K", "1mun"),
    AMPERE_PER_KELVIN: _steps("A/K", "1munpf"),
    VOLTAGE_NOISE: _steps("V/rtHz", "1munp"),
    CURRENT_NOISE: _steps("A/rtHz", "1munpfa"),
    SLEW_RATE: (Step("V/us", 6, 4), Step("V/s", 0, 0)),
    CONDUCTANCE: _steps("S", "1munp"),
}
