"""Small catalogues with their exact short lists, on which two independent scalar programs agree."""

from __future__ import annotations

import json
from pathlib import Path
from typing import Any

import pytest

from selector.parts import read_part
from selector.search import search
from selector.spec import spec_of

CASES = sorted((Path(__file__).parent.parent / "reference" / "cases").glob("ranges_*.json"))
CLOSE = 1e-9


def _loaded(path: Path) -> dict[str, Any]:
    return json.loads(path.read_text(encoding="utf-8"))


@pytest.mark.parametrize("path", CASES, ids=lambda path: path.stem)
def test_case_has_its_exact_short_list(path: Path) -> None:
    """The short list of a case has its parts in its order, with every score, use, border and error term.

    Source: two scalar programs written apart from each other, which agree on these cases.
    Tolerance: 1e-9 relative, the agreement that is asked of them.
    """
    case = _loaded(path)
    stock = {
        kind: tuple(read_part(kind, row, where=f"{path.name} {kind} {row['part']}") for row in rows)
        for kind, rows in case["catalogue"].items()
    }
    found = search(spec_of(case["spec"]), stock, top=case["top"])
    assert len(found.candidates) == len(case["answers"])
    for candidate, answer in zip(found.candidates, case["answers"], strict=True):
        design = candidate.design
        parts = answer["parts"]
        assert [shunt.part for shunt in design.shunts] == parts["shunts"]
        assert design.amplifier.part == parts["amplifier"]
        assert (design.switch.part if design.switch else None) == parts["switch"]
        assert (design.common.part if design.common else None) == parts["common"]
        assert ([one.part for one in design.gain] if design.gain else None) == parts["gain"]
        assert design.filter_resistor is not None
        assert design.filter_resistor.part == parts["filter_resistor"]
        assert design.filter_capacitor is not None
        assert design.filter_capacitor.part == parts["filter_capacitor"]
        assert candidate.score == pytest.approx(answer["score"], rel=CLOSE)
        for name, use in answer["uses"].items():
            assert getattr(candidate.uses, name) == pytest.approx(use, rel=CLOSE)
        assert candidate.power_w == pytest.approx(answer["power"], rel=CLOSE)
        assert candidate.burden_v == pytest.approx(answer["burden"], rel=CLOSE)
        assert candidate.headroom_frac == pytest.approx(answer["headroom"], rel=CLOSE, abs=1e-12)
        assert candidate.cost == pytest.approx(answer["cost"], rel=CLOSE)
        assert len(candidate.ranges) == len(answer["ranges"])
        for shown, wanted in zip(candidate.ranges, answer["ranges"], strict=True):
            assert shown.gain == pytest.approx(wanted["gain"], rel=CLOSE)
            assert shown.low_a == pytest.approx(wanted["low"], rel=CLOSE)
            assert shown.high_a == pytest.approx(wanted["high"], rel=CLOSE)
        assert len(candidate.points) == len(answer["errors"])
        for point, wanted in zip(candidate.points, answer["errors"], strict=True):
            assert point.range == wanted["range"]
            assert point.current_a == pytest.approx(wanted["current"], rel=CLOSE)
            assert point.error_a == pytest.approx(wanted["error"], rel=CLOSE)
            assert point.allowed_a == pytest.approx(wanted["allowed"], rel=CLOSE)
            terms = {term.name: term.amount_a for term in point.terms}
            assert terms == pytest.approx(wanted["terms"], rel=CLOSE)
