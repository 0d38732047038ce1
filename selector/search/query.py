"""The main job: from parts and a spec to the exact short list; and the judging of a given design."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from dataclasses import replace
from math import isinf
from time import perf_counter

from selector.candidate import Candidate, Design, Verdict
from selector.candidate.chain import Chain
from selector.limits import LIMITS
from selector.parts import Part
from selector.search.assess import chain_of, complete, spread_is_known, verdict
from selector.search.bank import bank_of
from selector.search.bench import Bench, bench_of
from selector.search.engine import EVALUATED, Engine
from selector.search.found import Found, Judged, NothingFits, Searched
from selector.search.objective import Score, score_of
from selector.search.order import rounded
from selector.search.present import present
from selector.search.shelf import Shelf, in_one_currency, shelf_of
from selector.search.standing import Standing
from selector.spec import Spec

Stock = Mapping[str, tuple[Part, ...]]


def search(
    spec: Spec,
    stock: Stock,
    *,
    top: int | None = 5,
    variants: bool = False,
    progress: Callable[[int, int], None] | None = None,
) -> Found:
    """Return the exact short list: what judging every combination would put first.

    The best combination of each (shunt, amplifier) pair, or every one with `variants`; `top` of them, None for all.
    `progress` is called with the pairs done and their number. Raises ValueError for a `top` below 1.
    """
    if top is not None and top < 1:
        message = f"top is {top}; a list has at least 1 place"
        raise ValueError(message)
    started = perf_counter()
    score = score_of(spec)
    bench = bench_of(shelf_of(spec, stock), score)
    standing = Standing(top, variants)
    Engine(bench, standing, progress).run()
    candidates = tuple(present(placed.chain, score) for placed in standing.best())
    empty = None if candidates else _nothing_fits(bench, score, progress)
    searched = _searched(bench, perf_counter() - started)
    return Found(_ranked(candidates), searched, empty)


def _nothing_fits(bench: Bench, score: Score, progress: Callable[[int, int], None] | None) -> NothingFits:
    """Return why nothing fits."""
    from selector.search.blocked import nothing_fits  # noqa: PLC0415 - where something fits, nothing asks

    return nothing_fits(bench, score, progress)


def _ranked(candidates: tuple[Candidate, ...]) -> tuple[Candidate, ...]:
    """Return the candidates with their ranks, and marked where no other of the list is as good in all and better."""
    each = [tuple(rounded(use) for use in _four(one)) for one in candidates]
    rows = []
    for place, candidate in enumerate(candidates):
        mine = each[place]
        beaten = any(other != mine and all(a <= b for a, b in zip(other, mine, strict=True)) for other in each)
        rows.append(replace(candidate, rank=place + 1, pareto=not beaten))
    return tuple(rows)


def _four(candidate: Candidate) -> tuple[float, float, float, float]:
    uses = candidate.uses
    return uses.power, uses.burden, uses.headroom, uses.error


def _searched(bench: Bench, seconds: float) -> Searched:
    shelf = bench.shelf
    return Searched(
        shunts=len(shelf.shunts),
        amplifiers=len(shelf.amplifiers),
        switches=len(shelf.switches),
        bypasses=len(shelf.bypasses),
        resistors=len(shelf.resistors),
        filter_pairs=len(bench.bank),
        combinations=combinations(shelf, len(bench.bank)),
        left_out=shelf.left_out,
        evaluated=bench.counts[EVALUATED],
        seconds=seconds,
    )


def combinations(shelf: Shelf, filter_pairs: int) -> int:
    """Return the nominal number of combinations, before any limit."""
    total = 0
    for amplifier in shelf.amplifiers:
        law = Design((), amplifier, None, None, None).law
        for count in range(1, (shelf.conditions.ranges_most if law.switchable else 1) + 1):
            places = 0 if law.switched_name is None else count + (law.common_name is not None)
            switches = 1 if count == 1 else len(shelf.switches)
            total += len(shelf.shunts) * switches * len(shelf.resistors) ** places * filter_pairs
    return total


def judge(spec: Spec, design: Design, stock: Stock, *, exempt: frozenset[tuple[str, str]] = frozenset()) -> Judged:
    """Return how a given design stands against every limit, and its figures as far as they exist.

    A filter part that the design leaves open is chosen from the stock as the search chooses it.
    """
    shelf = shelf_of(spec, stock)
    chain = chain_of(shelf.conditions, in_one_currency(design, stock), exempt)
    failed: str | None = None
    if not _figures_exist(chain):
        chain = replace(chain, filtered=False)
    elif not chain.filtered:
        completed = _completed(shelf, chain)
        failed = completed if isinstance(completed, str) else None
        chain = chain if isinstance(completed, str) else completed
    verdicts = tuple(_verdicts(chain, failed))
    candidate = present(chain, score_of(spec)) if chain.filtered else None
    return Judged(candidate, all(one.meets is not False for one in verdicts) and candidate is not None, verdicts)


def _figures_exist(chain: Chain) -> bool:
    """Return whether the parts state what every figure of the filter's place is computed from."""
    speed_is_known = bool(chain.ranges) and not isinf(float(chain.ranges[0].amplifier_pole_hz))
    return speed_is_known and spread_is_known(chain.design)


def _completed(shelf: Shelf, chain: Chain) -> Chain | str:
    """Return the chain with the filter parts that its design leaves open chosen from the shelf."""
    design = chain.design
    resistors = shelf.resistors if design.filter_resistor is None else (design.filter_resistor,)
    capacitors = shelf.capacitors if design.filter_capacitor is None else (design.filter_capacitor,)
    bank = bank_of(shelf.conditions, resistors, capacitors, chain.exempt)
    return complete(replace(chain, design=replace(design, filter_resistor=None, filter_capacitor=None)), bank)


def _verdicts(chain: Chain, failed: str | None) -> list[Verdict]:
    """Return the verdict of every limit; `failed` names the one that left no output filter."""
    rows = []
    for limit in LIMITS:
        row = verdict(chain, limit)
        if limit.name == failed:
            row = replace(row, meets=False, value=None, allowed=None)
        rows.append(row)
    return rows
