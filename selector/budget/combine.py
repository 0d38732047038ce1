"""The whole budget of a range: its combined error, and the amount of each term at a current."""

from __future__ import annotations

from collections.abc import Iterator
from math import sqrt

from selector.budget.methods import METHODS, Combined
from selector.budget.term import Size, Term
from selector.budget.terms import TERMS
from selector.candidate import Operating, TermAmount


def combined(at: Operating) -> Combined:
    """Return the combined error of a range by the spec's method, ready to be asked at any current."""
    return METHODS[at.conditions.method].combined(_remaining(at), at.conditions.coverage)


def amounts(at: Operating, current_a: float) -> tuple[TermAmount, ...]:
    """Return every non-zero term at a current in A, in table order."""
    method = METHODS[at.conditions.method]
    rows = []
    for term in TERMS:
        sizes = [float(size.at(current_a)) for size in term.remaining(at)]
        if any(sizes):
            square = sum(size**2 for size in sizes)
            standard_a = sqrt(square) if term.normal else sqrt(square / 3.0)
            rows.append(TermAmount(term.name, method.shown_a(term, sum(sizes)), standard_a))
    return tuple(rows)


def largest_term(at: Operating, terms: tuple[TermAmount, ...]) -> str:
    """Return the name of the term that counts most by the spec's method, the first in table order on a tie."""
    method = METHODS[at.conditions.method]
    best = max(terms, key=lambda term: method.rank_a(term.amount_a, term.standard_a))
    return best.name


def _remaining(at: Operating) -> Iterator[tuple[Term, Size]]:
    for term in TERMS:
        for size in term.remaining(at):
            yield term, size
