"""What stands at a path, found out before SQLite touches it."""

from __future__ import annotations

import os
import stat
from dataclasses import dataclass
from pathlib import Path

from selector.catalogue.faults import cannot_be_opened, not_a_catalogue
from selector.errors import Fault, Unusable

APPLICATION_ID = 0x73656C31
"""The four bytes `sel1` that SQLite keeps at offset 68 of a file of ours."""

_MAGIC = b"SQLite format 3\x00"
_HEADER_BYTES = 100
_FIRST_MAKE_ONE = "make one: selector load FILE, or selector parts add KIND part=CODE ..."


@dataclass(frozen=True, slots=True)
class Place:
    """A path that may hold a catalogue; `version` 0 where there is none yet (no file, or an empty one)."""

    path: Path
    exists: bool
    version: int

    @property
    def shown(self) -> str:
        """Return the path as it is named in messages; bytes that are no UTF-8 stand as escapes."""
        return shown_path(self.path)


def shown_path(path: Path) -> str:
    """Return a path as text that any stream and SQLite take."""
    return os.fsencode(path).decode("utf-8", "backslashreplace")


def default_path() -> Path:
    """Return where the catalogue stands if none is named: as SELECTOR_CATALOGUE says, else in the user's folder."""
    named = os.environ.get("SELECTOR_CATALOGUE")
    return Path(named) if named else user_path()


def user_path() -> Path:
    """Return the catalogue's place in the user's data folder, which need not be there yet."""
    from platformdirs import user_data_path  # noqa: PLC0415 - not needed where a path is named

    return user_data_path("selector", appauthor=False) / "catalogue.db"


def look(path: Path, newest: int) -> Place:
    """Look at a path and refuse all that is neither a catalogue nor free for one.

    Parameters
    ----------
    path : Path
        Where the catalogue stands or shall stand.
    newest : int
        The schema version that this program writes.

    Returns
    -------
    Place
        With the version that the file's header states.

    Raises
    ------
    Unusable
        The path is no regular file, no catalogue, of a newer version, or cannot be read. It is not changed.
    """
    shown = shown_path(path)
    try:
        header = _header(path, shown)
    except FileNotFoundError as error:
        if path.is_symlink():
            raise not_a_catalogue(shown, "a link that leads nowhere") from error
        return Place(path, exists=False, version=0)
    except OSError as error:
        raise cannot_be_opened(shown, error) from error
    except ValueError as error:
        raise not_a_catalogue(shown, "no name of a file") from error
    if not header:
        return Place(path, exists=True, version=0)
    version = _version(header, shown)
    refuse_newer(version, newest, shown)
    return Place(path, exists=True, version=version)


def missing(place: Place) -> Unusable:
    """Return the error of a command that needs a catalogue where there is none; it names those that make one."""
    return Unusable(Fault(place.shown, "there is no catalogue", _FIRST_MAKE_ONE))


def refuse_newer(version: int, newest: int, shown: str) -> None:
    """Raise Unusable where a file is of a later schema than this program knows."""
    if version > newest:
        what = f"is of version {version}; this program reads up to version {newest}"
        raise Unusable(Fault(shown, what, "install a newer selector; the file was not changed"))


def _header(path: Path, shown: str) -> bytes:
    """Return the first bytes of a regular file; a FIFO or a device is never opened."""
    mode = path.stat().st_mode
    if not stat.S_ISREG(mode):
        raise not_a_catalogue(shown, f"it is {_sort_of(mode)}")
    with path.open("rb") as file:
        return file.read(_HEADER_BYTES)


def _sort_of(mode: int) -> str:
    """Return in words what a path is that is no regular file."""
    sorts = (
        (stat.S_ISDIR, "a folder"),
        (stat.S_ISFIFO, "a pipe"),
        (stat.S_ISSOCK, "a socket"),
        (stat.S_ISCHR, "a device"),
        (stat.S_ISBLK, "a device"),
    )
    return next((words for test, words in sorts if test(mode)), "no regular file")


def _version(header: bytes, shown: str) -> int:
    """Return the schema version in a header, whose application number must be ours."""
    if len(header) < _HEADER_BYTES or not header.startswith(_MAGIC):
        raise not_a_catalogue(shown, "its first bytes are not those of a database")
    if int.from_bytes(header[68:72], "big") != APPLICATION_ID:
        raise not_a_catalogue(shown, "it is the database of another program")
    version = int.from_bytes(header[60:64], "big", signed=True)
    if version < 1:
        raise not_a_catalogue(shown, f"its version is {version}")
    return version
