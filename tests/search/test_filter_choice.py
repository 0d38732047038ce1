"""Which output filter a design takes."""

from __future__ import annotations

import pytest

from selector.search import search
from tests.search.small import capacitor, part, resistor, spec, stock


def _taken(*parts: object, **changes: object) -> tuple[str, str]:
    found = search(spec(**changes), stock(*parts))  # type: ignore[arg-type] # parts of any kind
    design = found.candidates[0].design
    assert design.filter_resistor is not None
    assert design.filter_capacitor is not None
    return design.filter_resistor.part, design.filter_capacitor.part


def test_slowest_filter_that_is_fast_enough_is_taken() -> None:
    """Of 1.6 kHz, 160 Hz and 16 Hz the 160 Hz filter serves 100 Hz with least noise."""
    parts = (resistor("R", 1e3), capacitor("C1", 1e-7), capacitor("C2", 1e-6), capacitor("C3", 1e-5))
    assert _taken(*parts) == ("R", "C2")


def test_equal_corners_take_the_larger_resistor() -> None:
    """1 kohm with 100 nF and 10 kohm with 10 nF have one corner: the larger resistor is taken."""
    parts = (resistor("R1", 1e3), resistor("R2", 1e4), capacitor("C1", 1e-7), capacitor("C2", 1e-8))
    assert _taken(*parts, signal__bandwidth=1000.0, filter__resistance_max=1e4) == ("R2", "C2")


def test_equal_filters_take_the_cheaper_then_the_first_name() -> None:
    """Of like resistors the cheaper is taken, of equally cheap ones the first by name, an unpriced one last."""
    like = [resistor(code, 1e3, unit_cost=cost) for code, cost in (("R9", 0.1), ("R2", 0.1), ("R1", 0.2))]
    assert _taken(*like, resistor("R0", 1e3), capacitor("C", 1e-7, unit_cost=0.1)) == ("R2", "C")


def test_resistor_outside_its_span_is_no_filter() -> None:
    """A 20 kohm resistor is above filter.resistance_max of 10 kohm, however slow its filter."""
    parts = (resistor("R1", 1e3), resistor("R2", 2e4), capacitor("C", 5e-8))
    assert _taken(*parts) == ("R1", "C")


@pytest.mark.parametrize(
    ("fields", "reason"),
    [
        ({"temp_change": None}, "no temperature change"),
        ({"tolerance": 0.5, "temp_change": 0.6}, "spread of 100 % or more"),
        ({"voltage": 3.4}, "voltage below the supply"),
        ({"dielectric": "Z5U", "temp_change": 0.56, "tolerance": 0.2}, "dielectric does not span the ambient"),
    ],
)
def test_unfit_capacitor_is_left_out(fields: dict[str, object], reason: str) -> None:
    """A capacitor that cannot serve is out before the search, and counted with its reason."""
    found = search(spec(), stock(resistor("R", 1e3), capacitor("C1", 1e-7), capacitor("C2", 1e-7, **fields)))
    assert [(row.kind, row.reason, row.count) for row in found.searched.left_out] == [("capacitor", reason, 1)]
    assert found.searched.filter_pairs == 1


def test_filter_part_in_two_places_counts_for_both() -> None:
    """A resistor of which there is one cannot set the gain and make the filter; the next filter is taken."""
    law = {"gain_law": "current-output", "gain": None, "transconductance": 2e-4, "buffered": True}
    amplifier = part("amplifier", **law, quantity=5)
    shunt = part("shunt", quantity=5)
    rows = (resistor("R1", 1e5, quantity=1), resistor("R2", 5e4, quantity=9), capacitor("C", 1e-9, quantity=9))
    found = search(
        spec(parts__from="stock", filter__resistance_max=1e6), stock(amplifier, shunt, *rows), top=None, variants=True
    )
    taken = {
        (one.design.gain[0].part, one.design.filter_resistor.part)
        for one in found.candidates
        if one.design.gain and one.design.filter_resistor
    }
    assert taken == {("R1", "R2"), ("R2", "R1")}
