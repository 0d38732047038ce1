"""A digest of every row, and the sum that shows whether all rows are there."""

from __future__ import annotations

import json
from collections.abc import Iterable
from hashlib import blake2b

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
