"""Files that appear whole or not at all, and never where they would do harm."""

from __future__ import annotations

import os
import stat
from pathlib import Path

import pytest

from selector.app import output
from selector.app.output import target
from selector.errors import Unusable, UsageRefused


def test_file_is_written_whole(tmp_path: Path) -> None:
    """A file gets its text, with its line ends as they are, and nothing else is left in the folder."""
    place = target(tmp_path / "a.csv")
    assert place is not None
    place.write("a,b\r\n\N{OHM SIGN}\n")
    assert (tmp_path / "a.csv").read_bytes() == "a,b\r\n\N{OHM SIGN}\n".encode()
    assert [path.name for path in tmp_path.iterdir()] == ["a.csv"]


def test_file_that_is_there_keeps_its_rights(tmp_path: Path) -> None:
    """Writing over a file keeps who may read it; a new one has what the user's mask leaves."""
    old = tmp_path / "old"
    old.write_text("before", encoding="utf-8")
    old.chmod(0o640)
    for path in (old, tmp_path / "new"):
        place = target(path)
        assert place is not None
        place.write("after")
    mask = os.umask(0)
    os.umask(mask)
    assert stat.S_IMODE(old.stat().st_mode) == 0o640
    assert stat.S_IMODE((tmp_path / "new").stat().st_mode) == 0o666 & ~mask


def test_old_file_stays_where_the_new_one_fails(tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    """Where the disk is full the file is as it was, and no temporary file is left."""
    path = tmp_path / "a"
    path.write_text("before", encoding="utf-8")
    place = target(path)
    assert place is not None

    def full(_descriptor: int) -> None:
        raise OSError(28, "No space left on device")

    monkeypatch.setattr(output.os, "fsync", full)
    with pytest.raises(Unusable, match="cannot be written: No space left on device"):
        place.write("after")
    assert path.read_text("utf-8") == "before"
    assert list(tmp_path.iterdir()) == [path]


def test_link_is_written_through(tmp_path: Path) -> None:
    """A link stays a link; the file it names is written."""
    (tmp_path / "real").write_text("before", encoding="utf-8")
    (tmp_path / "link").symlink_to("real")
    place = target(tmp_path / "link")
    assert place is not None
    place.write("after")
    assert (tmp_path / "link").is_symlink()
    assert (tmp_path / "real").read_text("utf-8") == "after"


def test_input_is_never_written_over(tmp_path: Path) -> None:
    """An input is known by every name: itself, a link, a hard link, a way round, and a link to what is not there."""
    given = tmp_path / "in"
    given.write_text("kept", encoding="utf-8")
    (tmp_path / "link").symlink_to("in")
    (tmp_path / "hard").hardlink_to(given)
    (tmp_path / "sub").mkdir()
    (tmp_path / "later").symlink_to("new.db")
    for path in (given, tmp_path / "link", tmp_path / "hard", tmp_path / "sub" / ".." / "in"):
        with pytest.raises(UsageRefused, match="would be overwritten"):
            target(path, inputs=[given])
    with pytest.raises(UsageRefused, match="would be overwritten"):
        target(tmp_path / "later", inputs=[tmp_path / "new.db"])


def test_what_is_no_file_is_refused(tmp_path: Path) -> None:
    """A folder, a pipe and a device are wrong usage; a folder that is not there cannot be written."""
    os.mkfifo(tmp_path / "pipe")
    for path, said in ((tmp_path, "is a folder"), (tmp_path / "pipe", "a pipe"), (Path("/dev/null"), "is a device")):
        with pytest.raises(UsageRefused, match=said):
            target(path)
    with pytest.raises(Unusable, match="No such file or directory"):
        target(tmp_path / "no" / "a")


def test_names_of_the_standard_output() -> None:
    """`-` and /dev/stdout are no files."""
    assert target(Path("-")) is None
    assert target(Path("/dev/stdout")) is None


def test_fresh_file_must_not_be_there(tmp_path: Path) -> None:
    """Where nothing may be written over, a file and a link that leads nowhere are refused."""
    (tmp_path / "a").touch()
    (tmp_path / "b").symlink_to("nowhere")
    for name in ("a", "b"):
        with pytest.raises(UsageRefused, match="is there already"):
            target(tmp_path / name, fresh=True)
    assert target(tmp_path / "c", fresh=True) is not None
