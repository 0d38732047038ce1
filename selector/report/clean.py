r"""Text of data made safe to print: what cannot be seen is written as \x1b."""

from __future__ import annotations

import re

# C0, DEL, C1; soft hyphen; what turns the direction of text or has no width (Unicode 15: Cf, Zl, Zp); surrogates.
_UNSEEN = re.compile(
    "[\x00-\x1f\x7f-\x9f\xad\u061c\u180e\u200b-\u200f\u2028-\u202e\u2060-\u206f\ufeff\ufff9-\ufffb"
    "\ud800-\udfff\U000e0000-\U000e007f]"
)
_BYTE = 0xFF
_BASIC_PLANE = 0xFFFF


def clean(text: str) -> str:
    r"""Return text without control characters, overrides of direction and characters of no width.

    Each is written as `\x1b`, `\u202e` or `\U000e0041`; all else stays as it is.

    >>> clean("a\x1b[31mb")
    'a\\x1b[31mb'
    """
    return _UNSEEN.sub(lambda match: escaped(match[0]), text)


def escaped(character: str) -> str:
    r"""Return a character as `\x1b`, `\u202e` or `\U000e0041`."""
    code = ord(character)
    if code <= _BYTE:
        return f"\\x{code:02x}"
    return f"\\u{code:04x}" if code <= _BASIC_PLANE else f"\\U{code:08x}"


def json_escaped(text: str) -> str:
    r"""Return text that stands inside a JSON string with what cannot be seen as `\u001b`."""
    return _UNSEEN.sub(lambda match: utf16_escaped(match[0]), text)


def utf16_escaped(character: str) -> str:
    r"""Return a character as JSON escapes it: `\u03a9`, beyond the basic plane as two surrogates."""
    code = ord(character)
    if code <= _BASIC_PLANE:
        return f"\\u{code:04x}"
    high, low = divmod(code - 0x10000, 0x400)
    return f"\\u{0xD800 + high:04x}\\u{0xDC00 + low:04x}"


def encodable(text: str, encoding: str) -> str:
    r"""Return text that an encoding can hold: each character that it lacks is written as `\u03a9`.

    JSON stays the same JSON. Raises LookupError for an encoding there is not.

    >>> encodable("4.7 kΩ", "ascii")
    '4.7 k\\u03a9'
    """
    if _holds(text, encoding):
        return text
    kept = {character for character in set(text) if _holds(character, encoding)}
    return "".join(character if character in kept else utf16_escaped(character) for character in text)


def _holds(text: str, encoding: str) -> bool:
    try:
        text.encode(encoding)
    except UnicodeEncodeError:
        return False
    return True
