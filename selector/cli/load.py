"""`selector load`: stock files into the catalogue."""

from __future__ import annotations

from collections.abc import Sequence
from pathlib import Path
from typing import TYPE_CHECKING, Annotated

import typer

from selector.cli import faults
from selector.cli.emit import sink_of
from selector.cli.options import FormOption, KindOption, OutputOption
from selector.cli.settings import catalogue_of
from selector.cli.streams import can_ask
from selector.errors import EXIT_INPUT_REFUSED, Fault, UsageRefused

if TYPE_CHECKING:
    from selector.report.answers.loaded import Loaded

FilesArgument = Annotated[list[Path], typer.Argument(metavar="FILE...", help="CSV files of stocked parts.")]
MapOption = Annotated[
    list[str] | None,
    typer.Option("--map", metavar="HEADING=FIELD", help="What a column gives; an empty field leaves it out."),
]
ReplaceOption = Annotated[
    bool, typer.Option("--replace", help="Change parts that are there with other figures; asks on a terminal.")
]
YesOption = Annotated[bool, typer.Option("--yes", help="Do not ask.")]
DryRunOption = Annotated[bool, typer.Option("--dry-run", help="Show what would be done, and do nothing.")]
RejectsOption = Annotated[
    Path | None,
    typer.Option("--rejects", metavar="FILE", help="Where refused rows go; else beside the file: NAME.rejects.csv."),
]


def load(
    context: typer.Context,
    files: FilesArgument,
    *,
    kind: KindOption = None,
    map_: MapOption = None,
    replace: ReplaceOption = False,
    yes: YesOption = False,
    dry_run: DryRunOption = False,
    rejects: RejectsOption = None,
    form: FormOption = None,
    output: OutputOption = None,
) -> None:
    """Load stocked parts from CSV files.

    All rows that can be read are loaded in one transaction; the others go to the rejects file.
    """
    catalogue = catalogue_of(context)
    inputs = files if rejects is None else [*files, rejects]
    sink = sink_of(form, output, inputs=inputs, catalogue=catalogue)
    from selector.app.load import Order  # noqa: PLC0415 - not needed for help
    from selector.app.load import load as answer_load  # noqa: PLC0415 - not needed for help

    confirm = _confirmed if can_ask() and not yes else None
    loaded = answer_load(files, Order(kind, headings_of(map_ or ()), dry_run, replace, rejects, catalogue, confirm))
    sink.answer(loaded)
    refused = sum(file.refused for file in loaded.files)
    if refused:
        where = f"; see {loaded.rejects}" if loaded.rejects else ""
        faults.lines([f"{refused} row{'s' if refused > 1 else ''} refused{where}"])
        raise typer.Exit(EXIT_INPUT_REFUSED)


def headings_of(pairs: Sequence[str]) -> dict[str, str]:
    """Return the field of each heading that `--map` names."""
    split = [(pair, *pair.rpartition("=")) for pair in pairs]
    wrong = [pair for pair, heading, mark, _ in split if not mark or not heading.strip()]
    if wrong:
        remedy = 'write it like "Res.=resistance"'
        raise UsageRefused(Fault("--map", f'"{pair[:60]}" is no HEADING=FIELD', remedy) for pair in wrong)
    return {heading.strip(): field.strip() for _, heading, _, field in split}


def _confirmed(planned: Loaded) -> bool:
    """Return whether the person who sees what would change wants it."""
    from selector.report import render  # noqa: PLC0415 - only where there is something to ask

    faults.lines(render(planned, "table").splitlines())
    return typer.confirm("Change these parts?", err=True)
