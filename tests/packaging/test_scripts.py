"""The scripts that start everything, and what pytest does with checks against a missing circuit simulator."""

from __future__ import annotations

import os
import stat
import subprocess
import sys
from pathlib import Path

import pytest

CHECKOUT = Path(__file__).resolve().parents[2]
STARTED = [CHECKOUT / ".ci" / "run", *(CHECKOUT / "scripts" / name for name in ("selector", "test", "lock", "bench"))]
TWO_CHECKS = """
import pytest

@pytest.mark.circuit
@pytest.mark.parametrize("number", [1, 2])
def test_circuit(number):
    pass

def test_other():
    pass
"""


@pytest.mark.parametrize("script", STARTED, ids=lambda path: path.name)
def test_script_can_be_started_and_parsed(script: Path) -> None:
    """Each script is executable, is read by bash without a fault, and stops at the first one when it runs."""
    assert script.stat().st_mode & stat.S_IXUSR
    assert subprocess.run(["/bin/bash", "-n", script], capture_output=True, check=False).stderr == b""
    assert "set -euo pipefail" in script.read_text(encoding="utf-8")


def run_two_checks(folder: Path, **environment: str) -> subprocess.CompletedProcess[str]:
    """Run two checks against the simulator and one other test where no program is on the path."""
    (folder / "test_two.py").write_text(TWO_CHECKS, encoding="utf-8")
    (folder / "conftest.py").write_bytes((CHECKOUT / "tests" / "conftest.py").read_bytes())
    (folder / "pytest.ini").write_text("[pytest]\nmarkers = circuit: simulator\n", encoding="utf-8")
    kept = {name: value for name, value in os.environ.items() if not name.startswith(("PYTEST_", "SELECTOR_"))}
    return subprocess.run(
        [sys.executable, "-m", "pytest", "-n", "2", "-p", "no:cacheprovider", "-c", "pytest.ini", "."],
        cwd=folder,
        env={**kept, "PATH": str(folder), **environment},
        capture_output=True,
        text=True,
        check=False,
    )


def test_missing_simulator_is_counted(tmp_path: Path) -> None:
    """Without the simulator its checks are skipped, and the summary says how many did not run."""
    done = run_two_checks(tmp_path)
    assert done.returncode == 0, done.stdout
    assert "2 checks against ngspice did not run" in done.stdout
    assert "1 passed, 2 skipped" in done.stdout.splitlines()[-1]


def test_missing_simulator_fails_where_it_is_required(tmp_path: Path) -> None:
    """Where the environment asks for the simulator, as in CI, its checks fail without it."""
    done = run_two_checks(tmp_path, SELECTOR_REQUIRE_NGSPICE="1")
    assert done.returncode == 1, done.stdout
    assert "1 passed, 2 errors" in done.stdout or "2 failed, 1 passed" in done.stdout
