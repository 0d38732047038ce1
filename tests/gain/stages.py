"""Stages of a gain law, and its sensitivities by differentiation of ln G."""

from __future__ import annotations

from dataclasses import replace
from random import Random
from typing import TYPE_CHECKING

import numpy as np
import sympy

from selector.gain import LAWS, LawFigures, Stage
from tests.builders import near

if TYPE_CHECKING:
    from collections.abc import Callable

    from selector.gain import Law
    from selector.real import Real

COMMON, SWITCHED, ON = sympy.symbols("common switched on", positive=True)
POINTS = 50
SHUNTS = np.array([0.1, 0.05])
ONS = np.array([5.0, 0.0])


def law(name: str) -> Law:
    """Return the law of a name."""
    return LAWS[name]


def stage(
    name: str, *, shunt: Real = 0.1, common: Real = 0.0, switched: Real = 0.0, on: Real = 0.0, **of: Real
) -> Stage:
    """Return a stage, resistances in ohm, with the gain that its law gives; `of` are figures of the law."""
    figures = LawFigures(**of)
    return Stage(figures, shunt, common, switched, on, LAWS[name].gain(figures, common, switched, on))


def check_sensitivities(
    name: str, expression: sympy.Expr, draw: Callable[[Random], Stage], figures: dict[str, str]
) -> None:
    """Compare every sensitivity of a law with the derivative of ln G, written in COMMON, SWITCHED, ON and `figures`."""
    random = Random(name)
    for _ in range(POINTS):
        at = draw(random)
        values = {COMMON: at.common_ohm, SWITCHED: at.switched_ohm, ON: at.on_ohm}
        values |= {sympy.Symbol(symbol, positive=True): getattr(at.figures, field) for symbol, field in figures.items()}
        exact = {symbol: sympy.Float(value, 40) for symbol, value in values.items()}
        wanted = {
            one: float((sympy.diff(sympy.log(expression), one)).subs(exact).evalf(30)) for one in (COMMON, SWITCHED, ON)
        }
        found = LAWS[name]
        assert found.common_sensitivity(at) == near(wanted[COMMON] * at.common_ohm, rel=1e-12)
        assert found.switched_sensitivity(at) == near(wanted[SWITCHED] * at.switched_ohm, rel=1e-12)
        assert found.on_sensitivity_per_ohm(at) == near(abs(wanted[ON]), rel=1e-12)


def between(random: Random, low: float, high: float) -> float:
    """Return a number between two, evenly on a logarithmic scale."""
    return float(low * (high / low) ** random.random())


def check_arrays(name: str, at: Stage) -> None:
    """Ask a law everything for a stage and for arrays of shunts and switches, and compare element by element."""
    many = replace(at, shunt_ohm=SHUNTS, on_ohm=ONS)
    many = replace(many, gain=LAWS[name].gain(at.figures, at.common_ohm, at.switched_ohm, ONS))
    for index, (shunt, on) in enumerate(zip(SHUNTS.tolist(), ONS.tolist(), strict=True)):
        one = replace(at, shunt_ohm=shunt, on_ohm=on)
        one = replace(one, gain=LAWS[name].gain(at.figures, at.common_ohm, at.switched_ohm, on))
        for of_many, of_one in zip(answers(LAWS[name], many), answers(LAWS[name], one), strict=True):
            element = np.broadcast_to(of_many, SHUNTS.shape)[index]
            assert float(element) == near(float(of_one))


def answers(found: Law, at: Stage) -> list[Real]:
    """Return what a law says of a stage, by all its methods."""
    of_stage = (
        found.common_sensitivity,
        found.switched_sensitivity,
        found.on_sensitivity_per_ohm,
        found.bias_v,
        found.noise_ohm,
        found.current_noise_ohm,
        found.output_ohm,
        found.load_siemens,
        found.bus_siemens,
    )
    return [
        at.gain,
        *(ask(at) for ask in of_stage),
        found.leakage_v(at, 1e-9),
        found.shunt_load_siemens(at, high_side=True),
        found.shunt_load_siemens(at, high_side=False),
        found.noise_gain(at.gain),
        found.common_mode_v(at.gain, 12.0, 2.5),
        found.mismatch_factor(at.gain),
    ]
