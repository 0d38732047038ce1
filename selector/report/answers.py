"""What each command answers: plain data, complete, so that a printer computes nothing."""

from __future__ import annotations

from dataclasses import dataclass
from typing import TYPE_CHECKING

if TYPE_CHECKING:  # what starts often must not import arrays for the sake of annotations
    from selector.bill.line import Offer
    from selector.parts import Part
    from selector.search import Judged, NothingFits, Searched
    from selector.series import Pair, Preferred
    from selector.spec import Spec
    from selector.units import Quantity


@dataclass(frozen=True, slots=True)
class Shortlist:
    """Answer of `query`.

    `nearest` is the offer of `nothing_fits.nearest`; `unknown` holds codes that the spec names and no part has.
    """

    spec: Spec
    offers: tuple[Offer, ...]
    searched: Searched
    nothing_fits: NothingFits | None = None
    nearest: Offer | None = None
    unknown: tuple[str, ...] = ()


@dataclass(frozen=True, slots=True)
class Checked:
    """Answer of `check`."""

    spec: Spec
    judged: Judged
    offer: Offer | None


@dataclass(frozen=True, slots=True)
class BillShown:
    """Answer of `bill`; `in_line` holds the (kind, code) of parts that are in no catalogue, for the TOML of it."""

    spec: Spec
    offer: Offer
    in_line: frozenset[tuple[str, str]] = frozenset()


@dataclass(frozen=True, slots=True)
class PartsListed:
    """Answer of `parts list` and `parts show`: parts of one or more kinds, in their order.

    `csv_text` is the stock file that loads again, printed as it is where the format is csv.
    """

    parts: tuple[Part, ...]
    csv_text: str | None = None


@dataclass(frozen=True, slots=True)
class FoundPart:
    """A part that was looked for, why it was found, and how well it fits, from 0 to 100."""

    part: Part
    why: str
    score: float


@dataclass(frozen=True, slots=True)
class PartsFound:
    """Answer of `parts find`, best first."""

    text: str
    found: tuple[FoundPart, ...]


@dataclass(frozen=True, slots=True)
class FieldChange:
    """A field of a part that is, or would be, changed; values as text."""

    kind: str
    part: str
    field: str
    before: str
    after: str


@dataclass(frozen=True, slots=True)
class PartsChanged:
    """Answer of `parts add`, `change`, `remove` and of `fill`: what was done, and to which parts."""

    done: str  # "added", "changed", "removed"
    parts: tuple[tuple[str, str], ...]  # (kind, code)
    changes: tuple[FieldChange, ...] = ()
    same: int = 0  # parts that were there already, just so


@dataclass(frozen=True, slots=True)
class ColumnRead:
    """A column of a stock file: its heading, the field it was taken for (None: not used), unit and samples."""

    heading: str
    field: str | None
    unit: str | None
    matched: str | None
    nearest: str | None
    samples: tuple[str, ...]


@dataclass(frozen=True, slots=True)
class CellRefused:
    """A cell that could not be taken, and what would be right."""

    line: int
    column: str
    value: str
    why: str
    remedy: str


@dataclass(frozen=True, slots=True)
class FileLoaded:
    """What became of one stock file."""

    file: str
    encoding: str
    delimiter: str
    heading_line: int
    columns: tuple[ColumnRead, ...]
    new: int
    changed: int
    same: int
    refused: int
    changes: tuple[FieldChange, ...]
    cells: tuple[CellRefused, ...]  # the first of the refused cells, at most `CELLS_SHOWN`
    notes: tuple[str, ...] = ()


@dataclass(frozen=True, slots=True)
class Loaded:
    """Answer of `load`; `rejects` names the file that the refused rows went to."""

    files: tuple[FileLoaded, ...]
    dry_run: bool
    rejects: str | None


@dataclass(frozen=True, slots=True)
class SeriesShown:
    """Answer of `series`: nearest preferred values, and pairs where they were asked for."""

    value: float
    quantity: Quantity
    series: str
    nearest: tuple[Preferred, ...]
    how: str | None = None  # "series" or "parallel"
    pairs: tuple[Pair, ...] = ()


@dataclass(frozen=True, slots=True)
class SpecShown:
    """Answer of `spec show`."""

    spec: Spec


@dataclass(frozen=True, slots=True)
class KindCounted:
    """How many parts of a kind a catalogue holds, how many of them are in stock, how many generic."""

    kind: str
    parts: int
    stocked: int
    generic: int


@dataclass(frozen=True, slots=True)
class CatalogueShown:
    """Answer of `catalogue info`; `changed` is the time of the last change as text, for show only."""

    path: str
    version: int
    kinds: tuple[KindCounted, ...]
    size_bytes: int
    changes: int
    changed: str | None


CELLS_SHOWN = 20

Answer = (
    Shortlist
    | Checked
    | BillShown
    | PartsListed
    | PartsFound
    | PartsChanged
    | Loaded
    | SeriesShown
    | SpecShown
    | CatalogueShown
)
