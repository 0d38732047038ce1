"""What starts often starts light: no heavy package is imported before it is needed."""

from __future__ import annotations

import os
import subprocess
import sys
from pathlib import Path

import pytest

HEAVY = ("pandas", "sqlite_utils", "matplotlib", "rapidfuzz", "scipy", "numpy")


def imported_by(arguments: list[str], folder: Path) -> set[str]:
    """Return the top packages that a run of the program imports, as the interpreter itself reports them."""
    process = subprocess.run(
        [sys.executable, "-P", "-X", "importtime", "-m", "selector", *arguments],
        cwd=folder,
        env={**os.environ, "PYTHONPATH": str(Path(__file__).resolve().parents[1])},
        capture_output=True,
        text=True,
        check=True,
    )
    lines = [line for line in process.stderr.splitlines() if line.startswith("import time:")]
    return {line.rpartition("|")[2].strip().split(".")[0] for line in lines}


@pytest.mark.parametrize("arguments", [["--help"], ["--version"], ["series", "4.9k"]])
def test_no_heavy_package_at_start(arguments: list[str], tmp_path: Path) -> None:
    """Help, the version and preferred values come without pandas, SQL tools, plots, fuzzy search or arrays."""
    imported = imported_by(arguments, tmp_path)
    assert "selector" in imported
    assert imported.isdisjoint(HEAVY)
