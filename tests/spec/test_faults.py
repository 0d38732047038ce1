"""Bad specs and the exact sentence each of them is answered with."""

from __future__ import annotations

import random
import tomllib
from pathlib import Path

import pytest

from selector.errors import Fault, InputRefused
from selector.parts import KINDS
from selector.spec import load_spec

GOOD = """\
title = "Orchard frost alarm"
[current]
min = "60 uA"
max = "60 mA"
[accuracy]
reading = "2 %"
floor = "3 uA"
[limits]
burden = "100 mV"
power = "20 mW"
[supply]
voltage = "3.3 V"
[sense]
[output]
[converter]
bits = 12
reference = "2.5 V"
[ambient]
min = "-20 degC"
max = "50 degC"
[signal]
bandwidth = "200 Hz"
[ranges]
[filter]
[parts]
[rank]
"""
BAD = tomllib.loads((Path(__file__).parent / "bad_specs.toml").read_text(encoding="utf-8"))["bad"]


def faults(folder: Path, text: str, overrides: dict[str, str] | None = None) -> list[str]:
    """Return the messages with which a spec is refused."""
    path = folder / "frost.toml"
    path.write_bytes(text.encode("utf-8", "surrogatepass"))
    with pytest.raises(InputRefused) as refused:
        load_spec(path, overrides or {}, kinds=KINDS)
    return [str(fault) for fault in refused.value.faults]


@pytest.mark.parametrize("bad", BAD, ids=lambda bad: bad["put"][:40])
def test_each_bad_entry_is_answered_with_its_sentences(bad: dict[str, str], tmp_path: Path) -> None:
    """A bad entry is refused with its line, its key, what was read and what would be right, and with nothing else."""
    assert GOOD.count(bad["for"]) == 1
    assert faults(tmp_path, GOOD.replace(bad["for"], bad["put"])) == bad["says"].splitlines()


def test_all_faults_come_at_once_in_line_order(tmp_path: Path) -> None:
    """Faults of keys, of rules and missing keys come together by line, those without a line after them, --set last."""
    text = GOOD.replace('min = "60 uA"', 'min = "60 mA"').replace('burden = "100 mV"', 'burden = "100 mA"')
    text = text.replace('max = "50 degC"', 'maximum = "50 degC"').replace('[signal]\nbandwidth = "200 Hz"\n', "")
    starts = [fault.partition(":")[0] for fault in faults(tmp_path, text, {"rank.power": "x", "limits.power": "1 V"})]
    assert starts == [
        "frost.toml line 4, current.max",
        "frost.toml line 9, limits.burden",
        "frost.toml line 18, ambient.max",
        "frost.toml line 20",
        "frost.toml, signal.bandwidth",
        "--set limits.power",
        "--set rank.power",
    ]


@pytest.mark.parametrize(
    ("text", "line"),
    [
        ("[limits\n", 1),
        ("title = 'x'\n[current]\nmin = 60 uA\n", 3),
        ('title = "x', 1),
        ("a = 1\na = 2\n", 2),
        ("a = 1" + "0" * 5000, 1),
        ("\n\na = \x00", 3),
        ("a." * 400_000 + "b = 1", 1),
        ("\ud800", 1),
    ],
)
def test_a_syntax_fault_stands_alone(text: str, line: int, tmp_path: Path) -> None:
    """What is no TOML is one fault with its line, whatever else is wrong."""
    (fault,) = faults(tmp_path, text)
    assert fault.startswith(f"frost.toml line {line}: ")


def test_brackets_without_end_are_refused(tmp_path: Path) -> None:
    """20 000 open brackets are one fault, not an error of the parser."""
    assert faults(tmp_path, "a = " + "[" * 20_000) == [
        "frost.toml: has brackets nested too deep; a spec needs no more than three"
    ]


def test_a_file_above_a_megabyte_is_refused(tmp_path: Path) -> None:
    """A spec of more than 1 MB is not read."""
    assert faults(tmp_path, "#" * 1_000_001) == [
        "frost.toml: is larger than 1 MB; a spec has some hundred lines at most"
    ]


def test_a_megabyte_of_unknown_keys_is_all_refused(tmp_path: Path) -> None:
    """Each of 80 000 unknown keys is a fault, the first ones with what is taken instead."""
    said = faults(tmp_path, "".join(f"k{number} = 1\n" for number in range(80_000)))
    assert sum("unknown key" in fault for fault in said) == 80_000


def test_a_missing_file_is_refused(tmp_path: Path) -> None:
    """A file that is not there is an input refused, with its name."""
    with pytest.raises(InputRefused) as refused:
        load_spec(tmp_path / "none.toml")
    assert str(refused.value) == "none.toml: cannot be read: No such file or directory; give the file of a spec"


def test_a_folder_is_refused(tmp_path: Path) -> None:
    """A folder is no spec."""
    with pytest.raises(InputRefused, match="Is a directory"):
        load_spec(tmp_path)


@pytest.mark.parametrize(
    ("key", "value", "said"),
    [
        ("limits.burden", "80mA", '"80mA" is a current; a voltage is wanted, for example "100 mV"'),
        ("limits.burden", "true", 'true is no voltage; for example "100 mV"'),
        ("current.max", "60 uA", "60 uA, with current.min = 60 uA; current.max must be above current.min"),
        ("limit.burden", "80mV", 'unknown key "limit.burden"; did you mean "limits.burden"?'),
        ("parts.only", "{shunts = ['a']}", 'unknown key "parts.only.shunts"; did you mean "parts.only.shunt"?'),
    ],
)
def test_a_fault_of_an_override_names_the_option(key: str, value: str, said: str, tmp_path: Path) -> None:
    """What `--set` gets wrong is said of `--set`, not of a line of the file."""
    assert faults(tmp_path, GOOD, {key: value}) == [f"--set {key}: {said}"]


def test_an_override_mends_a_faulty_entry(tmp_path: Path) -> None:
    """An entry that is overridden is not judged."""
    path = tmp_path / "frost.toml"
    path.write_text(GOOD.replace('"100 mV"', '"100 mA"'), encoding="utf-8")
    assert load_spec(path, {"limits.burden": "80mV"}).limits.burden == 0.08


@pytest.mark.parametrize("seed", range(150))
def test_a_mutated_spec_is_a_spec_or_refused(seed: int, tmp_path: Path) -> None:
    """Whatever bytes a spec has, it loads or is refused with faults that each say something."""
    chance = random.Random(seed)
    content = bytearray(GOOD.encode())
    for _ in range(chance.randint(1, 6)):
        place = chance.randrange(len(content))
        piece = chance.choice(
            [b"", b"\x00", b"\xff", b'"', b"[", b"{", b"=", b"\n", b"'''", b"9" * 400, b"-", b".", b"%"]
        )
        content[place : place + chance.randint(0, 3)] = piece
    path = tmp_path / "frost.toml"
    path.write_bytes(content)
    said: tuple[Fault, ...] = (Fault("a spec", "that loads"),)
    try:
        load_spec(path, kinds=KINDS)
    except InputRefused as refused:
        said = refused.faults
    assert said
    assert all(fault.where and fault.what for fault in said)
