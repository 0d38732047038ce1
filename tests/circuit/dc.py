"""Measurements at dc: gain, sensitivities, and the errors that currents and voltages at the inputs make."""

from __future__ import annotations

from collections.abc import Callable
from math import log

from tests.circuit.benches import BENCHES, Bench
from tests.circuit.measure import Measure, Printed, at_rest, change, dc_deck, load, sizes_of, transfer, where
from tests.circuit.networks import circuit

STEP = 1e-6
OFFSET_V = 1e-3
DIFFERENCE = "difference"


def _gain_deck(bench: Bench) -> str:
    return dc_deck(bench, {"rest": {}, "load": load(bench)})


def _sensitivity_deck(*names: str) -> Callable[[Bench], str]:
    def deck(bench: Bench) -> str:
        resting = at_rest(circuit(bench))
        cases: dict[str, dict[str, float]] = {}
        for sign, case in ((1.0, "more"), (-1.0, "less")):
            stepped = {name: resting[name] * (1.0 + sign * STEP) for name in names if name in resting}
            cases |= {f"rest{case}": stepped, f"load{case}": stepped | load(bench)}
        return dc_deck(bench, cases)

    return deck


def _sensitivity(bench: Bench, printed: Printed) -> float:
    """Return d ln G / d ln R from a step up and one down."""
    del bench
    more, less = transfer(printed, "loadmore", "restmore"), transfer(printed, "loadless", "restless")
    return log(more / less) / log((1.0 + STEP) / (1.0 - STEP))


def _bias_deck(bench: Bench) -> str:
    of_law = bench.at.amplifier.of_law
    cases = {"rest": {}, "load": load(bench)}
    if bench.law == DIFFERENCE:
        half_a = of_law.offset_current_a / 2.0
        cases["both"] = {"ivplus": half_a, "ivminus": -half_a}
    else:
        cases |= {"plus": {"ivplus": of_law.bias_a}, "minus": {"ivminus": of_law.bias_a}}
    if "ivout" in at_rest(circuit(bench)):
        cases["output"] = {"ivout": of_law.output_bias_a}
    return dc_deck(bench, cases)


def _bias(bench: Bench, printed: Printed) -> float:
    """Return the sum of what each current does alone, whatever its sign, at the input, V."""
    del bench
    causes = [case for case in ("both", "plus", "minus", "output") if f"{case}_out" in printed]
    return sum(abs(change(printed, "out", case)) for case in causes) / transfer(printed)


def _leakage_deck(bench: Bench) -> str:
    leakage_a = float(bench.at.switch.leakage_a)
    leaks = [name for name in at_rest(circuit(bench)) if name.startswith("ileak")]
    signs = {name: -1.0 if name.startswith("ileakb") else 1.0 for name in leaks}
    open_channels = {name: sign * leakage_a for name, sign in signs.items()}
    return dc_deck(bench, {"rest": {}, "load": load(bench), "open": open_channels})


def _leakage(bench: Bench, printed: Printed) -> float:
    del bench
    return abs(change(printed, "out", "open")) / transfer(printed)


def _leakage_ours(bench: Bench) -> float:
    open_a = bench.open_channels * bench.at.switch.leakage_a
    return float(bench.at.law.leakage_v(bench.at.stage, open_a))


def _offset_deck(bench: Bench) -> str:
    return dc_deck(bench, {"rest": {}, "load": load(bench), "offset": {"vos": OFFSET_V}})


def _offset(bench: Bench, printed: Printed) -> float:
    del bench
    return abs(change(printed, "out", "offset")) / transfer(printed) / OFFSET_V


def _loop_deck(bench: Bench) -> str:
    loss = {"glossamplifier": 1.0 / float(bench.at.amplifier.open_loop_gain)}
    cases = {"rest": {}, "load": load(bench), "restloop": loss, "loadloop": loss | load(bench)}
    return dc_deck(bench, cases)


def _loop(bench: Bench, printed: Printed) -> float:
    """Return the share of the gain that a finite open-loop gain takes."""
    del bench
    return 1.0 - transfer(printed, "loadloop", "restloop") / transfer(printed)


def _network_deck(bench: Bench) -> str:
    return dc_deck(bench, {"load": load(bench)}, expressions={"network": NETWORK_CURRENT[bench.law]})


NETWORK_CURRENT = {
    "non-inverting": "-i(eamplifier)",
    "difference": "-i(eamplifier)",
    "two-resistor": "@gmirror[i]",
    "current-output": "@gmirror[i]",
}


def _network_ours(bench: Bench) -> float:
    at = bench.at
    output_v = at.conditions.zero_v + at.transfer_ohm * bench.load_a
    return float(output_v * at.law.load_siemens(at.stage))


def _drives_network(bench: Bench) -> bool:
    """Return whether the formula is that of this circuit: a network to ground, away from the bus."""
    low_side = bench.law == DIFFERENCE and not bench.at.conditions.high_side
    return low_side or (bench.law in NETWORK_CURRENT and bench.law != DIFFERENCE and bench.at.conditions.zero_v == 0.0)


MEASURES = (
    Measure(
        "gain",
        _gain_deck,
        lambda _, printed: transfer(printed),
        lambda bench: float(bench.at.gain),
        below=1e-9,
        above=1e-9,
        repeat=1e-10,
        benches=tuple(BENCHES.values()),
    ),
    Measure(
        "common_sensitivity",
        _sensitivity_deck("rcommon", "rcommonb"),
        _sensitivity,
        lambda bench: float(bench.at.law.common_sensitivity(bench.at.stage)),
        below=1e-7,
        above=1e-7,
        repeat=1e-7,
        benches=where(lambda bench: bench.at.law.common_name is not None),
    ),
    Measure(
        "switched_sensitivity",
        _sensitivity_deck("rswitched", "rswitchedb"),
        _sensitivity,
        lambda bench: float(bench.at.law.switched_sensitivity(bench.at.stage)),
        below=1e-7,
        above=1e-7,
        repeat=1e-7,
        benches=where(lambda bench: bench.at.law.switched_name is not None),
    ),
    Measure(
        "on_sensitivity_per_ohm",
        _sensitivity_deck("ron"),
        lambda bench, printed: abs(_sensitivity(bench, printed)) / float(bench.at.switch.on_ohm),
        lambda bench: float(bench.at.law.on_sensitivity_per_ohm(bench.at.stage)),
        below=1e-5,
        above=1e-5,
        repeat=1e-5,
        benches=where(lambda bench: bench.has_switch),
    ),
    Measure(
        "bias_v",
        _bias_deck,
        _bias,
        lambda bench: float(bench.at.law.bias_v(bench.at.stage)),
        below=1e-5,
        above=1e-5,
        repeat=1e-7,
        benches=tuple(BENCHES.values()),
    ),
    Measure(
        "leakage_v",
        _leakage_deck,
        _leakage,
        _leakage_ours,
        below=1e-7,
        above=1e-7,
        repeat=1e-7,
        benches=where(lambda bench: bench.has_switch),
    ),
    Measure(
        "noise_gain_over_gain",
        _offset_deck,
        _offset,
        lambda bench: float(bench.at.noise_gain_over_gain),
        below=1e-5,
        above=1e-5,
        repeat=1e-9,
        benches=tuple(BENCHES.values()),
    ),
    Measure(
        "loop_gain_frac",
        _loop_deck,
        _loop,
        lambda bench: float(sizes_of(bench, "loop gain")[0].proportional),
        below=1e-5,
        above=1e-5,
        repeat=1e-6,
        benches=where(lambda bench: bench.at.law.by_feedback),
    ),
    Measure(
        "network_a",
        _network_deck,
        lambda _, printed: printed["load_network"],
        _network_ours,
        below=1e-5,
        above=1e-5,
        repeat=1e-9,
        benches=where(_drives_network),
    ),
)
