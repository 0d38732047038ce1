"""What all combinations of a pair with one switch and one number of ranges share."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass

from selector.candidate import Design, Pairing
from selector.candidate.chain import Chain
from selector.limits import AmplifierCheck, Limit, PairCheck, ShuntCheck, SwitchCheck
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


def every_frame(bench: Bench, shunt: Shunt, amplifier: Amplifier) -> Iterator[Frame]:
    """Yield every frame of a pair that the gain law can have, the fewest ranges first."""
    for count in range(1, bench.conditions.ranges_most + 1):
        for switch in bench.shelf.switches if count > 1 else (None,):
            bare = Design((shunt,), amplifier, switch, None, None)
            if count == 1 or bare.law.switchable:
                pairing = pairing_of(bench.conditions, bare, count)
                yield Frame(shunt, amplifier, switch, count, Chain(bare, pairing, (), frozenset(), filtered=False))


def frames_of(bench: Bench, shunt: Shunt, amplifier: Amplifier) -> Iterator[Frame]:
    """Yield every frame that meets the held limits which need no resistor."""
    for frame in every_frame(bench, shunt, amplifier):
        if all(stands(limit, frame.chain) for limit in bench.limits):
            yield frame


def stands(limit: Limit, chain: Chain) -> bool:
    """Return whether a frame meets a limit, as far as that can be judged without a resistor."""
    checks = (check for check in limit.checks if isinstance(check, EARLY))
    return all(measure is None or bool(measure.meets) for check in checks for measure in check.measured(chain))
