"""The limits, in the order in which they are judged."""

from selector.limits.each.amplifier_input import LIMIT as AMPLIFIER_INPUT
from selector.limits.each.bandwidth import LIMIT as BANDWIDTH
from selector.limits.each.burden import LIMIT as BURDEN
from selector.limits.each.common_mode import LIMIT as COMMON_MODE
from selector.limits.each.converter_pin import LIMIT as CONVERTER_PIN
from selector.limits.each.cost import LIMIT as COST
from selector.limits.each.error import LIMIT as ERROR
from selector.limits.each.filter import LIMIT as FILTER
from selector.limits.each.gain_capacitor import LIMIT as GAIN_CAPACITOR
from selector.limits.each.gain_resistance import LIMIT as GAIN_RESISTANCE
from selector.limits.each.headroom import LIMIT as HEADROOM
from selector.limits.each.inductance import LIMIT as INDUCTANCE
from selector.limits.each.law import LIMIT as LAW
from selector.limits.each.missing_figure import LIMIT as MISSING_FIGURE
from selector.limits.each.output_low import LIMIT as OUTPUT_LOW
from selector.limits.each.output_window import LIMIT as OUTPUT_WINDOW
from selector.limits.each.overload import LIMIT as OVERLOAD
from selector.limits.each.power import LIMIT as POWER
from selector.limits.each.range_order import LIMIT as RANGE_ORDER
from selector.limits.each.rating import LIMIT as RATING
from selector.limits.each.reference_pin import LIMIT as REFERENCE_PIN
from selector.limits.each.saturation import LIMIT as SATURATION
from selector.limits.each.settling import LIMIT as SETTLING
from selector.limits.each.slew_rate import LIMIT as SLEW_RATE
from selector.limits.each.stock import LIMIT as STOCK
from selector.limits.each.supply import LIMIT as SUPPLY
from selector.limits.each.temperature import LIMIT as TEMPERATURE
from selector.limits.measure import Limit

LIMITS: tuple[Limit, ...] = (
    MISSING_FIGURE,
    LAW,
    REFERENCE_PIN,
    SUPPLY,
    TEMPERATURE,
    OUTPUT_WINDOW,
    RATING,
    OVERLOAD,
    AMPLIFIER_INPUT,
    INDUCTANCE,
    GAIN_RESISTANCE,
    BURDEN,
    COMMON_MODE,
    HEADROOM,
    RANGE_ORDER,
    POWER,
    SLEW_RATE,
    OUTPUT_LOW,
    GAIN_CAPACITOR,
    FILTER,
    CONVERTER_PIN,
    BANDWIDTH,
    SETTLING,
    STOCK,
    COST,
    SATURATION,
    ERROR,
)
