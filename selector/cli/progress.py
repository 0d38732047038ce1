"""How far a long search is, on a terminal only."""

from __future__ import annotations

import sys
from time import monotonic
from typing import Self

from selector.cli.streams import is_terminal, say

_FIRST_S, _EVERY_S = 1.0, 0.2


class Progress:
    """Says the pairs done on one line of the standard error, and takes the line away at the end."""

    def __init__(self) -> None:
        """Begin to count the time."""
        self._visible = is_terminal(sys.stderr)
        self._next_s = monotonic() + _FIRST_S
        self._width = 0

    def __call__(self, done: int, total: int) -> None:
        """Take note of the pairs done and their number."""
        if self._visible and monotonic() >= self._next_s:
            self._next_s = monotonic() + _EVERY_S
            text = f"{done} of {total} pairs of shunt and amplifier"
            say(f"\r{text:<{self._width}}", end="")
            self._width = max(self._width, len(text))

    def __enter__(self) -> Self:
        """Return itself."""
        return self

    def __exit__(self, *_error: object) -> None:
        """Take the line away."""
        if self._width:
            say(f"\r{'':{self._width}}\r", end="")
