"""Random parts of every kind and gain law, with ties on purpose."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any

from selector.parts import read_part

if TYPE_CHECKING:
    from random import Random

    from selector.parts import Part

Fields = dict[str, Any]
KINDS = ("shunt", "amplifier", "switch", "resistor", "capacitor")
LAWS = ("fixed", "non-inverting", "one-resistor", "two-resistor", "current-output", "difference")


def shunt_row(random: Random, number: int, target_ohm: float) -> Fields:
    """Return a shunt that takes a share of the burden."""
    row: Fields = {
        "part": f"S{number}",
        "resistance": float(f"{target_ohm * random.choice([0.1, 0.33, 0.47, 0.68, 0.9]):.2g}"),
        "tolerance": random.choice([0.001, 0.005, 0.01]),
        "tempco": random.choice([15e-6, 50e-6]),
        "power": random.choice([0.25, 1.0, 2.0]),
        "terminals": random.choice([2, 4]),
        "thermal_emf": random.choice([0.0, 1e-6]),
        "drift": random.choice([0.0, 0.001]),
    }
    if random.random() < 0.3:
        row["thermal_resistance"] = 150.0
    if random.random() < 0.3:
        row["inductance"] = 3e-9
    if random.random() < 0.4:
        row["pulse_energy"] = 0.5
    return row


def amplifier_row(random: Random, number: int, law: str) -> Fields:
    """Return an amplifier of a gain law."""
    row: Fields = {
        "part": f"A{number}",
        "gain_law": law,
        "offset": random.choice([2e-6, 5e-6, 2e-5]),
        "offset_drift": random.choice([3e-8, 2e-7]),
        "bias_current": random.choice([0.0, 2e-10, 1e-8]),
        "cmrr": random.choice([90.0, 120.0]),
        "psrr": random.choice([95.0, 110.0]),
        "noise_density": random.choice([1e-8, 4e-8]),
        "current_noise_density": random.choice([0.0, 2e-13]),
        "low_frequency_noise": random.choice([0.0, 1e-6]),
        "swing_high": random.choice([0.02, 0.05]),
        "swing_low": random.choice([0.0005, 0.001, 0.005]),
        "common_mode_min": -0.1,
        "common_mode_top_gap": random.choice([0.0, 0.1, 1.2]),
        "common_mode_test": random.choice([0.0, 1.65]),
        "supply_min": 1.8,
        "supply_max": 5.5,
        "supply_current": random.choice([5e-5, 1e-3]),
        "temp_min": -40.0,
        "temp_max": random.choice([60.0, *[125.0] * 7]),
        "reference_pin": random.random() < 0.8,
    }
    if random.random() < 0.5:
        row["bias_current_drift"] = 2e-12
    if random.random() < 0.5:
        row["input_max"] = random.choice([0.3, 1.0, 2.0])
    if random.random() < 0.5:
        row["slew_rate"] = random.choice([2e3, 2e5])
    if law in ("non-inverting", "difference"):
        row |= {"gain_bandwidth": random.choice([1e6, 1e7]), "open_loop_gain": 110.0}
    else:
        row |= {"bandwidth": random.choice([2e3, 5e4]), "gain_error": 0.002, "gain_drift": 5e-6, "nonlinearity": 2e-5}
    row |= {
        "fixed": {"gain": random.choice([20.0, 50.0, 100.0])},
        "non-inverting": {},
        "one-resistor": {"gain_resistance": 1e5, "output_offset": 1e-4, "output_noise_density": 5e-8},
        "two-resistor": {"gain_factor": 2.0, "output_bias_current": 1e-9, "buffered": random.random() < 0.5},
        "current-output": {"transconductance": 2e-4, "buffered": random.random() < 0.3},
        "difference": {"offset_current": 1e-9},
    }[law]
    return row


def resistor_row(random: Random, number: int, values: list[float]) -> Fields:
    """Return a resistor of one of the values."""
    return {
        "part": f"R{number}",
        "resistance": random.choice(values),
        "tolerance": random.choice([0.0005, 0.001, 0.01]),
        "tempco": random.choice([1e-5, 2.5e-5]),
    }


def capacitor_row(random: Random, number: int) -> Fields:
    """Return a capacitor."""
    return {
        "part": f"C{number}",
        "capacitance": random.choice([1e-9, 1e-8, 1e-8, 1e-7, 1e-6]),
        "tolerance": random.choice([0.05, 0.1]),
        "temp_change": random.choice([0.0, 0.15]),
    }


def switch_row(random: Random, number: int) -> Fields:
    """Return a range switch."""
    return {
        "part": f"W{number}",
        "on_resistance": random.choice([2.0, 5.0, 50.0]),
        "on_resistance_spread": random.choice([0.5, 1.5]),
        "leakage": random.choice([1e-10, 1e-8]),
        "channels": random.choice([1, 2, 4]),
        "supply_min": random.choice([1.6, 1.6, 1.6, 3.6]),
        "supply_max": 5.5,
    }


def resistances(random: Random, laws: list[str], gain: float, each: int = 4) -> list[float]:
    """Return resistances of which `each` give every law gains near and above the one that fills the span."""
    values = [499.0, 1e3, 1e4, 1e5, 5.0]
    for law in laws:
        for _ in range(each):
            wanted = gain * random.choice([0.7, 1.0, 1.5, 3.0, 10.0, 30.0])
            ohm = {
                "fixed": 1e4,
                "non-inverting": random.choice([1e4, 1e5]) / wanted,
                "one-resistor": 1e5 / wanted,
                "two-resistor": wanted * random.choice([1e3, 1e4]) / 2.0,
                "current-output": wanted / 2e-4,
                "difference": wanted * 1e3,
            }[law]
            values.append(float(f"{ohm:.2g}"))
    return values


def stock_of(random: Random, rows: dict[str, list[Fields]]) -> dict[str, tuple[Part, ...]]:
    """Return the parts of rows by kind, with few different costs, now and then none, and small quantities."""
    missing = 0.1 if random.random() < 0.3 else 0.0
    return {kind: _priced(random, rows[kind], kind, missing=missing) for kind in KINDS}


def _priced(random: Random, rows: list[Fields], kind: str, *, missing: float) -> tuple[Part, ...]:
    for row in rows:
        if random.random() >= missing:
            row["unit_cost"] = random.choice([0.1, 0.1, 0.2, 0.5, 1.0])
        if random.random() < 0.95:
            row["quantity"] = random.choice([1, 2, 3, 5, 9])
    return tuple(read_part(kind, row, where=f"{kind} {row['part']}") for row in rows)
