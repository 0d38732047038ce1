"""Which codes stand in more than one row of a load, found in eight bytes a row: many rows must not fill the memory."""

from __future__ import annotations

from array import array
from collections import Counter
from collections.abc import Iterable, Sequence
from itertools import repeat

from selector.parts import Plain

_BUCKETS = 256


Key = tuple[str, str]
"""Kind and code of a part."""


class Codes:
    """Numbers that stand for the kinds and codes of rows; two rows of one code have one number."""

    def __init__(self) -> None:
        """Begin with none."""
        self._buckets = [array("q") for _ in range(_BUCKETS)]

    def add(self, kind: str, codes: Iterable[Plain]) -> None:
        """Add the codes of rows of one kind."""
        buckets = self._buckets
        for number in map(hash, zip(repeat(kind), codes)):
            buckets[number % _BUCKETS].append(number)

    def twice(self) -> frozenset[int]:
        """Return the numbers that were added more than once."""
        return frozenset(number for bucket in self._buckets for number in _twice(bucket))

    def also_in(self, other: Codes) -> frozenset[int]:
        """Return the numbers that were added to another one as well."""
        pairs = zip(self._buckets, other._buckets, strict=True)
        return frozenset(number for one, another in pairs for number in set(one) & set(another))


def number_of(key: Key) -> int:
    """Return the number that stands for a kind and a code, in this run of the program alone."""
    return hash(key)


def among_several(codes: Sequence[Codes]) -> frozenset[int]:
    """Return the numbers that were added to more than one of several."""
    pairs = ((one, other) for place, one in enumerate(codes) for other in codes[:place])
    return frozenset(number for one, other in pairs for number in one.also_in(other))


def _twice(bucket: array[int]) -> Iterable[int]:
    """Return the numbers that stand in a bucket more than once."""
    if len(set(bucket)) == len(bucket):
        return ()
    return (number for number, count in Counter(bucket).items() if count > 1)
