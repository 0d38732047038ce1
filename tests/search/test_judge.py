"""A given design against a spec: the same figures as the search, every limit with its figure, an open filter chosen."""

from __future__ import annotations

import json
from dataclasses import replace
from functools import cache
from pathlib import Path
from typing import TYPE_CHECKING, Any

import pytest

from selector.limits import LIMITS
from selector.parts import read_part
from selector.search import judge, search
from selector.spec import spec_of
from tests.builders import (
    HIGH_SIDE,
    ZERO,
    amplifier,
    capacitor,
    design,
    near,
    resistor,
    shunt,
    spec,
    switched,
)

if TYPE_CHECKING:
    from selector.candidate import Design, Verdict
    from selector.parts import Part
    from selector.search import Found
    from selector.search.found import Judged
    from selector.spec import Spec

CASES = sorted((Path(__file__).parents[1] / "reference" / "cases").glob("ranges_*.json"))
BY_NAME = pytest.mark.parametrize("path", CASES, ids=lambda path: path.stem)
STOCK = {"resistor": (resistor(code="R1"),), "capacitor": (capacitor(code="C1"),)}


@cache
def _case(path: Path) -> tuple[Spec, dict[str, tuple[Part, ...]], Found]:
    """Return spec, stock and short list of a case."""
    case: dict[str, Any] = json.loads(path.read_text(encoding="utf-8"))
    stock = {
        kind: tuple(read_part(kind, row, where=f"{path.name} {kind} {row['part']}") for row in rows)
        for kind, rows in case["catalogue"].items()
    }
    asked = spec_of(case["spec"])
    return asked, stock, search(asked, stock, top=case["top"])


@BY_NAME
def test_every_answer_is_judged_as_it_was_found(path: Path) -> None:
    """A candidate of the short list meets every limit, and has the same figures bit for bit."""
    asked, stock, found = _case(path)
    for candidate in found.candidates:
        judged = judge(asked, candidate.design, stock)
        assert judged.meets
        assert judged.candidate == replace(candidate, rank=None, pareto=None)


def test_cases_have_answers() -> None:
    """Of the twenty cases one fits nothing; the others have an answer to be judged."""
    assert len(CASES) == 20
    assert [path.stem for path in CASES if not _case(path)[2].candidates] == ["ranges_19"]


@BY_NAME
def test_every_answer_stands_by_its_margins(path: Path) -> None:
    """No limit fails, and no margin is below 0 by more than the 1e-12 within which a figure is on its limit."""
    asked, stock, found = _case(path)
    for candidate in found.candidates:
        for verdict in judge(asked, candidate.design, stock).verdicts:
            assert verdict.meets is not False, verdict
            assert verdict.margin is None or verdict.margin >= -1e-12


@BY_NAME
def test_open_filter_is_chosen_as_the_search_chose_it(path: Path) -> None:
    """Without its filter, or without one part of it, a candidate is judged with the filter that the search gave it."""
    asked, stock, found = _case(path)
    for candidate in found.candidates:
        whole = judge(asked, candidate.design, stock)
        open_parts = [{"filter_resistor": None, "filter_capacitor": None}]
        open_parts += [{"filter_resistor": None}, {"filter_capacitor": None}]
        for left_open in open_parts:
            assert judge(asked, replace(candidate.design, **left_open), stock) == whole


def _verdicts(judged: Judged) -> dict[str, Verdict]:
    return {verdict.limit: verdict for verdict in judged.verdicts}


def _failed(judged: Judged) -> list[str]:
    return [verdict.limit for verdict in judged.verdicts if verdict.meets is False]


def test_every_limit_has_a_verdict_in_its_order() -> None:
    """All 27 limits are told of, in their order, whatever they say."""
    assert [verdict.limit for verdict in judge(spec(), design(), {}).verdicts] == [one.name for one in LIMITS]


def test_plain_design_meets() -> None:
    """The plain design meets; limits that nothing states have no verdict."""
    judged = judge(spec(), design(), {})
    assert judged.meets
    assert judged.candidate is not None
    silent = {verdict.limit for verdict in judged.verdicts if verdict.meets is None}
    unstated = {"overload", "amplifier input", "inductance", "slew rate", "converter pin", "settling", "stock", "cost"}
    assert silent == unstated | {"gain resistance"}


# Entries that are changed, and the limits that fail for it.
FAILING: list[tuple[dict[str, object], list[str]]] = [
    ({"limits__burden": 0.1}, ["burden"]),
    ({"limits__power": 0.1}, ["power"]),
    ({"accuracy__floor": 0.0, "accuracy__reading": 0.001}, ["error"]),
    ({"limits__burden": 0.1, "limits__power": 0.1, "accuracy__reading": 0.001}, ["burden", "power", "error"]),
    ({"signal__bandwidth": 2000.0}, ["bandwidth"]),
    ({"signal__settle": 1e-4}, ["settling"]),
    ({"converter__reference": 2.05}, ["headroom"]),
    ({"ambient__max": 140.0}, ["temperature", "rating"]),
    ({"current__overload": 4.0, "current__overload_time": 1.0}, ["overload"]),
    ({"converter__input_max": 3.6}, ["converter pin"]),
    ({"supply__voltage": 6.0}, ["supply"]),
    ({"limits__cost": 1.0}, ["cost"]),
    ({"parts__from": "stock"}, ["stock"]),
    (ZERO, ["reference pin"]),
    ({"filter__resistance_min": 2e3}, ["filter"]),
]


@pytest.mark.parametrize(("changes", "failed"), FAILING, ids=",".join)
def test_failing_design_shows_which_limits_fail(changes: dict[str, object], failed: list[str]) -> None:
    """What a changed spec makes fail fails, nothing else does, and the figures are there all the same."""
    of = design(
        shunts=(shunt(unit_cost=0.5),),
        amplifier=amplifier(unit_cost=0.5),
        filter_resistor=resistor(unit_cost=0.25),
        filter_capacitor=capacitor(unit_cost=0.25),
    )
    judged = judge(spec(**changes), of, {})
    assert _failed(judged) == failed
    assert not judged.meets
    assert judged.candidate is not None


def test_margins_have_the_sign_of_their_verdicts() -> None:
    """A margin is (allowed - value) / abs(allowed): 0.495 of burden to spare, 0.485 too little power, error short."""
    verdicts = _verdicts(judge(spec(limits__power=0.0717, accuracy__reading=0.0, accuracy__floor=0.0144), design(), {}))
    assert (verdicts["burden"].value, verdicts["burden"].allowed) == near((0.101, 0.2))
    assert verdicts["burden"].margin == near(0.495)
    assert verdicts["power"].margin == near((0.0717 - 0.1065) / 0.0717)
    assert verdicts["error"].margin == near((0.0144 - 0.014426) / 0.0144, rel=0.05)
    for verdict in verdicts.values():
        if verdict.margin is not None:
            assert (verdict.margin >= 0.0) is verdict.meets


def test_margin_below_ground() -> None:
    """Where what is allowed is negative the margin still is positive as the limit is met: -0.2 V of -0.101 V."""
    two_way = ZERO | {"current__two_way": True}
    for lowest_v, margin in ((-0.2, 0.099 / 0.101), (-0.05, -0.051 / 0.101)):
        of = design(amplifier=amplifier(common_mode_min=lowest_v, common_mode_max=100.0, reference_pin=True))
        verdict = _verdicts(judge(spec(**two_way), of, {}))["common mode"]
        assert verdict.margin == near(margin, rel=1e-12)
        assert verdict.meets is (margin > 0.0)


def test_worst_of_several_measures_is_shown() -> None:
    """Of two ranges the one nearer to its limit is shown: 50 mA of room of the first, not 1 A of the last."""
    verdict = _verdicts(judge(spec(), switched("current-output", 19_990.0, 9_990.0), {}))["saturation"]
    assert verdict.allowed == near(0.05)


def test_design_without_a_window_has_no_figures() -> None:
    """An output that leaves nothing fails `output window`; no range exists, so nothing of ranges is judged."""
    judged = judge(spec(), design(amplifier=amplifier(swing_high=4.5)), STOCK)
    assert _failed(judged) == ["output window"]
    assert (judged.meets, judged.candidate) == (False, None)
    verdicts = _verdicts(judged)
    assert (verdicts["burden"].meets, verdicts["headroom"].meets, verdicts["error"].meets) == (True, None, None)


def test_design_without_a_stated_speed_has_no_figures() -> None:
    """An amplifier without any bandwidth misses a figure; its filter and its error are not judged."""
    judged = judge(spec(), design(amplifier=amplifier(bandwidth=None)), STOCK)
    assert _failed(judged) == ["missing figure"]
    assert (judged.meets, judged.candidate) == (False, None)


@pytest.mark.parametrize(
    "fields",
    [
        {"temp_change": None},
        {"tolerance": 0.5, "temp_change": 0.6},
        {"tolerance": 0.5, "temp_change": 0.5},
    ],
    ids=["unknown", "above", "equal"],
)
def test_capacitor_without_a_usable_spread_has_no_figures(fields: dict[str, object]) -> None:
    """A capacitor whose spread is not known, or is all of it or more, fails `filter`; no corner is computed of it."""
    judged = judge(spec(), design(filter_capacitor=capacitor(**fields)), STOCK)
    assert _failed(judged) == ["filter"]
    assert (judged.meets, judged.candidate) == (False, None)


@pytest.mark.parametrize(
    ("changes", "failed"),
    [
        ({"filter__resistance_max": 500.0}, "filter"),
        ({"converter__input_max": 3.6}, "converter pin"),
        ({"signal__bandwidth": 2000.0}, "bandwidth"),
        ({"signal__settle": 1e-4}, "settling"),
    ],
)
def test_open_filter_that_nothing_serves(changes: dict[str, object], failed: str) -> None:
    """Where no pair of the stock serves, the limit that leaves none fails, without a figure or a candidate."""
    judged = judge(spec(**changes), design(filter_resistor=None, filter_capacitor=None), STOCK)
    assert _failed(judged) == [failed]
    verdict = _verdicts(judged)[failed]
    assert (verdict.value, verdict.allowed, verdict.margin) == (None, None, None)
    assert (judged.meets, judged.candidate) == (False, None)


def test_open_filter_in_an_empty_stock() -> None:
    """Without a single pair the first limit that thins the choice, `filter`, leaves none."""
    assert _failed(judge(spec(), design(filter_resistor=None, filter_capacitor=None), {})) == ["filter"]


def test_open_filter_takes_what_other_places_leave() -> None:
    """Of a resistor of which the gain takes the only one none is left for the filter; another is taken."""
    law = amplifier("current-output", quantity=1)
    gain = resistor(1e4, "R1", quantity=1)
    stock = {
        "resistor": (gain, resistor(2e3, "R2", quantity=1)),
        "capacitor": (capacitor(1e-9, "C1", quantity=1),),
    }
    of = design("current-output", shunts=(shunt(quantity=1),), amplifier=law, gain=(gain,))
    judged = judge(spec(parts__from="stock"), replace(of, filter_resistor=None, filter_capacitor=None), stock)
    assert judged.meets
    assert judged.candidate is not None
    assert judged.candidate.design.filter_resistor == stock["resistor"][1]


def test_in_line_parts_pass_stock() -> None:
    """Parts that are exempt need no stock; the others of the design still do."""
    stocked = {"shunts": (shunt(quantity=1),), "filter_capacitor": capacitor(quantity=1)}
    of = design(**stocked)
    exempt = frozenset({("amplifier", "A"), ("resistor", "R")})
    assert judge(spec(parts__from="stock"), of, {}, exempt=exempt).meets
    assert _failed(judge(spec(parts__from="stock"), of, {})) == ["stock"]
    assert _failed(judge(spec(parts__from="stock", parts__boards=2), of, {}, exempt=exempt)) == ["stock"]


def test_in_line_part_of_an_open_filter_passes_stock() -> None:
    """An in-line resistor of a filter whose capacitor is chosen needs no stock; the capacitor does."""
    of = design(shunts=(shunt(quantity=1),), amplifier=amplifier(quantity=1), filter_capacitor=None)
    exempt = frozenset({("resistor", "R")})
    held = {"capacitor": (capacitor(quantity=1),)}
    assert judge(spec(parts__from="stock"), of, held, exempt=exempt).meets
    assert _failed(judge(spec(parts__from="stock"), of, held)) == ["stock"]
    assert not judge(spec(parts__from="stock"), of, {"capacitor": (capacitor(),)}, exempt=exempt).meets


def test_generic_parts_are_no_stock() -> None:
    """A generic part is never counted as stock, whatever quantity it states."""
    held = {"shunts": (shunt(quantity=1),), "filter_capacitor": capacitor(quantity=1)}
    of = design(amplifier=amplifier(quantity=1), filter_resistor=resistor(quantity=9, generic=True), **held)
    assert _failed(judge(spec(parts__from="stock"), of, {})) == ["stock"]


def _priced(currency: str) -> Design:
    """Return a design at 2.5 a board, its amplifier priced in a currency and all else in EUR."""
    euro = {"currency": "EUR"}
    return design(
        shunts=(shunt(unit_cost=1.0, **euro),),
        amplifier=amplifier(unit_cost=1.0, currency=currency),
        filter_resistor=resistor(unit_cost=0.25, **euro),
        filter_capacitor=capacitor(unit_cost=0.25, **euro),
    )


def _catalogue(of: Design) -> dict[str, tuple[Part, ...]]:
    return {place.part.kind: (place.part,) for place in of.places()}


def test_cost_and_currency() -> None:
    """Parts of one currency cost their sum in it; without a unit cost, as of an in-line part, it is unknown."""
    judged = judge(spec(), _priced("EUR"), _catalogue(_priced("EUR"))).candidate
    assert judged is not None
    assert (judged.cost, judged.currency) == (2.5, "EUR")
    plain = judge(spec(), design(), {}).candidate
    assert plain is not None
    assert (plain.cost, plain.currency) == (None, None)


def test_cost_in_two_currencies_is_unknown() -> None:
    """In a catalogue with two currencies a design costs what the search says it costs: nothing that is known."""
    of = _priced("CHF")
    found = search(spec(), _catalogue(of)).candidates[0]
    judged = judge(spec(), of, _catalogue(of)).candidate
    assert judged is not None
    assert judged.cost == found.cost
    assert judged.cost is None


def test_unknown_cost_is_within_no_limit() -> None:
    """With limits.cost a design of unknown cost fails `cost` without a figure, and the search does not offer it."""
    asked = spec(limits__cost=1e6)
    judged = judge(asked, design(), {})
    assert _failed(judged) == ["cost"]
    assert _verdicts(judged)["cost"].value is None
    assert search(asked, _catalogue(design())).candidates == ()


def test_high_side_and_zero_of_a_law_that_reads_its_own_ground() -> None:
    """A non-inverting amplifier at the high side fails `law`, and its common mode of 13 V; figures are there."""
    judged = judge(spec(**HIGH_SIDE), design("non-inverting"), {})
    assert _failed(judged)[0] == "law"
    assert "common mode" in _failed(judged)
    assert judged.candidate is not None


def test_more_ranges_than_the_spec_allows() -> None:
    """A design of two ranges does not meet a spec that allows one, and says so in the order of ranges."""
    path = next(path for path in CASES if path.stem == "ranges_02")
    case = json.loads(path.read_text(encoding="utf-8"))
    stock = {kind: tuple(read_part(kind, row, where="") for row in rows) for kind, rows in case["catalogue"].items()}
    found = search(spec_of(case["spec"]), stock, top=None)
    of_two = next(one.design for one in found.candidates if one.design.range_count > 1)
    narrow = judge(spec_of({**case["spec"], "ranges.most": 1}), of_two, stock)
    assert [one.limit for one in narrow.verdicts if one.meets is False] == ["range order"]
