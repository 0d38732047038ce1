"""Part codes and other text as the catalogue keeps them: no two codes differ only in what cannot be seen."""

from __future__ import annotations

import unicodedata

from selector.parts.holds import CellRefused

LONGEST_CODE = 200
LONGEST_TEXT = 10_000
_UNSEEN_CATEGORIES = ("Cc", "Cf", "Cs", "Zl", "Zp")
# Letters and marks that leave no ink (Unicode: Default_Ignorable_Code_Point), and the empty braille cell.
_UNSEEN_RANGES = (
    (0x034F, 0x034F),
    (0x115F, 0x1160),
    (0x17B4, 0x17B5),
    (0x180B, 0x180F),
    (0x2800, 0x2800),
    (0x3164, 0x3164),
    (0xFE00, 0xFE0F),
    (0xFFA0, 0xFFA0),
    (0xE0000, 0xE0FFF),
)


def clean_code(code: str) -> str:
    """Return a part code in Unicode's composed form (NFC), trimmed, every sort of blank a plain space.

    Raises
    ------
    CellRefused
        The code is empty, longer than 200 characters, or holds a character that cannot be seen.
    """
    blanks = "".join(" " if unicodedata.category(character) == "Zs" else character for character in code)
    clean = unicodedata.normalize("NFC", blanks.strip())
    if not clean:
        raise CellRefused("the code is empty", "give the part your own stock code, for example S-0R05")
    if len(clean) > LONGEST_CODE:
        raise CellRefused(f"a code of {len(clean)} characters", f"a code has at most {LONGEST_CODE}")
    unseen = next((character for character in clean if _unseen(character)), None)
    if unseen is not None:
        raise CellRefused(f"the code holds U+{ord(unseen):04X}, which cannot be seen", "leave it out")
    return clean


def clean_text(text: str) -> str:
    """Return free text, trimmed.

    Raises
    ------
    CellRefused
        The text is longer than 10 000 characters, or holds half a surrogate pair, which no file can hold.
    """
    clean = text.strip()
    if len(clean) > LONGEST_TEXT:
        raise CellRefused(f"a text of {len(clean)} characters", f"a text has at most {LONGEST_TEXT}")
    broken = next((character for character in clean if unicodedata.category(character) == "Cs"), None)
    if broken is not None:
        raise CellRefused(f"the text holds U+{ord(broken):04X}, half a character", "save the file as UTF-8")
    return clean


def _unseen(character: str) -> bool:
    if unicodedata.category(character) in _UNSEEN_CATEGORIES:
        return True
    return any(first <= ord(character) <= last for first, last in _UNSEEN_RANGES)
