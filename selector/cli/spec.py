"""`selector spec`: measurement specs begun, shown, described."""

from __future__ import annotations

from pathlib import Path
from typing import Annotated

import typer

from selector.cli import faults
from selector.cli.asking import ask_spec
from selector.cli.emit import sink_of
from selector.cli.options import FormOption, OutputOption, SetOption, SpecPath, WeightsOption
from selector.cli.settings import catalogue_of
from selector.cli.streams import can_ask, put

app = typer.Typer(help="Begin a spec, show one, describe its keys.", rich_markup_mode=None, no_args_is_help=True)


@app.command()
def new(
    context: typer.Context,
    file: Annotated[Path, typer.Argument(metavar="FILE", help="The file to write; it must not be there yet.")],
    set_: SetOption = None,
) -> None:
    """Write a commented spec; asks on a terminal for what is required and not set."""
    from selector.app import specs  # noqa: PLC0415 - not needed for help
    from selector.app.cataloguing import path_of  # noqa: PLC0415 - not needed for help
    from selector.app.output import target  # noqa: PLC0415 - not needed for help

    place = target(file, inputs=[path_of(catalogue_of(context))], fresh=True)
    given = specs.overrides_of(set_ or ())
    if can_ask():
        given = ask_spec(given)
    text = specs.new_text(given)
    if place is None:
        put(text)
        return
    place.write(text)
    examples = [name for name, _, _ in specs.to_ask(given)]
    if examples:
        faults.lines([f"examples to be replaced by your own: {', '.join(examples)}"])
    faults.lines([f"{file} is written; go on with: selector query {file}"])


@app.command()
def show(
    context: typer.Context,
    spec: SpecPath,
    *,
    set_: SetOption = None,
    weights: WeightsOption = None,
    form: FormOption = None,
    output: OutputOption = None,
) -> None:
    """Show every entry of a spec, with its default where it states none."""
    sink = sink_of(form, output, inputs=[spec], catalogue=catalogue_of(context))
    from selector.app import specs  # noqa: PLC0415 - not needed for help

    sink.answer(specs.show(specs.Asked(spec, set_ or (), weights)))


@app.command()
def schema(context: typer.Context, output: OutputOption = None) -> None:
    """Print the JSON Schema of a spec, for editors."""
    sink = sink_of("json", output, catalogue=catalogue_of(context))
    from selector.app import specs  # noqa: PLC0415 - not needed for help

    sink.take(specs.schema_text())
