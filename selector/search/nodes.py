"""The ranges that a pair, a switch and a number of ranges allow, as arrays: one node per pair of gain resistors."""

from __future__ import annotations

from dataclasses import dataclass, replace

import numpy as np
from numpy.typing import NDArray

from selector.budget import Combined, allowed_at, combined, zeroed
from selector.candidate import Operating, Pairing
from selector.candidate.chain import Chain
from selector.candidate.figures import NO_RESISTOR, ResistorFigures
from selector.candidate.uses import power_w, use_headroom
from selector.limits import (
    FilterCheck,
    LinkCheck,
    PairCheck,
    PointCheck,
    RangeCheck,
    ShuntCheck,
    SwitchCheck,
    use_of,
    worst_point,
)
from selector.limits.measure import AmplifierCheck
from selector.search.bench import Bench
from selector.search.pick import picked

Numbers = NDArray[np.float64]
Indices = NDArray[np.int64]
NONE = -1  # index of a resistor that the law does not have


@dataclass(frozen=True, slots=True)
class Nodes:
    """Ranges as arrays of shape (nodes,), with the resistors they are made of; ordered by common resistor."""

    at: Operating
    common: Indices
    switched: Indices

    def __len__(self) -> int:
        """Return the number of nodes."""
        return len(self.switched)

    def pick(self, index: Indices) -> Nodes:
        """Return some of the nodes."""
        return Nodes(picked(self.at, index), self.common[index], self.switched[index])


@dataclass(frozen=True, slots=True)
class Judged:
    """Nodes with their filter in, their combined error, and the uses that they settle as the last range."""

    nodes: Nodes
    error: Combined | None
    power: Numbers
    headroom: Numbers

    def pick(self, index: Indices) -> Judged:
        """Return some of the nodes."""
        return Judged(self.nodes.pick(index), picked(self.error, index), self.power[index], self.headroom[index])


def pair_stands(bench: Bench, chain: Chain) -> bool:
    """Return whether a pair with its switch meets every held limit that needs no resistor."""
    early = AmplifierCheck | ShuntCheck | SwitchCheck | PairCheck
    for limit in bench.limits:
        for check in limit.checks:
            if isinstance(check, early) and not all(one is None or bool(one.meets) for one in check.measured(chain)):
                return False
    return True


def nodes_of(bench: Bench, pairing: Pairing, *, last: bool) -> Nodes:
    """Return every range that meets the held limits which concern it alone, before the filter is known."""
    law = pairing.amplifier.law
    resistors = bench.resistors
    common = NO_RESISTOR if law.common_name is None else _shaped(resistors, (-1, 1))
    switched = NO_RESISTOR if law.switched_name is None else _shaped(resistors, (1, -1))
    count = len(bench.shelf.resistors)
    shape = (1 if law.common_name is None else count, 1 if law.switched_name is None else count)
    at = pairing.operate(common, switched, last=last)
    stands = np.ones(shape, dtype=bool)
    for limit in bench.limits:
        for check in limit.checks:
            if isinstance(check, RangeCheck) and (last or not check.last_only):
                measure = check.measure(at)
                if measure is not None:
                    stands &= measure.meets
    rows, columns = np.nonzero(stands)
    return _compact(pairing, resistors, rows, columns, last=last)


def _compact(pairing: Pairing, resistors: ResistorFigures, rows: Indices, columns: Indices, *, last: bool) -> Nodes:
    law = pairing.amplifier.law
    nothing = np.full(len(rows), NONE)
    common = NO_RESISTOR if law.common_name is None else picked(resistors, rows)
    switched = NO_RESISTOR if law.switched_name is None else picked(resistors, columns)
    at = zeroed(pairing.operate(common, switched, last=last))
    flat = _flattened(at, len(rows))
    return Nodes(flat, nothing if law.common_name is None else rows, nothing if law.switched_name is None else columns)


def _flattened(at: Operating, count: int) -> Operating:
    """Return the range with its gain and border as arrays, also where no resistor made them so."""
    gain = np.broadcast_to(np.asarray(at.stage.gain, dtype=float), (count,))
    high_a = np.broadcast_to(np.asarray(at.high_a, dtype=float), (count,))
    return replace(at, stage=replace(at.stage, gain=gain), high_a=high_a)


def judged_nodes(bench: Bench, nodes: Nodes) -> Judged:
    """Return the nodes that meet the held limits which need the filter, with their combined error.

    The filter must be in, or a stand-in for it that no filter can beat.
    """
    stands = np.ones(len(nodes), dtype=bool)
    if bench.needs_filter:
        for limit in bench.limits:
            for check in limit.checks:
                measure = check.measure(nodes.at) if isinstance(check, FilterCheck) else None
                if measure is not None:
                    stands &= measure.meets
    kept = nodes if stands.all() else nodes.pick(np.flatnonzero(stands))
    shape = (len(kept),)
    conditions = bench.conditions
    return Judged(
        kept,
        combined(kept.at) if bench.needs_filter else None,
        np.broadcast_to(np.asarray(power_w(kept.at) / conditions.power_limit_w), shape),
        np.broadcast_to(np.asarray(use_headroom(kept.at)), shape),
    )


def links(bench: Bench, at: Operating, error: Combined | None, shape: tuple[int, ...]) -> Numbers:
    """Return the use of the allowed error of ranges whose borders are in, infinite where a held limit is not met."""
    stands = np.ones(shape, dtype=bool)
    use: Numbers = np.zeros(shape)
    for limit in bench.limits:
        for check in limit.checks:
            if isinstance(check, LinkCheck):
                measure = check.measure(at)
                if measure is not None:
                    stands &= measure.meets
            elif isinstance(check, PointCheck) and error is not None:
                stands &= check.measure(at, error).meets
    if error is not None:
        use = use + use_of(worst_point(at, error))
    return np.where(stands, use, np.inf)


def top_use(bench: Bench, judged: Judged) -> Numbers:
    """Return the use of the allowed error at the upper border alone: at most the use of the whole range."""
    at = judged.nodes.at
    if judged.error is None:
        return np.zeros(len(judged.nodes))
    return np.asarray(judged.error.error_a(at.high_a) / allowed_at(bench.conditions, at.high_a), dtype=float)


def _shaped(figures: ResistorFigures, shape: tuple[int, int]) -> ResistorFigures:
    return ResistorFigures(
        *(np.reshape(one, shape) for one in (figures.ohm, figures.tolerance_frac, figures.tempco_per_k))
    )
