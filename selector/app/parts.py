"""The catalogue by hand: parts listed, found, shown, added, changed, removed."""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from pathlib import Path

from selector.app.cataloguing import named_part
from selector.app.changes import field_change
from selector.app.kinds import a_part_of, kind_named
from selector.app.naming import cut, did_you_mean, who
from selector.catalogue import open_catalogue
from selector.errors import Fault, InputRefused, UsageRefused
from selector.parts import KINDS, columns, read_part
from selector.report.answers.changed import PartsChanged
from selector.report.answers.found import FoundPart, PartsFound
from selector.report.answers.parts import PartsListed

BY_HAND = "by hand"
_WHY = ("code", "start of the code", "value", "likeness")
_NOT_ASKED = ("source", "generic", "typical", "assumed")


def listed(kind: str | None = None, catalogue: Path | None = None) -> PartsListed:
    """Return all parts, or those of one kind, by kind and code."""
    kinds = tuple(KINDS) if kind is None else (kind_named(kind),)
    with open_catalogue(catalogue) as opened:
        return PartsListed(tuple(part for each in kinds for part in opened.parts(each)))


def found(text: str, kind: str | None = None, limit: int = 20, catalogue: Path | None = None) -> PartsFound:
    """Return the parts that answer a text, the likeliest first."""
    wanted = None if kind is None else kind_named(kind)
    with open_catalogue(catalogue) as opened:
        hits = opened.find(text, wanted, limit)
    return PartsFound(text, tuple(FoundPart(hit.part, _WHY[hit.why], hit.score) for hit in hits))


def shown(code: str, kind: str | None = None, catalogue: Path | None = None) -> PartsListed:
    """Return one part."""
    with open_catalogue(catalogue) as opened:
        return PartsListed((named_part(opened, code, kind),))


def added(kind: str, fields: Mapping[str, str], catalogue: Path | None = None) -> PartsChanged:
    """Add a part.

    Raises
    ------
    UsageRefused
        A kind or field that is not there.
    InputRefused
        A value that cannot be, a field that is missing, or a code that is taken.
    """
    wanted = kind_named(kind)
    refuse_unknown_fields(wanted, fields)
    source = ", ".join(filter(None, (who(), BY_HAND)))
    part = read_part(wanted, {"source": source, **fields}, where="", bare=False)
    with open_catalogue(catalogue, write=True) as opened:
        opened.add(part)
    return PartsChanged("added", ((part.kind, part.part),))


def changed(
    code: str, fields: Mapping[str, str], kind: str | None = None, catalogue: Path | None = None
) -> PartsChanged:
    """Give a part other figures; an empty value takes a figure away."""
    with open_catalogue(catalogue) as reader:
        part = named_part(reader, code, kind)
    refuse_unknown_fields(part.kind, fields)
    if not fields:
        raise UsageRefused(Fault("", "no field is named", f"write FIELD=VALUE: {_fields_of(part.kind)}"))
    with open_catalogue(catalogue, write=True) as opened:
        changes = opened.change(part.kind, part.part, fields)
    now = next((str(each.after) for each in changes if each.field == "part"), part.part)
    done = ((part.kind, now),) if changes else ()
    return PartsChanged("changed", done, tuple(map(field_change, changes)), same=0 if changes else 1)


def removed(code: str, kind: str | None = None, catalogue: Path | None = None) -> PartsChanged:
    """Remove a part."""
    with open_catalogue(catalogue) as reader:
        part = named_part(reader, code, kind)
    with open_catalogue(catalogue, write=True) as opened:
        opened.remove(part.kind, part.part)
    return PartsChanged("removed", ((part.kind, part.part),))


def csv_text(answer: PartsListed) -> str:
    """Return parts as a stock file that loads again unchanged."""
    from selector.ingest import stock_csv  # noqa: PLC0415 - a list in another format reads no stock file

    return stock_csv(answer.parts)


def template_text(kind: str) -> str:
    """Return a stock file of one kind with every heading and some examples."""
    from selector.ingest import template  # noqa: PLC0415 - a list reads no stock file

    return template(kind_named(kind))


def fields_of(pairs: Sequence[str]) -> dict[str, str]:
    """Return the values by field of `FIELD=VALUE` pairs; UsageRefused with all that are none, or come twice."""
    split = [(pair, *map(str.strip, pair.partition("=")[::2])) for pair in pairs]
    faults = [
        Fault("", f'"{cut(pair)}" is no FIELD=VALUE', "write it like tolerance=0.1%")
        for pair, name, _ in split
        if "=" not in pair or not name
    ]
    names = [name for _, name, _ in split]
    twice = dict.fromkeys(name for name in names if name and names.count(name) > 1)
    faults += [Fault("", f"{cut(name)} is given twice", "give it once") for name in twice]
    if faults:
        raise UsageRefused(faults)
    return {name: value for _, name, value in split}


def refuse_unknown_fields(kind: str, fields: Mapping[str, str]) -> None:
    """Raise UsageRefused for every field that a kind does not have."""
    known = [column.name for column in columns(kind)]
    all_of_them = f"it has {', '.join(known)}"
    faults = [
        Fault("", f'{a_part_of(kind)} has no field "{cut(name)}"', did_you_mean(name, known, all_of_them))
        for name in fields
        if name not in known
    ]
    if faults:
        raise UsageRefused(faults)


def to_ask(kind: str) -> tuple[tuple[str, str, bool], ...]:
    """Return field, example and whether it is required, of each field to ask a person for."""
    asked = [column for column in columns(kind_named(kind)) if column.name not in _NOT_ASKED]
    asked.sort(key=lambda column: not column.required)
    return tuple(
        (
            column.name,
            column.quantity.example if column.quantity else ", ".join(map(str, column.choices)),
            column.required,
        )
        for column in asked
    )


def cell_fault(kind: str, name: str, text: str) -> str | None:
    """Return what is wrong with one value of a field, None where nothing is."""
    try:
        read_part(kind, {name: text}, where="", bare=False)
    except InputRefused as refused:
        return next((f"{each.what}; {each.remedy}" for each in refused.faults if each.where == name), None)
    return None


def _fields_of(kind: str) -> str:
    return ", ".join(column.name for column in columns(kind))
