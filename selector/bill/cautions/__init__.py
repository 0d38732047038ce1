"""The cautions, in the order in which they are printed."""

from selector.bill.caution import Caution
from selector.bill.cautions.amplifier_input import CAUTION as AMPLIFIER_INPUT
from selector.bill.cautions.assumed_figures import CAUTION as ASSUMED_FIGURES
from selector.bill.cautions.averaging import CAUTION as AVERAGING
from selector.bill.cautions.generic_parts import CAUTION as GENERIC_PARTS
from selector.bill.cautions.hot_shunt import CAUTION as HOT_SHUNT
from selector.bill.cautions.inductance import CAUTION as INDUCTANCE
from selector.bill.cautions.leakage import CAUTION as LEAKAGE
from selector.bill.cautions.measure_first import CAUTION as MEASURE_FIRST
from selector.bill.cautions.open_shunt import CAUTION as OPEN_SHUNT
from selector.bill.cautions.range_change import CAUTION as RANGE_CHANGE
from selector.bill.cautions.touch import CAUTION as TOUCH
from selector.bill.cautions.typical_figures import CAUTION as TYPICAL_FIGURES

# What may hurt a person comes first, then what may mislead the reading, then what is said of the data.
CAUTIONS: tuple[Caution, ...] = (
    TOUCH,
    HOT_SHUNT,
    OPEN_SHUNT,
    AMPLIFIER_INPUT,
    RANGE_CHANGE,
    AVERAGING,
    INDUCTANCE,
    LEAKAGE,
    TYPICAL_FIGURES,
    ASSUMED_FIGURES,
    GENERIC_PARTS,
    MEASURE_FIRST,
)
