"""Part codes: no two differ only in what cannot be seen."""

from __future__ import annotations

import unicodedata

import pytest
from hypothesis import given
from hypothesis import strategies as st

from selector.parts.code import clean_code, clean_text
from selector.units import QuantityError


@pytest.mark.parametrize(
    ("given_code", "kept"),
    [
        ("S-0R05", "S-0R05"),
        ("  S-0R05\t\n", "S-0R05"),
        ("e\u0301-1", "\u00e9-1"),
        ("A\u00a0B", "A B"),
        ("A\u2003B", "A B"),
        ("\u03a9-1", "\u03a9-1"),
        ("\u2126-1", "\u03a9-1"),
        ("=1+1", "=1+1"),
        ("[/b]", "[/b]"),
        ("x" * 200, "x" * 200),
    ],
)
def test_a_code_is_composed_and_trimmed(given_code: str, kept: str) -> None:
    """A code is kept in NFC, trimmed, with plain spaces; all that can be seen stays."""
    assert clean_code(given_code) == kept


@pytest.mark.parametrize(
    "code",
    [
        "",
        "   ",
        "x" * 201,
        "a\x00b",
        "a\tb",
        "a\nb",
        "a\x1b[1mb",
        "a\x7fb",
        "a\x85b",
        "a\u200bb",
        "a\u202eb",
        "a\u2066b",
        "a\ufeffb",
        "a\u00adb",
        "a\ud800b",
        "a\u2028b",
        "a\ufe0fb",
        "a\u3164b",
        "a\u034fb",
        "a\U000e0041b",
    ],
)
def test_a_code_with_what_cannot_be_seen_is_refused(code: str) -> None:
    """Empty and long codes, and control, format, surrogate and other unseen characters are refused."""
    with pytest.raises(QuantityError):
        clean_code(code)


@given(st.text())
def test_a_kept_code_is_kept_again(code: str) -> None:
    """Cleaning a clean code changes nothing, and no clean code holds a character of the categories refused."""
    try:
        clean = clean_code(code)
    except QuantityError:
        return
    assert clean_code(clean) == clean
    assert not {unicodedata.category(sign) for sign in clean} & {"Cc", "Cf", "Cs"}


def test_free_text_keeps_its_marks() -> None:
    """A description keeps control characters and marks: they are made harmless where they are shown."""
    assert clean_text(" [/b] \x1b[1m ") == "[/b] \x1b[1m"


@pytest.mark.parametrize("text", ["x" * 10_001, "a\udfffb"])
def test_text_that_no_file_can_hold_is_refused(text: str) -> None:
    """More than 10 000 characters, or half a surrogate pair, is no text."""
    with pytest.raises(QuantityError):
        clean_text(text)
