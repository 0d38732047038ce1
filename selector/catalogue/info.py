"""What is in a catalogue, in figures."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass
from pathlib import Path

from selector.catalogue.rows import Stored
from selector.catalogue.snapshot import Snapshot
from selector.parts import KINDS, place_of


@dataclass(frozen=True, slots=True)
class KindCount:
    """How many parts of a kind there are; of them in stock (a quantity above 0, not generic), and generic."""

    kind: str
    parts: int
    stocked: int
    generic: int


@dataclass(frozen=True, slots=True)
class Info:
    """The facts of a catalogue; `path` None in memory, `size_bytes` of the file, `changed` for reading only."""

    path: Path | None
    version: int
    kinds: tuple[KindCount, ...]
    size_bytes: int
    changes: int
    changed: str


def info_of(snapshot: Snapshot, path: Path | None) -> Info:
    """Return the facts of the rows of one moment and their file."""
    kinds = tuple(_count(kind, snapshot.rows[kind]) for kind in KINDS)
    size_bytes = path.stat().st_size if path is not None and path.exists() else 0
    state = snapshot.state
    return Info(path, snapshot.version, kinds, size_bytes, state.changes, state.changed)


def _count(kind: str, rows: Mapping[str, Stored]) -> KindCount:
    """Return the counts of one kind."""
    quantity, generic = place_of(kind, "quantity"), place_of(kind, "generic")
    stocked = sum(1 for row in rows.values() if row.values[quantity] and not row.values[generic])
    return KindCount(kind, len(rows), stocked, sum(1 for row in rows.values() if row.values[generic]))
