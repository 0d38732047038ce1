"""Faults on the standard error: one a line, and how many there were."""

from __future__ import annotations

from collections.abc import Iterable, Sequence
from itertools import islice

from selector.cli.streams import say
from selector.errors import SelectorError

MOST = 20
_OUTCOMES = {"load": "nothing was loaded", "parts": "nothing was changed", "fill": "nothing was changed"}


def tell(error: SelectorError, command: str = "") -> None:
    """Say each fault, at most twenty of them, then their number and what it means for the command."""
    count = len(error.faults)
    lines(str(fault) for fault in islice(error.faults, MOST))
    if count > MOST:
        say(f"... and {count - MOST} more")
    if count > 1:
        say(f"{count} faults, {_OUTCOMES.get(command, 'nothing was computed')}")


def lines(texts: Iterable[str]) -> None:
    """Say texts, each on a line of its own, without characters that a terminal would act on."""
    from selector.report.clean import clean  # noqa: PLC0415 - only where there is something to say

    for text in texts:
        say(clean(text))


def usage(message: str, path: str) -> None:
    """Say why a command line cannot be meant, and where to read what can."""
    lines([f"{sentence(message)}; see: {path} --help"])


def sentence(message: str) -> str:
    """Return a message as the other ones are: no capital, no full stop."""
    text = " ".join(message.split()).rstrip(".")
    return text[:1].lower() + text[1:]


def and_others(names: Sequence[str], most: int) -> str:
    """Return some names, and how many more there are."""
    more = f" and {len(names) - most} more" if len(names) > most else ""
    return ", ".join(names[:most]) + more
