"""What a search gives back."""

from __future__ import annotations

from dataclasses import dataclass

from selector.candidate import Candidate, Verdict


@dataclass(frozen=True, slots=True)
class LeftOut:
    """How many parts of a kind were out before the search, and why."""

    kind: str
    reason: str
    count: int


@dataclass(frozen=True, slots=True)
class Searched:
    """How much was looked at: parts of each kind, nominal combinations, and those judged in full."""

    shunts: int
    amplifiers: int
    switches: int
    bypasses: int
    resistors: int
    filter_pairs: int
    combinations: int
    left_out: tuple[LeftOut, ...]
    evaluated: int
    seconds: float


@dataclass(frozen=True, slots=True)
class NothingFits:
    """Why there is no candidate: pairs by the furthest limit one of their combinations stops at, in limit order.

    `nearest` is the combination with the smallest largest use of the ranked limits, all other limits held.
    """

    pairs: int
    blocked: tuple[tuple[str, int], ...]
    nearest: Candidate | None


@dataclass(frozen=True, slots=True)
class Found:
    """The exact short list, best first, or why it is empty."""

    candidates: tuple[Candidate, ...]
    searched: Searched
    nothing_fits: NothingFits | None


@dataclass(frozen=True, slots=True)
class Judged:
    """A given design against a spec: every limit, and its figures as far as they exist."""

    candidate: Candidate | None
    meets: bool
    verdicts: tuple[Verdict, ...]
