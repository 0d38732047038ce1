"""Named designs, one or more for each gain law: the same parts make a range of the program and a circuit.

Figures are plain and distinct, so that one taken for another shows. Shunts are small beside the resistors of the
networks where a formula leaves the shunt out.
"""

from __future__ import annotations

from dataclasses import dataclass
from math import pi
from typing import TYPE_CHECKING, Any, TypeVar

from selector.candidate import Pairing, conditions_of, window_of
from selector.candidate.figures import (
    NO_RESISTOR,
    NO_SWITCH,
    amplifier_figures,
    filter_figures,
    resistor_figures,
    shunt_figures,
    switch_figures,
)
from selector.parts import Amplifier, Capacitor, Part, Resistor, Shunt, Switch, read_part
from selector.spec import spec_of

if TYPE_CHECKING:
    from collections.abc import Mapping

    from selector.candidate import Operating

Kind = TypeVar("Kind", bound=Part)

SPEC: dict[str, Any] = {
    "current.min": 0.01,
    "current.max": 1.0,
    "accuracy.reading": 0.1,
    "accuracy.floor": 0.001,
    "limits.burden": 0.2,
    "limits.power": 1.0,
    "supply.voltage": 5.0,
    "converter.bits": 12,
    "converter.reference": 5.0,
    "converter.input_current": 2e-8,
    "converter.input_resistance": 3.3e6,
    "ambient.min": -10.0,
    "ambient.max": 60.0,
    "signal.bandwidth": 100.0,
}
HIGH: dict[str, Any] = {"sense.side": "high", "sense.bus_min": 9.0, "sense.bus_nominal": 12.0, "sense.bus_max": 14.0}
ZERO: dict[str, Any] = {"output.zero": 1.25, "output.zero_tolerance": 0.0, "output.zero_drift": 0.0}
AMPLIFIER: dict[str, Any] = {
    "part": "amplifier",
    "offset": 1e-5,
    "offset_drift": 1e-7,
    "bias_current": 3e-9,
    "offset_current": 7e-10,
    "cmrr": 110.0,
    "psrr": 110.0,
    "noise_density": 2.5e-8,
    "current_noise_density": 2e-12,
    "swing_high": 0.05,
    "swing_low": 0.005,
    "common_mode_min": -0.1,
    "common_mode_max": 60.0,
    "supply_min": 1.8,
    "supply_max": 5.5,
    "supply_current": 1e-4,
    "temp_min": -40.0,
    "temp_max": 125.0,
    "reference_pin": True,
}
SHUNT: dict[str, Any] = {"part": "shunt", "tolerance": 0.01, "tempco": 5e-5, "power": 1.0}
SWITCH: dict[str, Any] = {
    "part": "switch",
    "channels": 4,
    "on_resistance": 5.0,
    "on_resistance_spread": 2.0,
    "leakage": 4e-9,
    "supply_min": 1.8,
    "supply_max": 5.5,
}


@dataclass(frozen=True, slots=True)
class Bench:
    """A design on the bench: its only or last range with the output filter, and the parts that a deck needs."""

    name: str
    at: Operating
    filter_ohm: float
    filter_ohm_tolerance_frac: float
    filter_farad: float
    filter_farad_tolerance_frac: float

    @property
    def law(self) -> str:
        """Return the name of the gain law."""
        return self.at.law.name

    @property
    def buffered(self) -> bool:
        """Return whether a stage of its own drives the output."""
        return bool(self.at.amplifier.of_law.buffered)

    @property
    def open_channels(self) -> int:
        """Return how many channels of the range switch are open."""
        return self.at.range_count - 1

    @property
    def has_switch(self) -> bool:
        """Return whether a closed range switch stands in series with the switched resistor."""
        return self.at.range_count > 1

    @property
    def load_a(self) -> float:
        """Return the largest current, A."""
        return self.at.conditions.current_max_a


def bench(name: str, part: Mapping[str, Any], *, shunt: float = 0.001, **other: Any) -> Bench:  # noqa: ANN401 - fields of parts
    """Return a design from what its amplifier states, its resistors, ohm, and the changes to the spec.

    `other`: common, switched (ohm), ranges (count), tolerance, tempco (of both gain resistors), spec (entries),
    filter (ohm, farad).
    """
    conditions = conditions_of(spec_of(SPEC | other.get("spec", {})))
    amplifier = amplifier_figures(_part(Amplifier, AMPLIFIER | part), conditions.supply_v)
    count = other.get("ranges", 1)
    pairing = Pairing(
        conditions,
        shunt_figures(_part(Shunt, SHUNT | {"resistance": shunt})),
        amplifier,
        window_of(conditions, amplifier),
        switch_figures(_part(Switch, SWITCH)) if count > 1 else NO_SWITCH,
        count,
    )
    quality = {"tolerance": other.get("tolerance", 0.001), "tempco": other.get("tempco", 2.5e-5)}
    gain = [
        resistor_figures(_part(Resistor, {"part": use, "resistance": other[use]} | quality))
        if use in other
        else NO_RESISTOR
        for use in ("common", "switched")
    ]
    ohm, farad = other.get("filter", (1000.0, 1e-7))
    resistor = _part(Resistor, {"part": "Ro", "resistance": ohm, "tolerance": 0.01, "tempco": 1e-4})
    capacitor = _part(Capacitor, {"part": "Co", "capacitance": farad, "tolerance": 0.1, "temp_change": 0.15})
    at = pairing.operate(gain[0], gain[1], last=True).with_filter(filter_figures(resistor, capacitor))
    return Bench(name, at, ohm, 0.01, farad, 0.1 + 0.15)


def _part(kind: type[Kind], fields: Mapping[str, Any]) -> Kind:
    part = read_part(kind.kind, fields, where=kind.kind)
    assert isinstance(part, kind)
    return part


def _op_amp(law: str) -> dict[str, Any]:
    return {"gain_law": law, "gain_bandwidth": 2e6, "open_loop_gain": 110.0}


def _two_resistor(**fields: float) -> dict[str, Any]:
    return {"gain_law": "two-resistor", "gain_factor": 1.0, "bandwidth": 2e5, "output_bias_current": 5e-9} | fields


_FIXED = {"gain_law": "fixed", "gain": 50.0, "bandwidth": 2e3, "output_noise_density": 3e-7}
_ONE = {"gain_law": "one-resistor", "bandwidth": 3e4, "output_noise_density": 2e-7, "gain_resistance": 49400.0}
_TWO_AMPLIFIERS = _ONE | {"gain_base": 5.0, "gain_resistance": 80000.0, "bandwidth": 900.0}
_CURRENT = {"gain_law": "current-output", "transconductance": 1e-3, "bandwidth": 1.5e5}
_FEEDBACK = {"common": 100000.0, "switched": 1820.0, "shunt": 0.05}
_MIRROR = {"common": 1000.0, "switched": 24900.0, "shunt": 0.02}
_FOUR = {"common": 10000.0, "switched": 200000.0, "shunt": 0.05, "tolerance": 1e-5, "tempco": 1e-7}

BENCHES: dict[str, Bench] = {
    one.name: one
    for one in (
        bench("fixed", _FIXED, shunt=0.05),
        bench("non_inverting", _op_amp("non-inverting"), **_FEEDBACK),
        bench("non_inverting_switched", _op_amp("non-inverting") | {"gain_bandwidth": 8e4}, ranges=3, **_FEEDBACK),
        bench("one_resistor", _ONE, switched=499.0, shunt=0.01),
        bench("one_resistor_switched", _ONE, switched=499.0, shunt=0.01, ranges=3, spec=ZERO),
        bench("one_resistor_two_amplifiers", _TWO_AMPLIFIERS, switched=2000.0, shunt=0.03, ranges=2),
        bench("two_resistor", _two_resistor(), spec=HIGH, **_MIRROR),
        bench("two_resistor_switched", _two_resistor(gain_factor=2.5), ranges=3, spec=HIGH | ZERO, **_MIRROR),
        bench("two_resistor_buffered", _two_resistor(buffered=True, bandwidth=3e3), ranges=2, spec=HIGH, **_MIRROR),
        bench("two_resistor_slow", _two_resistor(bandwidth=70.0), ranges=2, spec=HIGH, **_MIRROR),
        bench("current_output", _CURRENT, switched=30100.0, shunt=0.08),
        bench("current_output_switched", _CURRENT, switched=30100.0, shunt=0.08, ranges=4),
        bench("current_output_slow", _CURRENT | {"bandwidth": 45.0}, switched=30100.0, shunt=0.08, spec=ZERO),
        bench("difference_low", _op_amp("difference") | {"gain_bandwidth": 4e4}, spec=ZERO, **_FOUR),
        bench("difference_high", _op_amp("difference"), spec=HIGH, **_FOUR),
        bench("difference_high_zero", _op_amp("difference"), spec=HIGH | ZERO, **_FOUR),
    )
}

# Two poles in each ratio to the filter's slowest corner, for converters of each width.
POLES: dict[str, Bench] = {
    one.name: one
    for one in (
        bench(
            f"poles_{ratio}_of_{bits}_bits",
            _FIXED | {"bandwidth": ratio / (2.0 * pi * 1010.0 * 1.25e-7)},
            shunt=0.05,
            spec={"converter.bits": bits},
        )
        for bits in (8, 12, 16)
        for ratio in (1, 5, 30)
    )
}
