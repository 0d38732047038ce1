"""Preferred values of IEC 60063: decade tables, the values nearest to a value, and pairs of them."""

from selector.series.pairs import How, Pair, pairs
from selector.series.tables import SERIES
from selector.series.values import Preferred, nearest, values_between

__all__ = ["SERIES", "How", "Pair", "Preferred", "nearest", "pairs", "values_between"]
