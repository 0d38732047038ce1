"""`selector catalogue`: the file of parts as a whole."""

from __future__ import annotations

import typer

from selector.cli.emit import sink_of
from selector.cli.options import FormOption, OutputOption
from selector.cli.settings import catalogue_of

app = typer.Typer(help="The catalogue's file.", rich_markup_mode=None, no_args_is_help=True)


@app.callback()
def catalogue() -> None:
    """Look after the catalogue's file."""


@app.command()
def info(context: typer.Context, form: FormOption = None, output: OutputOption = None) -> None:
    """Show where the catalogue is and what is in it."""
    catalogue = catalogue_of(context)
    sink = sink_of(form, output, catalogue=catalogue)
    from selector.app.cataloguing import info as answer_info  # noqa: PLC0415 - not needed for help

    sink.answer(answer_info(catalogue))
