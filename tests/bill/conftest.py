"""A real candidate of the pump's spec, and its conditions."""

from __future__ import annotations

from pathlib import Path

import pytest

from selector.candidate import Candidate, Conditions, conditions_of
from selector.ingest import read_stock
from selector.parts import Part
from selector.search import search
from selector.spec import load_spec

DATA = Path(__file__).parents[2] / "data"


def stock() -> dict[str, tuple[Part, ...]]:
    """Return the parts of the bundled catalogue by kind."""
    parts = [part for path in sorted((DATA / "parts").glob("*.csv")) for part in read_stock(path).parts]
    return {kind: tuple(part for part in parts if part.kind == kind) for kind in {part.kind for part in parts}}


@pytest.fixture(scope="session")
def conditions() -> Conditions:
    """Return the conditions of the pump: 5 A, 18 A overload, 60 degC, 500 Hz, bus to 27.5 V."""
    return conditions_of(load_spec(DATA / "irrigation_pump.toml"))


@pytest.fixture(scope="session")
def candidate() -> Candidate:
    """Return the best candidate of the pump: 5 mohm, a two-resistor amplifier."""
    return search(load_spec(DATA / "irrigation_pump.toml"), stock(), top=1).candidates[0]
