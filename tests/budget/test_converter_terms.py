"""The error terms of converter, reference and zero; plain: G Rs 2 ohm, 3.90625 mV a count, a filter of 1 kohm, 25 K."""

from __future__ import annotations

from tests.budget.sized import check
from tests.builders import ZERO, amplifier, design, operating

UNBUFFERED = design("current-output")  # the filter sees 10 kohm more
BUFFERED = design("current-output", amplifier=amplifier("current-output", buffered=True))


def test_zero_reference() -> None:
    """A zero of 1 V off by 0.2 % and by the converter's gain error of 0.1 %: 3 mV over 2 ohm; zero takes it out."""
    check("zero reference", operating(converter__gain_error=0.001, **ZERO), constant=1.5e-3)
    check("zero reference", operating(converter__gain_error=0.001, accuracy__calibration="zero", **ZERO))
    check("zero reference", operating(converter__gain_error=0.001))


def test_zero_reference_drift() -> None:
    """1 V times 10 ppm/K times 25 K over 2 ohm: 125 uA; it stays."""
    check("zero reference drift", operating(accuracy__calibration="zero-and-span", **ZERO), constant=1.25e-4)


def test_converter_offset() -> None:
    """1 mV over 2 ohm is 0.5 mA; zero takes it out."""
    check("converter offset", operating(converter__offset=1e-3), constant=5e-4)
    check("converter offset", operating(converter__offset=1e-3, accuracy__calibration="zero"))


def test_converter_nonlinearity() -> None:
    """2 counts are 7.8125 mV, 3.90625 mA over 2 ohm; it stays."""
    at = operating(converter__inl=2.0, accuracy__calibration="zero-and-span")
    check("converter nonlinearity", at, constant=3.90625e-3)


def test_quantisation() -> None:
    """Half a count is 1.953125 mV, 976.5625 uA over 2 ohm; it stays."""
    check("quantisation", operating(accuracy__calibration="zero-and-span"), constant=9.765625e-4)


def test_converter_gain() -> None:
    """0.1 % of the current; span takes it out."""
    check("converter gain", operating(converter__gain_error=0.001), proportional=0.001)
    check("converter gain", operating(converter__gain_error=0.001, accuracy__calibration="zero-and-span"))


def test_converter_input_current() -> None:
    """10 nA in 1 kohm are 10 uV, 5 uA over 2 ohm; behind an unbuffered 10 kohm 55 uA; it stays."""
    amount = {"converter__input_current": 1e-8, "accuracy__calibration": "zero-and-span"}
    check("converter input current", operating(**amount), constant=5e-6)
    check("converter input current", operating(UNBUFFERED, **amount), constant=5.5e-5)
    check("converter input current", operating(BUFFERED, **amount), constant=5e-6)


def test_converter_loading() -> None:
    """1 kohm into 99 kohm takes 1 %, an unbuffered 11 kohm 10 %; without a stated input resistance nothing."""
    check("converter loading", operating(converter__input_resistance=99e3), proportional=0.01)
    check("converter loading", operating(UNBUFFERED, converter__input_resistance=99e3), proportional=0.1)
    check("converter loading", operating())


def test_converter_loading_takes_its_share_of_the_zero() -> None:
    """A zero of 1 V is 0.5 A at the input: 1 % of it is 5 mA at no current; span takes both parts out."""
    at = operating(converter__input_resistance=99e3, **ZERO)
    check("converter loading", at, constant=5e-3, proportional=0.01)
    zeroed = operating(converter__input_resistance=99e3, accuracy__calibration="zero", **ZERO)
    check("converter loading", zeroed, constant=5e-3, proportional=0.01)
    check(
        "converter loading", operating(converter__input_resistance=99e3, accuracy__calibration="zero-and-span", **ZERO)
    )


def test_reference_tolerance() -> None:
    """0.2 % of the current; span takes it out."""
    check("reference tolerance", operating(converter__reference_tolerance=0.002), proportional=0.002)
    check("reference tolerance", operating(converter__reference_tolerance=0.002, accuracy__calibration="zero-and-span"))


def test_reference_drift() -> None:
    """20 ppm/K over 25 K are 500 ppm of the current; it stays."""
    at = operating(converter__reference_drift=2e-5, accuracy__calibration="zero-and-span")
    check("reference drift", at, proportional=5e-4)
