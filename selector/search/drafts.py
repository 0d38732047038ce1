"""The ranges of a frame that could be part of a combination, thinned with the best filter that any could have."""

from __future__ import annotations

from dataclasses import dataclass, replace
from math import isfinite

import numpy as np

from selector.search.bench import Bench
from selector.search.filtering import stand_in, with_stand_in
from selector.search.frames import Frame
from selector.search.nodes import (
    NONE,
    Indices,
    Judged,
    Nodes,
    Numbers,
    filtered_nodes,
    judged,
    links,
    nodes_of,
    top_use,
)
from selector.search.stand_in import StandIn

TWO = 2  # ranges that are neighbours: there is none between the first and the last


@dataclass(frozen=True, slots=True)
class Draft:
    """First, inner and last ranges that are left, with a bound for each common resistor.

    `layers` has one entry per range; `first_use` is the use of each first range. No combination with the common
    resistor `commons[n]` has a figure below `bound[n]`; the bounds rise. `filter` is the place of the filter in
    the bank that all of them take, None where a stand-in bounds it.
    """

    frame: Frame
    filter: int | None
    first_use: Numbers
    layers: tuple[Judged, ...]
    commons: Indices
    bound: Numbers


def draft_of(bench: Bench, frame: Frame) -> Draft | None:
    """Return the draft of a frame, None where nothing is left of it."""
    last = nodes_of(bench, frame.pairing, last=True)
    if not len(last):
        return None
    inner = nodes_of(bench, frame.pairing, last=False) if frame.range_count > 1 else last
    if not len(inner):
        return None
    if bench.needs_filter:
        above = _kept_stand_in(bench, frame, last=True)
        below = above if frame.range_count == 1 else _kept_stand_in(bench, frame, last=False)
        if below is None or above is None:
            return None
        last = with_stand_in(above, last)
        inner = last if frame.range_count == 1 else with_stand_in(below, inner)
    return layered(bench, frame, None, Thread(inner, inner, last))


def _kept_stand_in(bench: Bench, frame: Frame, *, last: bool) -> StandIn | None:
    """Return the stand-in of a frame, the same one for all frames that cannot differ in it."""
    key: tuple[object, ...] = (bench.held, frame.amplifier.part, frame.switch and frame.switch.part)
    if isfinite(bench.conditions.settle_s):
        key += (frame.shunt.part, last)
    if key not in bench.stand_ins:
        bench.stand_ins[key] = stand_in(bench, frame.pairing, last=last)
    return bench.stand_ins[key]


@dataclass(frozen=True, slots=True)
class Thread:
    """The ranges that may be first, inner and last."""

    first: Nodes
    inner: Nodes
    last: Nodes


def layered(bench: Bench, frame: Frame, place: int | None, nodes: Thread) -> Draft | None:
    """Return what is left when every range meets what can be judged without its neighbours, None where nothing is.

    The filter of `place`, or a stand-in, is in.
    """
    lowest, first_use = _lowest(bench, nodes.first)
    if not len(lowest.nodes):
        return None
    layers: tuple[Judged, ...] = (lowest,)
    use = first_use
    if frame.range_count > 1:
        highest, use = _beside(bench, nodes.last, lowest)
        between = _beside(bench, nodes.inner, lowest)[0] if frame.range_count > TWO else lowest
        layers = (lowest, *[between] * (frame.range_count - TWO), highest)
    if not all(len(layer.nodes) for layer in layers):
        return None
    commons, bound = _bounds(bench, frame, layers, (first_use, use))
    return Draft(frame, place, first_use, layers, commons, bound) if len(commons) else None


def _lowest(bench: Bench, first: Nodes) -> tuple[Judged, Numbers]:
    ranges = judged(bench, first)
    use = links(bench, ranges.nodes.at, ranges.error, (len(first),))
    standing = np.flatnonzero(np.isfinite(use))
    return _served(bench, ranges.pick(standing), use[standing])


def _served(bench: Bench, ranges: Judged, use: Numbers) -> tuple[Judged, Numbers]:
    count = len(ranges.nodes)
    marked = replace(ranges.nodes, common=np.arange(count))
    kept = filtered_nodes(bench, marked).common
    return (ranges, use) if len(kept) == count else (ranges.pick(kept), use[kept])


def _beside(bench: Bench, nodes: Nodes, lowest: Judged) -> tuple[Judged, Numbers]:
    """Return ranges that share a common resistor with some first range and are allowed at their upper border.

    With the use of each at that border.
    """
    ranges = judged(bench, nodes.where(np.isin(nodes.common, np.unique(lowest.nodes.common))))
    use = top_use(bench, ranges)
    standing = np.flatnonzero(np.isfinite(use))
    return _served(bench, ranges.pick(standing), use[standing])


def _bounds(
    bench: Bench, frame: Frame, layers: tuple[Judged, ...], uses: tuple[Numbers, Numbers]
) -> tuple[Indices, Numbers]:
    """Return the common resistors with a bound for each, rising: the best first range beside the best last one.

    `uses` holds the uses of the first ranges, and of the last ones at their upper border.
    """
    lowest, last = layers[0], layers[-1]
    size = int(max(lowest.nodes.common.max(), last.nodes.common.max())) + 2
    least_first = np.full(size, np.inf)
    np.minimum.at(least_first, lowest.nodes.common, uses[0])
    figure = bench.figure(last.power, frame.burden, last.headroom, np.maximum(uses[1], least_first[last.nodes.common]))
    bound = np.full(size, np.inf)
    np.minimum.at(bound, last.nodes.common, figure)
    commons = np.flatnonzero(np.isfinite(bound))
    order = commons[np.argsort(bound[commons], kind="stable")]
    return np.where(order == size - 1, NONE, order), bound[order]
