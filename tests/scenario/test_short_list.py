"""The main job from the command line: short list, bill, check."""

from __future__ import annotations

import json
import re
from pathlib import Path
from typing import Any

from tests.scenario.conftest import DATA, Run

PUMP = DATA / "irrigation_pump.toml"
NOTHING = ("--set", "limits.burden=1 uV")
TIME = re.compile(r"exact, [0-9.]+ m?s")
LAST = {"rank": None, "pareto": None}


def answer(run: Run, *arguments: object, status: int = 0) -> dict[str, Any]:
    """Return the JSON of a command."""
    done = run(*arguments, "--format", "json")
    assert done.returncode == status, done.stderr
    found: dict[str, Any] = json.loads(done.stdout)
    return found


def test_query_prints_the_short_list(run: Run) -> None:
    """The table has the title, the best five, and the bill of the best; nothing goes to the standard error."""
    done = run("query", PUMP)
    assert (done.returncode, done.stderr) == (0, "")
    assert done.stdout.startswith("Irrigation pump\n")
    assert all(f"\n  {rank}  " in done.stdout for rank in range(1, 6))
    assert "Best:" in done.stdout
    assert max(map(len, done.stdout.splitlines())) <= 80


def test_same_input_gives_the_same_bytes(run: Run) -> None:
    """Two runs print the same, but for the time they took."""
    first, second = (TIME.sub("", run("query", PUMP).stdout) for _ in range(2))
    assert first == second
    lists = [answer(run, "query", PUMP) for _ in range(2)]
    for each in lists:
        del each["searched"]["seconds"]
    assert json.dumps(lists[0]) == json.dumps(lists[1])


def test_check_repeats_the_figures_of_query_exactly(run: Run, tmp_path: Path) -> None:
    """A candidate written by `bill` as a design has, in `check`, the very figures that `query` gives it."""
    for rank, candidate in enumerate(answer(run, "query", PUMP, "--top", 3)["candidates"], start=1):
        assert run("bill", PUMP, "--rank", rank, "--output", "design.toml", "--format", "toml").returncode == 0
        checked = answer(run, "check", PUMP, "design.toml")
        assert checked["meets"] is True
        assert checked["candidate"] == {**candidate, **LAST}
        (tmp_path / "design.toml").unlink()


def test_code_that_no_part_has_is_told(run: Run) -> None:
    """A code in `parts.avoid` that the catalogue does not know is told, since it avoids nothing; the answer stands."""
    done = run("query", PUMP, "--set", 'parts.avoid=["S-0R005", "S-0R00S"]', "--top", 1)
    assert done.returncode == 0
    assert done.stderr == 'parts.only or parts.avoid names "S-0R00S", which is no part of the catalogue\n'


def test_top_and_variants(run: Run) -> None:
    """`--top` takes that many or all, and with `--variants` a pair may stand in the list more than once."""
    one, every = (answer(run, "query", PUMP, "--top", top)["candidates"] for top in ("1", "all"))
    assert len(one) == 1
    assert one[0]["parts"] == every[0]["parts"]
    pairs = [(each["parts"]["shunts"][0], each["parts"]["amplifier"]) for each in every]
    assert len(set(pairs)) == len(pairs) > 5
    variants = answer(run, "query", PUMP, "--variants")["candidates"]
    assert len({(each["parts"]["shunts"][0], each["parts"]["amplifier"]) for each in variants}) < len(variants)


def test_overrides_and_weights_count(run: Run) -> None:
    """`--set` and `--weights` are entries of the spec, and `--set` counts above `--weights`."""
    done = answer(run, "query", PUMP, "--weights", "power=3,error=2", "--set", "rank.error=4", "--set", "title=x=y")
    assert {name: done["spec"]["rank"][name] for name in ("power", "error")} == {"power": 3.0, "error": 4.0}
    assert done["spec"]["title"] == "x=y"


def test_nothing_fits_is_an_answer_with_its_own_status(run: Run) -> None:
    """Where nothing fits, the reasons are the answer, and the status is 1."""
    done = answer(run, "query", PUMP, *NOTHING, status=1)
    assert done["candidates"] == []
    assert sum(done["nothing_fits"]["blocked"].values()) == done["nothing_fits"]["pairs"]


def test_no_bill_where_nothing_fits(run: Run, tmp_path: Path) -> None:
    """`bill` then prints nothing, writes no file, tells the reasons on the standard error, and ends with 1."""
    done = run("bill", PUMP, *NOTHING, "--output", "bill.csv")
    assert (done.returncode, done.stdout) == (1, "")
    assert "Nothing fits" in done.stderr
    assert list(tmp_path.iterdir()) == []


def test_bill_counts_pieces_for_boards(run: Run) -> None:
    """`--boards` multiplies the pieces of the same candidate."""
    one, ten = (answer(run, "bill", PUMP, "--boards", boards) for boards in (1, 10))
    lines = [(line["part"], 10 * line["quantity"]) for line in _bill(one)]
    assert [(line["part"], line["quantity"]) for line in _bill(ten)] == lines


def _bill(found: dict[str, Any]) -> list[dict[str, Any]]:
    """Return the lines of a bill, wherever in the answer they stand."""
    lines = found["bill"] if "bill" in found else found["candidate"]["bill"]
    return list(lines)


def test_check_that_does_not_meet_ends_with_1(run: Run) -> None:
    """A design outside a limit has its figures all the same, and the status 1; so has its bill."""
    assert run("bill", PUMP, "--output", "d.toml").returncode == 0
    checked = answer(run, "check", PUMP, "d.toml", "--set", "limits.burden=1 mV", status=1)
    assert checked["meets"] is False
    assert checked["candidate"]["errors"]
    assert [each["limit"] for each in checked["limits"] if each["meets"] is False] == ["burden"]
    done = run("bill", PUMP, "--design", "d.toml", "--set", "limits.burden=1 mV")
    assert (done.returncode, done.stderr) == (1, "the design does not meet the spec: burden\n")
    assert "shunt" in done.stdout


def test_design_of_in_line_parts_needs_no_catalogue(run: Run, tmp_path: Path) -> None:
    """Parts given by their figures are judged without a catalogue, exempt from stock, and stay apart by number."""
    design = """
        shunts = [{resistance = "5 mohm", tolerance = "1 %", tempco = "50 ppm/K", power = "3 W", terminals = 4}]
        common = {resistance = "290 ohm", tolerance = "0.1 %", tempco = "25 ppm/K"}
        gain = [{resistance = "9.1 kohm", tolerance = "0.1 %", tempco = "25 ppm/K"}]
        filter_resistor = {part = "mine", resistance = "68 ohm", tolerance = "0.1 %", tempco = "25 ppm/K"}
        filter_capacitor = {capacitance = "22 nF", tolerance = "5 %", dielectric = "C0G", voltage = "50 V"}
        [amplifier]
        gain_law = "two-resistor"
        gain_factor = 1
        offset = "15 uV"
        offset_drift = "80 nV/K"
        bias_current = "100 nA"
        cmrr = "120 dB"
        psrr = "110 dB"
        noise_density = "40 nV/rtHz"
        swing_high = "0.2 V"
        swing_low = "0.01 V"
        common_mode_min = "2.5 V"
        common_mode_max = "60 V"
        supply_min = "2.7 V"
        supply_max = "5.5 V"
        supply_current = "1 mA"
        temp_min = "-40 degC"
        temp_max = "125 degC"
        bandwidth = "500 kHz"
        resistance_min = "100 ohm"
    """
    (tmp_path / "d.toml").write_text(design, encoding="utf-8")
    checked = answer(run, "check", PUMP, "d.toml", "--catalogue", "nowhere.db", status=0)
    parts = checked["candidate"]["parts"]
    assert (parts["common"], parts["gain"], parts["filter_resistor"]) == ("in-line", ["in-line 2"], "mine")
    assert checked["candidate"]["cost"] is None
    assert len(checked["candidate"]["bill"]) == 6
    assert not (tmp_path / "nowhere.db").exists()
    assert run("bill", PUMP, "--design", "d.toml", "--output", "e.toml").returncode == 0
    assert answer(run, "check", PUMP, "e.toml")["candidate"] == checked["candidate"]


def test_filter_left_out_is_chosen_as_the_search_chooses(run: Run, tmp_path: Path) -> None:
    """A design without its filter gets the one that the search gives it."""
    best = answer(run, "query", PUMP, "--top", 1)["candidates"][0]["parts"]
    lines = [f"shunts = {json.dumps(best['shunts'])}", f'amplifier = "{best["amplifier"]}"']
    lines += [f'common = "{best["common"]}"', f"gain = {json.dumps(best['gain'])}"]
    (tmp_path / "d.toml").write_text("\n".join(lines), encoding="utf-8")
    assert answer(run, "check", PUMP, "d.toml")["candidate"]["parts"] == best


def test_answer_goes_to_a_file_by_its_ending(run: Run, tmp_path: Path) -> None:
    """`--output` writes what the standard output would get, in the format of the ending; nothing is printed."""
    for name, start in (("a.json", "{"), ("a.csv", ""), ("a.md", "Irrigation pump"), ("a.txt", "Irrigation pump")):
        done = run("query", PUMP, "--output", name)
        assert (done.returncode, done.stdout, done.stderr) == (0, "", "")
        assert (tmp_path / name).read_text("utf-8").startswith(start)
    assert len(list(tmp_path.iterdir())) == 4


def test_demo_does_the_main_job_and_can_be_kept(run: Run, tmp_path: Path) -> None:
    """`demo --keep` leaves specs and catalogue in a new folder, with which its next commands work."""
    done = run("demo", "--keep", "shed")
    assert done.returncode == 0, done.stderr
    assert "Best:" in done.stdout
    assert [line.split()[0] for line in done.stderr.splitlines()] == ["go", "selector", "selector"]
    names = sorted(path.name for path in (tmp_path / "shed").iterdir())
    assert names == ["catalogue.db", "frost_alarm.toml", "irrigation_pump.toml", "nothing_fits.toml"]
    assert run("query", "shed/irrigation_pump.toml", "--catalogue", "shed/catalogue.db").returncode == 0
