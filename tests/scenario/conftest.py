"""Whole commands, each in a process of its own, on the bundled parts."""

from __future__ import annotations

import os
import subprocess
import sys
from collections.abc import Callable, Mapping
from pathlib import Path

import pytest

CHECKOUT = Path(__file__).resolve().parents[2]
DATA = CHECKOUT / "data"
FILES = sorted((DATA / "parts").glob("*.csv"))

Run = Callable[..., "subprocess.CompletedProcess[str]"]


def command(*arguments: object) -> list[str]:
    """Return the words of a command line of this checkout."""
    return [sys.executable, "-P", "-m", "selector", *map(str, arguments)]


def surroundings(folder: Path, more: Mapping[str, str] | None = None) -> dict[str, str]:
    """Return the environment of a command: this checkout's code, a home and a catalogue of its own."""
    kept = {name: value for name, value in os.environ.items() if not name.startswith(("SELECTOR_", "XDG_", "PYTHON"))}
    own = {"PYTHONPATH": str(CHECKOUT), "HOME": str(folder), "LC_ALL": "C.UTF-8", "COLUMNS": "80"}
    return {**kept, **own, **(more or {})}


def runner(folder: Path, catalogue: Path) -> Run:
    """Return what runs a command in a folder, with a catalogue unless the command names another."""

    def run(*arguments: object, **environment: str) -> subprocess.CompletedProcess[str]:
        done = subprocess.run(
            command(*arguments),
            cwd=folder,
            env=surroundings(folder, {"SELECTOR_CATALOGUE": str(catalogue), **environment}),
            capture_output=True,
            text=True,
            encoding="utf-8",
            stdin=subprocess.DEVNULL,
            check=False,
        )
        assert "Traceback" not in done.stderr, done.stderr
        return done

    return run


@pytest.fixture(scope="session")
def loaded(tmp_path_factory: pytest.TempPathFactory) -> Path:
    """Return a catalogue of the bundled parts, which no test changes."""
    folder = tmp_path_factory.mktemp("loaded")
    path = folder / "parts.db"
    done = runner(folder, path)("load", *FILES)
    assert done.returncode == 0, done.stderr
    path.chmod(0o444)
    return path


@pytest.fixture
def run(tmp_path: Path, loaded: Path) -> Run:
    """Run a command in an empty folder with the bundled parts."""
    return runner(tmp_path, loaded)


@pytest.fixture
def run_own(tmp_path: Path) -> Run:
    """Run a command in an empty folder with a catalogue that is not there yet: `own.db`."""
    return runner(tmp_path, tmp_path / "own.db")
