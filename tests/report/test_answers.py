"""Every answer in every format: whole, readable, at most 80 columns."""

from __future__ import annotations

import json
from pathlib import Path

import pytest

from selector.bill import offer_of
from selector.candidate import Design, conditions_of
from selector.errors import UsageRefused
from selector.ingest import read_stock
from selector.report import FORMATS, render
from selector.report.answers.answer import Answer
from selector.report.answers.catalogue import CatalogueShown, KindCounted
from selector.report.answers.changed import FieldChange, PartsChanged
from selector.report.answers.check import Checked
from selector.report.answers.found import FoundPart, PartsFound
from selector.report.answers.loaded import CellRefused, ColumnRead, FileLoaded, Loaded
from selector.report.answers.parts import PartsListed
from selector.report.answers.query import Shortlist
from selector.report.answers.series import SeriesShown
from selector.report.answers.spec import SpecShown
from selector.search import judge, search
from selector.series import Pair, Preferred
from selector.spec import KEYS, Spec, load_spec, spec_of
from selector.units import RESISTANCE

DATA = Path(__file__).parents[2] / "data"
CHANGE = FieldChange("shunt", "S-1", "tolerance", "1 %", "0.5 %")
LOADED = Loaded(
    (
        FileLoaded(
            file="drawer\udcff.csv",
            encoding="cp1252",
            delimiter=";",
            heading_line=3,
            columns=(
                ColumnRead("Wert [kOhm]", "resistance", "kohm", "synonym", None, ("4,99", "1")),
                ColumnRead("Lieferant", None, None, None, "location", ()),
            ),
            new=212,
            changed=3,
            same=40,
            refused=2,
            changes=(CHANGE,),
            cells=(CellRefused(17, "Tol.", "1", "has no unit", "write 1 % or F"),),
            notes=("read as cp1252",),
        ),
    ),
    dry_run=True,
    rejects="drawer.rejects.csv",
)
SERIES = SeriesShown(
    4800.0,
    RESISTANCE,
    "E24",
    (Preferred(4700.0, -1 / 48), Preferred(5100.0, 0.0625)),
    "series",
    (Pair(300.0, 4500.0, 4800.0, 0.0),),
)
CATALOGUE = CatalogueShown("/a/b.db", 1, (KindCounted("shunt", 16, 12, 0),), 40960, 1, "2024-01-02 03:04:05 UTC")
CHANGED = PartsChanged("changed", tuple(("shunt", f"S-{number}") for number in range(25)), (CHANGE,), 2)


@pytest.fixture(params=["loaded", "series", "catalogue", "changed", "spec", "list", "one", "found", "none"])
def answer(request: pytest.FixtureRequest, spec: Spec, design: Design) -> Answer:
    """Return each of the answers that show no candidate."""
    parts = tuple(place.part for place in design.places())
    answers: dict[str, Answer] = {
        "loaded": LOADED,
        "series": SERIES,
        "catalogue": CATALOGUE,
        "changed": CHANGED,
        "spec": SpecShown(spec),
        "list": PartsListed(parts),
        "one": PartsListed(parts[:1]),
        "found": PartsFound("s-0", (FoundPart(parts[0], "code", 100.0),)),
        "none": PartsFound("\x1b", ()),
    }
    return answers[request.param]


@pytest.mark.parametrize("form", list(FORMATS))
def test_every_answer_in_every_format(answer: Answer, form: str) -> None:
    """Each ends in one line feed and holds no control character; tables fit 80 columns; JSON names its schema."""
    text = render(answer, form)
    assert text.endswith("\n")
    assert not text.endswith("\n\n")
    if form == "table":
        assert max(map(len, text.splitlines())) <= 80
    if form != "csv":
        assert "\x1b" not in text
        assert "\udcff" not in text
    if form == "json":
        assert json.loads(text)["schema"].startswith("selector.")


def test_formats_have_names_and_endings_of_their_own() -> None:
    """The four formats, by name; no ending belongs to two."""
    assert list(FORMATS) == ["table", "json", "csv", "markdown"]
    endings = [ending for each in FORMATS.values() for ending in each.endings]
    assert len(set(endings)) == len(endings)


def test_an_unknown_format_is_wrong_usage() -> None:
    """The message names the formats there are."""
    with pytest.raises(UsageRefused, match="table, json, csv, markdown"):
        render(SERIES, "xml")


def test_a_load_has_the_keys_of_its_contract() -> None:
    """JSON of `load` as interface.md, section 6, lists it; figures that are not known yet are null."""
    (file,) = json.loads(render(LOADED, "json"))["files"]
    assert list(file) == ["file", "read", "columns", "counts", "changes", "refused"]
    assert list(file["read"]) == ["encoding", "delimiter", "heading_line", "decimal", "sheet", "layout"]
    assert list(file["columns"][0]) == ["heading", "field", "unit", "notation", "matched", "samples"]
    assert file["counts"] == {"new": 212, "changed": 3, "same": 40, "refused": 2}
    assert list(file["changes"][0]) == ["kind", "part", "field", "from", "to"]
    assert list(file["refused"][0]) == ["line", "column", "value", "why", "remedy"]


def test_a_load_reads_as_on_the_screens() -> None:
    """File and reading first, then columns, counts, refused cells with their remedy, and where they went."""
    text = render(LOADED, "table")
    assert text.startswith("drawer\\udcff.csv: read as semicolon, cp1252, headings in line 3\n")
    for line in (
        "  Lieferant    not used; did you mean location?  -     -",
        "212 would be new, 3 would be changed, 40 would be same, 2 would be refused",
        '  - line 17, Tol.: "1": has no unit; write 1 % or F',
        "-> drawer.rejects.csv",
        "Dry run: the catalogue is as it was.",
    ):
        assert line in text.splitlines()


def test_a_series_shows_deviations_with_their_sign() -> None:
    """4.7 kohm is 2.08 % below 4.8 kohm, 5.1 kohm 6.25 % above."""
    lines = [line.split() for line in render(SERIES, "table").splitlines()]
    assert ["4.7", "kohm", "-2.08", "%"] in lines
    assert ["5.1", "kohm", "+6.25", "%"] in lines
    assert ["300", "ohm", "4.5", "kohm", "4.8", "kohm", "0", "%"] in lines


def test_a_spec_shows_every_key_once(spec: Spec) -> None:
    """All entries, defaults resolved: 10 % overlap, the supply as highest output."""
    rows = [line.split() for line in render(SpecShown(spec), "table").splitlines()]
    firsts = [row[0] for row in rows if row]
    assert [firsts.count(name) for name in KEYS] == [1] * len(KEYS)
    assert next(row for row in rows if row[:1] == ["ranges.overlap"])[1:3] == ["10", "%"]
    assert next(row for row in rows if row[:1] == ["output.high"])[1:3] == ["3.3", "V"]


def test_bands_and_lists_of_a_spec_are_shown() -> None:
    """A table of allowed errors and lists of codes read as text."""
    entries = {
        "current.min": 1e-3,
        "current.max": 1.0,
        "limits.burden": 0.1,
        "limits.power": 1.0,
        "supply.voltage": 5.0,
        "converter.bits": 12,
        "converter.reference": 5.0,
        "ambient.min": 0.0,
        "ambient.max": 40.0,
        "signal.bandwidth": 100.0,
        "parts.avoid": ["A|1", "B"],
        "parts.only": {"shunt": ["S"]},
        "accuracy.bands": [
            {"up_to": "10 mA", "reading": "2 %", "floor": "1 uA"},
            {"reading": "1 %", "floor": "10 uA"},
        ],
    }
    text = render(SpecShown(spec_of(entries)), "csv")
    assert "up to 10 mA: 2 % + 1 uA, above: 1 % + 10 uA" in text
    assert '"A|1, B"' in text
    assert "shunt: S" in text


def test_real_answers_of_the_pump() -> None:
    """A search of the bundled catalogue, and the check of its best, print in every format; tables fit 80 columns."""
    parts = [part for path in sorted((DATA / "parts").glob("*.csv")) for part in read_stock(path).parts]
    stock = {kind: tuple(part for part in parts if part.kind == kind) for kind in {part.kind for part in parts}}
    spec = load_spec(DATA / "irrigation_pump.toml")
    conditions = conditions_of(spec)
    found = search(spec, stock)
    offers = tuple(offer_of(candidate, conditions, 1) for candidate in found.candidates)
    judged = judge(spec, offers[0].candidate.design, stock)
    assert judged.candidate is not None
    answers = (
        Shortlist(spec, offers, found.searched),
        Checked(spec, judged, offer_of(judged.candidate, conditions, 1)),
    )
    for each in answers:
        assert max(map(len, render(each, "table").splitlines())) <= 80
        data = json.loads(render(each, "json"))
        assert data["spec"]["title"] == "Irrigation pump"
        assert render(each, "csv").count("\n") > 1
        assert render(each, "markdown").isascii()
