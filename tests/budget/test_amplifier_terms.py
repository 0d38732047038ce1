"""The error terms of the amplifier's input, output and supply; plain: Rs 0.1 ohm, G Rs 2 ohm, 25 K, 80 dB of PSRR."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest

from tests.budget.sized import check
from tests.builders import amplifier, design, operating

if TYPE_CHECKING:
    from selector.candidate import Design

DIFFERENCE = design("difference")  # 20 k over 1 k: gain 20, kappa 1 + 1/20 = 1.05


def _with(law: str = "fixed", **fields: object) -> Design:
    return design(law, amplifier=amplifier(law, **fields))


def test_offset() -> None:
    """100 uV on 0.1 ohm are 1 mA; a zero calibration takes it out."""
    check("offset", operating(), constant=1e-3)
    check("offset", operating(accuracy__calibration="zero"))
    check("offset", operating(accuracy__calibration="zero-and-span"))


def test_offset_of_a_difference_amplifier() -> None:
    """Its noise gain of 21 over its gain of 20 makes 1.05 mA of 100 uV."""
    check("offset", operating(DIFFERENCE), constant=1.05e-3)


def test_offset_drift() -> None:
    """1 uV/K over 25 K on 0.1 ohm are 250 uA, 262.5 uA for a difference amplifier; it stays."""
    check("offset drift", operating(accuracy__calibration="zero-and-span"), constant=2.5e-4)
    check("offset drift", operating(DIFFERENCE), constant=2.625e-4)


def test_output_offset() -> None:
    """1 mV at the output over 2 ohm is 0.5 mA, whatever the law; a zero calibration takes it out."""
    check("output offset", operating(_with(output_offset=1e-3)), constant=5e-4)
    check("output offset", operating(_with("difference", output_offset=1e-3)), constant=5e-4)
    check("output offset", operating(_with(output_offset=1e-3), accuracy__calibration="zero"))


def test_output_offset_drift() -> None:
    """2 uV/K over 25 K and 2 ohm are 25 uA; it stays."""
    at = operating(_with(output_offset_drift=2e-6), accuracy__calibration="zero-and-span")
    check("output offset drift", at, constant=2.5e-5)


def test_bias_current() -> None:
    """1 nA in the shunt reads as 1 nA; through 950 ohm of feedback beside it as 1 nA * 950.1 / 0.1."""
    check("bias current", operating(), constant=1e-9)
    check("bias current", operating(design("non-inverting")), constant=9.501e-6)


def test_bias_current_of_a_difference_amplifier() -> None:
    """Its offset current in 1 kohm counts, 2 uA of 0.2 nA; where none is stated the bias current of 1 nA: 10 uA."""
    check("bias current", operating(DIFFERENCE), constant=1e-5)
    check("bias current", operating(_with("difference", offset_current=2e-10)), constant=2e-6)


def test_bias_current_of_a_two_resistor_amplifier() -> None:
    """1 nA in 1000.1 ohm and 5 nA in 10 kohm over the gain of 20: 1.0001 + 2.5 uV, 35.001 uA."""
    check("bias current", operating(_with("two-resistor", output_bias_current=5e-9)), constant=3.5001e-5)


@pytest.mark.parametrize("calibration", ["zero", "zero-and-span"])
def test_bias_current_is_calibrated_away_only_where_its_drift_is_known(calibration: str) -> None:
    """With a stated drift a zero calibration takes the bias current out; without one it stays whole."""
    check("bias current", operating(_with(bias_current_drift=1e-11), accuracy__calibration=calibration))
    check("bias current", operating(accuracy__calibration=calibration), constant=1e-9)


def test_bias_current_drift() -> None:
    """10 pA/K over 25 K of 1 nA are a quarter of the 1 nA that the zero took out; without calibration none."""
    of = _with(bias_current_drift=1e-11)
    check("bias current drift", operating(of))
    check("bias current drift", operating(of, accuracy__calibration="zero"), constant=2.5e-10)
    check("bias current drift", operating(of, accuracy__calibration="zero-and-span"), constant=2.5e-10)
    check("bias current drift", operating(accuracy__calibration="zero"))


def test_bias_current_drift_follows_the_laws_own_voltage() -> None:
    """A quarter of what 1 nA makes in a non-inverting stage: 9.501 uA / 4."""
    of = _with("non-inverting", bias_current_drift=1e-11)
    check("bias current drift", operating(of, accuracy__calibration="zero"), constant=9.501e-6 / 4.0)


def test_no_bias_current_has_no_drift() -> None:
    """A part without bias current counts as one without a stated drift: neither term is there."""
    of = _with(bias_current=0.0, bias_current_drift=1e-11)
    for calibration in ("none", "zero", "zero-and-span"):
        check("bias current", operating(of, accuracy__calibration=calibration))
        check("bias current drift", operating(of, accuracy__calibration=calibration))


def test_no_bias_current_at_the_inputs_leaves_the_outputs() -> None:
    """With Ib = 0 the drift counts as not stated, so 5 nA at the output stays through a zero calibration: 25 uA."""
    of = _with("two-resistor", bias_current=0.0, bias_current_drift=1e-11, output_bias_current=5e-9)
    check("bias current", operating(of, accuracy__calibration="zero"), constant=2.5e-5)


def test_supply_offset() -> None:
    """5 V against a test at 3 V: 2 V over 1e4 and 0.1 ohm, 2 mA, times 1.05 for a difference; zero takes it out."""
    check("supply offset", operating(_with(supply_test=3.0)), constant=2e-3)
    check("supply offset", operating(_with(supply_test=7.0)), constant=2e-3)
    check("supply offset", operating(_with("difference", supply_test=3.0)), constant=2.1e-3)
    check("supply offset", operating(_with(supply_test=3.0), accuracy__calibration="zero"))
    check("supply offset", operating())


def test_supply_change() -> None:
    """10 % of 5 V over 1e4 and 0.1 ohm are 0.5 mA, of a difference amplifier 0.525 mA; it stays."""
    check("supply change", operating(accuracy__calibration="zero-and-span"), constant=5e-4)
    check("supply change", operating(DIFFERENCE), constant=5.25e-4)


def test_amplifier_gain() -> None:
    """A gain error of 0.3 % of the current; a span calibration takes it out."""
    check("amplifier gain", operating(_with(gain_error=0.003)), proportional=0.003)
    check("amplifier gain", operating(_with(gain_error=0.003), accuracy__calibration="zero"), proportional=0.003)
    check("amplifier gain", operating(_with(gain_error=0.003), accuracy__calibration="zero-and-span"))


def test_amplifier_gain_drift() -> None:
    """10 ppm/K over 25 K are 0.025 % of the current; it stays."""
    at = operating(_with(gain_drift=1e-5), accuracy__calibration="zero-and-span")
    check("amplifier gain drift", at, proportional=2.5e-4)


def test_nonlinearity() -> None:
    """100 ppm of a span of 4 V over 2 ohm are 0.2 mA; it stays."""
    at = operating(_with(nonlinearity=1e-4), accuracy__calibration="zero-and-span")
    check("nonlinearity", at, constant=2e-4)


def test_nonlinearity_both_ways_counts_the_smaller_half() -> None:
    """With a zero of 1 V the halves are 3 V up and 0.99 V down: 100 ppm of 0.99 V over 2 ohm."""
    zero = {"output__zero": 1.0, "output__zero_tolerance": 0.0, "output__zero_drift": 0.0}
    at = operating(_with(nonlinearity=1e-4, reference_pin=True), current__two_way=True, **zero)
    check("nonlinearity", at, constant=4.95e-5)


def test_loop_gain() -> None:
    """100 dB at a noise gain of 20 takes 1 / 5001, of 21 1 / (1 + 1e5 / 21); a span calibration takes it out."""
    check("loop gain", operating(_with("non-inverting", open_loop_gain=100.0)), proportional=1.0 / 5001.0)
    check("loop gain", operating(_with("difference", open_loop_gain=100.0)), proportional=1.0 / (1.0 + 1e5 / 21.0))
    of = _with("non-inverting", open_loop_gain=100.0)
    check("loop gain", operating(of, accuracy__calibration="zero-and-span"))


@pytest.mark.parametrize("law", ["fixed", "one-resistor", "two-resistor", "current-output"])
def test_loop_gain_is_inside_the_other_laws(law: str) -> None:
    """A part whose loop is closed inside has it in its gain error; one that states no open-loop gain has none."""
    check("loop gain", operating(_with(law, open_loop_gain=100.0)))
    check("loop gain", operating(design("non-inverting")))
