"""`selector bill`: what to take from the shelf for one candidate."""

from __future__ import annotations

from pathlib import Path
from typing import TYPE_CHECKING, Annotated

import typer

from selector.cli import faults
from selector.cli.emit import FORMS, Sink, sink_of
from selector.cli.options import (
    BoardsOption,
    OutputOption,
    RankOption,
    SetOption,
    SpecPath,
    VariantsOption,
    WeightsOption,
)
from selector.cli.progress import Progress
from selector.cli.settings import catalogue_of
from selector.errors import EXIT_DOES_NOT_MEET, Fault, UsageRefused

if TYPE_CHECKING:
    from selector.app.check import InLine
    from selector.app.specs import Asked
    from selector.report.answers.bill import BillShown
    from selector.report.answers.check import Checked

TOML = "toml"
DesignOption = Annotated[
    Path | None, typer.Option("--design", metavar="DESIGN", help="A design in a TOML file, in place of --rank.")
]
BillFormOption = Annotated[
    str | None,
    typer.Option(
        "--format",
        metavar="FORMAT",
        help="table, json, csv, markdown, or toml: the candidate as a DESIGN; left out: by the ending of --output.",
    ),
]


def bill(
    context: typer.Context,
    spec: SpecPath,
    *,
    rank: RankOption = 1,
    design: DesignOption = None,
    boards: BoardsOption = None,
    variants: VariantsOption = False,
    set_: SetOption = None,
    weights: WeightsOption = None,
    form: BillFormOption = None,
    output: OutputOption = None,
) -> None:
    """Print the bill of one candidate."""
    catalogue = catalogue_of(context)
    if design is not None and rank != 1:
        raise UsageRefused(Fault("--rank", "stands beside --design", "name one of them"))
    inputs = [spec] if design is None else [spec, design]
    sink = sink_of(form, output, inputs=inputs, catalogue=catalogue, forms=(*FORMS, TOML))
    from selector.app.specs import Asked  # noqa: PLC0415 - arrays are slow to import

    asked = Asked(spec, set_ or (), weights, variants)
    if design is None:
        _of_rank(asked, rank, boards, catalogue, sink)
    else:
        _of_design(asked, design, boards, catalogue, sink)


def _of_rank(asked: Asked, rank: int, boards: int | None, catalogue: Path | None, sink: Sink) -> None:
    """Print the bill of a place in the list; where it is empty, say why."""
    from selector.app.bill import bill as answer_bill  # noqa: PLC0415 - arrays are slow to import
    from selector.report import render  # noqa: PLC0415 - arrays are slow to import
    from selector.report.answers.query import Shortlist  # noqa: PLC0415 - arrays are slow to import

    with Progress() as progress:
        shown = answer_bill(asked, rank=rank, boards=boards, catalogue=catalogue, progress=progress)
    if isinstance(shown, Shortlist):
        faults.lines(render(shown, "table").splitlines())
        raise typer.Exit(EXIT_DOES_NOT_MEET)
    _put(shown, sink)


def _of_design(asked: Asked, design: Path, boards: int | None, catalogue: Path | None, sink: Sink) -> None:
    """Print the bill of a design; where it does not meet the spec, say so too."""
    from selector.app.bill import bill_of_design  # noqa: PLC0415 - arrays are slow to import

    billed = bill_of_design(asked, design, boards=boards, catalogue=catalogue)
    if billed.shown is not None:
        _put(billed.shown, sink, billed.in_line)
    if not billed.checked.judged.meets:
        faults.lines([_not_met(billed.checked)])
        raise typer.Exit(EXIT_DOES_NOT_MEET)


def _put(shown: BillShown, sink: Sink, in_line: InLine = frozenset()) -> None:
    """Write a bill; as TOML the design alone, which `check` reads."""
    from selector.report import design_toml  # noqa: PLC0415 - arrays are slow to import

    if sink.form == TOML:
        sink.take(design_toml(shown.offer.candidate.design, in_line))
    else:
        sink.answer(shown)


def _not_met(checked: Checked) -> str:
    """Return which limits a design does not meet."""
    names = [verdict.limit for verdict in checked.judged.verdicts if verdict.meets is False]
    return f"the design does not meet the spec: {faults.and_others(names, 5) or 'its figures do not exist'}"
