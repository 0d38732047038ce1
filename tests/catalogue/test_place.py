"""Paths that hold something else than a catalogue: refused, and not one byte of them changed."""

from __future__ import annotations

import os
import random
import socket
import sqlite3
from collections.abc import Callable
from contextlib import AbstractContextManager
from pathlib import Path

import pytest

from selector.catalogue import open_catalogue
from selector.errors import EXIT_UNUSABLE, Unusable
from selector.parts import Part

Make = Callable[..., Part]
Sql = Callable[[Path], AbstractContextManager[sqlite3.Connection]]

MAGIC = b"SQLite format 3\x00"
CONTENTS = {
    "text": (b"part,resistance\nR1,4k99\n" * 20, "its first bytes are not those of a database"),
    "short text": (b"x", "its first bytes are not those of a database"),
    "picture": (b"\x89PNG\r\n\x1a\n" + bytes(200), "its first bytes are not those of a database"),
    "random bytes": (random.Random(1).randbytes(5000), "its first bytes are not those of a database"),
    "magic only": (MAGIC, "its first bytes are not those of a database"),
    "magic and noughts": (MAGIC + bytes(4080), "it is the database of another program"),
    "our mark, version 0": (MAGIC + bytes(52) + b"sel1" + bytes(4000), "its version is 0"),
    "our mark, version below 0": (
        MAGIC + bytes(44) + b"\xff" * 4 + bytes(4) + b"sel1" + bytes(4000),
        "its version is -1",
    ),
}


def refused_both_ways(path: Path, words: str, part: Part) -> None:
    """Open a path as a reader and as a writer; both must be refused with exit status 4."""
    for write in (False, True):
        with pytest.raises(Unusable) as refused, open_catalogue(path, write=write) as catalogue:
            catalogue.add(part)
        assert words in str(refused.value)
        assert refused.value.exit_status == EXIT_UNUSABLE


@pytest.mark.parametrize("name", CONTENTS)
def test_other_content_is_refused_and_kept(tmp_path: Path, name: str, resistor: Make) -> None:
    """A file that is no catalogue is refused with the reason, and its bytes stay."""
    content, words = CONTENTS[name]
    path = tmp_path / "parts.db"
    path.write_bytes(content)
    refused_both_ways(path, words, resistor("R1"))
    assert path.read_bytes() == content
    assert list(tmp_path.iterdir()) == [path]


def test_another_programs_database_is_refused_and_kept(tmp_path: Path, sql: Sql, resistor: Make) -> None:
    """A database without our application number is another program's, even with tables named like ours."""
    path = tmp_path / "parts.db"
    with sql(path) as connection:
        connection.execute("CREATE TABLE shunt (part TEXT)")
        connection.execute("PRAGMA user_version = 1")
    before = path.read_bytes()
    refused_both_ways(path, "it is the database of another program", resistor("R1"))
    assert path.read_bytes() == before


def test_a_newer_version_is_refused_with_both_versions(stocked: Path, sql: Sql, resistor: Make) -> None:
    """A catalogue of a later schema is left alone, and the message names its version and ours."""
    with sql(stocked) as connection:
        connection.execute("PRAGMA user_version = 7")
    before = stocked.read_bytes()
    refused_both_ways(stocked, "is of version 7; this program reads up to version 1", resistor("R1"))
    assert stocked.read_bytes() == before


def test_a_header_of_ours_over_noise_is_damage(tmp_path: Path, stocked: Path, resistor: Make) -> None:
    """A good header with random pages behind it is refused, and its bytes stay."""
    path = tmp_path / "noise.db"
    content = stocked.read_bytes()[:100] + random.Random(2).randbytes(30_000)
    path.write_bytes(content)
    for write in (False, True):
        with pytest.raises(Unusable), open_catalogue(path, write=write) as catalogue:
            catalogue.add(resistor("R9"))
    assert path.read_bytes() == content


def test_folders_pipes_sockets_and_devices_are_refused(tmp_path: Path, resistor: Make) -> None:
    """What is no regular file is refused without being opened: a pipe that never speaks does not hold us up."""
    (tmp_path / "folder").mkdir()
    os.mkfifo(tmp_path / "pipe")
    with socket.socket(socket.AF_UNIX) as listener:
        listener.bind(str(tmp_path / "socket"))
        refused_both_ways(tmp_path / "socket", "is no catalogue: it is a socket", resistor("R1"))
    refused_both_ways(tmp_path / "folder", "is no catalogue: it is a folder", resistor("R1"))
    refused_both_ways(tmp_path / "pipe", "is no catalogue: it is a pipe", resistor("R1"))
    for device in ("/dev/null", "/dev/zero", "/dev/full"):
        refused_both_ways(Path(device), "is no catalogue: it is a device", resistor("R1"))


def test_links_that_lead_nowhere_are_refused(tmp_path: Path, resistor: Make) -> None:
    """A broken link and a circle of links are refused, and nothing is made at their end."""
    (tmp_path / "broken").symlink_to(tmp_path / "none.db")
    (tmp_path / "a").symlink_to(tmp_path / "b")
    (tmp_path / "b").symlink_to(tmp_path / "a")
    refused_both_ways(tmp_path / "broken", "a link that leads nowhere", resistor("R1"))
    refused_both_ways(tmp_path / "a", "cannot be opened: Too many levels of symbolic links", resistor("R1"))
    assert not (tmp_path / "none.db").exists()


def test_a_good_link_is_followed(tmp_path: Path, stocked: Path) -> None:
    """A link to a catalogue is that catalogue."""
    (tmp_path / "link").symlink_to(stocked)
    with open_catalogue(tmp_path / "link") as catalogue:
        assert len(catalogue.parts("resistor")) == 3


def test_impossible_names_are_refused(tmp_path: Path, stocked: Path, resistor: Make) -> None:
    """A name with NUL, one below a file, and one in a folder that is not there cannot be opened."""
    refused_both_ways(tmp_path / "a\x00b", "no name of a file", resistor("R1"))
    refused_both_ways(stocked / "below", "cannot be opened: Not a directory", resistor("R1"))
    with (
        pytest.raises(Unusable, match="cannot be opened"),
        open_catalogue(tmp_path / "no" / "x", write=True) as catalogue,
    ):
        catalogue.add(resistor("R1"))
