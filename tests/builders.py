"""A plain spec, plain parts and what is built of them, for tests whose figures are worked by hand.

The spec: 0.1 to 1 A one-way at the low side; 5 V within 10 %, so 4.5 to 5.5 V; 0, 25 and 50 degC, so 25 K; 10 bits of
4 V, so 3.90625 mV a count. The parts: 0.1 ohm of 1 %, 50 ppm/K, 85 K/W by its derating line; a fixed gain of 20,
100 dB of CMRR, 80 dB of PSRR; a filter of 1 kohm and 100 nF without tolerance. The window is 0.01 to 4 V and G Rs
2 ohm. An argument of None takes an entry out; a point of a key is written as two underscores.
"""

from __future__ import annotations

from dataclasses import fields, is_dataclass, replace
from typing import TYPE_CHECKING, Any, TypeVar, cast

import numpy as np
import pytest

from selector.budget import TERMS, Size, Term
from selector.candidate import Conditions, Design, Operating, conditions_of
from selector.limits import LIMITS, Limit, Measure
from selector.parts import read_part
from selector.search.assess import chain_of, measures
from selector.spec import spec_of

if TYPE_CHECKING:
    from selector.candidate.chain import Chain
    from selector.parts import Amplifier, Capacitor, Resistor, Shunt, Switch
    from selector.spec import Spec

ENTRIES: dict[str, Any] = {
    "current.min": 0.1,
    "current.max": 1.0,
    "accuracy.reading": 0.1,
    "accuracy.floor": 0.01,
    "limits.burden": 0.2,
    "limits.power": 0.2,
    "supply.voltage": 5.0,
    "supply.tolerance": 0.1,
    "converter.bits": 10,
    "converter.reference": 4.0,
    "ambient.min": 0.0,
    "ambient.max": 50.0,
    "signal.bandwidth": 100.0,
    "ranges.most": 4,
    "parts.from": "all",
}
HIGH_SIDE: dict[str, Any] = {
    "sense__side": "high",
    "sense__bus_min": 10.0,
    "sense__bus_nominal": 12.0,
    "sense__bus_max": 13.0,
}
ZERO: dict[str, Any] = {"output__zero": 1.0, "output__zero_tolerance": 0.002, "output__zero_drift": 1e-5}
SHUNT: dict[str, Any] = {"part": "S", "resistance": 0.1, "tolerance": 0.01, "tempco": 5e-5, "power": 1.0}
AMPLIFIER: dict[str, Any] = {
    "part": "A",
    "gain_law": "fixed",
    "gain": 20.0,
    "offset": 1e-4,
    "offset_drift": 1e-6,
    "bias_current": 1e-9,
    "cmrr": 100.0,
    "psrr": 80.0,
    "noise_density": 1e-8,
    "bandwidth": 1e5,
    "swing_high": 0.1,
    "swing_low": 0.01,
    "common_mode_min": -0.1,
    "common_mode_max": 4.0,
    "supply_min": 2.0,
    "supply_max": 6.0,
    "supply_current": 1e-3,
    "temp_min": -40.0,
    "temp_max": 125.0,
}
# What sets the gain of each law, with resistors that make it 20: common, switched.
OF_LAW: dict[str, dict[str, Any]] = {
    "fixed": {},
    "non-inverting": {"gain": None},
    "one-resistor": {"gain": None, "gain_resistance": 19e3},
    "two-resistor": {"gain": None, "gain_factor": 2.0},
    "current-output": {"gain": None, "transconductance": 2e-3},
    "difference": {"gain": None},
}
OHMS_OF_LAW: dict[str, tuple[float | None, float | None]] = {
    "fixed": (None, None),
    "non-inverting": (19e3, 1e3),
    "one-resistor": (None, 1e3),
    "two-resistor": (1e3, 1e4),
    "current-output": (None, 1e4),
    "difference": (1e3, 2e4),
}
Tree = TypeVar("Tree")


def spec(**changes: object) -> Spec:
    """Return the plain spec with entries changed."""
    entries = ENTRIES | {key.replace("__", "."): value for key, value in changes.items()}
    return spec_of({key: value for key, value in entries.items() if value is not None})


def conditions(**changes: object) -> Conditions:
    """Return the conditions of the plain spec with entries changed."""
    return conditions_of(spec(**changes))


def shunt(**changes: object) -> Shunt:
    """Return the plain shunt with fields changed."""
    return cast("Shunt", read_part("shunt", _there(SHUNT | changes), where="shunt"))


def amplifier(law: str = "fixed", **changes: object) -> Amplifier:
    """Return the plain amplifier, as a law takes it, with fields changed."""
    cells = AMPLIFIER | {"gain_law": law} | OF_LAW[law] | changes
    return cast("Amplifier", read_part("amplifier", _there(cells), where="amplifier"))


def switch(**changes: object) -> Switch:
    """Return a switch of two channels, 10 ohm within 2 ohm, 1 nA, 2 to 6 V."""
    cells = {"part": "W", "on_resistance": 10.0, "on_resistance_spread": 2.0, "leakage": 1e-9, "channels": 2}
    cells |= {"supply_min": 2.0, "supply_max": 6.0}
    return cast("Switch", read_part("switch", _there(cells | changes), where="switch"))


def resistor(ohm: float = 1e3, code: str = "R", **changes: object) -> Resistor:
    """Return a resistor without tolerance and without temperature coefficient, unless they are given."""
    cells = {"part": code, "resistance": ohm, "tolerance": 0.0, "tempco": 0.0}
    return cast("Resistor", read_part("resistor", _there(cells | changes), where=code))


def capacitor(farad: float = 1e-7, code: str = "C", **changes: object) -> Capacitor:
    """Return a capacitor without tolerance that does not change with temperature, unless they are given."""
    cells = {"part": code, "capacitance": farad, "tolerance": 0.0, "temp_change": 0.0}
    return cast("Capacitor", read_part("capacitor", _there(cells | changes), where=code))


def near(value: Any, rel: float = 1e-14) -> Any:  # noqa: ANN401 - what pytest.approx takes and gives
    """Return what compares equal within a relative tolerance alone: nA leave no room for an absolute one."""
    return pytest.approx(value, rel=rel, abs=0.0)


def _there(cells: dict[str, Any]) -> dict[str, Any]:
    return {field: value for field, value in cells.items() if value is not None}


def design(law: str = "fixed", **changes: Any) -> Design:  # noqa: ANN401 - the parts of any place
    """Return the plain design of a law with one range, with places changed."""
    common, gain = OHMS_OF_LAW[law]
    plain = Design(
        shunts=(shunt(),),
        amplifier=amplifier(law),
        switch=None,
        common=None if common is None else resistor(common, "RC"),
        gain=None if gain is None else (resistor(gain, "RG"),),
        filter_resistor=resistor(),
        filter_capacitor=capacitor(),
    )
    return replace(plain, **changes)


def switched(law: str, *ohms: float, **changes: Any) -> Design:  # noqa: ANN401 - the parts of any place
    """Return the plain design of a law with the plain switch and one gain resistor for each range."""
    gain = tuple(resistor(ohm, f"RG{number}") for number, ohm in enumerate(ohms, start=1))
    return design(law, **({"switch": switch(), "gain": gain} | changes))


def chain(of: Design | None = None, exempt: frozenset[tuple[str, str]] = frozenset(), **changes: object) -> Chain:
    """Return the chain of a design, by default the plain one, under the plain spec with entries changed."""
    return chain_of(conditions(**changes), design() if of is None else of, exempt)


def operating(of: Design | None = None, number: int = 1, **changes: object) -> Operating:
    """Return a range, counted from 1, of a design under the plain spec with entries changed."""
    return chain(of, **changes).ranges[number - 1]


def term(name: str) -> Term:
    """Return the error term of a name."""
    return next(one for one in TERMS if one.name == name)


def sizes(name: str, at: Operating) -> list[tuple[float, float, float]]:
    """Return the parts of every size of a term, as floats, before calibration takes any out."""
    return [_parts(size) for size in term(name).sizes(at)]


def size(name: str, at: Operating) -> tuple[float, float, float]:
    """Return the parts in I^0, I^1 and I^3 of a term, summed over its causes; as after calibration."""
    rows = [_parts(size) for size in term(name).remaining(at)]
    return (sum(row[0] for row in rows), sum(row[1] for row in rows), sum(row[2] for row in rows))


def _parts(one: Size) -> tuple[float, float, float]:
    return float(one.constant_a), float(one.proportional), float(one.cubic_per_a2)


def limit(name: str) -> Limit:
    """Return the limit of a name."""
    return next(one for one in LIMITS if one.name == name)


def measured(name: str, of: Chain) -> list[Measure]:
    """Return every measure of a limit on a chain, in the order of its checks and ranges."""
    return list(measures(of, limit(name)))


def meets(name: str, of: Chain) -> bool:
    """Return whether a chain meets a limit."""
    return all(bool(measure.meets) for measure in measured(name, of))


def side_by_side(first: Tree, second: Tree) -> Tree:
    """Return two like trees of dataclasses as one, with an array of two wherever their numbers differ."""
    if isinstance(first, float) and isinstance(second, float):
        return cast("Tree", first if first == second else np.array([first, second]))
    if not is_dataclass(first) or isinstance(first, Conditions):
        return first
    pairs = {one.name: side_by_side(getattr(first, one.name), getattr(second, one.name)) for one in fields(first)}
    return cast("Tree", type(first)(**pairs))
