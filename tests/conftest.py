"""What all tests share: checks against the circuit simulator run where there is one and are counted elsewhere."""

from __future__ import annotations

import os
import shutil
from typing import TYPE_CHECKING

import pytest
from hypothesis import settings

if TYPE_CHECKING:
    from _pytest.terminal import TerminalReporter

# Random tests look for new failures at a desk; in CI they repeat, so that a failure there is one of the change at hand.
settings.register_profile("desk", deadline=None)
settings.register_profile("ci", deadline=None, derandomize=True)
settings.load_profile("ci" if os.environ.get("CI") == "true" else "desk")

MISSING = "ngspice is not installed"
REQUIRED = "SELECTOR_REQUIRE_NGSPICE"


def pytest_runtest_setup(item: pytest.Item) -> None:
    """Skip a check against the circuit simulator where there is none, or fail it where one is required."""
    if item.get_closest_marker("circuit") is None or shutil.which("ngspice") is not None:
        return
    if os.environ.get(REQUIRED) == "1":
        pytest.fail(f"{MISSING}, and {REQUIRED} asks for it", pytrace=False)
    pytest.skip(MISSING)


def pytest_terminal_summary(terminalreporter: TerminalReporter) -> None:
    """Say how many checks against the circuit simulator did not run."""
    skipped = terminalreporter.stats.get("skipped", [])
    missed = sum("circuit" in report.keywords and MISSING in str(report.longrepr) for report in skipped)
    if missed:
        terminalreporter.write_line(f"{missed} checks against ngspice did not run: {MISSING}")
