"""How far a long search is."""

from __future__ import annotations

import io
import sys

import pytest

from selector.cli import progress
from selector.cli.progress import Progress


class Terminal(io.StringIO):
    """A stream that is a terminal."""

    def isatty(self) -> bool:
        """Return that it is one."""
        return True


def told(stream: io.StringIO, monkeypatch: pytest.MonkeyPatch) -> str:
    """Return what a search of ten seconds says on a stream."""
    monkeypatch.setattr(sys, "stderr", stream)
    times = iter(range(100))
    monkeypatch.setattr(progress, "monotonic", lambda: float(next(times)))
    with Progress() as tell:
        for done in range(3):
            tell(done, 480)
    return stream.getvalue()


def test_terminal_sees_the_pairs_done(monkeypatch: pytest.MonkeyPatch) -> None:
    """A terminal has one line that is written over and gone at the end, without escape sequences."""
    shown = told(Terminal(), monkeypatch)
    assert "\r2 of 480 pairs of shunt and amplifier" in shown
    assert shown.endswith("\r")
    assert "\n" not in shown
    assert "\x1b" not in shown


def test_no_word_where_nobody_looks(monkeypatch: pytest.MonkeyPatch) -> None:
    """A file or a pipe gets nothing."""
    assert told(io.StringIO(), monkeypatch) == ""
