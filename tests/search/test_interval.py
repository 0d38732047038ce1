"""Arithmetic of numbers of which only the ends are known."""

from __future__ import annotations

from itertools import product
from math import inf
from operator import add, gt, lt, mul, sub, truediv
from typing import TYPE_CHECKING, Any

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from selector.search.interval import Interval, lower, upper

if TYPE_CHECKING:
    from collections.abc import Callable

SHORT = settings(max_examples=20, deadline=None, derandomize=True)
ULPS = 4.0 * np.finfo(float).eps  # a quotient by what may be negative is a product with a reciprocal: two roundings
EACH = 3  # elements of an array
SIZES = st.floats(1e-6, 1e6)
NUMBERS = st.one_of(SIZES, SIZES.map(lambda size: -size), st.just(0.0))
SHARES = st.one_of(st.sampled_from((0.0, 1.0)), st.floats(0.0, 1.0))
KINDS = ("interval", "array", "float", "numpy float")

OF_TWO: dict[str, Callable[[Any, Any], Any]] = {
    "sum": add,
    "difference": sub,
    "product": mul,
    "quotient": truediv,
    "less": lt,
    "more": gt,
    "numpy sum": np.add,
    "numpy difference": np.subtract,
    "numpy product": np.multiply,
    "numpy quotient": np.true_divide,
    "numpy less": np.less,
    "numpy more": np.greater,
    "minimum": np.minimum,
    "maximum": np.maximum,
    "one or the other": lambda first, second: np.where(first < second, first, 2.0 * second),
    "one or a number": lambda first, second: np.where(first > second, first, 1.0),
    "a number or one": lambda first, second: np.where(second < first, -1.0, second),
}
QUOTIENTS = ("quotient", "numpy quotient")
OF_ONE: dict[str, Callable[[Any], Any]] = {
    "negative": lambda value: -value,
    "size": abs,
    "numpy size": np.absolute,
    "square": lambda value: value**2,
    "numpy square": lambda value: np.power(value, 2.0),
}


class Drawn:
    """A number between ends, or a known one: as the search holds it, and as it is."""

    def __init__(self, kind: str, low: np.ndarray, high: np.ndarray, share: np.ndarray) -> None:
        """Take ends of shape (EACH,) and where between them the number lies."""
        real = np.clip(low + share * (high - low), low, high)
        one = np.full(EACH, real[0])
        self.real = real if kind in ("interval", "array") else one
        self.held: Any = {
            "interval": Interval(low, high),
            "array": real,
            "float": float(one[0]),
            "numpy float": one[0],
        }[kind]


@st.composite
def drawn(draw: st.DrawFn, kind: str, ends: st.SearchStrategy[float] = NUMBERS, *, alike: bool = False) -> Drawn:
    """Return a number of a kind; with `alike`, and now and then without, its ends have one sign and none is 0."""
    low, high, share = (np.array(draw(st.lists(one, min_size=EACH, max_size=EACH))) for one in (ends, ends, SHARES))
    if alike or (ends is NUMBERS and draw(st.booleans())):
        sign = draw(st.sampled_from((-1.0, 1.0)))
        low, high = (sign * np.maximum(np.abs(one), 1e-6) for one in (low, high))
    return Drawn(kind, np.minimum(low, high), np.maximum(low, high), share)


def encloses(held: object, real: object) -> None:
    """Compare the ends of an interval with a number between them, but for rounding."""
    assert isinstance(held, Interval)
    value = np.asarray(real, dtype=float)
    room = ULPS * np.abs(value)
    assert (lower(held) <= value + room).all()
    assert (value - room <= upper(held)).all()


def is_point(held: object, real: object) -> None:
    """Compare both ends of an interval with a number."""
    for end in (lower(held), upper(held)):
        np.testing.assert_allclose(end, np.asarray(real, dtype=float), rtol=ULPS, atol=0.0)


def _pairs() -> list[tuple[str, str]]:
    return [pair for other in KINDS for pair in ((KINDS[0], other), (other, KINDS[0]))][1:]


@pytest.mark.parametrize("name", OF_TWO)
@given(data=st.data())
@SHORT
def test_operation_of_two_encloses_every_result(name: str, data: st.DataObject) -> None:
    """Whatever stands at its side, an interval or a number, the result holds that of all numbers in between.

    Source: IEEE 1788-2015, the fundamental theorem of interval arithmetic.
    Tolerance: 4 roundings, the quotient's being those of a reciprocal and a product.
    """
    kinds = data.draw(st.sampled_from([*_pairs(), *[(KINDS[0], KINDS[0])] * 3]))
    first = data.draw(drawn(kinds[0]))
    second = data.draw(drawn(kinds[1], alike=name in QUOTIENTS))
    encloses(OF_TWO[name](first.held, second.held), OF_TWO[name](first.real, second.real))


@pytest.mark.parametrize("name", OF_TWO)
@given(data=st.data())
@SHORT
def test_operation_of_two_is_exact_at_points(name: str, data: st.DataObject) -> None:
    """Where both ends are equal the result is that of the number.

    Source: IEEE 1788-2015: a point interval stands for its number.
    Tolerance: 4 roundings, the quotient's being those of a reciprocal and a product.
    """
    first, second = data.draw(drawn("array")).real, data.draw(drawn("array", alike=name in QUOTIENTS)).real
    held = OF_TWO[name](Interval(first, first), Interval(second, second))
    is_point(held, OF_TWO[name](first, second))


@pytest.mark.parametrize("name", OF_ONE)
@given(data=st.data())
@SHORT
def test_operation_of_one_encloses_every_result_and_is_exact_at_points(name: str, data: st.DataObject) -> None:
    """Negative, size and square hold the result of every number between the ends, of either sign.

    Source: IEEE 1788-2015, the fundamental theorem of interval arithmetic.
    Tolerance: 4 roundings.
    """
    number = data.draw(drawn("interval"))
    encloses(OF_ONE[name](number.held), OF_ONE[name](number.real))
    is_point(OF_ONE[name](Interval(number.real, number.real)), OF_ONE[name](number.real))


@pytest.mark.parametrize("exponent", [0.5, 1.0, 2.0, 3.0])
@given(data=st.data())
@SHORT
def test_power_of_what_is_not_negative(exponent: float, data: st.DataObject) -> None:
    """Roots and powers of numbers from 0 up are enclosed; the root of what is not known to be so starts at 0.

    Source: IEEE 1788-2015: a root is that of the part of an interval on which it is defined.
    Tolerance: 4 roundings.
    """
    number = data.draw(drawn("interval", st.one_of(SIZES, st.just(0.0))))
    encloses(number.held**exponent, number.real**exponent)
    encloses(np.power(number.held, exponent), number.real**exponent)
    is_point(Interval(number.real, number.real) ** exponent, number.real**exponent)
    wider = Interval(lower(number.held) - 1.0, upper(number.held))
    encloses(wider**0.5, number.real**0.5)


@given(data=st.data())
@SHORT
def test_chosen_by_what_is_known(data: st.DataObject) -> None:
    """A condition of plain truths chooses between intervals element by element."""
    first, second = data.draw(drawn("interval")), data.draw(drawn("interval"))
    condition = np.array(data.draw(st.lists(st.booleans(), min_size=EACH, max_size=EACH)))
    held = np.where(condition, first.held, second.held)
    encloses(held, np.where(condition, first.real, second.real))
    assert (lower(held) == np.where(condition, lower(first.held), lower(second.held))).all()


@given(data=st.data())
@SHORT
def test_knowledge_of_the_sign_changes_no_end(data: st.DataObject) -> None:
    """That no element is negative, handed on from operation to operation, gives the ends that the elements give."""
    ends = st.one_of(SIZES, st.just(0.0))
    first, second = data.draw(drawn("interval", ends)).held, data.draw(drawn("interval", ends, alike=True)).held
    second = abs(second)
    for made in (first + second, first * second, first / second, first**2, abs(first - second)):
        assert made.positive == bool((lower(made) >= 0.0).all())
        again = Interval(lower(made), upper(made))
        for other in (made * first, again * first):
            np.testing.assert_array_equal(lower(other), lower(again * first))
            np.testing.assert_array_equal(upper(other), upper(again * first))


@given(data=st.data())
@SHORT
def test_what_two_have_in_common(data: st.DataObject) -> None:
    """A number between the ends of both is between those of what they have in common; nothing else is."""
    first, second = data.draw(drawn("interval")), data.draw(drawn("interval"))
    both = first.held.within(second.held)
    for value in (first.real, second.real):
        inside = (lower(first.held) <= value) & (value <= upper(first.held))
        inside &= (lower(second.held) <= value) & (value <= upper(second.held))
        np.testing.assert_array_equal(inside, (lower(both) <= value) & (value <= upper(both)))


@pytest.mark.parametrize("name", ["sum", "difference", "product", "quotient", "minimum", "maximum"])
def test_ends_are_reached(name: str) -> None:
    """Of every sign and both ends alike or not, the result is no wider than the results of the ends.

    Source: IEEE 1788-2015: the tightest interval that holds the range of an operation.
    Tolerance: 4 roundings, the quotient's being those of a reciprocal and a product.
    """
    ends = (-3.0, -2.0, -0.5, 0.0, 0.5, 2.0, 3.0)
    every = [pair for pair in product(ends, ends) if pair[0] <= pair[1]]
    pairs = [(one, two) for one in every for two in every if name != "quotient" or two[0] * two[1] > 0.0]
    (low, high), (other_low, other_high) = np.array(pairs).transpose(1, 2, 0)
    held = OF_TWO[name](Interval(low, high), Interval(other_low, other_high))
    results = [OF_TWO[name](one, two) for one in (low, high) for two in (other_low, other_high)]
    np.testing.assert_allclose(lower(held), np.min(results, axis=0), rtol=ULPS, atol=0.0)
    np.testing.assert_allclose(upper(held), np.max(results, axis=0), rtol=ULPS, atol=0.0)


def test_ends_broadcast() -> None:
    """Intervals of rows and of columns give an interval of the table."""
    rows = Interval(np.array([[1.0], [2.0]]), np.array([[3.0], [4.0]]))
    table = rows * Interval(np.array([[-1.0, 0.0, 1.0]]), np.array([[0.0, 1.0, 2.0]]))
    assert lower(table).tolist() == [[-3.0, 0.0, 1.0], [-4.0, 0.0, 2.0]]
    assert upper(table).tolist() == [[0.0, 3.0, 6.0], [0.0, 4.0, 8.0]]


def test_figures_that_are_not_stated_are_infinite() -> None:
    """Beside an infinite figure: nothing is left of a share of it, and the smaller of two is the other one."""
    some = Interval(np.array([2.0]), np.array([5.0]))
    without = some / inf
    assert (lower(without).tolist(), upper(without).tolist()) == ([0.0], [0.0])
    speed = np.minimum(inf / some, 3.0)
    assert (lower(speed).tolist(), upper(speed).tolist()) == ([3.0], [3.0])
    loop = 1.0 / (1.0 + np.array([inf]) / some)
    assert (lower(loop).tolist(), upper(loop).tolist()) == ([0.0], [0.0])


def test_ends_of_a_plain_number_are_the_number() -> None:
    """A float or an array is its own lower and upper end."""
    assert (float(lower(2.0)), float(upper(2.0))) == (2.0, 2.0)
    assert lower(np.array([1.0, 2.0])).tolist() == upper(np.array([1.0, 2.0])).tolist() == [1.0, 2.0]


@pytest.mark.parametrize(
    "asked",
    [
        np.exp,
        np.sqrt,
        np.add.reduce,
        lambda value: np.add(value, 1.0, out=np.zeros(1)),
        lambda value: np.add.outer(value, 1.0),
        np.where,
        np.clip,
        lambda value: value <= 1.0,
        lambda value: value >= 1.0,
    ],
)
def test_function_that_is_not_known_is_refused(asked: Callable[[Any], Any]) -> None:
    """A function that no formula uses raises, rather than give a figure that bounds nothing."""
    with pytest.raises(TypeError):
        asked(Interval(np.array([1.0]), np.array([2.0])))
