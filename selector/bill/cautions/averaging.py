"""The averaged reading is slower than the bandwidth that the spec asks for."""

from __future__ import annotations

from selector.bill.caution import Caution
from selector.bill.corner import slow_corner_hz
from selector.candidate import Candidate, Conditions
from selector.units import COUNT, FREQUENCY, TIME, shown


def _texts(candidate: Candidate, conditions: Conditions) -> tuple[str, ...]:
    """Where average / f_c > 1 / f_req, with the slowest corner of all ranges."""
    slowest_hz = slow_corner_hz(candidate, conditions)
    taken_s = conditions.average / slowest_hz
    if taken_s * conditions.bandwidth_hz <= 1.0:
        return ()
    time, bandwidth = shown(taken_s, TIME), shown(conditions.bandwidth_hz, FREQUENCY)
    if conditions.average == 1:
        return (f"One reading takes {time}: it does not follow {bandwidth}.",)
    count = shown(conditions.average, COUNT)
    return (f"Averaging {count} readings takes {time}: the averaged reading no longer follows {bandwidth}.",)


CAUTION = Caution("averaging", _texts)
