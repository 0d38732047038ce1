"""Texts that are refused, and what is said of them."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from selector.units import (
    CAPACITANCE,
    CONDUCTANCE,
    COUNT,
    CURRENT,
    DECIBEL,
    ENERGY,
    FRACTION,
    FREQUENCY,
    INDUCTANCE,
    LSB,
    MONEY,
    PER_KELVIN,
    POWER,
    QUANTITIES,
    RATIO,
    RESISTANCE,
    SLEW_RATE,
    TEMPERATURE,
    THERMAL_RESISTANCE,
    TIME,
    VOLTAGE,
    VOLTAGE_NOISE,
    DecimalMark,
    Quantity,
    QuantityError,
    parse,
)

REFUSED = [
    (RESISTANCE, "", '"" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "   ", '"   " is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "abc", '"abc" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "k", '"k" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "1,000", '"1,000" can be 1 or 1000; write the one that is meant'),
    (RESISTANCE, "3,300 kohm", '"3,300 kohm" can be 3.3 kohm or 3300 kohm; write the one that is meant'),
    (RESISTANCE, "-3,300", '"-3,300" can be -3.3 or -3300; write the one that is meant'),
    (RESISTANCE, "5 MOHM", '"5 MOHM" can be 5 mohm (milli) or 5 Mohm (mega); write the one that is meant'),
    (RESISTANCE, "5 mr", '"5 mr" can be 5 mR (milli) or 5 MR (mega); write the one that is meant'),
    (RESISTANCE, "4E7", '"4E7" can be 4.7 ohm or 4e7 ohm; write the one that is meant'),
    (RESISTANCE, "0E05", '"0E05" can be 0.05 ohm or 0e05 ohm; write the one that is meant'),
    (RESISTANCE, "4K7J", '"4K7J" ends in the tolerance letter J; write the value alone: 4K7'),
    (RESISTANCE, "R47F", '"R47F" ends in the tolerance letter F; write the value alone: R47'),
    (RESISTANCE, "4K7 V", '"4K7 V" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "4.7k3", '"4.7k3" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "1_000", '"1_000" is no resistance; write it like 4.7 kohm'),
    (
        RESISTANCE,
        "\uff11\uff12",
        '"\uff11\uff12" has the sign "\uff11", which is none of 0 to 9; write it like 4.7 kohm',
    ),
    (RESISTANCE, "٤٧", '"٤٧" has the sign "٤", which is none of 0 to 9; write it like 4.7 kohm'),
    (RESISTANCE, "½ ohm", '"½ ohm" has the sign "½", which is none of 0 to 9; write it like 4.7 kohm'),
    (RESISTANCE, "nan", '"nan" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "-inf", '"-inf" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "Infinity", '"Infinity" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "1e999", '"1e999" is too large for any calculation; write it like 4.7 kohm'),
    (RESISTANCE, "1e9999", '"1e9999" has an exponent of more than three digits; write it like 4.7 kohm'),
    (RESISTANCE, "1e-400", '"1e-400" is too small for any calculation; write it like 4.7 kohm'),
    (RESISTANCE, "1-2 ohm", '"1-2 ohm" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "4.7 100n", '"4.7 100n" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "5.", '"5." is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "1,2,3", '"1,2,3" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "1.2.3", '"1.2.3" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "+-5", '"+-5" can be 5 or a span of twice that; write the one that is meant'),
    (RESISTANCE, "<5 ohm", '"<5 ohm" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "5 L", '"5 L" has the unknown unit "L"; write it like 4.7 kohm'),
    (RESISTANCE, "10 g", '"10 g" has the unknown unit "g"; write it like 4.7 kohm'),
    (RESISTANCE, "0x10", '"0x10" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "1 e3", '"1 e3" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "- 5", '"- 5" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "--5", '"--5" is no resistance; write it like 4.7 kohm'),
    (RESISTANCE, "100 nF", '"100 nF" is a capacitance; a resistance is wanted, for example "4.7 kohm"'),
    (RESISTANCE, "10 %", '"10 %" is a fraction; a resistance is wanted, for example "4.7 kohm"'),
    (RESISTANCE, "4.7 kohm 1%", '"4.7 kohm 1%" has the unknown unit "kohm1%"; write it like 4.7 kohm'),
    (RESISTANCE, "4\x1b7", '"4\\x1b7" is no resistance; write it like 4.7 kohm'),
    (VOLTAGE, "100 mA", '"100 mA" is a current; a voltage is wanted, for example "100 mV"'),
    (VOLTAGE, "100 MV", '"100 MV" can be 100 mV (milli) or 100 MV (mega); write the one that is meant'),
    (VOLTAGE, "5 M", '"5 M" can be 5 m (milli) or 5 M (mega); write the one that is meant'),
    (VOLTAGE, "5 K", '"5 K" can be 5 kV or 5 kelvin; write 5 kV'),
    (VOLTAGE, "1/8 V", '"1/8 V" is no voltage; write it like 100 mV'),
    (VOLTAGE, "±15 V", '"±15 V" can be 15 V or a span of twice that; write the one that is meant'),
    (VOLTAGE, "5 Vrms", '"5 Vrms" is an rms figure; a peak-to-peak figure is wanted, for example "1 mVpp"'),
    (VOLTAGE, "-40 degC", '"-40 degC" is a temperature; a voltage is wanted, for example "100 mV"'),
    (VOLTAGE, "V33", '"V33" is no voltage; write it like 100 mV'),
    (VOLTAGE, "1 uV/K", '"1 uV/K" is a voltage drift; a voltage is wanted, for example "100 mV"'),
    (VOLTAGE, "5 a", '"5 a" is a current; a voltage is wanted, for example "100 mV"'),
    (CURRENT, "60 MA", '"60 MA" can be 60 mA (milli) or 60 MA (mega); write the one that is meant'),
    (CAPACITANCE, "100 MF", '"100 MF" can be 100 mF (milli) or 100 MF (mega); write the one that is meant'),
    (CAPACITANCE, "5 f", '"5 f" can be 5 fF or 5 F; write the one that is meant'),
    (CAPACITANCE, "10 MFD", '"10 MFD" is in MFD, which may be milli or micro; write it like "10 uF"'),
    (INDUCTANCE, "4R7", '"4R7" is no inductance; write it like 5 nH'),
    (INDUCTANCE, "4 R", '"4 R" has a letter of resistance; write it like "4.7 uH" or 4u7'),
    (TEMPERATURE, "298 K", '"298 K" is in kelvin; a temperature is wanted in degC, for example "25 degC"'),
    (TEMPERATURE, "77 °F", '"77 °F" is in degrees Fahrenheit; a temperature is wanted in degC, for example "25 degC"'),
    (TEMPERATURE, "10k", '"10k" is in kelvin; a temperature is wanted in degC, for example "25 degC"'),
    (FRACTION, "25 ppm/K", '"25 ppm/K" is a temperature coefficient; a fraction is wanted, for example "0.1 %"'),
    (
        FRACTION,
        "10K",
        '"10K" has a K, which is kilo, kelvin or 10 %; write it like 0.1 %, or the tolerance letter K alone',
    ),
    (FRACTION, "1 F", '"1 F" is a capacitance; a fraction is wanted, for example "0.1 %"'),
    (FRACTION, "f", '"f" is no fraction; write it like 0.1 %'),
    (FRACTION, "abc", '"abc" is no fraction; write it like 0.1 %'),
    (PER_KELVIN, "0.1 %", '"0.1 %" is a fraction; a temperature coefficient is wanted, for example "25 ppm/K"'),
    (TIME, "5 m", '"5 m" can be 5 ms or 5 minutes; write 5 ms, or the time in s'),
    (TIME, "2 min", '"2 min" is in minutes; a time is wanted in s, for example "60 s"'),
    (TIME, "1 h", '"1 h" is in hours; a time is wanted in s, for example "3600 s"'),
    (TIME, "5 S", '"5 S" is a conductance; a time is wanted, for example "10 ms"'),
    (FREQUENCY, "10 MHZ", '"10 MHZ" can be 10 mHz (milli) or 10 MHz (mega); write the one that is meant'),
    (FREQUENCY, "10 mhz", '"10 mhz" can be 10 mHz (milli) or 10 MHz (mega); write the one that is meant'),
    (FREQUENCY, "10 K", '"10 K" can be 10 kHz or 10 kelvin; write 10 kHz'),
    (VOLTAGE_NOISE, "7n", '"7n" has a prefix without a unit; write it like 8 nV/rtHz'),
    (SLEW_RATE, "3 V", '"3 V" is a voltage; a slew rate is wanted, for example "0.5 V/us"'),
    (POWER, "1/0 W", '"1/0 W" is no power; write it like 1/8 W'),
    (POWER, "1 1/8 W", '"1 1/8 W" is no power; write it like 1/8 W'),
    (POWER, "5 MW", '"5 MW" can be 5 mW (milli) or 5 MW (mega); write the one that is meant'),
    (DECIBEL, "1e5 V/V", '"1e5 V/V" is a plain number; a ratio in dB is wanted, for example "110 dB"'),
    (RATIO, "40 dB", '"40 dB" is a ratio in dB; a plain number is wanted, for example "100"'),
    (RATIO, "100k", '"100k" has a prefix without a unit; write the number alone'),
    (COUNT, "10.5", '"10.5" is no whole number; write it like 12'),
    (COUNT, "10 pcs", '"10 pcs" has the unknown unit "pcs"; write the number alone'),
    (
        MONEY,
        "2.31 EUR",
        '"2.31 EUR" has the unknown unit "EUR"; write the number alone; the currency has a field of its own',
    ),
    (MONEY, "$2", '"$2" is no price; write it like 0.38'),
    (LSB, "2 %", '"2 %" is a fraction; a figure in LSB is wanted, for example "0.5 LSB"'),
    (THERMAL_RESISTANCE, "5 W/K", '"5 W/K" has the unknown unit "W/K"; write it like 340 K/W'),
    (CONDUCTANCE, "5 s", '"5 s" is a time; a conductance is wanted, for example "1 mS"'),
    (ENERGY, "5 W", '"5 W" is a power; an energy is wanted, for example "50 mJ"'),
]


@pytest.mark.parametrize(("quantity", "text", "message"), REFUSED)
def test_refused(quantity: Quantity, text: str, message: str) -> None:
    """A text that is not the quantity, or could be two of it, is refused with what it is and what would be right."""
    with pytest.raises(QuantityError) as refused:
        parse(text, quantity)
    assert str(refused.value) == message
    assert f"{refused.value.what}; {refused.value.remedy}" == message


@pytest.mark.parametrize(
    ("text", "quantity", "message"),
    [
        ("1", FRACTION, '"1" has no unit; write 1 % or F'),
        ("0.1", FRACTION, '"0.1" has no unit; write 0.1 % or B'),
        ("2.5", FRACTION, '"2.5" has no unit; write 2.5 %'),
        ("0", FRACTION, '"0" has no unit; write 0 %'),
        ("25", PER_KELVIN, '"25" has no unit; write it like 25 ppm/K'),
        ("8e-9", VOLTAGE_NOISE, '"8e-9" has no unit; write it like 8 nV/rtHz'),
        ("4.7", RESISTANCE, '"4.7" has no unit; write it like 4.7 kohm'),
    ],
)
def test_bare_number_refused(text: str, quantity: Quantity, message: str) -> None:
    """Where bare numbers are not taken, the message says how the number would have to be written."""
    with pytest.raises(QuantityError) as refused:
        parse(text, quantity, bare=False)
    assert str(refused.value) == message


@pytest.mark.parametrize(
    ("unit", "message"),
    [
        ("mA", '"mA" is a current; a voltage is wanted, for example "100 mV"'),
        ("MV", '"MV" can be mV (milli) or MV (mega); write the one that is meant'),
        ("furlong", '"furlong" has the unknown unit "furlong"; write it like 100 mV'),
    ],
)
def test_unit_of_a_heading_refused(unit: str, message: str) -> None:
    """A heading's unit is held to the same rules as a cell's."""
    with pytest.raises(QuantityError) as refused:
        parse("5", VOLTAGE, unit=unit)
    assert str(refused.value) == message


@pytest.mark.parametrize(
    ("text", "decimal", "message"),
    [
        ("4,7 V", "point", '"4,7 V" is no voltage; write it like 100 mV'),
        ("1.000 V", "comma", '"1.000 V" can be 1 V or 1000 V; write the one that is meant'),
        ("1,234.5 V", "comma", '"1,234.5 V" is no voltage; write it like 100 mV'),
        ("1,000 V", "auto", '"1,000 V" can be 1 V or 1000 V; write the one that is meant'),
        ("12,34,567 V", "auto", '"12,34,567 V" is no voltage; write it like 100 mV'),
    ],
)
def test_decimal_mark_refused(text: str, decimal: DecimalMark, message: str) -> None:
    """Marks that contradict the known decimal mark, or leave two readings, are refused."""
    with pytest.raises(QuantityError) as refused:
        parse(text, VOLTAGE, decimal=decimal)
    assert str(refused.value) == message


@pytest.mark.parametrize("quantity", QUANTITIES.values(), ids=lambda quantity: quantity.name)
@pytest.mark.parametrize(
    "text",
    [
        "1" * 10_000 + "x",
        "9" * 9_999 + "k",
        "1," * 5_000,
        "1 000" * 2_000,
        "1" + "'000" * 2_499,
        "1 " * 5_000,
        " " * 9_999 + "x",
        "1e" * 5_000,
        "1e" + "9" * 9_998,
        "1/" * 5_000,
        "(" * 10_000,
        "+-" * 5_000,
        "R" * 10_000,
        "1" + "k1" * 4_999,
        "1" + "M" * 9_999,
        "\u00b5" * 10_000,
        "\u2126" * 10_000,
        "\uff11" * 10_000,
        "\ud800",
        "4\x007k",
        "1" * 10_001,
    ],
    ids=lambda text: ascii(text[:6]),
)
def test_hostile_text_is_refused(quantity: Quantity, text: str) -> None:
    """A hostile cell is refused with a message of one short line, however long it is."""
    with pytest.raises(QuantityError) as refused:
        parse(text, quantity)
    assert str(refused.value).isprintable()
    assert len(str(refused.value)) < 300


NEARLY = st.lists(
    st.sampled_from([*"0123456789.,'+-/ eEkKmMuRLFVA%", "ppm/K", "ohm", "\u00b1", "1,000", "\u00b5"]), max_size=9
)


@given(st.one_of(st.text(max_size=30), NEARLY.map("".join)), st.sampled_from(sorted(QUANTITIES)))
def test_any_text_is_a_figure_or_refused(text: str, name: str) -> None:
    """Every text is a finite figure or is refused in one printable line; nothing else comes out."""
    try:
        value, message = parse(text, QUANTITIES[name]), ""
    except QuantityError as refused:
        value, message = 0.0, str(refused)
    assert math.isfinite(value)
    assert message.isprintable()
