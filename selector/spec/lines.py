"""The line of a TOML file on which each key stands, found by walking the signs of its text."""

from __future__ import annotations

import re
from collections.abc import Iterator, Mapping
from dataclasses import dataclass, field

_SIGN = re.compile(
    r"(?P<blank>[ \t\r]+|\#[^\n]*)"
    r'|(?P<text>"""(?:[^\\]|\\.)*?"{3,5}|\'{3}.*?\'{3,5}|"(?:[^"\\\n]|\\.)*"|\'[^\'\n]*\')'
    r"|(?P<mark>[\n\[\]{}=,])"
    r"|(?P<dot>\.)"
    r"|(?P<bare>[^\s\[\]{}=,.\"'\#]+|.)",
    re.DOTALL,
)
_DEEPEST = 6  # steps of a dotted key that are followed; a spec has three
_ELEMENT = re.compile(r"\[[0-9]+\]$")
_LONGEST = 200  # characters of a key that is followed outwards; no key of ours has fifty


@dataclass(slots=True)
class _Bracket:
    """An inline table or an array that is open: the key it is the value of, and its element in an array."""

    name: str
    array: bool
    element: int = 1

    @property
    def inside(self) -> str:
        """Return the name of what stands inside: numbered from 1 in an array."""
        return f"{self.name}[{self.element}]" if self.array else self.name


@dataclass(slots=True)
class _Walk:
    """Where the walk stands."""

    lines: dict[str, int] = field(default_factory=dict)
    tables_of: dict[str, int] = field(default_factory=dict)  # how many tables of each array of tables came so far
    table: str = ""
    parts: list[str] = field(default_factory=list)  # of the key being read
    at_key: bool = True
    header: int = 0  # brackets of a table's heading
    value_of: str = ""  # the key whose value is being read
    brackets: list[_Bracket] = field(default_factory=list)

    def mark(self, sign: str, line: int) -> None:
        """Take one mark of the grammar."""
        match sign:
            case "=" if self.at_key:
                self._key_ends(line)
            case "[" if self.at_key:
                self.header += 1
            case "[" | "{":
                self._opens(sign)
            case "]" if self.header:
                self._heading_ends(line)
            case "]" | "}" if self.brackets:
                self.brackets.pop()
                self.at_key = False
            case "," if self.brackets:
                self._next()
            case "\n" if not self.brackets:
                self.at_key, self.header, self.parts = True, 0, []

    def _key_ends(self, line: int) -> None:
        name = self.brackets[-1].inside if self.brackets else self.table
        for part in self.parts[:_DEEPEST]:
            name = f"{name}.{part}" if name else part
            self.lines.setdefault(name, line)
        self.value_of, self.at_key, self.parts = name, False, []

    def _heading_ends(self, line: int) -> None:
        if not self.parts:
            return  # the second bracket of [[...]]
        self.table = ".".join(self.parts[:_DEEPEST])
        self.lines.setdefault(self.table, line)
        if self.header > 1:
            number = self.tables_of[self.table] = self.tables_of.get(self.table, 0) + 1
            self.table = f"{self.table}[{number}]"
            self.lines.setdefault(self.table, line)
        self.parts = []

    def _opens(self, sign: str) -> None:
        array = sign == "["
        name = self.value_of if len(self.brackets) < _DEEPEST else ""
        if self.brackets and self.brackets[-1].array:
            name = self.brackets[-1].inside
        self.brackets.append(_Bracket(name, array))
        self.at_key, self.parts = not array, []

    def _next(self) -> None:
        bracket = self.brackets[-1]
        if bracket.array:
            bracket.element += 1
        self.at_key = not bracket.array


def key_lines(text: str) -> dict[str, int]:
    """Return the first line of every table and key of a valid TOML text, by dotted key, counted from 1.

    Elements of arrays are numbered from 1: `accuracy.bands[2].up_to`. Keys in quotes stand without them, unless
    they hold a dot.
    """
    walk = _Walk()
    for kind, sign, line in _signs(text):
        if kind == "mark":
            walk.mark(sign, line)
        elif kind != "dot" and walk.at_key:
            walk.parts.append(sign[1:-1] if kind == "text" and "." not in sign else sign)
    return walk.lines


def outwards(key: str) -> Iterator[str]:
    """Yield a dotted key, then what it stands in, from the inside out: `a.b[2].c`, `a.b[2]`, `a.b`, `a`.

    A key may be any text; of a long one only the start is followed.
    """
    if len(key) > _LONGEST:
        yield key
        key = key[:_LONGEST]
    while key:
        yield key
        element = _ELEMENT.search(key)
        key = key[: element.start()] if element else key.rpartition(".")[0]


def line_of(key: str, lines: Mapping[str, int]) -> int | None:
    """Return the line of a key, or of the nearest that it stands in; None where no line is known."""
    return next((lines[name] for name in outwards(key) if name in lines), None)


def _signs(text: str) -> Iterator[tuple[str, str, int]]:
    line = 1
    for found in _SIGN.finditer(text):
        kind, sign = found.lastgroup or "bare", found.group()
        if kind != "blank":
            yield kind, sign, line
        line += sign.count("\n")
