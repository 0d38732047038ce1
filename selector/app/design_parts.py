"""The parts that a design names: from the catalogue by their codes, or from in-line tables."""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from dataclasses import dataclass, field, replace

from selector.app.cataloguing import unknown_part
from selector.app.kinds import a_part_of
from selector.app.toml_file import TomlFile
from selector.catalogue import Catalogue
from selector.errors import Fault, InputRefused
from selector.parts import Part, read_part

IN_LINE = "in-line"


@dataclass(frozen=True, slots=True)
class Chosen:
    """A part of a design: the key it stands under, whether it is in-line, and whether its table names it."""

    place: str
    part: Part
    in_line: bool = False
    named: bool = True


@dataclass(slots=True)
class Chooser:
    """Finds the parts of one design file and keeps what is wrong with them."""

    file: TomlFile
    catalogue: Catalogue | None
    faults: list[Fault] = field(default_factory=list)

    def chosen(self, place: str, kind: str, raw: object) -> Chosen | None:
        """Return the part that a value means; None, and a fault kept, where it means none."""
        if isinstance(raw, str):
            return self._by_code(place, kind, raw)
        if isinstance(raw, Mapping):
            return self._in_line(place, kind, raw)
        remedy = f'write a code like "R-10k", or a table of the fields of {a_part_of(kind)}'
        self.faults.append(Fault(self.file.place(place), "is neither a part code nor a table", remedy))
        return None

    def numbered(self, chosen: Sequence[Chosen]) -> list[Chosen]:
        """Return the parts with codes that tell different parts of a kind apart.

        In-line parts without a name of their own are `in-line`, `in-line 2` … within their kind; tables that say the
        same are one part. Two different parts of one code are a fault.
        """
        by_code: dict[tuple[str, str], Chosen] = {
            (each.part.kind, each.part.part): each for each in chosen if each.named
        }
        self._refuse_clashes(chosen, by_code)
        rows = []
        for each in chosen:
            one = each if each.named else self._with_number(each, by_code)
            by_code.setdefault((one.part.kind, one.part.part), one)
            rows.append(one)
        return rows

    def _by_code(self, place: str, kind: str, code: str) -> Chosen | None:
        """Return a part of the catalogue; nothing is looked up where the file is refused in any case."""
        if self.catalogue is None:
            return None
        part = self.catalogue.get(kind, code)
        if part is None:
            self.faults += unknown_part(self.catalogue, code, kind, self.file.place(place)).faults
            return None
        return Chosen(place, part)

    def _in_line(self, place: str, kind: str, table: Mapping[str, object]) -> Chosen | None:
        """Return the part of a table."""
        try:
            part = read_part(kind, {"part": IN_LINE, **table}, where="")
        except InputRefused as refused:
            self.faults += (self._fault(place, fault) for fault in refused.faults)
            return None
        return Chosen(place, part, in_line=True, named="part" in table)

    def _fault(self, place: str, fault: Fault) -> Fault:
        """Return a fault of a table with its place in the file."""
        where = self.file.place(f"{place}.{fault.where}" if fault.where else place)
        return Fault(where, fault.what, fault.remedy)

    def _refuse_clashes(self, chosen: Sequence[Chosen], by_code: Mapping[tuple[str, str], Chosen]) -> None:
        """Keep a fault for each named part that is not the one its code stands for."""
        for each in chosen:
            other = by_code.get((each.part.kind, each.part.part))
            if each.named and other is not None and (each.part, each.in_line) != (other.part, other.in_line):
                what = f'"{each.part.part}" is also the code of another {each.part.kind} of this design'
                first = each if each.in_line else other
                self.faults.append(Fault(self.file.place(first.place), what, "give the in-line part another name"))

    def _with_number(self, each: Chosen, by_code: Mapping[tuple[str, str], Chosen]) -> Chosen:
        """Return a part without a name under the first one that is free, or that the same part has already."""
        number = 1
        while True:
            code = IN_LINE if number == 1 else f"{IN_LINE} {number}"
            part = each.part.model_copy(update={"part": code})
            other = by_code.get((part.kind, code))
            if other is None or (other.part == part and other.in_line):
                return replace(each, part=part)
            number += 1
