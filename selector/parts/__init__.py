"""Pydantic models of the kinds of parts, and the reading of parts from text."""

from selector.parts.amplifier import Amplifier
from selector.parts.base import Part
from selector.parts.bypass import Bypass
from selector.parts.capacitor import Capacitor
from selector.parts.columns import Column, columns
from selector.parts.dielectric import dielectric_change_frac, dielectric_span_degc
from selector.parts.kinds import KINDS
from selector.parts.reading import cells_of, kind_of, read_part
from selector.parts.resistor import Resistor
from selector.parts.shunt import Shunt
from selector.parts.switch import Switch

__all__ = [
    "KINDS",
    "Amplifier",
    "Bypass",
    "Capacitor",
    "Column",
    "Part",
    "Resistor",
    "Shunt",
    "Switch",
    "cells_of",
    "columns",
    "dielectric_change_frac",
    "dielectric_span_degc",
    "kind_of",
    "read_part",
]
