"""Whole stock files taken in: the rows, the digests and what is said of them are those of parts taken one by one."""

from __future__ import annotations

import math
import sqlite3
from collections.abc import Callable, Iterator, Sequence
from contextlib import AbstractContextManager
from dataclasses import dataclass
from pathlib import Path

import pytest
from hypothesis import given
from hypothesis import strategies as st

from selector.catalogue import open_catalogue
from selector.catalogue.bulk import Taken
from selector.catalogue.digest import row_digest, row_digests
from selector.catalogue.merge import Change
from selector.errors import Unusable
from selector.parts import Part, Records, record_of

Make = Callable[..., Part]
Sql = Callable[[Path], AbstractContextManager[sqlite3.Connection]]

VALUES = (
    st.text(),
    st.floats(allow_nan=False, allow_infinity=False),
    st.integers(-(2**63), 2**63 - 1),
    st.none(),
    st.sampled_from((0, 1, 0.0, -0.0, 1.0, "", "%s", "\n", None)),
)


@dataclass(frozen=True)
class Parts:
    """Parts as a source, some at a time."""

    parts: Sequence[Part]
    at_once: int = 2

    def __len__(self) -> int:
        """Return how many there are."""
        return len(self.parts)

    def __iter__(self) -> Iterator[tuple[str, Records]]:
        """Yield their records by two."""
        for start in range(0, len(self.parts), self.at_once):
            some = [record_of(part) for part in self.parts[start : start + self.at_once]]
            yield self.parts[0].kind, list(zip(*some, strict=True))


@given(data=st.data())
def test_digests_of_many_rows_are_those_of_each(data: st.DataObject) -> None:
    """Digests made column by column are those made row by row, whatever stands in the columns."""
    count = data.draw(st.integers(1, 5))
    kinds = data.draw(st.lists(st.sampled_from(VALUES), min_size=1, max_size=5))
    columns = [data.draw(st.lists(kind, min_size=count, max_size=count)) for kind in kinds]
    columns += [[column[0]] * count for column in columns]
    rows = list(zip(*columns, strict=True))
    assert row_digests("shunt", columns) == [row_digest("shunt", row) for row in rows]


@pytest.mark.parametrize("value", [math.inf, -math.inf, math.nan, b"x"])
@pytest.mark.parametrize("other", [1.0, None, math.inf])
def test_what_no_catalogue_holds_has_no_digest(value: float | bytes, other: float | None) -> None:
    """A figure that is not finite, or bytes, is refused among other values too."""
    with pytest.raises((ValueError, TypeError)):
        row_digests("shunt", [[value, other]])


@pytest.mark.parametrize("replace", [False, True])
def test_taken_in_is_as_merged(stocked: Path, tmp_path: Path, resistor: Make, *, replace: bool) -> None:
    """A source leaves the catalogue with the rows, the digests and the counts that a merge of its parts leaves."""
    given_parts = [
        resistor("R7"),
        resistor("R1", description="thin film", source="s"),
        resistor("R3", tolerance="1 %"),
        resistor("R8"),
    ]
    other = tmp_path / "other.db"
    other.write_bytes(stocked.read_bytes())
    with open_catalogue(stocked, write=True) as one, open_catalogue(other, write=True) as another:
        planned = one.take_in([Parts(given_parts)], replace=replace, dry_run=True)
        taken = one.take_in([Parts(given_parts)], replace=replace)
        merge = another.merge(given_parts, replace=replace)
        assert planned == taken
        assert one.parts("resistor") == another.parts("resistor")
        assert one.info().changes == another.info().changes
    changes, conflicts = merge.changes, merge.conflicts
    assert taken == (Taken(len(merge.new), len(merge.same), len(merge.changed), changes, conflicts),)
    assert (taken[0].new, taken[0].same) == (2, 1)
    difference = Change("resistor", "R3", "tolerance", 0.001, 0.01)
    assert (difference in changes) is replace


def test_several_sources_are_told_apart(tmp_path: Path, resistor: Make) -> None:
    """What became of each of several sources is told by itself, and a second load of them changes nothing."""
    path = tmp_path / "parts.db"
    sources = [Parts([resistor("R1"), resistor("R2"), resistor("R3")]), Parts([resistor("R4")])]
    with open_catalogue(path, write=True) as catalogue:
        assert [each.new for each in catalogue.take_in(sources)] == [3, 1]
        before = path.read_bytes()
        assert [(each.new, each.same) for each in catalogue.take_in(sources)] == [(0, 3), (0, 1)]
    assert path.read_bytes() == before


def test_a_damaged_row_is_found_when_it_is_compared(stocked: Path, sql: Sql, resistor: Make) -> None:
    """A row that is not what its digest says is neither the same as another nor in conflict with it."""
    with sql(stocked) as connection:
        connection.execute("UPDATE resistor SET note = 'x' WHERE part = 'R3'")
    with open_catalogue(stocked, write=True) as catalogue, pytest.raises(Unusable, match="damaged: row 'R3'"):
        catalogue.take_in([Parts([resistor("R3")])])
