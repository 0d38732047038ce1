"""The parts of a design as the lines of a bill of materials."""

from __future__ import annotations

from selector.bill.line import BillLine
from selector.candidate import Design
from selector.parts import Part


def bill_lines(design: Design, boards: int) -> tuple[BillLine, ...]:
    """Return one line per part, in the order of its first place, with the pieces for `boards` boards.

    Parts of the same code but other figures, as in-line parts may be, have lines of their own.
    """
    uses: dict[Part, list[str]] = {}
    pieces: dict[Part, int] = {}
    for place in design.places():
        uses.setdefault(place.part, []).append(place.use)
        pieces[place.part] = pieces.get(place.part, 0) + place.count * boards
    return tuple(_line(part, ", ".join(places), pieces[part]) for part, places in uses.items())


def _line(part: Part, use: str, quantity: int) -> BillLine:
    return BillLine(
        use=use,
        kind=part.kind,
        part=part.part,
        description=part.description,
        quantity=quantity,
        on_hand=part.quantity,
        unit_cost=part.unit_cost,
        line_cost=None if part.unit_cost is None else quantity * part.unit_cost,
    )
