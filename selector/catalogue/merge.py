"""Parts taken into a catalogue: what is new, what is the same, what differs."""

from __future__ import annotations

from collections.abc import Callable, Iterable
from dataclasses import dataclass

from selector.catalogue.rows import Stored, part_of, stored
from selector.errors import Fault, InputRefused
from selector.parts import Part, columns

Key = tuple[str, str]
"""Kind and code of a part."""

Lookup = Callable[[str, str], Stored | None]
"""From kind and code to the row that the catalogue has of them."""

Figure = str | int | float | bool | tuple[str, ...] | None


@dataclass(frozen=True, slots=True)
class Change:
    """One field that differs: its figure in the catalogue, and the one that came in."""

    kind: str
    part: str
    field: str
    before: Figure
    after: Figure


@dataclass(frozen=True, slots=True)
class Conflict:
    """A part that is refused: the catalogue has it with other figures, and they are not to be replaced."""

    kind: str
    part: str
    differences: tuple[Change, ...]


@dataclass(frozen=True, slots=True)
class Merge:
    """What became of the parts given, or would become of them; each list in the order in which they were given."""

    new: tuple[Key, ...]
    same: tuple[Key, ...]
    changed: tuple[Key, ...]
    changes: tuple[Change, ...]
    conflicts: tuple[Conflict, ...]


@dataclass(frozen=True, slots=True)
class Put:
    """A row to write, and the digest of the one that it takes the place of."""

    kind: str
    code: str
    row: Stored
    replaced: bytes | None = None


def plan(before: Lookup, parts: Iterable[Part], *, replace: bool, where: str) -> tuple[Merge, tuple[Put, ...]]:
    """Return what becomes of the parts, and the rows to write for it.

    Two parts are the same where all fields but `source` are: a second load of a file changes nothing.

    Raises
    ------
    InputRefused
        Two of the parts share kind and code.
    Unusable
        A row that is compared is damaged.
    """
    new: list[Key] = []
    same: list[Key] = []
    changed: list[Key] = []
    changes: list[Change] = []
    conflicts: list[Conflict] = []
    puts: dict[Key, Put] = {}
    seen: set[Key] = set()
    for part in parts:
        key = (part.kind, part.part)
        if key in seen:
            raise InputRefused(Fault(f"{part.kind} {part.part}", "is given twice", "give it once"))
        seen.add(key)
        row, old = stored(part), before(*key)
        if old is None:
            new.append(key)
            puts[key] = Put(*key, row)
            continue
        differences = differing(part_of(part.kind, old, where), part_of(part.kind, row, where))
        if not differences:
            same.append(key)
        elif replace:
            changed.append(key)
            changes += differences
            puts[key] = Put(*key, row, old.digest)
        else:
            conflicts.append(Conflict(*key, differences))
    merge = Merge(tuple(new), tuple(same), tuple(changed), tuple(changes), tuple(conflicts))
    return merge, tuple(puts.values())


def differing(before: Part, after: Part) -> tuple[Change, ...]:
    """Return the fields in which a part differs from what it was, in the order of the kind; `source` does not count."""
    pairs = (
        (column.name, getattr(before, column.name), getattr(after, column.name))
        for column in columns(after.kind)
        if column.name != "source"
    )
    return tuple(Change(after.kind, after.part, name, old, new) for name, old, new in pairs if old != new)
