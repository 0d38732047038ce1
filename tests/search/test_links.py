"""That a range which begins higher is judged no worse: the ground of finding the range below it by halving."""

from __future__ import annotations

from dataclasses import replace
from random import Random
from typing import TYPE_CHECKING

import numpy as np
import pytest

from selector.budget import METHODS, combined
from selector.candidate import Band, Calibration
from selector.gain import LAWS
from selector.limits import LIMITS, LinkCheck, use_of, worst_point
from selector.search.bench import ORDER
from selector.search.stacks import mapped
from tests.search.boxed import SIDES, boxes

if TYPE_CHECKING:
    from collections.abc import Iterator

    from numpy.typing import NDArray

    from selector.candidate import Operating

STEPS = 40  # of the border below, to a range
ROUNDING = 1e-12
LINKS = [(limit.name, check) for limit in LIMITS for check in limit.checks if isinstance(check, LinkCheck)]

pytestmark = [
    pytest.mark.parametrize("law", LAWS),
    pytest.mark.parametrize("side", SIDES),
    pytest.mark.parametrize("calibration", Calibration),
]


def _ranges(law: str, side: str, calibration: Calibration, method: str = "rss") -> Iterator[Operating]:
    """Yield real ranges with the ends of the one below rising along the columns, under several tables of bands.

    What lies below is in order: it ends lower and has a larger gain.
    """
    random = Random(f"{law} {side}")
    for each in boxes(law, side, calibration):
        at = each.by(method).real
        least_a = at.conditions.current_min_a
        room = np.flatnonzero(np.asarray(at.high_a)[:, 0] > 1.1 * least_a)
        at = mapped(at, lambda array, rows=room: array[rows])
        most_a = np.asarray(at.high_a)
        rising_a = least_a * (most_a / least_a) ** np.linspace(0.0, 0.999, STEPS)[None, :]
        for count in (1, 2, 4):
            of = replace(at, conditions=replace(at.conditions, bands=_bands(random, count, rising_a)))
            yield of.above(rising_a, at.gain * most_a / rising_a * (1.0 + ROUNDING))


def _bands(random: Random, count: int, among: NDArray[np.float64]) -> tuple[Band, ...]:
    """Return bands that end where some ranges begin, as it happens, or anywhere between."""
    ends = sorted(random.choice((random.choice(among.ravel()), random.uniform(0.1, 1.0))) for _ in range(count - 1))
    return tuple(
        Band(float(end), random.choice((0.0, 0.01, 0.1)), random.choice((0.001, 0.01, 0.05))) for end in (*ends, np.inf)
    )


def test_no_limit_gets_worse_where_a_range_begins_higher(law: str, side: str, calibration: Calibration) -> None:
    """A limit on neighbours that is met stays met as the range below ends higher, as long as both are in order.

    Of all but the order itself, the figure comes no nearer to what is allowed.
    """
    for at in _ranges(law, side, calibration):
        shape = np.broadcast_shapes(at.gain.shape, (1, STEPS))
        for name, check in LINKS:
            measure = check.measure(at)
            if measure is None:
                continue
            met = np.broadcast_to(np.asarray(measure.meets), shape)
            assert (met[:, 1:] | ~met[:, :-1]).all(), name
            assert name != ORDER or met.all(), name
            if name != ORDER:
                value, allowed = (np.broadcast_to(one, shape) for one in (measure.value, measure.allowed))
                room = ROUNDING * (np.abs(value) + np.abs(allowed))[:, 1:]
                assert (np.diff(value - allowed, axis=1) <= room).all(), name


@pytest.mark.parametrize("method", METHODS)
def test_no_use_of_the_error_grows_where_a_range_begins_higher(
    law: str, side: str, calibration: Calibration, method: str
) -> None:
    """The largest share of the allowed error, over a part of the same span, is no larger; whatever the bands are."""
    for at in _ranges(law, side, calibration, method):
        use = np.asarray(use_of(worst_point(at, combined(at))))
        assert use.shape[1] == STEPS
        assert (use[:, 1:] <= use[:, :-1] * (1.0 + ROUNDING)).all()
