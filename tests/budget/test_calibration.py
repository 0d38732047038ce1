"""Which calibration takes out which term, what a zero calibration removes in all, and the known current's own error."""

from __future__ import annotations

import csv
from pathlib import Path

import pytest

from selector.budget import TERMS
from tests.budget.sized import check
from tests.builders import HIGH_SIDE, ZERO, amplifier, design, near, operating, term

TABLE = Path(__file__).parents[1] / "reference" / "physics_terms.csv"
ROWS = list(csv.DictReader(TABLE.read_text(encoding="utf-8").splitlines()))
TAKES_OUT = {"none": set[str](), "zero": {"zero"}, "zero-and-span": {"zero", "span"}}
DRIFT_STATED = design(amplifier=amplifier(bias_current_drift=1e-11))
UNCERTAIN = {"accuracy__calibration_uncertainty": 0.001}
NO_OFFSETS = design(amplifier=amplifier(offset=0.0, swing_low=0.0))


def test_terms_stand_in_their_order() -> None:
    """A budget has 41 terms, in the order of the reference table."""
    assert [one.name for one in TERMS] == [row["term"] for row in ROWS]
    assert len(TERMS) == 41


@pytest.mark.parametrize("calibration", TAKES_OUT)
@pytest.mark.parametrize("row", ROWS, ids=lambda row: row["term"])
def test_calibration_takes_out_its_terms(row: dict[str, str], calibration: str) -> None:
    """Each calibration takes out the terms that the table gives it, wholly, and no other.

    Source: the row's own; the low side, with a stated drift of the bias current.
    Tolerance: none.
    """
    at = operating(DRIFT_STATED, accuracy__calibration=calibration)
    assert term(row["term"]).removed(at) == float(row["removed by"] in TAKES_OUT[calibration])


def test_calibration_cannot_take_out_what_it_does_not_know() -> None:
    """Without a stated drift the bias current stays; at the high side the common-mode change does."""
    both = {"accuracy__calibration": "zero-and-span"}
    assert term("bias current").removed(operating(**both)) == 0.0
    assert term("common-mode change").removed(operating(**both, **HIGH_SIDE)) == 0.0


# Offset 1 mA, output offset 0.5 mA, supply offset 2 mA, converter offset 0.5 mA, zero reference 1 mA, bias 1 nA.
OFF = design(amplifier=amplifier(output_offset=1e-3, supply_test=3.0))
OFF_AND_BIAS = design(amplifier=amplifier(output_offset=1e-3, supply_test=3.0, bias_current_drift=1e-11))


@pytest.mark.parametrize("method", ["worst-case", "rss"])
@pytest.mark.parametrize("calibration", ["zero", "zero-and-span"])
def test_zero_removes_a_plain_sum(method: str, calibration: str) -> None:
    """1 + 0.5 + 2 + 0.5 + 1 mA are 5 mA by either method; the bias of 1 nA counts where its drift is stated."""
    changes = {"accuracy__method": method, "accuracy__calibration": calibration, "converter__offset": 1e-3}
    assert operating(OFF, **changes, **ZERO).zero_sum_a == near(5e-3)
    assert operating(OFF_AND_BIAS, **changes, **ZERO).zero_sum_a == near(5e-3 + 1e-9)


def test_nothing_is_removed_without_calibration() -> None:
    """Without calibration the sum of what a zero removes is 0."""
    assert operating(OFF_AND_BIAS, converter__offset=1e-3, **ZERO).zero_sum_a == 0.0


def test_calibration_with_span_uses_a_known_current() -> None:
    """A current known to 0.1 % counts with 0.1 % of the current; without calibration nothing does."""
    check("calibration", operating(accuracy__calibration="zero-and-span", **UNCERTAIN), proportional=0.001)
    check("calibration", operating(**UNCERTAIN))


def test_zero_that_rests_on_its_swing_limit_uses_a_known_current() -> None:
    """A zero of 0 V lies below the swing limit of 10 mV, so the zero is taken at a known current."""
    check("calibration", operating(accuracy__calibration="zero", **UNCERTAIN), proportional=0.001)


def test_zero_above_the_swing_limit_needs_no_current() -> None:
    """A zero of 1 V stands clear of 10 mV and 2 ohm times all that the zero removes, 2 mA: no current is used."""
    check("calibration", operating(accuracy__calibration="zero", **UNCERTAIN, **ZERO))
    check("calibration", operating(accuracy__calibration="zero-and-span", **UNCERTAIN, **ZERO), proportional=0.001)


def test_offsets_may_press_the_zero_onto_its_swing_limit() -> None:
    """With a swing to 0 V, a zero of 0 V rests on it as soon as an offset is there, and not without any."""
    pressed = design(amplifier=amplifier(swing_low=0.0))
    check("calibration", operating(pressed, accuracy__calibration="zero", **UNCERTAIN), proportional=0.001)
    check("calibration", operating(NO_OFFSETS, accuracy__calibration="zero", **UNCERTAIN))


@pytest.mark.parametrize(("zero_v", "used"), [(0.0140001, 0.0), (0.0139999, 0.001)])
def test_border_between_resting_and_free(zero_v: float, used: float) -> None:
    """10 mV and 2 ohm times 1 mA of offset and 1 mA of the converter's are 14 mV: above them the zero is free."""
    zero = {"output__zero": zero_v, "output__zero_tolerance": 0.0, "output__zero_drift": 0.0}
    at = operating(accuracy__calibration="zero", converter__offset=2e-3, **UNCERTAIN, **zero)
    check("calibration", at, proportional=used)
