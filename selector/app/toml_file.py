"""A TOML file of the user's, read within bounds, with the line of each key."""

from __future__ import annotations

import re
import tomllib
from collections.abc import Mapping
from dataclasses import dataclass
from pathlib import Path

from selector.app.naming import file_name
from selector.errors import Fault, InputRefused
from selector.spec.lines import key_lines, outwards

LARGEST = 1_000_000  # bytes
# A parser takes time by the square of the steps of a key.
_ENDLESS_KEY = re.compile(r"""(?<![\w"'\\-])(?:(?:"(?:[^"\\\n]|\\.)*"|'[^'\n]*'|[\w-]+)[ \t]*\.[ \t]*){30}""")
_PLACE = re.compile(r" \(at (?:line (\d+), column \d+|end of document)\)$")


@dataclass(frozen=True, slots=True)
class TomlFile:
    """The tables of a file, and the first line of each key; elements of lists count from 1: `gain[2].power`."""

    name: str
    tables: Mapping[str, object]
    lines: Mapping[str, int]

    def place(self, key: str) -> str:
        """Return `design.toml line 4, gain[2]`: with the line of the nearest key around it that has one."""
        line = next((self.lines[outer] for outer in outwards(key) if outer in self.lines), None)
        where = self.name if line is None else f"{self.name} line {line}"
        return f"{where}, {key}" if key else where


def read_toml(path: Path, noun: str) -> TomlFile:
    """Return a file's tables; `noun` says in messages what the file should be.

    Raises
    ------
    InputRefused
        It cannot be read, is larger than 1 MB, no UTF-8 text or no TOML; a syntax fault is reported alone.
    """
    name = file_name(path)
    text = _text(path, name, noun)
    endless = _ENDLESS_KEY.search(text)
    if endless is not None:
        line = text.count("\n", 0, endless.start()) + 1
        raise InputRefused(Fault(f"{name} line {line}", "a key of 30 steps or more", "a key has one or two"))
    try:
        tables = tomllib.loads(text)
    except RecursionError as error:
        raise InputRefused(Fault(name, "has brackets nested too deep", "no more than two are needed")) from error
    except ValueError as error:
        raise _no_toml(str(error), text, name) from error
    return TomlFile(name, tables, key_lines(text))


def _text(path: Path, name: str, noun: str) -> str:
    """Return the text of a file."""
    try:
        with path.open("rb") as file:
            content = file.read(LARGEST + 1)
    except OSError as error:
        what = f"cannot be read: {error.strerror or error}"
        raise InputRefused(Fault(name, what, f"give the file of a {noun}")) from error
    if len(content) > LARGEST:
        raise InputRefused(Fault(name, "is larger than 1 MB", f"a {noun} has some dozen lines"))
    try:
        return content.decode("utf-8-sig")
    except UnicodeDecodeError as error:
        line = content.count(b"\n", 0, error.start) + 1
        raise InputRefused(Fault(f"{name} line {line}", "is no UTF-8 text", "save the file as UTF-8")) from error


def _no_toml(message: str, text: str, name: str) -> InputRefused:
    """Return the error of a text that the parser refuses."""
    place = _PLACE.search(message)
    line = int(place[1]) if place and place[1] else text.count("\n") + 1
    what = f"no valid TOML: {message[: place.start()] if place else 'a number of too many digits'}"
    return InputRefused(Fault(f"{name} line {line}", what, 'write it like amplifier = "AMP-Z1", texts in quotes'))
