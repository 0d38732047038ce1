"""README.md shows what the program really prints."""

from __future__ import annotations

from typing import TYPE_CHECKING

from tests.scenario.glossary import limits, terms
from tests.scenario.readme import README, printed, timeless

if TYPE_CHECKING:
    from pathlib import Path


def test_every_example_shows_real_output(tmp_path: Path) -> None:
    """Every console block of README.md repeats what its commands print, but for the time they took."""
    text = README.read_text(encoding="utf-8")
    assert "```console" in text
    assert timeless(printed(text, tmp_path)) == timeless(text)


def test_readme_explains_every_limit_and_every_error_term() -> None:
    """The two tables of README.md say of each limit and each term what its file says, in the same order."""
    text = README.read_text(encoding="utf-8")
    assert limits() in text
    assert terms() in text
