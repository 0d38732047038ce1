"""Designs as files give them."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path

import pytest

from selector.app.design import ReadDesign, read_design
from selector.catalogue import Catalogue
from selector.errors import InputRefused

Write = Callable[[str], Path]
FREE = 'shunts = ["S1"]\namplifier = "A-free"\ncommon = "R2"\ngain = ["R1"]\n'
FIXED = 'shunts = ["S1"]\namplifier = "A-fixed"\n'
IN_LINE = '{resistance = "1 kohm", tolerance = "1 %", tempco = "50 ppm/K"}'
OTHER = IN_LINE.replace("1 kohm", "3 kohm")


@pytest.fixture
def read(small: Catalogue, write: Write) -> Callable[[str], ReadDesign]:
    """Read a design from its text."""
    return lambda text: read_design(write(text), lambda: small)


def faults_of(read: Callable[[str], ReadDesign], text: str) -> list[str]:
    """Return what is said of a design that is refused."""
    with pytest.raises(InputRefused) as refused:
        read(text)
    return [str(fault) for fault in refused.value.faults]


def test_codes_are_parts_of_the_catalogue(read: Callable[[str], ReadDesign]) -> None:
    """A design by codes has the parts of the catalogue, none of them exempt from stock; its filter is open."""
    found = read(FREE)
    assert [place.part.part for place in found.design.places()] == ["S1", "A-free", "R2", "R1"]
    assert found.exempt == frozenset()
    assert (found.design.filter_resistor, found.design.filter_capacitor) == (None, None)


def test_a_code_alone_is_a_list_of_one(read: Callable[[str], ReadDesign]) -> None:
    """`shunts` and `gain` may be written without brackets."""
    assert read(FREE.replace('["S1"]', '"S1"').replace('["R1"]', '"R1"')).design == read(FREE).design


def test_in_line_parts_are_numbered_within_their_kind(read: Callable[[str], ReadDesign]) -> None:
    """Different tables without a name are told apart by number, equal ones are one part, and all are exempt."""
    text = f'shunts = "S1"\namplifier = "A-free"\ncommon = {IN_LINE}\ngain = [{OTHER}, {IN_LINE}]\nswitch = "W1"\n'
    text += 'filter_capacitor = {capacitance = "1 nF", tolerance = "5 %"}\n'
    found = read(text)
    assert found.design.common is not None
    assert found.design.common.part == "in-line"
    assert found.design.gain is not None
    assert [part.part for part in found.design.gain] == ["in-line 2", "in-line"]
    assert found.exempt == {("resistor", "in-line"), ("resistor", "in-line 2"), ("capacitor", "in-line")}
    assert found.design.uses()["resistor", "in-line"] == 2


def test_in_line_number_steps_over_names_in_use(read: Callable[[str], ReadDesign]) -> None:
    """A table that names itself `in-line` keeps the name, and one without a name gets the next number."""
    named = OTHER.replace("{", '{part = "in-line", ')
    found = read(f'shunts = "S1"\namplifier = "A-free"\ncommon = {IN_LINE}\ngain = {named}\n')
    assert [place.part.part for place in found.design.places()][2:] == ["in-line 2", "in-line"]


def test_in_line_part_of_a_used_code_is_refused(read: Callable[[str], ReadDesign]) -> None:
    """A table with the code of a catalogue part of the same design would make the two one line of the bill."""
    named = IN_LINE.replace("{", '{part = "R1", ')
    text = FREE.replace('common = "R2"', f"common = {named}")
    said = 'd.toml line 3, common: "R1" is also the code of another resistor of this design; '
    assert faults_of(read, text) == [f"{said}give the in-line part another name"]


def test_catalogue_is_opened_only_where_it_is_needed(write: Write) -> None:
    """A file whose keys are wrong is refused before a catalogue is looked for."""

    def opened() -> Catalogue:
        raise AssertionError

    with pytest.raises(InputRefused, match='unknown key "shunt"; did you mean "shunts"'):
        read_design(write('shunt = "S1"\namplifier = "A-fixed"'), opened)


def test_all_faults_come_at_once_in_the_order_of_their_lines(read: Callable[[str], ReadDesign]) -> None:
    """Unknown codes, wrong sorts and faulty figures of one file are told together."""
    text = 'shunts = ["S3"]\namplifier = "A-free"\ncommon = 7\ngain = [{resistance = "1 V", tolerance = "1 %"}]\n'
    places = [said.partition(":")[0] for said in faults_of(read, text)]
    assert places == [
        "d.toml line 1, shunts[1]",
        "d.toml line 3, common",
        "d.toml line 4, gain[1].resistance",
        "d.toml line 4, gain[1].tempco",
    ]


@pytest.mark.parametrize(
    ("text", "said"),
    [
        (FIXED + 'gain = "R1"', "A-fixed is fixed, which has no gain resistor"),
        (FIXED + 'common = "R1"', "A-fixed is fixed, which has no common resistor"),
        (FREE.replace('gain = ["R1"]', ""), "missing: A-free is non-inverting; name the resistor Rg of each range"),
        (FREE.replace('common = "R2"', ""), "missing: A-free is non-inverting; name the resistor Rf"),
        (FREE.replace('["R1"]', '["R1", "R2"]'), "missing: there are 2 ranges; name the switch that chooses one"),
        (FREE + 'switch = "W1"', "one range needs no switch"),
        (
            FREE.replace('["R1"]', '["R1", "R1", "R1", "R1", "R1"]') + 'switch = "W1"',
            "5 ranges; a design has at most 4",
        ),
        (FREE.replace('["S1"]', "[]"), "missing; write shunts"),
        (FREE.replace('["S1"]', '["S1", "S2"]'), "stacks and gain capacitors come with a later version"),
        (FREE + 'bypass = "B1"', "stacks and gain capacitors come with a later version"),
        (FREE + 'gain_capacitors = "C1"', "stacks and gain capacitors come with a later version"),
        ("[amplifier.deep]\nx = 1\n" + "", 'unknown field "deep"'),
        ("a = " + "[" * 5000, "nested too deep"),
        (".".join("a" * 40) + " = 1", "a key of 30 steps or more"),
        ("#" * 1_000_001, "is larger than 1 MB"),
        ("gain = 1979-05-27", "is neither a part code nor a table"),
    ],
    ids=lambda value: value[:20].split("\n")[0] if value.startswith(("shunts", "a", "#", "[")) else "",
)
def test_what_is_no_design_is_refused(text: str, said: str, read: Callable[[str], ReadDesign]) -> None:
    """A design that does not suit its amplifier's law, or that no parser should be given, is refused in words."""
    assert any(said in each for each in faults_of(read, text))


def test_gain_capacitors_may_be_an_empty_list(read: Callable[[str], ReadDesign]) -> None:
    """An empty list asks for nothing."""
    assert read(FREE + "gain_capacitors = []").design == read(FREE).design


def test_bytes_that_are_no_text_are_refused(small: Catalogue, tmp_path: Path) -> None:
    """A file that is not UTF-8 is refused with the line."""
    path = tmp_path / "d.toml"
    path.write_bytes(b"a = 1\n\xff\n")
    with pytest.raises(InputRefused, match=r"d\.toml line 2: is no UTF-8 text"):
        read_design(path, lambda: small)
