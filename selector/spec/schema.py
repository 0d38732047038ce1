"""JSON Schema of a spec, with which editors complete and check it."""

from __future__ import annotations

from collections.abc import Callable, Iterable

from selector.spec.holds import Holds, Sort
from selector.spec.keys import BAND_KEYS, KEYS, SECTIONS, Key

Json = dict[str, object]

DIALECT = "https://json-schema.org/draft/2020-12/schema"


def schema() -> Json:
    """Return the JSON Schema (2020-12) of a spec: what each key takes, its unit, an example, its default.

    Rules over several keys that a schema can say are in it; all others are judged when a spec is read.
    """
    tables = {
        section: {
            **_table(key for key in KEYS.values() if key.section == section),
            **_OVER_SEVERAL_KEYS.get(section, {}),
        }
        for section in SECTIONS
    }
    above = {key.leaf: _property(key) for key in KEYS.values() if not key.section}
    required = {"accuracy", *(key.section for key in KEYS.values() if key.required)}
    return {
        "$schema": DIALECT,
        "title": "selector measurement spec",
        "type": "object",
        "properties": {**above, **tables},
        "required": [section for section in SECTIONS if section in required],
        "additionalProperties": False,
    }


def _table(keys: Iterable[Key]) -> Json:
    listed = list(keys)
    return {
        "type": "object",
        "properties": {key.leaf: _property(key) for key in listed},
        "required": [key.leaf for key in listed if key.required],
        "additionalProperties": False,
    }


def _property(key: Key) -> Json:
    described: Json = {"description": _description(key), **_TYPES[key.holds.sort](key.holds)}
    if isinstance(key.default, bool | str | int | float) and key.default != "":
        described["default"] = key.default
    return described


def _description(key: Key) -> str:
    quantity = key.holds.quantity
    unit = f"; a bare number is in {quantity.unit}" if quantity and quantity.unit not in ("", "1") else ""
    share = "; a bare number is a fraction" if quantity and quantity.unit == "1" else ""
    return f"{key.meaning}{unit}{share}; for example {key.holds.written}"


def _figure(holds: Holds) -> Json:
    bounds = {
        "minimum": holds.least,
        "exclusiveMinimum": holds.above,
        "exclusiveMaximum": holds.below,
        "maximum": holds.most,
    }
    number = "integer" if holds.quantity and holds.quantity.whole else "number"
    stated: Json = {name: bound for name, bound in bounds.items() if bound is not None}
    return {"type": ["string", number], **stated, "examples": [holds.example]}


def _words(holds: Holds) -> Json:
    return {"type": "string", "enum": list(holds.choices)}


def _flag(_holds: Holds) -> Json:
    return {"type": "boolean"}


def _text(_holds: Holds) -> Json:
    return {"type": "string"}


def _codes(_holds: Holds) -> Json:
    return {"type": "array", "items": {"type": "string", "minLength": 1}}


def _codes_by_kind(holds: Holds) -> Json:
    return {"type": "object", "additionalProperties": _codes(holds)}


def _bands(_holds: Holds) -> Json:
    return {"type": "array", "minItems": 1, "items": _table(BAND_KEYS.values())}


_TYPES: dict[Sort, Callable[[Holds], Json]] = {
    "quantity": _figure,
    "choice": _words,
    "flag": _flag,
    "text": _text,
    "codes": _codes,
    "codes by kind": _codes_by_kind,
    "bands": _bands,
}
_OVER_SEVERAL_KEYS: dict[str, Json] = {
    "current": {"dependentRequired": {"overload": ["overload_time"], "overload_time": ["overload"]}},
    "accuracy": {
        "oneOf": [{"required": ["bands"]}, {"anyOf": [{"required": ["reading"]}, {"required": ["floor"]}]}],
    },
    "sense": {
        "if": {"properties": {"side": {"const": "high"}}, "required": ["side"]},
        "then": {"required": ["bus_min", "bus_nominal", "bus_max"]},
    },
}
