"""Generic parts and preferred values."""

from __future__ import annotations

import pytest

from selector.app.fill import Span, generic_parts, value_code
from selector.app.series import series, value_of
from selector.errors import InputRefused, UsageRefused
from selector.units import CAPACITANCE, INDUCTANCE, RESISTANCE, parse

FIELDS = {"tolerance": "1 %", "tempco": "100 ppm/K"}


@pytest.mark.parametrize(
    ("value", "name", "code"),
    [
        (4990.0, "resistance", "4k99"),
        (10.0, "resistance", "10R"),
        (0.05, "resistance", "0R05"),
        (1e6, "resistance", "1M"),
        (332e3, "resistance", "332k"),
        (100e-9, "capacitance", "100n"),
        (4.7e-12, "capacitance", "4p7"),
        (2.2e-6, "capacitance", "2u2"),
    ],
)
def test_value_has_a_letter_for_its_mark(value: float, name: str, code: str) -> None:
    """A value is written with a letter in the place of its decimal mark, and reads back as itself.

    Source: IEC 60062:2016, clause 4 (from memory).
    Tolerance: none, the double is the same.
    """
    assert value_code(value, name) == code
    assert parse(code, RESISTANCE if name == "resistance" else CAPACITANCE) == value


def test_generic_part_says_what_it_is() -> None:
    """A part of a series has a code of kind, series, value and tolerance, no quantity, and is marked generic."""
    part = generic_parts("resistor", Span("E96", "4.9k", "5k"), FIELDS)[0]
    assert part.part == "resistor-E96-4k99-1%"
    assert (part.generic, part.quantity) == (True, None)


def test_all_values_of_the_span_are_filled() -> None:
    """Both ends count: ten to a megohm of E96 are five decades and one value."""
    assert len(generic_parts("resistor", Span("E96", "10", "1M"), FIELDS)) == 5 * 96 + 1


@pytest.mark.parametrize("field", ["part", "quantity", "generic", "source", "resistance"])
def test_what_fill_sets_itself_is_refused(field: str) -> None:
    """Code, quantity, mark and value are not given by hand."""
    with pytest.raises(UsageRefused, match="is set by fill itself"):
        generic_parts("resistor", Span("E6", "1", "10"), {**FIELDS, field: "1"})


def test_empty_span_is_refused() -> None:
    """A span without a value of the series is wrong usage; figures that cannot be are refused."""
    with pytest.raises(UsageRefused, match="no value of E3 lies from 3 to 4"):
        generic_parts("resistor", Span("E3", "3", "4"), FIELDS)
    with pytest.raises(InputRefused, match="tolerance"):
        generic_parts("resistor", Span("E3", "1", "10"), {**FIELDS, "tolerance": "200 %"})


def test_unit_says_what_the_value_is_of() -> None:
    """Ohm, farad and henry are told apart by the unit; a bare number is in ohm."""
    assert value_of("4.9k") == (4900.0, RESISTANCE)
    assert value_of("47") == (47.0, RESISTANCE)
    assert value_of("100 nF") == (100e-9, CAPACITANCE)
    assert value_of("10 uH") == (10e-6, INDUCTANCE)


def test_capacitors_add_up_in_parallel() -> None:
    """Two capacitors in parallel make their sum, two resistors in series do.

    Source: circuit theory; C = C1 + C2, R = R1 + R2.
    Tolerance: 1e-12, rounding of the sum.
    """
    for text, how in (("5 nF", "parallel"), ("5k", "series")):
        best = series(text, "E24", how=how).pairs[0]
        assert best.first + best.second == pytest.approx(best.value, rel=1e-12)
        assert best.deviation == 0.0
