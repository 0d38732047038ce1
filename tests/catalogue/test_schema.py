"""The tables: what they refuse whoever writes, and that their text is that of this version."""

from __future__ import annotations

import sqlite3
from collections.abc import Callable
from contextlib import AbstractContextManager
from pathlib import Path

import pytest

from selector.catalogue.migrations import newest
from selector.catalogue.schema import tables
from selector.parts import KINDS

Sql = Callable[[Path], AbstractContextManager[sqlite3.Connection]]

REFERENCE = Path(__file__).resolve().parents[1] / "reference"
REFUSED = [
    ("resistance", "0", "CHECK"),
    ("resistance", "-1", "CHECK"),
    ("resistance", "9e-19", "CHECK"),
    ("resistance", "9e999", "CHECK"),
    ("resistance", "-9e999", "CHECK"),
    ("resistance", "1e15", "CHECK"),
    ("resistance", "'4k7'", "cannot store TEXT"),
    ("resistance", "x'00'", "cannot store BLOB"),
    ("resistance", "NULL", "NOT NULL"),
    ("tolerance", "1.0", "CHECK"),
    ("tolerance", "-0.001", "CHECK"),
    ("tempco", "-1e-6", "CHECK"),
    ("power", "0", "CHECK"),
    ("full_power_temp", "-273.15", "CHECK"),
    ("terminals", "3", "CHECK"),
    ("terminals", "2.5", "cannot store REAL"),
    ("generic", "2", "CHECK"),
    ("quantity", "-1", "CHECK"),
    ("quantity", "1.5", "cannot store REAL"),
    ("part", "''", "CHECK"),
    ("part", "NULL", "NOT NULL"),
    ("part", "printf('%.201c', 'x')", "CHECK"),
    ("description", "printf('%.10001c', 'x')", "CHECK"),
    ("note", "NULL", "NOT NULL"),
    ("digest", "x'00'", "CHECK"),
]


@pytest.mark.parametrize(("field", "value", "words"), REFUSED)
def test_the_table_refuses_impossible_values(stocked: Path, sql: Sql, field: str, value: str, words: str) -> None:
    """Whoever writes with bare SQL meets the type, NOT NULL or CHECK of the column."""
    with sql(stocked) as connection, pytest.raises(sqlite3.IntegrityError, match=words):
        connection.execute(f'UPDATE shunt SET "{field}" = {value}')  # noqa: S608 - the test's own words


def test_temperatures_and_common_mode_may_be_negative(stocked: Path, sql: Sql) -> None:
    """Only temperatures and common_mode_min take figures below nought."""
    with sql(stocked) as connection:
        connection.execute("UPDATE shunt SET full_power_temp = -40.0")
    ddl = tables()["amplifier"]
    open_below = [line.split('"')[1] for line in ddl.splitlines() if " REAL" in line and "> 0" not in line]
    open_below = [name for name in open_below if f'"{name}" >= 0.0' not in ddl]
    assert open_below == ["common_mode_min", "temp_min", "temp_max"]


def test_a_code_stands_once_in_its_table(stocked: Path, sql: Sql) -> None:
    """The code is the primary key of its kind's table."""
    with sql(stocked) as connection, pytest.raises(sqlite3.IntegrityError, match="UNIQUE"):
        connection.execute("UPDATE resistor SET part = 'R1'")


def test_every_kind_has_a_strict_table() -> None:
    """There is one table for each kind of part and one for the state, all of them STRICT."""
    assert list(tables()) == ["state", *KINDS]
    assert all(ddl.endswith(") STRICT") for ddl in tables().values())


def test_the_schema_is_that_of_its_version() -> None:
    """The DDL is, to the letter, what this version had when it was released.

    Where this fails, a field was added or changed: raise the version by a step in migrations.STEPS (an empty one will
    do for a field with a default) and write the new text to the next reference file.
    Source: tests/reference/catalogue_schema_1.sql, written when version 1 was made.
    Tolerance: none, the text itself.
    """
    reference = REFERENCE / f"catalogue_schema_{newest()}.sql"
    assert "".join(f"{ddl};\n" for ddl in tables().values()) == reference.read_text(encoding="utf-8")


def test_the_file_carries_our_mark_and_settings(stocked: Path, sql: Sql) -> None:
    """The header holds application number and version, and the journal is one that is deleted."""
    with sql(stocked) as connection:
        pragmas = {
            name: connection.execute(f"PRAGMA {name}").fetchone()[0] for name in ("application_id", "user_version")
        }
        journal = connection.execute("PRAGMA journal_mode").fetchone()[0]
    assert (pragmas["application_id"].to_bytes(4, "big"), pragmas["user_version"], journal) == (b"sel1", 1, "delete")
    assert [path.name for path in stocked.parent.iterdir()] == ["parts.db"]
