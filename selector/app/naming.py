"""Names as messages show them, and the known names most like one that was given."""

from __future__ import annotations

import getpass
import os
from collections.abc import Collection, Iterable
from difflib import SequenceMatcher, get_close_matches
from pathlib import Path

_LONGEST = 60
_NEAR = 3
_LIKENESS = 0.5
_LIKE_THE_BEST = 0.15


def shown_path(path: Path) -> str:
    """Return a path as text; bytes that are no UTF-8 stand as escapes."""
    return os.fsencode(path).decode("utf-8", "backslashreplace")


def file_name(path: Path) -> str:
    """Return the name of a file without its folders; of `.`, the name of the folder that is meant."""
    return shown_path(Path(named(path).name))


def named(path: Path) -> Path:
    """Return a path that ends in a name."""
    return path if path.name else path.absolute()


def cut(text: str) -> str:
    """Return a text as a message shows it, cut where it is long."""
    return text if len(text) <= _LONGEST else f"{text[:_LONGEST]}..."


def near_ones(name: str, known: Iterable[str]) -> tuple[str, ...]:
    """Return up to three known names about as like a name as any is, the most alike first; capitals do not count."""
    by_folded: dict[str, str] = {}
    for each in known:
        by_folded.setdefault(each.casefold(), each)
    wanted = name.casefold()[:_LONGEST]
    near = get_close_matches(wanted, by_folded, n=_NEAR, cutoff=_LIKENESS)
    like = [SequenceMatcher(a=each, b=wanted).ratio() for each in near]
    return tuple(by_folded[each] for each, ratio in zip(near, like, strict=True) if ratio >= like[0] - _LIKE_THE_BEST)


def did_you_mean(name: str, known: Collection[str], otherwise: str = "") -> str:
    """Return 'did you mean "a" or "b"?', or what is to be said where no known name is like it."""
    near = near_ones(name, known)
    quoted = " or ".join(f'"{each}"' for each in near)
    return f"did you mean {quoted}?" if near else otherwise


def who() -> str:
    """Return the login name for the `source` of a part; empty where the system does not tell."""
    try:
        return getpass.getuser().encode("utf-8", "backslashreplace").decode("utf-8")
    except (KeyError, OSError, ImportError):
        return ""
