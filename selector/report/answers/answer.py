"""What an answer is."""

from __future__ import annotations

from typing import ClassVar, Protocol


class Answer(Protocol):
    """Plain data, complete, so that a printer computes nothing.

    `view` is the module of `report.views` that tells it.
    """

    view: ClassVar[str]
