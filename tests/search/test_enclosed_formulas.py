"""What stands on intervals bounds what stands on any real parts inside: the ground of the search's exactness.

All gain laws, error terms and limits of ranges, at both sides, one way and both, with every calibration and method.
"""

from __future__ import annotations

from typing import TYPE_CHECKING

import numpy as np
import pytest

from selector.budget import METHODS, TERMS, combined
from selector.candidate import Calibration
from selector.candidate.uses import headroom_frac, power_w, use_headroom
from selector.gain import LAWS
from selector.limits import LIMITS, FilterCheck, LinkCheck, RangeCheck
from selector.search.boxes import possible
from selector.search.stacks import low_ends
from tests.gain.stages import answers
from tests.search.boxed import ROOM, SIDES, boxes, check_figure

if TYPE_CHECKING:
    from collections.abc import Callable

    from selector.candidate import Operating
    from selector.limits import Measure
    from tests.search.boxed import Boxed

CURRENTS_A = (0.1, 0.3, 1.0)
OF_A_RANGE = (RangeCheck, LinkCheck, FilterCheck)
CHECKS = [check for one in LIMITS for check in one.checks if isinstance(check, OF_A_RANGE)]

pytestmark = [pytest.mark.parametrize("law", LAWS), pytest.mark.parametrize("side", SIDES)]
every_calibration = pytest.mark.parametrize("calibration", Calibration)


def _check(each: Boxed, figures: Callable[[Operating], list[tuple[str, object]]]) -> int:
    """Compare figures of intervals and of points with those of real ranges; return how many there are."""
    of_each = [figures(at) for at in (each.held, each.real, each.points)]
    for (name, held), (_, real), (_, points) in zip(*of_each, strict=True):
        check_figure(name, held, real, points)
    return len(of_each[0])


def test_every_answer_of_a_law_is_enclosed(law: str, side: str) -> None:
    """Gain, sensitivities, resistances and conductances of a network, and what a range makes of them, are bounded.

    Source: IEEE 1788-2015, the fundamental theorem of interval arithmetic.
    Tolerance: 1e-11, the rounding of some ten operations.
    """
    for each in (*boxes(law, side, Calibration.NONE), *boxes(law, side, Calibration.ZERO)):
        assert _check(each, _answers) > 20


def _answers(at: Operating) -> list[tuple[str, object]]:
    law, stage = at.law, at.stage
    of_parts = law.gain(stage.figures, stage.common_ohm, stage.switched_ohm, stage.on_ohm)
    of_range = (of_parts, at.high_a, at.swing_v, at.amplifier_pole_hz, at.noise_gain_over_gain, at.zero_sum_a)
    return [
        *((f"answer {number}", answer) for number, answer in enumerate((*answers(law, stage), *of_range))),
        ("power", power_w(at)),
        ("headroom", headroom_frac(at)),
        ("use of the headroom", use_headroom(at)),
    ]


@every_calibration
def test_every_error_term_is_enclosed(law: str, side: str, calibration: Calibration) -> None:
    """Each part of each term, before a calibration and after it, is bounded.

    Source: IEEE 1788-2015, the fundamental theorem of interval arithmetic.
    Tolerance: 1e-11, the rounding of some ten operations.
    """
    for each in boxes(law, side, calibration):
        assert _check(each, _terms) > 3 * len(TERMS)


def _terms(at: Operating) -> list[tuple[str, object]]:
    return [
        (term.name, part)
        for term in TERMS
        for size in (*term.sizes(at), *term.remaining(at))
        for part in (size.constant_a, size.proportional, size.cubic_per_a2)
    ]


@pytest.mark.parametrize("method", METHODS)
@every_calibration
def test_combined_error_is_enclosed(law: str, side: str, calibration: Calibration, method: str) -> None:
    """The error by either method is bounded at every current, and what its lower ends give is the lower end.

    Source: IEEE 1788-2015, the fundamental theorem of interval arithmetic.
    Tolerance: 1e-11, the rounding of some forty sums.
    """
    for each in (one.by(method) for one in boxes(law, side, calibration)):
        assert _check(each, _errors) == 2 * len(CURRENTS_A) + 1
        least, error = low_ends(combined(each.held)), combined(each.real)
        for current_a in CURRENTS_A:
            assert (least.error_a(current_a) <= error.error_a(current_a) * (1.0 + ROOM)).all()


def _errors(at: Operating) -> list[tuple[str, object]]:
    error, uncalibrated = combined(at), combined(at.uncalibrated())
    return [
        *((f"error at {current_a} A", error.error_a(current_a)) for current_a in CURRENTS_A),
        *((f"uncalibrated at {current_a} A", uncalibrated.error_a(current_a)) for current_a in CURRENTS_A),
        ("error at the upper border", error.error_a(at.high_a)),
    ]


@every_calibration
def test_every_limit_of_a_range_is_enclosed(law: str, side: str, calibration: Calibration) -> None:
    """Figure and allowance of each limit are bounded, and a limit that a real range meets may be met by its box.

    Source: IEEE 1788-2015, the fundamental theorem of interval arithmetic.
    Tolerance: 1e-11, the rounding of some forty sums.
    """
    for each in boxes(law, side, calibration):
        assert _check(each, _limits) >= 2 * 10
        for check in CHECKS:
            held, real = check.measure(each.held), check.measure(each.real)
            assert (held is None) is (real is None)
            assert held is None or real is None or (_possible(held) | ~_met(real)).all()


def _limits(at: Operating) -> list[tuple[str, object]]:
    each = [check.measure(at) for check in CHECKS]
    return [
        (f"limit {number}", end)
        for number, measure in enumerate(each)
        if measure is not None
        for end in (measure.value, measure.allowed)
    ]


def _possible(measure: Measure) -> np.ndarray:
    return np.asarray(possible(measure))


def _met(measure: Measure) -> np.ndarray:
    return np.asarray(measure.meets, dtype=bool)
