"""The stock covers the boards."""

from __future__ import annotations

from selector.candidate.design import in_stock
from selector.candidate.elementwise import larger
from selector.limits.measure import ChoiceAt, ChoiceCheck, DesignAt, DesignCheck, Limit, Measure
from selector.units import COUNT


def _enough(at: DesignAt) -> Measure | None:
    """Pieces for all boards against the quantity in stock, of the part that is shortest."""
    if not at.conditions.stock_only:
        return None
    wanted = [
        (kind, code, pieces) for (kind, code), pieces in at.design.uses().items() if (kind, code) not in at.exempt
    ]
    held = {(place.part.kind, place.part.part): in_stock(place.part) for place in at.design.places()}
    needs = [(float(at.conditions.boards * pieces), float(held[kind, code])) for kind, code, pieces in wanted]
    if not needs:
        return None
    needed, quantity = min(needs, key=lambda pair: pair[1] - pair[0])
    return Measure(needed, quantity)


def _enough_of_each(at: ChoiceAt) -> Measure | None:
    """The same for every filter pair beside the rest of the design: the largest shortage against none."""
    if not at.conditions.stock_only:
        return None
    rest = _enough(DesignAt(at.conditions, at.design, at.exempt))
    short = 0.0 if rest is None else max(0.0, float(rest.value) - float(rest.allowed))
    boards = at.conditions.boards
    short_of_resistors = boards * at.resistor_uses - at.held_resistors
    short_of_capacitors = boards * at.capacitor_uses - at.held_capacitors
    return Measure(larger(larger(short_of_resistors, short_of_capacitors), short), 0.0)


LIMIT = Limit(
    "stock",
    (
        DesignCheck(_enough),
        ChoiceCheck(_enough_of_each),
    ),
    COUNT,
    thins=True,
)
