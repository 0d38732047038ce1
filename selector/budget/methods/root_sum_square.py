"""Independent terms added in squares, times a coverage factor."""

from __future__ import annotations

from collections.abc import Iterable
from dataclasses import dataclass

from selector.budget.term import Size, Term
from selector.real import Real


@dataclass(frozen=True, slots=True)
class RootSumSquare:
    """E = coverage sqrt(sum (limit / sqrt 3)^2 + sigma^2), A, kept as the parts of the square in powers of I.

    Source: JCGM 100:2008, 5.1.2 and 6.2.1; limits as rectangular distributions, 4.3.7.
    """

    coverage: float
    parts: tuple[Real, Real, Real, Real, Real, Real]  # of I^0, I^1, I^2, I^3, I^4, I^6

    @classmethod
    def combined(cls, sizes: Iterable[tuple[Term, Size]], coverage: float) -> RootSumSquare:
        """Return the combination of all sizes, summed in their order."""
        parts: list[Real] = [0.0] * 6
        for term, size in sizes:
            weight = 1.0 if term.normal else 1.0 / 3.0
            for index, part in enumerate(_square(size)):
                parts[index] = parts[index] + weight * part
        return cls(coverage, (parts[0], parts[1], parts[2], parts[3], parts[4], parts[5]))

    def error_a(self, current_a: Real) -> Real:
        """Return the error at a current, A."""
        c0, c1, c2, c3, c4, c6 = self.parts
        square = c0 + current_a * (c1 + current_a * (c2 + current_a * (c3 + current_a * (c4 + current_a**2 * c6))))
        return self.coverage * square**0.5

    @staticmethod
    def shown_a(term: Term, amount_a: float) -> float:
        """Return a term's amount as a budget lists it, A: noise as one standard deviation."""
        del term
        return amount_a

    @staticmethod
    def rank_a(amount_a: float, standard_a: float) -> float:
        """Return what decides which term is the largest: its standard uncertainty, A."""
        del amount_a
        return standard_a


def _square(size: Size) -> tuple[Real, Real, Real, Real, Real, Real]:
    """Return the square of c + p I + q I^3 by powers of I."""
    constant, proportional, cubic = size.constant_a, size.proportional, size.cubic_per_a2
    return (
        constant**2,
        2.0 * constant * proportional,
        proportional**2,
        2.0 * constant * cubic,
        2.0 * proportional * cubic,
        cubic**2,
    )
