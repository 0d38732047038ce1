"""Names that are known, and those like them."""

from __future__ import annotations

import getpass
from pathlib import Path

import pytest

from selector.app.kinds import kind_named
from selector.app.naming import did_you_mean, file_name, near_ones, shown_path, who
from selector.app.specs import overrides_of, weights_of
from selector.errors import UsageRefused


def test_names_about_as_like_as_the_best_are_meant() -> None:
    """The most alike comes first, and one that is much less alike is left out."""
    assert near_ones("amp-t9", ["AMP-T1", "AMP-T2", "AMP-Z3"])[:2] in (("AMP-T2", "AMP-T1"), ("AMP-T1", "AMP-T2"))
    assert "AMP-Z3" not in near_ones("amp-t9", ["AMP-T1", "AMP-T2", "AMP-Z3"])
    assert did_you_mean("zzz", ["a"], "see the list") == "see the list"


def test_kind_is_known_whatever_its_capitals() -> None:
    """A kind is read without regard to capitals and blanks; all else is wrong usage."""
    assert kind_named(" Shunt ") == "shunt"
    with pytest.raises(UsageRefused, match='did you mean "shunt"'):
        kind_named("shunts")
    with pytest.raises(UsageRefused, match="a switch cannot be meant here"):
        kind_named("switch", ["shunt"])


def test_path_is_shown_whatever_its_bytes() -> None:
    """Bytes of a name that are no UTF-8 are shown as escapes; `.` has the name of its folder."""
    assert shown_path(Path("a\udcff")) == "a\\xff"
    assert file_name(Path()) == Path.cwd().name


def test_nobody_is_nobody(monkeypatch: pytest.MonkeyPatch) -> None:
    """Where the system knows no login name, a part has none in its source."""

    def unknown() -> str:
        raise OSError

    monkeypatch.setattr(getpass, "getuser", unknown)
    assert who() == ""


def test_overrides_are_pairs_of_known_keys() -> None:
    """All that is wrong with overrides is told at once; the last of two counts."""
    assert overrides_of(["limits.burden=1", "limits.burden = 2=3"]) == {"limits.burden": "2=3"}
    with pytest.raises(UsageRefused) as refused:
        overrides_of(["limits.burden", "limits.brden=1"])
    assert len(refused.value.faults) == 2


def test_weights_are_overrides_of_rank() -> None:
    """`power=1,error=2` sets two entries of the ranking."""
    assert weights_of("power=1, error=2") == {"rank.power": "1", "rank.error": "2"}
    assert weights_of(None) == {}
    for text in ("", "power", "power=1,", "speed=1"):
        with pytest.raises(UsageRefused):
            weights_of(text)
