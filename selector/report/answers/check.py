"""What `check` answers."""

from __future__ import annotations

from dataclasses import dataclass
from typing import TYPE_CHECKING, ClassVar

if TYPE_CHECKING:
    from selector.bill.line import Offer
    from selector.search import Judged
    from selector.spec import Spec


@dataclass(frozen=True, slots=True)
class Checked:
    """Answer of `check`."""

    view: ClassVar[str] = "check"
    spec: Spec
    judged: Judged
    offer: Offer | None
