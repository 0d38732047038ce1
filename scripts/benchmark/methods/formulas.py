"""The physics of one law and one range as text that DuckDB and pandas both read.

Non-inverting gain at the low side, zero at ground, no calibration, worst case: every error term that is then not zero,
every limit that can then fail. A name with an @ is a figure of the spec; other names are columns, those of parts with
the place in front, or what a line above has computed.
"""

from __future__ import annotations

from math import pi

from selector.budget.methods.worst_case import NOISE_SIGMAS
from selector.physics.noise import BOLTZMANN_J_PER_K, PEAK_TO_PEAK_SIGMAS

RESISTORS = ("common", "gain", "filter")


def _larger(first: str, second: str) -> str:
    """Return the text of the larger of two; pandas reads no function of two arguments."""
    return f"(({first}) + ({second}) + abs(({first}) - ({second}))) / 2"


def _smaller(first: str, second: str) -> str:
    return f"(({first}) + ({second}) - abs(({first}) - ({second}))) / 2"


def _fits(value: str, allowed: str) -> str:
    """Return the text of a limit that is met to 1e-12 of what is allowed, which is above 0."""
    return f"(({value}) <= ({allowed}) * (1 + 1e-12))"


def _enough(place: str) -> str:
    """Return the text that says that a resistor's pieces are enough, though it may stand in three places."""
    first, second = (f"{place}_part != {other}_part" for other in RESISTORS if other != place)
    held = f"{place}_held"
    twice, once = f"(({first} or {second}) and {held} >= 2 * @boards)", f"({first} and {second} and {held} >= @boards)"
    return f"({held} >= 3 * @boards or {twice} or {once})"


_CIRCUIT = {
    "span_v": _smaller("@ceiling_v", "@supply_min_v - amplifier_swing_high_v"),
    "bottom_v": _larger("@output_low_v", "amplifier_swing_low_v"),
    "gain_v_per_v": "1 + common_ohm / gain_ohm",
    "transfer_ohm": "gain_v_per_v * shunt_ohm",
    "feedback_ohm": "common_ohm * gain_ohm / (common_ohm + gain_ohm)",
    "most_ohm": "shunt_ohm * (1 + shunt_tolerance_frac)",
    "burden_v": "@current_max_a * (most_ohm + @lead_ohm)",
    "shunt_w": "@current_max_a ** 2 * most_ohm",
    "driven_a": "transfer_ohm * @current_max_a / (common_ohm + gain_ohm)",
    "power_w": "shunt_w + @supply_max_v * (amplifier_supply_a + driven_a)",
    "derated": "(shunt_zero_power_degc - @ambient_max_degc) / (shunt_zero_power_degc - shunt_full_power_degc)",
    "rated_w": "shunt_power_w * " + _smaller("1", "derated"),
    "slow_ohm": "filter_ohm * (1 + filter_tolerance_frac)",
    "slow_s": f"2 * {pi!r} * slow_ohm * capacitor_farad * (1 + capacitor_tolerance_frac)",
    "fast_ohm": "filter_ohm * (1 - filter_tolerance_frac)",
    "fast_s": f"2 * {pi!r} * fast_ohm * capacitor_farad * (1 - capacitor_tolerance_frac)",
    "pole_s": "gain_v_per_v / amplifier_gain_bandwidth_hz",
    "slow_hz": "1 / slow_s",
    "both_s2": "pole_s ** 2 + slow_s ** 2",
    "bandwidth_hz": "sqrt(2 / (both_s2 + sqrt(both_s2 ** 2 + 4 * pole_s ** 2 * slow_s ** 2)))",
}
_NOISE = {
    "thermal_v2_per_hz": f"4 * {BOLTZMANN_J_PER_K!r} * @hottest_k * (shunt_ohm + feedback_ohm)",
    "current_noise_v_per_rthz": "amplifier_current_noise_a_per_rthz * feedback_ohm",
    "density_v2_per_hz": "amplifier_noise_v_per_rthz ** 2 + thermal_v2_per_hz + current_noise_v_per_rthz ** 2",
    "white_v2": f"density_v2_per_hz * {pi / 2!r} / (pole_s + fast_s) + (@converter_noise_v / gain_v_per_v) ** 2",
    "flicker_v": f"amplifier_low_frequency_noise_v / {PEAK_TO_PEAK_SIGMAS!r}",
    "noise_v": "sqrt(white_v2 / @average + flicker_v ** 2)",
}
_AT_INPUT_V = (
    "shunt_thermal_emf_v_per_k * @gradient_k",
    "amplifier_offset_v",
    "amplifier_offset_drift_v_per_k * @temperature_change_k",
    "amplifier_bias_a * (feedback_ohm + shunt_ohm)",
    "@supply_change_v / amplifier_psrr",
    f"{NOISE_SIGMAS!r} * noise_v",
)
_AT_OUTPUT_V = (
    "@converter_offset_v",
    "@converter_inl_lsb * @lsb_v",
    "@lsb_v / 2",
    "@converter_input_current_a * filter_ohm",
)
_OF_READING = (
    "shunt_tolerance_frac",
    "shunt_tempco_per_k * @temperature_change_k",
    "shunt_drift_frac",
    "1 / amplifier_cmrr",
    "1 / (1 + amplifier_open_loop_gain / gain_v_per_v)",
    "(1 - 1 / gain_v_per_v) * (common_tolerance_frac + gain_tolerance_frac)",
    "(1 - 1 / gain_v_per_v) * (common_tempco_per_k + gain_tempco_per_k) * @temperature_change_k",
    "@converter_gain_error_frac",
    "@reference_tolerance_frac",
    "@reference_drift_per_k * @temperature_change_k",
)
_ERROR = {
    "constant_a": f"({' + '.join(_AT_INPUT_V)}) / shunt_ohm + ({' + '.join(_AT_OUTPUT_V)}) / transfer_ohm",
    "proportional": " + ".join(_OF_READING),
    "cubic_per_a2": "shunt_tempco_per_k * shunt_heating_k_per_w * shunt_ohm",
    "low_a": "constant_a + @current_min_a * (proportional + cubic_per_a2 * @current_min_a ** 2)",
    "high_a": "constant_a + @current_max_a * (proportional + cubic_per_a2 * @current_max_a ** 2)",
    "use_low": "low_a / (@reading_frac * @current_min_a + @floor_a)",
    "use_high": "high_a / (@reading_frac * @current_max_a + @floor_a)",
    "use_error": _larger("use_low", "use_high"),
    "use_headroom": "transfer_ohm * @current_max_a / span_v / (1 - @headroom_limit_frac)",
    "score": "(power_w / @power_limit_w + burden_v / @burden_limit_v + use_headroom + use_error) / 4",
}
_THINNED = (
    "filter_ohm >= @filter_least_ohm",
    "filter_ohm <= @filter_most_ohm",
    _fits("@bandwidth_hz", "bandwidth_hz"),
    *(_enough(place) for place in RESISTORS),
)
_HELD = (
    "amplifier_supply_min_v <= @supply_min_v",
    "amplifier_supply_max_v >= @supply_max_v",
    "amplifier_temp_min_degc <= @ambient_min_degc",
    "amplifier_temp_max_degc >= @ambient_max_degc",
    "span_v > 0",
    _fits("shunt_w", "@load_frac * rated_w"),
    _fits("most_ohm * @current_max_a", "amplifier_input_max_v"),
    _fits("2 * " + repr(pi) + " * @bandwidth_hz * shunt_inductance_h", "shunt_ohm"),
    "common_ohm >= amplifier_least_common_ohm",
    "common_ohm <= amplifier_most_ohm",
    "gain_ohm >= amplifier_least_switched_ohm",
    "gain_ohm <= amplifier_most_ohm",
    _fits("burden_v", "@burden_limit_v"),
    "amplifier_common_mode_min_v <= 0",
    _fits("burden_v", "@supply_min_v - amplifier_common_mode_top_gap_v"),
    _fits("use_headroom", "1"),
    _fits("power_w", "@power_limit_w"),
    _fits(repr(pi) + " * @bandwidth_hz * transfer_ohm * @current_max_a", "amplifier_slew_v_per_s"),
    _fits("bottom_v", "transfer_ohm * @current_min_a"),
    _fits("high_a", "span_v / transfer_ohm - @current_max_a"),
    _fits("use_error", "1"),
)
FORMULAS: dict[str, str] = {
    **_CIRCUIT,
    **_NOISE,
    **_ERROR,
    "thinned": " and ".join(_THINNED),
    "held": " and ".join(_HELD),
}
DESIGN = ("shunt_part", "amplifier_part", "common_part", "gain_part")
# What decides between filters of one design: the slowest, then the largest resistor, the cheapest, the names.
FILTER_ORDER = ("slow_hz", "less_ohm", "filter_cost", "filter_part", "capacitor_part")
