"""Options that are read by hand, and where an answer goes."""

from __future__ import annotations

from pathlib import Path

import pytest

from selector.cli.emit import FORMS, sink_of
from selector.cli.load import headings_of
from selector.cli.query import top_of
from selector.errors import UsageRefused


def test_top_is_a_number_or_all() -> None:
    """`all` is no bound; everything that is no number from 1 is refused."""
    assert (top_of("all"), top_of("1"), top_of("250")) == (None, 1, 250)
    for text in ("", "0", "-1", "1.5", "²", "٣", "9" * 5000, "ALL"):
        with pytest.raises(UsageRefused):
            top_of(text)


def test_map_is_split_at_the_last_sign() -> None:
    """A heading may hold `=`; an empty field leaves a column out."""
    assert headings_of(["a=b=part", "Supplier="]) == {"a=b": "part", "Supplier": ""}
    with pytest.raises(UsageRefused):
        headings_of(["=part"])


@pytest.mark.parametrize(
    ("form", "output", "expected"),
    [
        (None, None, "table"),
        (None, "a.json", "json"),
        (None, "a.CSV", "csv"),
        (None, "a.md", "markdown"),
        (None, "a.txt", "table"),
        ("json", "a.csv", "json"),
    ],
)
def test_format_left_out_is_that_of_the_ending(
    form: str | None, output: str | None, expected: str, tmp_path: Path
) -> None:
    """`--format` counts, else the ending of `--output`, else it is a table."""
    sink = sink_of(form, None if output is None else tmp_path / output)
    assert sink.form == expected
    assert (sink.target is None) == (output is None)


def test_format_that_an_answer_has_not_is_refused(tmp_path: Path) -> None:
    """A design as TOML is a format of `bill` alone."""
    for form, output in (("toml", None), (None, tmp_path / "a.toml")):
        with pytest.raises(UsageRefused, match="choose table, json, csv, markdown"):
            sink_of(form, output)
    assert sink_of(None, tmp_path / "a.toml", forms=(*FORMS, "toml")).form == "toml"
