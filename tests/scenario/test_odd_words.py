"""Words that no person types, and that end in a plain refusal all the same."""

from __future__ import annotations

import subprocess
import sys
from pathlib import Path

import pytest

from tests.scenario.conftest import DATA, Run, surroundings

PUMP = DATA / "irrigation_pump.toml"
KEYS = {
    "escape": (r'"\u001b[31m" = 1', r'unknown key "{table}\x1b[31m"'),
    "bracket": ('"x[y" = 1', 'unknown key "{table}x[y"'),
    "element": ('"x[1]" = 1', 'unknown key "{table}x[1]"'),
    "dots": (f'"{"." * 2000}" = 1', "...."),
}


@pytest.mark.parametrize("name", KEYS)
def test_a_key_of_any_signs_is_refused_in_a_spec(name: str, run: Run, tmp_path: Path) -> None:
    """A key with brackets, dots or signs that cannot be seen is an unknown key, and no endless search for its line."""
    line, told = KEYS[name]
    text = PUMP.read_text("utf-8").replace('burden = "150 mV"', f'burden = "150 mV"\n{line}')
    (tmp_path / "s.toml").write_text(text, encoding="utf-8")
    done = run("query", "s.toml")
    assert done.returncode == 3
    assert told.format(table="limits.") in done.stderr


@pytest.mark.parametrize("name", KEYS)
def test_a_key_of_any_signs_is_refused_in_a_design(name: str, run: Run, tmp_path: Path) -> None:
    """The same holds for the keys of a design."""
    line, told = KEYS[name]
    (tmp_path / "d.toml").write_text(f'amplifier = "AMP-T1"\n{line}\n', encoding="utf-8")
    done = run("check", PUMP, "d.toml")
    assert done.returncode == 3
    assert told.format(table="") in done.stderr


@pytest.mark.parametrize("option", ["--boards", "--rank"])
@pytest.mark.parametrize("digits", [10, 400, 5000])
def test_a_count_past_all_counting_is_wrong_usage(option: str, digits: int, run: Run) -> None:
    """A number of boards or a place beyond a thousand million is refused, however many digits it has."""
    done = run("bill", PUMP, option, "9" * digits)
    assert (done.returncode, done.stdout) == (2, "")
    assert done.stderr.startswith(f"invalid value for '{option}': ")
    assert len(done.stderr) < 300


def test_an_interrupt_in_code_made_from_text_ends_with_130(tmp_path: Path) -> None:
    """SIGINT while a library makes code from text ends with the status 130, not by the signal, and without a word."""
    words = (
        "import os, signal, sys; import selector.cli.run as running; from selector.cli.main import main; "
        "running.run = lambda _: exec('os.kill(os.getpid(), signal.SIGINT)'); sys.exit(main([]))"
    )
    done = subprocess.run(
        [sys.executable, "-P", "-c", words], cwd=tmp_path, env=surroundings(tmp_path), capture_output=True, check=False
    )
    assert (done.returncode, done.stdout, done.stderr) == (130, b"", b"")


@pytest.mark.parametrize("method", ["worst-case", "rss"])
@pytest.mark.parametrize("ohm", ["1e-18 ohm", "9e14 ohm"])
def test_a_shunt_beyond_all_proportion_is_no_traceback(ohm: str, method: str, run: Run, tmp_path: Path) -> None:
    """A figure that cannot be computed with ends in a verdict or a refusal in words."""
    shunt = f'{{resistance = "{ohm}", tolerance = "1 %", tempco = "50 ppm/K", power = "1 W"}}'
    (tmp_path / "d.toml").write_text(f'shunts = [{shunt}]\namplifier = "AMP-F50"\n', encoding="utf-8")
    done = run("check", PUMP, "d.toml", "--set", f"accuracy.method={method}")
    assert done.returncode in (1, 3)
    assert done.stdout or done.stderr.startswith("a figure of a part or of the spec")
