"""An answer to text in a format."""

from __future__ import annotations

from collections.abc import Callable
from importlib import import_module

from selector.errors import Fault, UsageRefused
from selector.report.answers.answer import Answer
from selector.report.formats import FORMATS
from selector.report.told import Told


def render(answer: Answer, form: str) -> str:
    """Return an answer as text in one of FORMATS, with a final line feed.

    Raises
    ------
    UsageRefused
        Where there is no such format.
    """
    if form not in FORMATS:
        raise UsageRefused(Fault("--format", f'there is no format "{form}"', f"choose one of {', '.join(FORMATS)}"))
    return FORMATS[form].write(told(answer))


def told(answer: Answer) -> Told:
    """Return an answer as JSON, document and records, each made when it is asked for.

    The view is imported here: what shows candidates brings the whole search along, which preferred values do without.
    """
    view: Callable[[Answer], Told] = import_module(f"selector.report.views.{answer.view}").told
    return view(answer)
