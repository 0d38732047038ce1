"""Exact short lists of current-sense designs from stocked parts."""

__version__ = "0.1.0"
