"""The entries of a spec, judged: values in SI units, or all that is wrong with them."""

from __future__ import annotations

from collections.abc import Collection, Iterator, Mapping

from selector.spec.keys import KEYS, SECTIONS, Key
from selector.spec.model import Spec
from selector.spec.rules import RULES, Value, Wrong
from selector.spec.values import as_read, read_value, shortened, unknown_key

_SUGGESTIONS = 50  # a file of nothing but unknown keys gets no more than so many


def judge(raw: Mapping[str, object], kinds: Collection[str] = ()) -> tuple[Spec | None, list[Wrong]]:
    """Return the spec that entries by dotted key make, or None and all that is wrong.

    `kinds` are the kinds of parts that `parts.only` may name; empty: any.
    """
    wrong = list(_unknown(raw))
    values: dict[str, Value] = {}
    for name, key in KEYS.items():
        if name in raw:
            value, faults = read_value(raw[name], key, kinds)
            wrong += faults
            if not faults:
                values[name] = value
        elif key.required:
            wrong.append(Wrong(name, "missing", _state(key)))
        else:
            values[name] = key.default
    wrong += (fault for rule in RULES for fault in rule.wrong_in(values))
    return (None, wrong) if wrong else (_spec(values), [])


def flat(tables: Mapping[str, object]) -> tuple[dict[str, object], list[Wrong]]:
    """Return the entries of TOML tables by dotted key, and the sections that are no tables."""
    raw: dict[str, object] = {}
    wrong: list[Wrong] = []
    for name, entry in tables.items():
        if name not in SECTIONS:
            raw[_whole(name)] = entry
        elif isinstance(entry, Mapping):
            raw |= {f"{name}.{_whole(leaf)}": value for leaf, value in entry.items()}
        else:
            wrong.append(Wrong(name, f"{as_read(entry)} is no table", f"write [{name}] and its keys below it"))
    return raw, wrong


def _state(key: Key) -> str:
    return f"{key.leaf} is the {key.meaning}, for example {key.leaf} = {key.holds.written}"


def _whole(name: str) -> str:
    """Return a key as one step of a dotted key: in quotes where it has a dot of its own."""
    return f'"{name}"' if "." in name else name


def _unknown(raw: Mapping[str, object]) -> Iterator[Wrong]:
    names = [name for name in raw if name not in KEYS]
    for name in names[:_SUGGESTIONS]:
        yield unknown_key(name, KEYS if "." in name else (*KEYS, *SECTIONS))
    for name in names[_SUGGESTIONS:]:
        yield Wrong(name, f"unknown key {shortened(name)}", named=False)


def _spec(values: Mapping[str, Value]) -> Spec:
    tables: dict[str, object] = {name: {} for name in SECTIONS}
    for name, value in values.items():
        section, _, leaf = name.rpartition(".")
        table = tables[section] if section else tables
        if isinstance(table, dict):
            table[leaf] = value
    return Spec.model_validate(tables)
