"""A draft, taken apart by the filter that its ranges really take, and by its common resistor."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import replace
from math import ceil, isfinite

import numpy as np

from selector.candidate import Operating
from selector.candidate.design import cost_or_inf, in_stock
from selector.search.bench import Bench
from selector.search.drafts import Draft, Thread, layered
from selector.search.filtering import stretches
from selector.search.frames import Frame
from selector.search.layers import Layers
from selector.search.nodes import Indices, Nodes
from selector.search.pick import picked


def cells_of(bench: Bench, draft: Draft) -> Iterator[Draft]:
    """Yield drafts with their filter in where it is certain, and one with the stand-in for what is left.

    Where the network adds resistance before the filter, the choice hangs on first and last range together: such a
    draft stays as it is, and the filter is chosen when a combination is judged.
    """
    first, last = draft.layers[0].nodes, draft.layers[-1].nodes
    if not bench.needs_filter or draft.filter is not None or not (_alone(first.at) and _alone(last.at)):
        yield draft
        return
    inner = draft.layers[-2].nodes if len(draft.layers) > 1 else first
    doubtful: list[Indices] = []
    for stretch in stretches(bench, first):
        if _settled(bench, draft.frame, stretch.filter):
            nodes = (_with_filter(bench, one, stretch.filter) for one in (first.pick(stretch.nodes), inner, last))
            cell = layered(bench, draft.frame, stretch.filter, Thread(*nodes))
            if cell is not None:
                yield cell
        else:
            doubtful.append(stretch.nodes)
    if doubtful:
        cell = layered(bench, draft.frame, None, Thread(first.pick(np.unique(np.concatenate(doubtful))), inner, last))
        if cell is not None:
            yield cell


def over(bench: Bench, cell: Draft, common: int) -> Layers:
    """Return the chains of a cell over one common resistor."""
    kept = [layer.pick(np.flatnonzero(layer.nodes.common == common)) for layer in cell.layers]
    first_use = cell.first_use[cell.layers[0].nodes.common == common]
    return Layers(bench, cell.frame.burden, first_use, tuple(kept))


def _with_filter(bench: Bench, nodes: Nodes, place: int) -> Nodes:
    if bench.bank.figures is None:
        return nodes
    return replace(nodes, at=nodes.at.with_filter(picked(bench.bank.figures, place)))


def _alone(at: Operating) -> bool:
    """Return whether the network leaves the output filter's corner alone."""
    return not np.any(np.asarray(at.output_ohm))


def _settled(bench: Bench, frame: Frame, place: int) -> bool:
    """Return whether neither stock nor cost nor a last range with a larger swing can change the filter taken."""
    conditions = bench.conditions
    resistor, capacitor = bench.bank.pairs[place]
    law = frame.pairing.amplifier.law
    most_uses = law.copies * (frame.range_count + 1)
    if conditions.stock_only and in_stock(resistor) < conditions.boards * (1 + most_uses):
        return False
    if bench.lifted and isfinite(conditions.settle_s):
        return False
    if not isfinite(conditions.cost_limit):
        return True
    dearest = max((cost_or_inf(part) for part in bench.shelf.resistors), default=0.0)
    switch = frame.switch
    switches = 0.0 if switch is None else ceil(frame.range_count / switch.channels) * cost_or_inf(switch)
    fixed = sum(cost_or_inf(part) for part in (frame.shunt, frame.amplifier, resistor, capacitor))
    return most_uses * dearest + switches + fixed <= conditions.cost_limit
