"""Rules over several fields of one part; each takes the values read so far and yields what is wrong.

A field that could not be read is missing from the values, and a rule passes over it: its own fault is enough.
"""

from __future__ import annotations

from collections.abc import Callable, Collection, Iterator, Mapping
from dataclasses import dataclass
from difflib import get_close_matches

from selector.parts.holds import Value


@dataclass(frozen=True, slots=True)
class Wrong:
    """A fault of one field in the light of the others."""

    field: str
    what: str
    remedy: str = ""


Rule = Callable[[Mapping[str, Value]], Iterator[Wrong]]


def not_below(high: str, low: str, *, equal: bool = True) -> Rule:
    """Return the rule that `high` lies at or above `low`, or truly above it where `equal` is false."""
    wanted = "at least" if equal else "above"

    def rule(values: Mapping[str, Value]) -> Iterator[Wrong]:
        upper, lower = values.get(high), values.get(low)
        if not isinstance(upper, int | float) or not isinstance(lower, int | float):
            return
        if upper < lower or (upper == lower and not equal):
            yield Wrong(high, f"{upper:g} with {low} = {lower:g}", f"{high} must be {wanted} {low}")

    return rule


def known_fields(fields: Collection[str]) -> Rule:
    """Return the rule that `typical` and `assumed` name fields of the kind."""

    def rule(values: Mapping[str, Value]) -> Iterator[Wrong]:
        for field in ("typical", "assumed"):
            names = values.get(field)
            for name in names if isinstance(names, tuple) else ():
                if name not in fields:
                    yield Wrong(field, f'"{name}" is no field', nearest(name, fields) or "name fields, such as part")

    return rule


def nearest(name: str, names: Collection[str]) -> str:
    """Return 'did you mean "x"?' for the name most like the one that was read, or an empty string."""
    found = get_close_matches(name, names, n=1, cutoff=0.6)
    return f'did you mean "{found[0]}"?' if found else ""
