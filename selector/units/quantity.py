"""What a quantity is, and the fault of a text that is none."""

from __future__ import annotations

from dataclasses import dataclass


@dataclass(frozen=True, slots=True)
class Quantity:
    """A sort of figure: what it is called, and in which unit it is counted inside.

    Attributes
    ----------
    name
        The noun a person reads in a message: `resistance`.
    unit
        The canonical unit, in which parsed figures and bare numbers are: `ohm`; `1` for a fraction, empty for a plain
        number.
    bare_in_stock
        Whether a stock file may give it as a bare number, because only one unit is in use.
    example
        A text that reads well and parses: `4.7 kohm`.
    heading
        The unit a person expects in the heading of a column: `%` for a fraction, else mostly `unit`.
    plus_minus
        Whether a leading `±` is read (and dropped): only where the figure is a magnitude either way in any case.
    fractions
        Whether `1/8` is a number of it.
    whole
        Whether only whole numbers are of it.
    """

    name: str
    unit: str
    bare_in_stock: bool
    example: str
    heading: str
    plus_minus: bool = False
    fractions: bool = False
    whole: bool = False

    @property
    def noun(self) -> str:
        """The name with its article: `a resistance`, `an inductance`."""
        return f"{'an' if self.name[0] in 'aeiou' else 'a'} {self.name}"


class QuantityError(ValueError):
    """A text that is not the quantity wanted, or that could be two of it.

    Attributes
    ----------
    what
        What was read and why it does not do: `"abc" is no fraction`.
    remedy
        What would be right: `write it like 0.1 %`.
    """

    def __init__(self, what: str, remedy: str) -> None:
        """Keep both halves of the message."""
        self.what = what
        self.remedy = remedy
        super().__init__(f"{what}; {remedy}")
