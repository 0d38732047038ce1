"""A digest of every row, and the sum that shows whether all rows are there."""

from __future__ import annotations

import json
import math
from collections.abc import Callable, Iterable, Sequence
from hashlib import blake2b
from itertools import repeat
from json.encoder import encode_basestring_ascii

Value = str | int | float | bytes | None
Row = tuple[Value, ...]

DIGEST_BYTES = 16
_MODULUS = 1 << (8 * DIGEST_BYTES)
_encode = json.JSONEncoder(ensure_ascii=True, allow_nan=False, separators=(",", ":")).encode


def row_digest(kind: str, values: Row) -> bytes:
    """Return the digest of one row: blake2b of its kind and values as JSON in the order of the table's columns.

    JSON writes a float with the shortest digits that give it back, so the digest is the same on every machine.

    Raises
    ------
    ValueError, TypeError
        A value is none that a catalogue holds (not finite, or bytes): the row is damaged.
    """
    return blake2b(_encode((kind, *values)).encode("ascii"), digest_size=DIGEST_BYTES).digest()


def row_digests(kind: str, columns: Sequence[Sequence[Value]]) -> list[bytes]:
    """Return the digest of each of many rows of one kind: those of `row_digest`, in less time.

    `columns` holds the values of all rows column by column. What is the same in all rows is written once.

    Raises
    ------
    ValueError, TypeError
        As `row_digest` does.
    """
    pieces = [_quoted(_encode(kind))]
    varying: list[Iterable[str]] = []
    for column in columns:
        if _alike(column):
            pieces.append(_quoted(_encode(column[0])))
        else:
            pieces.append("%s")
            varying.append(_texts(column))
    template = f"[{','.join(pieces)}]"
    rows = zip(*varying, strict=True) if varying else repeat((), len(columns[0]))
    texts = "\n".join(map(template.__mod__, rows)).encode("ascii").split(b"\n")
    return [blake2b(text, digest_size=DIGEST_BYTES).digest() for text in texts]


def _alike(column: Sequence[Value]) -> bool:
    """Return whether all values of a column are written alike; noughts are not, where one may have a minus."""
    first = column[0]
    if column[-1] != first or column.count(first) < len(column):
        return False
    return isinstance(first, str | None) or (first != 0.0 and len(set(map(type, column))) == 1)


def _texts(column: Sequence[Value]) -> Iterable[str]:
    """Return the values of a column as JSON."""
    types = set(map(type, column))
    write = _WRITERS.get(types.pop()) if len(types) == 1 else None
    if write is None or (write is float.__repr__ and not all(map(_IS_FINITE, column))):
        return map(_encode, column)
    return map(write, column)


_IS_FINITE: Callable[..., bool] = math.isfinite
_WRITERS: dict[type, Callable[..., str]] = {
    str: encode_basestring_ascii,
    int: int.__repr__,
    float: float.__repr__,
    type(None): lambda _value: "null",
}


def _quoted(text: str) -> str:
    """Return a text as it stands in a template."""
    return text.replace("%", "%%")


def digest_sum(digests: Iterable[bytes]) -> bytes:
    """Return the sum of digests modulo 2**128; the order does not count."""
    total = sum(int.from_bytes(digest, "big") for digest in digests)
    return (total % _MODULUS).to_bytes(DIGEST_BYTES, "big")


def moved_sum(before: bytes, taken: Iterable[bytes], put: Iterable[bytes]) -> bytes:
    """Return the sum after some rows' digests were taken away and others put in."""
    total = int.from_bytes(before, "big")
    total += sum(int.from_bytes(digest, "big") for digest in put)
    total -= sum(int.from_bytes(digest, "big") for digest in taken)
    return (total % _MODULUS).to_bytes(DIGEST_BYTES, "big")
