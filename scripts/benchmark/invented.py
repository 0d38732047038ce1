"""Invented parts of each kind, as cells that `read_part` takes; realistic figures, codes of our own."""

from __future__ import annotations

from collections.abc import Callable
from random import Random

from selector.gain import LAWS
from selector.series import values_between

Cells = dict[str, object]

_PER_PPM = 1e-6
_SHUNT_OHMS = values_between("E24", 0.15, 2.7)
_RESISTOR_OHMS = (*values_between("E96", 100.0, 1e6), *values_between("E24", 100.0, 1e6))
_FARADS = values_between("E6", 1e-9, 1e-5)
_FIXED_GAINS = (10.0, 20.0, 25.0, 50.0, 100.0, 200.0)
_LARGEST_C0G_FARAD = 1e-7


def _log_uniform(random: Random, low: float, high: float) -> float:
    """Return a value of three digits between two bounds, each decade as likely as the next."""
    return float(f"{low * (high / low) ** random.random():.3g}")


def shunt(random: Random, number: int) -> Cells:
    """Return a shunt of 0.15 to 2.7 ohm; better ones cost more."""
    tolerance = random.choice([0.001, 0.002, 0.005, 0.01, 0.01])
    four = random.random() < 0.6  # noqa: PLR2004 - the share of four-terminal parts
    cells: Cells = {
        "part": f"SHUNT-{number:03d}",
        "resistance": random.choice(_SHUNT_OHMS),
        "tolerance": tolerance,
        "tempco": random.choice([10, 15, 25, 50, 75, 100]) * _PER_PPM,
        "power": random.choice([0.25, 0.5, 1.0, 2.0, 3.0]),
        "drift": random.choice([0.0, 0.0005, 0.001, 0.002]),
        "thermal_emf": random.choice([0.0, 2e-7, 5e-7, 1e-6]),
        "terminals": 4 if four else 2,
        "unit_cost": round(0.2 + 0.002 / tolerance * random.uniform(0.5, 1.5) + 0.2 * four, 2),
        "quantity": random.randint(1, 60),
    }
    if number % 3 == 0:
        cells["thermal_resistance"] = _log_uniform(random, 15.0, 120.0)
    if number % 4 == 0:
        cells["inductance"] = _log_uniform(random, 2e-10, 5e-9)
    return cells


def _of_law(random: Random, law: str) -> Cells:
    """Return the figures that only amplifiers of one law have."""
    feedback: Cells = {"open_loop_gain": _log_uniform(random, 106.0, 130.0)}
    inside: Cells = {
        "gain_error": random.choice([0.0005, 0.001, 0.002, 0.003]),
        "gain_drift": random.choice([5, 10, 20]) * _PER_PPM,
        "nonlinearity": random.choice([2e-5, 5e-5, 1e-4]),
    }
    own: dict[str, Callable[[], Cells]] = {
        "fixed": lambda: inside | {"gain": random.choice(_FIXED_GAINS)},
        "non-inverting": lambda: feedback,
        "one-resistor": lambda: (
            inside
            | {
                "gain_base": random.choice([1.0, 5.0]),
                "gain_resistance": random.choice([5e4, 1e5, 2e5]),
                "output_offset": _log_uniform(random, 2e-5, 2e-4),
                "output_offset_drift": 5e-7,
                "output_noise_density": 6e-8,
            }
        ),
        "two-resistor": lambda: (
            inside
            | {
                "gain_factor": random.choice([1.0, 2.0]),
                "output_bias_current": _log_uniform(random, 5e-11, 1e-9),
                "buffered": random.random() < 0.5,  # noqa: PLR2004 - half of them
            }
        ),
        "current-output": lambda: inside | {"transconductance": random.choice([2e-4, 1e-3]), "buffered": True},
        "difference": lambda: feedback | {"offset_current": _log_uniform(random, 1e-11, 1e-9)},
    }
    return own[law]()


def amplifier(random: Random, number: int) -> Cells:
    """Return an amplifier; the six laws take turns."""
    law = tuple(LAWS)[number % len(LAWS)]
    grade = random.random()  # 0: the best
    offset_v = _log_uniform(random, 2e-6, 8e-6) * (1.0 + 9.0 * grade**2)
    bandwidth = "gain_bandwidth" if LAWS[law].by_feedback else "bandwidth"
    hertz = _log_uniform(random, 3e5, 1e7) if LAWS[law].by_feedback else _log_uniform(random, 2e3, 2e5)
    return _of_law(random, law) | {
        "part": f"AMP-{number:03d}",
        "gain_law": law,
        "offset": float(f"{offset_v:.3g}"),
        "offset_drift": _log_uniform(random, 2e-8, 2e-7),
        "bias_current": _log_uniform(random, 1e-11, 2e-9),
        "cmrr": round(random.uniform(96.0, 124.0)),
        "psrr": round(random.uniform(94.0, 120.0)),
        "noise_density": _log_uniform(random, 9e-9, 6e-8),
        "current_noise_density": _log_uniform(random, 1e-14, 2e-13),
        "low_frequency_noise": _log_uniform(random, 2e-7, 2e-6),
        bandwidth: hertz,
        "slew_rate": _log_uniform(random, 5e4, 5e6),
        "swing_high": round(random.uniform(0.02, 0.1), 3),
        "swing_low": round(random.uniform(0.002, 0.015), 4),
        "common_mode_min": -0.1,
        "common_mode_top_gap": 0.1,
        "input_max": 3.0,
        "supply_min": 1.8,
        "supply_max": 5.5,
        "supply_current": _log_uniform(random, 2e-5, 1e-3),
        "temp_min": -40.0,
        "temp_max": 125.0,
        "reference_pin": not LAWS[law].reads_own_ground,
        "unit_cost": round(0.5 + 2.0 * (1.0 - grade), 2),
        "quantity": random.randint(1, 80),
    }


def switch(random: Random, number: int) -> Cells:
    """Return a range switch: the lower its resistance, the more it leaks."""
    on_ohm = _log_uniform(random, 0.5, 80.0)
    channels = random.choice([1, 2, 4, 8])
    return {
        "part": f"SWITCH-{number:03d}",
        "on_resistance": on_ohm,
        "on_resistance_spread": float(f"{on_ohm * random.uniform(0.2, 0.4):.3g}"),
        "leakage": float(f"{2e-8 / (1.0 + on_ohm) * random.uniform(0.3, 1.0):.3g}"),
        "channels": channels,
        "supply_min": 1.65,
        "supply_max": 5.5,
        "unit_cost": round(0.2 + 0.1 * channels + random.uniform(0.0, 0.3), 2),
        "quantity": random.randint(1, 60),
    }


def resistor(random: Random, number: int) -> Cells:
    """Return a resistor of a preferred value; the same value comes in several tolerances."""
    tolerance, cost = random.choice([(0.001, 0.2), (0.005, 0.06), (0.01, 0.02)])
    return {
        "part": f"RES-{number:04d}",
        "resistance": random.choice(_RESISTOR_OHMS),
        "tolerance": tolerance,
        "tempco": random.choice([10, 25, 50, 100]) * _PER_PPM,
        "unit_cost": round(cost * random.uniform(0.8, 1.5), 3),
        "quantity": random.choice([1, 2, 3, 5, 10, 50, 100, 500]),
    }


def capacitor(random: Random, number: int) -> Cells:
    """Return a ceramic filter capacitor; small ones keep their value."""
    farad = random.choice(_FARADS)
    small = farad <= _LARGEST_C0G_FARAD and random.random() < 0.5  # noqa: PLR2004 - half of the small ones
    return {
        "part": f"CAP-{number:03d}",
        "capacitance": farad,
        "tolerance": random.choice([0.01, 0.02, 0.05]) if small else random.choice([0.05, 0.1, 0.2]),
        "dielectric": "C0G" if small else "X7R",
        "voltage": random.choice([16.0, 25.0, 50.0]),
        "unit_cost": round(random.uniform(0.02, 0.3), 3),
        "quantity": random.randint(1, 200),
    }


MAKERS: dict[str, Callable[[Random, int], Cells]] = {
    "shunt": shunt,
    "amplifier": amplifier,
    "switch": switch,
    "resistor": resistor,
    "capacitor": capacitor,
}
