"""A design as a file gives it: part codes of the catalogue, or tables of a part's own figures."""

from __future__ import annotations

from collections.abc import Callable, Iterator
from dataclasses import dataclass
from pathlib import Path

from selector.app.design_parts import Chooser, Chosen
from selector.app.naming import cut, did_you_mean
from selector.app.toml_file import TomlFile, read_design_file
from selector.candidate import Design
from selector.catalogue import Catalogue
from selector.errors import Fault, InputRefused
from selector.gain import LAWS
from selector.parts import Amplifier, Capacitor, Part, Resistor, Shunt, Switch

KIND_OF = {
    "shunts": "shunt",
    "amplifier": "amplifier",
    "switch": "switch",
    "bypass": "bypass",
    "common": "resistor",
    "gain": "resistor",
    "gain_capacitors": "capacitor",
    "filter_resistor": "resistor",
    "filter_capacitor": "capacitor",
}
LISTS = ("shunts", "gain", "gain_capacitors")
FILTER = ("filter_resistor", "filter_capacitor")
MOST_RANGES = 4
_LATER = "stacks and gain capacitors come with a later version"


@dataclass(frozen=True, slots=True)
class ReadDesign:
    """A design, the parts of it that need not be in stock, and the catalogue where one was needed."""

    design: Design
    exempt: frozenset[tuple[str, str]]
    catalogue: Catalogue | None


def read_design(path: Path, open_one: Callable[[], Catalogue]) -> ReadDesign:
    """Return the design of a TOML file.

    Parameters
    ----------
    path : Path
        Its keys are those of `KIND_OF`; each value is a part code or an in-line table of the kind's fields.
    open_one
        Opens the catalogue; called only where the file names a code, or leaves a filter part to be chosen.

    Raises
    ------
    InputRefused
        With every fault of the file: unknown keys and codes, faulty figures, parts that do not make a design.
    """
    file = read_design_file(path)
    entries, faults = _entries(file)
    named = any(isinstance(raw, str) for _, _, raw in entries) or any(key not in file.tables for key in FILTER)
    catalogue = open_one() if named and not faults else None
    chooser = Chooser(file, catalogue)
    chosen = [(key, chooser.chosen(place, KIND_OF[key], raw)) for key, place, raw in entries]
    numbered = chooser.numbered([each for _, each in chosen if each is not None])
    faults += chooser.faults
    faults += _shape(file, chosen)
    if faults:
        raise InputRefused(sorted(faults, key=_line_of))
    parts = iter(numbered)
    by_key: dict[str, list[Part]] = {key: [] for key in KIND_OF}
    for key, _ in chosen:
        by_key[key].append(next(parts).part)
    exempt = frozenset((each.part.kind, each.part.part) for each in numbered if each.in_line)
    return ReadDesign(_design(by_key), exempt, catalogue)


def _entries(file: TomlFile) -> tuple[list[tuple[str, str, object]], list[Fault]]:
    """Return key, place and raw value of each part that the file names, and the keys that cannot be taken."""
    entries: list[tuple[str, str, object]] = []
    faults: list[Fault] = []
    for key, raw in file.tables.items():
        if key not in KIND_OF:
            remedy = did_you_mean(key, KIND_OF, f"a design has {', '.join(KIND_OF)}")
            faults.append(Fault(file.place(key).partition(",")[0], f'unknown key "{cut(key)}"', remedy))
        elif key in LISTS:
            listed = raw if isinstance(raw, list) else [raw]
            if _comes_later(key, len(listed)):
                remedy = "leave all but one out" if key == "shunts" else "leave them out"
                faults.append(Fault(file.place(key), f"{len(listed)} of them: {_LATER}", remedy))
            elif key != "gain_capacitors":
                entries += ((key, f"{key}[{number}]", each) for number, each in enumerate(listed, 1))
        elif key == "bypass":
            faults.append(Fault(file.place(key), _LATER, "leave it out"))
        else:
            entries.append((key, key, raw))
    return entries, faults


def _comes_later(key: str, count: int) -> bool:
    """Return whether a list asks for what this version does not judge."""
    return (key == "shunts" and count > 1) or (key == "gain_capacitors" and count > 0)


def _shape(file: TomlFile, chosen: list[tuple[str, Chosen | None]]) -> Iterator[Fault]:
    """Yield what is missing, or too much, for the gain law of the amplifier."""
    count = {key: sum(each == key for each, _ in chosen) for key in KIND_OF}
    for key, example in (("shunts", 'shunts = ["S-0R82"]'), ("amplifier", 'amplifier = "AMP-Z1"')):
        if not count[key] and (key not in file.tables or file.tables[key] == []):
            yield Fault(file.place(key) if key in file.tables else f"{file.name}, {key}", "missing", f"write {example}")
    amplifiers = [each.part for key, each in chosen if key == "amplifier" and each is not None]
    if not amplifiers or not isinstance(amplifiers[0], Amplifier):
        return
    law = LAWS[amplifiers[0].gain_law]
    suits = f"{amplifiers[0].part} is {law.name}"
    if law.switched_name is None and count["gain"]:
        yield Fault(file.place("gain"), f"{suits}, which has no gain resistor", "leave gain out")
    if law.switched_name is not None and not count["gain"]:
        yield Fault(f"{file.name}, gain", f"missing: {suits}", f"name the resistor {law.switched_name} of each range")
    if law.common_name is None and count["common"]:
        yield Fault(file.place("common"), f"{suits}, which has no common resistor", "leave common out")
    if law.common_name is not None and not count["common"]:
        yield Fault(f"{file.name}, common", f"missing: {suits}", f"name the resistor {law.common_name}")
    yield from _ranges(file, count["gain"], count["switch"])


def _ranges(file: TomlFile, gains: int, switches: int) -> Iterator[Fault]:
    """Yield what does not go with the number of ranges."""
    if gains > MOST_RANGES:
        yield Fault(file.place("gain"), f"{gains} ranges", f"a design has at most {MOST_RANGES}")
    if gains > 1 and not switches:
        yield Fault(f"{file.name}, switch", f"missing: there are {gains} ranges", "name the switch that chooses one")
    if gains <= 1 and switches:
        yield Fault(file.place("switch"), "one range needs no switch", "leave switch out")


def _design(parts: dict[str, list[Part]]) -> Design:
    """Return the design of parts whose kinds are those of their keys."""
    amplifier = next(each for each in parts["amplifier"] if isinstance(each, Amplifier))
    gain = tuple(each for each in parts["gain"] if isinstance(each, Resistor))
    return Design(
        shunts=tuple(each for each in parts["shunts"] if isinstance(each, Shunt)),
        amplifier=amplifier,
        switch=next((each for each in parts["switch"] if isinstance(each, Switch)), None),
        common=next((each for each in parts["common"] if isinstance(each, Resistor)), None),
        gain=gain or None,
        filter_resistor=next((each for each in parts["filter_resistor"] if isinstance(each, Resistor)), None),
        filter_capacitor=next((each for each in parts["filter_capacitor"] if isinstance(each, Capacitor)), None),
    )


def _line_of(fault: Fault) -> int:
    """Return the line that a fault names, those without one last."""
    digits = fault.where.partition(" line ")[2].partition(",")[0]
    return int(digits) if digits.isdecimal() else 10**9
