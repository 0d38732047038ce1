"""What each command imports."""

from __future__ import annotations

import os
import subprocess
import sys
from pathlib import Path

import pytest

CHECKOUT = Path(__file__).resolve().parents[2]
TABLES = {"pandas", "rapidfuzz", "sqlite_utils", "matplotlib", "scipy"}


def imported(folder: Path, *words: str) -> set[str]:
    """Return the top packages that a command imports."""
    done = subprocess.run(
        [sys.executable, "-P", "-X", "importtime", "-m", "selector", *words],
        cwd=folder,
        env={**os.environ, "PYTHONPATH": str(CHECKOUT), "SELECTOR_CATALOGUE": str(folder / "c.db")},
        capture_output=True,
        text=True,
        stdin=subprocess.DEVNULL,
        check=False,
    )
    assert done.returncode in (0, 1), done.stderr
    lines = [line for line in done.stderr.splitlines() if line.startswith("import time:")]
    return {line.rpartition("|")[2].strip().split(".")[0] for line in lines}


@pytest.fixture(scope="module")
def folder(tmp_path_factory: pytest.TempPathFactory) -> Path:
    """Return a folder with a catalogue of some parts, and a spec."""
    folder = tmp_path_factory.mktemp("light")
    files = [str(CHECKOUT / "data" / "parts" / f"{name}.csv") for name in ("shunts", "switches")]
    imported(folder, "load", *files)
    return folder


@pytest.mark.parametrize("words", ["--help", "--version", "series 4k7", "parts list", "catalogue info", "spec schema"])
def test_light_commands_import_no_arrays(words: str, folder: Path) -> None:
    """What is looked up in a moment imports neither arrays nor tables."""
    found = imported(folder, *words.split())
    assert "selector" in found
    assert found.isdisjoint({*TABLES, "numpy"})


def test_query_imports_no_tables(folder: Path) -> None:
    """The search imports arrays alone."""
    found = imported(folder, "query", str(CHECKOUT / "data" / "irrigation_pump.toml"))
    assert "numpy" in found
    assert found.isdisjoint(TABLES)


def test_load_imports_no_tables(folder: Path) -> None:
    """A load into a new catalogue, and one into a catalogue that is there, import neither tables nor arrays."""
    for _ in range(2):
        words = ("load", str(CHECKOUT / "data" / "parts" / "resistors.csv"), "--catalogue", str(folder / "new.db"))
        assert imported(folder, *words).isdisjoint({*TABLES, "numpy"})
