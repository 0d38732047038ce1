"""Formulas of noise, heat and filters against the values that the outside states."""

from __future__ import annotations

import csv
from math import inf, pi
from pathlib import Path
from typing import TYPE_CHECKING

import pytest

from selector.physics.filters import corner_hz, settling_s
from selector.physics.heat import COPPER_PER_K, derating_frac, thermal_resistance_k_per_w
from selector.physics.noise import noise_bandwidth_hz, thermal_noise_v2_per_hz
from tests.builders import near

if TYPE_CHECKING:
    from collections.abc import Callable

CORNER_HZ = 1000.0
TABLE = Path(__file__).parents[1] / "reference" / "physics.csv"
ROWS = list(csv.DictReader(TABLE.read_text(encoding="utf-8").splitlines()))
QUANTITIES: dict[str, Callable[..., float]] = {
    "thermal noise density of a resistance at a temperature in V/rtHz": lambda ohm, kelvin: (
        thermal_noise_v2_per_hz(ohm, kelvin) ** 0.5
    ),
    "corner of a resistance and a capacitance in Hz": corner_hz,
    "noise bandwidth over corner of one pole": lambda: noise_bandwidth_hz(CORNER_HZ, inf) / CORNER_HZ,
    "settling of one pole to half a count of a number of bits in time constants": lambda bits: (
        settling_s(CORNER_HZ, inf, int(bits)) * 2.0 * pi * CORNER_HZ
    ),
    "derating at a temperature of a line from full to zero power": derating_frac,
    "thermal resistance of a rating of a line from full to zero power in K/W": thermal_resistance_k_per_w,
    "temperature coefficient of copper at 20 degC in 1/K": lambda: COPPER_PER_K,
}


@pytest.mark.parametrize("row", ROWS, ids=lambda row: f"{row['quantity']} {row['first']}")
def test_stated_value(row: dict[str, str]) -> None:
    """Each quantity has the value that its row states.

    Source: the row's own.
    Tolerance: the row's own, the digits stated or one rounding.
    """
    arguments = [float(row[place]) for place in ("first", "second", "third") if row[place]]
    found = QUANTITIES[row["quantity"]](*arguments)
    assert found == near(float(row["value"]), rel=float(row["tolerance"]))


def test_every_quantity_has_a_row() -> None:
    """No formula that is listed here goes without a stated value."""
    assert {row["quantity"] for row in ROWS} == set(QUANTITIES)
