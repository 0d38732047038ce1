"""Kinds of parts as a person names them."""

from __future__ import annotations

from collections.abc import Iterable

from selector.app.naming import cut, did_you_mean
from selector.errors import Fault, UsageRefused
from selector.parts import KINDS


def kind_named(name: str, among: Iterable[str] = ()) -> str:
    """Return the name of a kind as it is written here; UsageRefused where there is none of that name.

    `among` narrows the kinds to choose from.
    """
    kinds = tuple(among) or tuple(KINDS)
    clean = name.strip().casefold()
    if clean in kinds:
        return clean
    what = f'"{cut(name)}" is no kind of part' if clean not in KINDS else f"{a_part_of(clean)} cannot be meant here"
    raise UsageRefused(Fault("", what, did_you_mean(clean, kinds, f"kinds: {', '.join(kinds)}")))


def a_part_of(kind: str) -> str:
    """Return a kind with its article: `a shunt`, `an amplifier`."""
    return f"an {kind}" if kind[0] in "aeiou" else f"a {kind}"
