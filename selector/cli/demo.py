"""`selector demo`: the main job on the scenario that comes along."""

from __future__ import annotations

import shlex
from pathlib import Path
from typing import Annotated

import typer

from selector.cli import faults
from selector.cli.emit import sink_of
from selector.cli.options import FormOption
from selector.cli.progress import Progress

KeepOption = Annotated[
    Path | None, typer.Option("--keep", metavar="FOLDER", help="A new folder that keeps specs and catalogue.")
]


def demo(keep: KeepOption = None, form: FormOption = None) -> None:
    """Do the main job on a bundled scenario."""
    sink = sink_of(form, None)
    from selector.app.demo import CATALOGUE, SPEC  # noqa: PLC0415 - arrays are slow to import
    from selector.app.demo import demo as answer_demo  # noqa: PLC0415 - arrays are slow to import

    with Progress() as progress:
        listed = answer_demo(keep, progress)
    sink.answer(listed)
    folder = keep or Path("demo")
    file, spec = shlex.quote(str(folder / CATALOGUE)), shlex.quote(str(folder / SPEC))
    first = f"selector --catalogue {file} bill {spec}" if keep else "selector demo --keep demo"
    faults.lines(["go on with:", f"  {first}", f"  selector --catalogue {file} query {spec} --set limits.burden=80mV"])
