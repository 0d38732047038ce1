"""Options that several commands take."""

from __future__ import annotations

from pathlib import Path
from typing import Annotated

import typer

SpecPath = Annotated[Path, typer.Argument(metavar="SPEC", help="The measurement spec, a TOML file.")]
SetOption = Annotated[
    list[str] | None,
    typer.Option("--set", metavar="KEY=VALUE", help="Override an entry of the spec: limits.burden=80mV; repeatable."),
]
WeightsOption = Annotated[
    str | None,
    typer.Option("--weights", metavar="LIST", help="Weights of the ranking: power=1,burden=1,headroom=1,error=2."),
]
VariantsOption = Annotated[
    bool, typer.Option("--variants", help="List all combinations, not the best of each shunt and amplifier.")
]
FormOption = Annotated[
    str | None,
    typer.Option(
        "--format",
        metavar="FORMAT",
        help="table, json, csv or markdown; left out: by the ending of --output, else table.",
    ),
]
OutputOption = Annotated[
    Path | None, typer.Option("--output", metavar="FILE", help="Write the answer to a file, whole or not at all.")
]
KindOption = Annotated[str | None, typer.Option("--kind", metavar="KIND", help="The kind of part.")]
MOST_COUNTED = 1_000_000_000  # more boards or places than anybody has; counts stay numbers that can be multiplied
RankOption = Annotated[
    int,
    typer.Option("--rank", min=1, max=MOST_COUNTED, metavar="N", help="The place in the list that query gives."),
]
BoardsOption = Annotated[
    int | None,
    typer.Option("--boards", min=1, max=MOST_COUNTED, metavar="N", help="How many boards to count the pieces for."),
]
PairsArgument = Annotated[
    list[str] | None, typer.Argument(metavar="[FIELD=VALUE]...", help="Figures with their units: tolerance=0.1%.")
]
