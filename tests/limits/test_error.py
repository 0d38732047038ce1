"""Limits on the error: saturation and error.

The plain design, uncalibrated, without quantisation, at 1 A: 10 mA of tolerance, 1.25 of ambient, 0.425 of heat,
1 of offset, 0.25 of its drift, 1 nA of bias, 10 uA of common mode, 0.5 mA of supply, in all 13.435001 mA, and three
times the noise.
"""

from __future__ import annotations

from math import pi, sqrt
from typing import TYPE_CHECKING

import pytest

from tests.builders import amplifier, chain, design, measured, near, resistor, switched
from tests.limits.edges import check_edge

if TYPE_CHECKING:
    from selector.candidate.chain import Chain

PROPORTIONAL = 0.01 + 1.25e-3 + 1e-5
CUBIC = 4.25e-4
CONSTANT_A = 1e-3 + 2.5e-4 + 1e-9 + 5e-4
CORNER_HZ = 1.0 / (2.0 * pi * 1e3 * 1e-7)
ENBW_HZ = pi / 2.0 * 1e5 * CORNER_HZ / (1e5 + CORNER_HZ)
SIGMA_A = sqrt((1e-16 + 4.0 * 1.380649e-23 * 323.15 * 0.1) * ENBW_HZ) / 0.1
HALF_COUNT_A = 4.0 / 1024.0 / 2.0 / 2.0
FLOOR = {"accuracy__reading": 0.0}


def _error_a(current_a: float, half_count_a: float = HALF_COUNT_A) -> float:
    """Return the worst case of the plain design at a current."""
    return CONSTANT_A + half_count_a + 3.0 * SIGMA_A + current_a * (PROPORTIONAL + CUBIC * current_a**2)


def test_error_of_the_plain_design() -> None:
    """13.435001 mA, 0.977 mA of half a count and 15 uA of noise are 14.426 mA at 1 A."""
    assert _error_a(1.0) == near(0.014426, rel=1e-4)
    assert measured("error", chain(**FLOOR))[0].value == near(_error_a(1.0), rel=1e-12)


def test_error_within_a_floor() -> None:
    """A floor is taken at I_max, where the error is largest."""
    check_edge("error", lambda floor: chain(accuracy__floor=floor, **FLOOR), _error_a(1.0), meets_from="above")


def test_error_within_a_share_of_the_reading() -> None:
    """A share of the reading is taken at I_min of 0.1 A, where the error is the largest share."""
    edge = _error_a(0.1) / 0.1

    def built(reading: float) -> Chain:
        return chain(accuracy__reading=reading, accuracy__floor=0.0)

    check_edge("error", built, edge, meets_from="above")


@pytest.mark.parametrize(
    ("bands", "current_a", "share"),
    [
        ([{"up_to": 0.5, "floor": 1.0}, {"floor": None}], 1.0, 1.0),
        ([{"up_to": 0.5, "floor": None}, {"floor": 1.0}], 0.5, 1.0),
        ([{"up_to": 0.5, "reading": None}, {"floor": 1.0}], 0.1, 0.1),
        ([{"up_to": 0.5, "floor": 1.0}, {"reading": None}], 0.5, 0.5),
    ],
)
def test_error_at_the_breaks_of_the_table(bands: list[dict[str, float | None]], current_a: float, share: float) -> None:
    """A band is judged at both its ends, its lower end being the break of 0.5 A below it."""

    def built(figure: float) -> Chain:
        filled = [{key: figure if value is None else value for key, value in band.items()} for band in bands]
        return chain(accuracy__reading=None, accuracy__floor=None, accuracy__bands=filled)

    check_edge("error", built, _error_a(current_a) / share, meets_from="above")


def test_error_by_root_sum_of_squares() -> None:
    """Twice the root of the squares of limit / sqrt 3 and sigma, at 1 A."""
    limits = [0.01, 1.25e-3, 4.25e-4, 1e-5, 1e-3, 2.5e-4, 1e-9, 5e-4, HALF_COUNT_A]
    edge = 2.0 * sqrt(sum(limit**2 for limit in limits) / 3.0 + SIGMA_A**2)
    check_edge(
        "error",
        lambda floor: chain(accuracy__floor=floor, accuracy__method="rss", **FLOOR),
        edge,
        meets_from="above",
    )


def test_error_of_every_range() -> None:
    """Each range has a figure of its own; the first of two, whose resistor is off by 50 %, fails alone."""
    of = switched("current-output", gain=(resistor(19_990.0, "RG1", tolerance=0.5), resistor(9_990.0, "RG2")))
    rows = measured("error", chain(of))
    assert [bool(row.meets) for row in rows] == [False, True]


@pytest.mark.parametrize("calibration", ["none", "zero", "zero-and-span"])
def test_saturation(calibration: str) -> None:
    """Between 1 A and the converter's R / 2 ohm lies the error at 1 A, uncalibrated: R / 2 - 1 = E + R / 4096.

    Half a count is R / 1024 / 2 / 2 ohm, so R = (1 + E) / (1/2 - 1/4096) with E without it.
    """
    edge = (1.0 + _error_a(1.0, 0.0)) / (0.5 - 1.0 / 4096.0)

    def built(reference: float) -> Chain:
        return chain(converter__reference=reference, limits__headroom=0.0, accuracy__calibration=calibration)

    check_edge("saturation", built, edge, meets_from="above")


def test_saturation_leaves_out_what_calibration_brings() -> None:
    """Neither the known current's uncertainty nor the drift of the bias current counts: nothing is calibrated yet."""
    edge = (1.0 + _error_a(1.0, 0.0)) / (0.5 - 1.0 / 4096.0)
    of = design(amplifier=amplifier(bias_current_drift=1e-9))
    changes = {"accuracy__calibration": "zero-and-span", "accuracy__calibration_uncertainty": 0.5}

    def built(reference: float) -> Chain:
        return chain(of, converter__reference=reference, limits__headroom=0.0, **changes)

    check_edge("saturation", built, edge, meets_from="above")


def test_saturation_of_every_range() -> None:
    """A range of gain 40 has 4 V / 4 ohm - 0.95 A = 50 mA of room; the last, of gain 20, 1 A."""
    rows = measured("saturation", chain(switched("current-output", 19_990.0, 9_990.0)))
    assert [row.allowed for row in rows] == near([0.05, 1.0])
