"""The copy beside the catalogue that is made before its tables are brought up to a later version."""

from __future__ import annotations

import os
import shutil
import sqlite3
from contextlib import closing
from pathlib import Path

from selector.catalogue.connection import address, connected
from selector.catalogue.faults import damaged, fault_of
from selector.errors import Fault, Unusable


def backup_path(path: Path, version: int) -> Path:
    """Return where the copy of an older version is kept: `NAME.v3-backup`."""
    return path.with_name(f"{path.name}.v{version}-backup")


def copy_before_migration(path: Path, version: int, where: str) -> Path:
    """Copy a catalogue beside itself: whole and on the disk under its name, or not at all.

    The caller holds the write lock, so that nobody writes between the copy and the change.

    Raises
    ------
    Unusable
        No copy can be made; then nothing may be migrated.
    """
    kept = backup_path(path, version)
    unfinished = kept.with_name(f"{kept.name}.part")
    try:
        unfinished.unlink(missing_ok=True)
        _copy(path, unfinished, where)
        shutil.copymode(path, unfinished)
        _sync(unfinished)
        unfinished.replace(kept)
        _sync(kept.parent)
    except (OSError, sqlite3.Error) as error:
        reason = fault_of(error, where).what if isinstance(error, sqlite3.Error) else error.strerror or str(error)
        what = f"is of version {version}, and no copy of it can be kept beside it before it is changed: {reason}"
        raise Unusable(Fault(where, what, "make room, or make its folder writable")) from error
    finally:
        unfinished.unlink(missing_ok=True)
    return kept


def _copy(path: Path, target: Path, where: str) -> None:
    """Copy what is committed, and check the copy."""
    with connected(path, "ro") as source, closing(sqlite3.connect(address(target, "rwc"), uri=True)) as copy:
        source.backup(copy)
        if copy.execute("PRAGMA integrity_check").fetchall() != [("ok",)]:
            raise damaged(where, "its copy fails integrity_check")


def _sync(path: Path) -> None:
    """Bring a file, or a folder's list of names, onto the disk."""
    handle = os.open(path, os.O_RDONLY)
    try:
        os.fsync(handle)
    finally:
        os.close(handle)
