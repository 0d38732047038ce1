"""Measurements of noise, each against a resistor of 1 kohm in the same deck.

That resistor takes out the simulator's own k and temperature: all noise of a deck is thermal noise of resistors,
and is scaled by what the simulator makes of the one that is known.
"""

from __future__ import annotations

from math import sqrt

from selector.budget.noise import noise_v
from selector.physics.noise import thermal_noise_v2_per_hz
from tests.circuit.benches import BENCHES, Bench
from tests.circuit.measure import Measure, Printed, control, where
from tests.circuit.netlist import BOLTZMANN_J_PER_K, NOISE_OHM, Noisy
from tests.circuit.networks import circuit

ZERO_CELSIUS_K = 273.15
REFERENCE = ("Rreference reference 0 1000.0", "Vreference calm 0 0.0 ac 1", "Rcalm calm 0 1.0")
SWEEP = "dec 200 1e-3 1e8"


def _deck(bench: Bench, noisy: Noisy, commands: tuple[str, ...], *, poles: bool, spread: float) -> str:
    lines = [
        *circuit(bench, noisy=noisy, poles=poles, spread=spread),
        *REFERENCE,
        f".temp {bench.at.conditions.hottest_k - ZERO_CELSIUS_K!r}",
    ]
    known = (
        "noise v(reference) vreference dec 1 1 10",
        "setplot previous",
        "let known = onoise_spectrum[0]",
        "print known",
    )
    return control(f"{bench.name}: noise", lines, (*known, *commands))


def _spot_deck(bench: Bench, noisy: Noisy) -> str:
    commands = (
        "ac dec 1 1 10",
        "let gain = mag(v(out)[0])/mag(v(line)[0]-v(base)[0])",
        "print gain",
        "noise v(out) iload dec 1 1 10",
        "setplot previous",
        "let spot = onoise_spectrum[0]",
        "print spot",
    )
    return _deck(bench, noisy, commands, poles=False, spread=0.0)


def _total_deck(bench: Bench) -> str:
    commands = (f"noise v(pin) iload {SWEEP}", "let total = onoise_total", "print total")
    return _deck(bench, Noisy.ALL, commands, poles=True, spread=-1.0)


def _known_v2_per_hz(bench: Bench) -> float:
    return 4.0 * BOLTZMANN_J_PER_K * bench.at.conditions.hottest_k * NOISE_OHM


def _equivalent_ohm(bench: Bench, printed: Printed) -> float:
    """Return the resistance at the input that makes the same noise."""
    del bench
    return NOISE_OHM * (printed["spot"] / printed["known"] / printed["gain"]) ** 2


def _through_ohm(bench: Bench, printed: Printed) -> float:
    """Return the resistance through which the current noise becomes input voltage."""
    density = sqrt(_equivalent_ohm(bench, printed) / NOISE_OHM * _known_v2_per_hz(bench))
    return density / float(bench.at.amplifier.current_noise_a_per_rthz)


def _total_v(bench: Bench, printed: Printed) -> float:
    return printed["total"] / printed["known"] * sqrt(_known_v2_per_hz(bench))


def _poles_after_sources(bench: Bench) -> bool:
    """Return whether both poles lie after all sources of noise, as the formula has it, or may be taken to.

    The load resistor of a bare current output lies after the amplifier's pole; where that pole is far above the
    filter's, it makes no difference.
    """
    at = bench.at
    return bool(at.output_ohm == 0.0 or at.amplifier_pole_hz > 1000.0 * at.filter.noisy_hz)


MEASURES = (
    Measure(
        "thermal_noise_v_per_rthz",
        lambda bench: _deck(bench, Noisy.NONE, (), poles=False, spread=0.0),
        lambda _, printed: printed["known"],
        lambda bench: float(sqrt(thermal_noise_v2_per_hz(NOISE_OHM, bench.at.conditions.hottest_k))),
        below=1e-6,
        above=1e-6,
        repeat=1e-5,
        benches=(BENCHES["fixed"],),
    ),
    Measure(
        "noise_ohm",
        lambda bench: _spot_deck(bench, Noisy.NETWORK),
        _equivalent_ohm,
        lambda bench: float(bench.at.law.noise_ohm(bench.at.stage)),
        below=1e-5,
        above=1e-5,
        repeat=1e-6,
        benches=where(lambda bench: bench.at.law.switched_name is not None),
    ),
    Measure(
        "current_noise_ohm",
        lambda bench: _spot_deck(bench, Noisy.CURRENT),
        _through_ohm,
        lambda bench: float(bench.at.law.current_noise_ohm(bench.at.stage)),
        below=1e-5,
        above=1e-5,
        repeat=1e-6,
        benches=tuple(BENCHES.values()),
    ),
    Measure(
        "noise_v",
        _total_deck,
        _total_v,
        lambda bench: float(noise_v(bench.at) * bench.at.gain),
        below=1e-3,
        above=1e-3,
        repeat=1e-4,
        benches=where(_poles_after_sources),
    ),
)
