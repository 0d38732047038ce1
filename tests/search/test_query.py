"""What a search says of itself: counts, order, ranks, marks."""

from __future__ import annotations

from dataclasses import replace

import pytest

from selector.gain import LAWS
from selector.parts import Shunt
from selector.search import judge, search
from selector.search.order import cost_key, rounded
from tests.search.small import capacitor, part, resistor, spec, stock

FILTER = (resistor("R", 1e3), capacitor("C", 1e-7))


def test_nominal_combinations() -> None:
    """Two shunts, a fixed and a non-inverting amplifier, one switch, one resistor, one capacitor, up to two ranges.

    fixed: 2 shunts x 1 filter = 2. non-inverting: K = 1: 2 x 1^2; K = 2: 2 x 1 switch x 1^3: 4. In all 6.
    Source: the definition in words, counted by hand.
    """
    switch = {"on_resistance": 1.0, "on_resistance_spread": 0.5, "leakage": 1e-9, "channels": 2}
    parts = (
        part("shunt", part="S1"),
        part("shunt", part="S2"),
        part("amplifier", part="A1"),
        part("amplifier", part="A2", gain_law="non-inverting", gain=None),
        part("switch", part="W", supply_min=1.8, supply_max=5.5, **switch),
        *FILTER,
    )
    assert search(spec(ranges__most=2), stock(*parts)).searched.combinations == 6


def test_ranks_rise_and_the_front_is_marked() -> None:
    """Ranks count from 1; a candidate that another beats in every use is off the front."""
    shunts = [part("shunt", part=f"S{number}", resistance=ohm) for number, ohm in enumerate((0.5, 0.9, 1.1))]
    found = search(spec(), stock(*shunts, *FILTER))
    assert [one.rank for one in found.candidates] == [1, 2, 3]
    scores = [one.score for one in found.candidates]
    assert scores == sorted(scores)
    for one in found.candidates:
        beaten = any(
            other is not one
            and other.uses.power <= one.uses.power
            and other.uses.burden <= one.uses.burden
            and other.uses.headroom <= one.uses.headroom
            and other.uses.error <= one.uses.error
            for other in found.candidates
        )
        assert one.pareto is not beaten


def test_equal_scores_stand_by_cost_then_name() -> None:
    """Shunts alike in every figure stand in the order of their cost, the unpriced last, then of their codes."""
    rows = (("S3", 0.5), ("S2", 0.2), ("S1", 0.5), ("S4", None))
    shunts = [part("shunt", part=code, unit_cost=cost) for code, cost in rows]
    priced = [part("amplifier", unit_cost=1.0), resistor("R", 1e3, unit_cost=0.1), capacitor("C", 1e-7, unit_cost=0.1)]
    found = search(spec(), stock(*shunts, *priced))
    assert [one.design.shunts[0].part for one in found.candidates] == ["S2", "S1", "S3", "S4"]


def test_parts_of_two_currencies_have_no_cost() -> None:
    """Costs in more than one currency are no costs."""
    rows = (
        part("shunt", unit_cost=1.0, currency="EUR"),
        part("amplifier", unit_cost=1.0, currency="CHF"),
        resistor("R", 1e3, unit_cost=0.1, currency="EUR"),
        capacitor("C", 1e-7, unit_cost=0.1, currency="EUR"),
    )
    assert search(spec(), stock(*rows)).candidates[0].cost is None


def test_narrowing_is_counted() -> None:
    """Parts outside parts.only, in parts.avoid or short of the boards are left out and counted by reason."""
    shunts = [part("shunt", part=f"S{number}", quantity=number) for number in range(4)]
    rest = (part("amplifier", quantity=9), resistor("R", 1e3, quantity=9), capacitor("C", 1e-7, quantity=9))
    only = {"shunt": ["S0", "S1", "S2"]}
    found = search(
        spec(parts__from="stock", parts__boards=2, parts__only=only, parts__avoid=["S2"]), stock(*shunts, *rest)
    )
    reasons = {(row.kind, row.reason): row.count for row in found.searched.left_out}
    assert reasons == {
        ("shunt", "in parts.avoid"): 1,
        ("shunt", "not in parts.only"): 1,
        ("shunt", "not in stock"): 1,
        ("shunt", "too few in stock"): 1,
    }


def test_generic_parts_are_no_stock() -> None:
    """A generic part is out with parts.from = "stock", whatever quantity it states, and in with "all"."""
    rows = (part("shunt", generic=True, quantity=9), *FILTER)
    assert search(spec(), stock(*rows)).searched.shunts == 1
    assert search(spec(parts__from="stock"), stock(*rows)).searched.shunts == 0


def test_figures_are_compared_by_twelve_digits() -> None:
    """0.1 + 0.2 counts as 0.3; a difference in the twelfth digit counts."""
    assert rounded(0.1 + 0.2) == rounded(0.3)
    assert rounded(1.00000000001) != rounded(1.0)
    assert cost_key(None) > cost_key(1e9)
    assert cost_key(0.1 + 0.2) == cost_key(0.3)


def test_empty_catalogue_fits_nothing() -> None:
    """Without any part there is no pair, nothing blocked and nothing near."""
    found = search(spec(), {})
    assert found.candidates == ()
    assert found.nothing_fits is not None
    assert (found.nothing_fits.pairs, found.nothing_fits.blocked, found.nothing_fits.nearest) == (0, (), None)


@pytest.mark.parametrize("law", list(LAWS))
def test_empty_shelves_are_answered(law: str) -> None:
    """Without resistors, capacitors or both nothing fits, whatever the law, and the counts sum to the pairs."""
    fields = {
        "one-resistor": {"gain_resistance": 1e5},
        "two-resistor": {"gain_factor": 2.0},
        "current-output": {"transconductance": 2e-4},
    }.get(law, {})
    gain = 20.0 if law == "fixed" else None
    amplifier = part("amplifier", gain_law=law, gain=gain, **fields)
    switch = {"on_resistance": 1.0, "on_resistance_spread": 0.5, "leakage": 1e-9, "channels": 2}
    rest = (amplifier, part("switch", part="W", supply_min=1.8, supply_max=5.5, **switch))
    for parts in ((), (capacitor("C", 1e-7),), (resistor("R", 1e3),)):
        found = search(spec(ranges__most=2), stock(*rest, *parts))
        assert found.candidates == ()
        assert found.nothing_fits is not None
        assert sum(count for _, count in found.nothing_fits.blocked) == found.nothing_fits.pairs == 1


def test_unknown_cost_does_not_meet_a_limit() -> None:
    """A part without a cost is out where limits.cost is stated: physics 4, null: out."""
    priced = [part("amplifier", unit_cost=1.0), resistor("R", 1e3, unit_cost=0.1), capacitor("C", 1e-7, unit_cost=0.1)]
    shunts = (part("shunt", part="S1"), part("shunt", part="S2", unit_cost=0.5))
    found = search(spec(limits__cost=5.0), stock(*shunts, *priced))
    assert [one.design.shunts[0].part for one in found.candidates] == ["S2"]


def test_design_in_two_currencies_has_no_cost() -> None:
    """Costs in more than one currency are no costs when a design is judged, either."""
    rows = stock(
        part("shunt", unit_cost=1.0, currency="EUR"),
        part("amplifier", unit_cost=1.0, currency="EUR"),
        resistor("R", 1e3, unit_cost=0.1, currency="EUR"),
        capacitor("C", 1e-7, unit_cost=0.1, currency="EUR"),
    )
    design = search(spec(), rows).candidates[0].design
    foreign = part("shunt", unit_cost=1.0, currency="CHF")
    assert isinstance(foreign, Shunt)
    judged = judge(spec(limits__cost=9.0), replace(design, shunts=(foreign,)), rows)
    assert judged.candidate is not None
    assert judged.candidate.cost is None
    assert not judged.meets


def test_list_without_a_place_is_refused() -> None:
    """A list of no candidates cannot be asked for."""
    with pytest.raises(ValueError, match="top is 0"):
        search(spec(), stock(*FILTER), top=0)


def test_progress_counts_pairs() -> None:
    """Progress tells of two pairs, in their order, and ends with both."""
    told: list[tuple[int, int]] = []
    shunts = (part("shunt", part="S1"), part("shunt", part="S2"))
    search(spec(), stock(*shunts, *FILTER), progress=lambda done, total: told.append((done, total)))
    assert told[-1] == (2, 2)
    assert [done for done, _ in told] == sorted({done for done, _ in told})
