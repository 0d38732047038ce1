"""The known name most like one that was read."""

from __future__ import annotations

from collections.abc import Collection
from difflib import SequenceMatcher

_LONGEST = 80
_ALIKE_IN_ITS_TABLE = 0.6
_ALIKE_ELSEWHERE = 0.8


def did_you_mean(name: str, known: Collection[str]) -> str:
    """Return 'did you mean "x"?' for the nearest known name, an empty string where none is near.

    Near is a key of the same table whose last step is alike, or one of another table whose last step is very much
    alike; among several the one whose whole name is most alike, the first on a tie.
    """
    if len(name) > _LONGEST:
        return ""
    near = [key for key in known if _near(name, key)]
    return f'did you mean "{max(near, key=lambda key: _likeness(name, key))}"?' if near else ""


def _near(name: str, key: str) -> bool:
    table, _, leaf = name.rpartition(".")
    other_table, _, other = key.rpartition(".")
    return _likeness(leaf, other) >= (_ALIKE_IN_ITS_TABLE if table == other_table else _ALIKE_ELSEWHERE)


def _likeness(one: str, other: str) -> float:
    return SequenceMatcher(a=one, b=other, autojunk=False).ratio()
