"""What a measurement on a circuit is: a deck, the figure that follows from what it prints, and our own figure."""

from __future__ import annotations

from collections.abc import Callable, Iterable, Mapping
from dataclasses import dataclass

from selector.budget import TERMS, Size
from tests.circuit.benches import BENCHES, Bench
from tests.circuit.networks import circuit

Printed = Mapping[str, float]
EXPRESSIONS = {"out": "v(out)-v(zero)", "pin": "v(pin)-v(zero)", "in": "v(line)-v(base)"}
VALUE_AT = {"r": 3, "v": 3, "i": 3, "g": 5}


@dataclass(frozen=True, slots=True)
class Measure:
    """A quantity that both a circuit and the program give.

    Ours may lie `below` to `above` the circuit's, as fractions of it. A circuit run again gives the recorded figure
    to `repeat`, a fraction too.
    """

    quantity: str
    deck: Callable[[Bench], str]
    figure: Callable[[Bench, Printed], float]
    ours: Callable[[Bench], float]
    below: float
    above: float
    repeat: float
    benches: tuple[Bench, ...]


def where(applies: Callable[[Bench], bool]) -> tuple[Bench, ...]:
    """Return the designs that a quantity is measured on."""
    return tuple(bench for bench in BENCHES.values() if applies(bench))


def control(title: str, lines: Iterable[str], commands: Iterable[str]) -> str:
    """Return a whole deck: elements, and what the simulator is to do with all digits printed."""
    return "\n".join([title, *lines, ".control", "set numdgt=13", *commands, "quit", ".endc", ".end", ""])


def dc_deck(
    bench: Bench,
    cases: Mapping[str, Mapping[str, float]],
    *,
    extra: Iterable[str] = (),
    expressions: Mapping[str, str] = EXPRESSIONS,
) -> str:
    """Return the deck of several operating points of one circuit.

    A case names the elements that are changed for it, with their value; all others rest as they are. Each case
    prints its expressions as `case_expression`.
    """
    lines = [*circuit(bench), *extra]
    resting = at_rest(lines)
    commands = []
    for case, changes in cases.items():
        commands += [_alter(name, value) for name, value in changes.items()]
        commands.append("op")
        for name, expression in expressions.items():
            commands += [f"let {case}_{name} = {expression}", f"print {case}_{name}"]
        commands += [_alter(name, resting[name]) for name in changes]
    return control(f"{bench.name}: operating points", lines, commands)


def at_rest(lines: Iterable[str]) -> dict[str, float]:
    """Return the value of every element with one, by its name in small letters."""
    words = (line.lower().split() for line in lines)
    return {each[0]: float(each[VALUE_AT[each[0][0]]]) for each in words if each[0][0] in VALUE_AT}


def _alter(name: str, value: float) -> str:
    target = f"@{name}[gain]" if name.startswith("g") else name
    return f"alter {target} = {value!r}"


def change(printed: Printed, what: str, on: str, off: str = "rest") -> float:
    """Return by how much an expression differs between two cases."""
    return printed[f"{on}_{what}"] - printed[f"{off}_{what}"]


def transfer(printed: Printed, on: str = "load", off: str = "rest") -> float:
    """Return output over input between two cases, V/V."""
    return change(printed, "out", on, off) / change(printed, "in", on, off)


def load(bench: Bench) -> dict[str, float]:
    """Return the change that makes the load draw the largest current."""
    return {"iload": bench.load_a}


def sizes_of(bench: Bench, term: str) -> tuple[Size, ...]:
    """Return the program's own sizes of an error term."""
    return next(each for each in TERMS if each.name == term).sizes(bench.at)
