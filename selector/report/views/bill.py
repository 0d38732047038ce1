"""The bill of materials of one candidate."""

from __future__ import annotations

from functools import partial

from selector.report.answers.bill import BillShown
from selector.report.document import Document, Lines
from selector.report.told import Json, Records, Told
from selector.report.views.candidate import bill_block, cautions_block, held_back, name_of
from selector.report.views.data import candidate_data, spec_data
from selector.report.views.heading import heading_of
from selector.report.words import per_cent
from selector.units import POWER, VOLTAGE, shown

_HEADINGS = ("use", "kind", "part", "description", "quantity", "on_hand", "unit_cost", "line_cost")


def told(answer: BillShown) -> Told:
    """Return the bill, told."""
    return Told(partial(_data, answer), partial(_document, answer), partial(_records, answer))


def _data(answer: BillShown) -> dict[str, Json]:
    return {
        "schema": "selector.bill/1",
        "spec": spec_data(answer.spec),
        "boards": answer.offer.boards,
        "candidate": candidate_data(answer.offer),
    }


def _document(answer: BillShown) -> Document:
    candidate, limits = answer.offer.candidate, answer.spec.limits
    gist = (
        f"{name_of(candidate)}: burden {shown(candidate.burden_v, VOLTAGE)} ({shown(limits.burden, VOLTAGE)}), "
        f"power {shown(candidate.power_w, POWER)} ({shown(limits.power, POWER)}), error "
        f"{per_cent(candidate.uses.error)} of its limit ({held_back(candidate)})"
    )
    lines = Lines((*heading_of(answer.spec), gist))
    return Document((lines, bill_block(answer.offer), cautions_block(answer.offer)))


def _records(answer: BillShown) -> Records:
    rows = (
        (
            *(each.use, each.kind, each.part, each.description, each.quantity, each.on_hand),
            *(each.unit_cost, each.line_cost),
        )
        for each in answer.offer.bill
    )
    return Records(_HEADINGS, tuple(rows))
