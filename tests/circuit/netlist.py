"""Elements of a deck: resistors with and without noise, ideal amplifiers, poles and sources.

Names of elements: Rshunt, Rcommon, Rswitched, Ron (Rcommonb, Rswitchedb: the second ones of a difference amplifier);
Iload, Ivplus, Ivminus, Ivout (bias currents), Ileak1 … (open channels), Vos (offset), Vbus, Vzero.
Names of nodes: line and base (ends of the shunt), out (amplifier), pin (converter), zero (output at no current).
"""

from __future__ import annotations

from dataclasses import dataclass, field
from enum import Flag, auto
from math import pi, sqrt

BOLTZMANN_J_PER_K = 1.380649e-23  # the SI Brochure, 9th edition
NOISE_OHM = 1000.0


class Noisy(Flag):
    """What makes noise in a deck; all else is drawn without resistors."""

    NONE = 0
    NETWORK = auto()
    SHUNT = auto()
    VOLTAGE = auto()
    CURRENT = auto()
    ALL = NETWORK | SHUNT | VOLTAGE | CURRENT


@dataclass(slots=True)
class Netlist:
    """Lines of a deck; `poles` puts the amplifier's pole in, `hottest_k` is the temperature noise is stated for."""

    noisy: Noisy
    poles: bool
    hottest_k: float
    lines: list[str] = field(default_factory=list)

    def add(self, name: str, *rest: str | float) -> None:
        """Add an element; numbers are written with plain exponents and all their digits."""
        self.lines.append(" ".join([name, *(repr(each) if isinstance(each, float) else each for each in rest)]))

    def resistor(self, name: str, nodes: tuple[str, str], ohm: float, group: Noisy = Noisy.NETWORK) -> None:
        """Add a resistor; one that is to make no noise is a current source controlled by its own voltage."""
        if group in self.noisy:
            self.add(f"R{name}", *nodes, ohm)
        else:
            self.quiet(name, nodes, ohm)

    def quiet(self, name: str, nodes: tuple[str, str], ohm: float) -> None:
        """Add a resistance without thermal noise."""
        self.add(f"G{name}", *nodes, *nodes, 1.0 / ohm)

    def loop(self, name: str, plus: str, minus: str, gain_bandwidth_hz: float | None = None) -> str:
        """Add what drives an ideal amplifier and return its node, whose voltage is the output that is asked for.

        With infinite gain and no pole, the current law at the node holds both inputs at one voltage (a nullor). The
        element `Gloss…`, at 0 here, gives 1/A0 of an amplifier with a finite open-loop gain A0.
        """
        node = f"drive{name}"
        self.add(f"Gdrive{name}", "0", node, plus, minus, 1.0)
        self.add(f"Gloss{name}", node, "0", node, "0", 0.0)
        if gain_bandwidth_hz is not None and self.poles:
            self.add(f"Cdrive{name}", node, "0", 1.0 / (2.0 * pi * gain_bandwidth_hz))
        return node

    def op_amp(self, name: str, plus: str, minus: str, out: str, gain_bandwidth_hz: float | None = None) -> None:
        """Add an operational amplifier with a voltage output."""
        self.copy(name, self.loop(name, plus, minus, gain_bandwidth_hz), out)

    def copy(self, name: str, node: str, out: str) -> None:
        """Add a source that holds a node at the voltage of another."""
        self.add(f"E{name}", out, "0", node, "0", 1.0)

    def pole(self, name: str, node: str, pole_hz: float | None) -> str:
        """Add a first-order pole without noise and return its node, or the node itself where there is none."""
        if pole_hz is None or not self.poles:
            return node
        slow = f"slow{name}"
        self.add(f"Gpole{name}", "0", slow, node, "0", 1.0)
        self.quiet(f"hold{name}", (slow, "0"), 1.0)
        self.add(f"Cpole{name}", slow, "0", 1.0 / (2.0 * pi * pole_hz))
        return slow

    def voltage_noise(self, name: str, node: str, density: float) -> str:
        """Add a noise voltage, V/sqrt(Hz), in series and return the node behind it."""
        if Noisy.VOLTAGE not in self.noisy or density == 0.0:
            return node
        behind = f"noisy{name}"
        self._noise(name)
        self.add(f"Enoise{name}", behind, node, f"hiss{name}", "0", density / self._noise_density())
        return behind

    def current_noise(self, name: str, node: str, density: float) -> None:
        """Add a noise current, A/sqrt(Hz), from a node to ground."""
        if Noisy.CURRENT in self.noisy and density > 0.0:
            self._noise(name)
            self.add(f"Gnoise{name}", node, "0", f"hiss{name}", "0", density / self._noise_density())

    def _noise(self, name: str) -> None:
        self.add(f"Rhiss{name}", f"hiss{name}", "0", NOISE_OHM)

    def _noise_density(self) -> float:
        return sqrt(4.0 * BOLTZMANN_J_PER_K * self.hottest_k * NOISE_OHM)
