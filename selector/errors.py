"""Faults that a person can mend, and the exit status each sort of them ends the program with."""

from __future__ import annotations

from collections.abc import Iterable
from dataclasses import dataclass
from typing import ClassVar

EXIT_DONE = 0
EXIT_DOES_NOT_MEET = 1
EXIT_USAGE = 2
EXIT_INPUT_REFUSED = 3
EXIT_UNUSABLE = 4
EXIT_INTERRUPTED = 130


@dataclass(frozen=True, slots=True)
class Fault:
    """One thing that is wrong: where it stands, what was read, and what would be right.

    `remedy` may be empty where `what` says it all.
    """

    where: str
    what: str
    remedy: str = ""

    def __str__(self) -> str:
        """Return `where: what; remedy`, leaving out what is empty."""
        text = f"{self.what}; {self.remedy}" if self.remedy else self.what
        return f"{self.where}: {text}" if self.where else text


class SelectorError(Exception):
    """A run that cannot give its answer, with all faults found."""

    exit_status: ClassVar[int] = EXIT_INPUT_REFUSED

    def __init__(self, faults: Iterable[Fault] | Fault) -> None:
        """Keep the faults in the order in which they were found."""
        self.faults: tuple[Fault, ...] = (faults,) if isinstance(faults, Fault) else tuple(faults)
        super().__init__("\n".join(str(fault) for fault in self.faults))


class UsageRefused(SelectorError):
    """A command line that cannot be meant: an option's value, a rank past the list."""

    exit_status = EXIT_USAGE


class InputRefused(SelectorError):
    """A spec, a design, a stock file or a part that cannot be taken."""

    exit_status = EXIT_INPUT_REFUSED


class Unusable(SelectorError):
    """A catalogue that cannot be used, or an output that cannot be written."""

    exit_status = EXIT_UNUSABLE
