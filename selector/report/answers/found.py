"""What `parts find` answers."""

from __future__ import annotations

from dataclasses import dataclass
from typing import TYPE_CHECKING, ClassVar

if TYPE_CHECKING:
    from selector.parts import Part


@dataclass(frozen=True, slots=True)
class FoundPart:
    """A part that was looked for, why it was found, and how well it fits, from 0 to 100."""

    part: Part
    why: str
    score: float


@dataclass(frozen=True, slots=True)
class PartsFound:
    """Answer of `parts find`, best first."""

    view: ClassVar[str] = "found"
    text: str
    found: tuple[FoundPart, ...]
