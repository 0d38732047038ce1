"""The text of a new spec: every key with its meaning, the optional ones commented out."""

from __future__ import annotations

from collections.abc import Mapping

from selector.errors import Fault, InputRefused
from selector.spec.keys import KEYS, SECTIONS, Key
from selector.spec.load import override_value
from selector.spec.rules import Value
from selector.spec.values import unknown_key
from selector.units import exact

_SHOWN_UNASKED = ("title", "accuracy.reading", "accuracy.floor")
_INSTEAD_OF_BANDS = ("accuracy.reading", "accuracy.floor")
_HIGH_SIDE = ("sense.bus_min", "sense.bus_nominal", "sense.bus_max")
_WIDTH = 34
_HEAD = """\
# What is to be measured. A text has its unit ("60 uA", "2 %"); a bare number is
# in SI units (degC for temperatures, LSB for inl, a fraction for what is relative).
# Keys behind a # are optional: their defaults, or an example where there is none.
"""


def template(values: Mapping[str, str] | None = None) -> str:
    """Return the TOML text of a new spec.

    Required keys have the value given for them, else an example: an orchard's frost alarm that wakes from
    microamperes. The text of a value is taken as TOML where it reads as such, else as a string.

    Raises
    ------
    InputRefused
        A value is for a key that there is not; its `where` is `--set` and the key.
    """
    given = dict(values or {})
    unknown = [unknown_key(name, KEYS) for name in given if name not in KEYS]
    if unknown:
        raise InputRefused(Fault(f"--set {each.key}", each.what, each.remedy) for each in unknown)
    lines = [_HEAD, *(_line(key, given) for key in KEYS.values() if not key.section)]
    for section in SECTIONS:
        lines += ["", f"[{section}]", *(_line(key, given) for key in KEYS.values() if key.section == section)]
    return "\n".join(lines) + "\n"


def _line(key: Key, given: Mapping[str, str]) -> str:
    if key.name in given:
        return _commented(f"{key.leaf} = {_toml(given[key.name])}", key)
    if key.required or key.name in _filled(given):
        return _commented(f"{key.leaf} = {key.holds.written}", key)
    return _commented(f"# {key.leaf} = {_default(key)}", key)


def _filled(given: Mapping[str, str]) -> tuple[str, ...]:
    """Return the optional keys that are filled with their examples unless given."""
    shown: tuple[str, ...] = _SHOWN_UNASKED
    if any(name in given for name in ("accuracy.bands", *_INSTEAD_OF_BANDS)):
        shown = tuple(name for name in shown if name not in _INSTEAD_OF_BANDS)
    high_side = "sense.side" in given and override_value(given["sense.side"]) == "high"
    return (*shown, *_HIGH_SIDE) if high_side else shown


def _commented(entry: str, key: Key) -> str:
    choices = f": {', '.join(key.holds.choices)}" if key.holds.choices else ""
    no_default = " (no default)" if entry.startswith("#") and key.default in (None, ()) else ""
    meaning = f"# {key.meaning}{choices}{no_default}"
    return f"{entry:<{_WIDTH}}  {meaning}" if len(entry) <= _WIDTH else f"{meaning}\n{entry}"


def _default(key: Key) -> str:
    """Return the default as TOML, the example where there is none."""
    default: Value = key.default
    if isinstance(default, bool):
        return "true" if default else "false"
    if isinstance(default, int | float) and key.holds.quantity:
        text = exact(float(default), key.holds.quantity)
        return text if key.holds.written == key.holds.example else f'"{text}"'
    return f'"{default}"' if isinstance(default, str) else key.holds.written


def _toml(text: str) -> str:
    """Return a text as a TOML value: as it stands where it is one, else as a string."""
    value = override_value(text)
    return _string(value) if isinstance(value, str) else text.strip()


def _string(text: str) -> str:
    """Return a TOML basic string, with escapes for quotes, backslashes and control characters."""
    escaped = text.replace("\\", "\\\\").replace('"', '\\"')
    plain = "".join(f"\\u{ord(sign):04X}" if sign < " " or sign == "\x7f" else sign for sign in escaped)
    return f'"{plain}"'
