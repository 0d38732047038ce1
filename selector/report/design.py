"""A design as the TOML file that `check` reads."""

from __future__ import annotations

import json
import re
from typing import TYPE_CHECKING

from selector.report.clean import json_escaped

if TYPE_CHECKING:  # only annotations: a command without designs goes without their arrays
    from selector.candidate import Design
    from selector.parts import Part

_NAMELESS = re.compile(r"in-line( [0-9]+)?")  # what a part is called that was given without a code


def design_toml(design: Design, in_line: frozenset[tuple[str, str]] = frozenset()) -> str:
    """Return a design as TOML with the keys of interface.md, section 5.

    A part stands as its code, or as a table of all the fields it states where its (kind, code) is in `in_line` or it
    has no code of its own. Whatever is not there (a switch, a common resistor) has no key.
    """

    def value(part: Part) -> str:
        if not _NAMELESS.fullmatch(part.part) and (part.kind, part.part) not in in_line:
            return _text(part.part)
        from selector.parts import cells_of  # noqa: PLC0415 - parts are heavy to import

        return "{ " + ", ".join(f"{name} = {_text(cell)}" for name, cell in cells_of(part).items()) + " }"

    def listed(parts: tuple[Part, ...]) -> str:
        return "[" + ", ".join(value(part) for part in parts) + "]"

    lines = [f"shunts = {listed(design.shunts)}", f"amplifier = {value(design.amplifier)}"]
    single: tuple[tuple[str, Part | None], ...] = (("switch", design.switch), ("common", design.common))
    lines += [f"{key} = {value(part)}" for key, part in single if part is not None]
    if design.gain is not None:
        lines.append(f"gain = {listed(design.gain)}")
    after = (("filter_resistor", design.filter_resistor), ("filter_capacitor", design.filter_capacitor))
    lines += [f"{key} = {value(part)}" for key, part in after if part is not None]
    return "\n".join(lines) + "\n"


def _text(text: str) -> str:
    r"""Return a TOML basic string; JSON's escapes are TOML's, and what cannot be seen is written as `\u001b`.

    Source: TOML 1.0.0, string.
    """
    return json_escaped(json.dumps(text, ensure_ascii=False))
