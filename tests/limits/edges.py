"""Designs that just meet a limit and designs that just fail it."""

from __future__ import annotations

from typing import TYPE_CHECKING, Literal

from tests.builders import meets

if TYPE_CHECKING:
    from collections.abc import Callable

    from selector.candidate.chain import Chain

APART = 1e-9  # far beyond the 1e-12 within which a figure counts as on its limit


def check_edge(
    name: str,
    built: Callable[[float], Chain],
    edge: float,
    *,
    meets_from: Literal["above", "below"],
    on_it: bool = True,
) -> None:
    """Build chains on an edge worked by hand and on both sides of it; the limit must turn there, and only there.

    `on_it` tells whether it is met on the edge itself.
    """
    inside = 1.0 if meets_from == "above" else -1.0
    away = abs(edge) * APART
    assert meets(name, built(edge + inside * away)), f"{name} is to be met {meets_from} {edge}"
    assert not meets(name, built(edge - inside * away)), f"{name} is to be met {meets_from} {edge} only"
    assert meets(name, built(edge)) is on_it
