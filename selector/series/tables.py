"""Decade tables of the E series, as whole numbers of two or three digits. Data only.

Source: IEC 60063:2015. E48, E96 and E192 are the powers of ten to n/N rounded to three digits, with one exception; E3
to E24 have two digits and eight values that are not the rounded power.
"""

from __future__ import annotations

from collections.abc import Mapping
from types import MappingProxyType

# 27 30 33 36 39 43 47 82 are not the rounded powers.
_E24 = (10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30, 33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91)

_E192_EXCEPTIONS = {919: 920}


def _rounded(steps: int) -> tuple[int, ...]:
    """Return the powers of ten to n/steps, rounded to three digits."""
    return tuple(round(100 * 10 ** (step / steps)) for step in range(steps))


SERIES: Mapping[str, tuple[int, ...]] = MappingProxyType(
    {
        "E3": _E24[::8],
        "E6": _E24[::4],
        "E12": _E24[::2],
        "E24": _E24,
        "E48": _rounded(48),
        "E96": _rounded(96),
        "E192": tuple(_E192_EXCEPTIONS.get(value, value) for value in _rounded(192)),
    }
)
