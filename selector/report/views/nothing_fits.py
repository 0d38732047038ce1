"""Why nothing fits, and what came nearest."""

from __future__ import annotations

from collections.abc import Iterator

from selector.candidate import Candidate
from selector.report.answers.query import Shortlist
from selector.report.document import Block, Column, Lines, Notes, Table
from selector.report.told import Json
from selector.report.views.candidate import bill_block, cautions_block, error_block, name_of, ranges_block
from selector.report.views.data import candidate_data
from selector.report.words import many, number, per_cent
from selector.spec import Spec
from selector.units import CURRENT, POWER, VOLTAGE, shown


def nothing_fits_data(answer: Shortlist) -> Json:
    """Return `nothing_fits` of the JSON, null where something fits."""
    found = answer.nothing_fits
    if found is None:
        return None
    return {
        "pairs": found.pairs,
        "blocked": dict(found.blocked),
        "nearest": [] if answer.nearest is None else [candidate_data(answer.nearest)],
        "relax": [],
        "ways_out": [],
    }


def nothing_fits_blocks(answer: Shortlist) -> Iterator[Block]:
    """Yield which limits stop how many pairs, what was left out before, and the nearest combination."""
    found = answer.nothing_fits
    pairs = 0 if found is None else found.pairs
    none = "none meets" if pairs != 1 else "it does not meet"
    gist = f"Nothing fits: {many(pairs, 'pair')} of shunt and amplifier, {none} all limits."
    yield Lines((gist if pairs else "Nothing fits: there is no pair of shunt and amplifier to try.",))
    blocked = () if found is None else found.blocked
    yield Table(
        (Column("stopped by"), Column("pairs", "right")),
        tuple((name, number(count)) for name, count in blocked if count),
    )
    left_out = tuple((each.kind, each.reason, number(each.count)) for each in answer.searched.left_out)
    columns = (Column("kind"), Column("reason"), Column("parts", "right"))
    yield Table(columns, left_out, heading="left out beforehand")
    if answer.nearest is None:
        yield Lines(("No combination meets all limits but power, burden, headroom and error.",) if pairs else ())
        return
    nearest = answer.nearest.candidate
    yield Lines((f"Nearest: {name_of(nearest)}.",))
    yield Notes("it is over", tuple(_over(nearest, answer.spec)))
    yield ranges_block(nearest)
    yield error_block(nearest, answer.spec)
    yield bill_block(answer.nearest)
    yield cautions_block(answer.nearest)
    yield Lines(("See every figure of it: the same command with --format json, under nothing_fits, nearest.",))


def _over(candidate: Candidate, spec: Spec) -> Iterator[str]:
    """Yield a sentence for each of the ranked limits that the candidate does not meet."""
    uses, limits = candidate.uses, spec.limits
    if uses.power > 1.0:
        have, most = shown(candidate.power_w, POWER), shown(limits.power, POWER)
        yield f"power: {have} where {most} is allowed, {per_cent(uses.power - 1.0)} over."
    if uses.burden > 1.0:
        have, most = shown(candidate.burden_v, VOLTAGE), shown(limits.burden, VOLTAGE)
        yield f"burden: {have} where {most} is allowed, {per_cent(uses.burden - 1.0)} over."
    if uses.headroom > 1.0:
        have, least = per_cent(candidate.headroom_frac), per_cent(limits.headroom)
        yield f"headroom: {have} where {least} is wanted, {per_cent(uses.headroom - 1.0)} over."
    if uses.error > 1.0:
        limiting = candidate.limiting
        yield (
            f"error: {per_cent(uses.error - 1.0)} over what is allowed at {shown(limiting.current_a, CURRENT)} in "
            f"range {limiting.range}, most of it {limiting.term}."
        )
