"""How the terms of a budget are combined."""

from __future__ import annotations

from math import fsum, log10, sqrt

import pytest
from hypothesis import given
from hypothesis import strategies as st

from selector.budget import METHODS, TERMS, Size, Term, amounts, combined, largest_term
from selector.budget.methods import RootSumSquare, WorstCase
from tests.builders import OF_LAW, design, near, operating, resistor, term

PLAIN = term("offset")
NORMAL = term("noise")
FULL = {
    "converter__noise": 1e-3,
    "converter__inl": 1.0,
    "converter__reference_drift": 2e-5,
    "converter__gain_error": 1e-3,
    "sense__lead": 1e-3,
}


def _limits(*limits: float) -> list[tuple[Term, Size]]:
    return [(PLAIN, Size(constant_a=limit)) for limit in limits]


def test_worst_case_adds_limits_and_three_sigmas() -> None:
    """1 + 2 I + 3 I^3 and noise of 0.5 at 2 A: 1 + 4 + 24 + 1.5 = 30.5 A, whatever the coverage."""
    rows = [(PLAIN, Size(1.0, 2.0, 0.0)), (PLAIN, Size(0.0, 0.0, 3.0)), (NORMAL, Size(0.5))]
    assert WorstCase.combined(rows, 2.0).error_a(2.0) == 30.5
    assert WorstCase.combined(rows, 3.0).error_a(2.0) == 30.5


def test_root_sum_square_adds_in_squares() -> None:
    """Limits of 3 and 2 I = 4 and a sigma of 0.5, at 2 A and coverage 2: 2 sqrt(9/3 + 16/3 + 0.25)."""
    rows = [(PLAIN, Size(3.0)), (PLAIN, Size(0.0, 2.0)), (NORMAL, Size(0.5))]
    assert RootSumSquare.combined(rows, 2.0).error_a(2.0) == near(2.0 * sqrt(25.0 / 3.0 + 0.25))
    assert RootSumSquare.combined(rows, 3.0).error_a(2.0) == near(3.0 * sqrt(25.0 / 3.0 + 0.25))


def test_parts_of_one_cause_add_before_they_are_squared() -> None:
    """A cause of 1 + 2 I + 3 I^3 is one limit of 29 A at 2 A: its standard uncertainty is 29 / sqrt 3."""
    assert RootSumSquare.combined([(PLAIN, Size(1.0, 2.0, 3.0))], 1.0).error_a(2.0) == near(29.0 / sqrt(3.0))


def test_a_limit_has_the_uncertainty_of_a_rectangle() -> None:
    """A limit of a has the standard uncertainty a / sqrt 3.

    Source: JCGM 100:2008, 4.3.7.
    Tolerance: 1e-14, rounding.
    """
    assert RootSumSquare.combined(_limits(1.0), 1.0).error_a(0.0) == near(1.0 / sqrt(3.0))
    offset = next(row for row in amounts(operating(), 1.0) if row.name == "offset")
    assert (offset.amount_a, offset.standard_a) == near((1e-3, 1e-3 / sqrt(3.0)))


def test_four_equal_rectangles() -> None:
    """Four rectangles of standard uncertainty 1 give 3.92 at a coverage of 1.96 (the exact distribution 3.88).

    Source: JCGM 101:2008, 9.2.3, the Gaussian interval.
    Tolerance: 2e-3, the digits stated.
    """
    assert RootSumSquare.combined(_limits(*[sqrt(3.0)] * 4), 1.96).error_a(1.0) == near(3.92, rel=2e-3)
    assert RootSumSquare.combined(_limits(*[sqrt(3.0)] * 4), 1.96).error_a(1.0) == near(2.0 * 1.96)


def test_one_dominant_rectangle() -> None:
    """Rectangles of standard uncertainty 1, 1, 1 and 10 give 19.89 at a coverage of 1.96.

    Source: JCGM 101:2008, 9.2.4, the GUM interval.
    Tolerance: 5e-4, the digits stated.
    """
    limits = [sqrt(3.0)] * 3 + [10.0 * sqrt(3.0)]
    assert RootSumSquare.combined(_limits(*limits), 1.96).error_a(1.0) == near(19.89, rel=5e-4)


@given(st.lists(st.floats(1e-9, 1.0), min_size=1, max_size=30))
def test_root_sum_square_exceeds_the_worst_case_by_little(limits: list[float]) -> None:
    """At a coverage of 2 it is at most 2 / sqrt 3 of the worst case, 15 % above it, where one term stands alone."""
    worst = WorstCase.combined(_limits(*limits), 2.0).error_a(1.0)
    squares = RootSumSquare.combined(_limits(*limits), 2.0).error_a(1.0)
    assert squares <= worst * 2.0 / sqrt(3.0) * (1.0 + 1e-12)
    assert RootSumSquare.combined(_limits(1.0), 2.0).error_a(1.0) == near(1.1547005383792517)


def test_quantisation_makes_the_noise_of_an_ideal_converter() -> None:
    """Half a count, as a rectangle, leaves a full sine 6.0206 N + 1.7609 dB above it: 61.97 dB of 10 bits.

    Source: uniform quantisation.
    Tolerance: 1e-5, the digits stated.
    """
    row = next(row for row in amounts(operating(), 1.0) if row.name == "quantisation")
    sine_a = 4.0 / 2.0 / sqrt(2.0) / 2.0  # of the converter's 4 V over 2 ohm
    assert 20.0 * log10(sine_a / row.standard_a) == near(6.0206 * 10 + 1.7609, rel=1e-5)


@pytest.mark.parametrize("law", OF_LAW)
@pytest.mark.parametrize("method", METHODS)
@pytest.mark.parametrize("calibration", ["none", "zero", "zero-and-span"])
def test_error_is_what_its_terms_make(law: str, method: str, calibration: str) -> None:
    """At any current the combined error is the sum of the amounts, or coverage times the root of their squares."""
    at = operating(design(law), accuracy__method=method, accuracy__calibration=calibration, **FULL)
    for current in (0.0, 0.1, 0.37, 1.0):
        rows = amounts(at, current)
        if method == "rss":
            wanted = 2.0 * sqrt(fsum(row.standard_a**2 for row in rows))
        else:
            wanted = fsum(row.amount_a for row in rows)
        assert combined(at).error_a(current) == near(wanted, rel=1e-13)


def test_noise_is_shown_as_the_method_counts_it() -> None:
    """Noise stands as three sigmas in the worst case and as one in a root sum of squares; its uncertainty is one."""
    worst = amounts(operating(accuracy__method="worst-case"), 1.0)[-1]
    squares = amounts(operating(accuracy__method="rss"), 1.0)[-1]
    assert worst.name == squares.name == "noise"
    assert worst.amount_a == near(3.0 * worst.standard_a)
    assert squares.amount_a == squares.standard_a == worst.standard_a


def test_amounts_leave_out_what_is_zero() -> None:
    """Only what counts is listed, in the order of the terms."""
    rows = [row.name for row in amounts(operating(), 1.0)]
    assert rows == [
        "shunt tolerance",
        "shunt temperature",
        "shunt self-heating",
        "offset",
        "offset drift",
        "bias current",
        "common-mode change",
        "supply change",
        "quantisation",
        "noise",
    ]
    order = [one.name for one in TERMS]
    assert rows == sorted(rows, key=order.index)


# Two resistors of 0.7 % each on a shunt of 1 %: 1.4 % as a sum, 0.99 % as a root of squares.
TWO = design("two-resistor", common=resistor(1e3, "RC", tolerance=0.007), gain=(resistor(1e4, "RG", tolerance=0.007),))


def test_gain_resistors_enter_one_by_one() -> None:
    """Two resistors of 0.7 % have 0.7 % * sqrt(2 / 3) of standard uncertainty, and 1.4 % of limit."""
    row = next(row for row in amounts(operating(TWO), 1.0) if row.name == "gain resistors")
    assert (row.amount_a, row.standard_a) == near((0.014, 0.007 * sqrt(2.0 / 3.0)))


@pytest.mark.parametrize(("method", "largest"), [("worst-case", "gain resistors"), ("rss", "shunt tolerance")])
def test_largest_term_by_the_methods_own_measure(method: str, largest: str) -> None:
    """Of 1.4 % in two causes and 1 % in one the first is the larger limit, the second the larger uncertainty."""
    at = operating(TWO, accuracy__method=method)
    assert largest_term(at, amounts(at, 1.0)) == largest


def test_largest_term_of_equal_ones_is_the_first() -> None:
    """Shunt and reference of 1 % each: the shunt stands first in the table."""
    at = operating(converter__reference_tolerance=0.01)
    assert largest_term(at, amounts(at, 1.0)) == "shunt tolerance"
