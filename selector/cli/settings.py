"""What the options in front of a command set."""

from __future__ import annotations

from dataclasses import dataclass
from pathlib import Path

import typer


@dataclass(frozen=True, slots=True)
class Settings:
    """The catalogue's file, None for the default one."""

    catalogue: Path | None = None


def catalogue_of(context: typer.Context) -> Path | None:
    """Return the catalogue that a command works on."""
    settings = context.find_object(Settings)
    return settings.catalogue if settings is not None else None
