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

BARE_LOAD = """
import csv
import sqlite3
import sys

stock, database = sys.argv[1:]
connection = sqlite3.connect(database)
with open(stock, newline="", encoding="utf-8") as lines:
    rows = csv.reader(lines)
    heading = next(rows)
    connection.execute("CREATE TABLE part (" + ", ".join(f"c{number}" for number in range(len(heading))) + ")")
    connection.executemany("INSERT INTO part VALUES (" + ", ".join("?" for _ in heading) + ")", rows)
connection.commit()
connection.close()
"""
