"""An answer told in every way at once, each made only where it is asked for."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from dataclasses import dataclass
from typing import TYPE_CHECKING

if TYPE_CHECKING:  # JSON needs no document
    from selector.report.document import Document

Json = None | bool | int | float | str | list["Json"] | dict[str, "Json"]
Cell = None | bool | int | float | str


@dataclass(frozen=True, slots=True)
class Records:
    """The main records of an answer: headings, with units, and rows in SI units."""

    headings: tuple[str, ...]
    rows: tuple[tuple[Cell, ...], ...]


@dataclass(frozen=True, slots=True)
class Told:
    """The JSON of an answer, its document, and its records; records that are text are printed as they are."""

    data: Callable[[], Mapping[str, Json]]
    document: Callable[[], Document]
    records: Callable[[], Records | str]
