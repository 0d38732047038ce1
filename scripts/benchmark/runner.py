"""Runs each case in a fresh interpreter, within a time limit, and remembers what came of it."""

from __future__ import annotations

import json
import subprocess
import sys
from dataclasses import dataclass, field
from math import inf
from pathlib import Path

from scripts.benchmark.case import OUT_OF_MEMORY, Case, Outcome, peak_mb

CHECKOUT = Path(__file__).resolve().parents[2]
LIMIT_S = 600.0
LONG_S = 5.0  # a case that takes longer is not run again: what disturbs it is small beside it


@dataclass(slots=True)
class Runner:
    """The outcomes of cases: the best time of some turns, and the most memory of all of them."""

    turns: int
    limit_s: float = LIMIT_S
    outcomes: dict[Case, Outcome] = field(default_factory=dict)

    def of(self, case: Case) -> Outcome:
        """Return the outcome of a case; raises CalledProcessError where it fails of itself."""
        if case not in self.outcomes:
            self.outcomes[case] = self._best(case)
        return self.outcomes[case]

    def _best(self, case: Case) -> Outcome:
        best = self._once(case)
        for _ in range(self.turns - 1):
            if best.seconds > LONG_S:
                break
            other = self._once(case)
            peak_mb = max(best.peak_mb, other.peak_mb)
            best = Outcome(min(best.seconds, other.seconds), peak_mb, best.nominal, best.found)
        return best

    def _once(self, case: Case) -> Outcome:
        command = [sys.executable, "-P", "-m", "scripts.benchmark.case", *case.arguments()]
        with subprocess.Popen(command, cwd=CHECKOUT, stdout=subprocess.PIPE, stderr=subprocess.PIPE) as process:
            try:
                output, errors = process.communicate(timeout=self.limit_s)
            except subprocess.TimeoutExpired:
                so_far_mb = peak_mb(process.pid)
                process.kill()
                return Outcome(inf, so_far_mb, 0, 0)
        if process.returncode == OUT_OF_MEMORY:
            return Outcome(inf, inf, 0, 0)
        if process.returncode != 0:
            raise subprocess.CalledProcessError(process.returncode, command, output, errors)
        return Outcome(**json.loads(output))
