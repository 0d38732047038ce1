"""The parts that a search may use, and those that are out before it begins."""

from __future__ import annotations

from collections import Counter
from collections.abc import Iterable, Mapping
from dataclasses import dataclass
from typing import TypeVar

from selector.candidate import Conditions, conditions_of
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
    if conditions.stock_only and (part.generic or (part.quantity or 0) < conditions.boards):
        return "not in stock"
    return unfit(part, conditions) if isinstance(part, Capacitor) else None


def _priced(stock: Mapping[str, tuple[Part, ...]]) -> Mapping[str, Iterable[Part]]:
    currencies = {
        part.currency
        for parts in stock.values()
        for part in parts
        if part.unit_cost is not None and part.currency is not None
    }
    if len(currencies) <= 1:
        return stock
    return {kind: [part.model_copy(update={"unit_cost": None}) for part in parts] for kind, parts in stock.items()}
