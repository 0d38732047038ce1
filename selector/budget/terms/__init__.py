"""The error terms, in the order in which a budget lists them."""

from selector.budget.term import Term
from selector.budget.terms.amplifier_gain import TERM as AMPLIFIER_GAIN
from selector.budget.terms.amplifier_gain_drift import TERM as AMPLIFIER_GAIN_DRIFT
from selector.budget.terms.bias_current import TERM as BIAS_CURRENT
from selector.budget.terms.bias_current_drift import TERM as BIAS_CURRENT_DRIFT
from selector.budget.terms.calibration import TERM as CALIBRATION
from selector.budget.terms.common_mode import TERM as COMMON_MODE
from selector.budget.terms.common_mode_change import TERM as COMMON_MODE_CHANGE
from selector.budget.terms.converter_gain import TERM as CONVERTER_GAIN
from selector.budget.terms.converter_input_current import TERM as CONVERTER_INPUT_CURRENT
from selector.budget.terms.converter_loading import TERM as CONVERTER_LOADING
from selector.budget.terms.converter_nonlinearity import TERM as CONVERTER_NONLINEARITY
from selector.budget.terms.converter_offset import TERM as CONVERTER_OFFSET
from selector.budget.terms.gain_resistors import TERM as GAIN_RESISTORS
from selector.budget.terms.gain_resistors_temperature import TERM as GAIN_RESISTORS_TEMPERATURE
from selector.budget.terms.lead_resistance import TERM as LEAD_RESISTANCE
from selector.budget.terms.lead_temperature import TERM as LEAD_TEMPERATURE
from selector.budget.terms.loop_gain import TERM as LOOP_GAIN
from selector.budget.terms.network_change import TERM as NETWORK_CHANGE
from selector.budget.terms.network_current import TERM as NETWORK_CURRENT
from selector.budget.terms.network_loading import TERM as NETWORK_LOADING
from selector.budget.terms.network_mismatch import TERM as NETWORK_MISMATCH
from selector.budget.terms.noise import TERM as NOISE
from selector.budget.terms.nonlinearity import TERM as NONLINEARITY
from selector.budget.terms.offset import TERM as OFFSET
from selector.budget.terms.offset_drift import TERM as OFFSET_DRIFT
from selector.budget.terms.output_offset import TERM as OUTPUT_OFFSET
from selector.budget.terms.output_offset_drift import TERM as OUTPUT_OFFSET_DRIFT
from selector.budget.terms.quantisation import TERM as QUANTISATION
from selector.budget.terms.reference_drift import TERM as REFERENCE_DRIFT
from selector.budget.terms.reference_tolerance import TERM as REFERENCE_TOLERANCE
from selector.budget.terms.shunt_ageing import TERM as SHUNT_AGEING
from selector.budget.terms.shunt_self_heating import TERM as SHUNT_SELF_HEATING
from selector.budget.terms.shunt_temperature import TERM as SHUNT_TEMPERATURE
from selector.budget.terms.shunt_tolerance import TERM as SHUNT_TOLERANCE
from selector.budget.terms.supply_change import TERM as SUPPLY_CHANGE
from selector.budget.terms.supply_offset import TERM as SUPPLY_OFFSET
from selector.budget.terms.switch_leakage import TERM as SWITCH_LEAKAGE
from selector.budget.terms.switch_resistance import TERM as SWITCH_RESISTANCE
from selector.budget.terms.thermal_emf import TERM as THERMAL_EMF
from selector.budget.terms.zero_reference import TERM as ZERO_REFERENCE
from selector.budget.terms.zero_reference_drift import TERM as ZERO_REFERENCE_DRIFT

TERMS: tuple[Term, ...] = (
    SHUNT_TOLERANCE,
    SHUNT_TEMPERATURE,
    SHUNT_SELF_HEATING,
    SHUNT_AGEING,
    LEAD_RESISTANCE,
    LEAD_TEMPERATURE,
    THERMAL_EMF,
    OFFSET,
    OFFSET_DRIFT,
    OUTPUT_OFFSET,
    OUTPUT_OFFSET_DRIFT,
    BIAS_CURRENT,
    BIAS_CURRENT_DRIFT,
    COMMON_MODE,
    COMMON_MODE_CHANGE,
    NETWORK_LOADING,
    NETWORK_CURRENT,
    NETWORK_MISMATCH,
    NETWORK_CHANGE,
    SUPPLY_OFFSET,
    SUPPLY_CHANGE,
    ZERO_REFERENCE,
    ZERO_REFERENCE_DRIFT,
    AMPLIFIER_GAIN,
    AMPLIFIER_GAIN_DRIFT,
    LOOP_GAIN,
    NONLINEARITY,
    GAIN_RESISTORS,
    GAIN_RESISTORS_TEMPERATURE,
    SWITCH_RESISTANCE,
    SWITCH_LEAKAGE,
    CONVERTER_OFFSET,
    CONVERTER_NONLINEARITY,
    QUANTISATION,
    CONVERTER_GAIN,
    CONVERTER_INPUT_CURRENT,
    CONVERTER_LOADING,
    REFERENCE_TOLERANCE,
    REFERENCE_DRIFT,
    CALIBRATION,
    NOISE,
)
