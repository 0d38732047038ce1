"""What `spec show` answers."""

from __future__ import annotations

from dataclasses import dataclass
from typing import TYPE_CHECKING, ClassVar

if TYPE_CHECKING:
    from selector.spec import Spec


@dataclass(frozen=True, slots=True)
class SpecShown:
    """Answer of `spec show`."""

    view: ClassVar[str] = "spec"
    spec: Spec
