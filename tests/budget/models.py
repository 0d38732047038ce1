"""Measurement functions of the two worked designs, written from their circuits for any library of uncertain numbers.

An input is a value with a standard uncertainty; what a limit bounds is a rectangle of that half width. The functions
return the current that the converter's reading is taken for.
"""

from __future__ import annotations

from math import pi, sqrt
from typing import Any, Protocol

from tests.budget.worked import figures

BOLTZMANN = 1.380649e-23
COPPER_PER_K = 0.00393


class Uncertain(Protocol):
    """What makes an uncertain number of a library from a value and a standard uncertainty."""

    def __call__(self, value: float, standard: float) -> Any:  # noqa: ANN401 - a number of that library
        """Return the uncertain number."""


class Inputs:
    """The parts of a worked design, and its inputs as uncertain numbers of a library."""

    def __init__(self, name: str, uncertain: Uncertain) -> None:
        """Read the file of a design."""
        self.uncertain = uncertain
        self.spec = figures(name)["spec"]
        self.parts = figures(name)["parts"]
        nominal = self.spec["ambient.nominal"]
        self.change_k = max(self.spec["ambient.max"] - nominal, nominal - self.spec["ambient.min"])

    def limit(self, half_width: float, value: float = 0.0) -> Any:  # noqa: ANN401 - a number of the library
        """Return a value within a half width, rectangular."""
        return self.uncertain(value, half_width / sqrt(3.0))

    def normal(self, standard: float) -> Any:  # noqa: ANN401 - a number of the library
        """Return a value around 0 with a standard deviation."""
        return self.uncertain(0.0, standard)

    def shunt(self, heating_a: float, *, calibrated: bool) -> Any:  # noqa: ANN401 - a number of the library
        """Return the resistance of the shunt: tolerance, ambient, the heat of a current, age, each by itself."""
        shunt = self.parts["shunt"]
        line = (shunt["zero_power_temp"] - shunt["full_power_temp"]) / shunt["power"]
        warmed = shunt["tempco"] * line * heating_a**2 * shunt["resistance"]
        changes = [0.0 if calibrated else shunt["tolerance"], shunt["tempco"] * self.change_k, warmed, shunt["drift"]]
        total: Any = 1.0
        for change in changes:
            if change:
                total = total + self.limit(change)
        return shunt["resistance"] * total

    def resistor(self, part: dict[str, float], *, calibrated: bool) -> Any:  # noqa: ANN401 - a number of the library
        """Return a gain resistor: tolerance and ambient, each by itself."""
        off = self.limit(part["tempco"] * self.change_k)
        if not calibrated:
            off = off + self.limit(part["tolerance"])
        return part["resistance"] * (1.0 + off)

    def noise_bandwidth_hz(self, amplifier_hz: float) -> float:
        """Return pi/2 of both poles in parallel, the filter at its fast end."""
        resistor, capacitor = self.parts["filter_resistor"], self.parts["filter_capacitor"]
        ohm = resistor["resistance"] * (1.0 - resistor["tolerance"])
        farad = capacitor["capacitance"] * (1.0 - capacitor["tolerance"] - capacitor["temp_change"])
        corner_hz = 1.0 / (2.0 * pi * ohm * farad)
        return pi / 2.0 * amplifier_hz * corner_hz / (amplifier_hz + corner_hz)

    def noise_v(self, gain: float, network_ohm: float, current_noise_ohm: float, amplifier_hz: float) -> float:
        """Return the standard deviation at the input."""
        amplifier, spec = self.parts["amplifier"], self.spec
        kelvin = spec["ambient.max"] + 273.15
        density = amplifier["noise_density"] ** 2 + (amplifier.get("output_noise_density", 0.0) / gain) ** 2
        density += 4.0 * BOLTZMANN * kelvin * (self.parts["shunt"]["resistance"] + network_ohm)
        density += (amplifier["current_noise_density"] * current_noise_ohm) ** 2
        white = density * self.noise_bandwidth_hz(amplifier_hz) + (spec["converter.noise"] / gain) ** 2
        return sqrt(white / spec["converter.average"] + (amplifier["low_frequency_noise"] / 6.6) ** 2)


def low_side(uncertain: Uncertain, number: int, current_a: float) -> Any:  # noqa: ANN401 - a number of the library
    """Return the reading of the non-inverting design, uncalibrated, in a range counted from 1."""
    given = Inputs("low_side_two_ranges", uncertain)
    spec, amplifier, switch, limit = given.spec, given.parts["amplifier"], given.parts["switch"], given.limit
    part = given.parts["gain"][number - 1]
    feedback = given.resistor(given.parts["common"], calibrated=False)
    to_ground = given.resistor(part, calibrated=False) + limit(switch["on_resistance_spread"], switch["on_resistance"])
    gain_ohm, branch_ohm = given.parts["common"]["resistance"], part["resistance"] + switch["on_resistance"]
    nominal = 1.0 + gain_ohm / branch_ohm
    beside_ohm = gain_ohm * branch_ohm / (gain_ohm + branch_ohm)
    shunt_ohm = given.parts["shunt"]["resistance"]
    cmrr, psrr, open_loop = (10.0 ** (amplifier[one] / 20.0) for one in ("cmrr", "psrr", "open_loop_gain"))
    lead = spec["sense.lead"]
    across = current_a * (given.shunt(current_a, calibrated=False) + limit(lead))
    across = across + current_a * limit(lead * COPPER_PER_K * given.change_k)
    across = across + limit(given.parts["shunt"]["thermal_emf"] * spec["ambient.gradient"])
    across = across + limit(amplifier["offset"]) + limit(amplifier["offset_drift"] * given.change_k)
    across = across + limit(amplifier["bias_current"]) * (beside_ohm + shunt_ohm)
    across = across + limit(amplifier["common_mode_test"] / cmrr) + current_a * shunt_ohm * limit(1.0 / cmrr)
    across = across + limit(abs(spec["supply.voltage"] - amplifier["supply_test"]) / psrr)
    across = across + limit(spec["supply.voltage"] * spec["supply.tolerance"] / psrr)
    across = across + given.normal(
        given.noise_v(nominal, beside_ohm, beside_ohm, amplifier["gain_bandwidth"] / nominal)
    )
    output = (1.0 + feedback / to_ground) * across * (1.0 + limit(1.0 / (1.0 + open_loop / nominal)))
    output = output + limit(switch["leakage"]) * gain_ohm
    return _read(given, output, current_a * shunt_ohm * nominal, calibrated=False) / (nominal * shunt_ohm)


def high_side(uncertain: Uncertain, number: int, current_a: float, upper_a: float) -> Any:  # noqa: ANN401 - a number of the library
    """Return the reading of the one-resistor design, zero and span calibrated at `upper_a`, in a range from 1."""
    given = Inputs("high_side_two_way", uncertain)
    spec, amplifier, switch, limit = given.spec, given.parts["amplifier"], given.parts["switch"], given.limit
    part = given.parts["gain"][number - 1]
    setting = given.resistor(part, calibrated=True) + limit(switch["on_resistance_spread"], switch["on_resistance"])
    branch_ohm = part["resistance"] + switch["on_resistance"]
    nominal = amplifier["gain_base"] + amplifier["gain_resistance"] / branch_ohm
    shunt_ohm, zero_v = given.parts["shunt"]["resistance"], spec["output.zero"]
    cmrr, psrr = (10.0 ** (amplifier[one] / 20.0) for one in ("cmrr", "psrr"))
    across = current_a * given.shunt(upper_a, calibrated=True)
    across = across + limit(given.parts["shunt"]["thermal_emf"] * spec["ambient.gradient"])
    across = across + limit(amplifier["offset_drift"] * given.change_k)
    across = across + limit(amplifier["bias_current_drift"] * given.change_k) * shunt_ohm
    bus_v = max(spec["sense.bus_max"] - spec["sense.bus_nominal"], spec["sense.bus_nominal"] - spec["sense.bus_min"])
    across = across + limit(bus_v / cmrr) + limit(spec["supply.voltage"] * spec["supply.tolerance"] / psrr)
    share = 1.0 - amplifier["gain_base"] / nominal
    pole_hz = min(amplifier["gain_bandwidth"] / nominal, amplifier["bandwidth"])
    across = across + given.normal(given.noise_v(nominal, branch_ohm * share**2, shunt_ohm, pole_hz))
    gain = (amplifier["gain_base"] + amplifier["gain_resistance"] / setting) * (
        1.0 + limit(amplifier["gain_drift"] * given.change_k)
    )
    span_v = min(spec["converter.reference"] - zero_v, zero_v - amplifier["swing_low"])
    output = gain * across + limit(amplifier["nonlinearity"] * span_v)
    output = output + limit(amplifier["output_offset_drift"] * given.change_k)
    open_channels = len(given.parts["gain"]) - 1
    output = output + open_channels * limit(switch["leakage"]) * amplifier["gain_resistance"]
    output = output + limit(zero_v * spec["output.zero_drift"] * given.change_k)
    read_v = _read(given, output, current_a * shunt_ohm * nominal, calibrated=True)
    known = current_a * limit(spec["accuracy.calibration_uncertainty"])
    return read_v / (nominal * shunt_ohm) + known


def _read(given: Inputs, output_v: Any, nominal_v: float, *, calibrated: bool) -> Any:  # noqa: ANN401 - a number of the library
    """Return the voltage that the converter takes an output for."""
    spec, limit = given.spec, given.limit
    lsb_v = spec["converter.reference"] / 2.0 ** spec["converter.bits"]
    volt = output_v + limit(spec["converter.inl"] * lsb_v) + limit(0.5 * lsb_v)
    volt = volt + limit(spec["converter.input_current"]) * given.parts["filter_resistor"]["resistance"]
    scale = [spec["converter.reference_drift"] * given.change_k]
    if not calibrated:
        volt = volt + limit(spec["converter.offset"])
        scale += [spec["converter.gain_error"], spec["converter.reference_tolerance"]]
    for change in scale:
        volt = volt + nominal_v * limit(change)
    return volt
