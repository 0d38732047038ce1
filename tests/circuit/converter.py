"""Measurements at the converter's pin: its input current and resistance behind the output resistance."""

from __future__ import annotations

from tests.circuit.benches import BENCHES, Bench
from tests.circuit.measure import Measure, Printed, change, dc_deck, load, sizes_of, where


def _current_deck(bench: Bench) -> str:
    drawn = {"ipin": bench.at.conditions.converter_input_current_a}
    return dc_deck(bench, {"rest": {}, "drawn": drawn}, extra=["Ipin pin 0 0.0"])


def _current(bench: Bench, printed: Printed) -> float:
    return abs(change(printed, "pin", "drawn")) / float(bench.at.transfer_ohm)


def _loading_deck(bench: Bench) -> str:
    resistor = f"Rpin pin 0 {bench.at.conditions.converter_input_ohm!r}"
    open_pin = {"rpin": 1e30}
    cases = {"rest": open_pin, "free": open_pin | load(bench), "loaded": load(bench)}
    return dc_deck(bench, cases, extra=[resistor])


def _loading(bench: Bench, printed: Printed) -> float:
    """Return what the reading of the largest current lacks, A.

    A difference amplifier reads its network's own current too, which is another term; it is left out.
    """
    return abs(change(printed, "pin", "loaded", "free")) / float(bench.at.transfer_ohm)


MEASURES = (
    Measure(
        "converter_current_a",
        _current_deck,
        _current,
        lambda bench: float(sizes_of(bench, "converter input current")[0].constant_a),
        below=1e-7,
        above=1e-7,
        repeat=1e-7,
        benches=tuple(BENCHES.values()),
    ),
    Measure(
        "converter_loading_a",
        _loading_deck,
        _loading,
        lambda bench: float(sizes_of(bench, "converter loading")[0].at(bench.load_a)),
        below=1e-7,
        above=1e-7,
        repeat=1e-7,
        benches=where(lambda bench: bench.law != "difference"),
    ),
)
