"""Specs from files and from entries, with all faults at once in the order of their lines."""

from __future__ import annotations

import sys
import tomllib
from collections.abc import Collection, Iterator, Mapping
from pathlib import Path

from selector.errors import Fault, InputRefused
from selector.spec.judge import flat, judge
from selector.spec.lines import key_lines, line_of, outwards
from selector.spec.model import Spec
from selector.spec.rules import Wrong
from selector.spec.toml_text import Sort, read_toml

_SPEC = Sort(
    noun="spec",
    size="a spec has some hundred lines at most",
    keys="a key has two, as in limits.burden",
    depth="a spec needs no more than three",
    entry='burden = "100 mV"',
)


def load_spec(path: Path, overrides: Mapping[str, str] | None = None, *, kinds: Collection[str] = ()) -> Spec:
    """Return the spec of a TOML file.

    Parameters
    ----------
    path
        A file of at most 1 MB.
    overrides
        Dotted key to text, as `--set` gives them: a TOML value where the text reads as one, else a string.
    kinds
        The kinds of parts that `parts.only` may name; empty: any.

    Raises
    ------
    InputRefused
        With every fault of the file in line order, then those of the overrides.
    """
    read = read_toml(path, path.name, _SPEC)
    raw, wrong = flat(read.tables)
    given = {name: override_value(value) for name, value in (overrides or {}).items()}
    spec, more = judge({**raw, **given}, kinds)
    no_tables = {each.key for each in wrong}
    wrong += (each for each in more if each.key.partition(".")[0] not in no_tables)
    if wrong or spec is None:
        raise InputRefused(_in_order(wrong, path.name, key_lines(read.text), given))
    return spec


def spec_of(entries: Mapping[str, object], *, kinds: Collection[str] = ()) -> Spec:
    """Return the spec of entries by dotted key: numbers in SI units, texts with units.

    Raises
    ------
    InputRefused
        With every fault; its `where` is the key.
    """
    spec, wrong = judge(entries, kinds)
    if spec is None:
        raise InputRefused(Fault(each.key, each.what, each.remedy) for each in wrong)
    return spec


def override_value(text: str) -> object:
    """Return the TOML value that a text is, else the text itself."""
    try:
        tables = tomllib.loads(f"value = {text}")
    except (ValueError, RecursionError):
        return text
    return tables["value"] if len(tables) == 1 else text


def _in_order(wrong: list[Wrong], file: str, lines: Mapping[str, int], given: Collection[str]) -> Iterator[Fault]:
    """Yield the faults in the order of their lines, those without a line after them, those of --set last."""
    placed = [(_override(each.key, given), line_of(each.key, lines), each) for each in wrong]
    for override, line, each in sorted(placed, key=lambda place: (place[0] is not None, place[1] or sys.maxsize)):
        where = f"--set {override}" if override else f"{file} line {line}" if line else file
        if each.named and each.key != override:
            where = f"{where}, {each.key}"
        yield Fault(where, each.what, each.remedy)


def _override(key: str, given: Collection[str]) -> str | None:
    """Return the override that gave a key, or the table or list around it."""
    return next((name for name in outwards(key) if name in given), None)
