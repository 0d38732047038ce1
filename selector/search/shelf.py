"""The parts that a search may use, and those that are out before it begins."""

from __future__ import annotations

from collections import Counter
from collections.abc import Iterable, Mapping
from dataclasses import dataclass, replace
from typing import TypeVar

from selector.candidate import Conditions, Design, conditions_of
from selector.candidate.design import in_stock
from selector.limits import unfit
from selector.parts import Amplifier, Bypass, Capacitor, Part, Resistor, Shunt, Switch
from selector.search.found import LeftOut
from selector.spec import Spec

Kind = TypeVar("Kind", bound=Part)


@dataclass(frozen=True, slots=True)
class Shelf:
    """The parts of each kind, by code point of their codes, and how many were left out."""

    conditions: Conditions
    shunts: tuple[Shunt, ...]
    amplifiers: tuple[Amplifier, ...]
    switches: tuple[Switch, ...]
    bypasses: tuple[Bypass, ...]
    resistors: tuple[Resistor, ...]
    capacitors: tuple[Capacitor, ...]
    left_out: tuple[LeftOut, ...]


def shelf_of(spec: Spec, stock: Mapping[str, tuple[Part, ...]]) -> Shelf:
    """Return the parts that the spec leaves.

    Narrowed by its `parts` section; unfit capacitors are out; costs in more than one currency are unknown costs.
    """
    conditions = conditions_of(spec)
    left_out: Counter[tuple[str, str]] = Counter()
    priced = _priced(stock)

    def kept(kind: type[Kind]) -> tuple[Kind, ...]:
        rows = []
        for part in sorted(priced.get(kind.kind, ()), key=lambda one: one.part):
            reason = _reason(spec, conditions, part)
            if reason is not None:
                left_out[kind.kind, reason] += 1
            elif isinstance(part, kind):
                rows.append(part)
        return tuple(rows)

    return Shelf(
        conditions,
        kept(Shunt),
        kept(Amplifier),
        kept(Switch),
        kept(Bypass),
        kept(Resistor),
        kept(Capacitor),
        tuple(LeftOut(kind, reason, count) for (kind, reason), count in sorted(left_out.items())),
    )


def _reason(spec: Spec, conditions: Conditions, part: Part) -> str | None:
    only = None if spec.parts.only is None else spec.parts.only.get(part.kind)
    if only is not None and part.part not in only:
        return "not in parts.only"
    if part.part in spec.parts.avoid:
        return "in parts.avoid"
    if conditions.stock_only and in_stock(part) < conditions.boards:
        return "too few in stock" if in_stock(part) else "not in stock"
    return unfit(part, conditions) if isinstance(part, Capacitor) else None


def in_one_currency(design: Design, stock: Mapping[str, tuple[Part, ...]]) -> Design:
    """Return a design whose parts have no costs where they and the catalogue's have them in several currencies."""
    parts = [place.part for place in design.places()]
    if len(_currencies([parts, *stock.values()])) <= 1:
        return design
    return replace(
        design,
        shunts=tuple(_unpriced(shunt) for shunt in design.shunts),
        amplifier=_unpriced(design.amplifier),
        switch=design.switch and _unpriced(design.switch),
        common=design.common and _unpriced(design.common),
        gain=design.gain and tuple(_unpriced(resistor) for resistor in design.gain),
        filter_resistor=design.filter_resistor and _unpriced(design.filter_resistor),
        filter_capacitor=design.filter_capacitor and _unpriced(design.filter_capacitor),
    )


def _priced(stock: Mapping[str, tuple[Part, ...]]) -> Mapping[str, Iterable[Part]]:
    if len(_currencies(stock.values())) <= 1:
        return stock
    return {kind: [_unpriced(part) for part in parts] for kind, parts in stock.items()}


def _currencies(stock: Iterable[Iterable[Part]]) -> set[str]:
    """Return the currencies that costs are stated in."""
    priced = (part for parts in stock for part in parts if part.unit_cost is not None)
    return {part.currency for part in priced if part.currency is not None}


def _unpriced(part: Kind) -> Kind:
    return part.model_copy(update={"unit_cost": None})
