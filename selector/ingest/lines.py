"""The lines of a stock file: opened, decoded and measured, one at a time."""

from __future__ import annotations

import codecs
import os
import re
import stat
from collections import deque
from collections.abc import Iterator
from contextlib import contextmanager
from dataclasses import dataclass
from io import BufferedReader, FileIO
from pathlib import Path
from typing import NamedTuple

from selector.errors import Fault, InputRefused

LONGEST_LINE_BYTES = 16_000_000

LONGEST_PLAIN = 9_999
"""Lines of a block have at most so many characters: neither a cell nor the number of cells can be too large then."""

_BUFFER_BYTES = 1 << 17
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
class Block:
    """Whole lines without their ends: the number of the first, and whether a quote stands in one of them."""

    first: int
    texts: list[str]
    quotes: bool


@dataclass(frozen=True, slots=True)
class OpenFile:
    """A stock file while it is read: the encoding found, and its lines."""

    encoding: str
    lines: Lines


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
        with BufferedReader(FileIO(path), _BUFFER_BYTES) as file:
            head = file.peek(_HEAD_BYTES)[:_HEAD_BYTES]
            _refuse_other_content(head, where)
            marked = head.startswith(codecs.BOM_UTF8)
            file.read(len(codecs.BOM_UTF8) if marked else 0)
            yield OpenFile("utf-8-sig" if marked else "utf-8", Lines(file, where))
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


class Lines(Iterator[Line]):
    """The decoded lines of a file, which end in LF, CR LF or CR: one at a time, or as a block of plain ones."""

    def __init__(self, file: BufferedReader[FileIO], where: str) -> None:
        """Begin at the place where the file stands."""
        self._file, self._where = file, where
        self._pieces: deque[str] = deque()
        self._number = 0
        self._taken_bytes = 0
        self._seen_bytes = 0

    def __next__(self) -> Line:
        """Return the next line.

        Raises
        ------
        InputRefused
            It is too long, or not UTF-8.
        """
        if not self._pieces:
            raw = self._file.readline(LONGEST_LINE_BYTES + 1)
            if not raw:
                raise StopIteration
            self._taken_bytes += len(raw)
            self._split(raw)
        self._number += 1
        return Line(self._number, self._pieces.popleft())

    def block(self) -> Block | None:
        """Return the whole lines that stand in the buffer, None where they must be looked at one by one.

        That is so where one holds what is no UTF-8, a NUL or a lone CR, or is long; the next line ends it.
        """
        if self._pieces or self._taken_bytes < self._seen_bytes:
            return None
        head = self._file.peek(1)
        raw = head[: head.rfind(b"\n") + 1]
        self._seen_bytes = self._taken_bytes + len(raw)
        texts = _plain_texts(raw)
        if not texts:
            return None
        self._file.read(len(raw))
        self._taken_bytes = self._seen_bytes
        first = self._number + 1
        self._number += len(texts)
        return Block(first, texts, b'"' in raw)

    def _split(self, raw: bytes) -> None:
        """Keep what stands between ends of lines."""
        here = f"{self._where} line {self._number + 1}"
        if len(raw) > LONGEST_LINE_BYTES:
            what = f"is longer than {LONGEST_LINE_BYTES // 1_000_000} MB"
            raise InputRefused(Fault(here, what, "see whether this is a stock file"))
        text = _decoded(raw, here)
        self._pieces.extend(_LINE.findall(text) if "\r" in text else (text,))


def _plain_texts(raw: bytes) -> list[str]:
    """Return whole lines without their ends, none where one of them is not plain."""
    if not raw or b"\x00" in raw:
        return []
    if b"\r" in raw:
        raw = raw.replace(b"\r\n", b"\n")
    if b"\r" in raw:
        return []
    try:
        texts = raw.decode("utf-8").split("\n")
    except UnicodeDecodeError:
        return []
    texts.pop()
    return texts if max(map(len, texts)) <= LONGEST_PLAIN else []


def _decoded(raw: bytes, where: str) -> str:
    """Return a line as text."""
    try:
        return raw.decode("utf-8")
    except UnicodeDecodeError as error:
        what = f"is not UTF-8: byte 0x{raw[error.start]:02X} at place {error.start + 1}"
        raise InputRefused(Fault(where, what, _SAVE_AS)) from error
