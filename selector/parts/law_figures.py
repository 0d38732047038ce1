"""Which figures an amplifier must state for its gain law, and which it must not."""

from __future__ import annotations

from collections.abc import Iterator, Mapping

from selector.gain import LAWS
from selector.parts.holds import Value
from selector.parts.rules import Wrong

_DEFAULTS: dict[str, Value] = {"gain_base": 1.0}
_ALL_FIGURES = tuple(dict.fromkeys(figure for law in LAWS.values() for figure in law.figures))


def figures_of_the_law(values: Mapping[str, Value]) -> Iterator[Wrong]:
    """Yield the law's figures that are not stated, and stated ones that belong to another law."""
    name = values.get("gain_law")
    law = LAWS.get(name) if isinstance(name, str) else None
    if law is None:
        return
    for figure in _ALL_FIGURES:
        stated = values.get(figure, _UNREAD)
        if figure in law.figures and stated is None:
            yield Wrong(figure, "missing", f"a {law.name} amplifier needs {figure}")
        if figure not in law.figures and stated not in (None, _UNREAD, _DEFAULTS.get(figure)):
            wanted = ", ".join(law.figures) or "none"
            yield Wrong(figure, f"stated on a {law.name} amplifier", f"leave it out; the figures of this law: {wanted}")


def buffered_gain_capacitor(values: Mapping[str, Value]) -> Iterator[Wrong]:
    """Yield a gain capacitor that the law does not take, or that stands on an output without a buffer."""
    name = values.get("gain_law")
    law = LAWS.get(name) if isinstance(name, str) else None
    if law is None or not values.get("gain_capacitor"):
        return
    if not law.takes_gain_capacitor:
        takers = ", ".join(each.name for each in LAWS.values() if each.takes_gain_capacitor)
        yield Wrong("gain_capacitor", f"yes on a {law.name} amplifier", f"only {takers} takes one")
    elif values.get("buffered") is False:
        yield Wrong("gain_capacitor", "yes without buffered", "only a buffered part takes one; set buffered = yes")


_UNREAD = "unread"
