"""Sections of the spec that steer the search: ranges, filter and the parts to choose from."""

from __future__ import annotations

from typing import Annotated, Literal

from pydantic import Field

from selector.spec.demand import Section
from selector.spec.holds import Holds, choice, count, fraction, positive, value
from selector.spec.named_lists import NamedLists
from selector.units import RESISTANCE


class Ranges(Section):
    """How many measuring ranges there may be, and what changes between them."""

    most: Annotated[int, count("most ranges", "2", 1, 4)] = 1
    overlap: Annotated[float, fraction("hysteresis between two ranges", "10 %")] = 0.1
    by: Annotated[
        Literal["gain", "shunt", "either"],
        choice("what changes from range to range", "gain", "shunt", "either"),
    ] = "gain"


class Filter(Section):
    """What the output filter and gain capacitors may be."""

    resistance_min: Annotated[float, value(RESISTANCE, "least filter resistor", "10 ohm")] = 10.0
    resistance_max: Annotated[float, value(RESISTANCE, "largest filter resistor", "10 kohm")] = 1e4
    gain_corner: Annotated[float, positive("corner of a gain capacitor over the bandwidth", "3")] = 3.0


class Parts(Section):
    """Which parts of the catalogue may be used; the key `from` is `from_` in Python."""

    from_: Annotated[
        Literal["stock", "all"],
        choice("parts to choose from", "stock", "all"),
        Field(alias="from"),
    ] = "stock"
    boards: Annotated[int, count("boards to be built", "1", 1)] = 1
    only: Annotated[
        NamedLists | None,
        Holds("codes by kind", "part codes to choose from, by kind", '{shunt = ["S-0R82", "S-1R0"]}'),
    ] = None
    avoid: Annotated[tuple[str, ...], Holds("codes", "part codes to leave out", '["S-0R82"]')] = ()
