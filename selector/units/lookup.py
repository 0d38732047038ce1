"""From the text of a unit to what it means for a quantity."""

from __future__ import annotations

from collections.abc import Iterable, Iterator
from dataclasses import dataclass
from functools import lru_cache

from selector.units.quantity import Quantity
from selector.units.spellings import ALONE, ALONE_IN_CAPITALS, PREFIX_ALONE, PREFIXES, UNITS


@dataclass(frozen=True, slots=True)
class Unit:
    """One meaning of a unit's text: the quantity it measures, how it is spelled, its power of ten."""

    quantity: Quantity
    text: str
    exponent: int


def _spelled(quantity: Quantity) -> Iterator[Unit]:
    """Yield every unit of a quantity with every prefix."""
    for spelling in UNITS.get(quantity, ()):
        yield Unit(quantity, spelling.text, spelling.exponent)
        for prefix in spelling.prefixes:
            yield Unit(quantity, prefix + spelling.text, spelling.exponent + PREFIXES[prefix])


_UNITS: dict[Quantity, dict[str, Unit]] = {
    quantity: {unit.text: unit for unit in _spelled(quantity)} for quantity in UNITS
}
_PREFIXES: dict[Quantity, dict[str, Unit]] = {
    quantity: {
        prefix: Unit(quantity, prefix, PREFIXES[prefix])
        for prefix in ALONE + ALONE_IN_CAPITALS.get(quantity, "")
        if any(prefix in spelling.prefixes for spelling in UNITS[quantity])
    }
    for quantity in PREFIX_ALONE
}


@lru_cache(maxsize=4096)
def meanings(text: str, quantity: Quantity) -> tuple[Unit, ...]:
    """Return what a unit without spaces means where `quantity` is wanted.

    One entry of the quantity: that is its unit. Several entries of it: it could be any of them. Entries of other
    quantities: it is one of theirs. None: nobody has such a unit. Letters count as they are written; only where no unit
    is written so is the case let go, and never between milli and mega.
    """
    own = _UNITS.get(quantity, {}).get(text) or _PREFIXES.get(quantity, {}).get(text)
    if own:
        return (own,)
    others = tuple(units[text] for units in _UNITS.values() if text in units)
    return others or _without_case(text, quantity)


def is_base(text: str, quantity: Quantity) -> bool:
    """Whether the text is a unit of the quantity without prefix, as may stand behind a letter code."""
    return any(spelling.text == text and spelling.exponent == 0 for spelling in UNITS[quantity])


def _without_case(text: str, quantity: Quantity) -> tuple[Unit, ...]:
    """Return the units of the quantity, or else of others, that differ from the text in case alone."""
    milli = _PREFIXES.get(quantity, {}).get("m")
    if text == "M" and milli:
        return _milli_or_mega(text, (milli,))
    alike = _FOLDED.get(text.casefold(), ()) if text.isascii() else ()
    own = _one_each(unit for unit in alike if unit.quantity == quantity)
    if own:
        return _milli_or_mega(text, own)
    return () if text in ALONE else alike


def _folded() -> dict[str, tuple[Unit, ...]]:
    """Return all units by their text in small letters."""
    folded: dict[str, list[Unit]] = {}
    for table in _UNITS.values():
        for unit in table.values():
            folded.setdefault(unit.text.casefold(), []).append(unit)
    return {text: tuple(units) for text, units in folded.items()}


_FOLDED = _folded()


def _one_each(units: Iterable[Unit]) -> tuple[Unit, ...]:
    """Return the units with one entry for each size, the first spelling of it."""
    sizes: dict[int, Unit] = {}
    for unit in units:
        sizes.setdefault(unit.exponent, unit)
    return tuple(sizes.values())


def _milli_or_mega(text: str, found: tuple[Unit, ...]) -> tuple[Unit, ...]:
    """Return both where the text has an M for an m, one of them where the rest of its letters tell that case counts."""
    if text[0] not in "mM":
        return found
    same = tuple(unit for unit in found if unit.text[0] == text[0])
    one_case = text.isupper() or text.islower()
    if same and (len(found) == 1 or not one_case):
        return same
    if len(found) > 1:
        return found
    milli = found[0]
    return (milli, Unit(milli.quantity, "M" + milli.text[1:], milli.exponent + 9))
