"""What `query` answers."""

from __future__ import annotations

from dataclasses import dataclass
from typing import TYPE_CHECKING, ClassVar

if TYPE_CHECKING:
    from selector.bill.line import Offer
    from selector.search import NothingFits, Searched
    from selector.spec import Spec


@dataclass(frozen=True, slots=True)
class Shortlist:
    """Answer of `query`.

    `nearest` is the offer of `nothing_fits.nearest`; `unknown` holds codes that the spec names and no part has.
    """

    view: ClassVar[str] = "query"
    spec: Spec
    offers: tuple[Offer, ...]
    searched: Searched
    nothing_fits: NothingFits | None = None
    nearest: Offer | None = None
    unknown: tuple[str, ...] = ()
