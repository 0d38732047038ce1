"""Small catalogues for the commands."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path

import pytest

from selector.catalogue import Catalogue, in_memory
from selector.parts import KINDS, Part, read_part

PARTS: dict[tuple[str, str], dict[str, str]] = {
    ("shunt", "S1"): {"resistance": "1 ohm", "tolerance": "1 %", "tempco": "50 ppm/K", "power": "1 W"},
    ("shunt", "S2"): {"resistance": "2 ohm", "tolerance": "1 %", "tempco": "50 ppm/K", "power": "1 W"},
    ("resistor", "R1"): {"resistance": "1 kohm", "tolerance": "1 %", "tempco": "50 ppm/K"},
    ("resistor", "R2"): {"resistance": "20 kohm", "tolerance": "1 %", "tempco": "50 ppm/K"},
    ("capacitor", "C1"): {"capacitance": "100 nF", "tolerance": "5 %", "dielectric": "C0G"},
    ("switch", "W1"): {
        "on_resistance": "1 ohm",
        "on_resistance_spread": "0.5 ohm",
        "leakage": "1 nA",
        "channels": "4",
        "supply_min": "1.8 V",
        "supply_max": "5.5 V",
    },
}
AMPLIFIER = {
    "offset": "10 uV",
    "offset_drift": "50 nV/K",
    "bias_current": "1 nA",
    "cmrr": "110 dB",
    "psrr": "110 dB",
    "noise_density": "30 nV/rtHz",
    "swing_high": "50 mV",
    "swing_low": "10 mV",
    "common_mode_min": "-0.1 V",
    "common_mode_max": "5 V",
    "gain_bandwidth": "1 MHz",
    "bandwidth": "100 kHz",
    "supply_min": "1.8 V",
    "supply_max": "5.5 V",
    "supply_current": "100 uA",
    "temp_min": "-40 degC",
    "temp_max": "125 degC",
}


@pytest.fixture(scope="session")
def parts() -> tuple[Part, ...]:
    """Return some parts of each kind, with an amplifier without and one with gain resistors."""
    plain = [read_part(kind, {"part": code, **cells}, where=code) for (kind, code), cells in PARTS.items()]
    fixed = read_part("amplifier", {"part": "A-fixed", "gain_law": "fixed", "gain": "20", **AMPLIFIER}, where="")
    free = read_part("amplifier", {"part": "A-free", "gain_law": "non-inverting", **AMPLIFIER}, where="")
    assert {part.kind for part in (*plain, fixed)} == set(KINDS) - {"bypass"}
    return (*plain, fixed, free)


@pytest.fixture
def small(parts: tuple[Part, ...]) -> Catalogue:
    """Return a catalogue in memory of the small parts."""
    return in_memory(parts)


@pytest.fixture
def write(tmp_path: Path) -> Callable[[str], Path]:
    """Write a text to a design file and return that."""

    def written(text: str) -> Path:
        path = tmp_path / "d.toml"
        path.write_text(text, encoding="utf-8")
        return path

    return written
