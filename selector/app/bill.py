"""The bill of materials of one candidate: by its place in the short list, or as a design gives it."""

from __future__ import annotations

from dataclasses import dataclass
from pathlib import Path

from selector.app.check import InLine, check_telling_in_line
from selector.app.query import Progress, query
from selector.app.specs import Asked
from selector.bill import offer_of
from selector.candidate import conditions_of
from selector.errors import Fault, UsageRefused
from selector.report.answers.bill import BillShown
from selector.report.answers.check import Checked
from selector.report.answers.query import Shortlist


def bill(
    asked: Asked,
    *,
    rank: int = 1,
    boards: int | None = None,
    catalogue: Path | None = None,
    progress: Progress | None = None,
) -> BillShown | Shortlist:
    """Return the bill of the candidate at a place of the list that `query` gives, or the empty list.

    `boards` counts the pieces for so many boards; it does not change which candidate has the place.

    Raises
    ------
    UsageRefused
        The list ends before that place.
    """
    listed = query(asked, top=rank, catalogue=catalogue, progress=progress)
    if not listed.offers:
        return listed
    if rank > len(listed.offers):
        remedy = f"name a rank from 1 to {len(listed.offers)}"
        raise UsageRefused(Fault("--rank", f"{rank} is past the list, which has {len(listed.offers)}", remedy))
    offer = listed.offers[rank - 1]
    if boards is not None:
        offer = offer_of(offer.candidate, conditions_of(listed.spec), boards)
    return BillShown(listed.spec, offer)


@dataclass(frozen=True, slots=True)
class Billed:
    """How a design stands against a spec, its bill where it has figures at all, and which of its parts are in-line."""

    checked: Checked
    shown: BillShown | None
    in_line: InLine


def bill_of_design(
    asked: Asked, design_path: Path, *, boards: int | None = None, catalogue: Path | None = None
) -> Billed:
    """Return the bill of a design, and how it stands against a spec."""
    checked, in_line = check_telling_in_line(asked, design_path, catalogue=catalogue)
    if checked.offer is None:
        return Billed(checked, None, in_line)
    offer = checked.offer
    if boards is not None:
        offer = offer_of(offer.candidate, conditions_of(checked.spec), boards)
    return Billed(checked, BillShown(checked.spec, offer), in_line)
