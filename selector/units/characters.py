"""Characters: those that are read as others, those that are refused, and how a text is quoted in a message."""

from __future__ import annotations

from types import MappingProxyType

LONGEST = 10_000
LONGEST_UNIT = 40
_QUOTED = 40

SPACES = " \t\u00a0\u2009\u202f"
_NO_SPACES = MappingProxyType(str.maketrans("", "", SPACES))

# Signs that people and programs write for the same thing. Nothing else is folded: compatibility digits are refused.
_SAME = MappingProxyType(
    str.maketrans(
        {
            "\u2212": "-",  # minus sign
            "\u2010": "-",  # hyphen
            "\u2011": "-",  # non-breaking hyphen
            "\u2013": "-",  # en dash
            "\u2019": "'",  # apostrophe
            "\u00b5": "u",  # micro sign
            "\u03bc": "u",  # mu
            "\u2126": "ohm",  # ohm sign
            "\u03a9": "ohm",  # Omega
            "\u00b0": "deg",
            "\u00ba": "deg",  # ordinal, typed for a degree sign
            "\u02da": "deg",  # ring above, the same
            "\u2103": "degC",
            "\u212a": "K",  # kelvin sign
            "\u221a": "rt",
            "\u00b7": "*",  # middle dot
            "\u22c5": "*",  # dot operator
        }
    )
)


def plain(text: str) -> str:
    """Return the text trimmed, with signs that mean the same written one way.

    Examples
    --------
    >>> plain(" 3,3 k\u03a9 "), plain("\u221240 \u00b0C")
    ('3,3 kohm', '-40 degC')
    """
    trimmed = text.strip(SPACES + "\r\n")
    return trimmed if trimmed.isascii() else trimmed.translate(_SAME)


def joined(unit: str) -> str:
    """Return a unit without the spaces inside it: `V p-p` is `Vp-p`."""
    return unit.translate(_NO_SPACES)


def foreign_digit(text: str) -> str | None:
    """Return the first character that is a digit or a fraction to Unicode, but is not 0 to 9."""
    if text.isascii():
        return None
    return next((character for character in text if character.isnumeric() and not character.isascii()), None)


def quoted(text: str) -> str:
    """Return the text as `clean` gives it, in double quotes."""
    return f'"{clean(text)}"'


def clean(text: str) -> str:
    r"""Return the text for a message: short, and without characters that cannot be seen.

    Examples
    --------
    >>> clean("4\x1b7"), clean("1" * 50)
    ('4\\x1b7', '1111111111111111111111111111111111111...')
    """
    short = text if len(text) <= _QUOTED else text[: _QUOTED - 3] + "..."
    return "".join(c if c.isprintable() else ascii(c)[1:-1] for c in short)
