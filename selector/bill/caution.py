"""What a caution is: a name, and what it says of a candidate."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass

from selector.candidate import Candidate, Conditions


@dataclass(frozen=True, slots=True)
class Caution:
    """A caution; `texts` gives its sentences, none where it does not apply."""

    name: str
    texts: Callable[[Candidate, Conditions], tuple[str, ...]]
