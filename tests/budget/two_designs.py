"""Two designs of each law that differ in every figure, and both as arrays."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any

from tests.builders import (
    OHMS_OF_LAW,
    amplifier,
    capacitor,
    design,
    operating,
    resistor,
    shunt,
    side_by_side,
    switch,
)

if TYPE_CHECKING:
    from selector.candidate import Design, Operating

STATED = {
    "converter__noise": 1e-4,
    "converter__inl": 1.0,
    "converter__offset": 1e-3,
    "converter__gain_error": 1e-3,
    "converter__input_current": 1e-8,
    "converter__input_resistance": 1e6,
    "converter__reference_tolerance": 1e-3,
    "converter__reference_drift": 1e-5,
    "sense__lead": 1e-3,
    "accuracy__calibration_uncertainty": 1e-3,
}
LIMITED: dict[str, Any] = STATED | {
    "converter__input_max": 4.0,
    "converter__clamp_current": 1e-3,
    "signal__settle": 1e-3,
    "accuracy__reading": None,
    "accuracy__floor": None,
    "accuracy__bands": [{"up_to": 0.3, "reading": 0.1, "floor": 0.01}, {"reading": 0.05}],
}


def design_of(law: str, number: int) -> Design:
    """Return one of two designs of a law that differ in every figure."""
    few = float(number + 1)
    common, gain = OHMS_OF_LAW[law]
    stated: dict[str, Any] = {"bias_current_drift": 1e-11} if number else {}
    ranges = 2 if design(law).law.switchable else 1
    resistors = None if gain is None else [gain * few, gain * few / 2.0][:ranges]
    return design(
        law,
        shunts=(shunt(resistance=0.1 * few, tempco=5e-5 * few, drift=1e-3 * few, thermal_emf=1e-6 * few),),
        amplifier=amplifier(
            law,
            offset=1e-4 * few,
            output_offset=1e-4 * few,
            output_offset_drift=1e-6 * few,
            bias_current=1e-9 * few,
            output_bias_current=1e-9 * few,
            common_mode_test=1.5 * few,
            supply_test=3.0 * few,
            gain_error=1e-3 * few,
            gain_drift=1e-6 * few,
            nonlinearity=1e-5 * few,
            open_loop_gain=100.0 * few,
            current_noise_density=1e-13 * few,
            low_frequency_noise=1e-6 * few,
            **stated,
        ),
        switch=switch(on_resistance=10.0 * few, leakage=1e-9 * few) if ranges > 1 else None,
        common=None if common is None else resistor(common * few, "RC", tolerance=1e-3 * few, tempco=1e-5 * few),
        gain=None
        if resistors is None
        else tuple(resistor(ohm, "RG", tolerance=1e-3 * few, tempco=1e-5 * few) for ohm in resistors),
        filter_resistor=resistor(1e3 * few, tolerance=0.01),
        filter_capacitor=capacitor(1e-7 * few, tolerance=0.1),
    )


def both(law: str, **changes: object) -> tuple[Operating, tuple[Operating, Operating]]:
    """Return the first ranges of both designs of a law, as arrays and by themselves."""
    first, second = (operating(design_of(law, number), **changes) for number in (0, 1))
    return side_by_side(first, second), (first, second)
