"""The two designs that are worked out in full, read from their files."""

from __future__ import annotations

import json
from functools import cache
from pathlib import Path
from typing import TYPE_CHECKING, Any

from selector.candidate import Design, conditions_of
from selector.parts import read_part
from selector.search.assess import chain_of
from selector.spec import spec_of

if TYPE_CHECKING:
    from collections.abc import Mapping

    from selector.candidate.chain import Chain
    from selector.parts import Part
    from selector.spec import Spec

FOLDER = Path(__file__).parents[1] / "reference" / "worked"
NAMES = ("high_side_two_way", "low_side_two_ranges")
# What the files leave open, with values that do not bind.
OPEN_ENTRIES: dict[str, object] = {
    "limits.burden": 1.0,
    "limits.power": 1.0,
    "signal.bandwidth": 100.0,
    "ranges.most": 4,
    "parts.from": "all",
}
OPEN_FIELDS: dict[str, dict[str, object]] = {
    "shunt": {},
    "amplifier": {
        "common_mode_min": -1.0,
        "common_mode_max": 100.0,
        "supply_min": 1.0,
        "supply_max": 50.0,
        "temp_min": -100.0,
        "temp_max": 200.0,
        "reference_pin": True,
    },
    "switch": {"channels": 4, "supply_min": 1.0, "supply_max": 50.0},
    "resistor": {"tempco": 0.0},
    "capacitor": {},
}


@cache
def figures(name: str) -> dict[str, Any]:
    """Return all that the file of a design holds."""
    found: dict[str, Any] = json.loads((FOLDER / f"{name}.json").read_text(encoding="utf-8"))
    return found


def spec(name: str, **changes: object) -> Spec:
    """Return the spec of a design, with entries changed."""
    stated = {key.replace("__", "."): value for key, value in changes.items()}
    return spec_of(OPEN_ENTRIES | figures(name)["spec"] | stated)


def design(name: str) -> Design:
    """Return the parts of a design."""
    parts = figures(name)["parts"]

    def read(kind: str, place: str, cells: Mapping[str, object]) -> Any:  # noqa: ANN401 - a part of any kind
        part: Part = read_part(kind, {"part": place} | OPEN_FIELDS[kind] | cells, where=place)
        return part

    return Design(
        shunts=(read("shunt", "shunt", parts["shunt"]),),
        amplifier=read("amplifier", "amplifier", parts["amplifier"]),
        switch=read("switch", "switch", parts["switch"]),
        common=read("resistor", "common", parts["common"]) if "common" in parts else None,
        gain=tuple(read("resistor", f"gain-{number}", cells) for number, cells in enumerate(parts["gain"])),
        filter_resistor=read("resistor", "filter-resistor", parts["filter_resistor"]),
        filter_capacitor=read("capacitor", "filter-capacitor", parts["filter_capacitor"]),
    )


def chain(name: str, **changes: object) -> Chain:
    """Return the chain of a design, with entries of its spec changed."""
    return chain_of(conditions_of(spec(name, **changes)), design(name))
