"""Catalogues and specs of any size for measuring the search, from a seed."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import asdict, dataclass
from random import Random
from typing import Literal, get_args

from scripts.benchmark.invented import MAKERS, Cells
from selector.parts import Part, columns, read_part
from selector.spec import Spec, spec_of

SEED = 1912
JITTER = 0.001  # either way, so that two copies of a part lie within 0.2 % of one another

Tightness = Literal["loose", "middling", "tight"]
TIGHTNESSES: tuple[Tightness, ...] = get_args(Tightness)


@dataclass(frozen=True, slots=True)
class Sizes:
    """How many parts there are of each kind; those of catalogue X where nothing else is said."""

    shunts: int = 60
    amplifiers: int = 40
    switches: int = 10
    resistors: int = 500
    capacitors: int = 20


def catalogue(seed: int = SEED, *, near: bool = False, **sizes: int) -> dict[str, tuple[Part, ...]]:
    """Return the parts of a catalogue by kind; `sizes` are fields of Sizes.

    A smaller catalogue of the same seed is the beginning of a larger one, kind by kind. With `near`, shunts and
    amplifiers are copies of one non-inverting pair whose figures differ by 0.2 % at most; the rest stays as it is.
    """
    stock: dict[str, tuple[Part, ...]] = {}
    for counted, count in asdict(Sizes(**sizes)).items():
        kind = "switch" if counted == "switches" else counted.removesuffix("s")
        copied = near and kind in _COPIED
        rows = _copies(seed, kind, count) if copied else _drawn(seed, kind, count)
        stock[kind] = tuple(read_part(kind, row, where=str(row["part"])) for row in rows)
    return stock


def spec(tightness: Tightness, ranges_most: int = 3, **changes: object) -> Spec:
    """Return the spec of an orchard's frost alarm with ranges; a key's point in `changes` is two underscores."""
    entries = _ENTRIES | _TIGHTNESS[tightness] | {"ranges.most": ranges_most}
    return spec_of(entries | {key.replace("__", "."): value for key, value in changes.items()})


def _drawn(seed: int, kind: str, count: int) -> Iterator[Cells]:
    """Yield parts, each drawn for itself; every kind from a stream of its own."""
    random = Random(f"{seed} {kind}")  # noqa: S311 - figures of invented parts, no secret
    for number in range(1, count + 1):
        yield MAKERS[kind](random, number)


def _copies(seed: int, kind: str, count: int) -> Iterator[Cells]:
    """Yield copies of one part whose figures are jittered; counts, costs and temperatures stay as they are."""
    random = Random(f"{seed} near {kind}")  # noqa: S311 - figures of invented parts, no secret
    jittered = {one.name for one in columns(kind) if one.sort == "quantity"} - _KEPT
    for number in range(1, count + 1):
        copy = _COPIED[kind] | {"part": f"{kind.upper()}-{number:03d}"}
        for name, value in copy.items():
            if name in jittered and isinstance(value, float):
                copy[name] = value * (1.0 + random.uniform(-JITTER, JITTER))
        yield copy


_KEPT = frozenset({"quantity", "terminals", "unit_cost", "temp_min", "temp_max"})
_COPIED: dict[str, Cells] = {
    "shunt": {
        "resistance": 1.1,
        "tolerance": 0.001,
        "tempco": 1e-5,
        "power": 1.0,
        "drift": 0.0005,
        "thermal_emf": 5e-7,
        "terminals": 4,
        "unit_cost": 1.2,
        "quantity": 20,
    },
    "amplifier": {
        "gain_law": "non-inverting",
        "offset": 5e-6,
        "offset_drift": 5e-8,
        "bias_current": 2e-10,
        "cmrr": 114.0,
        "psrr": 110.0,
        "open_loop_gain": 118.0,
        "noise_density": 2e-8,
        "current_noise_density": 3e-14,
        "low_frequency_noise": 5e-7,
        "gain_bandwidth": 3e6,
        "swing_high": 0.04,
        "swing_low": 0.006,
        "common_mode_min": -0.1,
        "common_mode_top_gap": 0.1,
        "input_max": 5.0,
        "slew_rate": 1e6,
        "supply_min": 1.8,
        "supply_max": 5.5,
        "supply_current": 2e-4,
        "temp_min": -40.0,
        "temp_max": 125.0,
        "unit_cost": 1.1,
        "quantity": 25,
    },
}
_ENTRIES: dict[str, object] = {
    "title": "Orchard frost alarm",
    "current.max": 0.06,
    "supply.voltage": 3.3,
    "supply.tolerance": 0.03,
    "converter.bits": 12,
    "converter.reference": 2.5,
    "converter.reference_tolerance": 0.001,
    "converter.reference_drift": 2e-5,
    "converter.offset": 6e-4,
    "converter.inl": 0.5,
    "converter.gain_error": 0.001,
    "converter.noise": 2e-4,
    "converter.input_current": 1e-9,
    "converter.average": 16,
    "ambient.min": -25.0,
    "ambient.max": 45.0,
    "accuracy.calibration_uncertainty": 0.001,
}
_TIGHTNESS: dict[Tightness, dict[str, object]] = {
    "loose": {
        "current.min": 1e-3,
        "accuracy.reading": 0.05,
        "accuracy.floor": 1e-4,
        "limits.burden": 0.2,
        "limits.power": 0.03,
        "signal.bandwidth": 50.0,
    },
    "middling": {
        "current.min": 4e-4,
        "accuracy.reading": 0.012,
        "accuracy.floor": 1e-5,
        "accuracy.calibration": "zero",
        "limits.burden": 0.1,
        "limits.power": 0.01,
        "signal.bandwidth": 100.0,
    },
    "tight": {
        "current.min": 1e-4,
        "accuracy.reading": 0.006,
        "accuracy.floor": 5.5e-6,
        "accuracy.calibration": "zero-and-span",
        "limits.burden": 0.08,
        "limits.power": 0.008,
        "signal.bandwidth": 200.0,
    },
}
