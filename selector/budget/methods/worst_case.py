"""All terms at their limits at once, and three standard deviations of noise."""

from __future__ import annotations

from collections.abc import Iterable
from dataclasses import dataclass

from selector.budget.term import Size, Term
from selector.real import Real

NOISE_SIGMAS = 3.0  # common practice, no source


@dataclass(frozen=True, slots=True)
class WorstCase:
    """E = sum of abs(terms) + 3 sigma, A, kept as its parts in I^0, I^1 and I^3."""

    constant_a: Real
    proportional: Real
    cubic_per_a2: Real

    @classmethod
    def combined(cls, sizes: Iterable[tuple[Term, Size]], coverage: float) -> WorstCase:
        """Return the combination of all sizes, summed in their order."""
        del coverage
        constant, proportional, cubic = 0.0, 0.0, 0.0  # type: Real, Real, Real
        for term, size in sizes:
            weight = NOISE_SIGMAS if term.normal else 1.0
            constant = constant + weight * size.constant_a
            proportional = proportional + weight * size.proportional
            cubic = cubic + weight * size.cubic_per_a2
        return cls(constant, proportional, cubic)

    def error_a(self, current_a: Real) -> Real:
        """Return the error at a current, A."""
        return self.constant_a + current_a * (self.proportional + self.cubic_per_a2 * current_a**2)

    @staticmethod
    def shown_a(term: Term, amount_a: float) -> float:
        """Return a term's amount as a budget lists it, A: noise as three standard deviations."""
        return NOISE_SIGMAS * amount_a if term.normal else amount_a

    @staticmethod
    def rank_a(amount_a: float, standard_a: float) -> float:
        """Return what decides which term is the largest: its amount, A."""
        del standard_a
        return amount_a
