"""The commands by name, and the options that all of them take."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from pathlib import Path
from types import MappingProxyType
from typing import Annotated

import typer

from selector import __version__
from selector.cli import bill, catalogue, check, demo, fill, load, parts, query, series, spec
from selector.cli.settings import Settings
from selector.cli.streams import put

COMMANDS: Mapping[str, Callable[..., None] | typer.Typer] = MappingProxyType(
    {
        "query": query.query,
        "bill": bill.bill,
        "check": check.check,
        "load": load.load,
        "parts": parts.app,
        "spec": spec.app,
        "fill": fill.fill,
        "series": series.series,
        "catalogue": catalogue.app,
        "demo": demo.demo,
    }
)
"""The commands in the order of the help: a function each, or a group of commands."""


def program(command: str) -> typer.Typer:
    """Return the program with the one command that is named, with all where none is: help shows them.

    To put together what is not called takes a tenth of the start.
    """
    app = typer.Typer(
        name="selector",
        help="The exact short list of shunt, amplifier, gain resistors, switch and filter for a current measurement.",
        rich_markup_mode=None,
        pretty_exceptions_enable=False,
        add_completion=False,
        no_args_is_help=True,
    )
    app.callback()(selector)
    for name in (command,) if command in COMMANDS else COMMANDS:
        called = COMMANDS[name]
        if isinstance(called, typer.Typer):
            app.add_typer(called, name=name)
        else:
            app.command(name)(called)
    return app


def _version(wanted: bool) -> None:  # noqa: FBT001 - the option's own value
    if wanted:
        put(f"selector {__version__}\n")
        raise typer.Exit


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
