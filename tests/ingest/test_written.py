"""What is written loads again: parts, rejects, templates."""

from __future__ import annotations

import csv
import io
from collections.abc import Callable
from pathlib import Path

import pytest
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st

from selector.errors import InputRefused, UsageRefused
from selector.gain import LAWS
from selector.ingest import (
    CellFault,
    RefusedRow,
    RefusedRows,
    StockFile,
    read_stock,
    refusing_shared,
    rejects_text,
    stock_csv,
    template,
)
from selector.parts import KINDS, Column, Part, columns

Load = Callable[..., StockFile]

TEXT = st.text(st.characters(exclude_characters="\x00", exclude_categories=["Cs"]), max_size=20)
CODE = st.text(st.characters(categories=["L", "N", "P", "S"], max_codepoint=0x2FF), min_size=1, max_size=12)
CODE_LIKE_A_FORMULA = st.sampled_from(["=1+1", "-x", "@a", "+b", "'=c", "''-d", "'e", "-5", "1,5", 'a"b', "a;b"])
SMALLEST = 1e-300


def figures(column: Column) -> st.SearchStrategy[float | int]:
    """Return figures that a column takes."""
    low = column.least if column.least is not None else column.above if column.above is not None else -1e14
    high = min(bound for bound in (column.below, column.most, 1e14) if bound is not None)
    if column.whole:
        return st.integers(int(low), 10**6)
    floats = st.floats(max(low, -1e14), high, exclude_min=column.least is None, exclude_max=True)
    return floats.filter(lambda figure: figure == 0 or abs(figure) > SMALLEST).map(lambda figure: figure + 0.0)


def values(column: Column) -> st.SearchStrategy[object]:
    """Return values that a column takes."""
    if column.name == "part":
        return CODE | CODE_LIKE_A_FORMULA
    if column.choices:
        return st.sampled_from(column.choices)
    return {
        "flag": st.booleans(),
        "names": st.just(()),
        "text": TEXT.map(str.strip),
        "quantity": figures(column) if column.quantity is not None else st.none(),
    }[column.sort]


@st.composite
def parts(draw: st.DrawFn) -> Part:
    """Draw a part of any kind; figures that cannot stand together are drawn again."""
    kind = draw(st.sampled_from(list(KINDS)))
    given_fields: dict[str, object] = {}
    for column in columns(kind):
        if column.required or (column.name not in ("source", "currency") and draw(st.booleans())):
            given_fields[column.name] = draw(values(column))
    given_fields["source"] = draw(TEXT.map(str.strip).filter(bool))
    law = LAWS.get(str(given_fields.get("gain_law")))
    if law is not None:
        for figure in {name for each in LAWS.values() for name in each.figures}:
            given_fields.pop(figure, None)
        given_fields |= dict.fromkeys(law.figures, 2.0) | {"gain_capacitor": False}
    for low, high in (("supply_min", "supply_max"), ("temp_min", "temp_max"), ("full_power_temp", "zero_power_temp")):
        if low in given_fields or high in given_fields:
            given_fields |= {low: 1.5, high: 1.5 + draw(st.integers(1, 100))}
    given_fields |= {name: None for name in ("common_mode_max", "resistance_max") if name in given_fields}
    return KINDS[kind](**given_fields)


@given(st.lists(parts(), max_size=5, unique_by=lambda part: (part.kind, part.part.strip())))
@settings(max_examples=150, deadline=None, suppress_health_check=list(HealthCheck))
def test_parts_written_load_again_unchanged(tmp_path: Path, drawn: list[Part]) -> None:
    """Parts of several kinds written as a stock file and read again are the same, field for field and bit for bit."""
    path = tmp_path / "list.csv"
    path.write_bytes(stock_csv(drawn).encode("utf-8"))
    file = read_stock(path)
    assert len(file.refused) == 0
    assert list(file.parts) == drawn
    assert stock_csv(file.parts) == stock_csv(drawn)


def test_a_list_of_no_parts_is_a_stock_file(load: Load) -> None:
    """The list of an empty catalogue loads: no part, no refusal."""
    file = load(stock_csv([]))
    assert (file.rows, len(file.refused)) == ((), 0)


def test_figures_that_may_be_negative_are_plain_numbers(load: Load) -> None:
    """Only what may be negative has its unit in the heading; no cell of figures gets a guard."""
    text = stock_csv(load(template("amplifier")).parts)
    rows = list(csv.reader(io.StringIO(text, newline="")))
    assert [name for name in rows[0] if "[" in name] == ["common_mode_min [V]", "temp_min [degC]", "temp_max [degC]"]
    assert not any(cell.startswith("'") for row in rows for cell in row)
    assert rows[1][rows[0].index("temp_min [degC]")] == "-40.0"


@pytest.mark.parametrize("kind", KINDS)
def test_a_template_loads(load: Load, kind: str) -> None:
    """The template of each kind loads without a refusal, has every field that is filled by hand, and an example."""
    text = template(kind)
    file = load(text)
    assert (len(file.refused), [column.heading for column in file.columns if column.field is None]) == (0, [])
    by_hand = {column.name for column in columns(kind)} - {"source", "generic", "typical", "assumed"}
    assert {column.field for column in file.columns} == {"kind", *by_hand}
    assert len(file.parts) >= 1
    assert {part.kind for part in file.parts} == {kind}
    assert load(text, kind=kind).parts == file.parts


def test_the_template_of_amplifiers_shows_every_gain_law(load: Load) -> None:
    """There is one example of each gain law, in the order of the laws."""
    assert [part.model_dump()["gain_law"] for part in load(template("amplifier")).parts] == list(LAWS)


def test_a_template_of_no_kind_is_wrong_usage() -> None:
    """A kind that there is not is refused with the nearest one."""
    with pytest.raises(UsageRefused, match='"ampliflier" is no kind of part; did you mean "amplifier"'):
        template("ampliflier")


BAD = (
    "part;kind;resistance [kOhm];Bin;tolerance;tempco\n"
    "R1;resistor;bad;=A1;0,1 %;bad\n"
    "R2;resistor;4,99;B2;0,1 %;25 ppm/K\n"
    "'=R3;resistor;4,99;B3;1;25 ppm/K\n"
    "R4;resistor;4,99;B4;0,1 %;25 ppm/K;too much\n"
)


def test_rejects_hold_the_rows_as_they_stood(load: Load) -> None:
    """The rejects file has the cells of each refused row, and line, columns, reasons and remedies behind them."""
    rows = list(csv.reader(io.StringIO(rejects_text(load(BAD)), newline="")))
    assert rows == [
        ["part", "kind", "resistance [kOhm]", "Bin", "tolerance", "tempco", "line", "column", "why", "remedy"],
        [
            *("R1", "resistor", "bad", "'=A1", "0,1 %", "bad"),
            *("2", "resistance [kOhm]; tempco"),
            'resistance [kOhm]: "bad" is no resistance; tempco: "bad" is no temperature coefficient',
            "write it like 4.7 kohm; write it like 25 ppm/K",
        ],
        [
            *("'=R3", "resistor", "4,99", "B3", "1", "25 ppm/K"),
            *("4", "tolerance", 'tolerance: "1" has no unit', "write 1 % or F"),
        ],
        [
            *("R4", "resistor", "4,99", "B4", "0,1 %", "25 ppm/K", "5", ""),
            "has 7 cells where the heading line has 6",
            "put a cell that holds the delimiter in quotes",
            "too much",
        ],
    ]


def test_mended_rejects_load(load: Load) -> None:
    """A rejects file loads once it is mended; until then it is refused again, with no more columns."""
    first = rejects_text(load(BAD))
    again = load(first)
    assert (len(again.rows), len(again.refused)) == (0, 3)
    assert [row[:6] + row[7:] for row in csv.reader(io.StringIO(rejects_text(again), newline=""))][1:3] == [
        row[:6] + row[7:] for row in csv.reader(io.StringIO(first, newline=""))
    ][1:3]
    assert len(next(csv.reader(io.StringIO(rejects_text(again), newline="")))) == 10
    mended = first.replace(",bad,", ",1k,", 1).replace(",bad,", ",9 ppm/K,", 1).replace(",1,25", ",1 %,25")
    file = load(mended.replace(",too much", ""))
    assert [part.part for part in file.parts] == ["R1", "=R3", "R4"]
    assert len(file.refused) == 0


def test_rejects_of_several_files_share_their_columns(load: Load) -> None:
    """The rejects of files with other headings are one file: each heading once, equal ones of one file kept apart."""
    one = load("part,kind,resistance,tolerance,tempco,x,x\nR1,resistor,bad,1 %,25 ppm/K,1,2\n")
    two = load("kind,part,capacitance,tolerance,x\ncapacitor,C1,bad,1 %,3\n")
    none = load("part,kind,color\n")
    rows = [row[:9] for row in csv.reader(io.StringIO(rejects_text(one, none, two), newline=""))]
    assert rows == [
        ["part", "kind", "resistance", "tolerance", "tempco", "x", "x", "capacitance", "line"],
        ["R1", "resistor", "bad", "1 %", "25 ppm/K", "1", "2", "", "2"],
        ["C1", "capacitor", "", "1 %", "", "3", "", "bad", "2"],
    ]


def test_rows_that_the_catalogue_refuses_join_the_rejects(load: Load) -> None:
    """A row refused later, for a conflict with the catalogue, stands in the rejects as it stood in the file."""
    file = load(BAD)
    fault = CellFault(file.heading_of("resistance"), "4,99", "the catalogue has 5 kohm", "load it with --replace")
    later = file.refusing({("resistor", "R2"): [fault], ("shunt", "R2"): []})
    assert (later.rows, [row.line for row in later.refused]) == ((), [2, 3, 4, 5])
    assert later.refused[1] == RefusedRow(3, ("R2", "resistor", "4,99", "B2", "0,1 %", "25 ppm/K"), (fault,))
    assert file.refusing({("shunt", "R2"): [fault]}) is file


def test_rows_shared_by_two_files_are_refused_in_both(tmp_path: Path) -> None:
    """In one load of several files a kind and code may stand once; each row names where the others are."""
    files = []
    for name, codes in (("a.csv", "123"), ("b.csv", "34"), ("c.csv", "53")):
        path = tmp_path / name
        rows = "".join(f"R{code},1k,1 %,50 ppm/K\n" for code in codes)
        path.write_text(f"part,resistance,tolerance,tempco\n{rows}", encoding="utf-8")
        files.append(read_stock(path, kind="resistor"))
    first, second, third = refusing_shared(files)
    assert [[part.part for part in file.parts] for file in (first, second, third)] == [["R1", "R2"], ["R4"], ["R5"]]
    assert first.refused[0].faults[0].why == "resistor R3 is also in b.csv line 2, c.csv line 3"
    assert third.refused[0].faults[0].why == "resistor R3 is also in a.csv line 4, b.csv line 2"


def test_very_many_refused_rows_come_back_in_order() -> None:
    """Refused rows beyond those held in memory come back from the temporary file, in the order of their lines."""
    rows = [RefusedRow(line, (f"R{line}", "\u03a9"), (CellFault("a", "b", "c", "d"),)) for line in range(12_000)]
    kept = RefusedRows(rows[6000:])
    for row in rows[:6000]:
        kept.add(row)
    assert len(kept) == 12_000
    assert list(kept) == rows
    assert (kept[0], kept[-1], kept[5999:6002]) == (rows[0], rows[-1], tuple(rows[5999:6002]))
    assert len(kept.joined([RefusedRow(3, (), ())])) == 12_001
    with pytest.raises(IndexError):
        kept[12_000]


def test_a_refused_file_has_no_rows_to_write(load: Load) -> None:
    """A file without refused rows has rejects of a heading line alone, and one that is refused whole has none."""
    assert rejects_text(load("part,kind,note\n")).splitlines() == ["line,column,why,remedy"]
    with pytest.raises(InputRefused):
        load("note\n")
