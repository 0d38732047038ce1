"""Where an answer goes: to the standard output, or to a file that appears whole or not at all."""

from __future__ import annotations

import contextlib
import errno
import os
import secrets
import stat
from collections.abc import Iterable
from dataclasses import dataclass
from pathlib import Path

from selector.app.naming import shown_path
from selector.errors import Fault, Unusable, UsageRefused

STDOUT = ("-", "/dev/stdout", "/dev/fd/1", "/proc/self/fd/1")
_ANOTHER = "name another file"


@dataclass(frozen=True, slots=True)
class Target:
    """A file that may be written."""

    path: Path

    def write(self, text: str) -> None:
        """Write the whole file: a temporary one beside it first, flushed to the disk, then renamed onto it.

        Raises
        ------
        Unusable
            It cannot be written; what was there stays as it was.
        """
        final = Path(os.path.realpath(self.path))
        temporary = final.with_name(f".{secrets.token_hex(8)}.tmp")
        try:
            _write_new(temporary, text, final)
            temporary.replace(final)
        except OSError as error:
            raise cannot_write(self.path, error) from error
        finally:
            with contextlib.suppress(OSError):
                temporary.unlink(missing_ok=True)


def target(path: Path, *, inputs: Iterable[Path] = (), fresh: bool = False) -> Target | None:
    """Return the file that an answer may be written to, None where the path means the standard output.

    Parameters
    ----------
    path : Path
        As the user named it.
    inputs : Iterable[Path]
        Files that must not be overwritten: what is read, and the catalogue.
    fresh : bool
        Whether nothing may be there yet.

    Raises
    ------
    UsageRefused
        The path is one of the inputs, by whatever name or link, or is no regular file.
    """
    if str(path) in STDOUT:
        return None
    where = shown_path(path)
    try:
        mode = path.stat().st_mode
    except FileNotFoundError:
        mode = None
    except (OSError, ValueError) as error:
        raise cannot_write(path, error) from error
    if mode is None and not Path(os.path.realpath(path)).parent.is_dir():
        raise cannot_write(path, FileNotFoundError(errno.ENOENT, os.strerror(errno.ENOENT)))
    if mode is not None and not stat.S_ISREG(mode):
        sort = "a folder" if stat.S_ISDIR(mode) else "a device or a pipe"
        raise UsageRefused(Fault(where, f"is {sort}, where a file is to be written", _ANOTHER))
    if any(same_file(path, each) for each in inputs):
        raise UsageRefused(Fault(where, "is read by this command and would be overwritten", _ANOTHER))
    if fresh and (mode is not None or path.is_symlink()):
        raise UsageRefused(Fault(where, "is there already and is not overwritten", f"{_ANOTHER}, or remove it first"))
    return Target(path)


def same_file(one: Path, other: Path) -> bool:
    """Return whether two paths are one file, through links and `..`, or would be once they exist."""
    try:
        return one.samefile(other)
    except (OSError, ValueError):
        return os.path.realpath(one) == os.path.realpath(other)


def cannot_write(path: Path, error: OSError | ValueError) -> Unusable:
    """Return the error of an output that cannot be written."""
    reason = getattr(error, "strerror", None) or str(error)
    return Unusable(
        Fault(shown_path(path), f"cannot be written: {reason}", "see that its folder is there, and has room")
    )


def _write_new(path: Path, text: str, like: Path) -> None:
    """Write a file that is not there yet, down to the disk, with the rights of the file it will take the place of."""
    descriptor = os.open(path, os.O_WRONLY | os.O_CREAT | os.O_EXCL, 0o666)
    with os.fdopen(descriptor, "w", encoding="utf-8", errors="backslashreplace", newline="") as file:
        with contextlib.suppress(FileNotFoundError):
            os.fchmod(descriptor, stat.S_IMODE(like.stat().st_mode))
        file.write(text)
        file.flush()
        os.fsync(descriptor)
