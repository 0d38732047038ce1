"""Each caution appears where its figures, worked by hand, say so, and not a hair before."""

from __future__ import annotations

from dataclasses import replace
from math import pi

import pytest

from selector.bill import CAUTIONS, cautions_of
from selector.bill.corner import slow_corner_hz
from selector.candidate import Candidate, Conditions, Point
from selector.candidate.result import RangeFigures, TermAmount


def said(name: str, candidate: Candidate, conditions: Conditions) -> tuple[str, ...]:
    """Return what one caution says."""
    return next(each for each in CAUTIONS if each.name == name).texts(candidate, conditions)


def with_shunt(candidate: Candidate, **fields: object) -> Candidate:
    """Return a candidate whose shunt has other figures."""
    shunt = candidate.design.shunts[0].model_copy(update=fields)
    return replace(candidate, design=replace(candidate.design, shunts=(shunt,)))


def with_amplifier(candidate: Candidate, **fields: object) -> Candidate:
    """Return a candidate whose amplifier has other figures."""
    amplifier = candidate.design.amplifier.model_copy(update=fields)
    return replace(candidate, design=replace(candidate.design, amplifier=amplifier))


def with_ranges(candidate: Candidate, low_a: float, errors_a: tuple[float, float]) -> Candidate:
    """Return a candidate of two ranges, 0.1 A to 1 A and `low_a` to 5 A, with these errors where they meet."""
    ranges = (RangeFigures(40.0, 0.1, 1.0, 0.1, 2.0), RangeFigures(8.0, low_a, 5.0, 0.2, 2.0))
    points = (
        Point(1, 0.1, 9.0, 9.0, ()),
        Point(1, 1.0, errors_a[0], 9.0, ()),
        Point(2, low_a, errors_a[1], 9.0, ()),
        Point(2, 5.0, 9.0, 9.0, ()),
    )
    return replace(candidate, ranges=ranges, points=points)


@pytest.mark.parametrize(("per_watt", "hot"), [(120.0, False), (120.1, True)])
def test_a_shunt_is_hot_above_sixty_kelvin(
    candidate: Candidate, conditions: Conditions, per_watt: float, *, hot: bool
) -> None:
    """0.5 W into 120 K/W are 60 K: no caution; a little more is one, with the rise in it."""
    warm = replace(with_shunt(candidate, thermal_resistance=per_watt, power=3.0), shunt_power_w=0.5)
    texts = said("hot shunt", warm, conditions)
    assert bool(texts) is hot
    assert all("60.1 K" in text for text in texts)


def test_the_derating_line_gives_the_rise_where_no_thermal_resistance_is_stated(
    candidate: Candidate, conditions: Conditions
) -> None:
    """0.9 W in a 1 W shunt of 70 to 155 degC: 85 K/W, 76.5 K, and 90 % of its rating at 60 degC."""
    fields = {"thermal_resistance": None, "power": 1.0, "full_power_temp": 70.0, "zero_power_temp": 155.0}
    texts = said("hot shunt", replace(with_shunt(candidate, **fields), shunt_power_w=0.9), conditions)
    assert [("76.5 K" in text, "90 % of its rating at 60 degC" in text) for text in texts] == [
        (True, False),
        (False, True),
    ]


def test_half_the_rating_is_that_at_the_highest_ambient(candidate: Candidate, conditions: Conditions) -> None:
    """At 112.5 degC half of 1 W is left: 0.25 W is half of it and no caution, 0.26 W is one of 52 %."""
    hot = replace(conditions, ambient_max_degc=112.5)
    cool = with_shunt(candidate, thermal_resistance=1.0, power=1.0, full_power_temp=70.0, zero_power_temp=155.0)
    assert said("hot shunt", replace(cool, shunt_power_w=0.25), hot) == ()
    assert "52 % of its rating" in said("hot shunt", replace(cool, shunt_power_w=0.26), hot)[0]


def test_a_shunt_above_its_zero_power_temperature_has_no_rating(candidate: Candidate, conditions: Conditions) -> None:
    """Nothing is left of the rating at 180 degC: any power is more than it."""
    text = said("hot shunt", candidate, replace(conditions, ambient_max_degc=180.0))[-1]
    assert "more than its rating" in text


@pytest.mark.parametrize(
    ("voltages", "two_way", "words"),
    [
        ((60.0, 5.0), False, None),
        ((60.1, 5.0), False, "Touch hazard: up to 60.1 V"),
        ((0.0, 64.0), False, "Touch hazard: up to 64 V"),
        ((48.0, 5.0), False, None),
        ((48.0, 5.0), True, "Touch hazard where it alternates: up to 48 V"),
        ((30.0, 5.0), True, None),
    ],
)
def test_voltages_above_the_touch_limits(
    candidate: Candidate, conditions: Conditions, voltages: tuple[float, float], words: str | None, *, two_way: bool
) -> None:
    """Above 60 V, or above 30 V where the current flows both ways, the bus or the supply is a hazard to touch."""
    live = replace(
        conditions, stated_bus_v=voltages[0], supply_v=voltages[1], supply_tolerance_frac=0.0, two_way=two_way
    )
    texts = said("touch", candidate, live)
    assert [text.startswith(words) for text in texts if words] == ([True] if words else [])
    assert bool(texts) is (words is not None)


def test_leakage_names_the_terms_that_are_not_zero(candidate: Candidate, conditions: Conditions) -> None:
    """Of switch leakage 1 nA, bias 0 and input current 2 nA the two that count are named, with the hottest ambient."""
    terms = (
        TermAmount("bias current", 0.0, 0.0),
        TermAmount("switch leakage", 1e-9, 5.8e-10),
        TermAmount("converter input current", 2e-9, 1.2e-9),
    )
    leaky = replace(candidate, points=(Point(1, 1.0, 1e-3, 2e-3, terms),))
    assert said("leakage", leaky, conditions) == (
        (
            "Leakage estimates double every 10 K (switch leakage, converter input current): see that the figures "
            "entered hold at 60 degC."
        ),
    )
    dry = replace(candidate, points=(Point(1, 1.0, 1e-3, 2e-3, terms[:1]),))
    assert said("leakage", dry, conditions) == ()


def test_ranges_that_disagree_by_less_than_the_hysteresis(candidate: Candidate, conditions: Conditions) -> None:
    """U = 1 A, L = 0.75 A, errors 0.125 + 0.0625 A: 0.1875 A lies below the hysteresis of 0.25 A."""
    assert said("range change", with_ranges(candidate, 0.75, (0.125, 0.0625)), conditions) == ()


@pytest.mark.parametrize(
    ("low_a", "errors_a", "per_cent"), [(0.75, (0.125, 0.125), 26), (0.9, (0.0625, 0.0625), 13), (0.9, (0.2, 0.1), 31)]
)
def test_ranges_that_may_hand_back_and_forth(
    candidate: Candidate, conditions: Conditions, low_a: float, errors_a: tuple[float, float], per_cent: int
) -> None:
    """Errors of 25 %, 12.5 % and 30 % of U take an overlap of 26 %, 13 % and 31 %: the least whole per cent above."""
    (text,) = said("range change", with_ranges(candidate, low_a, errors_a), conditions)
    assert text.startswith("Ranges 1 and 2 may hand back and forth at 1 A")
    assert text.endswith(f"ranges.overlap = {per_cent} % would do.")


def test_no_overlap_helps_where_the_errors_reach_the_border(candidate: Candidate, conditions: Conditions) -> None:
    """Errors of 0.75 + 0.5 A at U = 1 A: more than a whole overlap."""
    (text,) = said("range change", with_ranges(candidate, 0.9, (0.75, 0.5)), conditions)
    assert text.endswith("no overlap would do.")


def test_an_amplifier_without_input_limit_under_an_overload(candidate: Candidate, conditions: Conditions) -> None:
    """18 A through 5 mohm + 1 % are 90.9 mV between the inputs; without an overload nothing is said."""
    blank = with_amplifier(candidate, input_max=None)
    (text,) = said("amplifier input", blank, conditions)
    assert "states no input_max: see that it stands 90.9 mV between its inputs at 18 A" in text
    assert said("amplifier input", blank, replace(conditions, overload_a=0.0)) == ()
    assert said("amplifier input", with_amplifier(candidate, input_max=1.0), conditions) == ()


@pytest.mark.parametrize(
    ("fields", "bandwidth_hz", "count"),
    [
        ({"resistance": 0.005, "inductance": None}, 20e3, 1),
        ({"resistance": 0.01, "inductance": None}, 20e3, 0),
        ({"resistance": 0.005, "inductance": None}, 10e3, 0),
        ({"resistance": 0.005, "inductance": 1e-9}, 20e3, 0),
    ],
)
def test_a_small_fast_shunt_without_inductance(
    candidate: Candidate, conditions: Conditions, fields: dict[str, object], bandwidth_hz: float, count: int
) -> None:
    """Below 10 mohm and above 10 kHz, both strictly, a shunt that states no inductance is named."""
    small = with_shunt(candidate, **fields)
    assert len(said("inductance", small, replace(conditions, bandwidth_hz=bandwidth_hz))) == count


def test_an_averaged_reading_that_no_longer_follows(candidate: Candidate, conditions: Conditions) -> None:
    """Two readings at a corner of 500.1 Hz take 4 ms, so that they follow 250 Hz and not 251 Hz.

    (68.1 ohm + 0.1 %) + 9.09 kohm behind the output and 33 nF + 5 % + 0.3 %: 1 / (2 pi x 9158.17 ohm x 34.749 nF).
    Source: definition of the corner.
    Tolerance: 1e-4, the digits worked out by hand.
    """
    assert slow_corner_hz(candidate, conditions) == pytest.approx(500.12, rel=1e-4)
    assert said("averaging", candidate, replace(conditions, average=1.0)) == ()
    assert said("averaging", candidate, replace(conditions, average=2.0, bandwidth_hz=250.0)) == ()
    assert said("averaging", candidate, replace(conditions, average=2.0, bandwidth_hz=251.0)) == (
        "Averaging 2 readings takes 4 ms: the averaged reading no longer follows 251 Hz.",
    )
    assert said("averaging", candidate, replace(conditions, average=1.0, bandwidth_hz=501.0)) == (
        "One reading takes 2 ms: it does not follow 501 Hz.",
    )


def test_the_slowest_corner_is_that_of_the_range_with_most_resistance(
    candidate: Candidate, conditions: Conditions
) -> None:
    """Of two ranges with 86.355 kohm and 9.09 kohm behind the output the first sets the corner.

    Source: definition of the corner.
    Tolerance: 1e-12, rounding of doubles.
    """
    gain = candidate.design.gain
    assert gain is not None
    large = gain[0].model_copy(update={"resistance": 86.355e3})
    design = replace(candidate.design, gain=(large, gain[0]))
    two = replace(candidate, design=design, ranges=candidate.ranges * 2)
    by_hand = 1.0 / (2.0 * pi * (68.1 * 1.001 + 86.355e3) * 33e-9 * 1.053)
    assert slow_corner_hz(two, conditions) == pytest.approx(by_hand, rel=1e-12)


def test_the_slow_corner_sees_no_resistance_behind_a_buffered_output(
    candidate: Candidate, conditions: Conditions
) -> None:
    """Buffered, the corner is that of the filter's parts alone, which is far above 500 Hz: 100 readings follow."""
    buffered = with_amplifier(candidate, buffered=True)
    assert said("averaging", buffered, replace(conditions, average=100.0)) == ()


def test_typical_and_assumed_figures_and_generic_parts_are_named(candidate: Candidate, conditions: Conditions) -> None:
    """Each part is named once, with its fields; generic parts share one sentence."""
    marked = with_shunt(candidate, part="S-9", typical=("tempco", "drift"), assumed=("power",), generic=True)
    marked = with_amplifier(marked, part="A-9", generic=True)
    assert said("typical figures", marked, conditions) == ("S-9: tempco, drift from typical figures, not from limits.",)
    assert said("assumed figures", marked, conditions) == (
        "S-9: power assumed at loading; look it up for the part that you have.",
    )
    assert said("generic parts", marked, conditions) == ("Generic, not from stock: S-9, A-9.",)


def test_open_joint_is_always_named_and_the_limits_of_figures_come_last(
    candidate: Candidate, conditions: Conditions
) -> None:
    """Every candidate carries both."""
    texts = cautions_of(candidate, conditions)
    assert "Without its shunt (open joint) the output rises to the supply." in texts
    assert texts[-1].startswith("Figures are limits computed from the data entered for these parts; measure a board")
    assert "local codes" in texts[-1]


def test_the_order_is_that_of_the_registry(candidate: Candidate, conditions: Conditions) -> None:
    """Cautions are printed in the order of CAUTIONS, whatever is found."""
    live = replace(conditions, stated_bus_v=400.0)
    texts = cautions_of(with_amplifier(candidate, input_max=None), live)
    starts = [text.split(" ")[0] for text in texts]
    assert starts == ["Touch", "Without", candidate.design.amplifier.part, "Leakage", "Figures"]
    assert len({each.name for each in CAUTIONS}) == len(CAUTIONS)
