"""Dielectric codes of ceramic capacitors: temperature span and change of capacitance.

Source: EIA-198, tables of the class I and class II/III codes; from memory, edition and clause not at hand.
"""

from __future__ import annotations

REFERENCE_DEGC = 25.0
LETTERS_IN_A_CODE = 3

# Class II and III, as in X7R: low end, high end, largest change in either direction.
_LOW_DEGC = {"X": -55.0, "Y": -30.0, "Z": 10.0}
_HIGH_DEGC = {"2": 45.0, "4": 65.0, "5": 85.0, "6": 105.0, "7": 125.0, "8": 150.0, "9": 200.0}
_CHANGE_FRAC = {
    "A": 0.010,
    "B": 0.015,
    "C": 0.022,
    "D": 0.033,
    "E": 0.047,
    "F": 0.075,
    "P": 0.10,
    "R": 0.15,
    "S": 0.22,
    "L": 0.40,  # +15 % / -40 %
    "T": 0.33,  # +22 % / -33 %
    "U": 0.56,  # +22 % / -56 %
    "V": 0.82,  # +22 % / -82 %
}

# Class I, as in C0G: significant figure times multiplier, plus or minus the tolerance, all in ppm/K.
_SLOPE = {
    "C": 0.0, "B": 0.3, "L": 0.8, "A": 0.9, "M": 1.0, "P": 1.5, "R": 2.2, "S": 3.3, "T": 4.7, "V": 5.6, "U": 7.5,
}  # fmt: skip
_MULTIPLIER = {
    "0": -1.0, "1": -10.0, "2": -100.0, "3": -1000.0, "4": -1e4, "5": 1.0, "6": 10.0, "7": 100.0, "8": 1000.0, "9": 1e4,
}  # fmt: skip
_SPREAD = {"G": 30.0, "H": 60.0, "J": 120.0, "K": 250.0, "L": 500.0, "M": 1000.0, "N": 2500.0}
_CLASS_ONE_SPAN_DEGC = (-55.0, 125.0)

_OTHER_NAMES = {"NP0": "C0G"}


def dielectric_span_degc(code: str) -> tuple[float, float] | None:
    """Return the temperatures in degC between which a dielectric code holds, None for what is no code."""
    letters = _letters(code)
    if letters is None:
        return None
    low, high, _ = letters
    if low in _LOW_DEGC:
        return _LOW_DEGC[low], _HIGH_DEGC[high]
    return _CLASS_ONE_SPAN_DEGC


def dielectric_change_frac(code: str) -> float | None:
    """Return the largest change of capacitance from its value at 25 degC over the code's span, a fraction.

    Class I codes state a slope: it is taken over the longer side of -55 ... 125 degC. None for what is no code,
    and for a slope that would change the capacitance by all of itself.
    """
    letters = _letters(code)
    if letters is None:
        return None
    first, digit, last = letters
    if first in _LOW_DEGC:
        return _CHANGE_FRAC[last]
    slope_per_k = (abs(_SLOPE[first] * _MULTIPLIER[digit]) + _SPREAD[last]) * 1e-6
    change = slope_per_k * max(abs(end - REFERENCE_DEGC) for end in _CLASS_ONE_SPAN_DEGC)
    return change if change < 1.0 else None


def _letters(code: str) -> tuple[str, str, str] | None:
    """Return the three characters of a code that the tables hold; the letter O stands for a zero."""
    plain = code.strip().upper().replace("O", "0")
    plain = _OTHER_NAMES.get(plain, plain)
    if len(plain) != LETTERS_IN_A_CODE:
        return None
    first, digit, last = plain[0], plain[1], plain[2]
    class_two = first in _LOW_DEGC and digit in _HIGH_DEGC and last in _CHANGE_FRAC
    class_one = first in _SLOPE and digit in _MULTIPLIER and last in _SPREAD
    return (first, digit, last) if class_one or class_two else None
