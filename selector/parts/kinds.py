"""The kinds of parts, by name, in the order in which they are listed."""

from selector.parts.amplifier import Amplifier
from selector.parts.base import Part
from selector.parts.bypass import Bypass
from selector.parts.capacitor import Capacitor
from selector.parts.resistor import Resistor
from selector.parts.shunt import Shunt
from selector.parts.switch import Switch

KINDS: dict[str, type[Part]] = {kind.kind: kind for kind in (Shunt, Resistor, Capacitor, Amplifier, Bypass, Switch)}
