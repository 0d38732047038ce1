"""Reading a spec: units, bare numbers, overrides, and round trips."""

from __future__ import annotations

import json
import tomllib
from pathlib import Path

import pytest
from hypothesis import given
from hypothesis import strategies as st

from selector.errors import InputRefused
from selector.spec import KEYS, entries, load_spec, schema, spec_of, template
from selector.spec.judge import flat
from selector.spec.load import override_value
from selector.units import exact

# Keys that may take any value of these bounds beside the example, whatever the others are.
FREE: dict[str, tuple[float, float]] = {
    "current.min": (1e-9, 0.05),
    "accuracy.reading": (1e-6, 0.99),
    "accuracy.floor": (1e-12, 1.0),
    "accuracy.coverage": (0.1, 10.0),
    "limits.burden": (1e-6, 10.0),
    "limits.power": (1e-9, 10.0),
    "limits.headroom": (0.0, 0.99),
    "limits.cost": (0.01, 1e4),
    "supply.voltage": (1.0, 1e3),
    "supply.tolerance": (0.0, 0.5),
    "sense.lead": (0.0, 1.0),
    "output.zero_drift": (0.0, 1e-3),
    "converter.inl": (0.0, 100.0),
    "converter.noise": (0.0, 0.1),
    "converter.input_resistance": (1.0, 1e9),
    "ambient.min": (-200.0, 25.0),
    "ambient.max": (25.0, 1e3),
    "ambient.gradient": (0.0, 50.0),
    "signal.bandwidth": (1e-3, 1e9),
    "signal.settle": (1e-9, 1e3),
    "filter.resistance_min": (1e-3, 1e4),
    "rank.power": (0.0, 100.0),
}
EXAMPLE = spec_of({key.name: key.holds.example for key in KEYS.values() if key.required} | {"accuracy.reading": "2 %"})


def example() -> dict[str, object]:
    """Return the entries of a small spec by dotted key."""
    flat: dict[str, object] = {}
    for section, table in entries(EXAMPLE).items():
        if isinstance(table, dict):
            flat |= {f"{section}.{leaf}": value for leaf, value in table.items() if value is not None}
    return flat


@st.composite
def figures(draw: st.DrawFn) -> dict[str, float]:
    """Draw figures of some of the free keys."""
    keys = draw(st.lists(st.sampled_from(sorted(FREE)), unique=True))
    return {key: draw(st.floats(*FREE[key])) for key in keys}


@given(figures())
def test_texts_with_units_are_the_same_as_numbers(stated: dict[str, float]) -> None:
    """Each figure as exact text with its unit makes the same spec as the SI number, bit for bit."""
    texts = {key: exact(value, KEYS[key].holds.quantity) for key, value in stated.items()}
    assert spec_of(example() | texts) == spec_of(example() | stated)


@given(figures())
def test_a_template_holds_what_it_was_given(tmp_path_factory: pytest.TempPathFactory, stated: dict[str, float]) -> None:
    """The text of a new spec loads with the values that were given for it."""
    path = tmp_path_factory.mktemp("spec") / "new.toml"
    path.write_text(template({key: repr(value) for key, value in stated.items()}), encoding="utf-8")
    spec = load_spec(path)
    assert {key: entries(spec)[key.split(".")[0]][key.split(".")[1]] for key in stated} == stated


@given(figures())
def test_entries_make_the_same_spec_again(stated: dict[str, float]) -> None:
    """What is shown of a spec, read as a spec, is the spec."""
    spec = spec_of(example() | stated)
    flat: dict[str, object] = {}
    for section, table in entries(spec).items():
        flat |= {f"{section}.{leaf}": value for leaf, value in table.items()} if isinstance(table, dict) else {}
    again = spec_of({key: value for key, value in flat.items() if value is not None and value != []})
    assert entries(again) == entries(spec)


def load(folder: Path, text: str, overrides: dict[str, str] | None = None) -> dict[str, object]:
    """Return the entries of a spec from its text."""
    path = folder / "frost.toml"
    path.write_text(text, encoding="utf-8")
    return entries(load_spec(path, overrides))


def test_the_template_loads(tmp_path: Path) -> None:
    """A new spec that nobody has touched is a spec: an orchard's frost alarm at the low side."""
    listed = load(tmp_path, template({}))
    assert listed["title"] == "Orchard frost alarm, node 7"
    assert listed["current"] == {
        "min": 60e-6,
        "max": 0.06,
        "two_way": False,
        "overload": None,
        "overload_time": None,
    }


def test_the_optional_keys_of_the_template_load_too(tmp_path: Path) -> None:
    """Each commented entry of a new spec, put in force alone, is valid beside the others but for those of a rule."""
    ruled = ("overload", "overload_time", "bands")
    lines = template({}).splitlines()
    tried = []
    for number, line in enumerate(lines):
        leaf = line[2:].split(" = ")[0]
        if line.startswith("# ") and " = " in line and leaf not in ruled and number > 3:
            section = next(head[1:-1] for head in reversed(lines[:number]) if head.startswith("["))
            read = load(tmp_path, "\n".join([*lines[:number], line[2:], *lines[number + 1 :]]))[section]
            assert isinstance(read, dict)
            assert read[leaf] is not None
            tried.append(f"{section}.{leaf}")
    stated, _ = flat(tomllib.loads("\n".join(lines)))
    assert tried == [name for name, key in KEYS.items() if name not in stated and key.leaf not in ruled]


def test_the_template_names_every_key() -> None:
    """Every key stands in a new spec once, in force or commented out."""
    text = template({})
    for key in KEYS.values():
        table = text.split(f"\n[{key.section}]\n")[1].split("\n[")[0] if key.section else text.split("\n[")[0]
        assert sum(line.removeprefix("# ").startswith(f"{key.leaf} = ") for line in table.splitlines()) == 1


def test_a_template_at_the_high_side_has_a_bus(tmp_path: Path) -> None:
    """A new spec for the high side loads: its bus voltages are filled with examples."""
    assert load(tmp_path, template({"sense.side": "high"}))["sense"]["bus_nominal"] == 3.3


def test_a_template_with_bands_has_no_single_allowance(tmp_path: Path) -> None:
    """Bands that are given stand in place of reading and floor."""
    listed = load(tmp_path, template({"accuracy.bands": '[{up_to = "1 mA", floor = "3 uA"}, {reading = "1 %"}]'}))
    assert listed["accuracy"]["reading"] is None
    assert len(listed["accuracy"]["bands"]) == 2


@pytest.mark.parametrize("title", ['a "b" \\ c', "'", "80mV # no", "tab\tline\nend\x7f", "=", "{", "5 # five", "ä"])
def test_a_template_quotes_any_title(title: str, tmp_path: Path) -> None:
    """A title with quotes, marks or control characters loads as it was given."""
    quoted = json.dumps(title).replace("\x7f", "\\u007f")
    assert load(tmp_path, template({"title": quoted}))["title"] == title
    if title != "5 # five":
        assert load(tmp_path, template({"title": title}))["title"] == title


def test_a_template_refuses_a_key_that_there_is_not() -> None:
    """A value for an unknown key is refused by the name of the option."""
    with pytest.raises(InputRefused) as refused:
        template({"current.maximum": "1 A"})
    assert str(refused.value) == '--set current.maximum: unknown key "current.maximum"; did you mean "current.max"?'


@pytest.mark.parametrize(
    ("text", "value"),
    [
        ("80mV", "80mV"),
        ("0.08", 0.08),
        ('"80 mV"', "80 mV"),
        ("true", True),
        ("5 %", "5 %"),
        ("[1, 2]", [1, 2]),
        ("", ""),
        ("1\nother = 2", "1\nother = 2"),
        ("[" * 5000, "[" * 5000),
        ("2_000", 2000),
    ],
)
def test_an_override_is_toml_where_it_reads_as_such(text: str, value: object) -> None:
    """The VALUE of `--set` is a TOML value where it reads as one, else a string."""
    assert override_value(text) == value


def test_overrides_win_over_the_file(tmp_path: Path) -> None:
    """An overridden entry has the value of the override, in units or bare."""
    listed = load(tmp_path, template({}), {"limits.burden": "80mV", "limits.power": "0.01", "ranges.most": "3"})
    assert (listed["limits"]["burden"], listed["limits"]["power"], listed["ranges"]["most"]) == (0.08, 0.01, 3)


def test_inline_tables_and_dotted_keys_are_tables(tmp_path: Path) -> None:
    """A spec may be written with inline tables and dotted keys."""
    text = (
        'current = {min = "60 uA", max = "60 mA"}\naccuracy.reading = "2 %"\nlimits.burden = 0.1\nlimits.power = 0.02\n'
        'supply.voltage = 3.3\nconverter = {bits = "12", reference = 2.5}\nambient = {min = -20, max = 50}\n'
        'signal.bandwidth = "200 Hz"\n'
    )
    assert load(tmp_path, text)["converter"]["bits"] == 12


def test_a_byte_order_mark_and_other_line_ends_are_taken(tmp_path: Path) -> None:
    """A spec saved with a byte order mark and CR LF reads as any other."""
    path = tmp_path / "frost.toml"
    path.write_bytes(b"\xef\xbb\xbf" + template({}).replace("\n", "\r\n").encode())
    assert load_spec(path).limits.burden == 0.1


def test_the_schema_describes_every_key() -> None:
    """Each key is in the JSON Schema with its meaning and an example; quantities are texts or numbers."""
    tables = schema()["properties"]
    for key in KEYS.values():
        described = tables[key.section]["properties"][key.leaf] if key.section else tables[key.leaf]
        assert key.meaning in described["description"]
        if key.holds.sort == "quantity":
            assert described["type"][0] == "string"
        if key.section:
            assert (key.leaf in tables[key.section]["required"]) == key.required


def test_the_schema_is_json() -> None:
    """The schema can be written as JSON without loss, and names its dialect."""
    assert json.loads(json.dumps(schema(), allow_nan=False)) == schema()
    assert schema()["$schema"] == "https://json-schema.org/draft/2020-12/schema"
    assert schema()["required"] == [
        "current",
        "accuracy",
        "limits",
        "supply",
        "converter",
        "ambient",
        "signal",
    ]
