"""`selector parts`: the catalogue by hand."""

from __future__ import annotations

from typing import Annotated

import typer

from selector.cli.asking import ask_fields
from selector.cli.emit import sink_of
from selector.cli.options import FormOption, KindOption, OutputOption, PairsArgument
from selector.cli.settings import catalogue_of
from selector.cli.streams import can_ask, put

app = typer.Typer(help="List, find, show, add, change and remove parts.", rich_markup_mode=None, no_args_is_help=True)

KindArgument = Annotated[
    str, typer.Argument(metavar="KIND", help="shunt, resistor, capacitor, amplifier, bypass, switch.")
]
PartArgument = Annotated[str, typer.Argument(metavar="PART", help="The part's code.")]
LimitOption = Annotated[int, typer.Option("--top", min=1, metavar="N", help="How many parts at most.")]


@app.command("list")
def list_(
    context: typer.Context, kind: KindOption = None, form: FormOption = None, output: OutputOption = None
) -> None:
    """List all parts, or those of one kind; as CSV they load again unchanged."""
    catalogue = catalogue_of(context)
    sink = sink_of(form, output, catalogue=catalogue)
    from selector.app import parts  # noqa: PLC0415 - not needed for help

    listed = parts.listed(kind, catalogue)
    sink.take(parts.csv_text(listed)) if sink.form == "csv" else sink.answer(listed)


@app.command()
def find(
    context: typer.Context,
    text: Annotated[str, typer.Argument(metavar="TEXT", help="A code, a value, words; errors of typing are forgiven.")],
    *,
    kind: KindOption = None,
    top: LimitOption = 20,
    form: FormOption = None,
    output: OutputOption = None,
) -> None:
    """Search for parts by whatever is remembered of them."""
    catalogue = catalogue_of(context)
    sink = sink_of(form, output, catalogue=catalogue)
    from selector.app import parts  # noqa: PLC0415 - not needed for help

    sink.answer(parts.found(text, kind, top, catalogue))


@app.command()
def show(
    context: typer.Context,
    part: PartArgument,
    kind: KindOption = None,
    form: FormOption = None,
    output: OutputOption = None,
) -> None:
    """Show one part with all its figures."""
    catalogue = catalogue_of(context)
    sink = sink_of(form, output, catalogue=catalogue)
    from selector.app import parts  # noqa: PLC0415 - not needed for help

    shown = parts.shown(part, kind, catalogue)
    sink.take(parts.csv_text(shown)) if sink.form == "csv" else sink.answer(shown)


@app.command()
def add(context: typer.Context, kind: KindArgument, pairs: PairsArgument = None, form: FormOption = None) -> None:
    """Add a part from FIELD=VALUE pairs; without any, asks on a terminal."""
    sink = sink_of(form, None)
    from selector.app import parts  # noqa: PLC0415 - not needed for help

    fields = ask_fields(kind) if not pairs and can_ask() else parts.fields_of(pairs or ())
    sink.answer(parts.added(kind, fields, catalogue_of(context)))


@app.command()
def change(
    context: typer.Context,
    part: PartArgument,
    pairs: PairsArgument = None,
    kind: KindOption = None,
    form: FormOption = None,
) -> None:
    """Give a part other figures; FIELD= takes one away."""
    sink = sink_of(form, None)
    from selector.app import parts  # noqa: PLC0415 - not needed for help

    sink.answer(parts.changed(part, parts.fields_of(pairs or ()), kind, catalogue_of(context)))


@app.command()
def remove(context: typer.Context, part: PartArgument, kind: KindOption = None, form: FormOption = None) -> None:
    """Remove a part."""
    sink = sink_of(form, None)
    from selector.app import parts  # noqa: PLC0415 - not needed for help

    sink.answer(parts.removed(part, kind, catalogue_of(context)))


@app.command()
def template(kind: KindArgument) -> None:
    """Print a CSV of one kind: every heading with its unit, and examples."""
    from selector.app import parts  # noqa: PLC0415 - not needed for help

    put(parts.template_text(kind))
