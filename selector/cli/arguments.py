"""Global options, which may stand before or behind the command."""

from __future__ import annotations

from collections.abc import Sequence

from selector.errors import Fault, UsageRefused

CATALOGUE, VERSION = "--catalogue", "--version"


def hoisted(arguments: Sequence[str]) -> list[str]:
    """Return the arguments with the global options in front; what stands behind `--` stays as it is.

    Raises
    ------
    UsageRefused
        `--catalogue` stands last, without its path.
    """
    front: list[str] = []
    rest: list[str] = []
    waiting = iter(arguments)
    for argument in waiting:
        if argument == "--":
            rest += (argument, *waiting)
        elif argument == VERSION or argument.startswith(f"{CATALOGUE}="):
            front.append(argument)
        elif argument == CATALOGUE:
            path = next(waiting, None)
            if path is None:
                raise UsageRefused(Fault(CATALOGUE, "no path stands behind it", f"write {CATALOGUE} PATH"))
            front += (argument, path)
        else:
            rest.append(argument)
    return front + rest


def command_of(arguments: Sequence[str]) -> str:
    """Return the command: the first word behind the global options; empty where that is another option."""
    words = iter(hoisted(arguments))
    for word in words:
        if word == CATALOGUE:
            next(words)
        elif not word.startswith(f"{CATALOGUE}="):
            return "" if word.startswith("-") else word
    return ""
