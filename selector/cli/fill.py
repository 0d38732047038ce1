"""`selector fill`: generic parts of an E series."""

from __future__ import annotations

from typing import Annotated

import typer

from selector.cli.emit import sink_of
from selector.cli.options import FormOption, PairsArgument
from selector.cli.settings import catalogue_of

KindArgument = Annotated[str, typer.Argument(metavar="KIND", help="resistor, capacitor or shunt.")]
SeriesOption = Annotated[str, typer.Option("--series", metavar="NAME", help="E3 to E192.")]
FromOption = Annotated[str, typer.Option("--from", metavar="VALUE", help="The least value.")]
ToOption = Annotated[str, typer.Option("--to", metavar="VALUE", help="The largest value.")]


def fill(
    context: typer.Context,
    kind: KindArgument,
    *,
    pairs: PairsArgument = None,
    from_: FromOption,
    to: ToOption,
    series: SeriesOption = "E96",
    form: FormOption = None,
) -> None:
    """Add generic parts of an E series.

    They are never counted as stock.
    """
    sink = sink_of(form, None)
    from selector.app.fill import Span  # noqa: PLC0415 - not needed for help
    from selector.app.fill import fill as answer_fill  # noqa: PLC0415 - not needed for help
    from selector.app.parts import fields_of  # noqa: PLC0415 - not needed for help

    sink.answer(answer_fill(kind, Span(series, from_, to), fields_of(pairs or ()), catalogue_of(context)))
