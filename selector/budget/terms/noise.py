"""Noise of the amplifier, the resistors, the converter, as a standard deviation."""

from __future__ import annotations

from selector.budget.noise import noise_v
from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """sigma_v / Rs over the noise bandwidth of the chain, white noise thinned by averaging."""
    return (Size(constant_a=noise_v(at) / at.shunt_ohm),)


TERM = Term("noise", _sizes, normal=True)
