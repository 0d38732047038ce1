"""`selector query`: the short list."""

from __future__ import annotations

from typing import Annotated

import typer

from selector.cli import faults
from selector.cli.emit import sink_of
from selector.cli.options import FormOption, OutputOption, SetOption, SpecPath, VariantsOption, WeightsOption
from selector.cli.progress import Progress
from selector.cli.settings import catalogue_of
from selector.cli.streams import say
from selector.errors import EXIT_DOES_NOT_MEET, Fault, UsageRefused

TopOption = Annotated[str, typer.Option("--top", metavar="N", help="How many candidates, or: all.")]


def query(
    context: typer.Context,
    spec: SpecPath,
    *,
    top: TopOption = "5",
    variants: VariantsOption = False,
    set_: SetOption = None,
    weights: WeightsOption = None,
    form: FormOption = None,
    output: OutputOption = None,
) -> None:
    """List the best candidates for a spec.

    The bill of materials of the best stands below the list.
    """
    catalogue = catalogue_of(context)
    most = top_of(top)
    sink = sink_of(form, output, inputs=[spec], catalogue=catalogue)
    from selector.app.query import query as answer_query  # noqa: PLC0415 - arrays are slow to import
    from selector.app.specs import Asked  # noqa: PLC0415 - arrays are slow to import

    asked = Asked(spec, set_ or (), weights, variants)
    with Progress() as progress:
        listed = answer_query(asked, top=most, catalogue=catalogue, progress=progress)
    faults.lines(
        [f'parts.only or parts.avoid names "{code}", which is no part of the catalogue' for code in listed.unknown]
    )
    sink.answer(listed)
    if not listed.offers:
        if sink.form == "csv":
            say(f"Nothing fits; see why: selector query {spec} --format table")
        raise typer.Exit(EXIT_DOES_NOT_MEET)


def top_of(text: str) -> int | None:
    """Return how many candidates are asked for, None for all."""
    if text == "all":
        return None
    if text.isascii() and text.isdigit() and len(text) < 10 and int(text) > 0:  # noqa: PLR2004 - digits of a count
        return int(text)
    raise UsageRefused(Fault("--top", f'"{text[:60]}" is no number of candidates', "write a number from 1, or all"))
