"""What a format is."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass

from selector.report.told import Told


@dataclass(frozen=True, slots=True)
class Format:
    """A format: its name, the endings of files in it, and how it writes an answer, final line feed included."""

    name: str
    endings: tuple[str, ...]
    write: Callable[[Told], str]
