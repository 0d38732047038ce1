"""Global options before and behind the command."""

from __future__ import annotations

import pytest

from selector.cli.arguments import command_of, hoisted
from selector.errors import UsageRefused


@pytest.mark.parametrize(
    ("given", "expected"),
    [
        (["query", "s", "--catalogue", "c"], ["--catalogue", "c", "query", "s"]),
        (["query", "--catalogue=c", "s"], ["--catalogue=c", "query", "s"]),
        (["query", "--version"], ["--version", "query"]),
        (["load", "--", "--catalogue"], ["load", "--", "--catalogue"]),
        (["--catalogue", "--odd", "query"], ["--catalogue", "--odd", "query"]),
        ([], []),
    ],
)
def test_global_options_come_to_the_front(given: list[str], expected: list[str]) -> None:
    """`--catalogue` with its path and `--version` move in front of the command, all else keeps its order."""
    assert hoisted(given) == expected


def test_catalogue_needs_its_path() -> None:
    """`--catalogue` as the last word is wrong usage."""
    with pytest.raises(UsageRefused, match="no path stands behind it"):
        hoisted(["query", "--catalogue"])


@pytest.mark.parametrize(
    ("given", "command"),
    [
        (["query", "s"], "query"),
        (["--catalogue", "query", "load", "s"], "load"),
        (["load", "s", "--catalogue=query"], "load"),
        (["--version"], ""),
        (["--help", "query"], ""),
        (["--", "query"], ""),
        ([], ""),
    ],
)
def test_command_is_the_first_word_behind_the_global_options(given: list[str], command: str) -> None:
    """The command is found wherever the catalogue stands; behind another option or `--` there is none."""
    assert command_of(given) == command
