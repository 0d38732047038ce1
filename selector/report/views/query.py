"""The short list of candidates."""

from __future__ import annotations

from functools import partial

from selector.bill import Offer
from selector.candidate import Candidate
from selector.report.answers.query import Shortlist
from selector.report.document import Block, Column, Document, Lines, Table
from selector.report.told import Cell, Json, Records, Told
from selector.report.views.candidate import blocks_of, held_back, name_of
from selector.report.views.data import candidate_data, code_of, spec_data
from selector.report.views.heading import heading_of
from selector.report.views.nothing_fits import nothing_fits_blocks, nothing_fits_data
from selector.report.words import UNKNOWN, number, per_cent, price
from selector.search import Searched
from selector.spec import Spec
from selector.units import CAPACITANCE, POWER, RATIO, RESISTANCE, TIME, VOLTAGE, shown

_HEADINGS = (
    *("rank", "score", "pareto", "power [W]", "burden [V]", "headroom [1]"),
    *("use of power [1]", "use of burden [1]", "use of headroom [1]", "use of error [1]", "cost", "currency"),
    *("shunts", "amplifier", "switch", "bypass", "common", "gain", "gain_capacitors"),
    *("filter_resistor", "filter_capacitor", "cutoff [Hz]", "transient [V]"),
    *("limiting range", "limiting current [A]", "limiting use [1]", "limiting term"),
)


def told(answer: Shortlist) -> Told:
    """Return the short list, told."""
    return Told(partial(_data, answer), partial(_document, answer), partial(_records, answer))


def _data(answer: Shortlist) -> dict[str, Json]:
    return {
        "schema": "selector.query/1",
        "spec": spec_data(answer.spec),
        "searched": _searched(answer.searched),
        "candidates": [candidate_data(offer) for offer in answer.offers],
        "nothing_fits": nothing_fits_data(answer),
    }


def _searched(searched: Searched) -> dict[str, Json]:
    left_out: dict[str, Json] = {}
    for each in searched.left_out:
        reasons = left_out.setdefault(each.kind, {})
        if isinstance(reasons, dict):
            reasons[each.reason] = each.count
    return {
        "shunts": searched.shunts,
        "amplifiers": searched.amplifiers,
        "switches": searched.switches,
        "bypasses": searched.bypasses,
        "resistors": searched.resistors,
        "filter_pairs": searched.filter_pairs,
        "combinations": searched.combinations,
        "left_out": left_out,
        "evaluated": searched.evaluated,
        "seconds": searched.seconds,
    }


def _document(answer: Shortlist) -> Document:
    heading = heading_of(answer.spec)
    if not answer.offers:
        return Document((Lines(heading), *nothing_fits_blocks(answer)))
    searched = answer.searched
    count = len(answer.offers)
    best = "The best" if count == 1 else f"The best {count}"
    gist = f"{best} of {number(searched.combinations)} combinations, exact, {shown(searched.seconds, TIME, 2)}"
    first = answer.offers[0]
    blocks: tuple[Block, ...] = (
        Lines((*heading, gist)),
        _list(answer.offers, answer.spec),
        _parts(answer.offers),
        Lines((f"Best: {name_of(first.candidate)}",)),
        *blocks_of(first, answer.spec),
    )
    return Document(blocks)


def _list(offers: tuple[Offer, ...], spec: Spec) -> Table:
    limits = spec.limits
    columns = (
        Column("", "right"),
        Column("score"),
        Column("burden", "right", shown(limits.burden, VOLTAGE)),
        Column("power", "right", shown(limits.power, POWER)),
        Column("headroom", "right", f"{per_cent(limits.headroom)} min"),
        Column("error", "right", "of limit"),
        Column("held back by"),
    )
    return Table(columns, tuple(_row(offer.candidate) for offer in offers))


def _row(candidate: Candidate) -> tuple[str, ...]:
    return (
        UNKNOWN if candidate.rank is None else str(candidate.rank),
        shown(candidate.score, RATIO),
        shown(candidate.burden_v, VOLTAGE),
        shown(candidate.power_w, POWER),
        per_cent(candidate.headroom_frac),
        per_cent(candidate.uses.error),
        held_back(candidate),
    )


def _parts(offers: tuple[Offer, ...]) -> Table:
    columns = (
        Column("", "right"),
        Column("shunt"),
        Column("amplifier"),
        Column("switch"),
        Column("gain resistors"),
        Column("filter"),
        Column("a board", "right"),
    )
    return Table(columns, tuple(_parts_row(offer.candidate) for offer in offers))


def _parts_row(candidate: Candidate) -> tuple[str, ...]:
    design = candidate.design
    common = UNKNOWN if design.common is None else shown(design.common.resistance, RESISTANCE)
    switched = ", ".join(shown(resistor.resistance, RESISTANCE) for resistor in design.gain or ())
    resistor, capacitor = design.filter_resistor, design.filter_capacitor
    after = (
        ()
        if resistor is None or capacitor is None
        else (shown(resistor.resistance, RESISTANCE), shown(capacitor.capacitance, CAPACITANCE))
    )
    return (
        UNKNOWN if candidate.rank is None else str(candidate.rank),
        ", ".join(shunt.part for shunt in design.shunts),
        design.amplifier.part,
        code_of(design.switch) or UNKNOWN,
        f"{common} / {switched}" if switched else UNKNOWN,
        " + ".join(after) or UNKNOWN,
        price(candidate.cost, candidate.currency),
    )


def _records(answer: Shortlist) -> Records:
    return Records(_HEADINGS, tuple(_record(offer.candidate) for offer in answer.offers))


def _record(candidate: Candidate) -> tuple[Cell, ...]:
    design, uses, limiting = candidate.design, candidate.uses, candidate.limiting
    return (
        *(candidate.rank, candidate.score, candidate.pareto),
        *(candidate.power_w, candidate.burden_v, candidate.headroom_frac),
        *(uses.power, uses.burden, uses.headroom, uses.error, candidate.cost, candidate.currency),
        "; ".join(shunt.part for shunt in design.shunts),
        *(design.amplifier.part, code_of(design.switch), None, code_of(design.common)),
        "; ".join(resistor.part for resistor in design.gain or ()),
        *(None, code_of(design.filter_resistor), code_of(design.filter_capacitor)),
        *(candidate.filter.cutoff_hz, None),
        *(limiting.range, limiting.current_a, limiting.use, limiting.term),
    )
