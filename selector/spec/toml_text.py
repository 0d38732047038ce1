"""A TOML file of the user's, read within bounds; every sort of file says its faults in its own words."""

from __future__ import annotations

import re
import tomllib
from dataclasses import dataclass
from pathlib import Path

from selector.errors import Fault, InputRefused

LARGEST = 1_000_000  # bytes
# A key of so many steps says nothing, and a parser takes time by the square of them.
_ENDLESS_KEY = re.compile(r"""(?<![\w"'\\-])(?:(?:"(?:[^"\\\n]|\\.)*"|'[^'\n]*'|[\w-]+)[ \t]*\.[ \t]*){30}""")
_PLACE = re.compile(r" \(at (?:line (\d+), column \d+|end of document)\)$")


@dataclass(frozen=True, slots=True)
class Sort:
    """What one sort of file is called, and what messages say of its size, keys, nesting and entries."""

    noun: str
    size: str
    keys: str
    depth: str
    entry: str


@dataclass(frozen=True, slots=True)
class TomlText:
    """The text of a file, and the tables in it."""

    text: str
    tables: dict[str, object]


def read_toml(path: Path, name: str, sort: Sort) -> TomlText:
    """Return what a file of a sort holds; `name` is what messages call the file.

    Raises
    ------
    InputRefused
        It cannot be read, is larger than 1 MB, no UTF-8 text or no TOML. A syntax fault stands alone, since nothing
        after it can be read.
    """
    text = _text(path, name, sort)
    endless = _ENDLESS_KEY.search(text)
    if endless is not None:
        line = text.count("\n", 0, endless.start()) + 1
        raise InputRefused(Fault(f"{name} line {line}", "a key of 30 steps or more", sort.keys))
    try:
        return TomlText(text, tomllib.loads(text))
    except RecursionError as error:
        raise InputRefused(Fault(name, "has brackets nested too deep", sort.depth)) from error
    except ValueError as error:
        raise _no_toml(str(error), text, name, sort) from error


def _text(path: Path, name: str, sort: Sort) -> str:
    """Return the text of a file, which must be UTF-8 and of a bearable size."""
    try:
        with path.open("rb") as file:
            content = file.read(LARGEST + 1)
    except OSError as error:
        what = f"cannot be read: {error.strerror or error}"
        raise InputRefused(Fault(name, what, f"give the file of a {sort.noun}")) from error
    if len(content) > LARGEST:
        raise InputRefused(Fault(name, "is larger than 1 MB", sort.size))
    try:
        return content.decode("utf-8-sig")
    except UnicodeDecodeError as error:
        line = content.count(b"\n", 0, error.start) + 1
        raise InputRefused(Fault(f"{name} line {line}", "is no UTF-8 text", "save the file as UTF-8")) from error


def _no_toml(message: str, text: str, name: str, sort: Sort) -> InputRefused:
    """Return the error of a text that the parser refuses."""
    place = _PLACE.search(message)
    line = int(place[1]) if place and place[1] else text.count("\n") + 1
    what = f"no valid TOML: {message[: place.start()] if place else 'a number of too many digits'}"
    return InputRefused(Fault(f"{name} line {line}", what, f"write it like {sort.entry}, texts in quotes"))
