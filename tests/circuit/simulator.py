"""Runs a deck in the circuit simulator and reads what it prints."""

from __future__ import annotations

import re
import subprocess
import tempfile
from functools import cache
from pathlib import Path

PRINTED = re.compile(r"^(\w+)\s*=\s*([-+]?\d[\d.]*e[-+]?\d+)\s*$", re.MULTILINE)
LIMIT_S = 60


def printed(deck: str) -> dict[str, float]:
    """Return every `name = number` line that a deck prints; raise RuntimeError where it prints an error."""
    with tempfile.TemporaryDirectory() as folder:
        path = Path(folder) / "deck.cir"
        path.write_text(deck, encoding="ascii")
        done = subprocess.run(
            ["ngspice", "-n", "-b", str(path)],  # noqa: S607 - the simulator is found by PATH, as conftest.py does
            cwd=folder,
            capture_output=True,
            text=True,
            check=False,
            timeout=LIMIT_S,
        )
    told = done.stdout + done.stderr
    faults = [
        line
        for line in told.splitlines()
        if re.search(r"error|fail|singular|unknown|not available", line, re.IGNORECASE)
    ]
    if faults or done.returncode != 0:
        raise RuntimeError("ngspice: " + "; ".join(faults or [f"exit status {done.returncode}"]))
    return {name: float(value) for name, value in PRINTED.findall(told)}


@cache
def version() -> str:
    """Return the simulator's name and version, such as `ngspice-39`."""
    command = ["ngspice", "-v"]
    told = subprocess.run(command, capture_output=True, text=True, check=True, timeout=LIMIT_S).stdout
    found = re.search(r"ngspice-\S+", told)
    return found.group() if found else "ngspice of unknown version"
