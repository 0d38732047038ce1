"""Bad parts and the exact sentence each of them is answered with."""

from __future__ import annotations

import tomllib
from pathlib import Path

import pytest

from selector.errors import InputRefused
from selector.parts import KINDS, read_part

HERE = Path(__file__).parent
GOOD = tomllib.loads((HERE / "good_parts.toml").read_text(encoding="utf-8"))
BAD = tomllib.loads((HERE / "bad_parts.toml").read_text(encoding="utf-8"))["bad"]


def faults(kind: str, cells: dict[str, object], *, bare: bool = True) -> list[str]:
    """Return the messages with which a part is refused."""
    with pytest.raises(InputRefused) as refused:
        read_part(kind, cells, where="stock.csv line 14", bare=bare)
    return [str(fault) for fault in refused.value.faults]


@pytest.mark.parametrize("bad", BAD, ids=lambda bad: f"{bad['kind']} {bad['put']}"[:40])
def test_each_bad_field_is_answered_with_its_sentence(bad: dict[str, str]) -> None:
    """A bad field is refused with its place, its name, what was read and what would be right, and with nothing else."""
    cells = GOOD[bad["kind"]] | tomllib.loads(bad["put"])
    assert faults(bad["kind"], cells) == bad["says"].splitlines()


@pytest.mark.parametrize("kind", KINDS)
def test_an_empty_part_misses_every_required_field(kind: str) -> None:
    """All that is missing is said at once."""
    required = [name for name in GOOD[kind] if name != "dielectric"]
    assert [fault.split(": ")[0].split(", ")[1] for fault in faults(kind, {})] == required


def test_all_faults_come_at_once() -> None:
    """Unknown fields, unreadable ones and those that cannot stand together are said in one go."""
    cells = GOOD["amplifier"] | {"gian": 2, "offset": "x", "supply_max": "1 V", "gain_law": "fixed"}
    assert [fault.split(": ")[0] for fault in faults("amplifier", cells)] == [
        "stock.csv line 14",
        "stock.csv line 14, offset",
        "stock.csv line 14, gain",
        "stock.csv line 14, supply_max",
    ]


def test_a_field_that_could_not_be_read_has_one_fault() -> None:
    """A rule over two fields is passed over where one of them is itself refused."""
    cells = GOOD["amplifier"] | {"supply_max": "1 A", "gain_law": "one-resistor", "gain_resistance": "x"}
    assert len(faults("amplifier", cells)) == 2


def test_a_gain_capacitor_needs_a_buffer() -> None:
    """Only a buffered part of a law that takes one may have a gain capacitor."""
    cells = GOOD["amplifier"] | {"gain_law": "two-resistor", "gain_factor": 2, "gain_capacitor": "yes"}
    assert faults("amplifier", cells) == [
        "stock.csv line 14, gain_capacitor: yes without buffered; only a buffered part takes one; set buffered = yes"
    ]
    assert read_part("amplifier", cells | {"buffered": "yes"}, where="").part == "AMP-Z3"


@pytest.mark.parametrize(
    ("field", "text", "said"),
    [
        ("tolerance", "1", '"1" has no unit; write 1 % or F'),
        ("tempco", "50", '"50" has no unit; write it like 25 ppm/K'),
        ("drift", "0.1", '"0.1" has no unit; write 0.1 % or B'),
        ("inductance", "3", '"3" has no unit; write it like 5 nH'),
    ],
)
def test_a_stock_file_states_units_where_several_are_in_use(field: str, text: str, said: str) -> None:
    """A bare number is refused by the stock-file rule for fractions, 1/K and all else with more than one unit."""
    assert faults("shunt", GOOD["shunt"] | {field: text}, bare=False) == [f"stock.csv line 14, {field}: {said}"]


@pytest.mark.parametrize(("field", "text", "value"), [("resistance", "0.82", 0.82), ("power", "0.25", 0.25)])
def test_a_stock_file_may_leave_out_the_one_unit_in_use(field: str, text: str, value: float) -> None:
    """A bare number is taken by the stock-file rule where one unit is in use."""
    assert getattr(read_part("shunt", GOOD["shunt"] | {field: text}, where="", bare=False), field) == value


def test_a_field_name_without_end_is_cut() -> None:
    """What is said of a field name of a million characters is short."""
    (fault,) = faults("shunt", GOOD["shunt"] | {"x" * 1_000_000: "1"})
    assert len(fault) < 600
