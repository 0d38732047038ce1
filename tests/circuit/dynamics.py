"""Measurements in time and frequency: the corner of amplifier and filter, and how long a step takes to settle."""

from __future__ import annotations

from math import pi, sqrt

from selector.limits import settle_s
from selector.physics.filters import bandwidth_hz
from tests.circuit.benches import BENCHES, POLES, Bench
from tests.circuit.measure import Measure, control
from tests.circuit.networks import circuit

SWEEP = "dec 400 0.1 1e7"
STEPS_PER_TIME_CONSTANT = 300
TIME_CONSTANTS = 32  # of the slower pole; what is left of a step is below 1e-12


def _corner_deck(bench: Bench) -> str:
    commands = (
        f"ac {SWEEP}",
        "let size = mag(v(pin))/mag(v(pin)[0])",
        f"meas ac corner when size={sqrt(0.5)!r}",
        "print corner",
    )
    return control(f"{bench.name}: corner", circuit(bench, poles=True, spread=1.0), commands)


def _settling_deck(bench: Bench) -> str:
    """Return the deck of a step of the load; half a count is left of it at the time that is asked for."""
    constant_s = 1.0 / (2.0 * pi * min(float(bench.at.amplifier_pole_hz), float(bench.at.filter.slow_hz)))
    step = f"pulse(0 {bench.load_a!r} 0 {constant_s * 1e-6!r} 1 1e6 2e6)"
    lines = [line.replace("0.0 ac 1", step) for line in circuit(bench, poles=True, spread=1.0)]
    grain_s, end_s = constant_s / STEPS_PER_TIME_CONSTANT, constant_s * TIME_CONSTANTS
    commands = (
        "option reltol=1e-9 abstol=1e-15 vntol=1e-12",
        f"tran {grain_s!r} {end_s!r} 0 {grain_s!r}",
        "let start = v(pin)[0]",
        "let end = v(pin)[length(v(pin))-1]",
        "let left = (end-v(pin))/(end-start)",
        f"meas tran settling when left={2.0 ** -(bench.at.conditions.bits + 1)!r}",
        "print settling",
    )
    return control(f"{bench.name}: settling", lines, commands)


MEASURES = (
    Measure(
        "corner_hz",
        _corner_deck,
        lambda _, printed: printed["corner"],
        lambda bench: float(bandwidth_hz(bench.at.amplifier_pole_hz, bench.at.filter.slow_hz)),
        below=1e-3,
        above=1e-3,
        repeat=1e-4,
        benches=(*BENCHES.values(), *POLES.values()),
    ),
    Measure(
        "settling_s",
        _settling_deck,
        lambda _, printed: printed["settling"],
        lambda bench: float(settle_s(bench.at)),
        below=0.0155,
        above=0.155,
        repeat=1e-3,
        benches=(*BENCHES.values(), *POLES.values()),
    ),
)
