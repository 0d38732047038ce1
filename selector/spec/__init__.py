"""The measurement spec: its model, its reading with all faults at once, its schema and its template."""

from selector.spec.choices import Filter, Parts, Ranges
from selector.spec.circuit import Ambient, Converter, Output, Sense, Supply
from selector.spec.demand import Accuracy, Band, Current, Limits, Rank, Signal
from selector.spec.entries import entries
from selector.spec.keys import KEYS, Key
from selector.spec.load import load_spec, spec_of
from selector.spec.model import Spec
from selector.spec.named_lists import NamedLists
from selector.spec.schema import schema
from selector.spec.template import template

__all__ = [
    "KEYS",
    "Accuracy",
    "Ambient",
    "Band",
    "Converter",
    "Current",
    "Filter",
    "Key",
    "Limits",
    "NamedLists",
    "Output",
    "Parts",
    "Ranges",
    "Rank",
    "Sense",
    "Signal",
    "Spec",
    "Supply",
    "entries",
    "load_spec",
    "schema",
    "spec_of",
    "template",
]
