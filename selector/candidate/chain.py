"""A combination with everything that is known of it: its parts, its pair, its ranges from the lowest currents up."""

from __future__ import annotations

from dataclasses import dataclass

from selector.candidate.design import Design
from selector.candidate.operating import Operating, Pairing


@dataclass(frozen=True, slots=True)
class Chain:
    """A combination; `ranges` is empty where the output has no window, `filtered` tells that the filter is in.

    `exempt` holds the (kind, code) of parts that come from outside the stock.
    """

    design: Design
    pairing: Pairing
    ranges: tuple[Operating, ...]
    exempt: frozenset[tuple[str, str]]
    filtered: bool
