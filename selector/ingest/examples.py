"""Example rows of each kind for templates: plausible figures of parts that do not exist. Data only."""

from __future__ import annotations

_COMMON = {"unit_cost": "0.12", "currency": "EUR", "quantity": "40", "location": "B-12"}

_AMPLIFIER = _COMMON | {
    "unit_cost": "1.45",
    "quantity": "6",
    "location": "C-03",
    "offset": "25 uV",
    "offset_drift": "0.2 uV/K",
    "bias_current": "200 pA",
    "cmrr": "110",
    "psrr": "105",
    "noise_density": "25 nV/rtHz",
    "low_frequency_noise": "0.6 uV",
    "swing_high": "30 mV",
    "swing_low": "5 mV",
    "common_mode_min": "-0.1",
    "common_mode_top_gap": "1.2",
    "supply_min": "1.8",
    "supply_max": "5.5",
    "supply_current": "90 uA",
    "temp_min": "-40",
    "temp_max": "125",
    "package": "SOT-23-5",
}

EXAMPLES: dict[str, tuple[dict[str, str], ...]] = {
    "shunt": (
        _COMMON
        | {
            "part": "S-0R05",
            "description": "shunt 50 mohm 0.5 % 1 W",
            "resistance": "0R05",
            "tolerance": "0.5",
            "tempco": "50",
            "power": "1",
            "full_power_temp": "70",
            "zero_power_temp": "155",
            "drift": "0.2",
            "thermal_emf": "1 uV/K",
            "inductance": "2 nH",
            "terminals": "4",
            "package": "2512",
        },
    ),
    "resistor": (
        _COMMON
        | {
            "part": "R-4K99",
            "description": "resistor 4.99 kohm 0.1 % 25 ppm/K",
            "resistance": "4.99 kohm",
            "tolerance": "0.1",
            "tempco": "25",
            "power": "1/8 W",
            "voltage": "100",
            "package": "0805",
        },
    ),
    "capacitor": (
        _COMMON
        | {
            "part": "C-100N",
            "description": "capacitor 100 nF 5 % C0G 50 V",
            "capacitance": "100 nF",
            "tolerance": "5",
            "temp_change": "0.3",
            "dielectric": "C0G",
            "voltage": "50",
            "package": "1206",
        },
    ),
    "amplifier": (
        _AMPLIFIER
        | {
            "part": "A-FIX50",
            "description": "fixed gain of 50",
            "gain_law": "fixed",
            "gain": "50",
            "gain_error": "0.3",
            "gain_drift": "10",
            "bandwidth": "100 kHz",
            "reference_pin": "yes",
            "common_mode_min": "-0.2",
            "common_mode_max": "26",
            "common_mode_top_gap": "",
            "common_mode_test": "12",
        },
        _AMPLIFIER
        | {
            "part": "A-OP1",
            "description": "operational amplifier, gain by two resistors to its ground",
            "gain_law": "non-inverting",
            "open_loop_gain": "115",
            "gain_bandwidth": "1 MHz",
            "slew_rate": "0.5 V/us",
        },
        _AMPLIFIER
        | {
            "part": "A-IN1",
            "description": "instrumentation amplifier, gain by one resistor",
            "gain_law": "one-resistor",
            "gain_base": "1",
            "gain_resistance": "100 kohm",
            "gain_error": "0.2",
            "gain_drift": "30",
            "output_offset": "0.5 mV",
            "output_offset_drift": "3 uV/K",
            "gain_bandwidth": "400 kHz",
            "reference_pin": "yes",
        },
        _AMPLIFIER
        | {
            "part": "A-TR1",
            "description": "buffered amplifier, gain by two resistors, with gain capacitor",
            "gain_law": "two-resistor",
            "gain_factor": "2",
            "gain_error": "0.4",
            "gain_drift": "20",
            "output_bias_current": "200 pA",
            "bandwidth": "50 kHz",
            "buffered": "yes",
            "gain_capacitor": "yes",
            "reference_pin": "yes",
        },
        _AMPLIFIER
        | {
            "part": "A-CO1",
            "description": "amplifier with a current output into one resistor",
            "gain_law": "current-output",
            "transconductance": "200 uS",
            "gain_error": "0.5",
            "gain_drift": "40",
            "bandwidth": "300 kHz",
            "common_mode_min": "2.5",
            "common_mode_max": "36",
            "common_mode_top_gap": "",
            "common_mode_test": "12",
        },
        _AMPLIFIER
        | {
            "part": "A-OP2",
            "description": "operational amplifier in a difference stage of four resistors",
            "gain_law": "difference",
            "offset_current": "50 pA",
            "open_loop_gain": "110",
            "gain_bandwidth": "2 MHz",
            "reference_pin": "yes",
        },
    ),
    "bypass": (
        _COMMON
        | {
            "part": "Q-3M",
            "description": "bypass transistor 3 mohm",
            "on_resistance": "3 mohm",
            "leakage": "1 uA",
            "clamp": "0.7",
            "current": "5",
            "voltage": "20",
            "package": "SO-8",
        },
    ),
    "switch": (
        _COMMON
        | {
            "part": "SW-4",
            "description": "four analogue switches",
            "on_resistance": "5",
            "on_resistance_spread": "1.5",
            "leakage": "10 nA",
            "channels": "4",
            "supply_min": "1.8",
            "supply_max": "5.5",
            "package": "TSSOP-16",
        },
    ),
}
