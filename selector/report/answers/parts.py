"""What `parts list` and `parts show` answer."""

from __future__ import annotations

from dataclasses import dataclass
from typing import TYPE_CHECKING, ClassVar

if TYPE_CHECKING:
    from selector.parts import Part


@dataclass(frozen=True, slots=True)
class PartsListed:
    """Answer of `parts list` and `parts show`: parts of one or more kinds, in their order.

    `csv_text` is the stock file that loads again, printed as it is where the format is csv.
    """

    view: ClassVar[str] = "parts"
    parts: tuple[Part, ...]
    csv_text: str | None = None
