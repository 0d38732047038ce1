"""What a spec holds once it is read."""

from __future__ import annotations

import pytest
from pydantic import ValidationError

from selector.spec import KEYS, Band, NamedLists, Spec, entries, spec_of

LEAST: dict[str, object] = {
    "current.min": 60e-6,
    "current.max": 0.06,
    "accuracy.reading": 0.02,
    "limits.burden": 0.1,
    "limits.power": 0.02,
    "supply.voltage": 3.3,
    "converter.bits": 12,
    "converter.reference": 2.5,
    "ambient.min": -20,
    "ambient.max": 50,
    "signal.bandwidth": 200,
}
# Source: interface.md, section 2.
DEFAULTS: dict[str, object] = {
    "current.two_way": False,
    "current.overload": None,
    "accuracy.bands": None,
    "accuracy.method": "worst-case",
    "accuracy.coverage": 2.0,
    "accuracy.calibration": "none",
    "accuracy.calibration_uncertainty": 0.0,
    "limits.headroom": 0.05,
    "limits.cost": None,
    "limits.transient": None,
    "limits.load_fraction": 0.5,
    "supply.tolerance": 0.05,
    "sense.side": "low",
    "sense.lead": 0.0,
    "output.low": 0.0,
    "output.zero": 0.0,
    "output.zero_tolerance": None,
    "converter.inl": 0.0,
    "converter.input_resistance": None,
    "converter.clamp_current": 0.0,
    "converter.average": 1,
    "ambient.nominal": 25.0,
    "ambient.gradient": 1.0,
    "signal.settle": None,
    "ranges.most": 1,
    "ranges.overlap": 0.1,
    "ranges.by": "gain",
    "filter.resistance_min": 10.0,
    "filter.resistance_max": 1e4,
    "filter.gain_corner": 3.0,
    "parts.from": "stock",
    "parts.boards": 1,
    "parts.only": None,
    "parts.avoid": (),
    "rank.power": 1.0,
    "rank.error": 1.0,
}


@pytest.mark.parametrize("key", DEFAULTS)
def test_what_is_absent_has_its_default(key: str) -> None:
    """Each optional key has the default of the interface."""
    section, leaf = key.split(".")
    section_of = getattr(spec_of(LEAST), section)
    assert getattr(section_of, "from_" if leaf == "from" else leaf) == DEFAULTS[key]
    assert KEYS[key].default == DEFAULTS[key]


def test_the_required_keys_are_those_of_the_interface() -> None:
    """No key is required but those that have no default, accuracy's pair being required by a rule."""
    required = [key.name for key in KEYS.values() if key.required]
    assert sorted(required) == sorted(set(LEAST) - {"accuracy.reading"})


def test_an_absent_output_high_is_the_supply() -> None:
    """The highest output voltage is the supply unless stated, also among the entries."""
    spec = spec_of(LEAST)
    assert spec.output.high is None
    assert spec.output_high_v == 3.3
    assert entries(spec)["output"] == {
        "low": 0.0,
        "high": 3.3,
        "zero": 0.0,
        "zero_tolerance": None,
        "zero_drift": None,
    }


def test_entries_stand_in_the_order_of_the_keys() -> None:
    """All keys are among the entries, in the order of the interface."""
    listed = entries(spec_of(LEAST))
    names = [f"{section}.{leaf}" for section, table in listed.items() if isinstance(table, dict) for leaf in table]
    assert ["title", *names] == list(KEYS)


def test_lists_and_bands_are_plain_among_the_entries() -> None:
    """Bands, codes by kind and codes become lists and tables that JSON can hold."""
    bands = [{"up_to": "1 mA", "reading": "5 %"}, {"floor": "3 uA"}]
    stated = {key: value for key, value in LEAST.items() if key != "accuracy.reading"}
    listed = entries(
        spec_of({**stated, "accuracy.bands": bands, "parts.only": {"shunt": [" S-1 "]}, "parts.avoid": ["A-1"]})
    )
    assert listed["accuracy"]["bands"] == [
        {"up_to": 0.001, "reading": 0.05, "floor": 0.0},
        {"up_to": None, "reading": 0.0, "floor": 3e-6},
    ]
    assert listed["parts"]["only"] == {"shunt": ["S-1"]}
    assert listed["parts"]["avoid"] == ["A-1"]


def test_a_spec_is_frozen_and_can_be_hashed() -> None:
    """Equal specs have one hash, and no entry can be set."""
    spec = spec_of({**LEAST, "parts.only": {"shunt": ["S-1"]}})
    assert hash(spec) == hash(spec_of({**LEAST, "parts.only": {"shunt": ["S-1"]}}))
    with pytest.raises(ValidationError, match="frozen"):
        spec.current.min = 1.0


def test_named_lists_are_a_mapping() -> None:
    """Codes by kind are asked like a dict."""
    lists = NamedLists((("shunt", ("S-1", "S-2")),))
    assert dict(lists) == {"shunt": ("S-1", "S-2")}
    assert lists.get("switch") is None
    assert len(lists) == 1


@pytest.mark.parametrize("by", ["gain", "shunt", "either"])
def test_every_sort_of_range_is_a_spec(by: str) -> None:
    """Ranges by gain, by shunt and by either are valid where there are two."""
    assert spec_of({**LEAST, "ranges.by": by, "ranges.most": 2}).ranges.by == by


@pytest.mark.parametrize("method", ["worst-case", "rss", "monte-carlo"])
def test_every_method_is_a_spec(method: str) -> None:
    """The three ways of combining errors are valid."""
    assert spec_of({**LEAST, "accuracy.method": method}).accuracy.method == method


def test_a_stack_of_either_sort_may_have_one_range() -> None:
    """Only ranges by shunt alone need two."""
    assert spec_of({**LEAST, "ranges.by": "either", "ranges.most": 1}).ranges.most == 1


def test_the_bus_may_stand_unused_at_the_low_side() -> None:
    """Bus voltages in any order do not matter at the low side."""
    assert spec_of({**LEAST, "sense.bus_min": 5, "sense.bus_max": 3}).sense.bus_min == 5.0


def test_the_model_itself_refuses_what_cannot_stand_together() -> None:
    """Whoever builds a spec without reading it meets the same rules."""
    good = spec_of(LEAST)
    with pytest.raises(ValidationError, match=r"current\.max"):
        Spec.model_validate({**dict(good), "current": good.current.model_copy(update={"max": 1e-6})})


def test_the_model_itself_refuses_what_is_out_of_bounds() -> None:
    """Bounds hold for whoever builds a table."""
    with pytest.raises(ValidationError, match="not below 100 %"):
        Band(reading=1.0)


def test_one_of_reading_and_floor_is_enough() -> None:
    """An allowance of a floor alone, or of a share of the reading alone, is complete."""
    stated = {key: value for key, value in LEAST.items() if key != "accuracy.reading"}
    assert spec_of({**stated, "accuracy.floor": "1 uA"}).accuracy.reading is None
    assert spec_of(LEAST).accuracy.floor is None


def test_zero_current_needs_a_floor() -> None:
    """A span that begins at 0 A is a spec where a floor is allowed."""
    assert spec_of({**LEAST, "current.min": 0, "accuracy.floor": 1e-6}).current.min == 0.0
