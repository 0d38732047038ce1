"""Answers as JSON, for programs."""

from __future__ import annotations

import json
import math

from selector.report.clean import json_escaped
from selector.report.format import Format
from selector.report.told import Json, Told


def _write(told: Told) -> str:
    """Return the data with two spaces per level, keys in the order of interface.md, full doubles."""
    plain = _finite(dict(told.data()))
    return json_escaped_lines(json.dumps(plain, allow_nan=False, ensure_ascii=False, indent=2))


def json_escaped_lines(text: str) -> str:
    """Return JSON text with a final line feed; its own line feeds stand between tokens and stay."""
    return "".join(json_escaped(line) + "\n" for line in text.split("\n"))


def _finite(value: Json) -> Json:
    """Return data in which a figure that is not finite, which JSON cannot say, is null."""
    if isinstance(value, dict):
        return {key: _finite(each) for key, each in value.items()}
    if isinstance(value, list):
        return [_finite(each) for each in value]
    return None if isinstance(value, float) and not math.isfinite(value) else value


FORMAT = Format("json", (".json",), _write)
