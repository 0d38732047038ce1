"""Small random catalogues and specs, from a seed: every law, method and limit in turn, ties on purpose."""

from __future__ import annotations

from random import Random
from typing import TYPE_CHECKING, Any

from selector.parts import read_part
from selector.spec import spec_of

if TYPE_CHECKING:
    from selector.parts import Part
    from selector.spec import Spec

Fields = dict[str, Any]
LAWS = ("fixed", "non-inverting", "one-resistor", "two-resistor", "current-output", "difference")


def _shunt(random: Random, number: int, target_ohm: float) -> Fields:
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


def _amplifier(random: Random, number: int, law: str) -> Fields:
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


def _priced(random: Random, rows: list[Fields], kind: str, *, missing: float) -> tuple[Part, ...]:
    for row in rows:
        if random.random() >= missing:
            row["unit_cost"] = random.choice([0.1, 0.1, 0.2, 0.5, 1.0])
        if random.random() < 0.95:
            row["quantity"] = random.choice([1, 2, 3, 5, 9])
    return tuple(read_part(kind, row, where=f"{kind} {row['part']}") for row in rows)


def catalogue(
    seed: int, *, resistors: tuple[int, int] = (2, 6), most: int = 3
) -> tuple[Spec, dict[str, tuple[Part, ...]]]:
    """Return a spec and a catalogue; `resistors` bounds their number, `most` the number of ranges."""
    random = Random(seed)
    entries = _entries(random, most)
    target = entries["limits.burden"] / entries["current.max"]
    laws = [random.choice(LAWS) for _ in range(random.randint(1, 3))]
    values = _values(random, laws, 0.8 * entries["converter.reference"] / entries["limits.burden"])
    resistor_rows: list[Fields] = [
        {
            "part": f"R{number}",
            "resistance": random.choice(values),
            "tolerance": random.choice([0.0005, 0.001, 0.01]),
            "tempco": random.choice([1e-5, 2.5e-5]),
        }
        for number in range(random.randint(*resistors))
    ]
    capacitor_rows: list[Fields] = [
        {
            "part": f"C{number}",
            "capacitance": random.choice([1e-9, 1e-8, 1e-8, 1e-7, 1e-6]),
            "tolerance": random.choice([0.05, 0.1]),
            "temp_change": random.choice([0.0, 0.15]),
        }
        for number in range(random.randint(1, 3))
    ]
    switch_rows: list[Fields] = [
        {
            "part": f"W{number}",
            "on_resistance": random.choice([2.0, 5.0, 50.0]),
            "on_resistance_spread": random.choice([0.5, 1.5]),
            "leakage": random.choice([1e-10, 1e-8]),
            "channels": random.choice([1, 2, 4]),
            "supply_min": random.choice([1.6, 1.6, 1.6, 3.6]),
            "supply_max": 5.5,
        }
        for number in range(random.choice([0, 1, 1, 2, 2]))
    ]
    shunts = [_shunt(random, number, target) for number in range(random.randint(1, 3))]
    amplifiers = [_amplifier(random, number, law) for number, law in enumerate(laws)]
    missing = 0.1 if random.random() < 0.3 else 0.0
    stock = {
        kind: _priced(random, rows, kind, missing=missing)
        for kind, rows in (
            ("shunt", shunts),
            ("amplifier", amplifiers),
            ("switch", switch_rows),
            ("resistor", resistor_rows),
            ("capacitor", capacitor_rows),
        )
    }
    return spec_of(entries), stock


def _values(random: Random, laws: list[str], gain: float) -> list[float]:
    """Return resistances of which some give the laws gains near and above the one that fills the span."""
    values = [499.0, 1e3, 1e4, 1e5, 5.0]
    for law in laws:
        for _ in range(4):
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


def _entries(random: Random, most: int) -> Fields:
    most_a = random.choice([0.005, 0.02, 0.1, 0.4])
    least_a = most_a / random.choice([5.0, 20.0, 60.0, 100.0])
    entries: Fields = {
        "current.min": least_a,
        "current.max": most_a,
        "accuracy.method": random.choice(["worst-case", "rss"]),
        "accuracy.calibration": random.choice(["none", "zero", "zero-and-span"]),
        "accuracy.calibration_uncertainty": 0.001,
        "limits.burden": random.choice([0.05, 0.2, 0.5]),
        "limits.power": most_a * random.choice([0.3, 1.0]) + random.choice([5e-4, 2e-2]),
        "limits.headroom": random.choice([0.05, 0.05, 0.0, 0.2]),
        "supply.voltage": random.choice([3.3, 5.0]),
        "converter.bits": random.choice([12, 16]),
        "converter.reference": random.choice([2.5, 3.0]),
        "converter.inl": 1.0,
        "converter.offset": random.choice([0.0, 0.0, 1e-3]),
        "converter.reference_tolerance": 0.001,
        "converter.noise": random.choice([0.0, 1e-4]),
        "converter.input_current": random.choice([0.0, 1e-8]),
        "converter.average": random.choice([1, 16]),
        "ambient.min": -20.0,
        "ambient.max": random.choice([50.0, 70.0]),
        "signal.bandwidth": random.choice([20.0, 100.0, 300.0]),
        "ranges.most": random.choice([1, 2, most, most]),
        "ranges.overlap": random.choice([0.1, 0.1, 0.0, 0.5]),
        "sense.lead": random.choice([0.0, 1e-3]),
        "parts.from": random.choice(["all", "stock"]),
        "parts.boards": random.choice([1, 1, 2]),
    }
    loose = random.choice([0.5, 1.0, 3.0, 10.0, 20.0])
    reading, floor = 0.02 * loose, least_a * 0.05 * loose
    if random.random() < 0.3:
        entries["accuracy.bands"] = [
            {"up_to": (least_a * most_a) ** 0.5, "reading": min(0.9, reading * 2), "floor": floor},
            {"reading": min(0.9, reading), "floor": floor / 2},
        ]
    else:
        entries |= {"accuracy.reading": min(0.9, reading), "accuracy.floor": floor}
    for name in ("power", "burden", "headroom", "error"):
        entries[f"rank.{name}"] = random.choice([0.0, 0.5, 1.0, 1.0, 2.0])
    entries["rank.power"] += 0.25
    _options(random, entries, most_a)
    return entries


def _options(random: Random, entries: Fields, most_a: float) -> None:
    if random.random() < 0.3:
        entries |= {"sense.side": "high", "sense.bus_min": 0.9, "sense.bus_nominal": 1.2, "sense.bus_max": 1.3}
    if random.random() < 0.25:
        entries |= {
            "current.two_way": random.random() < 0.7,
            "output.zero": 1.25,
            "output.zero_tolerance": 0.001,
            "output.zero_drift": 1e-5,
        }
    if random.random() < 0.25:
        entries |= {"current.overload": most_a * 3, "current.overload_time": 0.05}
    if random.random() < 0.3:
        entries["signal.settle"] = random.choice([0.002, 0.02, 0.1])
    if random.random() < 0.3:
        entries["limits.cost"] = random.choice([1.0, 2.0, 3.0])
    if random.random() < 0.25:
        entries |= {"converter.input_max": 3.6, "converter.clamp_current": 0.001}
    if random.random() < 0.25:
        entries["converter.input_resistance"] = 1e6
    if random.random() < 0.15:
        entries["parts.avoid"] = ["S0", "A1"]
