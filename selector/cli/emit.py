"""Answers in the format asked for, to the standard output or a file."""

from __future__ import annotations

from collections.abc import Iterable
from dataclasses import dataclass
from pathlib import Path
from typing import TYPE_CHECKING

from selector.cli.streams import put
from selector.errors import Fault, UsageRefused

if TYPE_CHECKING:
    from selector.app.output import Target
    from selector.report.answers.answer import Answer

FORMS = ("table", "json", "csv", "markdown")
_BY_ENDING = {".json": "json", ".csv": "csv", ".md": "markdown", ".toml": "toml"}


@dataclass(frozen=True, slots=True)
class Sink:
    """The format of an answer, and the file it goes to; None is the standard output."""

    form: str
    target: Target | None = None

    def take(self, text: str) -> None:
        """Write a text as it is."""
        if self.target is None:
            put(text)
        else:
            self.target.write(text)

    def answer(self, answer: Answer) -> None:
        """Write an answer in the format."""
        from selector.report import render  # noqa: PLC0415 - after the answer is there

        self.take(render(answer, self.form))


def sink_of(
    form: str | None,
    output: Path | None,
    *,
    inputs: Iterable[Path] = (),
    catalogue: Path | None = None,
    forms: tuple[str, ...] = FORMS,
) -> Sink:
    """Return where an answer goes, before anything is computed for it.

    Raises
    ------
    UsageRefused
        The format is none of `forms`, or the file is one that is read, the catalogue, or no regular file.
    """
    chosen = _form(form, output, forms)
    if output is None:
        return Sink(chosen)
    from selector.app.cataloguing import path_of  # noqa: PLC0415 - only where a file is written
    from selector.app.output import target  # noqa: PLC0415 - only where a file is written

    return Sink(chosen, target(output, inputs=[*inputs, path_of(catalogue)]))


def _form(form: str | None, output: Path | None, forms: tuple[str, ...]) -> str:
    """Return the format asked for, else the one of the file's ending, else the first."""
    by_ending = _BY_ENDING.get(output.suffix.lower()) if output is not None else None
    chosen = form if form is not None else by_ending or forms[0]
    if chosen not in forms:
        where = "--format" if form is not None else "--output"
        raise UsageRefused(Fault(where, f'"{chosen[:60]}" is no format of this answer', f"choose {', '.join(forms)}"))
    return chosen
