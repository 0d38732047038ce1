"""What SQLite reports, said in words that tell a person what to do."""

from __future__ import annotations

import sqlite3
from collections.abc import Iterator
from contextlib import contextmanager

from selector.errors import Fault, Unusable

_REPLACE = "put a good copy of the file in its place"

# The first name that the error's own name starts with counts, so the longer of two stands first.
_SAYINGS: tuple[tuple[str, str, str], ...] = (
    ("SQLITE_BUSY", "in use by another process; its lock was waited for", "try again when that one has ended"),
    ("SQLITE_LOCKED", "in use by another process", "try again when that one has ended"),
    ("SQLITE_PROTOCOL", "in use by another process", "try again when that one has ended"),
    ("SQLITE_READONLY", "read-only, or its folder is", "make file and folder writable, or use another --catalogue"),
    ("SQLITE_PERM", "read-only, or its folder is", "make file and folder writable, or use another --catalogue"),
    ("SQLITE_FULL", "disk full; nothing was changed", "make room and do it again"),
    ("SQLITE_IOERR", "disk error, or a limit on file sizes; nothing was changed", "look at the disk and at ulimit -f"),
    ("SQLITE_CORRUPT", "damaged", _REPLACE),
    ("SQLITE_NOTADB", "is no catalogue", "name another file with --catalogue"),
    ("SQLITE_CANTOPEN", "cannot be opened", "see that its folder is there and may be entered"),
    ("SQLITE_NOMEM", "out of memory; nothing was changed", "close other programs and do it again"),
    ("SQLITE_TOOBIG", "a text is too long to be kept", "shorten it"),
    ("SQLITE_CONSTRAINT", "refuses a value", "see the field's bounds: selector parts template KIND"),
    ("SQLITE_MISMATCH", "damaged", _REPLACE),
)


def damaged(where: str, what: str) -> Unusable:
    """Return the error of a catalogue whose content is not what was written."""
    return Unusable(Fault(where, f"damaged: {what}", _REPLACE))


def not_a_catalogue(where: str, what: str) -> Unusable:
    """Return the error of a path that holds something else than a catalogue."""
    return Unusable(Fault(where, f"is no catalogue: {what}", "name another file with --catalogue"))


def cannot_be_opened(where: str, error: OSError) -> Unusable:
    """Return the error of a path that the system does not let us look at."""
    reason = error.strerror or type(error).__name__
    return Unusable(Fault(where, f"cannot be opened: {reason}", "name another file with --catalogue"))


def fault_of(error: sqlite3.Error, where: str) -> Fault:
    """Return the fault of one error of SQLite at the catalogue `where`.

    An error without a name comes from Python's reading of a value, e.g. of a text that is no UTF-8, and
    `SQLITE_ERROR` from a table or column that is not there: both mean damage.
    """
    name = getattr(error, "sqlite_errorname", "SQLITE_ERROR")
    for start, what, remedy in _SAYINGS:
        if name.startswith(start):
            return Fault(where, f"{what} ({error})", remedy)
    return Fault(where, f"damaged ({error})", _REPLACE)


@contextmanager
def told_plainly(where: str) -> Iterator[None]:
    """Turn what SQLite raises inside the block into Unusable."""
    try:
        yield
    except sqlite3.Error as error:
        raise Unusable(fault_of(error, where)) from error
