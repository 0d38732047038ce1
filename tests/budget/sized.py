"""The comparison of a term with a figure worked by hand."""

from __future__ import annotations

from typing import TYPE_CHECKING

from tests.builders import near, size

if TYPE_CHECKING:
    from selector.candidate import Operating

CLOSE = 1e-12  # a dozen roundings at most


def check(name: str, at: Operating, *, constant: float = 0.0, proportional: float = 0.0, cubic: float = 0.0) -> None:
    """Compare what calibration leaves of a term: A, A per A and A per A^3."""
    assert size(name, at) == near((constant, proportional, cubic), rel=CLOSE)
