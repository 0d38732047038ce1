"""One entry as TOML gives it, to the value of its key in SI units."""

from __future__ import annotations

import datetime as dt
import unicodedata
from collections.abc import Callable, Collection, Iterable, Mapping

from selector.spec.demand import Band
from selector.spec.holds import TOO_LARGE, Holds, KeyRefused, Sort
from selector.spec.keys import BAND_KEYS, Key
from selector.spec.named_lists import NamedLists
from selector.spec.nearest import did_you_mean
from selector.spec.rules import Value, Wrong
from selector.units import Quantity, QuantityError, parse

_LONGEST_SHOWN = 60


def read_value(raw: object, key: Key, kinds: Collection[str]) -> tuple[Value, list[Wrong]]:
    """Return the value of an entry and what is wrong with it; the value counts only where nothing is.

    `kinds` are the kinds of parts that `parts.only` may name; empty: any.
    """
    wrong: list[Wrong] = []
    if key.holds.sort == "bands":
        return _bands(raw, key, wrong), wrong
    if key.holds.sort == "codes by kind":
        return _lists(raw, key, kinds, wrong), wrong
    try:
        return _READERS[key.holds.sort](raw, key.holds), wrong
    except QuantityError as refused:
        return None, [Wrong(key.name, refused.what, refused.remedy)]


def as_read(raw: object) -> str:
    """Return how a message shows what was read: text in quotes, long text cut, tables and lists by name."""
    if isinstance(raw, str):
        return f'"{raw if len(raw) <= _LONGEST_SHOWN else raw[:_LONGEST_SHOWN] + "..."}"'
    if isinstance(raw, bool):
        return "true" if raw else "false"
    if isinstance(raw, float) or (isinstance(raw, int) and abs(raw) < 10**_LONGEST_SHOWN):
        return repr(raw)
    return _SORTS.get(type(raw), "a number of very many digits")


def _figure(raw: object, holds: Holds) -> Value:
    quantity = holds.quantity
    if quantity is None or isinstance(raw, bool) or not isinstance(raw, str | int | float):
        noun = quantity.name if quantity else "figure"
        raise KeyRefused(f"{as_read(raw)} is no {noun}", holds.wanted)
    if isinstance(raw, str):
        figure = _parsed(raw, quantity, holds.example)
    else:
        figure = float(raw) if isinstance(raw, float) or abs(raw) < TOO_LARGE else TOO_LARGE if raw > 0 else -TOO_LARGE
    holds.check(figure, as_read(raw))
    if not quantity.whole:
        return figure
    if not figure.is_integer():
        raise KeyRefused(f"{as_read(raw)} is no whole number", holds.wanted)
    return int(figure)


def _parsed(text: str, quantity: Quantity, example: str) -> float:
    """Return the figure of a text; a fault shows the key's own example."""
    try:
        return parse(text, quantity)
    except QuantityError as refused:
        raise KeyRefused(refused.what, refused.remedy.replace(quantity.example, example)) from refused


def _choice(raw: object, holds: Holds) -> Value:
    if isinstance(raw, str) and raw in holds.choices:
        return raw
    remedy = holds.wanted
    if isinstance(raw, str):
        remedy = f"{did_you_mean(raw, holds.choices)} {remedy}".strip()
    raise KeyRefused(f"{as_read(raw)} is not known", remedy)


def _flag(raw: object, holds: Holds) -> Value:
    if isinstance(raw, bool):
        return raw
    raise KeyRefused(f"{as_read(raw)} is neither true nor false", holds.wanted)


def _text(raw: object, _holds: Holds) -> Value:
    if not isinstance(raw, str):
        raise KeyRefused(f"{as_read(raw)} is no text", "write it in quotes")
    if any(unicodedata.category(sign) == "Cs" for sign in raw):
        raise KeyRefused(f"{as_read(raw)} holds half a character", "write it as UTF-8")
    return raw.strip()


def _codes(raw: object, holds: Holds) -> tuple[str, ...]:
    remedy = f"write it like {holds.example}"
    if not isinstance(raw, list | tuple):
        raise KeyRefused(f"{as_read(raw)} is no list of part codes", remedy)
    codes = tuple(_code(code) for code in raw if isinstance(code, str) and code.strip())
    if len(codes) < len(raw):
        raise KeyRefused("the list holds what is no part code", remedy)
    return codes


def _code(code: str) -> str:
    """Return a part code as the catalogue keeps it: composed (NFC) and trimmed."""
    return unicodedata.normalize("NFC", code.strip())


def _lists(raw: object, key: Key, kinds: Collection[str], wrong: list[Wrong]) -> Value:
    if not isinstance(raw, Mapping):
        wrong.append(Wrong(key.name, f"{as_read(raw)} is no table", f"write it like {key.holds.example}"))
        return None
    pairs: list[tuple[str, tuple[str, ...]]] = []
    for kind, codes in raw.items():
        name = f"{key.name}.{kind}"
        if kinds and kind not in kinds:
            wrong.append(unknown_key(name, (f"{key.name}.{each}" for each in kinds)))
            continue
        try:
            pairs.append((kind, _codes(codes, key.holds)))
        except KeyRefused as refused:
            wrong.append(Wrong(name, refused.what, f'write it like {kind} = ["S-0R82"]'))
    return NamedLists(tuple(pairs))


def _bands(raw: object, key: Key, wrong: list[Wrong]) -> Value:
    if not isinstance(raw, list | tuple) or not raw:
        what = "an empty list" if isinstance(raw, list | tuple) else as_read(raw)
        wrong.append(Wrong(key.name, f"{what} is no list of bands", f"write it like {key.holds.example}"))
        return None
    return tuple(_band(band, f"{key.name}[{number}]", wrong) for number, band in enumerate(raw, 1))


def _band(raw: object, name: str, wrong: list[Wrong]) -> Band:
    values: dict[str, Value] = {}
    if not isinstance(raw, Mapping):
        wrong.append(Wrong(name, f"{as_read(raw)} is no band", 'write it like {up_to = "1 mA", reading = "5 %"}'))
        return Band()
    for leaf, entry in raw.items():
        key = BAND_KEYS.get(leaf)
        if key is None:
            wrong.append(unknown_key(f"{name}.{leaf}", (f"{name}.{each}" for each in BAND_KEYS)))
            continue
        values[leaf], faults = read_value(entry, key, ())
        wrong += (Wrong(f"{name}.{fault.key}", fault.what, fault.remedy) for fault in faults)
    if "reading" not in raw and "floor" not in raw:
        wrong.append(Wrong(name, "neither reading nor floor", 'state what is allowed, for example reading = "2 %"'))
    return Band.model_validate({leaf: value for leaf, value in values.items() if value is not None})


def unknown_key(name: str, known: Iterable[str]) -> Wrong:
    """Return the fault of a key that there is not, with the nearest that there is or what its table takes."""
    names = tuple(known)
    return Wrong(name, f"unknown key {shortened(name)}", did_you_mean(name, names) or _takes(name, names), named=False)


def _takes(name: str, known: tuple[str, ...]) -> str:
    table = name.rpartition(".")[0]
    leaves = [key.rpartition(".")[2] for key in known if key.rpartition(".")[0] == table]
    return f"{table or 'a spec'} takes {', '.join(leaves)}" if leaves else ""


def shortened(name: str) -> str:
    """Return a name as a message shows it: in quotes, cut where it is long."""
    short = name if len(name) <= _LONGEST_SHOWN else name[:_LONGEST_SHOWN] + "..."
    return short if '"' in short else f'"{short}"'


_SORTS: dict[type, str] = {
    dict: "a table",
    list: "a list",
    dt.date: "a date",
    dt.datetime: "a date",
    dt.time: "a time of day",
}
_READERS: dict[Sort, Callable[[object, Holds], Value]] = {
    "quantity": _figure,
    "choice": _choice,
    "flag": _flag,
    "text": _text,
    "codes": _codes,
}
