"""The known name most like one that was read."""

from __future__ import annotations

from collections.abc import Collection
from difflib import SequenceMatcher

_LONGEST = 80
_LIKE_ENOUGH = 0.6


def did_you_mean(name: str, known: Collection[str]) -> str:
    """Return 'did you mean "x"?' for the nearest known name, an empty string where none is near.

    Near is a key whose last step is alike, in whatever table; among several the one whose whole name is most alike,
    the first on a tie.
    """
    if len(name) > _LONGEST:
        return ""
    leaf = _leaf(name)
    near = [key for key in known if _likeness(leaf, _leaf(key)) >= _LIKE_ENOUGH]
    return f'did you mean "{max(near, key=lambda key: _likeness(name, key))}"?' if near else ""


def _leaf(name: str) -> str:
    return name.rpartition(".")[2]


def _likeness(one: str, other: str) -> float:
    return SequenceMatcher(a=one, b=other, autojunk=False).ratio()
