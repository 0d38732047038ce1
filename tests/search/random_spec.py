"""Random measurement specs: every method, calibration and option in turn."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any

if TYPE_CHECKING:
    from random import Random

Fields = dict[str, Any]


def entries_of(random: Random, most: int) -> Fields:
    """Return the entries of a spec; `most` is the most ranges that it may allow."""
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
