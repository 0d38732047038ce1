"""Sections of the spec that say what is to be measured, and how well."""

from __future__ import annotations

from typing import Annotated, Literal

from pydantic import BaseModel, ConfigDict

from selector.spec.holds import Holds, amount, choice, flag, fraction, positive, share, value, weight
from selector.units import CURRENT, FREQUENCY, MONEY, POWER, TIME, VOLTAGE


class Section(BaseModel):
    """A table of the spec; SI units, degC, LSB and fractions, as interface.md names them."""

    model_config = ConfigDict(frozen=True, extra="forbid", strict=True, populate_by_name=True, defer_build=True)


class Current(Section):
    """The load current."""

    min: Annotated[float, amount(CURRENT, "lowest load current to be measured", "60 uA")]
    max: Annotated[float, value(CURRENT, "highest load current to be measured", "60 mA")]
    two_way: Annotated[bool, flag("the current flows both ways")] = False
    overload: Annotated[float | None, value(CURRENT, "current to be survived, with overload_time", "300 mA")] = None
    overload_time: Annotated[float | None, value(TIME, "how long the overload lasts", "10 ms")] = None


class Band(Section):
    """The allowed error up to a current: reading * I + floor; the last band may go on without end."""

    up_to: Annotated[float | None, value(CURRENT, "highest current of the band", "1 mA")] = None
    reading: Annotated[float, fraction("allowed error, of the reading", "2 %")] = 0.0
    floor: Annotated[float, amount(CURRENT, "allowed error, whatever the reading", "3 uA")] = 0.0


class Accuracy(Section):
    """The allowed error, how errors are combined, and what is calibrated."""

    reading: Annotated[float | None, fraction("allowed error, of the reading", "2 %")] = None
    floor: Annotated[float | None, amount(CURRENT, "allowed error, whatever the reading", "3 uA")] = None
    bands: Annotated[
        tuple[Band, ...] | None,
        Holds(
            "bands",
            "allowed error by current, instead of reading and floor",
            '[{up_to = "1 mA", reading = "5 %", floor = "3 uA"}, {reading = "2 %", floor = "30 uA"}]',
        ),
    ] = None
    method: Annotated[
        Literal["worst-case", "rss", "monte-carlo"],
        choice("how error terms are combined", "worst-case", "rss", "monte-carlo"),
    ] = "worst-case"
    coverage: Annotated[float, positive("coverage factor of rss", "2")] = 2.0
    calibration: Annotated[
        Literal["none", "zero", "zero-and-span"],
        choice("what each board is calibrated for", "none", "zero", "zero-and-span"),
    ] = "none"
    calibration_uncertainty: Annotated[float, fraction("error of the calibration's known current", "0.1 %")] = 0.0


class Limits(Section):
    """What the measurement may take."""

    burden: Annotated[float, value(VOLTAGE, "most voltage the measurement may take from the load", "100 mV")]
    power: Annotated[float, value(POWER, "most power the measurement may take", "20 mW")]
    headroom: Annotated[float, fraction("least part of the output span left free at the highest current", "5 %")] = 0.05
    cost: Annotated[float | None, value(MONEY, "most a board's parts may cost", "4")] = None
    transient: Annotated[float | None, value(VOLTAGE, "most voltage for a moment, in stacks", "500 mV")] = None
    load_fraction: Annotated[float, share("most part of a shunt's rated power that is used", "50 %")] = 0.5


class Signal(Section):
    """How fast the current changes."""

    bandwidth: Annotated[float, value(FREQUENCY, "least -3 dB bandwidth", "200 Hz")]
    settle: Annotated[float | None, value(TIME, "longest time to settle to half a count", "20 ms")] = None


class Rank(Section):
    """Weights of the score."""

    power: Annotated[float, weight("weight of the power")] = 1.0
    burden: Annotated[float, weight("weight of the burden")] = 1.0
    headroom: Annotated[float, weight("weight of the headroom")] = 1.0
    error: Annotated[float, weight("weight of the error")] = 1.0
