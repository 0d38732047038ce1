"""The fuzzy search over the catalogue."""

from __future__ import annotations

from collections.abc import Callable

import pytest

from selector.catalogue import Catalogue, in_memory
from selector.parts import Part

Make = Callable[..., Part]


@pytest.fixture
def drawer(resistor: Make, shunt: Make) -> Catalogue:
    """Return a catalogue whose parts differ in code, description and value."""
    return in_memory(
        [
            resistor("R-4K99", description="thin film 0805"),
            resistor("R-4K99-B", description="thick film 1206"),
            resistor("R-10K", resistance="10 kohm", description="thick film 0805"),
            shunt("S-0R05", description="four terminals"),
            shunt("R-4K9", resistance="4.9 kohm", description="misnamed"),
        ]
    )


@pytest.mark.parametrize(
    ("text", "codes"),
    [
        ("R-4K99", ["R-4K99", "R-4K99-B"]),
        ("r-4k99", ["R-4K99", "R-4K99-B"]),
        ("4.99k", ["R-4K99", "R-4K99-B"]),
        ("4K99", ["R-4K99", "R-4K99-B"]),
        ("50 mohm", ["S-0R05"]),
        ("thik film", ["R-10K", "R-4K99-B"]),
        ("four terminls", ["S-0R05"]),
        ("S0R05", ["S-0R05"]),
    ],
)
def test_the_likeliest_part_comes_first(drawer: Catalogue, text: str, codes: list[str]) -> None:
    """Codes, starts of codes, values and mistyped words lead to the part that is meant."""
    assert [each.part.part for each in drawer.find(text, limit=len(codes))] == codes


@pytest.mark.parametrize("text", ["", "   ", "zzzzzz", "!!!", "\x00", "[/b]"])
def test_what_is_like_nothing_finds_nothing(drawer: Catalogue, text: str) -> None:
    """A text that is like no part gives an empty list."""
    assert drawer.find(text) == ()


def test_find_keeps_to_kind_and_limit(drawer: Catalogue) -> None:
    """A kind narrows the search, and the limit cuts the list after ordering."""
    assert {each.part.kind for each in drawer.find("R-4K9", kind="shunt")} == {"shunt"}
    assert [each.part.part for each in drawer.find("R-4K9", limit=1)] == ["R-4K9"]


def test_equal_likeness_is_ordered_by_kind_and_code(drawer: Catalogue) -> None:
    """Parts that are equally like a text stand in the order of kinds, then of code points."""
    found = drawer.find("film")
    assert [each.part.part for each in found] == ["R-10K", "R-4K99", "R-4K99-B"]
    assert len({each.score for each in found}) == 1
