"""Burden, power and headroom of a design."""

from __future__ import annotations

import pytest

from selector.candidate.uses import headroom_frac, idle_power_w, power_w, shunt_power_w, use_headroom
from tests.builders import HIGH_SIDE, ZERO, chain, design, near, operating, shunt, switched

SHUNT_W = 0.101  # 1 A^2 * 0.1 ohm * 1.01
IDLE_W = SHUNT_W + 5.5e-3  # 5.5 V * 1 mA


def test_burden_holds_tolerance_and_lead() -> None:
    """1 A through 0.101 ohm and 20 mohm of lead drops 0.121 V; four terminals leave the lead in the path."""
    assert chain().pairing.burden_v == near(0.101)
    assert chain(sense__lead=0.02).pairing.burden_v == near(0.121)
    assert chain(design(shunts=(shunt(terminals=4),)), sense__lead=0.02).pairing.burden_v == near(0.121)
    assert operating(sense__lead=0.02).burden_v == near(0.121)


def test_power_of_shunt_and_idle() -> None:
    """0.101 W in the shunt, and 5.5 mW of supply."""
    assert shunt_power_w(operating()) == near(SHUNT_W)
    assert idle_power_w(operating()) == near(IDLE_W)


def test_figures_at_two_ampere() -> None:
    """2 A drop 0.202 V and make 0.404 W; a current output of 4 V drives 0.4 mA; nothing of 4 V is left."""
    at = operating(design("current-output"), current__max=2.0)
    assert at.burden_v == near(0.202)
    assert shunt_power_w(at) == near(0.404)
    assert power_w(at) == near(0.404 + 5.5 * (1e-3 + 4e-4))
    assert headroom_frac(at) == 0.0


@pytest.mark.parametrize(
    ("law", "driven_w"),
    [
        ("fixed", 0.0),
        ("one-resistor", 0.0),
        ("non-inverting", 5.5 * 2.0 / 20e3),
        ("two-resistor", 5.5 * 2.0 / 1e4),
        ("current-output", 5.5 * 2.0 / 1e4),
        ("difference", 5.5 * 2.0 / 21e3),
    ],
)
def test_power_that_the_output_drives(law: str, driven_w: float) -> None:
    """An output of 2 V drives the law's own network from 5.5 V: Rf + Rg, R2, RL or R1 + R2."""
    assert power_w(operating(design(law))) == near(IDLE_W + driven_w)


def test_output_drives_its_network_from_the_zero_on() -> None:
    """With a zero of 1 V the output stands at 3 V."""
    assert power_w(operating(design("current-output"), **ZERO)) == near(IDLE_W + 5.5 * 3.0 / 1e4)


def test_bus_feeds_both_branches_of_a_difference_amplifier() -> None:
    """13 V on two branches of 21 kohm take 2 * 169 / 21 000 W beside all else, at the high side alone."""
    wanted = IDLE_W + 5.5 * 2.0 / 21e3 + 2.0 * 169.0 / 21e3
    assert power_w(operating(design("difference"), **HIGH_SIDE)) == near(wanted)
    assert power_w(operating(**HIGH_SIDE)) == near(IDLE_W)


def test_power_is_that_of_the_last_range() -> None:
    """Of two ranges the last drives 10 kohm, switch included, to 2 V at I_max."""
    at = operating(switched("current-output", 19_990.0, 9_990.0), 2)
    assert power_w(at) == near(IDLE_W + 5.5 * 2.0 / 1e4)


def test_headroom() -> None:
    """2 V of 4 V leave half the span: a use of 0.5 / 0.95 where 5 % are to be left, 0.5 / 0.5 where half is."""
    assert headroom_frac(operating()) == near(0.5)
    assert use_headroom(operating()) == near(0.5 / 0.95)
    assert use_headroom(operating(limits__headroom=0.5)) == near(1.0)
