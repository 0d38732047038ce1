"""The tables of a catalogue, written from the columns of the part kinds."""

from __future__ import annotations

import sqlite3

from selector.catalogue.digest import DIGEST_BYTES
from selector.parts import KINDS, Column, columns

_TOO_LARGE = 1e15
_MOST_CODE_CHARACTERS = 200
_MOST_CHARACTERS = 10_000

STATE = f"""CREATE TABLE "state" (
  "id" INTEGER NOT NULL PRIMARY KEY CHECK ("id" = 1),
  "rows" INTEGER NOT NULL CHECK ("rows" >= 0),
  "digests" BLOB NOT NULL CHECK (length("digests") = {DIGEST_BYTES}),
  "changes" INTEGER NOT NULL CHECK ("changes" >= 0),
  "changed" TEXT NOT NULL
) STRICT"""
"""One row: how many parts there are, the sum of their digests, how often they changed, and when last (shown only)."""


def tables() -> dict[str, str]:
    """Return name and DDL of every table that a catalogue of today's version has."""
    return {"state": STATE} | {kind: table(kind) for kind in KINDS}


def table(kind: str) -> str:
    """Return the DDL of one kind's table: a column per field, and the row's digest."""
    lines = [f"  {quoted(column.name)} {sql_type(column)}{_rules(column)}" for column in columns(kind)]
    lines.append(f'  "digest" BLOB NOT NULL CHECK (length("digest") = {DIGEST_BYTES})')
    body = ",\n".join(lines)
    return f"CREATE TABLE {quoted(kind)} (\n{body}\n) STRICT"


def quoted(name: str) -> str:
    """Return a name of ours as an SQL identifier."""
    return '"' + name.replace('"', '""') + '"'


def sql_type(column: Column) -> str:
    """Return the strict type of a field's column: TEXT, INTEGER or REAL."""
    if column.real:
        return "REAL"
    return "INTEGER" if column.sort == "flag" or column.whole else "TEXT"


def stored_names(kind: str) -> tuple[str, ...]:
    """Return the names of a table's columns in order, the digest last."""
    return (*(column.name for column in columns(kind)), "digest")


def found_tables(connection: sqlite3.Connection) -> dict[str, str]:
    """Return name and DDL of what a file holds, without what SQLite keeps for itself."""
    sql = "SELECT name, sql FROM sqlite_master WHERE name NOT LIKE 'sqlite!_%' ESCAPE '!'"
    return dict(connection.execute(sql).fetchall())


def _rules(column: Column) -> str:
    """Return what a column demands of its values, as SQL."""
    rule = " NOT NULL" if column.required or column.default is not None else ""
    if column.name == "part":
        return f'{rule} PRIMARY KEY CHECK (length("part") BETWEEN 1 AND {_MOST_CODE_CHARACTERS})'
    tests = " AND ".join(_tests(column))
    return f"{rule} CHECK ({tests})" if tests else rule


def _tests(column: Column) -> list[str]:
    """Return the conditions that a value of the column meets; an absent one (NULL) meets all."""
    name = quoted(column.name)
    if column.choices:
        return [f"{name} IN ({', '.join(_literal(choice) for choice in column.choices)})"]
    if column.sort == "flag":
        return [f"{name} IN (0, 1)"]
    if column.sort != "quantity":
        return [f"length({name}) <= {_MOST_CHARACTERS}"]
    tests = [f"abs({name}) < {_TOO_LARGE!r}"]
    bounds = ((">=", column.least), (">", column.above), ("<", column.below), ("<=", column.most))
    return tests + [f"{name} {sign} {bound!r}" for sign, bound in bounds if _binds(bound)]


def _binds(bound: float | None) -> bool:
    """Return whether a bound says more than that the figure is below 1e15 in size."""
    return bound is not None and abs(bound) < _TOO_LARGE


def _literal(value: object) -> str:
    """Return a choice of ours as an SQL literal."""
    return str(value) if isinstance(value, int | float) else "'" + str(value).replace("'", "''") + "'"
