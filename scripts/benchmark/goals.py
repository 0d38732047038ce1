"""What the search is to reach, each goal beside the figure that was reached."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import asdict, dataclass, replace
from math import inf, isfinite

from scripts.benchmark.case import EVERY_PAIR, Case, Outcome
from scripts.benchmark.catalogue import TIGHTNESSES, Sizes, Tightness
from scripts.benchmark.runner import Runner
from scripts.benchmark.table import Row

YARDSTICK = Case("loose", 1, Sizes(12, 12, 1, 14, 10), yardstick=True)  # 2 million combinations, of all six laws
MANY_PAIRS = Sizes(500, 200)
MOST_MB = 500.0
RATE, TIME = 1e11, 5.0  # of catalogue X beside the yardstick


@dataclass(frozen=True, slots=True)
class Grown:
    """A catalogue or spec and a larger one: the larger may take `most` times as long."""

    goal: str
    name: str
    small: Case
    large: Case
    most: float


def rows(runner: Runner, *, full: bool = False) -> Iterator[Row]:
    """Measure every goal of the search in turn; `full` adds all three specs to each, and the largest catalogue."""
    yield from _beside_the_yardstick(runner)
    for grown in (each for tightness in (TIGHTNESSES if full else ("middling",)) for each in _growing(tightness)):
        yield _ratio(runner, grown)
    if full:
        yield from _largest(runner)
    yield _memory(runner)


def _beside_the_yardstick(runner: Runner) -> Iterator[Row]:
    """Yield catalogue X beside the yardstick: goals 2 and 3."""
    yardstick = runner.of(YARDSTICK)
    rate = f"{yardstick.nominal:.3g} combinations in {_seconds(yardstick, runner)}, {yardstick.nominal_per_s:.3g} /s"
    yield Row("", "yardstick: numpy, one range, each in full", rate)
    for tightness in TIGHTNESSES:
        outcome = runner.of(Case(tightness))
        share = outcome.nominal_per_s / yardstick.nominal_per_s
        done = f"{share:.2g} x ({outcome.nominal:.3g} combinations in {_seconds(outcome, runner)})"
        done = done if isfinite(outcome.seconds) else _times(inf, runner)
        yield Row("2", f"X, {tightness}: combinations/s", done, f">= {RATE:.0e} x", share >= RATE)
        times = outcome.seconds / yardstick.seconds
        reached = f"{_times(times, runner)}, {outcome.peak_mb:.0f} MB"
        yield Row("3", f"X, {tightness}: time", reached, f"<= {TIME:g} x", times <= TIME)


def _growing(tightness: Tightness) -> Iterator[Grown]:
    """Yield what grows, and by how much the time may: goals 4 to 7."""
    base = Case(tightness)

    def sized(case: Case, **sizes: int) -> Case:
        return replace(case, sizes=replace(case.sizes, **sizes))

    for most in (1, 2, 3):
        # With one range only the loose spec can be met.
        case = replace(base, most=most, tightness="loose" if most == 1 else tightness)
        hundred, thousand, many = (sized(case, resistors=count) for count in (100, 1000, 5000))
        yield Grown("4", f"resistors 100 -> 1000, K = {most}, {case.tightness}", hundred, thousand, 12.0)
        yield Grown("4", f"resistors 1000 -> 5000, K = {most}, {case.tightness}", thousand, many, 8.0)
    pairs = MANY_PAIRS.shunts * MANY_PAIRS.amplifiers / (base.sizes.shunts * base.sizes.amplifiers)
    yield Grown("5", f"{pairs:.0f} x the pairs, {tightness}", base, replace(base, sizes=MANY_PAIRS), 20.0)
    one, twenty = sized(base, switches=1), sized(base, switches=20)
    yield Grown("5", f"switches 1 -> 20, {tightness}", one, twenty, 6.0)
    few, eighty = sized(base, capacitors=5), sized(base, capacitors=80)
    yield Grown("5", f"capacitors 5 -> 80, {tightness}", few, eighty, 2.5)
    two, four = replace(base, most=2), replace(base, most=4)
    yield Grown("5", f"K 2 -> 4, {tightness}", two, four, 5.0)
    yield Grown("6", f"every pair listed, {tightness}", base, replace(base, top=EVERY_PAIR), 100.0)
    yield Grown("7", f"near duplicates, {tightness}", base, replace(base, near=True), 40.0)


def _ratio(runner: Runner, grown: Grown) -> Row:
    """Return how many times as long the larger takes; not met where either does not end."""
    small = runner.of(grown.small)
    if not isfinite(small.seconds):
        return Row(grown.goal, grown.name, f"the smaller {_times(inf, runner)}", f"<= {grown.most:g} x", met=False)
    large = runner.of(grown.large)
    times = large.seconds / small.seconds
    reached = f"{_times(times, runner)} ({_seconds(small, runner)} -> {_seconds(large, runner)})"
    if isfinite(times) and not (small.found and large.found):
        reached += ", nothing fits"
    return Row(grown.goal, grown.name, reached, f"<= {grown.most:g} x", times <= grown.most)


def _largest(runner: Runner) -> Iterator[Row]:
    for tightness in TIGHTNESSES:
        outcome = runner.of(Case(tightness, 4, MANY_PAIRS))
        reached = f"{outcome.nominal:.3g} combinations in {_seconds(outcome, runner)}, {outcome.peak_mb:.0f} MB"
        yield Row("", f"500 x 200 x 10 x 500 parts, K = 4, {tightness}", reached)


def _memory(runner: Runner) -> Row:
    """Return the most memory of all searches so far: goal 8."""
    peaks = {case: outcome.peak_mb for case, outcome in runner.outcomes.items() if not case.yardstick}
    case = max(peaks, key=lambda each: peaks[each])
    sizes = ", ".join(f"{count} {name}" for name, count in asdict(case.sizes).items())
    reached = f"{peaks[case]:.0f} MB, {case.tightness}, K = {case.most}, {sizes}"
    return Row("8", "most memory of any of these", reached, f"< {MOST_MB:g} MB", peaks[case] < MOST_MB)


def _seconds(outcome: Outcome, runner: Runner) -> str:
    return f"{outcome.seconds:.3g} s" if isfinite(outcome.seconds) else f"> {runner.limit_s:g} s"


def _times(times: float, runner: Runner) -> str:
    return f"{times:.3g} x" if isfinite(times) else f"not within {runner.limit_s:g} s"
