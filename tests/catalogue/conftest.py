"""Parts, a catalogue file, and ways into it that the catalogue itself does not offer."""

from __future__ import annotations

import sqlite3
from collections.abc import Callable, Iterator
from contextlib import closing, contextmanager
from pathlib import Path

import pytest

from selector.catalogue import open_catalogue
from selector.parts import Part, read_part

MakePart = Callable[..., Part]
OpenSql = Callable[[Path], object]

RESISTOR = {"resistance": "4.99 kohm", "tolerance": "0.1 %", "tempco": "25 ppm/K", "quantity": "40"}
SHUNT = {"resistance": "0R05", "tolerance": "0.5 %", "tempco": "50 ppm/K", "power": "1 W"}


@pytest.fixture
def resistor() -> MakePart:
    """Return a maker of resistors: a code, and fields that differ from the usual ones."""

    def make(code: str, **fields: str) -> Part:
        return read_part("resistor", {"part": code, **RESISTOR, **fields}, where="test")

    return make


@pytest.fixture
def shunt() -> MakePart:
    """Return a maker of shunts: a code, and fields that differ from the usual ones."""

    def make(code: str, **fields: str) -> Part:
        return read_part("shunt", {"part": code, **SHUNT, **fields}, where="test")

    return make


@pytest.fixture
def stocked(tmp_path: Path, resistor: MakePart, shunt: MakePart) -> Path:
    """Return the path of a catalogue with three resistors and a shunt."""
    path = tmp_path / "parts.db"
    parts = [resistor("R3"), resistor("R1", description="thin film"), resistor("r2"), shunt("S1")]
    with open_catalogue(path, write=True) as catalogue:
        catalogue.merge(parts)
    return path


@pytest.fixture
def sql() -> OpenSql:
    """Return a way to open a file with bare SQLite, as another program would."""

    @contextmanager
    def opened(path: Path) -> Iterator[sqlite3.Connection]:
        with closing(sqlite3.connect(path, isolation_level=None, timeout=0.0)) as connection:
            yield connection

    return opened
