"""Parts in the catalogue: added, changed, removed, merged, found again."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path

import pytest

from selector.catalogue import in_memory, open_catalogue
from selector.catalogue.merge import Change
from selector.errors import InputRefused, Unusable, UsageRefused
from selector.parts import KINDS, Part

Make = Callable[..., Part]


def test_parts_come_in_order_of_code_points(stocked: Path) -> None:
    """Parts of a kind are listed by the code points of their codes: capitals before small letters."""
    with open_catalogue(stocked) as catalogue:
        assert [part.part for part in catalogue.parts("resistor")] == ["R1", "R3", "r2"]


def test_parts_come_back_as_they_went_in(stocked: Path, resistor: Make) -> None:
    """A part read from the file equals the one written, figure for figure."""
    with open_catalogue(stocked) as catalogue:
        assert catalogue.get("resistor", "R1") == resistor("R1", description="thin film")


def test_all_sorts_of_fields_come_back(resistor: Make) -> None:
    """Names, flags, counts, money and absent figures come back with their types."""
    part = resistor("R1", typical="tempco, power", generic="yes", unit_cost="0.12", currency="EUR", voltage="100 V")
    found = in_memory([part]).get("resistor", "R1")
    assert found == part
    assert repr(found) == repr(part)


def test_get_takes_codes_as_people_write_them(resistor: Make) -> None:
    """A code is looked up trimmed and in composed form, as it is kept."""
    catalogue = in_memory([resistor("R-\u00e9")])
    assert catalogue.get("resistor", " R-e\u0301 ") is not None
    assert catalogue.get("resistor", "R-x") is None


def test_kinds_of_a_code(resistor: Make, shunt: Make) -> None:
    """A code that two kinds share has both, in the order of the kinds."""
    catalogue = in_memory([resistor("X1"), shunt("X1"), shunt("X2")])
    assert catalogue.kinds_of("X1") == ("shunt", "resistor")
    assert catalogue.kinds_of("X2") == ("shunt",)
    assert catalogue.kinds_of("X3") == ()


def test_add_refuses_a_code_that_is_taken(stocked: Path, resistor: Make) -> None:
    """A second part of the same kind and code is refused, and the first stays."""
    with open_catalogue(stocked, write=True) as catalogue:
        catalogue.add(resistor("R4"))
        with pytest.raises(InputRefused, match="resistor R4: is in the catalogue already; change it"):
            catalogue.add(resistor("R4", resistance="1 kohm"))
        assert catalogue.get("resistor", "R4") == resistor("R4")


def test_change_gives_the_fields_that_differ(stocked: Path) -> None:
    """A change returns each field with its figure before and after, and holds."""
    with open_catalogue(stocked, write=True) as catalogue:
        changes = catalogue.change("resistor", "R1", {"resistance": "5 kohm", "description": ""})
    assert changes == (
        Change("resistor", "R1", "description", "thin film", ""),
        Change("resistor", "R1", "resistance", 4990.0, 5000.0),
    )
    with open_catalogue(stocked) as catalogue:
        part = catalogue.get("resistor", "R1")
    assert part is not None
    assert part.model_dump()["resistance"] == 5000.0


def test_change_of_the_code_moves_the_part(stocked: Path) -> None:
    """A new code takes the place of the old one, unless it is taken."""
    with open_catalogue(stocked, write=True) as catalogue:
        catalogue.change("resistor", "R1", {"part": "R9"})
        assert [part.part for part in catalogue.parts("resistor")] == ["R3", "R9", "r2"]
        with pytest.raises(InputRefused, match="resistor R3: is in the catalogue already"):
            catalogue.change("resistor", "R9", {"part": "R3"})
    with open_catalogue(stocked) as catalogue:
        assert catalogue.info().kinds[1].parts == 3


def test_an_impossible_change_is_refused_and_changes_nothing(stocked: Path) -> None:
    """A figure that no part can have is refused with the field, and the file stays as it was."""
    before = stocked.read_bytes()
    with open_catalogue(stocked, write=True) as catalogue, pytest.raises(InputRefused, match="resistor R1, tolerance"):
        catalogue.change("resistor", "R1", {"tolerance": "150 %"})
    assert stocked.read_bytes() == before


def test_remove_takes_one_part_out(stocked: Path) -> None:
    """A removed part is returned and gone; one that is not there is refused."""
    with open_catalogue(stocked, write=True) as catalogue:
        assert catalogue.remove("resistor", "R1").part == "R1"
        assert [part.part for part in catalogue.parts("resistor")] == ["R3", "r2"]
        with pytest.raises(InputRefused, match="resistor R1: is not in the catalogue"):
            catalogue.remove("resistor", "R1")


def test_merge_sorts_parts(stocked: Path, resistor: Make) -> None:
    """Parts are new, the same, or refused with both figures where the catalogue has others."""
    given = [resistor("R1", description="thin film"), resistor("R3", tolerance="1 %"), resistor("R7")]
    with open_catalogue(stocked, write=True) as catalogue:
        merge = catalogue.merge(given)
        assert (merge.new, merge.same, merge.changed) == ((("resistor", "R7"),), (("resistor", "R1"),), ())
        assert [conflict.part for conflict in merge.conflicts] == ["R3"]
        assert merge.conflicts[0].differences == (Change("resistor", "R3", "tolerance", 0.001, 0.01),)
        assert catalogue.get("resistor", "R3") == resistor("R3")


def test_merge_replaces_where_told(stocked: Path, resistor: Make) -> None:
    """With replace a part takes the figures given, and each change is listed."""
    with open_catalogue(stocked, write=True) as catalogue:
        merge = catalogue.merge([resistor("R3", tolerance="1 %")], replace=True)
    assert merge.changes == (Change("resistor", "R3", "tolerance", 0.001, 0.01),)
    assert merge.changed == (("resistor", "R3"),)
    with open_catalogue(stocked) as catalogue:
        assert catalogue.get("resistor", "R3") == resistor("R3", tolerance="1 %")


@pytest.mark.parametrize("replace", [False, True])
def test_a_second_load_changes_no_byte(stocked: Path, resistor: Make, replace: bool) -> None:  # noqa: FBT001 - a parameter
    """The same parts from another file and line are the same: the file's bytes and the source stay."""
    before = stocked.read_bytes()
    with open_catalogue(stocked, write=True) as catalogue:
        merge = catalogue.merge([resistor("R3", source="other.csv line 9")], replace=replace)
        assert merge.same == (("resistor", "R3"),)
        assert catalogue.get("resistor", "R3") == resistor("R3")
    assert stocked.read_bytes() == before


def test_a_dry_run_says_all_and_writes_nothing(stocked: Path, tmp_path: Path, resistor: Make) -> None:
    """A dry run gives the same answer as the load, leaves the bytes alone, and makes no file."""
    before = stocked.read_bytes()
    given = [resistor("R3", tolerance="1 %"), resistor("R7")]
    with open_catalogue(stocked, write=True) as catalogue:
        dry = catalogue.merge(given, replace=True, dry_run=True)
        assert stocked.read_bytes() == before
        assert catalogue.merge(given, replace=True) == dry
    none = tmp_path / "none.db"
    with open_catalogue(none, write=True) as catalogue:
        assert len(catalogue.merge(given, dry_run=True).new) == 2
        catalogue.merge([])
    assert not none.exists()


def test_merge_refuses_a_part_given_twice(resistor: Make) -> None:
    """Two parts of one kind and code in one merge are refused, and none is taken."""
    catalogue = in_memory()
    with pytest.raises(InputRefused, match="resistor R1: is given twice"):
        catalogue.merge([resistor("R1"), resistor("R1", tolerance="1 %")])
    assert catalogue.parts("resistor") == ()


def test_info_counts(tmp_path: Path, resistor: Make, shunt: Make) -> None:
    """Info counts parts, stocked ones (a quantity above 0, not generic) and generic ones of each kind."""
    path = tmp_path / "parts.db"
    parts = [
        resistor("R1"),
        resistor("R2", quantity="0"),
        resistor("R3", quantity=""),
        resistor("R4", generic="yes"),
        shunt("S1"),
    ]
    with open_catalogue(path, write=True) as catalogue:
        catalogue.merge(parts)
    with open_catalogue(path) as catalogue:
        info = catalogue.info()
    assert (info.path, info.version, info.size_bytes, info.changes) == (path, 1, path.stat().st_size, 1)
    counts = {each.kind: (each.parts, each.stocked, each.generic) for each in info.kinds}
    assert list(counts) == list(KINDS)
    assert (counts["resistor"], counts["shunt"], counts["switch"]) == ((4, 1, 1), (1, 0, 0), (0, 0, 0))


def test_a_reader_sees_one_moment(stocked: Path) -> None:
    """What a reader opened does not change under it, and it cannot write."""
    with open_catalogue(stocked) as reader, open_catalogue(stocked, write=True) as writer:
        writer.remove("resistor", "R1")
        assert [part.part for part in reader.parts("resistor")] == ["R1", "R3", "r2"]
        assert [part.part for part in writer.parts("resistor")] == ["R3", "r2"]
        with pytest.raises(UsageRefused, match="was opened for reading"):
            reader.remove("resistor", "R3")


def test_a_missing_catalogue_names_what_makes_one(tmp_path: Path) -> None:
    """A reader of a file that is not there is told the commands that make one, and no file appears."""
    path = tmp_path / "none.db"
    with pytest.raises(Unusable, match="there is no catalogue; make one: selector load FILE, or selector parts add"):
        open_catalogue(path)
    with open_catalogue(path, write=True) as catalogue:
        with pytest.raises(Unusable, match="there is no catalogue"):
            catalogue.change("resistor", "R1", {"note": "x"})
        with pytest.raises(Unusable, match="there is no catalogue"):
            catalogue.remove("resistor", "R1")
    assert list(tmp_path.iterdir()) == []


def test_an_empty_file_is_a_new_catalogue(tmp_path: Path, resistor: Make) -> None:
    """A file of no bytes is an empty catalogue to a reader, who leaves it alone, and a new one to a writer."""
    path = tmp_path / "parts.db"
    path.touch()
    with open_catalogue(path) as catalogue:
        assert all(catalogue.parts(kind) == () for kind in KINDS)
    assert path.read_bytes() == b""
    with open_catalogue(path, write=True) as catalogue:
        catalogue.add(resistor("R1"))
    with open_catalogue(path) as catalogue:
        assert len(catalogue.parts("resistor")) == 1


def test_the_default_path(tmp_path: Path, monkeypatch: pytest.MonkeyPatch, resistor: Make) -> None:
    """Without a path the catalogue stands where SELECTOR_CATALOGUE says, else in the user's folder, made for it."""
    monkeypatch.setenv("SELECTOR_CATALOGUE", str(tmp_path / "named.db"))
    with open_catalogue(write=True) as catalogue:
        catalogue.add(resistor("R1"))
    assert (tmp_path / "named.db").exists()
    monkeypatch.delenv("SELECTOR_CATALOGUE")
    monkeypatch.setenv("XDG_DATA_HOME", str(tmp_path / "data"))
    with open_catalogue(write=True) as catalogue:
        catalogue.add(resistor("R1"))
    assert catalogue.path is not None
    assert tmp_path / "data" in catalogue.path.parents
    with open_catalogue() as catalogue:
        assert len(catalogue.parts("resistor")) == 1


@pytest.mark.parametrize("name", ["a b.db", "p?mode=ro#x.db", "%41.db", "file:x.db", "-x.db", "\udcff\n\x1b.db"])
def test_a_name_means_just_that_file(tmp_path: Path, name: str, resistor: Make) -> None:
    """Whatever characters a name has, the catalogue is made in the file of that name and no other."""
    path = tmp_path / name
    with open_catalogue(path, write=True) as catalogue:
        catalogue.add(resistor("R1"))
    assert list(tmp_path.iterdir()) == [path]
    with open_catalogue(path) as catalogue:
        assert len(catalogue.parts("resistor")) == 1


def test_a_relative_name(tmp_path: Path, monkeypatch: pytest.MonkeyPatch, resistor: Make) -> None:
    """A relative path is taken from the working folder."""
    monkeypatch.chdir(tmp_path)
    with open_catalogue(Path("x?y.db"), write=True) as catalogue:
        catalogue.add(resistor("R1"))
    assert [path.name for path in tmp_path.iterdir()] == ["x?y.db"]
