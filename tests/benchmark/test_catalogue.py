"""The catalogues that are measured: of the sizes asked for, the same each time, larger ones hold smaller ones."""

from __future__ import annotations

import pytest

from scripts.benchmark.catalogue import TIGHTNESSES, catalogue, spec
from selector.gain import LAWS
from selector.parts import Amplifier, Resistor, Shunt


def test_catalogue_has_the_parts_that_are_asked_for() -> None:
    """Each kind has as many parts as asked for, and catalogue X is what stands where nothing is asked."""
    counts = {kind: len(parts) for kind, parts in catalogue().items()}
    assert counts == {"shunt": 60, "amplifier": 40, "switch": 10, "resistor": 500, "capacitor": 20}
    assert len(catalogue(shunts=3)["shunt"]) == 3
    assert all(part.quantity and part.unit_cost for parts in catalogue().values() for part in parts)


def test_catalogue_is_the_same_each_time_and_grows_at_its_end() -> None:
    """A seed gives one catalogue; a smaller one is the beginning of a larger one; another seed gives another."""
    small, large = catalogue(resistors=20), catalogue(resistors=40)
    assert small == catalogue(resistors=20)
    assert large["resistor"][:20] == small["resistor"]
    assert large["shunt"] == small["shunt"]
    assert catalogue(seed=1, resistors=20)["resistor"] != small["resistor"]


def test_catalogue_holds_every_law_and_values_in_several_tolerances() -> None:
    """Six amplifiers in a row have all laws; equal resistances come in different tolerances, from 100 ohm to 1 Mohm."""
    stock = catalogue()
    laws = [part.gain_law for part in stock["amplifier"][:6] if isinstance(part, Amplifier)]
    assert sorted(laws) == sorted(LAWS)
    tolerances: dict[float, set[float]] = {}
    for part in stock["resistor"]:
        assert isinstance(part, Resistor)
        tolerances.setdefault(part.resistance, set()).add(part.tolerance)
    assert min(tolerances) >= 100.0
    assert max(tolerances) <= 1e6
    assert sum(len(each) > 1 for each in tolerances.values()) >= 50


def test_near_duplicates_differ_by_two_permille_at_most() -> None:
    """Any two shunts, and any two amplifiers, of near duplicates agree in every figure to 0.2 % and have own codes."""
    stock = catalogue(near=True, shunts=20, amplifiers=20)
    for kind in ("shunt", "amplifier"):
        rows = [part.model_dump() for part in stock[kind]]
        assert len({row["part"] for row in rows}) == 20
        for name, first in rows[0].items():
            if isinstance(first, float):
                values = [row[name] for row in rows]
                assert max(values) - min(values) <= 0.002001 * abs(first), name
    assert len({part.resistance for part in stock["shunt"] if isinstance(part, Shunt)}) > 10


@pytest.mark.parametrize("tightness", TIGHTNESSES)
def test_spec_takes_changes(tightness: str) -> None:
    """A spec of each tightness is one of an orchard's frost alarm, with the ranges and the changes asked for."""
    wanted = spec(tightness, 2, limits__cost=9.0)
    assert wanted.ranges.most == 2
    assert wanted.limits.cost == 9.0
    assert "rchard" in wanted.title
