"""What is known of a combination that was computed: everything that people and programs are shown."""

from __future__ import annotations

from dataclasses import dataclass

from selector.candidate.design import Design


@dataclass(frozen=True, slots=True)
class Uses:
    """How much of each limit a combination uses; 1 is all of it."""

    power: float
    burden: float
    headroom: float
    error: float

    def largest(self) -> float:
        """Return the largest of the four."""
        return max(self.power, self.burden, self.headroom, self.error)


@dataclass(frozen=True, slots=True)
class RangeFigures:
    """Gain of a range, its borders at the input, A, and the output there, V."""

    gain: float
    low_a: float
    high_a: float
    output_low_v: float
    output_high_v: float


@dataclass(frozen=True, slots=True)
class TermAmount:
    """One term at one current: its amount, A, and its standard uncertainty, A."""

    name: str
    amount_a: float
    standard_a: float


@dataclass(frozen=True, slots=True)
class Point:
    """The error of a range at one judged current, A; `range` counts from 1."""

    range: int
    current_a: float
    error_a: float
    allowed_a: float
    terms: tuple[TermAmount, ...]

    @property
    def use(self) -> float:
        """Return the error as a share of what is allowed."""
        return self.error_a / self.allowed_a


@dataclass(frozen=True, slots=True)
class Limiting:
    """The judged point with the largest share of the allowed error, and the term that is largest there."""

    range: int
    current_a: float
    use: float
    term: str


@dataclass(frozen=True, slots=True)
class FilterFiguresShown:
    """The nominal corner with the resistance of the last range, Hz, and what each range makes of it."""

    cutoff_hz: float
    bandwidth_hz: tuple[float, ...]
    settle_s: tuple[float, ...]


@dataclass(frozen=True, slots=True)
class Verdict:
    """One limit on a combination: `value` is to be at most `allowed`; None where it has no figure."""

    limit: str
    meets: bool | None
    value: float | None
    allowed: float | None

    @property
    def margin(self) -> float | None:
        """Return (allowed - value) / abs(allowed), positive where the limit is met."""
        if self.value is None or self.allowed is None or self.allowed == 0.0:
            return None
        return (self.allowed - self.value) / abs(self.allowed)


@dataclass(frozen=True, slots=True)
class Candidate:
    """A combination with all its figures."""

    design: Design
    score: float
    uses: Uses
    power_w: float
    burden_v: float
    headroom_frac: float
    shunt_power_w: float
    cost: float | None
    currency: str | None
    ranges: tuple[RangeFigures, ...]
    filter: FilterFiguresShown
    points: tuple[Point, ...]
    limiting: Limiting
    rank: int | None = None
    pareto: bool | None = None
