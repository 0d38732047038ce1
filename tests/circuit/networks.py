"""The six gain laws as networks of ideal elements, between the nodes line, base, zero and out.

Each writes the circuit from resistor values and the amplifier's own figures, never from the law's formulas.
"""

from __future__ import annotations

from collections.abc import Callable
from typing import TYPE_CHECKING

from tests.circuit.netlist import Netlist, Noisy

if TYPE_CHECKING:
    from tests.circuit.benches import Bench


def circuit(
    bench: Bench, *, noisy: Noisy = Noisy.NETWORK | Noisy.SHUNT, poles: bool = False, spread: float = 0.0
) -> list[str]:
    """Return the elements of a design: shunt, amplifier, network and output filter.

    `spread` takes the filter's parts to the end of their tolerance: 1 the slow end, -1 the fast end.
    """
    net = Netlist(noisy, poles, bench.at.conditions.hottest_k)
    conditions = bench.at.conditions
    if conditions.high_side:
        net.add("Vbus", "line", "0", conditions.bus_nominal_v)
        net.add("Iload", "base", "0", 0.0, "ac 1")
    else:
        net.add("Vbus", "base", "0", 0.0)
        net.add("Iload", "0", "line", 0.0, "ac 1")
    net.add("Vzero", "zero", "0", conditions.zero_v)
    net.resistor("shunt", ("line", "base"), bench.at.shunt.ohm, Noisy.SHUNT)
    NETWORKS[bench.law](net, bench)
    net.quiet("filter", ("out", "pin"), bench.filter_ohm * (1.0 + spread * bench.filter_ohm_tolerance_frac))
    net.add("Cfilter", "pin", "0", bench.filter_farad * (1.0 + spread * bench.filter_farad_tolerance_frac))
    return net.lines


def _fixed(net: Netlist, bench: Bench) -> None:
    plus = _input(net, bench, "line")
    _bias(net, bench, "line", "base")
    net.add("Egain", "inner", "0", plus, "base", bench.at.amplifier.of_law.fixed_gain)
    _voltage_output(net, bench, "inner")


def _non_inverting(net: Netlist, bench: Bench) -> None:
    plus = _input(net, bench, "line")
    _bias(net, bench, "line", "minus")
    net.op_amp("amplifier", plus, "minus", "out", bench.at.amplifier.gain_bandwidth_hz)
    net.resistor("common", ("out", "minus"), bench.at.common.ohm)
    _switched(net, bench, "minus", "0")
    _leaks(net, bench, "minus")


def _one_resistor(net: Netlist, bench: Bench) -> None:
    plus = _input(net, bench, "line")
    _bias(net, bench, "line", "base")
    outer_ohm = bench.at.amplifier.of_law.gain_resistance_ohm / 2.0
    base = bench.at.amplifier.of_law.gain_base
    if base == 1.0:
        _three_amplifiers(net, plus, outer_ohm)
    else:
        _two_amplifiers(net, plus, outer_ohm, outer_ohm / (base - 1.0))
    _switched(net, bench, "upper", "lower")
    _leaks(net, bench, "upper")
    _leaks(net, bench, "lower", name="leakb")
    _voltage_output(net, bench, "inner")


def _three_amplifiers(net: Netlist, plus: str, outer_ohm: float) -> None:
    """Add two amplifiers with the gain resistor between their inverting inputs, and a difference of one."""
    net.op_amp("upper", plus, "upper", "first")
    net.op_amp("lower", "base", "lower", "second")
    net.quiet("outer", ("first", "upper"), outer_ohm)
    net.quiet("outerb", ("second", "lower"), outer_ohm)
    net.add("Egain", "inner", "0", "first", "second", 1.0)


def _two_amplifiers(net: Netlist, plus: str, outer_ohm: float, inner_ohm: float) -> None:
    """Add the chain of two amplifiers: 1 + outer/inner without a gain resistor, 2 outer/Rg more with one."""
    net.op_amp("lower", "base", "lower", "first")
    net.op_amp("upper", plus, "upper", "inner")
    net.quiet("outer", ("0", "lower"), outer_ohm)
    net.quiet("inner", ("lower", "first"), inner_ohm)
    net.quiet("innerb", ("first", "upper"), inner_ohm)
    net.quiet("outerb", ("upper", "inner"), outer_ohm)


def _two_resistor(net: Netlist, bench: Bench) -> None:
    """R1 carries the current that holds both inputs at one voltage; a multiple of it flows into R2."""
    plus = _input(net, bench, "base")
    _bias(net, bench, "base", "minus")
    net.resistor("common", ("line", "minus"), bench.at.common.ohm)
    drive = net.loop("amplifier", "minus", plus)
    net.add("Gpass", "minus", "0", drive, "0", 1.0)
    pole_hz = bench.at.amplifier.bandwidth_hz
    current = net.pole("pass", drive, None if bench.buffered else pole_hz)
    load = "load" if bench.buffered else "out"
    net.add("Gmirror", "0", load, current, "0", bench.at.amplifier.of_law.gain_factor)
    _switched(net, bench, load, "zero")
    _leaks(net, bench, load)
    net.add("Ivout", load, "0", 0.0)
    if bench.buffered:
        net.copy("buffer", net.pole("buffer", load, pole_hz), "out")


def _current_output(net: Netlist, bench: Bench) -> None:
    plus = _input(net, bench, "line")
    _bias(net, bench, "line", "base")
    net.add("Ggain", "0", "sense", plus, "base", 1.0)
    net.quiet("sense", ("sense", "0"), 1.0)
    current = net.pole("sense", "sense", bench.at.amplifier.bandwidth_hz)
    net.add("Gmirror", "0", "out", current, "0", bench.at.amplifier.of_law.transconductance_s)
    _switched(net, bench, "out", "zero")
    _leaks(net, bench, "out")


def _difference(net: Netlist, bench: Bench) -> None:
    net.resistor("common", ("line", "upper"), bench.at.common.ohm)
    net.resistor("switched", ("upper", "zero"), bench.at.switched.ohm)
    net.resistor("commonb", ("base", "minus"), bench.at.common.ohm)
    net.resistor("switchedb", ("minus", "out"), bench.at.switched.ohm)
    plus = _input(net, bench, "upper")
    _bias(net, bench, "upper", "minus")
    net.op_amp("amplifier", plus, "minus", "out", bench.at.amplifier.gain_bandwidth_hz)


NETWORKS: dict[str, Callable[[Netlist, Bench], None]] = {
    "fixed": _fixed,
    "non-inverting": _non_inverting,
    "one-resistor": _one_resistor,
    "two-resistor": _two_resistor,
    "current-output": _current_output,
    "difference": _difference,
}


def _input(net: Netlist, bench: Bench, node: str) -> str:
    """Add offset and noise voltage at an input and return the node behind them."""
    net.add("Vos", "offset", node, 0.0)
    return net.voltage_noise("input", "offset", bench.at.amplifier.noise_v_per_rthz)


def _bias(net: Netlist, bench: Bench, plus: str, minus: str) -> None:
    """Add the bias currents of both inputs, at 0, and their noise."""
    for name, node in (("vplus", plus), ("vminus", minus)):
        net.add(f"I{name}", node, "0", 0.0)
        net.current_noise(name, node, bench.at.amplifier.current_noise_a_per_rthz)


def _switched(net: Netlist, bench: Bench, upper: str, lower: str) -> None:
    """Add the switched resistor, with the closed channel as a resistor where there is a switch."""
    if bench.has_switch:
        net.resistor("switched", (upper, "channel"), bench.at.switched.ohm)
        net.resistor("on", ("channel", lower), bench.at.switch.on_ohm)
    else:
        net.resistor("switched", (upper, lower), bench.at.switched.ohm)


def _leaks(net: Netlist, bench: Bench, node: str, name: str = "leak") -> None:
    """Add the leakage of each open channel, at 0."""
    for channel in range(1, bench.open_channels + 1):
        net.add(f"I{name}{channel}", node, "0", 0.0)


def _voltage_output(net: Netlist, bench: Bench, node: str) -> None:
    """Add output noise, the amplifier's pole and the output voltage at no current."""
    noisy = net.voltage_noise("output", node, bench.at.amplifier.output_noise_v_per_rthz)
    slow = net.pole("output", noisy, bench.at.amplifier.bandwidth_hz)
    net.add("Eout", "out", "zero", slow, "0", 1.0)
