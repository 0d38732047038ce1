"""The limits stand in the order of judging."""

from __future__ import annotations

from selector.limits import LIMITS

ORDER = """missing figure, law, reference pin, supply, temperature, output window, rating, overload, amplifier input,
inductance, gain resistance, burden, common mode, headroom, range order, power, slew rate, output low, gain capacitor,
filter, converter pin, bandwidth, settling, stock, cost, saturation, error"""


def test_limits_stand_in_their_order() -> None:
    """The 27 limits of designs without stacks are judged in this order."""
    assert [one.name for one in LIMITS] == ORDER.replace("\n", " ").split(", ")
    assert len(LIMITS) == 27


def test_limits_that_thin_the_choice_of_a_filter() -> None:
    """Filter, converter pin, bandwidth, settling, stock and cost thin the choice of a filter, in this order."""
    thinning = [one.name for one in LIMITS if one.thins]
    assert thinning == ["filter", "converter pin", "bandwidth", "settling", "stock", "cost"]


def test_limits_without_a_figure() -> None:
    """Four limits are met or not, without a figure; all others have a quantity."""
    assert [one.name for one in LIMITS if one.quantity is None] == [
        "missing figure",
        "law",
        "reference pin",
        "gain capacitor",
    ]
