"""The stock covers the boards, and the parts of a board cost no more than is granted."""

from __future__ import annotations

from dataclasses import replace
from typing import TYPE_CHECKING

import numpy as np
import pytest

from selector.limits import ChoiceAt, ChoiceCheck
from tests.builders import (
    amplifier,
    capacitor,
    chain,
    conditions,
    design,
    limit,
    measured,
    meets,
    near,
    resistor,
    shunt,
)
from tests.limits.edges import check_edge

if TYPE_CHECKING:
    from selector.candidate import Design
    from selector.limits import Measure

THREE_BOARDS = {"parts__from": "stock", "parts__boards": 3}
HELD = design(
    shunts=(shunt(quantity=3),),
    amplifier=amplifier(quantity=3),
    filter_resistor=resistor(quantity=3),
    filter_capacitor=capacitor(quantity=3),
)


def test_stock_just_covers_the_boards() -> None:
    """Three of each part build three boards."""
    assert meets("stock", chain(HELD, **THREE_BOARDS))
    assert not meets("stock", chain(HELD, **THREE_BOARDS | {"parts__boards": 4}))


@pytest.mark.parametrize(
    ("place", "short"),
    [
        ("shunts", (shunt(quantity=2),)),
        ("amplifier", amplifier(quantity=2)),
        ("filter_resistor", resistor(quantity=2)),
        ("filter_capacitor", capacitor(quantity=None)),
    ],
)
def test_stock_of_every_part(place: str, short: object) -> None:
    """One part short, or not stocked at all, is enough to fail; it matters not with parts.from = "all"."""
    of = replace(HELD, **{place: short})
    assert not meets("stock", chain(of, **THREE_BOARDS))
    assert measured("stock", chain(of, parts__boards=3)) == []


def test_stock_of_a_part_in_several_places() -> None:
    """A resistor in all places of a difference amplifier counts five times a board: 15 for three boards."""

    def of(quantity: int) -> Design:
        one = resistor(1e3, quantity=quantity)
        plain = design("difference", common=one, gain=(one,), filter_resistor=one)
        return replace(
            plain,
            shunts=HELD.shunts,
            amplifier=amplifier("difference", quantity=3),
            filter_capacitor=HELD.filter_capacitor,
        )

    assert meets("stock", chain(of(15), **THREE_BOARDS))
    assert not meets("stock", chain(of(14), **THREE_BOARDS))
    assert [(row.value, row.allowed) for row in measured("stock", chain(of(14), **THREE_BOARDS))] == [(15.0, 14.0)]


def test_stock_shows_the_part_that_is_shortest() -> None:
    """Of 3 needed and 1 held of one part, 2 of another, the first is shown."""
    of = replace(HELD, shunts=(shunt(quantity=2),), amplifier=amplifier(quantity=1))
    assert [(row.value, row.allowed) for row in measured("stock", chain(of, **THREE_BOARDS))] == [(3.0, 1.0)]


def test_stock_leaves_out_exempt_parts() -> None:
    """A part from outside the stock is not counted; a design of such parts alone has no figure."""
    of = replace(HELD, shunts=(shunt(quantity=None),))
    assert meets("stock", chain(of, frozenset({("shunt", "S")}), **THREE_BOARDS))
    assert not meets("stock", chain(of, frozenset({("resistor", "S")}), **THREE_BOARDS))
    every = frozenset({("shunt", "S"), ("amplifier", "A"), ("resistor", "R"), ("capacitor", "C")})
    assert measured("stock", chain(of, every, **THREE_BOARDS)) == []


PRICED = design(
    shunts=(shunt(unit_cost=1.5),),
    amplifier=amplifier(unit_cost=2.0),
    filter_resistor=resistor(unit_cost=0.125),
    filter_capacitor=capacitor(unit_cost=0.0625),
)


def test_cost() -> None:
    """1.5 + 2 + 0.125 + 0.0625 = 3.6875 a board, however many boards."""
    check_edge("cost", lambda most: chain(PRICED, limits__cost=most, parts__boards=7), 3.6875, meets_from="above")


def test_cost_that_is_not_limited() -> None:
    """Without limits.cost nothing is judged, known or not."""
    assert measured("cost", chain(PRICED)) == measured("cost", chain()) == []


def test_cost_that_is_not_known_fails_every_limit() -> None:
    """A part without a unit cost leaves the cost unknown, and an unknown cost is within no limit."""
    assert not meets("cost", chain(replace(PRICED, amplifier=amplifier()), limits__cost=1e6))


def _choice(name: str, at: ChoiceAt) -> Measure:
    """Return what a limit says of every filter pair at once."""
    (check,) = (one for one in limit(name).checks if isinstance(one, ChoiceCheck))
    measure = check.measure(at)
    assert measure is not None
    return measure


def _beside(of: Design, **changes: object) -> ChoiceAt:
    """Return a design beside three filter pairs; the third takes parts that stand elsewhere too."""
    return ChoiceAt(
        conditions=conditions(**THREE_BOARDS, **changes),
        design=replace(of, filter_resistor=None, filter_capacitor=None),
        exempt=frozenset(),
        resistor_uses=np.array([1.0, 1.0, 2.0]),
        capacitor_uses=np.array([1.0, 1.0, 2.0]),
        held_resistors=np.array([3.0, 2.0, 6.0]),
        held_capacitors=np.array([3.0, 9.0, 4.0]),
        cost=np.array([3.0, 4.0, np.inf]),
    )


def test_stock_of_every_filter_pair() -> None:
    """Three of each will do; 2 resistors are one short, 4 capacitors of twice 3 two; all are beside a short rest."""
    measure = _choice("stock", _beside(HELD))
    assert np.array_equal(measure.value, [0.0, 1.0, 2.0])
    assert np.array_equal(measure.meets, [True, False, False])
    short = _choice("stock", _beside(replace(HELD, shunts=(shunt(quantity=1),))))
    assert np.array_equal(short.value, [2.0, 2.0, 2.0])


def test_cost_of_every_filter_pair() -> None:
    """Of boards at 3, at 4 and at no known cost the first two are within 4, the first alone within 3.5."""
    assert np.array_equal(_choice("cost", _beside(HELD, limits__cost=4.0)).meets, [True, True, False])
    assert np.array_equal(_choice("cost", _beside(HELD, limits__cost=3.5)).meets, [True, False, False])
    assert measured("cost", chain(PRICED, limits__cost=4.0))[0].value == near(3.6875)
