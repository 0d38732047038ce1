"""One combination judged in full, limit by limit, in plain numbers: the contract that every search answers to."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import replace
from math import isinf

from selector.budget import combined, zeroed
from selector.candidate import Conditions, Design, Operating, Pairing, Uses, Verdict, window_of
from selector.candidate.chain import Chain
from selector.candidate.figures import (
    NO_RESISTOR,
    NO_SWITCH,
    amplifier_figures,
    filter_figures,
    resistor_figures,
    shunt_figures,
    switch_figures,
)
from selector.candidate.uses import power_w, use_headroom
from selector.limits import (
    LIMITS,
    Limit,
    Measure,
    use_of,
    worst_point,
)
from selector.search.bank import FilterBank


def pairing_of(conditions: Conditions, design: Design, range_count: int) -> Pairing:
    """Return shunt, amplifier and switch of a design as they are tried with a number of ranges."""
    amplifier = amplifier_figures(design.amplifier, conditions.supply_v)
    return Pairing(
        conditions,
        shunt_figures(design.shunts[0]),
        amplifier,
        window_of(conditions, amplifier),
        NO_SWITCH if design.switch is None else switch_figures(design.switch),
        range_count,
    )


def chain_of(conditions: Conditions, design: Design, exempt: frozenset[tuple[str, str]] = frozenset()) -> Chain:
    """Return the chain of a design's parts; the ranges exist where the output has a window."""
    pairing = pairing_of(conditions, design, design.range_count)
    chain = Chain(design, pairing, (), exempt, filtered=False)
    if pairing.window.span_v <= 0.0:
        return chain
    chain = replace(chain, ranges=_ranges(design, pairing))
    given = design.filter_resistor is not None and design.filter_capacitor is not None
    return _filtered(chain, design) if given and spread_is_known(design) else chain


def spread_is_known(design: Design) -> bool:
    """Return whether the filter's capacitor, where there is one, states how far it may be off, and by less than all."""
    capacitor = design.filter_capacitor
    return capacitor is None or (
        capacitor.temp_change is not None and capacitor.tolerance + capacitor.temp_change < 1.0
    )


def _ranges(design: Design, pairing: Pairing) -> tuple[Operating, ...]:
    common = NO_RESISTOR if design.common is None else resistor_figures(design.common)
    each = [resistor_figures(part) for part in design.gain] if design.gain else [NO_RESISTOR]
    ranges: list[Operating] = []
    for number, switched in enumerate(each, start=1):
        at = zeroed(pairing.operate(common, switched, last=number == len(each)))
        ranges.append(at.above(ranges[-1].high_a, ranges[-1].gain) if ranges else at)
    return tuple(ranges)


def _filtered(chain: Chain, design: Design) -> Chain:
    if design.filter_resistor is None or design.filter_capacitor is None:
        return replace(chain, design=design)
    figures = filter_figures(design.filter_resistor, design.filter_capacitor)
    ranges = tuple(at.with_filter(figures) for at in chain.ranges)
    return replace(chain, design=design, ranges=ranges, filtered=True)


def complete(chain: Chain, bank: FilterBank, lifted: frozenset[str] = frozenset()) -> Chain | str:
    """Return the chain with the output filter it takes, or the name of the limit that leaves none."""
    if chain.filtered:
        return chain
    index = bank.choose(chain.ranges, bank.beside(chain.design, chain.exempt), lifted)
    if isinstance(index, str):
        return index
    resistor, capacitor = bank.pair(index)
    return _filtered(chain, replace(chain.design, filter_resistor=resistor, filter_capacitor=capacitor))


def measures(chain: Chain, limit: Limit) -> Iterator[Measure]:
    """Yield every measure of a limit on a chain, where what it needs is known."""
    for check in limit.checks:
        for measure in check.measured(chain):
            if measure is not None:
                yield measure


def verdict(chain: Chain, limit: Limit) -> Verdict:
    """Return how a chain stands against a limit: the worst of its measures, None where nothing is to be judged.

    A limit that a part or the spec does not state allows without end; it is not judged.
    """
    worst: Measure | None = None
    for measure in measures(chain, limit):
        if not isinf(float(measure.allowed)) and (worst is None or _worse(measure, worst)):
            worst = measure
    if worst is None:
        return Verdict(limit.name, None, None, None)
    value, allowed = float(worst.value), float(worst.allowed)
    shown = worst.figure and not isinf(value)
    return Verdict(limit.name, bool(worst.meets), value if shown else None, allowed if shown else None)


def _worse(measure: Measure, other: Measure) -> bool:
    if bool(measure.meets) != bool(other.meets):
        return not measure.meets
    return _shortage(measure) > _shortage(other)


def _shortage(measure: Measure) -> float:
    value, allowed = float(measure.value), float(measure.allowed)
    return value if allowed == 0.0 else (value - allowed) / abs(allowed)


def stopped_at(chain: Chain, bank: FilterBank, lifted: frozenset[str] = frozenset()) -> Chain | str:
    """Return the completed chain where it meets every limit, or the name of the first that it does not meet."""
    for limit in LIMITS:
        if limit.name in lifted:
            continue
        if limit.thins and not chain.filtered:
            completed = complete(chain, bank, lifted)
            if isinstance(completed, str):
                return completed
            chain = completed
        if not all(bool(measure.meets) for measure in measures(chain, limit)):
            return limit.name
    return chain


def uses_of(chain: Chain) -> Uses:
    """Return the four uses of a completed chain."""
    conditions, last = chain.pairing.conditions, chain.ranges[-1]
    return Uses(
        power=float(power_w(last) / conditions.power_limit_w),
        burden=float(chain.pairing.burden_v / conditions.burden_limit_v),
        headroom=float(use_headroom(last)),
        error=max(float(use_of(worst_point(at, combined(at)))) for at in chain.ranges),
    )
