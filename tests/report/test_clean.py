"""What is done to text before it is printed."""

from __future__ import annotations

import json
import unicodedata

import pytest

from selector.report import clean, encodable


def test_everything_that_cannot_be_seen_is_written_out() -> None:
    """C0, DEL, C1, format characters, line separators and surrogates do not survive; what is left is shown as it is.

    Source: Unicode character database, general categories Cc, Cf, Cs, Zl, Zp, as Python has them.
    Tolerance: none; Arabic and other number signs (Cf, visible) and musical and shorthand controls are let through.
    """
    visible = {*range(0x600, 0x606), 0x6DD, 0x70F, 0x890, 0x891, 0x8E2, 0x110BD, 0x110CD}
    visible |= {*range(0x13430, 0x13440), *range(0x1BCA0, 0x1BCA4), *range(0x1D173, 0x1D17B)}
    unseen = [
        character
        for character in map(chr, range(0x110000))
        if unicodedata.category(character) in ("Cc", "Cf", "Cs", "Zl", "Zp") and ord(character) not in visible
    ]
    assert [hex(ord(character)) for character in unseen if character in clean(character)] == []


@pytest.mark.parametrize(
    ("text", "shown"),
    [
        ("\x1b[0m", r"\x1b[0m"),
        ("a\nb\tc", r"a\x0ab\x09c"),
        ("\x7f\x9b", r"\x7f\x9b"),
        ("\u202etxt", r"\u202etxt"),
        ("\udc80", r"\udc80"),
        ("\U000e0041", r"\U000e0041"),
        ("4.7 k\N{OHM SIGN} [/b]", "4.7 k\N{OHM SIGN} [/b]"),
    ],
)
def test_how_it_is_written(text: str, shown: str) -> None:
    r"""One byte as `\x1b`, more as `\u202e`; markup and letters stay."""
    assert clean(text) == shown


@pytest.mark.parametrize("encoding", ["ascii", "latin-1", "cp1252", "utf-8"])
def test_text_fits_every_encoding_and_json_stays_json(encoding: str) -> None:
    r"""What an encoding lacks is written as `\u03a9`; JSON read back is the same, also beyond the basic plane."""
    text = 'k\N{GREEK CAPITAL LETTER OMEGA} \N{LATIN SMALL LETTER E WITH ACUTE} \U0001f600 \udc80 "'
    written = json.dumps({"a": text}, ensure_ascii=False)
    safe = encodable(written, encoding)
    assert json.loads(safe.encode(encoding).decode(encoding)) == {"a": text}
    assert ("\\u03a9" in safe) is (encoding != "utf-8")
