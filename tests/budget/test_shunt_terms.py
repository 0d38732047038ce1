"""The error terms of the shunt and its leads; the plain shunt has 0.1 ohm, 1 %, 50 ppm/K, 85 K/W."""

from __future__ import annotations

import pytest

from tests.budget.sized import check
from tests.builders import design, operating, shunt, switched


def test_shunt_tolerance() -> None:
    """1 % of the current; a span calibration takes it out."""
    check("shunt tolerance", operating(), proportional=0.01)
    check("shunt tolerance", operating(accuracy__calibration="zero"), proportional=0.01)
    check("shunt tolerance", operating(accuracy__calibration="zero-and-span"))


def test_shunt_temperature() -> None:
    """50 ppm/K over the larger distance from 25 degC: 25 K to 50 degC, 0.125 %; 65 K to -40 degC, 0.325 %."""
    check("shunt temperature", operating(), proportional=1.25e-3)
    check("shunt temperature", operating(ambient__min=-40.0), proportional=3.25e-3)
    check("shunt temperature", operating(accuracy__calibration="zero-and-span"), proportional=1.25e-3)


def test_shunt_self_heating() -> None:
    """The derating line gives 85 K/W: 50 ppm/K * 85 K/W * 0.1 ohm = 4.25e-4 per A^2, in the cube of the current."""
    check("shunt self-heating", operating(), cubic=4.25e-4)
    check("shunt self-heating", operating(accuracy__calibration="zero"), cubic=4.25e-4)


def test_shunt_self_heating_by_stated_thermal_resistance() -> None:
    """A stated 100 K/W counts instead of the line: 5e-4 per A^2."""
    check("shunt self-heating", operating(design(shunts=(shunt(thermal_resistance=100.0),))), cubic=5e-4)


@pytest.mark.parametrize(("number", "upper_a"), [(1, 0.95), (2, 1.0)])
def test_shunt_self_heating_with_span_is_that_of_the_upper_border(number: int, upper_a: float) -> None:
    """Calibrated hot at U and used cold, the heat of U stays: 4.25e-4 U^2, U = 3.8 V / 4 ohm or I_max."""
    of = switched("current-output", 19_990.0, 9_990.0)
    at = operating(of, number, accuracy__calibration="zero-and-span")
    check("shunt self-heating", at, proportional=4.25e-4 * upper_a**2)


def test_shunt_ageing() -> None:
    """A drift of 0.2 % over life stays whatever is calibrated."""
    of = design(shunts=(shunt(drift=0.002),))
    check("shunt ageing", operating(of), proportional=0.002)
    check("shunt ageing", operating(of, accuracy__calibration="zero-and-span"), proportional=0.002)
    check("shunt ageing", operating())


def test_lead_resistance() -> None:
    """1 mohm of lead on 100 mohm is 1 %, which a span calibration takes out; four terminals leave it out."""
    check("lead resistance", operating(sense__lead=1e-3), proportional=0.01)
    check("lead resistance", operating(sense__lead=1e-3, accuracy__calibration="zero-and-span"))
    check("lead resistance", operating(design(shunts=(shunt(terminals=4),)), sense__lead=1e-3))


def test_lead_temperature() -> None:
    """1 % of lead, of copper, over 25 K: 0.01 * 0.00393 * 25 = 9.825e-4; four terminals leave it out."""
    check("lead temperature", operating(sense__lead=1e-3), proportional=9.825e-4)
    at = operating(sense__lead=1e-3, accuracy__calibration="zero-and-span")
    check("lead temperature", at, proportional=9.825e-4)
    check("lead temperature", operating(design(shunts=(shunt(terminals=4),)), sense__lead=1e-3))


def test_thermal_emf() -> None:
    """3 uV/K over 2 K on 0.1 ohm are 60 uA, over the default of 1 K 30 uA; no calibration takes it out."""
    of = design(shunts=(shunt(thermal_emf=3e-6),))
    check("thermal emf", operating(of, ambient__gradient=2.0), constant=6e-5)
    check("thermal emf", operating(of, accuracy__calibration="zero-and-span"), constant=3e-5)
