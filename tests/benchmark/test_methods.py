"""The methods that are compared: each gives the score of the plain walk, for every pair by itself."""

from __future__ import annotations

from dataclasses import replace
from math import inf

import pytest

from scripts.benchmark.methods.__main__ import problem
from scripts.benchmark.methods.plain import by_plain_walk
from scripts.benchmark.methods.queries import by_duckdb, by_pandas
from scripts.benchmark.methods.tables import problem_of
from scripts.benchmark.yardstick import enumerated
from selector.search.shelf import shelf_of
from tests.search.walk import walked


def test_every_method_finds_the_best_of_each_pair() -> None:
    """DuckDB, pandas and numpy find the score of the plain walk to 1e-9, or that nothing fits, for pair after pair."""
    wanted, stock = problem()
    shelf = shelf_of(wanted, stock)
    walked_scores = {rank[2][:2]: rank[0] for rank, _ in walked(wanted, stock)}
    numpy_scores = {rank[2][:2]: rank[0] for rank in enumerated(wanted, stock).ranks}
    assert numpy_scores == pytest.approx(walked_scores, rel=1e-9)
    assert 0 < len(walked_scores) < len(shelf.shunts) * len(shelf.amplifiers)
    for shunt in shelf.shunts[::2]:
        for amplifier in shelf.amplifiers:
            pair = problem_of(replace(shelf, shunts=(shunt,), amplifiers=(amplifier,)))
            expected = pytest.approx(walked_scores.get(((shunt.part,), (amplifier.part,)), inf), rel=1e-9)
            assert by_duckdb(pair) == expected
            assert by_pandas(pair) == expected


def test_plain_walk_of_the_benchmark_is_that_of_the_tests() -> None:
    """Judging each filter by itself in plain numbers gives the best score of the walk that the search is held to."""
    wanted, stock = problem()
    few = {**stock, "resistor": stock["resistor"][:6], "capacitor": stock["capacitor"][:3]}
    assert by_plain_walk(wanted, few) == pytest.approx(min(rank[0] for rank, _ in walked(wanted, few)), rel=1e-12)
