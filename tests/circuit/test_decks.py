"""The recorded figures are those that the decks give."""

from __future__ import annotations

import csv
import re

import pytest

from selector.gain import LAWS
from selector.physics import noise
from tests.circuit.benches import BENCHES, POLES
from tests.circuit.netlist import BOLTZMANN_J_PER_K
from tests.circuit.networks import NETWORKS
from tests.circuit.record import COLUMNS, FILE, MEASURES, deck_name, measured, recorded
from tests.circuit.simulator import printed

PLAIN = re.compile(r"\d+(\.\d+)?(e[-+]?\d+)?")
PLACES = [(name, quantity) for name, quantity in recorded() if quantity in MEASURES]


@pytest.mark.circuit
@pytest.mark.parametrize(("name", "quantity"), PLACES)
def test_a_deck_gives_the_recorded_figure(name: str, quantity: str) -> None:
    """The deck of a named design gives the figure that is recorded of it.

    Source: ngspice, run now.
    Tolerance: stated with each measurement; other versions step and interpolate otherwise.
    """
    measure = MEASURES[quantity]
    bench = next(each for each in measure.benches if each.name == name)
    assert measured(measure, bench) == pytest.approx(recorded()[name, quantity].value, rel=measure.repeat)


@pytest.mark.circuit
def test_a_deck_with_a_fault_is_refused() -> None:
    """A deck that the simulator cannot run is an error, not an empty answer."""
    with pytest.raises(RuntimeError, match="ngspice"):
        printed("fault\nR1 a 0 1000.0\n.control\nop\nprint v(nowhere)\nquit\n.endc\n.end\n")


def test_every_measurement_is_recorded_once() -> None:
    """The file of figures holds each quantity of each design that it is measured on, and nothing else."""
    with FILE.open(encoding="utf-8", newline="") as lines:
        rows = list(csv.DictReader(lines))
    assert tuple(rows[0]) == COLUMNS
    assert [(row["name"], row["quantity"]) for row in rows] == [
        (bench.name, measure.quantity) for measure in MEASURES.values() for bench in measure.benches
    ]


def test_the_recorded_tolerances_are_those_of_the_measurements() -> None:
    """A tolerance in the file is the one that its measurement states, so that none is loosened in the file."""
    for (_, quantity), row in recorded().items():
        assert (row.below, row.above) == (MEASURES[quantity].below, MEASURES[quantity].above)


def test_every_gain_law_has_a_circuit() -> None:
    """Each gain law has a network and a design whose gain is recorded."""
    assert set(NETWORKS) == set(LAWS)
    assert {bench.law for bench in BENCHES.values() if (bench.name, "gain") in recorded()} == set(LAWS)


def test_every_source_names_its_deck() -> None:
    """The source of a figure names the deck's file and the simulator with its version."""
    with FILE.open(encoding="utf-8", newline="") as lines:
        for row in csv.DictReader(lines):
            bench = (BENCHES | POLES)[row["name"]]
            assert row["source"].startswith(f"{deck_name(MEASURES[row['quantity']], bench)}, ngspice-")


def test_the_decks_take_k_from_the_same_place() -> None:
    """The decks' noise sources are made with the exact k that the program uses.

    Source: the SI Brochure, 9th edition: k is 1.380649e-23 J/K.
    Tolerance: none; the figure is exact.
    """
    assert noise.BOLTZMANN_J_PER_K == BOLTZMANN_J_PER_K == 1.380649e-23


@pytest.mark.parametrize("quantity", MEASURES)
def test_decks_write_plain_numbers(quantity: str) -> None:
    """No value in a deck has a letter code such as 4k7 or 1u: each is a number with a plain exponent."""
    for bench in MEASURES[quantity].benches:
        elements = MEASURES[quantity].deck(bench).split(".control")[0].splitlines()[1:]
        values = [word for line in elements for word in line.split()[3:] if word[0].isdigit() and ")" not in word]
        assert [word for word in values if not PLAIN.fullmatch(word)] == []
