"""A measurement spec as the formulas read it: flat, in SI units, with what follows from it alone."""

from __future__ import annotations

from dataclasses import dataclass
from enum import Enum
from math import inf

from selector.candidate.elementwise import stated
from selector.spec import Spec

ZERO_CELSIUS_K = 273.15  # exact by definition of the Celsius temperature; the SI Brochure, 9th edition


class Calibration(Enum):
    """What is calibrated away, in every range, at nominal conditions."""

    NONE = "none"
    ZERO = "zero"
    ZERO_AND_SPAN = "zero-and-span"

    @property
    def zero(self) -> bool:
        """Return whether the reading at no current is calibrated."""
        return self is not Calibration.NONE

    @property
    def span(self) -> bool:
        """Return whether the reading at a known current is calibrated."""
        return self is Calibration.ZERO_AND_SPAN


@dataclass(frozen=True, slots=True)
class Band:
    """The error allowed up to a current: a share of the reading and a floor in A."""

    up_to_a: float
    reading_frac: float
    floor_a: float


@dataclass(frozen=True, slots=True)
class Conditions:
    """Everything a spec fixes; bus voltages are 0 at the low side."""

    two_way: bool
    current_min_a: float
    current_max_a: float
    overload_a: float  # 0 where the spec states none
    overload_s: float
    bands: tuple[Band, ...]
    method: str
    coverage: float
    calibration: Calibration
    calibration_uncertainty_frac: float
    burden_limit_v: float
    power_limit_w: float
    headroom_limit_frac: float
    cost_limit: float  # infinite where the spec states none
    load_frac: float
    supply_v: float
    supply_tolerance_frac: float
    high_side: bool
    bus_min_v: float
    bus_nominal_v: float
    bus_max_v: float
    stated_bus_v: float  # the highest bus voltage that the spec states at either side, 0 where it states none
    lead_ohm: float
    output_low_v: float
    output_high_v: float
    zero_v: float
    zero_tolerance_frac: float
    zero_drift_per_k: float
    bits: int
    reference_v: float
    reference_tolerance_frac: float
    reference_drift_per_k: float
    converter_offset_v: float
    converter_inl_lsb: float
    converter_gain_error_frac: float
    converter_noise_v: float
    converter_input_current_a: float
    converter_input_ohm: float  # infinite where the spec states none
    converter_input_max_v: float  # infinite where the spec states none
    clamp_current_a: float
    average: float
    ambient_min_degc: float
    ambient_nominal_degc: float
    ambient_max_degc: float
    gradient_k: float
    bandwidth_hz: float
    settle_s: float  # infinite where the spec states none
    ranges_most: int
    overlap_frac: float
    filter_least_ohm: float
    filter_most_ohm: float
    stock_only: bool
    boards: int

    @property
    def supply_min_v(self) -> float:
        """Return the lowest supply voltage, V."""
        return self.supply_v * (1.0 - self.supply_tolerance_frac)

    @property
    def supply_max_v(self) -> float:
        """Return the highest supply voltage, V."""
        return self.supply_v * (1.0 + self.supply_tolerance_frac)

    @property
    def supply_change_v(self) -> float:
        """Return how far the supply may be from nominal, V."""
        return self.supply_v * self.supply_tolerance_frac

    @property
    def temperature_change_k(self) -> float:
        """Return the largest distance of the ambient from nominal, K."""
        nominal = self.ambient_nominal_degc
        return max(self.ambient_max_degc - nominal, nominal - self.ambient_min_degc)

    @property
    def hottest_k(self) -> float:
        """Return the highest ambient as an absolute temperature, K."""
        return self.ambient_max_degc + ZERO_CELSIUS_K

    @property
    def common_mode_v(self) -> float:
        """Return the nominal voltage of the sense lines, V."""
        return self.bus_nominal_v if self.high_side else 0.0

    @property
    def bus_change_v(self) -> float:
        """Return the largest distance of the bus from nominal, V; 0 at the low side."""
        if not self.high_side:
            return 0.0
        return max(self.bus_max_v - self.bus_nominal_v, self.bus_nominal_v - self.bus_min_v)

    @property
    def lsb_v(self) -> float:
        """Return one count of the converter, V."""
        return self.reference_v / float(2**self.bits)

    @property
    def largest_current_a(self) -> float:
        """Return the larger of the top of the measured span and the overload, A."""
        return max(self.current_max_a, self.overload_a)


def conditions_of(spec: Spec) -> Conditions:
    """Return the conditions that a spec fixes."""
    high_side = spec.sense.side == "high"
    return Conditions(
        two_way=spec.current.two_way,
        current_min_a=spec.current.min,
        current_max_a=spec.current.max,
        overload_a=stated(spec.current.overload, 0.0),
        overload_s=stated(spec.current.overload_time, 0.0),
        bands=_bands(spec),
        method=spec.accuracy.method,
        coverage=spec.accuracy.coverage,
        calibration=Calibration(spec.accuracy.calibration),
        calibration_uncertainty_frac=spec.accuracy.calibration_uncertainty,
        burden_limit_v=spec.limits.burden,
        power_limit_w=spec.limits.power,
        headroom_limit_frac=spec.limits.headroom,
        cost_limit=stated(spec.limits.cost, inf),
        load_frac=spec.limits.load_fraction,
        supply_v=spec.supply.voltage,
        supply_tolerance_frac=spec.supply.tolerance,
        high_side=high_side,
        bus_min_v=stated(spec.sense.bus_min, 0.0) if high_side else 0.0,
        bus_nominal_v=stated(spec.sense.bus_nominal, 0.0) if high_side else 0.0,
        bus_max_v=stated(spec.sense.bus_max, 0.0) if high_side else 0.0,
        stated_bus_v=stated(spec.sense.bus_max, 0.0),
        lead_ohm=spec.sense.lead,
        output_low_v=spec.output.low,
        output_high_v=stated(spec.output.high, spec.supply.voltage),
        zero_v=spec.output.zero,
        zero_tolerance_frac=stated(spec.output.zero_tolerance, 0.0),
        zero_drift_per_k=stated(spec.output.zero_drift, 0.0),
        bits=spec.converter.bits,
        reference_v=spec.converter.reference,
        reference_tolerance_frac=spec.converter.reference_tolerance,
        reference_drift_per_k=spec.converter.reference_drift,
        converter_offset_v=spec.converter.offset,
        converter_inl_lsb=spec.converter.inl,
        converter_gain_error_frac=spec.converter.gain_error,
        converter_noise_v=spec.converter.noise,
        converter_input_current_a=spec.converter.input_current,
        converter_input_ohm=stated(spec.converter.input_resistance, inf),
        converter_input_max_v=stated(spec.converter.input_max, inf),
        clamp_current_a=spec.converter.clamp_current,
        average=float(spec.converter.average),
        ambient_min_degc=spec.ambient.min,
        ambient_nominal_degc=spec.ambient.nominal,
        ambient_max_degc=spec.ambient.max,
        gradient_k=spec.ambient.gradient,
        bandwidth_hz=spec.signal.bandwidth,
        settle_s=stated(spec.signal.settle, inf),
        ranges_most=spec.ranges.most,
        overlap_frac=spec.ranges.overlap,
        filter_least_ohm=spec.filter.resistance_min,
        filter_most_ohm=spec.filter.resistance_max,
        stock_only=spec.parts.from_ == "stock",
        boards=spec.parts.boards,
    )


def _bands(spec: Spec) -> tuple[Band, ...]:
    if spec.accuracy.bands is None:
        return (Band(inf, stated(spec.accuracy.reading, 0.0), stated(spec.accuracy.floor, 0.0)),)
    return tuple(Band(stated(band.up_to, inf), band.reading, band.floor) for band in spec.accuracy.bands)
