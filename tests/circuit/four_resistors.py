"""Measurements on the difference amplifier: unequal resistors, and what its network takes from the sense lines."""

from __future__ import annotations

from tests.circuit.benches import Bench
from tests.circuit.measure import EXPRESSIONS, Measure, Printed, change, dc_deck, load, sizes_of, where

SIGNS = {"rcommon": -1.0, "rswitched": 1.0, "rcommonb": 1.0, "rswitchedb": -1.0}


def _difference(bench: Bench) -> bool:
    return bench.law == "difference"


def _unequal(bench: Bench, *, drift: bool) -> dict[str, float]:
    """Return the four resistors at the ends of their tolerance, with their temperature drift where asked.

    The signs are those that open the two ratios most.
    """
    at = bench.at
    changes = {}
    for name, sign in SIGNS.items():
        part = at.common if "common" in name else at.switched
        off = part.tolerance_frac + (part.tempco_per_k * at.conditions.temperature_change_k if drift else 0.0)
        changes[name] = float(part.ohm * (1.0 + sign * off))
    return changes


def _input_a(bench: Bench, output_v: float) -> float:
    return output_v / float(bench.at.transfer_ohm)


def _mismatch_deck(bench: Bench) -> str:
    return dc_deck(bench, {"rest": {}, "unequal": _unequal(bench, drift=False)})


def _mismatch(bench: Bench, printed: Printed) -> float:
    return abs(_input_a(bench, change(printed, "out", "unequal")))


def _change_deck(bench: Bench) -> str:
    conditions = bench.at.conditions
    moved = {"vbus": conditions.bus_nominal_v + conditions.bus_change_v}
    unequal = _unequal(bench, drift=False)
    cases = {"rest": {}, "moved": moved, "unequal": unequal, "hot": _unequal(bench, drift=True) | moved}
    return dc_deck(bench, cases)


def _change(bench: Bench, printed: Printed) -> float:
    """Return what the bus and the temperature change: equal resistors, and unequal ones beyond that, A."""
    equal = change(printed, "out", "moved")
    unequal = change(printed, "out", "hot", "unequal")
    return _input_a(bench, abs(equal) + abs(unequal - equal))


def _loading_deck(bench: Bench) -> str:
    return dc_deck(bench, {"rest": {}, "load": load(bench)})


def _loading(bench: Bench, printed: Printed) -> float:
    """Return the share of the load current that the reading lacks."""
    return 1.0 - _input_a(bench, change(printed, "out", "load")) / bench.load_a


def _rest_deck(bench: Bench) -> str:
    return dc_deck(bench, {"rest": {}}, expressions=EXPRESSIONS | {"plus": "v(upper)"})


def _seen_ours(bench: Bench) -> float:
    conditions = bench.at.conditions
    return float(bench.at.law.common_mode_v(bench.at.gain, conditions.common_mode_v, conditions.zero_v))


MEASURES = (
    Measure(
        "network_mismatch_a",
        _mismatch_deck,
        _mismatch,
        lambda bench: float(sizes_of(bench, "network mismatch")[0].constant_a),
        below=1e-4,
        above=1e-4,
        repeat=1e-7,
        benches=where(_difference),
    ),
    Measure(
        "network_change_a",
        _change_deck,
        _change,
        lambda bench: float(sizes_of(bench, "network change")[0].constant_a),
        below=1e-4,
        above=1e-4,
        repeat=1e-6,
        benches=where(_difference),
    ),
    Measure(
        "network_loading_frac",
        _loading_deck,
        _loading,
        lambda bench: float(sizes_of(bench, "network loading")[0].proportional),
        below=1e-5,
        above=1e-5,
        repeat=1e-6,
        benches=where(_difference),
    ),
    Measure(
        "network_current_a",
        _rest_deck,
        lambda bench, printed: _input_a(bench, printed["rest_out"]),
        lambda bench: float(sizes_of(bench, "network current")[0].constant_a),
        below=1e-5,
        above=1e-5,
        repeat=1e-7,
        benches=where(_difference),
    ),
    Measure(
        "amplifier_input_v",
        _rest_deck,
        lambda _, printed: printed["rest_plus"],
        _seen_ours,
        below=1e-9,
        above=1e-9,
        repeat=1e-10,
        benches=where(lambda bench: _difference(bench) and bench.at.conditions.high_side),
    ),
)
