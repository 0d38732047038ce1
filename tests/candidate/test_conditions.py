"""A spec as the formulas read it."""

from __future__ import annotations

from math import inf

import pytest

from selector.candidate import Calibration
from tests.builders import HIGH_SIDE, ZERO, conditions, near


def test_supply_at_both_ends() -> None:
    """5 V within 10 %: 4.5 to 5.5 V, off by 0.5 V."""
    at = conditions()
    assert (at.supply_min_v, at.supply_max_v, at.supply_change_v) == near((4.5, 5.5, 0.5))


@pytest.mark.parametrize(("coldest", "hottest", "change"), [(0.0, 50.0, 25.0), (-40.0, 50.0, 65.0), (20.0, 85.0, 60.0)])
def test_change_of_the_ambient_is_the_larger_distance(coldest: float, hottest: float, change: float) -> None:
    """The ambient's change is counted from nominal, 25 degC, to the farther end; the hottest in kelvin."""
    at = conditions(ambient__min=coldest, ambient__max=hottest)
    assert at.temperature_change_k == change
    assert at.hottest_k == hottest + 273.15


def test_change_follows_a_stated_nominal() -> None:
    """From 10 degC to 50 degC are 40 K."""
    assert conditions(ambient__nominal=10.0).temperature_change_k == 40.0


def test_one_count_of_the_converter() -> None:
    """4 V over 2^10 counts are 3.90625 mV."""
    assert conditions().lsb_v == 3.90625e-3


def test_bus_at_the_high_side() -> None:
    """10, 12 and 13 V: the lines stand at 12 V and move by 2 V."""
    at = conditions(**HIGH_SIDE)
    assert (at.common_mode_v, at.bus_change_v, at.bus_min_v, at.bus_max_v) == (12.0, 2.0, 10.0, 13.0)


def test_bus_counts_for_nothing_at_the_low_side() -> None:
    """Bus voltages that stand unused at the low side are 0 for every formula; the highest is kept for cautions."""
    at = conditions(**HIGH_SIDE | {"sense__side": "low"})
    assert (at.common_mode_v, at.bus_change_v, at.bus_min_v, at.bus_nominal_v, at.bus_max_v) == (0.0,) * 5
    assert at.stated_bus_v == 13.0


def test_what_a_spec_does_not_state_limits_nothing() -> None:
    """An absent cost, settling time, pin voltage or input resistance stands as infinite; an absent overload as 0."""
    at = conditions()
    assert (at.cost_limit, at.settle_s, at.converter_input_max_v, at.converter_input_ohm) == (inf,) * 4
    assert (at.overload_a, at.overload_s, at.stated_bus_v) == (0.0, 0.0, 0.0)


def test_output_reaches_the_supply_unless_it_is_held_below() -> None:
    """Without output.high the supply of 5 V is the top; a stated 2 V is kept."""
    assert conditions().output_high_v == 5.0
    assert conditions(output__high=2.0).output_high_v == 2.0


def test_largest_current_is_the_overload_where_one_is_stated() -> None:
    """Of 1 A and an overload of 3 A the overload is larger; an overload below I_max is not."""
    assert conditions().largest_current_a == 1.0
    assert conditions(current__overload=3.0, current__overload_time=0.01).largest_current_a == 3.0
    assert conditions(current__overload=0.5, current__overload_time=0.01).largest_current_a == 1.0


def test_one_allowance_is_one_band_without_end() -> None:
    """A reading and a floor make a band without end; bands stand as stated, the last without end."""
    assert [(one.up_to_a, one.reading_frac, one.floor_a) for one in conditions().bands] == [(inf, 0.1, 0.01)]
    bands = [{"up_to": 0.5, "reading": 0.1, "floor": 0.01}, {"reading": 0.05}]
    at = conditions(accuracy__reading=None, accuracy__floor=None, accuracy__bands=bands)
    assert [(one.up_to_a, one.reading_frac, one.floor_a) for one in at.bands] == [(0.5, 0.1, 0.01), (inf, 0.05, 0.0)]


def test_calibrations() -> None:
    """No calibration takes nothing, `zero` the zero, `zero-and-span` both."""
    taken = {one.value: (one.zero, one.span) for one in Calibration}
    assert taken == {"none": (False, False), "zero": (True, False), "zero-and-span": (True, True)}
    assert conditions(accuracy__calibration="zero").calibration is Calibration.ZERO


def test_stock_and_boards() -> None:
    """Only with parts.from = "stock", the default, does the stock count."""
    assert not conditions().stock_only
    assert conditions(parts__from="stock", parts__boards=3).stock_only
    assert conditions(parts__from=None).stock_only
    assert conditions(parts__boards=3).boards == 3


# Entry, its value, and the attribute that holds it.
PLAIN: list[tuple[str, object, str]] = [
    ("current__two_way", True, "two_way"),
    ("current__min", 0.2, "current_min_a"),
    ("current__max", 2.0, "current_max_a"),
    ("accuracy__method", "rss", "method"),
    ("accuracy__coverage", 3.0, "coverage"),
    ("accuracy__calibration_uncertainty", 0.002, "calibration_uncertainty_frac"),
    ("limits__burden", 0.3, "burden_limit_v"),
    ("limits__power", 0.4, "power_limit_w"),
    ("limits__headroom", 0.1, "headroom_limit_frac"),
    ("limits__cost", 5.0, "cost_limit"),
    ("limits__load_fraction", 0.7, "load_frac"),
    ("sense__lead", 0.01, "lead_ohm"),
    ("output__low", 0.2, "output_low_v"),
    ("output__zero_tolerance", 0.003, "zero_tolerance_frac"),
    ("output__zero_drift", 2e-5, "zero_drift_per_k"),
    ("converter__bits", 12, "bits"),
    ("converter__reference", 3.0, "reference_v"),
    ("converter__reference_tolerance", 0.004, "reference_tolerance_frac"),
    ("converter__reference_drift", 3e-5, "reference_drift_per_k"),
    ("converter__offset", 1e-3, "converter_offset_v"),
    ("converter__inl", 1.5, "converter_inl_lsb"),
    ("converter__gain_error", 0.005, "converter_gain_error_frac"),
    ("converter__noise", 1e-4, "converter_noise_v"),
    ("converter__input_current", 1e-8, "converter_input_current_a"),
    ("converter__input_resistance", 1e6, "converter_input_ohm"),
    ("converter__input_max", 3.6, "converter_input_max_v"),
    ("converter__clamp_current", 1e-3, "clamp_current_a"),
    ("converter__average", 8, "average"),
    ("ambient__gradient", 2.0, "gradient_k"),
    ("signal__bandwidth", 200.0, "bandwidth_hz"),
    ("signal__settle", 0.01, "settle_s"),
    ("ranges__most", 3, "ranges_most"),
    ("ranges__overlap", 0.2, "overlap_frac"),
    ("filter__resistance_min", 20.0, "filter_least_ohm"),
    ("filter__resistance_max", 5e3, "filter_most_ohm"),
]


@pytest.mark.parametrize(("entry", "value", "held"), PLAIN)
def test_entry_is_held_as_stated(entry: str, value: object, held: str) -> None:
    """Each entry of the spec reaches the formulas unchanged, and what the plain spec has is not that value."""
    assert getattr(conditions(**ZERO | {entry: value}), held) == value
    assert getattr(conditions(**ZERO), held) != value
