"""Texts fitted into columns of a terminal."""

from __future__ import annotations

import unicodedata
from collections.abc import Iterator, Sequence

from selector.report.document import Align

WIDTH = 80


def width_of(text: str) -> int:
    """Return how many columns a text takes: two for a wide character, none for a combining mark.

    Source: Unicode Standard Annex 11, East Asian Width.
    """
    return len(text) if text.isascii() else sum(_width(character) for character in text)


def _width(character: str) -> int:
    if unicodedata.combining(character) or unicodedata.category(character) in ("Mn", "Me"):
        return 0
    return 2 if unicodedata.east_asian_width(character) in "WF" else 1


def padded(text: str, width: int, align: Align) -> str:
    """Return a text filled with blanks to a width."""
    blanks = " " * (width - width_of(text))
    return blanks + text if align == "right" else text + blanks


def wrapped(text: str, width: int) -> list[str]:
    """Return a text as lines of at most `width` columns, broken between words, and inside a word that is longer."""
    lines: list[str] = []
    line = ""
    for piece in (piece for word in text.split(" ") if word for piece in _pieces(word, width)):
        longer = f"{line} {piece}" if line else piece
        if width_of(longer) <= width:
            line = longer
        else:
            lines.append(line)
            line = piece
    return [*lines, line]


def _pieces(word: str, width: int) -> Iterator[str]:
    """Yield a word in pieces that fit; a mark stays with its letter."""
    piece, taken = "", 0
    for character in word:
        wide = _width(character)
        if piece and taken + wide > width:
            yield piece
            piece, taken = "", 0
        piece += character
        taken += wide
    yield piece


def widths(rows: Sequence[Sequence[str]], room: int, least: Sequence[int]) -> list[int]:
    """Return the widths of columns so that they fit into `room` together.

    Each is as wide as its widest cell; where that is too much the widest is narrowed, the last of several, but none
    below its `least`.
    """
    natural = [max(map(width_of, column)) for column in zip(*rows, strict=True)]
    while sum(natural) > room:
        free = [(width, place) for place, width in enumerate(natural) if width > least[place]]
        if not free:
            break
        natural[max(free)[1]] -= 1
    return natural
