"""The mark before cells that a spreadsheet would take for a formula, put on in writing and taken off in reading."""

from __future__ import annotations

import re

_FORMULA = re.compile(r"'*[=+\-@\t\r]")
_GUARDED = re.compile(r"'+[=+\-@\t\r]")
_NUMBER = re.compile(r"[+-]?(?:[0-9]+(?:[.,][0-9]*)?|[.,][0-9]+)(?:[eE][+-]?[0-9]{1,3})?")


def guarded(cell: str) -> str:
    """Return a cell as it is written: with one more `'` where it starts like a formula and is no number.

    Source: OWASP ASVS 4.0.3, requirement 5.3.10 (from memory): `'` before a cell that a spreadsheet would compute.

    >>> guarded("=1+1"), guarded("'-x"), guarded("-5"), guarded("S-1R")
    ("'=1+1", "''-x", '-5', 'S-1R')
    """
    return f"'{cell}" if _FORMULA.match(cell) and not _NUMBER.fullmatch(cell) else cell


def unguarded(cell: str) -> str:
    """Return a cell as it was before `guarded`."""
    return cell[1:] if _GUARDED.match(cell) else cell
