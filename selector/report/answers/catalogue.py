"""What `catalogue info` answers."""

from __future__ import annotations

from dataclasses import dataclass
from typing import ClassVar


@dataclass(frozen=True, slots=True)
class KindCounted:
    """How many parts of a kind a catalogue holds, how many of them are in stock, how many generic."""

    kind: str
    parts: int
    stocked: int
    generic: int


@dataclass(frozen=True, slots=True)
class CatalogueShown:
    """Answer of `catalogue info`; `changed` is the time of the last change as text, for show only."""

    view: ClassVar[str] = "catalogue"
    path: str
    version: int
    kinds: tuple[KindCounted, ...]
    size_bytes: int
    changes: int
    changed: str | None
