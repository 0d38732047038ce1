"""The formulas worked out by DuckDB and by pandas: cross joins, a filter for each design, the best that is left."""

from __future__ import annotations

import re
from functools import reduce
from math import inf

import duckdb
import pandas as pd

from scripts.benchmark.methods.formulas import DESIGN, FILTER_ORDER, FORMULAS
from scripts.benchmark.methods.tables import Problem


def by_duckdb(problem: Problem) -> float:
    """Return the best score, worked out in one query; infinite where nothing is left."""
    with duckdb.connect(":memory:") as connection:
        for place, table in problem.tables.items():
            connection.register(f"{place}s", table)
        row = connection.execute(query(problem)).fetchone()
    assert row is not None  # noqa: S101 - an aggregate without groups has one row
    return float(row[0])


def query(problem: Problem) -> str:
    """Return the query for the best score; numbers stand in it as doubles, not as decimals."""
    joined = " CROSS JOIN ".join(f"{place}s" for place in problem.tables)
    columns = ", ".join(f"{_sql(text, problem.spec)} AS {name}" for name, text in FORMULAS.items())
    number = f"row_number() OVER (PARTITION BY {', '.join(DESIGN)} ORDER BY {', '.join(FILTER_ORDER)})"
    judged = f"SELECT *, {columns}, -filter_ohm AS less_ohm FROM {joined}"  # noqa: S608 - names and numbers of ours
    chosen = f"SELECT * FROM ({judged}) WHERE thinned QUALIFY {number} = 1"  # noqa: S608 - names and numbers of ours
    return f"SELECT coalesce(min(score), 1e0 / 0e0) FROM ({chosen}) WHERE held"  # noqa: S608 - names and numbers of ours


def by_pandas(problem: Problem) -> float:
    """Return the best score, worked out over one table of every combination; infinite where nothing is left."""
    tables = list(problem.tables.values())
    frame = reduce(lambda left, right: left.merge(right, how="cross"), tables[1:], tables[0])
    text = "\n".join(f"{name} = {formula}" for name, formula in FORMULAS.items())
    judged = frame.eval(f"{text}\nless_ohm = -filter_ohm", local_dict=problem.spec, engine="python")
    assert isinstance(judged, pd.DataFrame)  # noqa: S101 - what assignments give
    thinned = judged[judged["thinned"]].sort_values([*DESIGN, *FILTER_ORDER])
    chosen = thinned.drop_duplicates(list(DESIGN))
    return min(map(float, chosen.loc[chosen["held"], "score"]), default=inf)


def _sql(text: str, spec: dict[str, float]) -> str:
    """Return a formula with the figures of the spec written out."""
    named = re.sub(r"@(\w+)", lambda found: f"({spec[found[1]]!r})", text)
    return re.sub(r"(?<![\w.])(\d+(?:\.\d+)?(?:e[+-]?\d+)?)(?![\w.])", lambda found: _double(found[1]), named)


def _double(number: str) -> str:
    return number if "e" in number else f"{number}e0"
