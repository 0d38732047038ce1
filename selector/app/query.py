"""The main job: a spec and a catalogue to the short list."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path

from selector.app.cataloguing import Stock, stock_of
from selector.app.specs import Asked, read_spec
from selector.bill import offer_of
from selector.candidate import conditions_of
from selector.catalogue import Catalogue, open_catalogue
from selector.report.answers.query import Shortlist
from selector.search import search
from selector.spec import Spec

Progress = Callable[[int, int], None]


def query(
    asked: Asked,
    *,
    top: int | None = 5,
    catalogue: Path | None = None,
    progress: Progress | None = None,
) -> Shortlist:
    """Return the exact short list of a spec file over a catalogue, best first, or why it is empty.

    Parameters
    ----------
    asked : Asked
        The spec's file with what is set beside it.
    top : int or None
        How many candidates at most; None: all.
    catalogue : Path or None
        The catalogue's file; None is the default one.
    progress
        Called with the pairs done and their number.
    """
    spec = read_spec(asked)
    with open_catalogue(catalogue) as opened:
        return shortlist(spec, opened, top=top, variants=asked.variants, progress=progress)


def shortlist(
    spec: Spec, catalogue: Catalogue, *, top: int | None = 5, variants: bool = False, progress: Progress | None = None
) -> Shortlist:
    """Return the short list of a spec over an open catalogue."""
    stock = stock_of(catalogue)
    found = search(spec, stock, top=top, variants=variants, progress=progress)
    conditions, boards = conditions_of(spec), spec.parts.boards
    offers = tuple(offer_of(candidate, conditions, boards) for candidate in found.candidates)
    nearest = found.nothing_fits.nearest if found.nothing_fits else None
    return Shortlist(
        spec,
        offers,
        found.searched,
        found.nothing_fits,
        None if nearest is None else offer_of(nearest, conditions, boards),
        _unknown(spec, stock),
    )


def _unknown(spec: Spec, stock: Stock) -> tuple[str, ...]:
    """Return the codes that the spec narrows the catalogue by and that no part has: likely slips of the pen."""
    only = [(kind, code) for kind, codes in (spec.parts.only or {}).items() for code in codes]
    codes = {kind: {part.part for part in parts} for kind, parts in stock.items()}
    missing = [code for kind, code in only if code not in codes.get(kind, ())]
    missing += [code for code in spec.parts.avoid if not any(code in known for known in codes.values())]
    return tuple(dict.fromkeys(missing))
