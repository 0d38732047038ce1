"""Dielectric codes: what they promise of temperature."""

from __future__ import annotations

import pytest

from selector.parts import Capacitor, dielectric_change_frac, dielectric_span_degc, read_part


@pytest.mark.parametrize(
    ("code", "span_degc", "change_frac"),
    [
        ("X7R", (-55.0, 125.0), 0.15),
        ("X5R", (-55.0, 85.0), 0.15),
        ("Y5V", (-30.0, 85.0), 0.82),
        ("Z5U", (10.0, 85.0), 0.56),
        ("X8R", (-55.0, 150.0), 0.15),
        ("X7T", (-55.0, 125.0), 0.33),
        ("X6S", (-55.0, 105.0), 0.22),
        ("C0G", (-55.0, 125.0), 0.003),
        ("C0H", (-55.0, 125.0), 0.006),
        ("U2J", (-55.0, 125.0), 0.087),
        ("x7r", (-55.0, 125.0), 0.15),
        ("COG", (-55.0, 125.0), 0.003),
        ("NP0", (-55.0, 125.0), 0.003),
        ("npo", (-55.0, 125.0), 0.003),
    ],
)
def test_a_code_gives_span_and_change(code: str, span_degc: tuple[float, float], change_frac: float) -> None:
    """A dielectric code gives its temperatures and the largest change over them, against 25 degC.

    Source: from memory: EIA-198, tables of class I and class II/III codes; U2J is -750 +- 120 ppm/K over 100 K.
    Tolerance: 1e-12, rounding of the sum.
    """
    assert dielectric_span_degc(code) == span_degc
    assert dielectric_change_frac(code) == pytest.approx(change_frac, rel=1e-12)


@pytest.mark.parametrize("code", ["", "PP", "film", "X7", "X7RR", "X1R", "X7Q", "C0R", "Q7R", "77R", "Å7R", "tantalum"])
def test_what_is_no_code_gives_nothing(code: str) -> None:
    """A dielectric that is no code of the tables has neither span nor change."""
    assert dielectric_span_degc(code) is None
    assert dielectric_change_frac(code) is None


def test_a_slope_that_leaves_nothing_gives_no_change() -> None:
    """A class I code whose slope would change the capacitance by all of itself gives no figure."""
    assert dielectric_change_frac("U4J") is None


CELLS = {"part": "C-1", "capacitance": "100 nF", "tolerance": "10 %"}


def test_an_absent_temperature_change_comes_from_the_code() -> None:
    """A capacitor with a code and no stated change has the code's."""
    assert read_part("capacitor", {**CELLS, "dielectric": "X7R"}, where="").temp_change == 0.15
    assert Capacitor(part="C-1", capacitance=1e-7, tolerance=0.1, dielectric="X5R").temp_change == 0.15


def test_a_stated_temperature_change_stands() -> None:
    """A change that the part states is not replaced by the code's."""
    part = read_part("capacitor", {**CELLS, "dielectric": "X7R", "temp_change": "5 %"}, where="")
    assert part.temp_change == 0.05


def test_without_change_and_code_there_is_none() -> None:
    """What neither the part nor a code states is absent, not zero."""
    assert read_part("capacitor", {**CELLS, "dielectric": "PP"}, where="").temp_change is None
