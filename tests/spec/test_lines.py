"""The lines of keys, in every form that TOML has for them."""

from __future__ import annotations

import tomllib

from hypothesis import given
from hypothesis import strategies as st

from selector.spec.lines import key_lines, outwards

FORMS = r"""title = '''
[not.a.table]
min = 1 "
''' # [comment]
top = "it \" [x]"
[ current ] # [x]
min = '60 uA # no ]'
"max" = [ # = {
  1,
]
[accuracy]
bands = [
  {up_to = "1 mA", reading = 5},

  { floor = 3 },
]
[sense]
lead.a = 1
'bus.min' = 2
limits = {burden = {deep = 1}, power = [[1], {x = 2}]}
[[more.list]]
a = 1
[[more.list]]
a = 2
"""


def test_every_form_of_key_has_its_line() -> None:
    """Multi-line strings, comments, inline tables, arrays, dotted and quoted keys do not lead the count astray.

    Source: TOML 1.0.0, the sections on keys, strings, arrays, inline tables and arrays of tables.
    Tolerance: none.
    """
    assert set(tomllib.loads(FORMS)) == {"title", "top", "current", "accuracy", "sense", "more"}
    found = key_lines(FORMS)
    expected = {
        "title": 1,
        "top": 5,
        "current": 6,
        "current.min": 7,
        "current.max": 8,
        "accuracy": 11,
        "accuracy.bands": 12,
        "accuracy.bands[1].up_to": 13,
        "accuracy.bands[1].reading": 13,
        "accuracy.bands[2].floor": 15,
        "sense.lead": 18,
        "sense.lead.a": 18,
        "sense.'bus.min'": 19,
        "sense.limits.burden.deep": 20,
        "sense.limits.power[2].x": 20,
        "more.list": 21,
        "more.list[1].a": 22,
        "more.list[2].a": 24,
    }
    assert {name: found.get(name) for name in expected} == expected
    assert "not.a.table" not in found


@given(st.text(alphabet="a=[]{}\"'\\#.,\n 1", max_size=60))
def test_any_text_is_walked_to_its_end(text: str) -> None:
    """The walk ends on every text, and no line it names lies outside the text."""
    assert all(1 <= line <= text.count("\n") + 1 for line in key_lines(text).values())


@given(st.dictionaries(st.text(alphabet="abc", min_size=1), st.integers(), min_size=1))
def test_each_key_of_a_plain_table_has_its_own_line(table: dict[str, int]) -> None:
    """One key to a line: the n-th key stands on the n-th line."""
    text = "".join(f"{key} = {value}\n" for key, value in table.items())
    assert key_lines(text) == {key: number for number, key in enumerate(table, 1)}


def test_a_key_is_followed_outwards_step_by_step() -> None:
    """Elements of lists, tables and single keys come off one by one; brackets within a name are part of it."""
    assert list(outwards("accuracy.bands[2].up_to")) == [
        "accuracy.bands[2].up_to",
        "accuracy.bands[2]",
        "accuracy.bands",
        "accuracy",
    ]
    assert list(outwards("limits.a[31m")) == ["limits.a[31m", "limits"]
    assert list(outwards("x[y")) == ["x[y"]


@given(st.text(alphabet="a.[]1\x1b", max_size=400))
def test_every_key_is_left_behind(key: str) -> None:
    """Whatever a key holds, the way outwards ends, after no more steps than the key has characters."""
    assert len(list(outwards(key))) <= len(key)
