"""Faults on the standard error."""

from __future__ import annotations

import pytest

from selector.cli.faults import and_others, sentence, tell, usage
from selector.errors import Fault, InputRefused


def test_at_most_twenty_faults_are_told(capsys: pytest.CaptureFixture[str]) -> None:
    """Of many faults the first twenty are told, then how many there are and what it means for the command."""
    tell(InputRefused(Fault(f"s.csv line {line}", "is wrong") for line in range(1, 1001)), "load")
    lines = capsys.readouterr().err.splitlines()
    assert lines[0] == "s.csv line 1: is wrong"
    assert lines[19:] == ["s.csv line 20: is wrong", "... and 980 more", "1000 faults, nothing was loaded"]


def test_a_single_fault_is_one_line(capsys: pytest.CaptureFixture[str]) -> None:
    """One fault stands alone, whatever line feeds its data has."""
    tell(InputRefused(Fault("a\nb", "is wrong\r", "mend\x1bit")))
    assert capsys.readouterr().err == "a\\x0ab: is wrong\\x0d; mend\\x1bit\n"


def test_wrong_usage_reads_like_the_other_faults(capsys: pytest.CaptureFixture[str]) -> None:
    """A message of the command line's parser begins small, ends without a stop, and says where to read on."""
    usage("No such option: --odd.", "selector query")
    assert capsys.readouterr().err == "no such option: --odd; see: selector query --help\n"
    assert sentence("") == ""


def test_names_are_cut_to_some_and_a_count() -> None:
    """A list of names ends after some of them with the number of the others."""
    assert and_others(["a", "b"], 2) == "a, b"
    assert and_others(["a", "b", "c"], 2) == "a, b and 1 more"
