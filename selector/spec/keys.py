"""Every key of the spec, in order: one table for reading, schema, template and what is shown."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass

from pydantic import BaseModel
from pydantic.fields import FieldInfo

from selector.spec.demand import Band
from selector.spec.holds import Holds
from selector.spec.model import Spec
from selector.spec.rules import Value


@dataclass(frozen=True, slots=True)
class Key:
    """One key: its dotted name, what it holds, and its default where it is not required.

    `default` is None for an optional key without a default.
    """

    name: str
    holds: Holds
    required: bool
    default: Value

    @property
    def section(self) -> str:
        """Return the table the key stands in, empty for one above all tables."""
        return self.name.rpartition(".")[0]

    @property
    def leaf(self) -> str:
        """Return the key within its table."""
        return self.name.rpartition(".")[2]

    @property
    def meaning(self) -> str:
        """Return what the key is, in one line."""
        return self.holds.meaning


def _keys_of(model: type[BaseModel], section: str) -> Iterator[Key]:
    for field_name, field in model.model_fields.items():
        name = f"{section}{field.alias or field_name}"
        if isinstance(field.annotation, type) and issubclass(field.annotation, BaseModel):
            yield from _keys_of(field.annotation, f"{name}.")
        else:
            yield _key(name, field)


def _key(name: str, field: FieldInfo) -> Key:
    holds = next(each for each in field.metadata if isinstance(each, Holds))
    required = field.is_required()
    return Key(name, holds, required, None if required else field.default)


KEYS: dict[str, Key] = {key.name: key for key in _keys_of(Spec, "")}
SECTIONS: tuple[str, ...] = tuple(dict.fromkeys(key.section for key in KEYS.values() if key.section))
BAND_KEYS: dict[str, Key] = {key.name: key for key in _keys_of(Band, "")}
