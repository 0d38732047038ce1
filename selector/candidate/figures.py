"""Parts as the formulas read them: SI units, defaults resolved, one part or arrays of them.

What a part does not state stands as the value that leaves its formula without effect: an infinite limit or
speed, an inductance of 0.
"""

from __future__ import annotations

from dataclasses import dataclass
from math import inf

from selector.candidate.elementwise import stated
from selector.gain import LAWS, Law, LawFigures
from selector.parts import Amplifier, Capacitor, Resistor, Shunt, Switch
from selector.physics.heat import thermal_resistance_k_per_w
from selector.real import Real

FOUR_TERMINALS = 4


@dataclass(frozen=True, slots=True)
class ShuntFigures:
    """A shunt; `terminal_lead` is 1 where the lead counts in the reading (two terminals), else 0."""

    ohm: Real
    tolerance_frac: Real
    tempco_per_k: Real
    power_w: Real
    full_power_degc: Real
    zero_power_degc: Real
    drift_frac: Real
    thermal_emf_v_per_k: Real
    heating_k_per_w: Real
    pulse_energy_j: Real
    inductance_h: Real
    terminal_lead: Real

    @property
    def most_ohm(self) -> Real:
        """Return the largest resistance within tolerance, ohm."""
        return self.ohm * (1.0 + self.tolerance_frac)


@dataclass(frozen=True, slots=True)
class ResistorFigures:
    """A resistor of the gain network."""

    ohm: Real
    tolerance_frac: Real
    tempco_per_k: Real


@dataclass(frozen=True, slots=True)
class SwitchFigures:
    """A range switch."""

    on_ohm: Real
    on_spread_ohm: Real
    leakage_a: Real
    supply_min_v: Real
    supply_max_v: Real


@dataclass(frozen=True, slots=True)
class AmplifierFigures:
    """An amplifier and the law its gain follows; rejection and open-loop gain as ratios."""

    law: Law
    of_law: LawFigures
    offset_v: Real
    offset_drift_v_per_k: Real
    output_offset_v: Real
    output_offset_drift_v_per_k: Real
    bias_drift_per_k: Real  # bias_current_drift / bias_current, 0 where not stated
    bias_drift_stated: Real  # 1 or 0
    cmrr: Real
    psrr: Real
    gain_error_frac: Real
    gain_drift_per_k: Real
    nonlinearity_frac: Real
    open_loop_gain: Real
    noise_v_per_rthz: Real
    output_noise_v_per_rthz: Real
    current_noise_a_per_rthz: Real
    low_frequency_noise_v: Real
    gain_bandwidth_hz: Real
    bandwidth_hz: Real
    swing_high_v: Real
    swing_low_v: Real
    common_mode_min_v: Real
    common_mode_max_v: Real
    common_mode_top_gap_v: Real  # minus infinity where not stated
    common_mode_test_v: Real
    supply_test_v: Real
    input_max_v: Real
    slew_v_per_s: Real
    supply_min_v: Real
    supply_max_v: Real
    supply_a: Real
    temp_min_degc: Real
    temp_max_degc: Real
    reference_pin: Real
    gain_capacitor: Real
    least_common_ohm: Real
    least_switched_ohm: Real
    most_ohm: Real


@dataclass(frozen=True, slots=True)
class FilterFigures:
    """An output filter; the capacitor's tolerance holds its temperature change too."""

    ohm: Real
    tolerance_frac: Real
    farad: Real
    farad_tolerance_frac: Real


NO_SWITCH = SwitchFigures(0.0, 0.0, 0.0, -inf, inf)
NO_RESISTOR = ResistorFigures(0.0, 0.0, 0.0)


def shunt_figures(part: Shunt) -> ShuntFigures:
    """Return the figures of a shunt; its heating follows its derating line where it states none."""
    by_line = thermal_resistance_k_per_w(part.power, part.full_power_temp, part.zero_power_temp)
    return ShuntFigures(
        ohm=part.resistance,
        tolerance_frac=part.tolerance,
        tempco_per_k=part.tempco,
        power_w=part.power,
        full_power_degc=part.full_power_temp,
        zero_power_degc=part.zero_power_temp,
        drift_frac=part.drift,
        thermal_emf_v_per_k=part.thermal_emf,
        heating_k_per_w=by_line if part.thermal_resistance is None else part.thermal_resistance,
        pulse_energy_j=stated(part.pulse_energy, 0.0),
        inductance_h=stated(part.inductance, 0.0),
        terminal_lead=0.0 if part.terminals == FOUR_TERMINALS else 1.0,
    )


def resistor_figures(part: Resistor) -> ResistorFigures:
    """Return the figures of a gain resistor."""
    return ResistorFigures(part.resistance, part.tolerance, part.tempco)


def switch_figures(part: Switch) -> SwitchFigures:
    """Return the figures of a range switch."""
    return SwitchFigures(part.on_resistance, part.on_resistance_spread, part.leakage, part.supply_min, part.supply_max)


def filter_figures(resistor: Resistor, capacitor: Capacitor) -> FilterFigures:
    """Return the figures of an output filter."""
    return FilterFigures(
        ohm=resistor.resistance,
        tolerance_frac=resistor.tolerance,
        farad=capacitor.capacitance,
        farad_tolerance_frac=capacitor.tolerance + stated(capacitor.temp_change, 0.0),
    )


def amplifier_figures(part: Amplifier, supply_v: float) -> AmplifierFigures:
    """Return the figures of an amplifier; one that states no test supply was tested at `supply_v`."""
    law = LAWS[part.gain_law]
    drift = stated(part.bias_current_drift, 0.0) if part.bias_current > 0.0 else 0.0
    return AmplifierFigures(
        law=law,
        of_law=_law_figures(part),
        offset_v=part.offset,
        offset_drift_v_per_k=part.offset_drift,
        output_offset_v=part.output_offset,
        output_offset_drift_v_per_k=part.output_offset_drift,
        bias_drift_per_k=drift / part.bias_current if part.bias_current > 0.0 else 0.0,
        bias_drift_stated=float(part.bias_current_drift is not None and part.bias_current > 0.0),
        cmrr=_ratio(part.cmrr),
        psrr=_ratio(part.psrr),
        gain_error_frac=part.gain_error,
        gain_drift_per_k=part.gain_drift,
        nonlinearity_frac=part.nonlinearity,
        open_loop_gain=inf if part.open_loop_gain is None else _ratio(part.open_loop_gain),
        noise_v_per_rthz=part.noise_density,
        output_noise_v_per_rthz=part.output_noise_density,
        current_noise_a_per_rthz=part.current_noise_density,
        low_frequency_noise_v=part.low_frequency_noise,
        gain_bandwidth_hz=stated(part.gain_bandwidth, inf),
        bandwidth_hz=stated(part.bandwidth, inf),
        swing_high_v=part.swing_high,
        swing_low_v=part.swing_low,
        common_mode_min_v=part.common_mode_min,
        common_mode_max_v=stated(part.common_mode_max, inf),
        common_mode_top_gap_v=stated(part.common_mode_top_gap, -inf),
        common_mode_test_v=part.common_mode_test,
        supply_test_v=stated(part.supply_test, supply_v),
        input_max_v=stated(part.input_max, inf),
        slew_v_per_s=stated(part.slew_rate, inf),
        supply_min_v=part.supply_min,
        supply_max_v=part.supply_max,
        supply_a=part.supply_current,
        temp_min_degc=part.temp_min,
        temp_max_degc=part.temp_max,
        reference_pin=float(part.reference_pin),
        gain_capacitor=float(part.gain_capacitor),
        least_common_ohm=stated(part.resistance_min, law.least_common_ohm),
        least_switched_ohm=stated(part.resistance_min, law.least_switched_ohm),
        most_ohm=stated(part.resistance_max, law.most_ohm),
    )


def _law_figures(part: Amplifier) -> LawFigures:
    return LawFigures(
        fixed_gain=stated(part.gain, 0.0),
        gain_base=stated(part.gain_base, 1.0),
        gain_resistance_ohm=stated(part.gain_resistance, 0.0),
        gain_factor=stated(part.gain_factor, 0.0),
        transconductance_s=stated(part.transconductance, 0.0),
        buffered=float(part.buffered),
        bias_a=part.bias_current,
        offset_current_a=stated(part.offset_current, part.bias_current),
        output_bias_a=part.output_bias_current,
    )


def _ratio(decibel: float) -> float:
    """Return a voltage ratio given in dB: 10^(dB/20); definition of the decibel, IEC 60027-3."""
    return float(10.0 ** (decibel / 20.0))
