"""What commands answer that change parts."""

from __future__ import annotations

from dataclasses import dataclass
from typing import ClassVar


@dataclass(frozen=True, slots=True)
class FieldChange:
    """A field of a part that is, or would be, changed; values as text."""

    kind: str
    part: str
    field: str
    before: str
    after: str


@dataclass(frozen=True, slots=True)
class PartsChanged:
    """Answer of `parts add`, `change`, `remove` and of `fill`: what was done, and to which parts."""

    view: ClassVar[str] = "changed"
    done: str  # "added", "changed", "removed"
    parts: tuple[tuple[str, str], ...]  # (kind, code)
    changes: tuple[FieldChange, ...] = ()
    same: int = 0  # parts that were there already, just so
