"""Answers made by hand: an invented candidate of two ranges, so that no test here hangs on the search."""

from __future__ import annotations

from dataclasses import replace
from typing import cast

import pytest

from selector.bill import Offer, bill_lines
from selector.candidate import Candidate, Design, Point, TermAmount, Uses, Verdict
from selector.candidate.result import FilterFiguresShown, Limiting, RangeFigures
from selector.parts import Amplifier, Capacitor, Resistor, Shunt, Switch, read_part
from selector.report.answers.bill import BillShown
from selector.report.answers.check import Checked
from selector.report.answers.query import Shortlist
from selector.search import Judged, NothingFits, Searched
from selector.search.found import LeftOut
from selector.spec import Spec, spec_of

SENTENCES = ("Without its shunt (open joint) the output rises to the supply.", "Measure a board.")


@pytest.fixture
def spec() -> Spec:
    """Return a spec of 60 uA to 60 mA with a table of allowed errors."""
    return spec_of(
        {
            "title": "Orchard frost alarm",
            "current.min": "60 uA",
            "current.max": "60 mA",
            "accuracy.reading": "2 %",
            "accuracy.floor": "3 uA",
            "limits.burden": "100 mV",
            "limits.power": "20 mW",
            "supply.voltage": "3.3 V",
            "converter.bits": 12,
            "converter.reference": "2.5 V",
            "ambient.min": "-25 degC",
            "ambient.max": "45 degC",
            "signal.bandwidth": "100 Hz",
            "ranges.most": 2,
        }
    )


@pytest.fixture
def design() -> Design:
    """Return a design of eight parts."""
    shunt = {"resistance": "0.82 ohm", "tolerance": "0.5 %", "tempco": "50 ppm/K", "power": "0.5 W", "quantity": 40}
    amplifier = {
        "gain_law": "non-inverting",
        "offset": "5 uV",
        "offset_drift": "30 nV/K",
        "bias_current": "0.2 nA",
        "cmrr": "110 dB",
        "psrr": "106 dB",
        "noise_density": "30 nV/rtHz",
        "gain_bandwidth": "1 MHz",
        "swing_high": "50 mV",
        "swing_low": "12 mV",
        "common_mode_min": "-0.1 V",
        "common_mode_top_gap": "0.1 V",
        "supply_min": "1.8 V",
        "supply_max": "5.5 V",
        "supply_current": "100 uA",
        "temp_min": "-40 degC",
        "temp_max": "125 degC",
        "quantity": 25,
    }
    switch = {
        "on_resistance": "5 ohm",
        "on_resistance_spread": "1 ohm",
        "leakage": "1 nA",
        "channels": 4,
        "supply_min": "1.8 V",
        "supply_max": "5.5 V",
    }
    capacitor = {"capacitance": "100 nF", "tolerance": "5 %", "dielectric": "C0G", "quantity": 7}

    def part(kind: str, code: str, **cells: object) -> object:
        return read_part(kind, {"part": code, "unit_cost": "0.25", "currency": "EUR", **cells}, where="here")

    def resistor(code: str, value: str) -> Resistor:
        cells = {"resistance": value, "tolerance": "0.1 %", "tempco": "25 ppm/K", "description": "thin film"}
        return cast("Resistor", part("resistor", code, **cells))

    return Design(
        (cast("Shunt", part("shunt", "S-0R82", **shunt)),),
        cast("Amplifier", part("amplifier", "AMP-Z3", **amplifier)),
        cast("Switch", part("switch", "SW-4", **switch)),
        resistor("R-20K", "20 kohm"),
        (resistor("R-31R6", "31.6 ohm"), resistor("R-549R", "549 ohm")),
        resistor("R-1K", "1 kohm"),
        cast("Capacitor", part("capacitor", "C-100n", **capacitor)),
    )


@pytest.fixture
def candidate(design: Design) -> Candidate:
    """Return a candidate with invented figures and seven error terms at its limiting point."""
    names = ("offset drift", "noise", "shunt tolerance", "quantisation", "thermal emf", "converter gain", "offset")
    amounts = (1.26e-6, 0.5e-6, 0.3e-6, 0.25e-6, 0.2e-6, 0.06e-6, 0.0)
    terms = tuple(TermAmount(name, a, a / 2.0) for name, a in zip(names, amounts, strict=True))
    points = (
        Point(1, 60e-6, 2.57e-6, 4.2e-6, terms),
        Point(1, 3.4e-3, 47.6e-6, 71e-6, terms[:1]),
        Point(2, 3.06e-3, 55.1e-6, 64.2e-6, terms[:1]),
        Point(2, 60e-3, 0.78e-3, 1.2e-3, terms[:1]),
    )
    return Candidate(
        design=design,
        score=0.412,
        uses=Uses(0.455, 0.52, 0.98, 0.858),
        power_w=9.1e-3,
        burden_v=52e-3,
        headroom_frac=0.069,
        shunt_power_w=2.97e-3,
        cost=2.0,
        currency="EUR",
        ranges=(RangeFigures(584.0, 60e-6, 3.4e-3, 29e-3, 1.63), RangeFigures(37.4, 3.06e-3, 60e-3, 94e-3, 1.84)),
        filter=FilterFiguresShown(1591.5, (120.0, 1500.0), (0.0143, 0.0012)),
        points=points,
        limiting=Limiting(2, 3.06e-3, 0.858, "offset drift"),
        rank=1,
        pareto=True,
    )


@pytest.fixture
def offer(candidate: Candidate) -> Offer:
    """Return the candidate with a bill for one board and two cautions."""
    limiting = Limiting(1, 60e-6, 2.57 / 4.2, "offset drift")
    candidate = replace(candidate, limiting=limiting)
    return Offer(candidate, 1, bill_lines(candidate.design, 1), SENTENCES)


@pytest.fixture
def searched() -> Searched:
    """Return how much was looked at."""
    left_out = (LeftOut("capacitor", "not in stock", 3), LeftOut("resistor", "not in stock", 5))
    return Searched(16, 30, 4, 2, 200, 800, 61234567890123, left_out, 1234, 0.4)


@pytest.fixture
def shortlist(spec: Spec, offer: Offer, searched: Searched) -> Shortlist:
    """Return a short list of two: the same candidate twice, second and a little worse."""
    second = replace(offer, candidate=replace(offer.candidate, rank=2, score=0.455, cost=None, pareto=False))
    return Shortlist(spec, (offer, second), searched)


@pytest.fixture
def empty(spec: Spec, offer: Offer, searched: Searched) -> Shortlist:
    """Return the answer where nothing fits; the nearest is over in burden and error."""
    uses = Uses(0.455, 1.18, 0.98, 1.34)
    nearest = replace(offer, candidate=replace(offer.candidate, uses=uses, burden_v=0.118, rank=None, pareto=None))
    blocked = (("supply", 17), ("burden", 155), ("output low", 96), ("error", 212))
    return Shortlist(spec, (), searched, NothingFits(480, blocked, nearest.candidate), nearest)


@pytest.fixture
def checked(spec: Spec, offer: Offer) -> Checked:
    """Return a design that meets all but the burden."""
    candidate = replace(offer.candidate, rank=None, pareto=None)
    verdicts = (
        Verdict("law", True, None, None),  # noqa: FBT003 - the order of the fields says it
        Verdict("overload", None, None, None),
        Verdict("burden", False, 0.118, 0.1),  # noqa: FBT003 - the order of the fields says it
        Verdict("error", True, 2.57e-6, 4.2e-6),  # noqa: FBT003 - the order of the fields says it
    )
    return Checked(spec, Judged(candidate, False, verdicts), replace(offer, candidate=candidate))  # noqa: FBT003 - the order of the fields says it


@pytest.fixture
def bill(spec: Spec, offer: Offer) -> BillShown:
    """Return the bill of the candidate."""
    return BillShown(spec, offer)
