"""The parts of a design, each once."""

from __future__ import annotations

from selector.candidate import Design
from selector.parts import Part


def parts_of(design: Design) -> tuple[Part, ...]:
    """Return the parts of a design, each once, in the order of the bill."""
    return tuple(dict.fromkeys(place.part for place in design.places()))
