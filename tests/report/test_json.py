"""JSON has the keys of interface.md, section 5, and no figure that JSON cannot say."""

from __future__ import annotations

import json
from dataclasses import replace
from typing import Any

import pytest

from selector.report import render
from selector.report.answers.bill import BillShown
from selector.report.answers.check import Checked
from selector.report.answers.query import Shortlist

CANDIDATE = (
    *("rank", "score", "pareto", "uses", "power", "burden", "headroom", "cost", "currency", "parts", "ranges"),
    *("filter", "errors", "transient", "limiting", "bill", "cautions"),
)
PARTS = (
    *("shunts", "amplifier", "switch", "bypass", "common", "gain", "gain_capacitors"),
    *("filter_resistor", "filter_capacitor"),
)
SEARCHED = (
    *("shunts", "amplifiers", "switches", "bypasses", "resistors", "filter_pairs", "combinations"),
    *("left_out", "evaluated", "seconds"),
)
LINE = ("use", "kind", "part", "description", "quantity", "on_hand", "unit_cost", "line_cost")


def read(text: str) -> Any:  # noqa: ANN401 - JSON is read as whatever it is
    """Return JSON read strictly: NaN and infinity are refused."""

    def refuse(word: str) -> None:
        message = f"{word} is no JSON"
        raise AssertionError(message)

    return json.loads(text, parse_constant=refuse)


def keys(value: dict[str, object]) -> tuple[str, ...]:
    """Return the keys in their order."""
    return tuple(value)


def test_keys_of_query(shortlist: Shortlist) -> None:
    """The answer of `query` and its candidates have the keys of section 5, in its order."""
    data = read(render(shortlist, "json"))
    assert keys(data) == ("schema", "spec", "searched", "candidates", "nothing_fits")
    assert data["schema"] == "selector.query/1"
    assert keys(data["searched"]) == SEARCHED
    assert data["searched"]["left_out"] == {"capacitor": {"not in stock": 3}, "resistor": {"not in stock": 5}}
    candidate = data["candidates"][0]
    assert keys(candidate) == CANDIDATE
    assert keys(candidate["uses"]) == ("power", "burden", "headroom", "error")
    assert keys(candidate["parts"]) == PARTS
    assert keys(candidate["ranges"][0]) == ("gain", "low", "high", "output_low", "output_high")
    assert keys(candidate["filter"]) == ("cutoff", "bandwidth", "settle")
    assert keys(candidate["errors"][0]) == ("range", "current", "error", "allowed", "terms")
    assert keys(candidate["limiting"]) == ("range", "current", "use", "term")
    assert keys(candidate["bill"][0]) == LINE


def test_figures_of_query_are_whole_doubles(shortlist: Shortlist) -> None:
    """What is read back equals what was written bit for bit; terms that are zero are left out."""
    data = read(render(shortlist, "json"))
    made = shortlist.offers[0].candidate
    candidate = data["candidates"][0]
    assert candidate["score"] == made.score
    assert candidate["errors"][0]["error"] == made.points[0].error_a
    assert "offset" not in candidate["errors"][0]["terms"]
    assert len(candidate["errors"][0]["terms"]) == 6
    assert (candidate["transient"], data["nothing_fits"]) == (None, None)
    assert data["candidates"][1]["cost"] is None
    assert candidate["parts"]["gain"] == ["R-31R6", "R-549R"]
    assert candidate["parts"]["gain_capacitors"] == []
    assert data["spec"]["current"]["min"] == 60e-6


def test_a_fixed_gain_has_no_gain_resistors(shortlist: Shortlist) -> None:
    """`gain`, `switch` and `common` are null where the design has none."""
    offer = shortlist.offers[0]
    design = replace(offer.candidate.design, gain=None, switch=None, common=None)
    fixed = replace(shortlist, offers=(replace(offer, candidate=replace(offer.candidate, design=design)),))
    parts = read(render(fixed, "json"))["candidates"][0]["parts"]
    assert (parts["gain"], parts["switch"], parts["common"]) == (None, None, None)


def test_keys_where_nothing_fits(empty: Shortlist) -> None:
    """`blocked` keeps the order of the limits; `nearest` is one candidate in a list."""
    data = read(render(empty, "json"))
    found = data["nothing_fits"]
    assert keys(found) == ("pairs", "blocked", "nearest", "relax", "ways_out")
    assert list(found["blocked"].items()) == [("supply", 17), ("burden", 155), ("output low", 96), ("error", 212)]
    assert [keys(each) for each in found["nearest"]] == [CANDIDATE]
    assert (found["relax"], found["ways_out"], data["candidates"]) == ([], [], [])
    assert read(render(replace(empty, nearest=None), "json"))["nothing_fits"]["nearest"] == []


def test_keys_of_check(checked: Checked) -> None:
    """The answer of `check` has a candidate without rank and every limit with its margin: -18 % for 118 of 100 mV."""
    data = read(render(checked, "json"))
    assert keys(data) == ("schema", "spec", "candidate", "meets", "limits")
    assert (data["schema"], data["meets"]) == ("selector.check/1", False)
    assert (data["candidate"]["rank"], data["candidate"]["pareto"]) == (None, None)
    law, overload, burden, _ = data["limits"]
    assert keys(burden) == ("limit", "meets", "value", "allowed", "margin")
    assert burden["margin"] == pytest.approx(-0.18, rel=1e-12)
    assert (law["meets"], overload["meets"], overload["value"], overload["margin"]) == (True, None, None, None)
    assert read(render(replace(checked, offer=None), "json"))["candidate"] is None


def test_keys_of_bill(bill: BillShown) -> None:
    """The answer of `bill` holds the candidate, whose bill is for the boards named."""
    data = read(render(bill, "json"))
    assert keys(data) == ("schema", "spec", "boards", "candidate")
    assert (data["schema"], data["boards"]) == ("selector.bill/1", 1)
    assert keys(data["candidate"]) == CANDIDATE


def test_what_is_not_finite_is_null(shortlist: Shortlist) -> None:
    """No NaN and no infinity is ever written."""
    offer = shortlist.offers[0]
    strange = replace(offer.candidate, power_w=float("inf"), burden_v=float("nan"))
    data = read(render(replace(shortlist, offers=(replace(offer, candidate=strange),)), "json"))
    assert (data["candidates"][0]["power"], data["candidates"][0]["burden"]) == (None, None)


def test_hostile_text_is_escaped_and_comes_back(bill: BillShown) -> None:
    """ESC, a bidi override, half a surrogate pair and quotes stand in ASCII escapes, and read back as they were."""
    strange = 'a\x1b[31m\u202e\u200b\x85\x7f\udc80"\\ \N{GREEK CAPITAL LETTER OMEGA} \U0001f600'
    offer = replace(bill.offer, cautions=(strange,))
    text = render(replace(bill, offer=offer), "json")
    assert not set("\x1b\u202e\u200b\x85\x7f\udc80") & set(text)
    assert "\N{GREEK CAPITAL LETTER OMEGA} \U0001f600" in text
    assert text.encode("utf-8")
    assert read(text)["candidate"]["cautions"] == [strange]
