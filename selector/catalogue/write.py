"""Rows written into the tables, with the state row kept in step."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass
from datetime import UTC, datetime
from itertools import groupby
from operator import attrgetter

from selector.catalogue.digest import moved_sum
from selector.catalogue.merge import Put
from selector.catalogue.rows import Stored
from selector.catalogue.schema import stored_names
from selector.catalogue.store import Writing

_VARIABLES = 900
"""How many values one statement carries at most; SQLite once took no more than 999."""


@dataclass(frozen=True, slots=True)
class Gone:
    """A row to delete."""

    kind: str
    code: str
    row: Stored


def write(writing: Writing, puts: Sequence[Put] = (), gone: Sequence[Gone] = ()) -> None:
    """Delete rows, then write rows, new ones or in another's place, inside the open transaction."""
    for each in gone:
        writing.db.table(each.kind).delete(each.code)
    for kind, group in groupby(sorted(puts, key=attrgetter("kind", "code")), key=attrgetter("kind")):
        names = stored_names(kind)
        records = [names, *((*each.row.values, each.row.digest) for each in group)]
        writing.db.table(kind).insert_all(records, batch_size=_VARIABLES // len(names), replace=True)
    taken = [each.replaced for each in puts if each.replaced is not None] + [each.row.digest for each in gone]
    _restate(writing, taken, [each.row.digest for each in puts])


def _restate(writing: Writing, taken: Sequence[bytes], given: Sequence[bytes]) -> None:
    """Bring the state row in step with the rows taken away and put in."""
    state = writing.before.state
    fields = {
        "rows": state.rows - len(taken) + len(given),
        "digests": moved_sum(state.digests, taken, given),
        "changes": state.changes + 1,
        "changed": datetime.now(UTC).isoformat(timespec="seconds"),
    }
    writing.db.table("state").update(1, fields)
