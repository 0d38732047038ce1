"""A given design against a spec."""

from __future__ import annotations

from pathlib import Path

from selector.app.cataloguing import stock_of
from selector.app.design import read_design
from selector.app.specs import Asked, read_spec
from selector.bill import offer_of
from selector.candidate import conditions_of
from selector.catalogue import open_catalogue
from selector.report.answers.check import Checked
from selector.search import judge

InLine = frozenset[tuple[str, str]]
"""Kind and code of the in-line parts of a design."""


def check(asked: Asked, design_path: Path, *, catalogue: Path | None = None) -> Checked:
    """Return every limit on a design, and every error term as far as its figures exist.

    A design whose parts are all in-line, its filter too, needs no catalogue.

    Raises
    ------
    InputRefused
        The spec or the design is faulty.
    Unusable
        The design needs a catalogue, and it cannot be used.
    """
    checked, _ = check_telling_in_line(asked, design_path, catalogue=catalogue)
    return checked


def check_telling_in_line(asked: Asked, design_path: Path, *, catalogue: Path | None = None) -> tuple[Checked, InLine]:
    """Return what `check` returns, and which parts of the design are in-line."""
    spec = read_spec(asked)
    read = read_design(design_path, lambda: open_catalogue(catalogue))
    stock = stock_of(read.catalogue) if read.catalogue is not None else {}
    judged = judge(spec, read.design, stock, exempt=read.exempt)
    offer = None
    if judged.candidate is not None:
        offer = offer_of(judged.candidate, conditions_of(spec), spec.parts.boards)
    return Checked(spec, judged, offer), read.exempt
