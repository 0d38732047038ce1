"""README's tables of limits and error terms, as the files of both say what they are."""

from __future__ import annotations

import inspect
import sys

from selector.budget import TERMS
from selector.limits import LIMITS


def _said(function: object) -> str:
    module = sys.modules[str(getattr(function, "__module__", ""))]
    return (inspect.getdoc(module) or "").splitlines()[0].rstrip(".")


def limits() -> str:
    """Return the table of limits, in the order in which they are judged."""
    rows = [f"| {limit.name} | {_said(limit.checks[0].measure)} |" for limit in LIMITS]
    return "\n".join(["| limit | is met where |", "|---|---|", *rows]) + "\n"


def terms() -> str:
    """Return the table of error terms, in the order of a budget."""
    rows = [f"| {term.name} | {_said(term.sizes)} | {_removed(term)} |" for term in TERMS]
    return "\n".join(["| error term | is | taken out by |", "|---|---|---|", *rows]) + "\n"


def _removed(term: object) -> str:
    removed_by = getattr(term, "removed_by", None)
    return "" if removed_by is None else str(removed_by.value)
