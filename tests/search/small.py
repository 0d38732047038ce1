"""A small spec and catalogue in which every figure is plain."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any

from selector.parts import read_part
from selector.spec import spec_of

if TYPE_CHECKING:
    from selector.parts import Part
    from selector.spec import Spec

AMPLIFIER: dict[str, Any] = {
    "part": "A",
    "gain_law": "fixed",
    "gain": 20.0,
    "offset": 1e-5,
    "offset_drift": 1e-7,
    "bias_current": 1e-9,
    "cmrr": 110.0,
    "psrr": 110.0,
    "noise_density": 2e-8,
    "bandwidth": 5e4,
    "swing_high": 0.05,
    "swing_low": 0.005,
    "common_mode_min": -0.1,
    "common_mode_top_gap": 0.0,
    "supply_min": 1.8,
    "supply_max": 5.5,
    "supply_current": 1e-4,
    "temp_min": -40.0,
    "temp_max": 125.0,
}
SHUNT: dict[str, Any] = {"part": "S", "resistance": 1.0, "tolerance": 0.01, "tempco": 5e-5, "power": 1.0}
ENTRIES: dict[str, Any] = {
    "current.min": 0.01,
    "current.max": 0.1,
    "accuracy.reading": 0.1,
    "accuracy.floor": 0.001,
    "limits.burden": 0.2,
    "limits.power": 0.1,
    "supply.voltage": 3.3,
    "converter.bits": 12,
    "converter.reference": 2.5,
    "ambient.min": 0.0,
    "ambient.max": 50.0,
    "signal.bandwidth": 100.0,
    "parts.from": "all",
}


def spec(**changes: object) -> Spec:
    """Return the small spec with entries changed; a key's point is written as two underscores."""
    return spec_of(ENTRIES | {key.replace("__", "."): value for key, value in changes.items()})


def part(kind: str, **fields: object) -> Part:
    """Return a part of a kind."""
    base = {"shunt": SHUNT, "amplifier": AMPLIFIER}.get(kind, {})
    return read_part(kind, base | fields, where=kind)


def resistor(code: str, ohm: float, **fields: object) -> Part:
    """Return a resistor of 1 % and 100 ppm/K."""
    return part("resistor", **({"part": code, "resistance": ohm, "tolerance": 0.01, "tempco": 1e-4} | fields))


def capacitor(code: str, farad: float, **fields: object) -> Part:
    """Return a capacitor of 10 % that does not change with temperature."""
    return part("capacitor", **({"part": code, "capacitance": farad, "tolerance": 0.1, "temp_change": 0.0} | fields))


def stock(*parts: Part) -> dict[str, tuple[Part, ...]]:
    """Return parts by kind, with the small shunt and amplifier where none of their kind is given."""
    kinds: dict[str, list[Part]] = {}
    for one in parts:
        kinds.setdefault(one.kind, []).append(one)
    kinds.setdefault("shunt", [part("shunt")])
    kinds.setdefault("amplifier", [part("amplifier")])
    return {kind: tuple(rows) for kind, rows in kinds.items()}
