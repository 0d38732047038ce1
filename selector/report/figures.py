"""The figures by which parts are chosen."""

from __future__ import annotations

from collections.abc import Mapping

from selector.parts import Part, columns
from selector.units import Quantity, shown

_MAIN: Mapping[str, tuple[str, ...]] = {
    "shunt": ("resistance", "tolerance", "power"),
    "resistor": ("resistance", "tolerance"),
    "capacitor": ("capacitance", "tolerance", "dielectric"),
    "amplifier": ("gain_law", "offset"),
    "bypass": ("on_resistance", "current", "leakage"),
    "switch": ("on_resistance", "leakage"),
}


def main_figures(part: Part) -> str:
    """Return the figures by which a part is chosen: `820 mohm, 0.5 %, 500 mW`."""
    fields = {column.name: column.quantity for column in columns(part.kind)}
    stated = ((fields[name], getattr(part, name)) for name in _MAIN[part.kind])
    texts = (_text(value, quantity) for quantity, value in stated if value not in (None, ""))
    return ", ".join(texts)


def _text(value: object, quantity: Quantity | None) -> str:
    return shown(float(value), quantity) if quantity and isinstance(value, int | float) else str(value)
