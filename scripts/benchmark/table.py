"""The one layout of all that is printed: a goal beside what was reached."""

from __future__ import annotations

from dataclasses import dataclass

ANSWERS = {True: "yes", False: "NO", None: ""}


@dataclass(frozen=True, slots=True)
class Row:
    """One line of the table: what was measured, what came of it, what was wanted, and whether it is so.

    `met` is None where nothing was wanted.
    """

    goal: str
    name: str
    reached: str
    wanted: str = ""
    met: bool | None = None


def line(row: Row) -> str:
    """Return what is printed of one row."""
    return _line(row.goal, row.name, row.reached, row.wanted, ANSWERS[row.met])


def heading(name: str) -> str:
    """Return what is printed above rows of one sort."""
    return _line("goal", name, "reached", "wanted", "")


def _line(goal: str, name: str, reached: str, wanted: str, answer: str) -> str:
    return f"{goal:>4}  {name:<42}  {reached:<64}  {wanted:<11}  {answer}".rstrip()
