"""The least that could do each job: programs that the real one is measured against."""

from __future__ import annotations

EMPTY_COMMAND = """
import typer

app = typer.Typer()


@app.callback(invoke_without_command=True)
def main(version: bool = typer.Option(False, "--version")) -> None:
    if version:
        print("0")


app()
"""

IMPORTS = """
import numpy
import pydantic
import typer
"""

IN_USE = """
import numpy
import typer
from pydantic import BaseModel


class Spec(BaseModel):
    burden: float


app = typer.Typer()


@app.command()
def main(burden: str) -> None:
    print(numpy.float64(Spec(burden=burden).burden))


app()
"""
"""The same packages, each used once: pydantic imports most of itself only then, and typer pydantic."""

BARE_LOAD = """
import csv
import sqlite3
import sys

from pydantic import BaseModel, Field


class Resistor(BaseModel):
    part: str = Field(min_length=1, max_length=200)
    kind: str
    resistance: float = Field(gt=0.0, lt=1e15)
    tolerance: float = Field(ge=0.0, lt=100.0)
    tempco: float = Field(ge=0.0, lt=1e15)
    quantity: int | None = Field(default=None, ge=0)
    unit_cost: float | None = Field(default=None, ge=0.0)


FIELDS = tuple(Resistor.model_fields)


def records(lines):
    rows = csv.reader(lines)
    next(rows)
    for cells in rows:
        each = Resistor(**dict(zip(FIELDS, cells)))
        yield (
            each.part,
            each.kind,
            each.resistance,
            each.tolerance / 100.0,
            each.tempco * 1e-6,
            each.quantity,
            each.unit_cost,
        )


stock, database = sys.argv[1:]
connection = sqlite3.connect(database)
connection.execute(
    "CREATE TABLE resistor (part TEXT NOT NULL PRIMARY KEY, kind TEXT, resistance REAL, tolerance REAL, tempco REAL,"
    " quantity INTEGER, unit_cost REAL) STRICT"
)
with open(stock, newline="", encoding="utf-8") as lines:
    connection.executemany("INSERT INTO resistor VALUES (?, ?, ?, ?, ?, ?, ?)", records(lines))
connection.commit()
connection.close()
"""
"""A stock list into a table with a key: a csv reader, a pydantic model for each row, one executemany."""
