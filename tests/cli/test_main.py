"""The entry of the program, in this process."""

from __future__ import annotations

import os
import signal
from collections.abc import Iterator
from pathlib import Path

import pytest

from selector.cli import run as running
from selector.cli.main import main
from selector.cli.root import COMMANDS
from selector.cli.signals import Ended

KEPT = ("SIGINT", "SIGTERM", "SIGHUP")


@pytest.fixture(autouse=True)
def handlers() -> Iterator[None]:
    """Put the handlers of signals back, which the program takes over."""
    before = {name: signal.getsignal(getattr(signal, name)) for name in KEPT}
    yield
    for name, handler in before.items():
        signal.signal(getattr(signal, name), handler)


def raising(error: BaseException) -> object:
    """Return what raises an error in the place of a command."""

    def invoked(_arguments: object) -> int:
        raise error

    return invoked


@pytest.mark.parametrize(
    ("error", "status", "told"),
    [
        (MemoryError(), 4, "out of memory; close other programs, or ask for less\n"),
        (RecursionError(), 3, "an input is nested too deep\n"),
        (
            OverflowError(),
            3,
            "a figure of a part or of the spec is too large or too small to compute with; see them through\n",
        ),
        (OSError(28, "No space left on device", "x.db"), 4, "x.db: cannot be used: No space left on device\n"),
        (OSError(28, "No space left on device"), 4, "standard output: cannot be written: No space left on device\n"),
        (BrokenPipeError(), 141, ""),
        (KeyboardInterrupt(), 130, ""),
        (Ended(signal.SIGTERM), 143, ""),
        (Ended(signal.SIGHUP), 129, ""),
    ],
    ids=lambda value: type(value).__name__ if isinstance(value, BaseException) else "",
)
def test_whatever_comes_has_its_status(
    error: BaseException, status: int, told: str, monkeypatch: pytest.MonkeyPatch, capsys: pytest.CaptureFixture[str]
) -> None:
    """Each way a run can end has its exit status and at most one line."""
    monkeypatch.setattr(running, "_invoked", raising(error))
    assert main(["query"]) == status
    assert capsys.readouterr().err == told


def test_one_thread_for_arrays_unless_said_otherwise(monkeypatch: pytest.MonkeyPatch) -> None:
    """The number of threads is set before arrays are imported, and a user's own number stays."""
    monkeypatch.delenv("OPENBLAS_NUM_THREADS", raising=False)
    assert main(["--version"]) == 0
    assert os.environ["OPENBLAS_NUM_THREADS"] == "1"
    monkeypatch.setenv("OPENBLAS_NUM_THREADS", "2")
    assert main(["--version"]) == 0
    assert os.environ["OPENBLAS_NUM_THREADS"] == "2"


@pytest.mark.parametrize("before", [[], ["--catalogue", "query"], ["--catalogue=query"]])
def test_a_command_is_called_by_its_name(before: list[str], capsys: pytest.CaptureFixture[str]) -> None:
    """A command is found behind the global options, also where the catalogue is named like another command."""
    assert main([*before, "series", "--help"]) == 0
    assert "Show preferred values near a value." in capsys.readouterr().out


@pytest.mark.parametrize("words", [["--help"], ["--help", "query"], ["--catalogue", "x", "--help"]])
def test_help_shows_every_command(words: list[str], capsys: pytest.CaptureFixture[str]) -> None:
    """The program's own help lists all commands, whatever stands behind it."""
    assert main(words) == 0
    shown = capsys.readouterr().out
    assert [name for name in COMMANDS if f"  {name} " not in shown] == []


def test_no_command_is_wrong_usage_and_shows_the_help(capsys: pytest.CaptureFixture[str]) -> None:
    """The program alone shows on the standard error what it can do."""
    assert main([]) == 2
    shown = capsys.readouterr()
    assert shown.out == ""
    assert shown.err.startswith("Usage: selector")


def test_series_answers(tmp_path: Path, capsys: pytest.CaptureFixture[str], monkeypatch: pytest.MonkeyPatch) -> None:
    """A light command answers on the standard output and ends with 0."""
    monkeypatch.chdir(tmp_path)
    assert main(["series", "4.7k", "--series", "E12"]) == 0
    shown = capsys.readouterr()
    assert "4.7 kohm" in shown.out
    assert shown.err == ""
