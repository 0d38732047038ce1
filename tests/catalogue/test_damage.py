"""Rows that are not what was written are seen by whoever reads them."""

from __future__ import annotations

import random
import sqlite3
import struct
from collections.abc import Callable
from contextlib import AbstractContextManager
from pathlib import Path

import pytest

from selector.catalogue import open_catalogue
from selector.catalogue.digest import digest_sum, moved_sum, row_digest
from selector.errors import Unusable
from selector.parts import KINDS, Part

Make = Callable[..., Part]
Sql = Callable[[Path], AbstractContextManager[sqlite3.Connection]]


def read_all(path: Path) -> list[Part]:
    """Return every part of a catalogue."""
    with open_catalogue(path) as catalogue:
        return [part for kind in KINDS for part in catalogue.parts(kind)]


def test_a_flipped_bit_in_a_figure_is_seen(stocked: Path) -> None:
    """One bit of one double in the file, and the part's row no longer has its digest."""
    content = bytearray(stocked.read_bytes())
    place = content.index(struct.pack(">d", 0.001))
    content[place + 6] ^= 1
    stocked.write_bytes(content)
    with pytest.raises(
        Unusable, match=r"damaged: row '(R1|R3|r2)' of table resistor; put a good copy of the file in its place"
    ):
        read_all(stocked)


TAMPERED = {
    "a figure": ("UPDATE resistor SET resistance = 5000.0 WHERE part = 'R1'", "damaged: row 'R1' of table resistor"),
    "a text": ("UPDATE resistor SET note = 'x' WHERE part = 'R1'", "damaged: row 'R1' of table resistor"),
    "a row gone": ("DELETE FROM resistor WHERE part = 'R1'", "damaged: 3 parts where 4 were written"),
    "all rows gone": ("DELETE FROM resistor", "damaged: 1 parts where 4 were written"),
    "a digest": ("UPDATE shunt SET digest = zeroblob(16)", "damaged: the parts are not those that were written"),
    "a code": ("UPDATE resistor SET part = 'R5' WHERE part = 'R1'", "damaged: row 'R5' of table resistor"),
    "the state's sum": ("UPDATE state SET digests = zeroblob(16)", "damaged: the parts are not those"),
    "the state's count": ("UPDATE state SET rows = 9", "damaged: 4 parts where 9 were written"),
    "the state gone": ("DELETE FROM state", "damaged: 0 state rows instead of 1"),
    "no UTF-8": ("UPDATE resistor SET note = CAST(x'ff' AS TEXT)", "damaged"),
    "a table gone": ("DROP TABLE switch", "damaged: not as it was made: switch"),
    "a table more": ("CREATE TABLE extra (x)", "damaged: not as it was made: extra"),
    "a trigger": ("CREATE TRIGGER t AFTER INSERT ON shunt BEGIN DELETE FROM shunt; END", "not as it was made: t"),
    "a column more": ("ALTER TABLE shunt ADD COLUMN x TEXT", "damaged: not as it was made: shunt"),
    "a table renamed": ("ALTER TABLE shunt RENAME TO shunt2", "damaged: not as it was made: shunt, shunt2"),
}


@pytest.mark.parametrize("name", TAMPERED)
def test_tampering_is_seen(stocked: Path, sql: Sql, name: str) -> None:
    """A change made behind the program's back is damage to the next reader, with the reason."""
    statement, words = TAMPERED[name]
    with sql(stocked) as connection:
        connection.execute(statement)
    before = stocked.read_bytes()
    with pytest.raises(Unusable) as refused:
        read_all(stocked)
    assert words in str(refused.value)
    assert stocked.read_bytes() == before


@pytest.mark.parametrize("name", ["a row gone", "the state gone", "a table more", "a table gone"])
def test_a_writer_leaves_a_damaged_catalogue_alone(stocked: Path, sql: Sql, name: str, resistor: Make) -> None:
    """Nothing is written onto damage: the writer is refused as a reader is."""
    with sql(stocked) as connection:
        connection.execute(TAMPERED[name][0])
    before = stocked.read_bytes()
    with pytest.raises(Unusable, match="damaged"), open_catalogue(stocked, write=True) as catalogue:
        catalogue.add(resistor("R9"))
    assert stocked.read_bytes() == before


def test_a_damaged_row_is_not_compared(stocked: Path, sql: Sql, resistor: Make) -> None:
    """A load that meets a damaged row of the same code is refused, replace or not."""
    with sql(stocked) as connection:
        connection.execute("UPDATE resistor SET resistance = 5000.0 WHERE part = 'R3'")
    with open_catalogue(stocked, write=True) as catalogue:
        for replace in (False, True):
            with pytest.raises(Unusable, match="damaged: row 'R3'"):
                catalogue.merge([resistor("R3")], replace=replace)


def test_no_flip_of_a_bit_changes_what_is_read_unseen(tmp_path: Path, resistor: Make, shunt: Make) -> None:
    """Of 400 random flips each is refused, or every part reads as it was written: no changed figure, no crash."""
    path = tmp_path / "parts.db"
    parts = [resistor(f"R{number}", description="x" * number) for number in range(60)] + [shunt("S1")]
    with open_catalogue(path, write=True) as catalogue:
        catalogue.merge(parts)
    good, wanted, noise = path.read_bytes(), read_all(path), random.Random(3)
    refused = 0
    for _ in range(400):
        content = bytearray(good)
        content[noise.randrange(len(good))] ^= 1 << noise.randrange(8)
        path.write_bytes(content)
        try:
            assert read_all(path) == wanted
        except Unusable:
            refused += 1
    assert refused > 40


def test_a_file_cut_short_is_seen(tmp_path: Path, stocked: Path) -> None:
    """A file cut anywhere is refused."""
    good, path = stocked.read_bytes(), tmp_path / "cut.db"
    for share in range(2, 100, 7):
        path.write_bytes(good[: len(good) * share // 100])
        with pytest.raises(Unusable):
            read_all(path)


def test_the_digest_is_that_of_the_values() -> None:
    """The digest of a row is fixed for good: another program, or another version of this one, computes the same.

    Source: blake2b with 16 bytes of the JSON text ["shunt","S1",0.05,2,null], by the b2sum of GNU coreutils.
    Tolerance: none, the digest itself.
    """
    assert row_digest("shunt", ("S1", 0.05, 2, None)).hex() == "192cba905ca33b18702c403af07ac6ba"


@pytest.mark.parametrize("value", [float("nan"), float("inf"), b"\x00"])
def test_what_no_row_holds_has_no_digest(value: float | bytes) -> None:
    """NaN, infinity and bytes are no values of a row."""
    with pytest.raises((TypeError, ValueError)):
        row_digest("shunt", ("S1", value))


def test_the_sum_of_digests_follows_rows_in_and_out() -> None:
    """Taking rows away and putting rows in moves the sum to that of the rows that are there."""
    digests = [bytes([number]) * 16 for number in (255, 254, 3)]
    assert moved_sum(digest_sum(digests[:2]), digests[:1], digests[2:]) == digest_sum(digests[1:])
    assert digest_sum(reversed(digests)) == digest_sum(digests)
    assert moved_sum(digest_sum(digests), digests, ()) == bytes(16)
