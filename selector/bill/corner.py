"""The slowest corner of a candidate's output filter."""

from __future__ import annotations

from selector.candidate import Candidate, Conditions
from selector.candidate.figures import amplifier_figures, filter_figures
from selector.gain import Stage
from selector.physics.filters import corner_hz


def slow_corner_hz(candidate: Candidate, conditions: Conditions) -> float:
    """Return 1 / (2 pi (Ro (1 + tolerance) + R_out) Co (1 + tolerance)) of the slowest range, Hz.

    R_out is what the gain network puts in series with the filter. Raises ValueError for a design without a filter.
    """
    design = candidate.design
    if design.filter_resistor is None or design.filter_capacitor is None:
        message = "a candidate has its filter"
        raise ValueError(message)
    parts = filter_figures(design.filter_resistor, design.filter_capacitor)
    series_ohm = parts.ohm * (1.0 + parts.tolerance_frac) + max(_output_ohms(candidate, conditions))
    return float(corner_hz(series_ohm, parts.farad * (1.0 + parts.farad_tolerance_frac)))


def _output_ohms(candidate: Candidate, conditions: Conditions) -> list[float]:
    """Return R_out of every range."""
    design = candidate.design
    figures = amplifier_figures(design.amplifier, conditions.supply_v).of_law
    common_ohm = 0.0 if design.common is None else design.common.resistance
    on_ohm = 0.0 if design.switch is None else design.switch.on_resistance
    switched = [resistor.resistance for resistor in design.gain or ()] or [0.0]
    return [
        float(design.law.output_ohm(Stage(figures, design.shunts[-1].resistance, common_ohm, ohm, on_ohm, figure.gain)))
        for ohm, figure in zip(switched, candidate.ranges, strict=True)
    ]
