"""Catalogue parts and a spec to the exact short list of designs."""

from selector.search.found import Found, Judged, LeftOut, NothingFits, Searched
from selector.search.query import judge, search

__all__ = ["Found", "Judged", "LeftOut", "NothingFits", "Searched", "judge", "search"]
