"""One range of one design as the error terms and limits read it, or arrays of such ranges."""

from __future__ import annotations

from dataclasses import dataclass, replace
from math import inf

from selector.candidate.conditions import Calibration, Conditions
from selector.candidate.elementwise import smaller
from selector.candidate.figures import (
    NO_SWITCH,
    AmplifierFigures,
    FilterFigures,
    ResistorFigures,
    ShuntFigures,
    SwitchFigures,
)
from selector.gain import Law, Stage
from selector.physics.filters import corner_hz
from selector.real import Real


@dataclass(frozen=True, slots=True)
class Window:
    """The output voltages that can be used, V, and the span a current may take of them, V."""

    low_v: Real
    high_v: Real
    span_v: Real


@dataclass(frozen=True, slots=True)
class ShuntAt:
    """A shunt under the conditions of a spec."""

    conditions: Conditions
    shunt: ShuntFigures

    @property
    def burden_v(self) -> Real:
        """Return the largest drop in the current's path, I_max (Rs (1 + tolerance) + lead), V."""
        return self.conditions.current_max_a * (self.shunt.most_ohm + self.conditions.lead_ohm)


@dataclass(frozen=True, slots=True)
class AmplifierAt:
    """An amplifier under the conditions of a spec."""

    conditions: Conditions
    amplifier: AmplifierFigures
    window: Window


@dataclass(frozen=True, slots=True)
class SwitchAt:
    """A range switch under the conditions of a spec."""

    conditions: Conditions
    switch: SwitchFigures


@dataclass(frozen=True, slots=True)
class FilterAt:
    """What a range has of the output filter: its resistor, ohm, and its slowest and its noisiest corner, Hz."""

    ohm: Real
    slow_hz: Real
    noisy_hz: Real
    least_ohm: Real = 0.0


NO_FILTER = FilterAt(0.0, inf, inf)


@dataclass(frozen=True, slots=True)
class Border:
    """Where a range begins, A, and what lies below it: the upper border, A, and the gain of the range below."""

    low_a: Real
    below_a: Real
    below_gain: Real = inf


@dataclass(frozen=True, slots=True)
class Operating:
    """One range of one design, or arrays of them; every figure broadcasts with every other.

    `border` (where the range below ends), `filter` and `zero_sum_a` (the plain sum of what a zero calibration
    removes, A) stand at their neutral values until the neighbouring range, the filter and the budget give them.
    """

    conditions: Conditions
    shunt: ShuntFigures
    amplifier: AmplifierFigures
    window: Window
    switch: SwitchFigures
    range_count: int
    common: ResistorFigures
    switched: ResistorFigures
    stage: Stage
    last: bool
    high_a: Real
    border: Border
    calibration: Calibration
    filter: FilterAt = NO_FILTER
    zero_sum_a: Real = 0.0

    @property
    def law(self) -> Law:
        """Return the gain law."""
        return self.amplifier.law

    @property
    def gain(self) -> Real:
        """Return the nominal gain, V/V."""
        return self.stage.gain

    @property
    def shunt_ohm(self) -> Real:
        """Return the shunt's nominal resistance, ohm."""
        return self.shunt.ohm

    @property
    def transfer_ohm(self) -> Real:
        """Return output voltage over load current, G Rs, ohm."""
        return self.stage.gain * self.shunt.ohm

    @property
    def noise_gain(self) -> Real:
        """Return the gain from the amplifier's own input to the output."""
        return self.law.noise_gain(self.stage.gain)

    @property
    def noise_gain_over_gain(self) -> Real:
        """Return kappa, which refers the amplifier's own input errors to the shunt."""
        return self.noise_gain / self.stage.gain

    @property
    def output_ohm(self) -> Real:
        """Return the resistance that the network puts in series with the output filter, ohm."""
        return self.law.output_ohm(self.stage)

    @property
    def burden_v(self) -> Real:
        """Return the largest drop in the current's path, V."""
        return ShuntAt(self.conditions, self.shunt).burden_v

    @property
    def amplifier_pole_hz(self) -> Real:
        """Return the amplifier's pole, min(gain_bandwidth / NG, bandwidth), Hz."""
        by_gain = self.amplifier.gain_bandwidth_hz / self.noise_gain
        return smaller(by_gain, self.amplifier.bandwidth_hz)

    @property
    def swing_v(self) -> Real:
        """Return the output's largest swing, G Rs U, V; twice where current flows both ways."""
        return self.transfer_ohm * self.high_a * (2.0 if self.conditions.two_way else 1.0)

    def with_filter(self, figures: FilterFigures) -> Operating:
        """Return the range with its output filter: f_c at the slow ends of its parts, and at their fast ends."""
        most_ohm = figures.ohm * (1.0 + figures.tolerance_frac)
        least_ohm = figures.ohm * (1.0 - figures.tolerance_frac)
        slow = corner_hz(most_ohm + self.output_ohm, figures.farad * (1.0 + figures.farad_tolerance_frac))
        noisy = corner_hz(least_ohm + self.output_ohm, figures.farad * (1.0 - figures.farad_tolerance_frac))
        return replace(self, filter=FilterAt(figures.ohm, slow, noisy, least_ohm))

    @property
    def low_a(self) -> Real:
        """Return the lower border of the range, A."""
        return self.border.low_a

    def above(self, high_a: Real, gain: Real) -> Operating:
        """Return the range with the one below it ending at `high_a`, A, with its gain.

        The range begins where the one below hands over on the way down: U (1 - overlap).
        """
        low_a = high_a * (1.0 - self.conditions.overlap_frac)
        return replace(self, border=Border(low_a, high_a, gain))

    def uncalibrated(self) -> Operating:
        """Return the range as it reads without calibration."""
        return replace(self, calibration=Calibration.NONE, zero_sum_a=0.0)


def window_of(conditions: Conditions, amplifier: AmplifierFigures) -> Window:
    """Return the usable output window of an amplifier and the span that is left for the current, V.

    One-way the span reaches from the zero to the top; two-way it is the smaller of both halves.
    """
    high = min(
        conditions.output_high_v, conditions.supply_min_v - float(amplifier.swing_high_v), conditions.reference_v
    )
    low = max(conditions.output_low_v, float(amplifier.swing_low_v))
    above = high - conditions.zero_v
    return Window(low, high, min(above, conditions.zero_v - low) if conditions.two_way else above)


@dataclass(frozen=True, slots=True)
class Pairing:
    """A shunt and an amplifier, with the switch and the number of ranges that they are tried with."""

    conditions: Conditions
    shunt: ShuntFigures
    amplifier: AmplifierFigures
    window: Window
    switch: SwitchFigures = NO_SWITCH
    range_count: int = 1

    @property
    def burden_v(self) -> Real:
        """Return the largest drop in the current's path, V."""
        return ShuntAt(self.conditions, self.shunt).burden_v

    @property
    def usable_v(self) -> Real:
        """Return what the least headroom leaves of the span, V."""
        return (1.0 - self.conditions.headroom_limit_frac) * self.window.span_v

    def operate(self, common: ResistorFigures, switched: ResistorFigures, *, last: bool) -> Operating:
        """Return a range with its gain and its upper border: I_max for the last, else where headroom ends."""
        gain = self.amplifier.law.gain(self.amplifier.of_law, common.ohm, switched.ohm, self.switch.on_ohm)
        return self.operate_at(gain, common, switched, last=last)

    def operate_at(self, gain: Real, common: ResistorFigures, switched: ResistorFigures, *, last: bool) -> Operating:
        """Return a range with a gain that is known to be the one that its resistors give."""
        stage = Stage(self.amplifier.of_law, self.shunt.ohm, common.ohm, switched.ohm, self.switch.on_ohm, gain)
        high_a = self.conditions.current_max_a + 0.0 * gain if last else self.usable_v / (gain * self.shunt.ohm)
        return Operating(
            conditions=self.conditions,
            shunt=self.shunt,
            amplifier=self.amplifier,
            window=self.window,
            switch=self.switch,
            range_count=self.range_count,
            common=common,
            switched=switched,
            stage=stage,
            last=last,
            high_a=high_a,
            border=Border(self.conditions.current_min_a, self.conditions.current_min_a),
            calibration=self.conditions.calibration,
        )
