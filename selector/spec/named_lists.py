"""Lists of part codes by kind: a mapping that cannot change and can be hashed."""

from __future__ import annotations

from collections.abc import Iterator, Mapping
from dataclasses import dataclass

from pydantic import GetCoreSchemaHandler
from pydantic_core import CoreSchema, core_schema


@dataclass(frozen=True, slots=True)
class NamedLists(Mapping[str, tuple[str, ...]]):
    """A mapping from a name to a list of texts, in the order in which it was written."""

    pairs: tuple[tuple[str, tuple[str, ...]], ...] = ()

    def __getitem__(self, name: str) -> tuple[str, ...]:
        """Return the list of a name; KeyError where there is none."""
        return dict(self.pairs)[name]

    def __iter__(self) -> Iterator[str]:
        """Return the names in order."""
        return (name for name, _ in self.pairs)

    def __len__(self) -> int:
        """Return how many names there are."""
        return len(self.pairs)

    @classmethod
    def __get_pydantic_core_schema__(cls, _source: object, _handler: GetCoreSchemaHandler) -> CoreSchema:
        """Let a model hold it as it is."""
        return core_schema.is_instance_schema(cls)
