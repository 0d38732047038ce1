"""Pydantic models of the kinds of parts, and the reading of parts from text."""

from selector.parts.amplifier import Amplifier
from selector.parts.base import Part
from selector.parts.bypass import Bypass
from selector.parts.capacitor import Capacitor
from selector.parts.cells import read_cell
from selector.parts.code import LONGEST_CODE
from selector.parts.columns import Column, columns
from selector.parts.dielectric import dielectric_change_frac, dielectric_span_degc
from selector.parts.holds import Value
from selector.parts.kinds import KINDS
from selector.parts.reading import cells_of, kind_of, read_part
from selector.parts.record import Plain, Record, Records, part_of_record, place_of, plain_value, record_of
from selector.parts.resistor import Resistor
from selector.parts.shunt import Shunt
from selector.parts.switch import Switch

__all__ = [
    "KINDS",
    "LONGEST_CODE",
    "Amplifier",
    "Bypass",
    "Capacitor",
    "Column",
    "Part",
    "Plain",
    "Record",
    "Records",
    "Resistor",
    "Shunt",
    "Switch",
    "Value",
    "cells_of",
    "columns",
    "dielectric_change_frac",
    "dielectric_span_degc",
    "kind_of",
    "part_of_record",
    "place_of",
    "plain_value",
    "read_cell",
    "read_part",
    "record_of",
]
