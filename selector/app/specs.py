"""Specs for the commands: read with their overrides, shown, begun anew, described."""

from __future__ import annotations

import json
import tomllib
from collections.abc import Collection, Mapping, Sequence
from dataclasses import dataclass
from pathlib import Path

from selector.app.naming import cut, did_you_mean, file_name, named
from selector.errors import Fault, InputRefused, UsageRefused
from selector.parts import KINDS
from selector.report.answers.spec import SpecShown
from selector.spec import KEYS, Spec, load_spec, schema, spec_of, template
from selector.spec.load import override_value
from selector.spec.values import read_value

RANKED = ("power", "burden", "headroom", "error")
_ASKED_TOO = ("accuracy.reading", "accuracy.floor")
_LATER = "comes with a later version"


@dataclass(frozen=True, slots=True)
class Asked:
    """A spec as a command names it.

    Attributes
    ----------
    path
        A TOML file.
    overrides
        `KEY=VALUE` each; the last one of a key counts.
    weights
        `power=1,error=2`: the weights of `[rank]`; `overrides` count above them.
    variants
        Whether every combination stands in the list, not the best of each shunt and amplifier.
    """

    path: Path
    overrides: Sequence[str] = ()
    weights: str | None = None
    variants: bool = False


def read_spec(asked: Asked) -> Spec:
    """Return a spec that this version can work with.

    Raises
    ------
    UsageRefused
        An override is no `KEY=VALUE`, or its key does not exist.
    InputRefused
        The spec is faulty, or asks for what comes later.
    """
    spec = show(asked).spec
    _refuse_later(spec, file_name(asked.path))
    return spec


def overrides_of(given: Sequence[str]) -> dict[str, str]:
    """Return the overrides by key; UsageRefused with all that cannot be meant."""
    pairs = [(text, *_split(text)) for text in given]
    faults = [
        Fault("--set", f'"{cut(text)}" is no KEY=VALUE', "write it like limits.burden=80mV")
        for text, key, _ in pairs
        if not key
    ]
    faults += [
        Fault("--set", f'unknown key "{cut(key)}"', did_you_mean(key, KEYS, "see: selector spec new -"))
        for _, key, _ in pairs
        if key and key not in KEYS
    ]
    if faults:
        raise UsageRefused(faults)
    return {key: value for _, key, value in pairs}


def weights_of(text: str | None) -> dict[str, str]:
    """Return the overrides of `[rank]` that `power=1,error=2` means."""
    if text is None:
        return {}
    pairs = [_split(each) for each in text.split(",")]
    faults = [
        Fault("--weights", f'"{cut(name or text)}" is no weight', f"write it like power=1,error=2: {', '.join(RANKED)}")
        for name, _ in pairs
        if name not in RANKED
    ]
    if faults:
        raise UsageRefused(faults)
    return {f"rank.{name}": value for name, value in pairs}


def show(asked: Asked) -> SpecShown:
    """Return a spec with every default resolved, whether or not this version can work with it."""
    weighed, given = _beside(asked)
    try:
        return SpecShown(load_spec(named(asked.path), {**weighed, **given}, kinds=KINDS))
    except InputRefused as refused:
        raise InputRefused(_named(fault, weighed.keys() - given.keys()) for fault in refused.faults) from refused


def schema_text() -> str:
    """Return the JSON Schema of a spec."""
    return json.dumps(schema(), indent=2, ensure_ascii=True, allow_nan=False) + "\n"


def new_text(values: Mapping[str, str]) -> str:
    """Return the text of a new spec with the values given, examples for what else is required.

    Raises
    ------
    InputRefused
        A value is not what its key holds, or does not go with another.
    """
    text = template(values)
    tables = tomllib.loads(text)
    raw: dict[str, object] = {}
    for name, entry in tables.items():
        raw |= {f"{name}.{leaf}": value for leaf, value in entry.items()} if isinstance(entry, dict) else {name: entry}
    try:
        spec_of(raw, kinds=KINDS)
    except InputRefused as refused:
        raise InputRefused(
            Fault(f"--set {fault.where}" if fault.where in values else fault.where, fault.what, fault.remedy)
            for fault in refused.faults
        ) from refused
    return text


def to_ask(given: Mapping[str, str]) -> tuple[tuple[str, str, str], ...]:
    """Return key, meaning and example of each entry to ask a person for."""
    asked = [key for key in KEYS.values() if key.required or (key.name in _ASKED_TOO and "accuracy.bands" not in given)]
    return tuple((key.name, key.meaning, key.holds.example) for key in asked if key.name not in given)


def _beside(asked: Asked) -> tuple[dict[str, str], dict[str, str]]:
    """Return weights and overrides by key; UsageRefused with the faults of both."""
    try:
        weighed = weights_of(asked.weights)
    except UsageRefused as refused:
        faults = list(refused.faults)
        try:
            overrides_of(asked.overrides)
        except UsageRefused as more:
            faults += more.faults
        raise UsageRefused(faults) from refused
    return weighed, overrides_of(asked.overrides)


def entry_fault(key: str, text: str) -> str | None:
    """Return what is wrong with one entry by itself, None where nothing is."""
    _, wrong = read_value(override_value(text), KEYS[key], KINDS)
    return f"{wrong[0].what}; {wrong[0].remedy}" if wrong else None


def _split(text: str) -> tuple[str, str]:
    """Return key and value of `KEY=VALUE`; an empty key where there is no `=`."""
    key, mark, value = text.partition("=")
    return (key.strip(), value.strip()) if mark else ("", "")


def _named(fault: Fault, weighed: Collection[str]) -> Fault:
    """Return a fault of a weight as one of `--weights`, if it is one."""
    key = fault.where.removeprefix("--set ")
    if key in weighed and key != fault.where:
        return Fault(f"--weights {key.removeprefix('rank.')}", fault.what, fault.remedy)
    return fault


def _refuse_later(spec: Spec, name: str) -> None:
    """Refuse what a spec may ask for and this version does not do."""
    faults = []
    if spec.accuracy.method == "monte-carlo":
        what = f'accuracy.method = "monte-carlo" {_LATER}'
        faults.append(Fault(name, what, 'write "worst-case" or "rss"'))
    if spec.ranges.by != "gain":
        what = f'ranges.by = "{spec.ranges.by}" {_LATER}'
        faults.append(Fault(name, what, 'write "gain": ranges by switched gain resistors'))
    if faults:
        raise InputRefused(faults)
