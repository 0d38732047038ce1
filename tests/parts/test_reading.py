"""Parts from cells and back."""

from __future__ import annotations

import tomllib
from pathlib import Path

import pytest
from hypothesis import given
from hypothesis import strategies as st
from pydantic import ValidationError

from selector.gain import LAWS
from selector.parts import KINDS, Amplifier, Column, Part, Resistor, Shunt, cells_of, columns, kind_of, read_part

GOOD = tomllib.loads((Path(__file__).parent / "good_parts.toml").read_text(encoding="utf-8"))
FIGURES = {figure for law in LAWS.values() for figure in law.figures}
# The upper and the lower of two fields that must not cross.
ORDERED = (
    ("zero_power_temp", "full_power_temp"),
    ("supply_max", "supply_min"),
    ("temp_max", "temp_min"),
    ("resistance_max", "resistance_min"),
    ("common_mode_max", "common_mode_min"),
)
TEXT = st.text(st.characters(categories=["Lu", "Ll", "Nd", "Po", "Pd", "Sm"]), min_size=1, max_size=20)


def value_of(column: Column) -> st.SearchStrategy[object]:
    """Return what draws a value that a field takes."""
    if column.choices:
        return st.sampled_from(column.choices)
    if column.sort == "text":
        return TEXT
    if column.sort == "flag":
        return st.booleans()
    if column.sort == "names":
        return st.lists(st.sampled_from(["part", "note", "quantity"]), unique=True).map(tuple)
    if column.whole:
        return st.integers(int(column.least or 0), 10**9)
    low = column.least if column.least is not None else column.above
    high = column.below if column.most is None else column.most
    return st.floats(low, high, exclude_min=column.least is None, exclude_max=column.most is None)


@st.composite
def parts(draw: st.DrawFn, kind: str) -> Part:
    """Draw a part of a kind with any fields stated."""
    fields: dict[str, object] = {}
    for column in columns(kind):
        if column.required or draw(st.booleans()):
            fields[column.name] = draw(value_of(column))
    for upper, lower in ORDERED:
        if upper in fields or lower in fields:
            fields[lower], fields[upper] = sorted([draw(st.floats(1, 50)), draw(st.floats(51, 100))])
    if kind == "amplifier":
        law = LAWS[str(fields["gain_law"])]
        fields = {name: value for name, value in fields.items() if name not in FIGURES}
        fields |= {figure: draw(st.floats(1e-6, 1e6)) for figure in law.figures}
        fields["gain_capacitor"] = bool(fields.get("buffered")) and law.takes_gain_capacitor
    return KINDS[kind].model_validate(fields)


@pytest.mark.parametrize("kind", KINDS)
@given(data=st.data())
def test_cells_make_the_same_part_again(kind: str, data: st.DataObject) -> None:
    """A part written as cells and read again is the part, bit for bit, also by the rule of stock files."""
    part = data.draw(parts(kind))
    cells = cells_of(part)
    assert read_part(kind, cells, where="") == part
    assert read_part(kind, cells, where="", bare=False) == part


def test_cells_hold_what_is_stated() -> None:
    """Cells are the required fields and those that differ from their defaults, with units."""
    part = Shunt(part="S-1", resistance=0.05, tolerance=0.01, tempco=5e-5, power=1.0, terminals=4, generic=True)
    assert cells_of(part) == {
        "part": "S-1",
        "resistance": "50 mohm",
        "tolerance": "1 %",
        "tempco": "50 ppm/K",
        "power": "1 W",
        "terminals": "4",
        "generic": "yes",
    }


def test_cells_leave_out_what_follows_from_the_dielectric() -> None:
    """A temperature change that the dielectric code gives is no cell, so that another code changes it."""
    part = read_part("capacitor", GOOD["capacitor"], where="")
    assert "temp_change" not in cells_of(part)
    assert read_part("capacitor", cells_of(part) | {"dielectric": "Y5V"}, where="").temp_change == 0.82


@pytest.mark.parametrize("kind", KINDS)
def test_a_part_knows_its_kind(kind: str) -> None:
    """The kind of a part that was read as one is that kind."""
    assert kind_of(read_part(kind, GOOD[kind], where="")) == kind


@pytest.mark.parametrize("law", LAWS)
def test_each_law_needs_its_own_figures(law: str) -> None:
    """An amplifier with just the figures of its law is a part, whatever the law."""
    cells = GOOD["amplifier"] | {"gain_law": law} | dict.fromkeys(LAWS[law].figures, "2")
    assert read_part("amplifier", cells, where="").gain_law == law


def test_a_gain_base_is_one_unless_stated() -> None:
    """A one-resistor amplifier need not state its gain without a resistor."""
    cells = GOOD["amplifier"] | {"gain_law": "one-resistor", "gain_resistance": "50 kohm"}
    assert read_part("amplifier", cells, where="").gain_base == 1.0


@pytest.mark.parametrize("kind", KINDS)
def test_bare_numbers_are_in_the_units_of_the_interface(kind: str) -> None:
    """A number is taken in the field's own unit: SI, degC, dB and fractions."""
    part = read_part(kind, GOOD[kind], where="")
    cells = {
        name: getattr(part, name) if column.sort == "quantity" else GOOD[kind][name]
        for column in columns(kind)
        for name in [column.name]
        if name in GOOD[kind]
    }
    assert read_part(kind, cells, where="") == part


@pytest.mark.parametrize(
    ("cell", "value"),
    [("yes", True), ("No", False), ("TRUE", True), ("0", False), (1, True), (False, False), (1.0, True), ("", False)],
)
def test_flags_are_read_as_people_write_them(cell: object, value: bool) -> None:  # noqa: FBT001 - an expected value
    """A flag is yes, no, true, false, 1 or 0 in any case; an empty cell is the default."""
    assert read_part("resistor", GOOD["resistor"] | {"generic": cell}, where="").generic is value


@pytest.mark.parametrize("cell", ["tolerance, tempco", "tolerance tempco", "tolerance;tempco,tolerance"])
def test_names_are_read_with_any_mark_between(cell: str) -> None:
    """Names of fields stand with commas, semicolons or blanks between, each counted once."""
    part = read_part("resistor", GOOD["resistor"] | {"typical": cell}, where="")
    assert part.typical == ("tolerance", "tempco")


@pytest.mark.parametrize(("cell", "text"), [(805, "805"), (805.0, "805"), (" 0805 ", "0805"), (1.5, "1.5")])
def test_text_may_come_as_a_number(cell: object, text: str) -> None:
    """A package that a spreadsheet holds as a number is text."""
    assert read_part("resistor", GOOD["resistor"] | {"package": cell}, where="").package == text


def test_the_law_may_be_written_with_blanks() -> None:
    """Case, blanks and underscores in the name of a law do not count."""
    assert read_part("amplifier", GOOD["amplifier"] | {"gain_law": "Non_Inverting"}, where="").gain_law in LAWS


def test_an_absent_offset_current_is_the_bias_current() -> None:
    """What stands for an absent offset current is the bias current; a stated 0 stands."""
    absent = read_part("amplifier", GOOD["amplifier"], where="")
    stated = read_part("amplifier", GOOD["amplifier"] | {"offset_current": "0 A"}, where="")
    assert isinstance(absent, Amplifier)
    assert isinstance(stated, Amplifier)
    assert (absent.offset_current, absent.offset_current_a) == (None, 1e-9)
    assert stated.offset_current_a == 0.0


def test_a_part_needs_neither_bandwidth_nor_top_of_the_common_mode() -> None:
    """A figure whose absence is a limit of the search is no fault of the part."""
    part = read_part("amplifier", GOOD["amplifier"], where="")
    assert (part.bandwidth, part.gain_bandwidth, part.common_mode_max, part.common_mode_top_gap) == (None,) * 4


def test_the_model_itself_holds_bounds_and_rules() -> None:
    """Whoever builds a part without reading it meets the same bounds, rules and code cleaning."""
    with pytest.raises(ValidationError, match="must be above 0 ohm"):
        Resistor(part="R", resistance=0.0, tolerance=0.01, tempco=0.0)
    with pytest.raises(ValidationError, match="zero_power_temp"):
        Shunt(part="S", resistance=1, tolerance=0, tempco=0, power=1, full_power_temp=155)
    with pytest.raises(ValidationError, match="cannot be seen"):
        Resistor(part="R\u200b1", resistance=1.0, tolerance=0.01, tempco=0.0)
    assert Resistor(part=" R ", resistance=1, tolerance=0.01, tempco=0).part == "R"


def test_a_part_is_frozen_and_can_be_hashed() -> None:
    """Equal parts have one hash, and no field can be set."""
    one, other = (read_part("shunt", GOOD["shunt"], where="") for _ in range(2))
    assert hash(one) == hash(other)
    with pytest.raises(ValidationError, match="frozen"):
        one.note = "x"
