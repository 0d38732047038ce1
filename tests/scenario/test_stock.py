"""Stock files, single parts and generic parts from the command line."""

from __future__ import annotations

import json
from pathlib import Path

import pytest

from tests.scenario.conftest import FILES, Run

HEAD = "kind,part,resistance,tolerance,tempco,quantity\n"
ONE = "resistor,R1,1k,1 %,50 ppm/K,10\n"
BAD = "resistor,R2,2k,1,50 ppm/K,10\n"


@pytest.fixture
def stock(tmp_path: Path) -> Path:
    """Write a stock file with a good and a bad row."""
    path = tmp_path / "stock.csv"
    path.write_text(HEAD + ONE + BAD, encoding="utf-8")
    return path


def codes(run: Run, *more: str) -> list[str]:
    """Return the codes in the catalogue, as CSV lists them."""
    return [line.split(",")[1] for line in run("parts", "list", "--format", "csv", *more).stdout.splitlines()[1:]]


def test_good_rows_load_and_the_others_go_to_the_rejects(run_own: Run, stock: Path, tmp_path: Path) -> None:
    """A refused row gives status 3 and a file beside the stock file, which loads once it is mended."""
    done = run_own("load", stock)
    assert (done.returncode, done.stderr) == (3, f"1 row refused; see {tmp_path}/stock.rejects.csv\n")
    rejects = tmp_path / "stock.rejects.csv"
    assert codes(run_own) == ["R1"]
    rejects.write_text(rejects.read_text("utf-8").replace("2k,1,", "2k,1 %,"), encoding="utf-8")
    assert run_own("load", rejects).returncode == 0
    assert codes(run_own) == ["R1", "R2"]


def test_no_rejects_file_where_nothing_is_refused(run_own: Run, stock: Path, tmp_path: Path) -> None:
    """A load without a refused row makes no file, and an old rejects file stays."""
    stock.write_text(HEAD + ONE, encoding="utf-8")
    assert run_own("load", stock, "--rejects", "r.csv").returncode == 0
    assert sorted(path.name for path in tmp_path.iterdir()) == ["own.db", "stock.csv"]


def test_second_load_changes_nothing(run_own: Run) -> None:
    """The bundled files, all in one transaction, change not one byte when they are loaded again."""
    first = json.loads(run_own("load", *FILES, "--format", "json").stdout)
    assert sum(file["counts"]["new"] for file in first["files"]) == 234
    before = run_own("parts", "list", "--format", "json").stdout
    second = json.loads(run_own("load", *FILES, "--format", "json").stdout)
    assert sum(file["counts"]["same"] for file in second["files"]) == 234
    assert run_own("parts", "list", "--format", "json").stdout == before


def test_dry_run_does_nothing(run_own: Run, stock: Path, tmp_path: Path) -> None:
    """`--dry-run` tells the same counts and makes neither a catalogue nor a rejects file."""
    done = run_own("load", stock, "--dry-run", "--format", "json")
    assert done.returncode == 3
    counts = json.loads(done.stdout)["files"][0]["counts"]
    assert (counts["new"], counts["refused"]) == (1, 1)
    assert list(tmp_path.iterdir()) == [stock]


def test_missing_file_stops_the_load_of_all(run_own: Run, stock: Path, tmp_path: Path) -> None:
    """Where one of several files is not there, none is loaded."""
    assert run_own("load", stock, "nowhere.csv").returncode == 3
    assert list(tmp_path.iterdir()) == [stock]


def test_other_figures_are_refused_unless_replaced(run_own: Run, stock: Path, tmp_path: Path) -> None:
    """A part that is there with other figures is a refused row; with `--replace` its change is listed."""
    stock.write_text(HEAD + ONE, encoding="utf-8")
    run_own("load", stock)
    stock.write_text(HEAD + ONE.replace("1k", "1.1k").replace("1 %", "2 %"), encoding="utf-8")
    done = run_own("load", stock, "--format", "json")
    assert done.returncode == 3
    file = json.loads(done.stdout)["files"][0]
    assert [(each["column"], each["value"]) for each in file["refused"]] == [
        ("resistance", "1.1 kohm"),
        ("tolerance", "2 %"),
    ]
    assert "is in the catalogue with resistance 1 kohm" in (tmp_path / "stock.rejects.csv").read_text("utf-8")
    done = run_own("load", stock, "--replace", "--format", "json")
    assert done.returncode == 0, done.stderr
    changes = json.loads(done.stdout)["files"][0]["changes"]
    assert [(each["field"], each["from"], each["to"]) for each in changes] == [
        ("resistance", "1 kohm", "1.1 kohm"),
        ("tolerance", "1 %", "2 %"),
    ]


def test_headings_are_mapped_by_hand(run_own: Run, tmp_path: Path) -> None:
    """`--map` says what a column gives, `--kind` what all parts are."""
    (tmp_path / "s.csv").write_text("Nr;W;T;K;Q\nR1;1k;1 %;50 ppm/K;7\n", encoding="utf-8")
    pairs = ("Nr=part", "W=resistance", "T=tolerance", "K=tempco", "Q=")
    done = run_own("load", "s.csv", "--kind", "resistor", *(word for pair in pairs for word in ("--map", pair)))
    assert done.returncode == 0, done.stderr + done.stdout
    assert codes(run_own) == ["R1"]


def test_rejects_that_cannot_be_written_are_told(run_own: Run, stock: Path) -> None:
    """The good rows are loaded, and the status says that the rejects could not be written."""
    done = run_own("load", stock, "--rejects", "nowhere/r.csv")
    assert done.returncode == 4
    assert "cannot be written" in done.stderr


def test_list_as_csv_loads_again_unchanged(run_own: Run, tmp_path: Path) -> None:
    """What `parts list` writes as CSV is, loaded into another catalogue, the same list."""
    run_own("load", *FILES)
    text = run_own("parts", "list", "--output", "all.csv")
    assert text.returncode == 0
    assert run_own("load", "all.csv", "--catalogue", "other.db").returncode == 0
    again = run_own("parts", "list", "--format", "csv", "--catalogue", "other.db").stdout
    assert again.encode() == (tmp_path / "all.csv").read_bytes().replace(b"\r\n", b"\n")
    assert run_own("load", "all.csv", "--format", "json").returncode == 0


def test_part_by_hand(run_own: Run) -> None:
    """A part is added, shown, changed, loses a figure, and is removed."""
    assert (
        run_own("parts", "add", "resistor", "part=R9", "resistance=4k99", "tolerance=F", "tempco=25ppm/K").returncode
        == 0
    )
    assert run_own("parts", "change", "R9", "quantity=5", "note=drawer 3").returncode == 0
    shown = json.loads(run_own("parts", "show", "R9", "--format", "json").stdout)
    assert "4990.0" in json.dumps(shown)
    assert "drawer 3" in json.dumps(shown)
    assert run_own("parts", "change", "R9", "note=").returncode == 0
    assert "drawer 3" not in run_own("parts", "show", "R9").stdout
    assert run_own("parts", "remove", "R9").returncode == 0
    assert codes(run_own) == []


def test_code_of_several_kinds_needs_its_kind(run_own: Run) -> None:
    """A code that two kinds have is asked for with `--kind`."""
    run_own("parts", "add", "resistor", "part=X", "resistance=1k", "tolerance=1%", "tempco=25ppm/K")
    run_own("parts", "add", "capacitor", "part=X", "capacitance=1n", "tolerance=5%")
    done = run_own("parts", "show", "X")
    assert done.returncode == 2
    assert done.stderr == "X: is the code of parts of several kinds: resistor, capacitor; name one: --kind resistor\n"
    assert run_own("parts", "remove", "X", "--kind", "capacitor").returncode == 0
    assert run_own("parts", "show", "X").returncode == 0


def test_find_forgives(run: Run) -> None:
    """A code typed wrong and a value both find the part."""
    assert "R-10K-01" in run("parts", "find", "r10k-01").stdout
    assert "R-4K99-01" in run("parts", "find", "4.99 kohm").stdout


@pytest.mark.parametrize("kind", ["shunt", "resistor", "capacitor", "amplifier", "bypass", "switch"])
def test_template_loads(run_own: Run, tmp_path: Path, kind: str) -> None:
    """The template of each kind is a stock file that loads."""
    (tmp_path / "t.csv").write_text(run_own("parts", "template", kind).stdout, encoding="utf-8")
    assert run_own("load", "t.csv").returncode == 0
    assert codes(run_own)


def test_fill_adds_generic_parts_once(run_own: Run) -> None:
    """Parts of a series are added with codes that say what they are, and not again."""
    order = ("fill", "resistor", "--series", "E6", "--from", "1k", "--to", "4.7k", "tolerance=1%", "tempco=100ppm/K")
    done = run_own(*order)
    assert done.returncode == 0, done.stderr
    values = ("1k", "1k5", "2k2", "3k3", "4k7")
    assert sorted(codes(run_own)) == sorted(f"resistor-E6-{value}-1%" for value in values)
    assert json.loads(run_own(*order, "--format", "json").stdout)
    info = json.loads(run_own("catalogue", "info", "--format", "json").stdout)
    assert "generic" in json.dumps(info)
    done = run_own(*order[:-1], "tempco=50ppm/K")
    assert done.returncode == 3
    assert done.stderr.splitlines()[-1] == "5 faults, nothing was changed"


def test_generic_parts_are_no_stock(run_own: Run) -> None:
    """A spec that takes parts from stock leaves generic ones out."""
    run_own("fill", "capacitor", "--series", "E3", "--from", "1n", "--to", "1u", "tolerance=5%", "dielectric=C0G")
    listed = json.loads(run_own("parts", "list", "--format", "json").stdout)
    parts = [part for value in listed.values() if isinstance(value, list) for part in value]
    assert len(parts) == 10
    assert all(part["generic"] is True and part["quantity"] is None for part in parts)
