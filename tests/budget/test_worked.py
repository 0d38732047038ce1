"""Every figure of two designs that are worked out in full: spans, ranges, poles, noise, each term at each current.

One is non-inverting at the low side, two ranges, worst case, no calibration; the other a one-resistor amplifier at the
high side, two-way, three ranges, root sum of squares, zero and span calibrated.
"""

from __future__ import annotations

from typing import TYPE_CHECKING, Any

import pytest

from selector.budget import TERMS, combined
from selector.budget.noise import noise_v
from selector.candidate.uses import headroom_frac, power_w, shunt_power_w
from selector.limits import settle_s
from selector.physics.filters import bandwidth_hz
from selector.physics.noise import noise_bandwidth_hz
from selector.search.objective import score_of
from selector.search.present import present
from tests.budget.worked import NAMES, chain, design, figures, spec
from tests.builders import measured, near

if TYPE_CHECKING:
    from selector.candidate import Operating

CLOSE = 1e-9
RANGES = [(name, number) for name in NAMES for number in range(1, len(figures(name)["result"]["ranges"]) + 1)]
POINTS = [(name, number) for name in NAMES for number in range(len(figures(name)["result"]["points"]))]


def _close(value: Any) -> Any:  # noqa: ANN401 - what pytest.approx takes and gives
    return near(value, rel=CLOSE)


@pytest.mark.parametrize("name", NAMES)
def test_figures_of_the_whole(name: str) -> None:
    """Window, span, headroom, burden, power and rating are those worked out.

    Source: two scalar programs written apart from each other.
    Tolerance: 1e-9, below the 12 digits written.
    """
    wanted, found = figures(name)["result"], chain(name)
    last, window = found.ranges[-1], found.pairing.window
    assert (window.high_v, window.low_v, window.span_v) == _close((wanted["v_hi"], wanted["v_lo"], wanted["span"]))
    assert headroom_frac(last) == _close(wanted["headroom"])
    assert found.pairing.burden_v == _close(wanted["burden"])
    assert power_w(last) == _close(wanted["power"])
    assert shunt_power_w(last) == _close(wanted["shunt_power"])
    rating = measured("rating", found)[0]
    assert (rating.value, rating.allowed) == _close((wanted["shunt_power"], wanted["allowed_shunt_power"]))
    at_most_v = last.conditions.zero_v + last.transfer_ohm * last.conditions.current_max_a
    assert at_most_v * last.law.load_siemens(last.stage) == _close(wanted["output_current"])


def _range_figures(at: Operating) -> dict[str, float]:
    """Return what a range exposes, by the names of the file."""
    zero_v, leaking_a = at.conditions.zero_v, (at.range_count - 1) * at.switch.leakage_a
    found = {
        "gain": at.gain,
        "low": at.low_a,
        "high": at.high_a,
        "output_low": zero_v + at.transfer_ohm * at.low_a,
        "output_high": zero_v + at.transfer_ohm * at.high_a,
        "f_amp": at.amplifier_pole_hz,
        "f_c_low": at.filter.slow_hz,
        "f_c_high": at.filter.noisy_hz,
        "f_low": bandwidth_hz(at.amplifier_pole_hz, at.filter.slow_hz),
        "enbw": noise_bandwidth_hz(at.amplifier_pole_hz, at.filter.noisy_hz),
        "settle": settle_s(at),
        "Vb": at.law.bias_v(at.stage),
        "Vl": at.law.leakage_v(at.stage, leaking_a),
        "Rn": at.law.noise_ohm(at.stage),
        "sigma_v": noise_v(at),
        "sigma_i": noise_v(at) / at.shunt_ohm,
    }
    return {name: float(value) for name, value in found.items()}


@pytest.mark.parametrize(("name", "number"), RANGES)
def test_figures_of_each_range(name: str, number: int) -> None:
    """Gain, borders, outputs, poles, bandwidths, settling, bias, leakage and noise of a range are those worked out.

    Source: two scalar programs written apart from each other.
    Tolerance: 1e-9, below the 12 digits written.
    """
    wanted = dict(figures(name)["result"]["ranges"][number - 1])
    assert wanted.pop("range") == number
    assert _range_figures(chain(name).ranges[number - 1]) == _close(wanted)


@pytest.mark.parametrize(("name", "number"), POINTS)
def test_figures_of_each_judged_current(name: str, number: int) -> None:
    """At each judged current the error, what is allowed, its share and every term are those worked out.

    Source: two scalar programs written apart from each other.
    Tolerance: 1e-9, below the 12 digits written.
    """
    wanted = figures(name)["result"]["points"][number]
    points = present(chain(name), score_of(spec(name))).points
    assert len(points) == len(figures(name)["result"]["points"])
    point = points[number]
    assert point.range == wanted["range"]
    found = (point.current_a, point.error_a, point.allowed_a, point.use)
    assert found == _close((wanted["current"], wanted["error"], wanted["allowed"], wanted["use"]))
    assert {row.name: row.amount_a for row in point.terms} == _close(wanted["terms"])


@pytest.mark.parametrize(("name", "number"), POINTS)
def test_terms_that_calibration_removes(name: str, number: int) -> None:
    """At each judged current what calibration removes, and nothing else, is what was worked out.

    Source: two scalar programs written apart from each other.
    Tolerance: 1e-9, below the 12 digits written.
    """
    wanted = figures(name)["result"]["points"][number]
    at = chain(name).ranges[wanted["range"] - 1]
    removed = {
        one.name: sum(float(size.at(wanted["current"])) for size in one.sizes(at))
        for one in TERMS
        if one.removed(at) == 1.0
    }
    assert {one: amount for one, amount in removed.items() if amount} == _close(wanted["removed"])


@pytest.mark.parametrize("name", NAMES)
def test_overlap_of_neighbouring_ranges(name: str) -> None:
    """Gap and summed errors where ranges hand over are those worked out.

    Source: two scalar programs written apart from each other.
    Tolerance: 1e-9, below the 12 digits written.
    """
    ranges = chain(name).ranges
    for row, lower, upper in zip(figures(name)["result"]["hand_over"], ranges, ranges[1:], strict=False):
        assert float(lower.high_a - upper.low_a) == _close(row["gap"])
        errors = combined(lower).error_a(lower.high_a) + combined(upper).error_a(upper.low_a)
        assert float(errors) == _close(row["errors"])


def test_both_files_are_whole_designs() -> None:
    """The files hold a two-range and a three-range design, with a term table at both ends of every range."""
    assert [len(design(name).gain or ()) for name in NAMES] == [3, 2]
    assert [len(figures(name)["result"]["points"]) for name in NAMES] == [6, 4]
