"""What a release states in several places is the same in all of them."""

from __future__ import annotations

import re
import tomllib
from pathlib import Path

import selector

CHECKOUT = Path(__file__).resolve().parents[2]
PROJECT = tomllib.loads((CHECKOUT / "pyproject.toml").read_text(encoding="utf-8"))


def test_version_is_the_same_everywhere() -> None:
    """The package, its metadata and the newest heading of the change log name one version."""
    newest = re.search(r"^## (\S+)", (CHECKOUT / "CHANGELOG.md").read_text(encoding="utf-8"), flags=re.MULTILINE)
    assert newest is not None
    assert PROJECT["project"]["version"] == selector.__version__ == newest[1]


def test_licences_of_all_direct_dependencies_are_listed() -> None:
    """DEVELOPERS.md names the licence of each package that pyproject.toml asks for."""
    text = (CHECKOUT / "DEVELOPERS.md").read_text(encoding="utf-8")
    rows = [line.split("|")[1] for line in text.splitlines() if line.startswith("| ")]
    listed = {name.strip() for row in rows for name in row.split(",")}
    wanted = [*PROJECT["project"]["dependencies"], *PROJECT["dependency-groups"]["dev"]]
    assert {re.split(r"[^A-Za-z0-9-]", name)[0] for name in wanted} <= listed
