"""A catalogue of an older version: read as it is, and changed only after a copy of it was kept."""

from __future__ import annotations

import sqlite3
from collections.abc import Callable
from contextlib import AbstractContextManager
from pathlib import Path
from typing import TYPE_CHECKING

import pytest

from selector.catalogue import migrations, open_catalogue
from selector.catalogue.digest import digest_sum, row_digest
from selector.catalogue.schema import tables
from selector.errors import Unusable
from selector.parts import KINDS, Part

if TYPE_CHECKING:
    from sqlite_utils import Database

Make = Callable[..., Part]
Sql = Callable[[Path], AbstractContextManager[sqlite3.Connection]]


def mark_locations(db: Database) -> None:
    """Do what a later version might: write one field anew."""
    db.execute("UPDATE resistor SET location = location || '!'")


def fail(db: Database) -> None:
    """Do something, then fail, as a step may that meets what it did not foresee."""
    db.execute("UPDATE resistor SET location = 'lost'")
    db.execute("UPDATE resistor SET tolerance = 7.0")


@pytest.fixture
def later(monkeypatch: pytest.MonkeyPatch) -> Callable[..., None]:
    """Return a way to make this program a later one, with more steps."""

    def with_steps(*steps: migrations.Step) -> None:
        monkeypatch.setattr(migrations, "STEPS", steps)

    return with_steps


def version_of(path: Path) -> int:
    """Return the version in a file's header."""
    return int.from_bytes(path.read_bytes()[60:64], "big")


def codes(path: Path) -> list[str]:
    """Return the codes of the resistors."""
    with open_catalogue(path) as catalogue:
        return [part.part for part in catalogue.parts("resistor")]


def test_reading_an_older_version_changes_nothing(stocked: Path, later: Callable[..., None]) -> None:
    """A reader sees an older catalogue as the later version has it, and the file stays as it was."""
    before = stocked.read_bytes()
    later(mark_locations, mark_locations)
    with open_catalogue(stocked) as catalogue:
        part = catalogue.get("resistor", "R1")
        assert part is not None
        assert part.location == "!!"
        assert catalogue.info().version == 3
    assert stocked.read_bytes() == before
    assert [path.name for path in stocked.parent.iterdir()] == ["parts.db"]


def test_the_first_write_keeps_a_copy_and_migrates(stocked: Path, later: Callable[..., None], resistor: Make) -> None:
    """A writer copies the old version beside it, runs all steps, and writes; the copy is the old file still."""
    old = codes(stocked)
    later(mark_locations, mark_locations)
    with open_catalogue(stocked, write=True) as catalogue:
        catalogue.add(resistor("R9"))
    assert (version_of(stocked), codes(stocked)) == (3, [*old[:-1], "R9", old[-1]])
    backup = stocked.with_name("parts.db.v1-backup")
    assert sorted(stocked.parent.iterdir()) == [stocked, backup]
    later()
    assert (version_of(backup), codes(backup)) == (1, old)


def test_a_migrated_file_has_the_tables_of_a_new_one(
    stocked: Path, tmp_path: Path, later: Callable[..., None], resistor: Make, sql: Sql
) -> None:
    """After a migration the schema is the same text as in a catalogue that is made anew."""
    later(mark_locations)
    schemas = []
    for path in (stocked, tmp_path / "new.db"):
        with open_catalogue(path, write=True) as catalogue:
            catalogue.add(resistor("R9"))
        with sql(path) as connection:
            schemas.append(dict(connection.execute("SELECT name, sql FROM sqlite_master").fetchall()))
    assert schemas[0] == schemas[1]


def test_fields_and_kinds_that_came_later_are_added(
    tmp_path: Path, later: Callable[..., None], sql: Sql, resistor: Make
) -> None:
    """An older file that lacks a field and a kind gets both: the field with its default, the digests anew."""
    path = tmp_path / "old.db"
    ddl = tables()
    del ddl["switch"]
    ddl["resistor"] = "\n".join(line for line in ddl["resistor"].splitlines() if '"note"' not in line)
    names = [line.split('"')[1] for line in ddl["resistor"].splitlines()[1:-1]][:-1]
    figures = {"part": "R1", "resistance": 4990.0, "tolerance": 0.001, "tempco": 25e-6, "quantity": 40, "generic": 0}
    row = tuple(
        figures.get(name, None if name in ("unit_cost", "currency", "power", "voltage") else "") for name in names
    )
    digest = row_digest("resistor", row)
    with sql(path) as connection:
        for statement in ddl.values():
            connection.execute(statement)
        places = ", ".join("?" * (len(row) + 1))
        connection.execute(f"INSERT INTO resistor VALUES ({places})", (*row, digest))  # noqa: S608 - question marks
        connection.execute("INSERT INTO state VALUES (1, 1, ?, 1, '')", (digest_sum([digest]),))
        connection.execute("PRAGMA application_id = 1936026673")
        connection.execute("PRAGMA user_version = 1")
    later(lambda _: None)
    with open_catalogue(path) as catalogue:
        assert catalogue.parts("resistor") == (resistor("R1"),)
    with open_catalogue(path, write=True) as catalogue:
        catalogue.change("resistor", "R1", {"note": "kept"})
    with open_catalogue(path) as catalogue:
        assert catalogue.parts("resistor") == (resistor("R1", note="kept"),)
        assert all(catalogue.parts(kind) == () for kind in KINDS if kind != "resistor")


def test_a_step_that_fails_leaves_the_old_version(stocked: Path, later: Callable[..., None], resistor: Make) -> None:
    """Where a step fails, the file is as it was, version and all."""
    before = stocked.read_bytes()
    later(mark_locations, fail)
    with pytest.raises(Unusable, match="refuses a value"), open_catalogue(stocked, write=True) as catalogue:
        catalogue.add(resistor("R9"))
    assert stocked.read_bytes() == before


def test_damage_is_not_migrated(stocked: Path, later: Callable[..., None], sql: Sql, resistor: Make) -> None:
    """An older catalogue whose rows are not what was written is refused to reader and writer alike."""
    with sql(stocked) as connection:
        connection.execute("UPDATE resistor SET resistance = 1.0 WHERE part = 'R1'")
    before = stocked.read_bytes()
    later(mark_locations)
    with pytest.raises(Unusable, match="damaged: row 'R1'"):
        open_catalogue(stocked)
    with pytest.raises(Unusable, match="damaged: row 'R1'"), open_catalogue(stocked, write=True) as catalogue:
        catalogue.add(resistor("R9"))
    assert stocked.read_bytes() == before


def test_without_a_copy_nothing_is_migrated(stocked: Path, later: Callable[..., None], resistor: Make) -> None:
    """Where the copy cannot take its place, the catalogue stays at its version and no part of a copy is left."""
    stocked.with_name("parts.db.v1-backup").mkdir()
    before = stocked.read_bytes()
    later(mark_locations)
    words = "is of version 1, and no copy of it can be kept beside it before it is changed"
    with pytest.raises(Unusable, match=words), open_catalogue(stocked, write=True) as catalogue:
        catalogue.add(resistor("R9"))
    assert stocked.read_bytes() == before
    assert sorted(path.name for path in stocked.parent.iterdir()) == ["parts.db", "parts.db.v1-backup"]


def test_a_dry_run_migrates_nothing(stocked: Path, later: Callable[..., None], resistor: Make) -> None:
    """A dry run on an older catalogue leaves it alone and keeps no copy."""
    before = stocked.read_bytes()
    later(mark_locations)
    with open_catalogue(stocked, write=True) as catalogue:
        assert catalogue.merge([resistor("R9")], dry_run=True).new == (("resistor", "R9"),)
    assert stocked.read_bytes() == before
    assert len(list(stocked.parent.iterdir())) == 1
