"""What `series` answers."""

from __future__ import annotations

from dataclasses import dataclass
from typing import TYPE_CHECKING, ClassVar

if TYPE_CHECKING:
    from selector.series import Pair, Preferred
    from selector.units import Quantity


@dataclass(frozen=True, slots=True)
class SeriesShown:
    """Answer of `series`: nearest preferred values, and pairs where they were asked for."""

    view: ClassVar[str] = "series"
    value: float
    quantity: Quantity
    series: str
    nearest: tuple[Preferred, ...]
    how: str | None = None  # "series" or "parallel"
    pairs: tuple[Pair, ...] = ()
