"""A combination of parts: what it is made of, the ranges it works in, and what was found of it."""

from selector.candidate.conditions import Band, Calibration, Conditions, conditions_of
from selector.candidate.design import Design, Place, cost_of
from selector.candidate.operating import Operating, Pairing, ShuntAt, Window, window_of
from selector.candidate.result import Candidate, Point, TermAmount, Uses, Verdict

__all__ = [
    "Band",
    "Calibration",
    "Candidate",
    "Conditions",
    "Design",
    "Operating",
    "Pairing",
    "Place",
    "Point",
    "ShuntAt",
    "TermAmount",
    "Uses",
    "Verdict",
    "Window",
    "conditions_of",
    "cost_of",
    "window_of",
]
