"""`selector check`: a given design against a spec."""

from __future__ import annotations

from pathlib import Path
from typing import Annotated

import typer

from selector.cli.emit import sink_of
from selector.cli.options import FormOption, OutputOption, SetOption, SpecPath, WeightsOption
from selector.cli.settings import catalogue_of
from selector.errors import EXIT_DOES_NOT_MEET

DesignPath = Annotated[
    Path, typer.Argument(metavar="DESIGN", help="A TOML file of part codes, or tables of their figures.")
]


def check(
    context: typer.Context,
    spec: SpecPath,
    design: DesignPath,
    *,
    set_: SetOption = None,
    weights: WeightsOption = None,
    form: FormOption = None,
    output: OutputOption = None,
) -> None:
    """Judge a given design against a spec.

    Every limit, and every error term at every judged current.
    """
    catalogue = catalogue_of(context)
    sink = sink_of(form, output, inputs=[spec, design], catalogue=catalogue)
    from selector.app.check import check as answer_check  # noqa: PLC0415 - arrays are slow to import
    from selector.app.specs import Asked  # noqa: PLC0415 - arrays are slow to import

    checked = answer_check(Asked(spec, set_ or (), weights), design, catalogue=catalogue)
    sink.answer(checked)
    if not checked.judged.meets:
        raise typer.Exit(EXIT_DOES_NOT_MEET)
