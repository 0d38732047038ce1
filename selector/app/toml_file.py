"""The TOML file of a design, with the line of each key."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass
from pathlib import Path

from selector.app.naming import file_name
from selector.spec.lines import key_lines, line_of
from selector.spec.toml_text import Sort, read_toml

_DESIGN = Sort(
    noun="design",
    size="a design has some dozen lines",
    keys="a key has one or two",
    depth="no more than two are needed",
    entry='amplifier = "AMP-Z1"',
)


@dataclass(frozen=True, slots=True)
class TomlFile:
    """The tables of a file, and the first line of each key; elements of lists count from 1: `gain[2].power`."""

    name: str
    tables: Mapping[str, object]
    lines: Mapping[str, int]

    def place(self, key: str) -> str:
        """Return `design.toml line 4, gain[2]`: with the line of the nearest key around it that has one."""
        line = line_of(key, self.lines)
        where = self.name if line is None else f"{self.name} line {line}"
        return f"{where}, {key}" if key else where


def read_design_file(path: Path) -> TomlFile:
    """Return the tables of a design's file.

    Raises
    ------
    InputRefused
        It cannot be read, is larger than 1 MB, no UTF-8 text or no TOML; a syntax fault is reported alone.
    """
    name = file_name(path)
    read = read_toml(path, name, _DESIGN)
    return TomlFile(name, read.tables, key_lines(read.text))
