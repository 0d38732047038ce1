"""Corner, bandwidth and settling of first-order poles in a chain."""

from __future__ import annotations

from math import log, pi

from selector.real import Real


def corner_hz(resistance_ohm: Real, capacitance_f: Real) -> Real:
    """Return the corner 1 / (2 pi R C) of a first-order low-pass, Hz.

    Source: definition of the corner.

    >>> round(corner_hz(1e3, 100e-9), 3)
    1591.549
    """
    return 1.0 / (2.0 * pi * resistance_ohm * capacitance_f)


def bandwidth_hz(first_pole_hz: Real, second_pole_hz: Real) -> Real:
    """Return the exact -3 dB frequency of two first-order poles, Hz.

    f^2 = 2 a c / (a + c + sqrt((a + c)^2 + 4 a c)) with the squares a, c of the poles: the positive root of
    (1 + f^2/a) (1 + f^2/c) = 2. Written with reciprocals, so that one pole may be infinite.
    Source: definition of the -3 dB frequency.
    """
    first = 1.0 / first_pole_hz**2
    second = 1.0 / second_pole_hz**2
    both = first + second
    return (2.0 / (both + (both**2 + 4.0 * first * second) ** 0.5)) ** 0.5


def settling_s(first_pole_hz: Real, second_pole_hz: Real, bits: int) -> Real:
    """Return the time in which two first-order poles settle to half a count of a converter, s.

    ln(2^(bits + 1)) sqrt(1/a^2 + 1/c^2) / (2 pi): exact for one pole; for two, +15 … -1.5 % off the exact time from
    8 to 16 bits, and up to 8 % short of it at 4 bits.
    Source: exponential settling; root sum of squares of time constants, common practice, no source.
    """
    counts = log(2.0) * (bits + 1)
    return counts * (1.0 / first_pole_hz**2 + 1.0 / second_pole_hz**2) ** 0.5 / (2.0 * pi)
