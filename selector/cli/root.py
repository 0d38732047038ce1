"""The commands by name, and the options that all of them take."""

from __future__ import annotations

from pathlib import Path
from typing import Annotated

import typer

from selector import __version__
from selector.cli import bill, catalogue, check, demo, fill, load, parts, query, series, spec
from selector.cli.settings import Settings
from selector.cli.streams import put

app = typer.Typer(
    name="selector",
    help="The exact short list of shunt, amplifier, gain resistors, switch and filter for a current measurement.",
    rich_markup_mode=None,
    pretty_exceptions_enable=False,
    add_completion=False,
    no_args_is_help=True,
)
app.command("query")(query.query)
app.command("bill")(bill.bill)
app.command("check")(check.check)
app.command("load")(load.load)
app.add_typer(parts.app, name="parts")
app.add_typer(spec.app, name="spec")
app.command("fill")(fill.fill)
app.command("series")(series.series)
app.add_typer(catalogue.app, name="catalogue")
app.command("demo")(demo.demo)


def _version(wanted: bool) -> None:  # noqa: FBT001 - the option's own value
    if wanted:
        put(f"selector {__version__}\n")
        raise typer.Exit


@app.callback()
def selector(
    context: typer.Context,
    catalogue: Annotated[
        Path | None,
        typer.Option(
            "--catalogue",
            metavar="PATH",
            help="The catalogue's file, before or behind the command; else SELECTOR_CATALOGUE, else your own.",
        ),
    ] = None,
    version: Annotated[
        bool, typer.Option("--version", callback=_version, is_eager=True, help="Say the version and end.")
    ] = False,
) -> None:
    """Keep what counts for every command."""
    del version
    context.obj = Settings(catalogue)
