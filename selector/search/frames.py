"""What all combinations of a pair with one switch and one number of ranges share."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass

from selector.candidate import Design, Pairing
from selector.candidate.chain import Chain
from selector.limits import AmplifierCheck, PairCheck, ShuntCheck, SwitchCheck
from selector.parts import Amplifier, Shunt, Switch
from selector.search.assess import pairing_of
from selector.search.bench import Bench

EARLY = (AmplifierCheck, ShuntCheck, SwitchCheck, PairCheck)


@dataclass(frozen=True, slots=True)
class Frame:
    """A pair with a switch (None for one range) and a number of ranges."""

    shunt: Shunt
    amplifier: Amplifier
    switch: Switch | None
    range_count: int
    chain: Chain

    @property
    def pairing(self) -> Pairing:
        """Return the pair with its switch."""
        return self.chain.pairing

    @property
    def burden(self) -> float:
        """Return the use of the burden limit."""
        return float(self.pairing.burden_v / self.pairing.conditions.burden_limit_v)


def frames_of(bench: Bench, shunt: Shunt, amplifier: Amplifier) -> Iterator[Frame]:
    """Yield every frame of a pair that meets the held limits which need no resistor, the fewest ranges first."""
    for count in range(1, bench.conditions.ranges_most + 1):
        for switch in bench.shelf.switches if count > 1 else (None,):
            bare = Design((shunt,), amplifier, switch, None, None)
            if count == 1 or bare.law.switchable:
                pairing = pairing_of(bench.conditions, bare, count)
                frame = Frame(shunt, amplifier, switch, count, Chain(bare, pairing, (), frozenset(), filtered=False))
                if _stands(bench, frame.chain):
                    yield frame


def _stands(bench: Bench, chain: Chain) -> bool:
    checks = (check for limit in bench.limits for check in limit.checks if isinstance(check, EARLY))
    return all(measure is None or bool(measure.meets) for check in checks for measure in check.measured(chain))
