"""Stock files into the catalogue, in one transaction."""

from __future__ import annotations

import stat
from collections.abc import Callable, Mapping, Sequence
from dataclasses import dataclass, field, replace
from pathlib import Path

from selector.app.cataloguing import path_of
from selector.app.kinds import kind_named
from selector.app.load_answer import conflict_faults, file_loaded
from selector.app.naming import shown_path, who
from selector.app.output import Target, same_file, target
from selector.catalogue import Catalogue, open_catalogue
from selector.catalogue.bulk import Taken
from selector.errors import Fault, InputRefused, Unusable, UsageRefused
from selector.ingest import StockFile, read_stock, refusing_shared, rejects_text
from selector.report.answers.loaded import Loaded

Confirm = Callable[[Loaded], bool]
_OF_A_PIPE = "stock.rejects.csv"


@dataclass(frozen=True, slots=True)
class Order:
    """What a load is asked to do beside reading its files; `confirm` is asked before parts are changed."""

    kind: str | None = None
    headings: Mapping[str, str] = field(default_factory=dict)
    dry_run: bool = False
    replace: bool = False
    rejects: Path | None = None
    catalogue: Path | None = None
    confirm: Confirm | None = None


def load(files: Sequence[Path], order: Order) -> Loaded:
    """Take stock files into the catalogue: every row that can be read, or no row at all where a file cannot be.

    Raises
    ------
    UsageRefused
        A kind, field or heading that is not there; a file named twice; a rejects file that would overwrite an input.
    InputRefused
        A file as a whole cannot be read; nothing is loaded.
    Unusable
        The catalogue cannot be used, or the rejects cannot be written.
    """
    kind = None if order.kind is None else kind_named(order.kind)
    _refuse_twice(files)
    wanted = _rejects_target(files, order)
    read = _read(files, kind, order.headings)
    _refuse_unmapped(read)
    read = refusing_shared(read)
    catalogue = open_catalogue(order.catalogue, write=True)
    records = [file.records for file in read]
    if order.dry_run or (order.replace and order.confirm is not None):
        planned = catalogue.take_in(records, replace=order.replace, dry_run=True)
        if order.dry_run or _declined(read, planned, order):
            return _answer(_without(read, planned), planned, dry_run=True, rejects=None)
    taken = catalogue.take_in(records, replace=order.replace)
    read = _without(read, taken)
    return _answer(read, taken, dry_run=False, rejects=_write_rejects(read, wanted, order))


def stock_of_files(files: Sequence[Path], catalogue: Catalogue) -> None:
    """Take stock files into an open catalogue; InputRefused where a row is refused."""
    read = _read(files, None, {})
    refused = [row for file in read for row in file.refused]
    if refused:
        raise InputRefused(
            Fault(f"line {row.line}", fault.why, fault.remedy) for row in refused for fault in row.faults
        )
    catalogue.take_in([file.records for file in read])


def _read(files: Sequence[Path], kind: str | None, headings: Mapping[str, str]) -> tuple[StockFile, ...]:
    """Return all files, or raise with what is wrong with each of those that cannot be read."""
    read: list[StockFile] = []
    faults: list[Fault] = []
    by = who()
    for path in files:
        try:
            read.append(read_stock(path, kind=kind, headings=headings, who=by))
        except InputRefused as refused:
            faults += refused.faults
    if faults:
        raise InputRefused(faults)
    return tuple(read)


def _refuse_twice(files: Sequence[Path]) -> None:
    """Raise where two names are one file."""
    for number, path in enumerate(files):
        if any(same_file(path, other) for other in files[:number]):
            raise UsageRefused(Fault(shown_path(path), "is named twice", "name each file once"))


def _refuse_unmapped(files: Sequence[StockFile]) -> None:
    """Raise where a heading that the user named stands in no file."""
    nowhere = [each for each in files[0].not_mapped if all(each in file.not_mapped for file in files)]
    if nowhere:
        there = ", ".join(dict.fromkeys(f'"{column.heading}"' for file in files for column in file.columns))
        raise UsageRefused(Fault("--map", f'no column is headed "{each}"', f"there are {there}") for each in nowhere)


def _rejects_target(files: Sequence[Path], order: Order) -> Target | None:
    """Return where `--rejects` sends the refused rows, refusing a file that is read; None where it names none."""
    if order.rejects is None or order.dry_run:
        return None
    found = target(order.rejects, inputs=[*files, path_of(order.catalogue)])
    if found is None:
        raise UsageRefused(Fault("--rejects", "the standard output holds the answer", "name a file"))
    return found


def _declined(read: Sequence[StockFile], planned: Sequence[Taken], order: Order) -> bool:
    """Return whether parts would be changed and the user does not want it."""
    if not any(each.changed for each in planned) or order.confirm is None:
        return False
    return not order.confirm(_answer(read, planned, dry_run=True, rejects=None))


def _without(files: Sequence[StockFile], taken: Sequence[Taken]) -> tuple[StockFile, ...]:
    """Return the files without the parts that the catalogue has with other figures: these are refused rows now."""
    return tuple(
        file.refusing({(each.kind, each.part): conflict_faults(file, each) for each in of_file.conflicts})
        for file, of_file in zip(files, taken, strict=True)
    )


def _write_rejects(files: Sequence[StockFile], wanted: Target | None, order: Order) -> str | None:
    """Write the refused rows to their file and return its name; None where none was refused."""
    first = next((file for file in files if file.refused), None)
    if first is None:
        return None
    try:
        chosen = wanted or target(
            _beside(first.path), inputs=[*(file.path for file in files), path_of(order.catalogue)]
        )
        if chosen is not None:
            chosen.write(rejects_text(*files))
            return shown_path(chosen.path)
    except (Unusable, UsageRefused) as error:
        count = sum(len(file.refused) for file in files)
        what = f"{error.faults[0].what}; all other rows were loaded, {count} refused"
        remedy = "load again with --rejects FILE in a folder that can be written"
        raise Unusable(replace(error.faults[0], what=what, remedy=remedy)) from error
    return None


def _beside(path: Path) -> Path:
    """Return the rejects file of a stock file: beside it; of a pipe, in the current folder."""
    if not stat.S_ISREG(path.stat().st_mode):
        return Path(_OF_A_PIPE)
    return path.with_name(f"{path.stem}.rejects.csv")


def _answer(files: Sequence[StockFile], taken: Sequence[Taken], *, dry_run: bool, rejects: str | None) -> Loaded:
    """Return what became of each file."""
    return Loaded(tuple(map(file_loaded, files, taken)), dry_run, rejects)
