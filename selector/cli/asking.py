"""Questions to a person at a terminal."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from functools import partial

import typer

from selector.cli import faults


def ask_fields(kind: str) -> dict[str, str]:
    """Return the fields of a new part as a person answers them; those that need not be may stay empty."""
    from selector.app import parts  # noqa: PLC0415 - not needed for help

    answers: dict[str, str] = {}
    for name, example, required in parts.to_ask(kind):
        hint = f" (like {example})" if example else ""
        need = "" if required else ", may stay empty"
        answer = ask(f"{name}{hint}{need}", partial(parts.cell_fault, kind, name), needed=required)
        if answer:
            answers[name] = answer
    return answers


def ask_spec(given: Mapping[str, str]) -> dict[str, str]:
    """Return the entries of a new spec that are not given, as a person answers them; Enter takes the example."""
    from selector.app import specs  # noqa: PLC0415 - not needed for help

    answers = dict(given)
    for key, meaning, example in specs.to_ask(given):
        answers[key] = ask(f"{key}, {meaning}", partial(specs.entry_fault, key), default=example)
    return answers


def ask(
    question: str, fault_of: Callable[[str], str | None], *, needed: bool = True, default: str | None = None
) -> str:
    """Return the answer to a question, asking again while something is wrong with it."""
    while True:
        shown = "" if default is None and not needed else default
        answer = str(typer.prompt(question, default=shown, show_default=bool(shown), err=True)).strip()
        fault = fault_of(answer) if answer else None
        if fault is None and (answer or not needed):
            return answer
        faults.lines([fault or "an answer is needed"])
