"""The fuzzy search for a part by whatever a person remembers of it."""

from __future__ import annotations

import math
import re
from collections.abc import Iterable
from dataclasses import dataclass
from functools import cache

from selector.parts import KINDS, Column, Part, columns
from selector.units import QuantityError, parse, shown

_LEAST_SCORE = 65.0
_LEAST_OF_A_WORD = 60.0
_START_OF_A_WORD = 95.0
_WORD = re.compile(r"[^\s,;()]+")
_SAME_VALUE = 1e-9

CODE, CODE_START, VALUE, LIKENESS = range(4)
"""Why a part was found, the best reason first: its code, the start of its code, its value, a likeness of the words."""


@dataclass(frozen=True, slots=True)
class Found:
    """A part that answers a search: why (CODE ... LIKENESS), and how alike the words are, 0 ... 100."""

    part: Part
    why: int
    score: float


def find_parts(parts: Iterable[Part], text: str, limit: int) -> tuple[Found, ...]:
    """Return the parts that answer a text, forgiving errors of typing.

    The code itself comes first, then codes that start with the text, then parts whose value the text is (`4k99`),
    then those whose code, description and figures are like it. Within each: the higher score, the order of the kinds,
    the code points of the code.
    """
    wanted = text.strip().casefold()
    if not wanted:
        return ()
    kinds = tuple(KINDS)
    values = {kind: _value(kind, text) for kind in kinds}
    found = [each for part in parts if (each := _found(part, wanted, values[part.kind])) is not None]
    found.sort(key=lambda each: (each.why, -each.score, kinds.index(each.part.kind), each.part.part))
    return tuple(found[:limit])


def _found(part: Part, wanted: str, value: float | None) -> Found | None:
    """Return one part as found, or None where nothing of it is like the text; `value` is the text read as a figure."""
    code = part.part.casefold()
    if code == wanted:
        return Found(part, CODE, 100.0)
    if code.startswith(wanted):
        return Found(part, CODE_START, 100.0 * len(wanted) / len(code))
    if value is not None and _has_value(part, value):
        return Found(part, VALUE, 100.0)
    score = _likeness(wanted, code, _words(part))
    return Found(part, LIKENESS, score) if score >= _LEAST_SCORE else None


def _likeness(wanted: str, code: str, words: tuple[str, ...]) -> float:
    """Return how like a part is to a text, 0 ... 100: by its code as a whole, or by the mean over the text's words."""
    from rapidfuzz import fuzz  # noqa: PLC0415 - only the search needs it

    asked = _WORD.findall(wanted)
    best = [max(_word_score(each, word, fuzz.ratio(each, word)) for word in words) for each in asked]
    by_words = sum(score for score in best if score >= _LEAST_OF_A_WORD) / max(len(asked), 1)
    return round(max(fuzz.ratio(wanted, code), by_words), 6)


def _word_score(asked: str, word: str, ratio: float) -> float:
    """Return how like two words are; one that begins with what is asked is nearly the same."""
    return max(ratio, _START_OF_A_WORD) if word.startswith(asked) else ratio


@cache
def _figures(kind: str) -> tuple[Column, ...]:
    """Return the fields whose figures a part of the kind is known by: those that it must state."""
    return tuple(column for column in columns(kind) if column.required and column.quantity is not None)


def _value(kind: str, text: str) -> float | None:
    """Return the text read as the first figure of a kind; a bare number is none."""
    figures = _figures(kind)
    if not figures or figures[0].quantity is None:
        return None
    try:
        return parse(text, figures[0].quantity, bare=False)
    except QuantityError:
        return None


def _has_value(part: Part, value: float) -> bool:
    """Return whether a part's first figure is the value, as far as a person writes it."""
    of_part = getattr(part, _figures(part.kind)[0].name)
    return isinstance(of_part, float) and math.isclose(value, of_part, rel_tol=_SAME_VALUE)


def _words(part: Part) -> tuple[str, ...]:
    """Return the words a part is looked for by: kind, code, all texts but its source, and the figures it must state."""
    figures = (shown(getattr(part, column.name), column.quantity) for column in _figures(part.kind) if column.quantity)
    named = (column.name for column in columns(part.kind) if column.sort in ("text", "choice"))
    texts = (getattr(part, name) for name in named if name != "source")
    return tuple(_WORD.findall(" ".join((part.kind, *(str(text) for text in texts if text), *figures)).casefold()))
