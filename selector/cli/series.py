"""`selector series`: preferred values near a value."""

from __future__ import annotations

from typing import Annotated

import typer

from selector.cli.emit import sink_of
from selector.cli.options import FormOption, OutputOption
from selector.cli.settings import catalogue_of

ValueArgument = Annotated[str, typer.Argument(metavar="VALUE", help="Like 4.99k, 100 nF or 10 uH; bare: in ohm.")]
SeriesOption = Annotated[str, typer.Option("--series", metavar="NAME", help="E3 to E192.")]
CountOption = Annotated[int, typer.Option("--count", min=1, max=10_000, metavar="N", help="How many values.")]
PairOption = Annotated[
    str | None, typer.Option("--pair", metavar="HOW", help="series or parallel: the best pairs as well.")
]


def series(
    context: typer.Context,
    value: ValueArgument,
    *,
    series: SeriesOption = "E96",
    count: CountOption = 3,
    pair: PairOption = None,
    form: FormOption = None,
    output: OutputOption = None,
) -> None:
    """Show preferred values near a value.

    With their deviation, and the best pairs on request.
    """
    sink = sink_of(form, output, catalogue=catalogue_of(context))
    from selector.app.series import series as answer_series  # noqa: PLC0415 - not needed for help

    sink.answer(answer_series(value, series, count, pair))
