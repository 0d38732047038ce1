"""Rows read many at once: the same parts and the same refused rows as when each is read by itself."""

from __future__ import annotations

from collections.abc import Callable, Iterator
from dataclasses import dataclass

import pytest
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st

from selector.errors import InputRefused
from selector.guard import unguarded
from selector.ingest import RefusedRow, StockFile, known
from selector.ingest.accepted import Accepted, Piece, Spool
from selector.ingest.known import known_of
from selector.ingest.lines import Lines
from selector.ingest.quick import Quick
from selector.ingest.rows import PlainRows
from selector.parts import KINDS, Column, columns, plain_value, read_cell
from selector.units import QUANTITIES, QuantityError, parse, plain_power

Load = Callable[..., StockFile]

CELLS: dict[str, tuple[str, ...]] = {
    "part": ("R1", " R1 ", "r-2", "'=R3", "'R4", "=R5", "\u00c4-1", "A\u030a", "R\u00a06", "R\u200b7", "", "R" * 201),
    "kind": ("resistor", "Resistor ", "shunt", "capacitor", "", "resistr"),
    "resistance": (
        "1k",
        "4.99",
        "4k99",
        "0",
        "-5",
        "1e400",
        "1,000",
        "0.0000000000000000001",
        "1000000000000000",
        "007",
    ),
    "capacitance": ("1u", "100 nF", "4.7", ""),
    "tolerance": ("0.1", "0.1 %", "F", "1", "100", "100 %", "0", ""),
    "tempco": ("25", "25 ppm/K", "50ppm", "-25", "0"),
    "power": ("1/8", "0.25", "1/8 W", "", "0"),
    "zero_power_temp": ("155", "60", "-20 degC", ""),
    "quantity": ("0", "12", "1.5", "-1", "many", "", "1000000000000000"),
    "unit_cost": ("0.10", "0,1", "0", "", "free"),
    "dielectric": ("X7R", "C0G", "film", ""),
    "temp_change": ("15 %", ""),
    "generic": ("yes", "no", "1", "maybe", ""),
    "typical": ("tolerance", "tolerance, power", "nothing", ""),
    "note": ("", "a b", 'say "x"', "two\nlines", "a, b", "\x1b", "  "),
    "source": ("drawer", "", " "),
    "terminals": ("2", "4", "3", ""),
}
GOOD = {"kind": "resistor", "resistance": "4.99", "tolerance": "0.1 %", "tempco": "25 ppm/K"}
UNITS = {"resistance": ("", " [ohm]", " [kohm]"), "tolerance": ("", " [%]"), "tempco": ("", " [ppm/K]")}


@dataclass(frozen=True)
class Outcome:
    """All that a stock file was read as."""

    accepted: list[Accepted]
    refused: list[RefusedRow]
    samples: list[tuple[str, ...]]


def outcome(file: StockFile) -> Outcome:
    """Return a stock file's rows, taken and refused, in a form to be compared."""
    accepted = [row._replace(cells=tuple(row.cells)) for row in file.accepted]
    return Outcome(accepted, list(file.refused), [column.samples for column in file.columns])


def none_at_once(_quick: Quick, rows: PlainRows) -> Iterator[Piece]:
    """Leave every row to be judged by itself."""
    yield Piece("", rows.lines, (), rows.cells)


@st.composite
def stock(draw: st.DrawFn) -> str:
    """Return a stock file with good cells, odd ones, and rows too long and too short."""
    names = draw(st.lists(st.sampled_from(sorted(CELLS)), unique=True, min_size=3))
    names = list(dict.fromkeys(["part", *draw(st.permutations([*GOOD, *names]))]))
    heads = [name + draw(st.sampled_from(UNITS.get(name, ("",)))) for name in names]
    likely = [st.just(GOOD.get(name, "")) | st.sampled_from(CELLS[name]) | st.text(max_size=4) for name in names]
    good = [st.integers(1, 99).map("R{}".format), *(st.just(GOOD.get(name, "")) for name in names[1:])]
    rows = draw(st.lists(st.tuples(*good) | st.tuples(*likely), min_size=1, max_size=8))
    lengths = [draw(st.sampled_from((0, 0, 0, 0, 1, -1))) for _ in rows]
    ragged = [(*row, *["x"] * more) if more >= 0 else row[:more] for row, more in zip(rows, lengths, strict=True)]
    end = draw(st.sampled_from(("\n", "\r\n")))
    quoting = draw(st.booleans())
    return "".join(",".join(_cell(cell, quoting=quoting) for cell in row) + end for row in (heads, *ragged))


def _cell(text: str, *, quoting: bool) -> str:
    """Return a cell as a program writes it, in quotes where need be, or the bare text of somebody careless."""
    return '"' + text.replace('"', '""') + '"' if quoting and (set(text) & set(',"\r\n') or len(text) % 2) else text


@given(text=stock())
@settings(max_examples=300, deadline=None, suppress_health_check=[HealthCheck.function_scoped_fixture])
def test_many_at_once_are_read_as_one_by_one(load: Load, text: str) -> None:
    """Whatever stands in a file, each row becomes the same part or is refused for the same faults, either way."""
    content = text.encode("utf-8", "surrogatepass")
    ways = []
    for change in ((), ((Quick, "pieces", none_at_once),), ((Lines, "block", lambda _lines: None),)):
        with pytest.MonkeyPatch.context() as patch:
            for target, name, value in change:
                patch.setattr(target, name, value)
            ways.append(_read_or_refused(load, content))
    assert ways[1:] == ways[:1] * 2


def _read_or_refused(load: Load, content: bytes) -> Outcome | str:
    """Return what a file is read as, or why it is refused as a whole."""
    try:
        return outcome(load(content))
    except InputRefused as refused:
        return str(refused)


COLUMNS = [column for kind in KINDS for column in columns(kind)]


@given(data=st.data())
@settings(max_examples=300, deadline=None)
def test_a_cell_known_is_the_cell_read(data: st.DataObject) -> None:
    """A column's cells read together have the values that each of them has alone, or are odd."""
    column = data.draw(st.sampled_from(COLUMNS))
    number = st.decimals(0, 10**16, allow_nan=False).map(lambda value: f"{value:f}") | st.from_regex(r"[0-9]{1,17}")
    cells = data.draw(
        st.lists(st.sampled_from(CELLS.get(column.name, ("", "1"))) | number | st.text(max_size=5), min_size=1)
    )
    for kept in (0, 2):
        with pytest.MonkeyPatch.context() as patch:
            patch.setattr(known, "_MOST_KEPT", kept)
            values = known_of(column, None, plain=True)
            assert values.values_of(cells) == values.values_of(cells) == [_alone(column, cell) for cell in cells]


def _alone(column: Column, cell: str) -> object:
    """Return the value of one cell as a part's reading has it, ODD where it is refused or must be told by the row."""
    stripped = unguarded(cell.strip())
    if not stripped:
        return known.ODD if column.required or column.name == "source" else plain_value(column.default, column)
    try:
        return plain_value(read_cell(stripped, column, bare=False), column)
    except QuantityError:
        return known.ODD


@given(data=st.data())
@settings(max_examples=300, deadline=None)
def test_a_plain_number_needs_no_grammar(data: st.DataObject) -> None:
    """A plain decimal, times the power of ten of its column, is the double that the grammar of quantities reads."""
    quantity = data.draw(st.sampled_from(sorted(QUANTITIES.values(), key=lambda each: each.name)))
    unit = data.draw(st.sampled_from((None, quantity.heading or None, "kohm", "%", "ppm/K", "mV", "pF", "M")))
    bare = unit is None and quantity.bare_in_stock
    text = data.draw(st.from_regex(r"\A[0-9]{1,15}(\.[0-9]{1,15})?\Z"))
    power = plain_power(quantity, bare=bare, unit=unit)
    try:
        read = parse(text, quantity, bare=bare, unit=unit)
    except QuantityError:
        assert power is None or quantity.whole
    else:
        assert power is not None
        assert float(f"{text}e{power}") == read


def test_spooled_rows_come_again_as_they_were(monkeypatch: pytest.MonkeyPatch) -> None:
    """Rows that went to the temporary file are the rows that come back, as often as they are asked for."""
    monkeypatch.setattr("selector.ingest.accepted._AT_ONCE", 3)
    monkeypatch.setattr("selector.ingest.accepted._MOST_HELD_BYTES", 50)
    spool = Spool()
    for number in range(10):
        spool.add(Piece("shunt", range(number, number + 1), [(f"S{number}",), (0.5,), (None,)], [["\u00e4", ""]]))
    expected = [("shunt", [number], [(f"S{number}",), (0.5,), (None,)], [["\u00e4", ""]]) for number in range(10)]
    assert [tuple(piece) for piece in spool.pieces()] == expected
    assert [tuple(piece) for piece in spool.pieces()] == expected
    assert len(spool) == 10


def test_many_rows_of_one_code_are_all_refused(load: Load) -> None:
    """Rows that share a code are found wherever in a long file they stand."""
    rows = [f"R{number},resistor,1k,1 %,50 ppm/K\n" for number in range(5_000)]
    file = load("part,kind,resistance,tolerance,tempco\n" + "".join([*rows, rows[7], *rows[:1]]))
    assert [(row.line, row.faults[0].why) for row in file.refused] == [
        (2, "resistor R0 is also in line 5003"),
        (9, "resistor R7 is also in line 5002"),
        (5002, "resistor R7 is also in line 9"),
        (5003, "resistor R0 is also in line 2"),
    ]
    assert len(file.accepted) == 4_998
