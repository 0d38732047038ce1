"""Catalogues for the commands: opened, their parts by kind, and the one part a person names."""

from __future__ import annotations

from pathlib import Path

from selector.app.kinds import kind_named
from selector.app.naming import cut, did_you_mean, shown_path
from selector.catalogue import Catalogue, default_path, open_catalogue
from selector.errors import Fault, InputRefused, UsageRefused
from selector.parts import KINDS, Part
from selector.report.answers.catalogue import CatalogueShown, KindCounted

Stock = dict[str, tuple[Part, ...]]


def path_of(catalogue: Path | None) -> Path:
    """Return where the catalogue stands: as named, else the default one."""
    return default_path() if catalogue is None else catalogue


def stock_of(catalogue: Catalogue) -> Stock:
    """Return all parts by kind."""
    return {kind: catalogue.parts(kind) for kind in KINDS}


def named_part(catalogue: Catalogue, code: str, kind: str | None) -> Part:
    """Return the part that a code means.

    Raises
    ------
    UsageRefused
        Several kinds have a part of that code, and none is named.
    InputRefused
        There is no such part; the codes most like it are named.
    """
    wanted = None if kind is None else kind_named(kind)
    kinds = [each for each in catalogue.kinds_of(code) if wanted in (None, each)]
    if len(kinds) > 1:
        what = f"is the code of parts of several kinds: {', '.join(kinds)}"
        raise UsageRefused(Fault(cut(code), what, f"name one: --kind {kinds[0]}"))
    part = catalogue.get(kinds[0], code) if kinds else None
    if part is None:
        raise unknown_part(catalogue, code, wanted)
    return part


def unknown_part(catalogue: Catalogue, code: str, kind: str | None, where: str = "") -> InputRefused:
    """Return the error of a code that no part has, with the codes most like it."""
    kinds = tuple(KINDS) if kind is None else (kind,)
    codes = [part.part for each in kinds for part in catalogue.parts(each)]
    remedy = did_you_mean(code, codes, "search for it: selector parts find TEXT")
    return InputRefused(Fault(where, f'no {kind or "part"} "{cut(code)}" is in the catalogue', remedy))


def info(catalogue: Path | None) -> CatalogueShown:
    """Return what is in a catalogue, in figures."""
    with open_catalogue(catalogue) as opened:
        facts = opened.info()
    kinds = tuple(KindCounted(each.kind, each.parts, each.stocked, each.generic) for each in facts.kinds)
    path = shown_path(path_of(catalogue))
    return CatalogueShown(path, facts.version, kinds, facts.size_bytes, facts.changes, facts.changed or None)
