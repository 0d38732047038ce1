"""Letter codes: a letter in the place of the decimal mark, and letters that are tolerances. Data only."""

from __future__ import annotations

from selector.units.quantities import CAPACITANCE, INDUCTANCE, RESISTANCE, VOLTAGE
from selector.units.quantity import Quantity

# IEC 60062:2016 for resistance (R, K, M, G, T; L is the milliohm) and capacitance (p, n, u, m, F). The small k, m and r
# and the capitals P, N, U are what people write for them. Inductance and 3V3: common practice, no source.
VALUE_LETTERS: dict[Quantity, dict[str, int]] = {
    RESISTANCE: {"L": -3, "m": -3, "R": 0, "r": 0, "K": 3, "k": 3, "M": 6, "G": 9, "T": 12},
    CAPACITANCE: {"p": -12, "P": -12, "n": -9, "N": -9, "u": -6, "U": -6, "m": -3, "F": 0},
    INDUCTANCE: {"n": -9, "u": -6, "m": -3},
    VOLTAGE: {"V": 0},
}

# A code may begin with its letter (`R47`) only where the standard has such codes.
LEADING_LETTER: tuple[Quantity, ...] = (RESISTANCE, CAPACITANCE)

# IEC 60062:2016, letters of symmetrical relative tolerances, in per cent; W, P and L from memory.
TOLERANCE_LETTERS: dict[str, str] = {
    "L": "0.01",
    "P": "0.02",
    "W": "0.05",
    "B": "0.1",
    "C": "0.25",
    "D": "0.5",
    "F": "1",
    "G": "2",
    "J": "5",
    "K": "10",
    "M": "20",
}
