"""The shunt gets hot at the largest current, or carries more than half of what it is rated for."""

from __future__ import annotations

from selector.bill.caution import Caution
from selector.candidate import Candidate, Conditions
from selector.candidate.figures import shunt_figures
from selector.physics.heat import derating_frac
from selector.units import CURRENT, FRACTION, POWER, TEMPERATURE, TEMPERATURE_DIFFERENCE, shown

MOST_RISE_K = 60.0  # common practice, no source
MOST_SHARE_OF_RATING = 0.5  # common practice, no source


def _texts(candidate: Candidate, conditions: Conditions) -> tuple[str, ...]:
    """Rise = power times thermal resistance to the air; the rating is that at the highest ambient."""
    part = candidate.design.shunts[-1]
    power_w = candidate.shunt_power_w
    hottest_degc = conditions.ambient_max_degc
    rise_k = power_w * float(shunt_figures(part).heating_k_per_w)
    rated_w = part.power * float(derating_frac(hottest_degc, part.full_power_temp, part.zero_power_temp))
    at = f"at {shown(conditions.current_max_a, CURRENT)}"
    said = []
    if rise_k > MOST_RISE_K:
        said.append(
            f"Hot: shunt {part.part} rises by {shown(rise_k, TEMPERATURE_DIFFERENCE)} with "
            f"{shown(power_w, POWER)} {at}; keep hands and parts away from it."
        )
    if power_w > MOST_SHARE_OF_RATING * rated_w:
        share = f"{shown(power_w / rated_w, FRACTION)} of its" if rated_w > 0.0 else "more than its"
        said.append(
            f"Shunt {part.part} carries {shown(power_w, POWER)} {at}, {share} rating at "
            f"{shown(hottest_degc, TEMPERATURE)}."
        )
    return tuple(said)


CAUTION = Caution("hot shunt", _texts)
