"""Bad input: a status that says whose fault it is, words that say what and how to mend it, and no traceback."""

from __future__ import annotations

import subprocess
import tomllib
from collections.abc import Callable
from pathlib import Path
from typing import Any

import pytest

Run = Callable[..., subprocess.CompletedProcess[str]]
DATA = Path(__file__).resolve().parents[2] / "data"
CASES: list[dict[str, Any]] = tomllib.loads(Path(__file__).with_name("bad_input.toml").read_text("utf-8"))["case"]


@pytest.mark.parametrize("case", CASES, ids=lambda case: str(case["name"]).replace(" ", "-"))
def test_bad_input_is_told(case: dict[str, Any], run: Run, tmp_path: Path) -> None:
    """Each bad input ends with its status and with exactly these words; what is there stays as it was."""
    text = (DATA / "irrigation_pump.toml").read_text("utf-8")
    for before, after in case.get("spec", ()):
        assert text.count(before) == 1
        text = text.replace(before, after)
    files = {"spec.toml": text, **case.get("files", {})}
    for name, content in files.items():
        (tmp_path / name).write_text(content, encoding="utf-8")
    done = run(*(word.replace("{folder}", tmp_path.name) for word in case["run"]))
    assert done.stderr == case["stderr"].replace("{folder}", tmp_path.name)
    assert done.returncode == case["status"]
    assert case.get("told", "") in " ".join(done.stdout.split())
    assert {path.name: path.read_text("utf-8") for path in tmp_path.iterdir() if path.is_file()} == files


def test_there_are_many_of_them() -> None:
    """The list has at least sixty bad inputs, each told apart by its name."""
    assert len({case["name"] for case in CASES}) == len(CASES) >= 60
