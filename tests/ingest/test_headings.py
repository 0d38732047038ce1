"""Headings: which field each names, in which unit, and what is said of those that name none."""

from __future__ import annotations

from collections.abc import Callable

import pytest

from selector.errors import InputRefused
from selector.ingest import MissingFields, StockFile
from selector.parts import KINDS, columns

Load = Callable[..., StockFile]

LACKING = "no column gives tolerance, tempco, which every resistor needs"
NO_CODE = "no column gives part, the code that every part needs"
NAMES = [
    ("tolerance", "tolerance", None),
    ("Tolerance", "tolerance", None),
    (" TOLERANCE ", "tolerance", None),
    ("Tolerance (%)", "tolerance", "%"),
    ("tolerance [%]", "tolerance", "%"),
    ("tolerance[%]", "tolerance", "%"),
    ("tolerance %", "tolerance", "%"),
    ("tempco ppm/K", "tempco", "ppm/K"),
    ("Tempco_ppm/K", "tempco", "ppm/K"),
    ("resistance [kOhm]", "resistance", "kOhm"),
    ("RESISTANCE (\u03a9)", "resistance", "\u03a9"),
    ("full power temp", "full_power_temp", None),
    ("Full-Power-Temp [degC]", "full_power_temp", "degC"),
    ("full power temp degC", "full_power_temp", "degC"),
    ("thermal_emf uV/K", "thermal_emf", "uV/K"),
    ("thermal\nemf", "thermal_emf", None),
    ("unit cost", "unit_cost", None),
    ("quantity (pcs)", "quantity", None),
    ("package (SMD)", "package", None),
]


@pytest.mark.parametrize(("heading", "field", "unit"), NAMES)
def test_a_heading_names_its_field(load: Load, heading: str, field: str, unit: str | None) -> None:
    """Case, blanks, hyphens and underscores do not count; a unit stands in brackets or behind a blank."""
    others = [name for name in ("part", "resistance", "tolerance", "tempco", "power") if name != field]
    file = load(f'"{heading}",{",".join(others)}\n', kind="shunt")
    column = file.columns[0]
    assert (column.heading, column.field, column.unit, column.matched) == (heading, field, unit, "exact")


def test_every_field_of_every_kind_is_a_heading(load: Load) -> None:
    """A file may have all fields of all kinds as headings, in the words of the interface."""
    names = list(dict.fromkeys(column.name for kind in KINDS for column in columns(kind)))
    file = load(",".join(("kind", *names)) + "\n")
    assert [column.field for column in file.columns] == ["kind", *names]


def test_units_of_headings_hold_for_bare_cells_alone(load: Load) -> None:
    """A bare number takes the heading's unit; a cell with a unit, or a letter code, has its own."""
    rows = "A,4.99,0.1,25\nB,4990 ohm,0.1 %,25 ppm/K\nC,4K99,B,0.0025 %/K\n"
    file = load(f"part,resistance [kOhm],Tolerance (%),tempco ppm/K\n{rows}", kind="resistor")
    figures = {(each["resistance"], each["tolerance"], each["tempco"]) for each in (p.model_dump() for p in file.parts)}
    assert (len(file.parts), figures) == (3, {(4990.0, 0.001, 25e-6)})


def test_a_bad_cell_shows_what_stands_in_the_file(load: Load) -> None:
    """The fault of a cell under a heading with a unit names the heading and the cell as it stands."""
    file = load(
        "part,resistance [kOhm],Tol [%],tempco\nA,4.99,abc,25 ppm/K\n", kind="resistor", headings={"Tol": "tolerance"}
    )
    assert [tuple(fault) for fault in file.refused[0].faults] == [
        ("Tol [%]", "abc", '"abc" is no fraction', "write it like 0.1 %")
    ]
    file = load("part,resistance [kOhm],tolerance [%],tempco\nA,4.99,150,25 ppm/K\n", kind="resistor")
    assert file.refused[0].faults[0].why == '"150 %" is too large'
    assert file.refused[0].faults[0].value == "150"


def test_unknown_headings_are_told_and_not_used(load: Load) -> None:
    """A heading that names no field is not used, and the field most like it is told."""
    file = load("part,resistance,tolerence,tolerance,tempco,Supplier,\nA,1k,9,1 %,50 ppm/K,me,x\n", kind="resistor")
    told = [(column.heading, column.field, column.matched, column.nearest, column.samples) for column in file.columns]
    assert told[2] == ("tolerence", None, None, "tolerance", ("9",))
    assert told[5] == ("Supplier", None, None, "", ("me",))
    assert told[6] == ("", None, None, "", ("x",))
    assert len(file.parts) == 1


def test_fields_of_other_kinds_are_not_used_with_one_kind(load: Load) -> None:
    """Where the kind is named for the whole file, a column of another kind's field is like any other not used."""
    file = load("part,capacitance,resistance,tolerance,tempco\nA,1n,1k,1 %,50 ppm/K\n", kind="resistor")
    assert (file.columns[1].field, len(file.parts)) == (None, 1)


def test_samples_are_the_first_three_cells(load: Load) -> None:
    """A column's samples are the first three cells that are not empty, cut where they are long."""
    rows = "".join(f"R{number},{text},1k,1 %,50 ppm/K\n" for number, text in enumerate(["", "a", "b" * 50, "c", "d"]))
    file = load(f"part,note,resistance,tolerance,tempco\n{rows}", kind="resistor")
    assert file.columns[1].samples == ("a", "b" * 40, "c")


def test_the_caller_decides_what_a_heading_means(load: Load) -> None:
    """A named heading gives the field named, unit and all; an empty field leaves the column out."""
    file = load(
        "Code;Wert [kOhm];TOL;tempco;resistance\nR1;4,99;0,1 %;25 ppm/K;rubbish\n",
        kind="resistor",
        headings={"code": "part", "Wert": "resistance", "Tol": "tolerance", "resistance": "", "Lager": "location"},
    )
    assert [(column.field, column.matched) for column in file.columns] == [
        ("part", "map"),
        ("resistance", "map"),
        ("tolerance", "map"),
        ("tempco", "exact"),
        (None, "map"),
    ]
    assert (file.parts[0].model_dump()["resistance"], file.not_mapped) == (4990.0, ("Lager",))
    assert (file.heading_of("resistance"), file.heading_of("package")) == ("Wert [kOhm]", "package")


def test_the_kind_column(load: Load) -> None:
    """Each row is of the kind in its cell, in any case; a kind named for the load must not be contradicted."""
    head = "part,Kind,resistance,tolerance,tempco\n"
    assert load(f"{head}R1,RESISTOR,1k,1 %,50 ppm/K\n").parts[0].kind == "resistor"
    file = load(f"{head}R1,,1k,1 %,50 ppm/K\nR2,shunt,1k,1 %,50 ppm/K\n", kind="resistor")
    assert [part.part for part in file.parts] == ["R1"]
    assert file.refused[0].faults[0].why == '"shunt" is not resistor, the kind named for this load'


@pytest.mark.parametrize(
    ("heading", "kind", "faults"),
    [
        (
            "part,resistance,tempco,Tempco [1/K],tolerance",
            "resistor",
            ['2 columns give tempco: "tempco" and "Tempco [1/K]"; keep one, or leave one out: --map "Tempco [1/K]="'],
        ),
        (
            "part,resistance [mV],tolerance [V],tempco",
            "resistor",
            [
                'column "resistance [mV]": "mV" is no unit of resistance; write it like resistance [ohm]',
                'column "tolerance [V]": "V" is no unit of tolerance; write it like tolerance [%]',
            ],
        ),
        (
            "part,resistance,colour",
            "resistor",
            [f'{LACKING}; add them, or say which column it is: --map "HEADING=tolerance"'],
        ),
        (
            "resistance,tolerance,tempco",
            None,
            [
                "no column gives the kind of part; add a column kind, or name it: --kind resistor",
                f'{NO_CODE}; head the column of your stock codes "part", or say which it is: --map "HEADING=part"',
            ],
        ),
        ("kind,kind,part", None, ['2 columns give kind: "kind" and "kind"; keep one, or leave one out: --map "kind="']),
    ],
)
def test_headings_that_will_not_do_refuse_the_file(
    load: Load, heading: str, kind: str | None, faults: list[str]
) -> None:
    """A file whose headings are doubled, of a wrong unit or too few is refused, with all of it at once."""
    with pytest.raises(InputRefused) as refused:
        load(f"{heading}\n1,2,3,4\n", kind=kind)
    told = [str(fault).split("stock.csv line 1", 1)[1].lstrip(":, ") for fault in refused.value.faults]
    assert told == faults


def test_missing_fields_read_as_a_sentence() -> None:
    """What a kind lacks is one sentence."""
    assert str(MissingFields("shunt", ("tempco", "power"))) == "no column gives tempco, power, which every shunt needs"
