"""Parts as the formulas read them."""

from __future__ import annotations

from math import inf

import pytest

from selector.candidate.figures import amplifier_figures, filter_figures, shunt_figures, switch_figures
from tests.builders import amplifier, capacitor, near, resistor, shunt, switch

SUPPLY_V = 5.0


def test_shunt_heats_by_its_derating_line_unless_it_states_how() -> None:
    """1 W from 70 to 155 degC makes 85 K/W; a stated 100 K/W counts instead."""
    assert shunt_figures(shunt()).heating_k_per_w == near(85.0)
    assert shunt_figures(shunt(power=0.25, zero_power_temp=125.0)).heating_k_per_w == near(220.0)
    assert shunt_figures(shunt(thermal_resistance=100.0)).heating_k_per_w == 100.0


def test_four_terminals_take_the_lead_out_of_the_reading() -> None:
    """The lead counts with two terminals, the default, and not with four."""
    assert shunt_figures(shunt()).terminal_lead == 1.0
    assert shunt_figures(shunt(terminals=4)).terminal_lead == 0.0


def test_shunt_at_the_end_of_its_tolerance() -> None:
    """0.1 ohm of 1 % is at most 0.101 ohm; without pulse energy or inductance those are 0."""
    found = shunt_figures(shunt())
    assert found.most_ohm == near(0.101)
    assert (found.pulse_energy_j, found.inductance_h) == (0.0, 0.0)


def test_decibels_are_voltage_ratios() -> None:
    """100 dB are 1e5, 80 dB 1e4, 110 dB 316227.766.

    Source: IEC 60027-3, 20 dB to a decade of voltage.
    Tolerance: 1e-14, rounding.
    """
    found = amplifier_figures(amplifier(open_loop_gain=110.0), SUPPLY_V)
    assert (found.cmrr, found.psrr) == near((1e5, 1e4))
    assert found.open_loop_gain == near(316227.76601683796)


def test_amplifier_leaves_out_what_it_does_not_state() -> None:
    """An absent speed, slew rate, input limit, common-mode top or open-loop gain limits nothing."""
    found = amplifier_figures(amplifier(common_mode_max=None, bandwidth=None), SUPPLY_V)
    assert (found.gain_bandwidth_hz, found.bandwidth_hz, found.slew_v_per_s, found.input_max_v) == (inf,) * 4
    assert (found.common_mode_max_v, found.common_mode_top_gap_v, found.open_loop_gain) == (inf, -inf, inf)


def test_amplifier_that_states_no_test_supply_was_tested_at_the_specs() -> None:
    """Without supply_test the spec's supply stands for it."""
    assert amplifier_figures(amplifier(), SUPPLY_V).supply_test_v == SUPPLY_V
    assert amplifier_figures(amplifier(supply_test=3.0), SUPPLY_V).supply_test_v == 3.0


def test_offset_current_falls_back_on_the_bias_current() -> None:
    """An absent offset current counts as the bias current of 1 nA, a stated one of 0 as 0."""
    assert amplifier_figures(amplifier(), SUPPLY_V).of_law.offset_current_a == 1e-9
    assert amplifier_figures(amplifier(offset_current=0.0), SUPPLY_V).of_law.offset_current_a == 0.0


@pytest.mark.parametrize(
    ("fields", "drift", "stated"),
    [
        ({}, 0.0, 0.0),
        ({"bias_current_drift": 1e-11}, 0.01, 1.0),
        ({"bias_current_drift": 0.0}, 0.0, 1.0),
        ({"bias_current_drift": 1e-11, "bias_current": 0.0}, 0.0, 0.0),
    ],
)
def test_drift_of_the_bias_current(fields: dict[str, float], drift: float, stated: float) -> None:
    """10 pA/K of 1 nA is 1 % per kelvin; a stated 0 is stated; with no bias current nothing is."""
    found = amplifier_figures(amplifier(**fields), SUPPLY_V)
    assert (found.bias_drift_per_k, found.bias_drift_stated) == near((drift, stated))


@pytest.mark.parametrize(
    ("law", "common_least", "switched_least"),
    [
        ("one-resistor", 1e3, 100.0),
        ("non-inverting", 1e3, 100.0),
        ("two-resistor", 1e3, 1e3),
        ("current-output", 1e3, 1e3),
        ("difference", 1e3, 1e3),
    ],
)
def test_resistances_that_an_amplifier_works_with(law: str, common_least: float, switched_least: float) -> None:
    """By default 1 kohm to 1 Mohm, and from 100 ohm where one resistor sets the gain; stated figures hold for all."""
    found = amplifier_figures(amplifier(law), SUPPLY_V)
    assert (found.least_common_ohm, found.least_switched_ohm, found.most_ohm) == (common_least, switched_least, 1e6)
    stated = amplifier_figures(amplifier(law, resistance_min=50.0, resistance_max=2e6), SUPPLY_V)
    assert (stated.least_common_ohm, stated.least_switched_ohm, stated.most_ohm) == (50.0, 50.0, 2e6)


def test_capacitors_spread_holds_its_temperature_change() -> None:
    """10 % of tolerance and 15 % over temperature are 25 %; a dielectric code gives the 15 % too."""
    stated = filter_figures(resistor(tolerance=0.01), capacitor(tolerance=0.1, temp_change=0.15))
    coded = filter_figures(resistor(tolerance=0.01), capacitor(tolerance=0.1, temp_change=None, dielectric="X7R"))
    assert (stated.tolerance_frac, stated.farad_tolerance_frac) == near((0.01, 0.25))
    assert coded.farad_tolerance_frac == near(0.25)


def test_switch_keeps_its_figures() -> None:
    """A switch has its resistance, spread, leakage and supply as stated."""
    found = switch_figures(switch())
    assert (found.on_ohm, found.on_spread_ohm, found.leakage_a) == (10.0, 2.0, 1e-9)
    assert (found.supply_min_v, found.supply_max_v) == (2.0, 6.0)
