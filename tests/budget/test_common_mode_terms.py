"""What the sense lines' voltage does; plain: 100 dB of CMRR, Rs 0.1 ohm; at the high side 10, 12 and 13 V."""

from __future__ import annotations

from typing import TYPE_CHECKING

from tests.budget.sized import check
from tests.builders import HIGH_SIDE, amplifier, design, operating

if TYPE_CHECKING:
    from selector.candidate import Design

VZ = {"output__zero": 2.4, "output__zero_tolerance": 0.0, "output__zero_drift": 0.0}


def _tested_at(volt: float, law: str = "fixed") -> Design:
    return design(law, amplifier=amplifier(law, common_mode_test=volt))


def test_common_mode_at_the_low_side() -> None:
    """0 V against a test at 1.5 V: 1.5 V over 1e5 and 0.1 ohm, 150 uA; zero takes it out."""
    check("common mode", operating(_tested_at(1.5)), constant=1.5e-4)
    check("common mode", operating(_tested_at(1.5), accuracy__calibration="zero"))
    check("common mode", operating())


def test_common_mode_at_the_high_side() -> None:
    """12 V against a test at 1.5 V: 10.5 V, 1.05 mA; a test at 12 V leaves nothing, one at 15 V 0.3 mA."""
    check("common mode", operating(_tested_at(1.5), **HIGH_SIDE), constant=1.05e-3)
    check("common mode", operating(_tested_at(12.0), **HIGH_SIDE))
    check("common mode", operating(_tested_at(15.0), **HIGH_SIDE), constant=3e-4)


def test_common_mode_of_a_difference_amplifier() -> None:
    """Its inputs see (20 * 12 + 2.4) / 21 V; less 1.5 V, times 1.05: 1.0545 mA."""
    check("common mode", operating(_tested_at(1.5, "difference"), **HIGH_SIDE, **VZ), constant=1.0545e-3)


def test_common_mode_change_at_the_low_side() -> None:
    """The shunt's own drop moves the inputs: I / 1e5; it follows the current, so a span calibration takes it out."""
    check("common-mode change", operating(), proportional=1e-5)
    check("common-mode change", operating(accuracy__calibration="zero"), proportional=1e-5)
    check("common-mode change", operating(accuracy__calibration="zero-and-span"))


def test_common_mode_change_at_the_high_side() -> None:
    """The bus moves by 2 V at most: 2 V over 1e5 and 0.1 ohm, 200 uA; no calibration takes it out."""
    check("common-mode change", operating(**HIGH_SIDE), constant=2e-4)
    check("common-mode change", operating(accuracy__calibration="zero-and-span", **HIGH_SIDE), constant=2e-4)
    up = HIGH_SIDE | {"sense__bus_max": 15.0}
    check("common-mode change", operating(**up), constant=3e-4)


def test_bus_that_stands_unused_at_the_low_side_changes_nothing() -> None:
    """Bus voltages that a spec states at the low side enter neither term."""
    unused = HIGH_SIDE | {"sense__side": "low"}
    check("common mode", operating(**unused))
    check("common-mode change", operating(**unused), proportional=1e-5)
