"""Rules over several entries of the spec, judged as far as the entries they need could be read."""

from __future__ import annotations

from collections.abc import Callable, Iterator, Mapping
from dataclasses import dataclass
from itertools import pairwise

from pydantic import BaseModel

from selector.spec.demand import Band
from selector.spec.named_lists import NamedLists
from selector.units import CURRENT, RESISTANCE, TEMPERATURE, VOLTAGE, Quantity, shown

Value = float | int | str | bool | tuple[str, ...] | tuple[Band, ...] | NamedLists | None
Values = Mapping[str, Value]


@dataclass(frozen=True, slots=True)
class Wrong:
    """A fault of one entry: its key, what is wrong, and what would be right.

    `named`: whether the message has to name the key, because `what` does not.
    """

    key: str
    what: str
    remedy: str = ""
    named: bool = True


@dataclass(frozen=True, slots=True)
class Rule:
    """A rule: the keys it reads, and what yields its faults once all of them are known (absent ones as None)."""

    reads: tuple[str, ...]
    faults: Callable[..., Iterator[Wrong]]

    def wrong_in(self, values: Values) -> list[Wrong]:
        """Return the faults among the values; none where an entry that the rule reads is itself faulty."""
        if any(key not in values for key in self.reads):
            return []
        return list(self.faults(*(values[key] for key in self.reads)))


def values_of(spec: BaseModel) -> dict[str, Value]:
    """Return the entries of a spec by dotted key."""
    values: dict[str, Value] = {}
    for name, section in spec:
        if isinstance(section, BaseModel):
            fields = type(section).model_fields
            values |= {f"{name}.{fields[key].alias or key}": value for key, value in section}
        else:
            values[name] = section
    return values


def _rising(low: str, high: str, quantity: Quantity, *, equal: bool) -> Rule:
    """Return the rule that two entries rise."""
    words = "at least" if equal else "above"

    def faults(lower: float | None, upper: float | None) -> Iterator[Wrong]:
        if lower is None or upper is None or lower < upper or (equal and lower == upper):
            return
        what = f"{shown(upper, quantity)}, with {low} = {shown(lower, quantity)}"
        yield Wrong(high, what, f"{high} must be {words} {low}")

    return Rule((low, high), faults)


def _overload(overload: float | None, time_s: float | None) -> Iterator[Wrong]:
    if (overload is None) == (time_s is None):
        return
    absent, there = ("overload", "overload_time") if overload is None else ("overload_time", "overload")
    yield Wrong(f"current.{absent}", "missing", f"state both or neither; current.{there} is stated")


def _one_allowance(reading: float | None, floor: float | None, bands: tuple[Band, ...] | None) -> Iterator[Wrong]:
    stated = reading is not None or floor is not None
    if stated and bands is not None:
        yield Wrong("accuracy.bands", "stated beside reading or floor", "state reading and floor, or bands, never both")
    if not stated and bands is None:
        yield Wrong(
            "accuracy.reading", "missing", 'state the allowed error, for example reading = "2 %" and floor = "3 uA"'
        )


def _something_allowed(current: float, reading: float | None, floor: float | None) -> Iterator[Wrong]:
    if (reading, floor) != (None, None) and (reading or 0.0) * current + (floor or 0.0) <= 0.0:
        what = f"no error is allowed at current.min = {shown(current, CURRENT)}"
        yield Wrong("accuracy.floor" if reading is None or floor is not None else "accuracy.reading", what, _ALLOW)


def _bands_cover(low: float, high: float, bands: tuple[Band, ...] | None) -> Iterator[Wrong]:
    if bands is None:
        return
    names = [f"accuracy.bands[{number}]" for number in range(1, len(bands) + 1)]
    for name, band in zip(names[:-1], bands[:-1], strict=True):
        if band.up_to is None:
            yield Wrong(f"{name}.up_to", "missing", "only the last band may go without")
    for name, (before, after) in zip(names[1:], pairwise(bands), strict=True):
        if before.up_to is not None and after.up_to is not None and after.up_to <= before.up_to:
            what = f"{shown(after.up_to, CURRENT)} after {shown(before.up_to, CURRENT)}"
            yield Wrong(f"{name}.up_to", what, "up_to must rise from band to band")
    last = bands[-1].up_to
    if last is not None and last < high:
        what = f"{shown(last, CURRENT)}, with current.max = {shown(high, CURRENT)}"
        yield Wrong(f"{names[-1]}.up_to", what, "the last band must reach current.max, or go without up_to")
    yield from _bands_allow(low, bands, names)


def _bands_allow(low: float, bands: tuple[Band, ...], names: list[str]) -> Iterator[Wrong]:
    """Yield the bands that allow no error: judged at the lowest current each holds."""
    lowest = low
    for name, band in zip(names, bands, strict=True):
        reached = band.up_to is None or band.up_to >= low
        if reached and band.reading * lowest + band.floor <= 0.0:
            yield Wrong(name, f"no error is allowed at {shown(lowest, CURRENT)}", _ALLOW)
        if reached and band.up_to is not None:
            lowest = max(low, band.up_to)


def _high_side(side: str, *voltages: float | None) -> Iterator[Wrong]:
    if side != "high":
        return
    for key, voltage in zip(_BUS, voltages, strict=True):
        if voltage is None:
            yield Wrong(key, "missing", f'side = "high" needs it, for example {key.split(".")[1]} = "3.3 V"')
    for (low, lower), (high, upper) in pairwise(zip(_BUS, voltages, strict=True)):
        yield from _rising(low, high, VOLTAGE, equal=True).faults(lower, upper)


def _zero(zero: float, tolerance: float | None, drift: float | None) -> Iterator[Wrong]:
    if zero <= 0.0:
        return
    for key, value, example in (("zero_tolerance", tolerance, "0.1 %"), ("zero_drift", drift, "10 ppm/K")):
        if value is None:
            yield Wrong(f"output.{key}", "missing", f'zero above 0 V needs it, for example {key} = "{example}"')


def _two_way(two_way: bool, zero: float) -> Iterator[Wrong]:  # noqa: FBT001 - rules take the values of their keys
    if two_way and zero <= 0.0:
        remedy = 'two_way needs a zero inside the output window, for example zero = "1.25 V"'
        yield Wrong("output.zero", f"{shown(zero, VOLTAGE)} with current.two_way = true", remedy)


def _window(low: float, high: float | None, supply: float) -> Iterator[Wrong]:
    top, name = (supply, "supply.voltage") if high is None else (high, "output.high")
    if low >= top:
        what = f"{shown(low, VOLTAGE)}, with {name} = {shown(top, VOLTAGE)}"
        yield Wrong("output.low", what, f"output.low must be below {name}")


def _stack(most: int, by: str) -> Iterator[Wrong]:
    if by == "shunt" and most < _LEAST_IN_A_STACK:
        yield Wrong("ranges.most", f'{most} with by = "shunt"', "a stack has at least 2 ranges; write most = 2")


def _weights(*weights: float) -> Iterator[Wrong]:
    if not any(weights):
        yield Wrong("rank", "all weights are 0", "give one of power, burden, headroom, error a weight above 0")


_ALLOW = "allow some, by reading or floor"
_LEAST_IN_A_STACK = 2
_BUS = ("sense.bus_min", "sense.bus_nominal", "sense.bus_max")

RULES: tuple[Rule, ...] = (
    _rising("current.min", "current.max", CURRENT, equal=False),
    Rule(("current.overload", "current.overload_time"), _overload),
    Rule(("accuracy.reading", "accuracy.floor", "accuracy.bands"), _one_allowance),
    Rule(("current.min", "accuracy.reading", "accuracy.floor"), _something_allowed),
    Rule(("current.min", "current.max", "accuracy.bands"), _bands_cover),
    Rule(("sense.side", *_BUS), _high_side),
    Rule(("output.zero", "output.zero_tolerance", "output.zero_drift"), _zero),
    Rule(("current.two_way", "output.zero"), _two_way),
    Rule(("output.low", "output.high", "supply.voltage"), _window),
    _rising("ambient.min", "ambient.nominal", TEMPERATURE, equal=True),
    _rising("ambient.nominal", "ambient.max", TEMPERATURE, equal=True),
    _rising("filter.resistance_min", "filter.resistance_max", RESISTANCE, equal=True),
    Rule(("ranges.most", "ranges.by"), _stack),
    Rule(("rank.power", "rank.burden", "rank.headroom", "rank.error"), _weights),
)
