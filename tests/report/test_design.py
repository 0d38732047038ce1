"""A design as TOML holds everything that `check` needs."""

from __future__ import annotations

import tomllib
from dataclasses import replace

from selector.candidate import Design
from selector.parts import read_part
from selector.report import design_toml


def test_codes_in_their_places(design: Design) -> None:
    """Parts of the catalogue stand as codes, the gain resistors in the order of the ranges."""
    assert tomllib.loads(design_toml(design)) == {
        "shunts": ["S-0R82"],
        "amplifier": "AMP-Z3",
        "switch": "SW-4",
        "common": "R-20K",
        "gain": ["R-31R6", "R-549R"],
        "filter_resistor": "R-1K",
        "filter_capacitor": "C-100n",
    }


def test_what_is_not_there_has_no_key(design: Design) -> None:
    """A fixed gain without switch and without filter leaves shunt and amplifier."""
    bare = replace(design, switch=None, common=None, gain=None, filter_resistor=None, filter_capacitor=None)
    assert tomllib.loads(design_toml(bare)) == {"shunts": ["S-0R82"], "amplifier": "AMP-Z3"}


def test_in_line_parts_come_back_equal(design: Design) -> None:
    """A part that is in no catalogue stands as a table from which the same part is read, odd figures included."""
    odd = design.gain[0].model_copy(update={"resistance": 0.1 + 0.2, "part": "in-line"}) if design.gain else None
    assert odd is not None
    other = odd.model_copy(update={"resistance": 1e4 / 3.0, "part": "in-line 2"})
    mixed = replace(design, gain=(odd, other))
    data = tomllib.loads(design_toml(mixed, frozenset({("shunt", "S-0R82"), ("amplifier", "AMP-Z3")})))
    assert read_part("shunt", data["shunts"][0], where="here") == design.shunts[0]
    assert read_part("amplifier", data["amplifier"], where="here") == design.amplifier
    assert [read_part("resistor", each, where="here") for each in data["gain"]] == [odd, other]
    assert data["common"] == "R-20K"


def test_hostile_codes_come_back(design: Design) -> None:
    """Quotes, backslashes, controls, DEL and line breaks in a code stand escaped and read back."""
    code = '"]\\\n\x7f\x1b\x85\u202e\U0001f600 = 1 # \N{GREEK CAPITAL LETTER OMEGA}'
    strange = replace(design, shunts=(design.shunts[0].model_copy(update={"part": code}),))
    text = design_toml(strange)
    assert tomllib.loads(text)["shunts"] == [code]
    assert not set("\x7f\x1b\x85\u202e") & set(text)
