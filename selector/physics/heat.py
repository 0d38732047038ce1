"""What heat leaves of a rating, and what it does to a resistance."""

from __future__ import annotations

from selector.real import Real

COPPER_PER_K = 0.00393  # temperature coefficient of annealed copper at 20 degC; IEC 60028:1925


def derating_frac(ambient_degc: float, full_power_degc: Real, zero_power_degc: Real) -> Real:
    """Return the share of a power rating that is left at an ambient temperature, from 0 to 1.

    (T_zero - T) / (T_zero - T_full), held between 0 and 1.
    Source: IEC 60115-1, straight-line derating.

    >>> round(derating_frac(85.0, 70.0, 155.0), 4)
    0.8235
    """
    share = (zero_power_degc - ambient_degc) / (zero_power_degc - full_power_degc)
    return _between(share)


def _between(share: Real) -> Real:
    if isinstance(share, float):
        return min(max(share, 0.0), 1.0)
    return share.clip(0.0, 1.0)


def thermal_resistance_k_per_w(power_w: Real, full_power_degc: Real, zero_power_degc: Real) -> Real:
    """Return the thermal resistance to the air that a derating line implies, K/W.

    (T_zero - T_full) / P: at full load in T_full the part stands at T_zero.
    Source: IEC 60115-1, straight-line derating.

    >>> thermal_resistance_k_per_w(0.25, 70.0, 155.0)
    340.0
    """
    return (zero_power_degc - full_power_degc) / power_w
