"""The error budget: its terms, what calibration takes out of it, and how it is combined."""

from selector.budget.allowed import allowed_a, allowed_at, breaks, judged
from selector.budget.combine import amounts, combined, largest_term
from selector.budget.methods import METHODS, Combined
from selector.budget.term import Size, Term
from selector.budget.terms import TERMS
from selector.budget.zero import zeroed

__all__ = [
    "METHODS",
    "TERMS",
    "Combined",
    "Size",
    "Term",
    "allowed_a",
    "allowed_at",
    "amounts",
    "breaks",
    "combined",
    "judged",
    "largest_term",
    "zeroed",
]
