"""Loads, as the command's function answers them."""

from __future__ import annotations

from pathlib import Path

import pytest

from selector.app.cataloguing import info, named_part, stock_of
from selector.app.load import Order, load
from selector.app.parts import added, changed, found, listed, removed, shown
from selector.catalogue import open_catalogue
from selector.errors import InputRefused, Unusable, UsageRefused

HEAD = "kind,part,resistance,tolerance,tempco\n"
ROW = "resistor,R1,1k,1 %,50 ppm/K\n"


@pytest.fixture
def stock(tmp_path: Path) -> Path:
    """Write a stock file of one resistor."""
    path = tmp_path / "s.csv"
    path.write_text(HEAD + ROW, encoding="utf-8")
    return path


def test_person_may_decline_what_would_change(stock: Path, tmp_path: Path) -> None:
    """With `replace`, what would change is shown first; where it is not wanted, nothing changes."""
    file = tmp_path / "c.db"
    load([stock], Order(catalogue=file))
    before = file.read_bytes()
    stock.write_text(HEAD + ROW.replace("1k", "2k"), encoding="utf-8")
    seen = []
    answer = load([stock], Order(replace=True, catalogue=file, confirm=lambda planned: bool(seen.append(planned))))
    assert answer == seen[0]
    assert [change.after for change in answer.files[0].changes] == ["2 kohm"]
    assert file.read_bytes() == before
    answer = load([stock], Order(replace=True, catalogue=file, confirm=lambda _planned: True))
    assert (answer.dry_run, answer.files[0].changed) == (False, 1)


def test_rows_shared_by_two_files_are_refused_in_both(stock: Path, tmp_path: Path) -> None:
    """A code in two files of one load is a refused row of each, and they share one rejects file."""
    other = tmp_path / "t.csv"
    other.write_text(HEAD + ROW + "resistor,R2,1k,1 %,50 ppm/K\n", encoding="utf-8")
    answer = load([stock, other], Order(catalogue=tmp_path / "c.db"))
    assert [(file.new, file.refused) for file in answer.files] == [(0, 1), (1, 1)]
    assert answer.rejects == str(tmp_path / "s.rejects.csv")


def test_catalogue_that_cannot_be_used_is_not_touched(stock: Path, tmp_path: Path) -> None:
    """A load into what is no catalogue leaves it and makes no rejects."""
    file = tmp_path / "c.db"
    file.write_text("mine", encoding="utf-8")
    with pytest.raises(Unusable, match="is no catalogue"):
        load([stock], Order(catalogue=file))
    assert file.read_text("utf-8") == "mine"


def test_life_of_a_part(tmp_path: Path) -> None:
    """A part is added once, shown, found, changed field by field, and removed."""
    file = tmp_path / "c.db"
    fields = {"part": "R7", "resistance": "7k", "tolerance": "1%", "tempco": "50ppm/K"}
    assert added("resistor", fields, file).parts == (("resistor", "R7"),)
    with pytest.raises(InputRefused, match="is in the catalogue already"):
        added("resistor", fields, file)
    assert shown("R7", None, file).parts[0].source.endswith("by hand")
    assert [each.why for each in found("R7", None, 20, file).found] == ["code"]
    assert found("zzzz", None, 20, file).found == ()
    changes = changed("R7", {"resistance": "8k", "part": "R8"}, None, file)
    assert [(each.field, each.before, each.after) for each in changes.changes] == [
        ("part", "R7", "R8"),
        ("resistance", "7 kohm", "8 kohm"),
    ]
    assert changes.parts == (("resistor", "R8"),)
    assert changed("R8", {"resistance": "8k"}, None, file).same == 1
    assert removed("R8", "resistor", file).done == "removed"
    assert listed(None, file).parts == ()
    assert [each.parts for each in info(file).kinds] == [0] * 6


def test_unknown_part_names_those_like_it(stock: Path, tmp_path: Path) -> None:
    """A code that is not there is refused with the nearest ones, of the kind that was named."""
    file = tmp_path / "c.db"
    load([stock], Order(catalogue=file))
    with open_catalogue(file) as opened:
        assert sum(map(len, stock_of(opened).values())) == 1
        with pytest.raises(InputRefused, match='no part "R0" is in the catalogue; did you mean "R1"'):
            named_part(opened, "R0", None)
        with pytest.raises(InputRefused, match='no shunt "R1" is in the catalogue'):
            named_part(opened, "R1", "shunt")
        with pytest.raises(UsageRefused, match="is no kind of part"):
            named_part(opened, "R1", "shnt")
