"""The lines of a stock file: opened, decoded and measured, one at a time."""

from __future__ import annotations

import codecs
import os
import re
import stat
from collections.abc import Iterator
from contextlib import contextmanager
from dataclasses import dataclass
from pathlib import Path
from typing import IO, NamedTuple

from selector.errors import Fault, InputRefused

LONGEST_LINE_BYTES = 16_000_000

_HEAD_BYTES = 4096
_MOST_NULS = 2
_LINE = re.compile(r"[^\r\n]*(?:\r\n|\r|\n)|[^\r\n]+\Z")
_SAVE_AS = 'save it as "CSV UTF-8"'

_STARTS: tuple[tuple[bytes, str, str], ...] = (
    (b"PK\x03\x04", "is a workbook or a zip file", "save the sheet as CSV"),
    (b"\x1f\x8b", "is packed by gzip", "unpack it first"),
    (codecs.BOM_UTF32_LE, "is UTF-32", _SAVE_AS),
    (codecs.BOM_UTF16_LE, "is UTF-16", _SAVE_AS),
    (codecs.BOM_UTF16_BE, "is UTF-16", _SAVE_AS),
)


class Line(NamedTuple):
    """One line with its end; the first has number 1."""

    number: int
    text: str


@dataclass(frozen=True, slots=True)
class OpenFile:
    """A stock file while it is read: the encoding found, and its lines."""

    encoding: str
    lines: Iterator[Line]


def shown_path(path: Path) -> str:
    """Return a path as text that any stream and the catalogue take."""
    return os.fsencode(path).decode("utf-8", "backslashreplace")


@contextmanager
def opened(path: Path) -> Iterator[OpenFile]:
    """Open a stock file: a regular file or a pipe of UTF-8 text, with or without a byte-order mark.

    Raises
    ------
    InputRefused
        There is no such file, it cannot be read, or it is no text; or a line is too long or not UTF-8.
    """
    where = shown_path(path)
    try:
        _refuse_other_sorts(path, where)
        with path.open("rb") as file:
            head = file.peek(_HEAD_BYTES)[:_HEAD_BYTES]
            _refuse_other_content(head, where)
            marked = head.startswith(codecs.BOM_UTF8)
            file.read(len(codecs.BOM_UTF8) if marked else 0)
            yield OpenFile("utf-8-sig" if marked else "utf-8", _lines(file, where))
    except OSError as error:
        raise InputRefused(Fault(where, f"cannot be read: {error.strerror or error}")) from error
    except ValueError as error:
        if isinstance(error, UnicodeError):
            raise
        raise InputRefused(Fault(where, "is no name of a file")) from error


def _refuse_other_sorts(path: Path, where: str) -> None:
    """Refuse what is neither a file nor a pipe, before it is opened."""
    mode = path.stat().st_mode
    if stat.S_ISDIR(mode):
        raise InputRefused(Fault(where, "is a folder", "name the file in it"))
    if not (stat.S_ISREG(mode) or stat.S_ISFIFO(mode)):
        raise InputRefused(Fault(where, "is a device or a socket", "name a file"))


def _refuse_other_content(head: bytes, where: str) -> None:
    """Refuse what its first bytes show to be no UTF-8 text."""
    if not head:
        raise InputRefused(Fault(where, "is empty", "begin with a heading line: selector parts template KIND"))
    for start, what, remedy in _STARTS:
        if head.startswith(start):
            raise InputRefused(Fault(where, what, remedy))
    if head.count(b"\x00") > _MOST_NULS:
        raise InputRefused(Fault(where, "is no text file", _SAVE_AS))


def _lines(file: IO[bytes], where: str) -> Iterator[Line]:
    """Yield the decoded lines; they end in LF, CR LF or CR."""
    number = 0
    while raw := file.readline(LONGEST_LINE_BYTES + 1):
        if len(raw) > LONGEST_LINE_BYTES:
            what = f"is longer than {LONGEST_LINE_BYTES // 1_000_000} MB"
            raise InputRefused(Fault(f"{where} line {number + 1}", what, "see whether this is a stock file"))
        text = _decoded(raw, f"{where} line {number + 1}")
        for piece in _LINE.findall(text) if "\r" in text else (text,):
            number += 1
            yield Line(number, piece)


def _decoded(raw: bytes, where: str) -> str:
    """Return a line as text."""
    try:
        return raw.decode("utf-8")
    except UnicodeDecodeError as error:
        what = f"is not UTF-8: byte 0x{raw[error.start]:02X} at place {error.start + 1}"
        raise InputRefused(Fault(where, what, _SAVE_AS)) from error
