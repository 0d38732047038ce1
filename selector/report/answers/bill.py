"""What `bill` answers."""

from __future__ import annotations

from dataclasses import dataclass
from typing import TYPE_CHECKING, ClassVar

if TYPE_CHECKING:
    from selector.bill.line import Offer
    from selector.spec import Spec


@dataclass(frozen=True, slots=True)
class BillShown:
    """Answer of `bill`; `in_line` holds the (kind, code) of parts that are in no catalogue, for the TOML of it."""

    view: ClassVar[str] = "bill"
    spec: Spec
    offer: Offer
    in_line: frozenset[tuple[str, str]] = frozenset()
