"""Headings of columns, and the fields of parts that they name."""

from __future__ import annotations

import re
from collections.abc import Collection, Mapping, Sequence
from dataclasses import dataclass
from difflib import get_close_matches
from functools import cache

from selector.parts import KINDS, Column, columns
from selector.units import Quantity, is_unit

KIND = "kind"
ADDED_BY_REJECTS = ("line", "column", "why", "remedy")
"""Columns that a rejects file has besides those of the file it came from; a load passes over them."""

_BETWEEN_WORDS = re.compile(r"[\s_\-]+")
_BRACKETED = re.compile(r"(.*?)\s*(?:\[([^\[\]]*)\]|\(([^()]*)\))\s*", re.DOTALL)
_LIKE_ENOUGH = 0.6


@dataclass(frozen=True, slots=True)
class Heading:
    """One heading: the text, the field it names (None: not used), the unit of its cells, how it was matched.

    `wrong_unit` is a unit in it that its field cannot have; `nearest` a field that it may have meant.
    """

    text: str
    field: str | None = None
    unit: str | None = None
    matched: str | None = None
    wrong_unit: str = ""
    nearest: str = ""

    @property
    def known(self) -> bool:
        """Return whether the heading means anything here."""
        return self.field is not None or plain(self.text) in ADDED_BY_REJECTS


def plain(text: str) -> str:
    """Return a heading with its case, spaces, hyphens and underscores made alike."""
    return _BETWEEN_WORDS.sub("_", text.strip().casefold()).strip("_")


def read_headings(
    cells: Sequence[str], kind: str | None, named: Mapping[str, str]
) -> tuple[tuple[Heading, ...], tuple[str, ...]]:
    """Return what each heading means, and which of the headings named by the caller are not there.

    Parameters
    ----------
    cells : Sequence[str]
        The heading line's cells.
    kind : str or None
        The kind of all parts; None where a column gives it.
    named : Mapping[str, str]
        Field by heading, as the caller decides it; an empty field leaves the column out.
    """
    fields = _fields(kind)
    by_heading = {plain(heading): field for heading, field in named.items()}
    headings = tuple(_heading(cell, fields, by_heading) for cell in cells)
    there = {name for cell in cells for name in (plain(cell), plain(_split(cell)[0]))}
    return headings, tuple(heading for heading in named if plain(heading) not in there)


def field_names(kind: str | None) -> tuple[str, ...]:
    """Return the fields that a heading may name: those of a kind, or of all, and `kind`."""
    return (KIND, *_fields(kind))


@cache
def _fields(kind: str | None) -> Mapping[str, tuple[Column, ...]]:
    """Return the columns of each field's name, one for each kind that has it."""
    found: dict[str, tuple[Column, ...]] = {}
    for each in KINDS if kind is None else (kind,):
        for column in columns(each):
            found[column.name] = (*found.get(column.name, ()), column)
    return found


def _heading(text: str, fields: Mapping[str, tuple[Column, ...]], named: Mapping[str, str]) -> Heading:
    """Return what one heading means."""
    name, unit = _split(text)
    decided = named.get(plain(text), named.get(plain(name)))
    if decided is not None:
        return _with_unit(text, decided, unit, fields, "map") if decided else Heading(text, matched="map")
    for field in (plain(text), plain(name)):
        if field in fields or field == KIND:
            return _with_unit(text, field, unit if field == plain(name) else None, fields, "exact")
    return _unit_behind(text, fields) or Heading(text, nearest=_nearest(plain(name), fields))


def _split(text: str) -> tuple[str, str | None]:
    """Return the name in a heading, and the unit in brackets behind it; None where there is none."""
    found = _BRACKETED.fullmatch(text)
    if found is None:
        return text, None
    unit = (found[2] or found[3] or "").strip()
    return found[1], unit or None


def _with_unit(
    text: str, field: str, unit: str | None, fields: Mapping[str, tuple[Column, ...]], matched: str
) -> Heading:
    """Return a heading whose field is known, with its unit; words in brackets behind a text or a count are no unit."""
    if unit is not None and not any(column.quantity and column.quantity.unit for column in fields.get(field, ())):
        unit = None
    if unit is None or _takes(fields.get(field, ()), unit):
        return Heading(text, field, unit, matched)
    return Heading(text, field, matched=matched, wrong_unit=unit)


def _unit_behind(text: str, fields: Mapping[str, tuple[Column, ...]]) -> Heading | None:
    """Return what a heading like `tempco ppm/K` means: a field's name and a unit behind a blank, longest name first."""
    words = re.split(r"([\s_]+)", text.strip())
    for end in range(len(words) - 2, 0, -2):
        field, unit = plain("".join(words[:end])), "".join(words[end + 1 :]).strip()
        if field in fields and _takes(fields[field], unit):
            return Heading(text, field, unit, "exact")
    return None


def _takes(of_field: Collection[Column], unit: str) -> bool:
    """Return whether a unit is one of the field's quantity, in any kind."""
    quantities: set[Quantity] = {column.quantity for column in of_field if column.quantity is not None}
    return any(is_unit(unit, quantity) for quantity in quantities)


def nearest(name: str, names: Collection[str]) -> str:
    """Return the question whether the name most like one that is unknown was meant, or an empty text."""
    found = get_close_matches(name, names, n=1, cutoff=_LIKE_ENOUGH)
    return f'did you mean "{found[0]}"?' if found else ""


def _nearest(name: str, fields: Collection[str]) -> str:
    """Return the field most like a heading that is none, or an empty text."""
    if not name or name in ADDED_BY_REJECTS:
        return ""
    return next(iter(get_close_matches(name, (KIND, *fields), n=1, cutoff=_LIKE_ENOUGH)), "")
