"""Specs from files and from entries, with all faults at once in the order of their lines."""

from __future__ import annotations

import re
import sys
import tomllib
from collections.abc import Collection, Iterator, Mapping
from pathlib import Path

from selector.errors import Fault, InputRefused
from selector.spec.judge import flat, judge
from selector.spec.lines import key_lines, outwards
from selector.spec.model import Spec
from selector.spec.rules import Wrong

LARGEST_FILE = 1_000_000  # bytes
# A key of so many steps says nothing, and a parser takes time by the square of them.
_ENDLESS_KEY = re.compile(r"""(?<![\w"'\\-])(?:(?:"(?:[^"\\\n]|\\.)*"|'[^'\n]*'|[\w-]+)[ \t]*\.[ \t]*){30}""")
_PLACE = re.compile(r" \(at (?:line (\d+), column \d+|end of document)\)$")


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
    text = _text(path)
    raw, wrong = flat(_parsed(text, path.name))
    given = {name: override_value(value) for name, value in (overrides or {}).items()}
    spec, more = judge({**raw, **given}, kinds)
    no_tables = {each.key for each in wrong}
    wrong += (each for each in more if each.key.partition(".")[0] not in no_tables)
    if wrong or spec is None:
        raise InputRefused(_in_order(wrong, path.name, key_lines(text), given))
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


def _text(path: Path) -> str:
    """Return the text of a file, which must be UTF-8 and of a bearable size."""
    try:
        with path.open("rb") as file:
            content = file.read(LARGEST_FILE + 1)
    except OSError as error:
        raise InputRefused(Fault(path.name, f"cannot be read: {error.strerror}", "give the file of a spec")) from error
    if len(content) > LARGEST_FILE:
        raise InputRefused(Fault(path.name, "is larger than 1 MB", "a spec has some hundred lines at most"))
    try:
        return content.decode("utf-8-sig")
    except UnicodeDecodeError as error:
        line = content.count(b"\n", 0, error.start) + 1
        raise InputRefused(Fault(f"{path.name} line {line}", "is no UTF-8 text", "save the file as UTF-8")) from error


def _parsed(text: str, name: str) -> dict[str, object]:
    """Return the tables of a TOML text; a syntax fault stands alone, since nothing after it can be read."""
    endless = _ENDLESS_KEY.search(text)
    if endless is not None:
        line = text.count("\n", 0, endless.start()) + 1
        raise InputRefused(
            Fault(f"{name} line {line}", "a key of 30 steps or more", "a key has two, as in limits.burden")
        )
    try:
        return tomllib.loads(text)
    except RecursionError as error:
        raise InputRefused(Fault(name, "has brackets nested too deep", "a spec needs no more than three")) from error
    except ValueError as error:
        message = str(error)
        place = _PLACE.search(message)
        line = int(place[1]) if place and place[1] else text.count("\n") + 1
        what = f"no valid TOML: {message[: place.start()] if place else 'a number of too many digits'}"
        remedy = 'write it like burden = "100 mV", texts in quotes'
        raise InputRefused(Fault(f"{name} line {line}", what, remedy)) from error


def _in_order(wrong: list[Wrong], file: str, lines: Mapping[str, int], given: Collection[str]) -> Iterator[Fault]:
    """Yield the faults in the order of their lines, those without a line after them, those of --set last."""
    placed = [(_override(each.key, given), _line(each.key, lines), each) for each in wrong]
    for override, line, each in sorted(placed, key=lambda place: (place[0] is not None, place[1] or sys.maxsize)):
        where = f"--set {override}" if override else f"{file} line {line}" if line else file
        if each.named and each.key != override:
            where = f"{where}, {each.key}"
        yield Fault(where, each.what, each.remedy)


def _override(key: str, given: Collection[str]) -> str | None:
    """Return the override that gave a key, or the table or list around it."""
    return next((name for name in outwards(key) if name in given), None)


def _line(key: str, lines: Mapping[str, int]) -> int | None:
    """Return the line of a key, or of the nearest table around it."""
    return next((lines[name] for name in outwards(key) if name in lines), None)
