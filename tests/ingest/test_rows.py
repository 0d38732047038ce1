"""Rows that are refused: each with its column, what was read, why and what would be right."""

from __future__ import annotations

from collections.abc import Callable

import pytest

from selector.ingest import StockFile

Load = Callable[..., StockFile]
Fault = tuple[str, str, str, str]

HEADING = "part,kind,resistance,tolerance,tempco,quantity,note,power\n"
KINDS = "write one of shunt, resistor, capacitor, amplifier, bypass, switch"
OHM = "write it like 4.7 kohm"

ROWS: list[tuple[str, list[Fault]]] = [
    ("R,resistor,abc,0.1 %,25 ppm/K,1,,", [("resistance", "abc", '"abc" is no resistance', OHM)]),
    ("R,resistor,4k99,1,25 ppm/K,1,,", [("tolerance", "1", '"1" has no unit', "write 1 % or F")]),
    ("R,resistor,4k99,0.1 %,25,1,,", [("tempco", "25", '"25" has no unit', "write it like 25 ppm/K")]),
    (
        "R,resistor,4k99,100 %,25 ppm/K,1,,",
        [("tolerance", "100 %", '"100 %" is too large', "tolerance must be below 100 %")],
    ),
    (
        "R,resistor,4k99,-0.1 %,25 ppm/K,1,,",
        [("tolerance", "-0.1 %", '"-0.1 %" is too small', "tolerance must be at least 0 %")],
    ),
    (
        "R,resistor,4k99,0.1 V,25 ppm/K,1,,",
        [("tolerance", "0.1 V", '"0.1 V" is a voltage', 'a fraction is wanted, for example "0.1 %"')],
    ),
    (
        "R,resistor,-5,0.1 %,25 ppm/K,1,,",
        [("resistance", "-5", '"-5" is too small', "resistance must be above 0 ohm")],
    ),
    ("R,resistor,0,0.1 %,25 ppm/K,1,,", [("resistance", "0", '"0" is too small', "resistance must be above 0 ohm")]),
    ("R,resistor,nan,0.1 %,25 ppm/K,1,,", [("resistance", "nan", '"nan" is no resistance', OHM)]),
    ("R,resistor,inf,0.1 %,25 ppm/K,1,,", [("resistance", "inf", '"inf" is no resistance', OHM)]),
    (
        "R,resistor,1e400,0.1 %,25 ppm/K,1,,",
        [("resistance", "1e400", '"1e400" is too large for any calculation', OHM)],
    ),
    (
        "R,resistor,1e-400,0.1 %,25 ppm/K,1,,",
        [("resistance", "1e-400", '"1e-400" is too small for any calculation', OHM)],
    ),
    (
        'R,resistor,"1,000",0.1 %,25 ppm/K,1,,',
        [("resistance", "1,000", '"1,000" can be 1 or 1000', "write the one that is meant")],
    ),
    (
        "R,resistor,100 mA,0.1 %,25 ppm/K,1,,",
        [("resistance", "100 mA", '"100 mA" is a current', 'a resistance is wanted, for example "4.7 kohm"')],
    ),
    (
        "R,resistor,100 quux,0.1 %,25 ppm/K,1,,",
        [("resistance", "100 quux", '"100 quux" has the unknown unit "quux"', OHM)],
    ),
    ("R,resistor,1_000,0.1 %,25 ppm/K,1,,", [("resistance", "1_000", '"1_000" is no resistance', OHM)]),
    (
        "R,resistor,\uff11\uff12,0.1 %,25 ppm/K,1,,",
        [
            (
                "resistance",
                "\uff11\uff12",
                '"\uff11\uff12" has the sign "\uff11", which is none of 0 to 9',
                OHM,
            )
        ],
    ),
    (
        "R,resistor,,0.1 %,25 ppm/K,1,,",
        [("resistance", "", "missing", "every resistor needs it, for example 4.7 kohm")],
    ),
    (",resistor,4k99,0.1 %,25 ppm/K,1,,", [("part", "", "missing", "every resistor needs it")]),
    ("R,,4k99,0.1 %,25 ppm/K,1,,", [("kind", "", "the kind of part is missing", KINDS)]),
    (
        "R,resistr,4k99,0.1 %,25 ppm/K,1,,",
        [("kind", "resistr", '"resistr" is no kind of part', 'did you mean "resistor"?')],
    ),
    ("R,widget,4k99,0.1 %,25 ppm/K,1,,", [("kind", "widget", '"widget" is no kind of part', KINDS)]),
    ("R,resistor,4k99,0.1 %,25 ppm/K,1.5,,", [("quantity", "1.5", '"1.5" is no whole number', "write it like 12")]),
    ("R,resistor,4k99,0.1 %,25 ppm/K,many,,", [("quantity", "many", '"many" is no whole number', "write it like 12")]),
    (
        "R,resistor,4k99,0.1 %,25 ppm/K,-1,,",
        [("quantity", "-1", '"-1" is too small', "quantity must be at least 0")],
    ),
    (
        "R,resistor,4k99,0.1 %,-25 ppm/K,1,,",
        [("tempco", "-25 ppm/K", '"-25 ppm/K" is too small', "tempco must be at least 0 ppm/K")],
    ),
    (
        "R,resistor,4k99,0.1 %,25 ppm/K,1,,,more",
        [("", "more", "has 9 cells where the heading line has 8", "put a cell that holds the delimiter in quotes")],
    ),
    (
        "R\u200b1,resistor,4k99,0.1 %,25 ppm/K,1,,",
        [("part", "R\u200b1", "the code holds U+200B, which cannot be seen", "leave it out")],
    ),
    (
        f"{'R' * 201},resistor,4k99,0.1 %,25 ppm/K,1,,",
        [("part", "R" * 200 + "...", "a code of 201 characters", "a code has at most 200")],
    ),
    (
        "R,resistor,4k99,0.1 %,25 ppm/K,1,a\x00b,",
        [("", "", "holds a NUL character", "take it out; it is no part of a text")],
    ),
    (
        f"R,resistor,4k99,0.1 %,25 ppm/K,1,{'x' * 10_001},",
        [("", "", "has a cell of more than 10000 characters (column 7)", "shorten it")],
    ),
    (
        f"R,resistor,4k99,0.1 %,25 ppm/K,1,{'x' * 140_000},",
        [("", "", "has a cell of more than 10000 characters", "shorten it")],
    ),
    (
        "R" + "," * 10_000,
        [("", "", "has more than 10000 columns", "see whether this is a stock file")],
    ),
    ("R,shunt,4k99,0.1 %,25 ppm/K,1,,", [("power", "", "missing", "every shunt needs it, for example 1/8 W")]),
    (
        "R,resistor,bad,bad,bad,bad,,bad",
        [
            ("quantity", "bad", '"bad" is no whole number', "write it like 12"),
            ("resistance", "bad", '"bad" is no resistance', OHM),
            ("tolerance", "bad", '"bad" is no fraction', "write it like 0.1 %"),
            ("tempco", "bad", '"bad" is no temperature coefficient', "write it like 25 ppm/K"),
            ("power", "bad", '"bad" is no power', "write it like 1/8 W"),
        ],
    ),
    (
        "R,capacitor,4k99,5 %,,1,,",
        [
            ("resistance", "4k99", "a capacitor has no resistance", "empty the cell"),
            (
                "",
                "",
                "no column gives capacitance, which every capacitor needs",
                "see: selector parts template capacitor",
            ),
        ],
    ),
]


@pytest.mark.parametrize(("row", "faults"), ROWS, ids=[row[:40] for row, _ in ROWS])
def test_a_bad_row_is_refused_with_all_its_faults(load: Load, row: str, faults: list[Fault]) -> None:
    """A row that cannot be read is refused with column, value, reason and remedy; the row before it loads."""
    file = load(f"{HEADING}G,resistor,1k,1 %,50 ppm/K,1,,\n{row}\n")
    assert [part.part for part in file.parts] == ["G"]
    assert [refused.line for refused in file.refused] == [3]
    assert [tuple(fault) for fault in file.refused[0].faults] == faults


def test_there_are_thirty_bad_rows() -> None:
    """The table above has at least 30 rows."""
    assert len(ROWS) >= 30


def test_missing_columns_are_one_message_for_each_kind(load: Load) -> None:
    """Rows of a kind for which columns are missing are refused, the kind is told once, the other kinds load."""
    file = load(HEADING + "".join(f"C{n},capacitor,,5 %,,1,,\n" for n in range(5)) + "R,resistor,1k,1 %,50 ppm/K,1,,\n")
    assert [str(each) for each in file.missing] == ["no column gives capacitance, which every capacitor needs"]
    assert ([part.part for part in file.parts], len(file.refused)) == (["R"], 5)


def test_rows_that_share_kind_and_code_are_all_refused(load: Load) -> None:
    """Rows of one kind and code are refused, all of them, however equal; the same code in another kind is not."""
    good = "resistor,1k,1 %,50 ppm/K,1,,\n"
    file = load(f"{HEADING}R1,{good}R2,{good}R1,{good} R1 ,{good}R1,shunt,1k,1 %,50 ppm/K,1,,1 W\n")
    assert [(part.kind, part.part) for part in file.parts] == [("resistor", "R2"), ("shunt", "R1")]
    assert [(row.line, row.faults[0].why) for row in file.refused] == [
        (2, "resistor R1 is also in line 4"),
        (4, "resistor R1 is also in line 2"),
        (5, "resistor R1 is also in line 2"),
    ]
    assert file.refused[1].faults[0][:2] == ("part", "R1")
    assert file.refused[1].faults[0].remedy == "keep one of the rows"


def test_a_row_that_shares_its_code_with_a_refused_one_is_refused(load: Load) -> None:
    """A good row whose code stands in a bad row too is refused: which one is meant cannot be told."""
    file = load(f"{HEADING}R1,resistor,1k,1 %,50 ppm/K,1,,\nR1,Resistor,bad,1 %,50 ppm/K,1,,\n")
    assert file.rows == ()
    assert [row.faults[0].why for row in file.refused] == [
        "resistor R1 is also in a row that is refused",
        '"bad" is no resistance',
    ]


def test_blank_rows_are_no_rows(load: Load) -> None:
    """Lines without text, and rows of empty cells, are passed over and counted nowhere."""
    file = load(f"\n  \n{HEADING}\n,,,,,,,\nR1,resistor,1k,1 %,50 ppm/K,1,,\n\r\n , ,\n")
    assert (len(file.rows), len(file.refused), file.read.heading_line, file.rows[0][0]) == (1, 0, 3, 6)


def test_a_short_row_has_empty_cells(load: Load) -> None:
    """Cells that a row lacks at its end are empty."""
    assert len(load(f"{HEADING}R1,resistor,1k,1 %,50 ppm/K\n").rows) == 1


def test_the_source_says_who_file_and_line(load: Load) -> None:
    """A part's source names who loaded it, the file and the line, unless the file itself gives a source."""
    row = "R1,resistor,1k,1 %,50 ppm/K,1,,\n"
    assert load(HEADING + row).parts[0].source == "stock.csv line 2"
    assert load(HEADING + row, who="ada").parts[0].source == "ada, stock.csv line 2"
    own = load("part,source,resistance,tolerance,tempco\nR1,drawer list,1k,1 %,50 ppm/K\n", kind="resistor", who="ada")
    assert own.parts[0].source == "drawer list"


def test_a_guard_is_taken_off_once(load: Load) -> None:
    """One `'` before a cell that starts like a formula is taken off, and no other."""
    head = "part,description,note,location,resistance,tolerance,tempco\n"
    part = load(f"{head}'=R1,''-x,'plain,=1,1k,1 %,50 ppm/K\n", kind="resistor").parts[0]
    assert (part.part, part.description, part.note, part.location) == ("=R1", "'-x", "'plain", "=1")


QUOTED = "part,note,resistance,tolerance,tempco\n"


def test_a_cell_over_several_lines(load: Load) -> None:
    """A cell in quotes may hold line ends, delimiters and doubled quotes; lines are counted on."""
    file = load(QUOTED + 'R1,"a\r\nb, ""c""\rd",1k,1 %,50 ppm/K\nR2,x,1k,1 %,50 ppm/K\n', kind="resistor")
    assert [(line, part.note) for line, part in file.rows] == [(2, 'a\r\nb, "c"\rd'), (5, "x")]


@pytest.mark.parametrize("lines", [3, 49, 51, 120])
def test_a_quote_that_stays_open_costs_one_row(load: Load, lines: int) -> None:
    """A row whose quote is never closed is refused alone; all rows behind it load."""
    rest = "".join(f"R{number},x,1k,1 %,50 ppm/K\n" for number in range(lines))
    file = load(f'{QUOTED}B,"open,1k,1 %,50 ppm/K\n{rest}', kind="resistor")
    assert len(file.rows) == lines
    assert [(row.line, row.cells[:2]) for row in file.refused] == [(2, ("B", '"open'))]
    why = "a quote swallows more than 50 lines" if lines > 50 else "a quote is not closed before the file ends"
    assert file.refused[0].faults[0].why == why


def test_a_quote_closed_by_another_rows_quote_costs_one_row(load: Load) -> None:
    """A quote that ends at the next quote some rows on does not swallow the rows between."""
    rest = "".join(f"R{number},x,1k,1 %,50 ppm/K\n" for number in range(5))
    file = load(f'{QUOTED}B,"open,1k,1 %,50 ppm/K\n{rest}C,"closed",1k,1 %,50 ppm/K\n', kind="resistor")
    assert [part.part for part in file.parts] == [f"R{number}" for number in range(5)] + ["C"]
    assert file.refused[0].faults[0].why == "a quote stays open at the end of its line"
