"""What is said of a text that is refused: what was read, and what would be right."""

from __future__ import annotations

from selector.units.characters import clean, quoted
from selector.units.doubtful import NO_UNIT
from selector.units.letters import TOLERANCE_LETTERS
from selector.units.lookup import Unit
from selector.units.quantities import FRACTION
from selector.units.quantity import Quantity, QuantityError
from selector.units.spellings import PREFIXES

_LETTERS = {percent: letter for letter, percent in TOLERANCE_LETTERS.items()}


def like(quantity: Quantity) -> str:
    """Return the remedy that shows how the quantity is written."""
    return f"write it like {quantity.example}"


def nothing_of_it(text: str, quantity: Quantity) -> QuantityError:
    """Return the fault of a text that cannot be read at all."""
    return QuantityError(f"{quoted(text)} is no {quantity.name}", like(quantity))


def could_be(text: str, *readings: str, remedy: str = "write the one that is meant") -> QuantityError:
    """Return the fault of a text with more than one reading, all of them named."""
    return QuantityError(f"{quoted(text)} can be {' or '.join(clean(reading.strip()) for reading in readings)}", remedy)


def without_unit(text: str, written: str, quantity: Quantity) -> QuantityError:
    """Return the fault of a bare number where a unit has to stand."""
    remedy = like(quantity)
    if quantity == FRACTION:
        letter = _LETTERS.get(written)
        remedy = f"write {clean(written)} %{f' or {letter}' if letter else ''}"
    return QuantityError(f"{quoted(text)} has no unit", remedy)


def unknown_unit(text: str, unit: str, quantity: Quantity) -> QuantityError:
    """Return the fault of a unit that nobody has, or that a plain number must not have."""
    remedy = NO_UNIT.get(quantity, like(quantity))
    if unit in PREFIXES:
        return QuantityError(f"{quoted(text)} has a prefix without a unit", remedy)
    if any(character.isdigit() for character in unit[:2]) or unit[0] in ".,;:+-_(<>=":
        return nothing_of_it(text, quantity)
    return QuantityError(f"{quoted(text)} has the unknown unit {quoted(unit)}", remedy)


def wrong_unit(text: str, unit: Unit, quantity: Quantity) -> QuantityError:
    """Return the fault of a unit of another quantity."""
    return QuantityError(
        f"{quoted(text)} is {unit.quantity.noun}", f'{quantity.noun} is wanted, for example "{quantity.example}"'
    )


def several_units(text: str, written: str, units: tuple[Unit, ...]) -> QuantityError:
    """Return the fault of a unit that could be any of several."""
    sizes = {-3: " (milli)", 6: " (mega)"}
    return could_be(text, *(f"{written} {unit.text}{sizes.get(unit.exponent, '')}" for unit in units))
