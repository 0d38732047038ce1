"""Limits that the shunt decides: rating, overload, amplifier input, inductance, burden.

Plain: 1 A in 0.1 ohm of 1 %, so 0.101 V and 0.101 W; a rating of 1 W that falls from 70 to 155 degC, half used.
"""

from __future__ import annotations

from math import pi
from typing import TYPE_CHECKING

from tests.builders import amplifier, chain, design, measured, meets, near, shunt
from tests.limits.edges import check_edge

if TYPE_CHECKING:
    from selector.candidate.chain import Chain

OVERLOAD = {"current__overload": 3.0, "current__overload_time": 0.01}  # 0.909 W, 9.09 mJ


def _with(fields: dict[str, object], **changes: object) -> Chain:
    return chain(design(shunts=(shunt(**fields),)), **changes)


def test_rating() -> None:
    """Half of 0.202 W carries 0.101 W."""
    check_edge("rating", lambda watt: _with({"power": watt}), 0.202, meets_from="above")


def test_rating_goes_with_the_square_of_the_current() -> None:
    """2 A make 0.404 W, which half of 0.808 W carries; 0.5 A make 25.25 mW."""
    check_edge("rating", lambda watt: _with({"power": watt}, current__max=2.0), 0.808, meets_from="above")
    check_edge("rating", lambda watt: _with({"power": watt}, current__max=0.5), 0.0505, meets_from="above")


def test_rating_by_load_fraction() -> None:
    """All of 0.101 W carries it where the whole rating may be used."""
    check_edge("rating", lambda watt: _with({"power": watt}, limits__load_fraction=1.0), 0.101, meets_from="above")


def test_rating_is_derated() -> None:
    """At 85 degC 70/85 of the rating are left: half of that of 0.245286 W carries 0.101 W; at 155 degC nothing is."""
    hot = {"ambient__max": 85.0}
    check_edge("rating", lambda watt: _with({"power": watt}, **hot), 0.202 * 85.0 / 70.0, meets_from="above")
    assert not meets("rating", _with({"power": 1e6}, ambient__max=155.0))


def test_overload_within_the_rating() -> None:
    """3 A make 0.909 W, which a whole rating of 0.909 W stands; without an overload nothing is judged."""
    check_edge("overload", lambda watt: _with({"power": watt}, **OVERLOAD), 0.909, meets_from="above")
    assert measured("overload", _with({"power": 0.21})) == []


def test_overload_within_the_derated_rating() -> None:
    """At 85 degC the rating for it is 85/70 of 0.909 W."""
    hot = OVERLOAD | {"ambient__max": 85.0}
    check_edge("overload", lambda watt: _with({"power": watt}, **hot), 0.909 * 85.0 / 70.0, meets_from="above")


def test_overload_within_the_pulse_energy() -> None:
    """10 ms of 0.909 W are 9.09 mJ, which a pulse energy of as much stands whatever the rating."""

    def built(joule: float) -> Chain:
        return _with({"power": 0.21, "pulse_energy": joule}, **OVERLOAD)

    check_edge("overload", built, 9.09e-3, meets_from="above")


def test_amplifier_input() -> None:
    """1 A drops 0.101 V, an overload of 3 A 0.303 V; an overload below I_max changes nothing."""

    def built(volt: float, **changes: object) -> Chain:
        return chain(design(amplifier=amplifier(input_max=volt)), **changes)

    check_edge("amplifier input", built, 0.101, meets_from="above")
    check_edge("amplifier input", lambda volt: built(volt, **OVERLOAD), 0.303, meets_from="above")
    check_edge("amplifier input", lambda volt: built(volt, current__max=2.0), 0.202, meets_from="above")
    small = OVERLOAD | {"current__overload": 0.5}
    check_edge("amplifier input", lambda volt: built(volt, **small), 0.101, meets_from="above")


def test_amplifier_that_states_no_input_limit() -> None:
    """Where the amplifier states none, any drop is met."""
    assert meets("amplifier input", _with({"resistance": 1e3}, **OVERLOAD))


def test_inductance() -> None:
    """0.1 ohm rises 3 dB at 100 Hz with 0.1 / (2 pi 100) H; more is out, none stated is met."""
    check_edge("inductance", lambda henry: _with({"inductance": henry}), 0.1 / (200.0 * pi), meets_from="below")
    assert meets("inductance", chain(signal__bandwidth=1e9))


def test_burden() -> None:
    """1 A drops 0.101 V, with 20 mohm of lead 0.121 V."""
    check_edge("burden", lambda volt: chain(limits__burden=volt), 0.101, meets_from="above")
    check_edge("burden", lambda volt: chain(limits__burden=volt, sense__lead=0.02), 0.121, meets_from="above")
    check_edge("burden", lambda volt: chain(limits__burden=volt, current__max=2.0), 0.202, meets_from="above")


def test_figure_on_its_limit_meets_it_to_a_trillionth() -> None:
    """The burden of 0.101 V meets a limit that is 5e-13 of it below, and fails one that is 2e-12 below."""
    assert meets("burden", chain(limits__burden=0.101 * (1.0 - 5e-13)))
    assert not meets("burden", chain(limits__burden=0.101 * (1.0 - 2e-12)))


def test_figures_that_are_shown() -> None:
    """Each limit shows its figure and what is allowed: 0.101 W of 0.5 W, 0.909 W of 1 W, 0.101 V of 0.2 V."""
    of = chain(**OVERLOAD)
    shown = {name: measured(name, of)[0] for name in ("rating", "overload", "burden")}
    assert (shown["rating"].value, shown["rating"].allowed) == near((0.101, 0.5))
    assert (shown["overload"].value, shown["overload"].allowed) == near((0.909, 1.0))
    assert (shown["burden"].value, shown["burden"].allowed) == near((0.101, 0.2))
