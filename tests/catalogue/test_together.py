"""Several programs at one catalogue: locks, crashes, disks, and what a reader imports."""

from __future__ import annotations

import os
import shutil
import sqlite3
import subprocess
import sys
from collections.abc import Callable
from contextlib import AbstractContextManager
from pathlib import Path

import pytest

from selector.catalogue import connection, open_catalogue
from selector.catalogue.faults import fault_of
from selector.errors import Unusable
from selector.parts import KINDS, Part

Make = Callable[..., Part]
Sql = Callable[[Path], AbstractContextManager[sqlite3.Connection]]

LOAD = """
import sys
from pathlib import Path
from selector.catalogue import open_catalogue
from selector.parts import read_part
path, name, count, one_by_one = Path(sys.argv[1]), sys.argv[2], int(sys.argv[3]), sys.argv[4] == "add"
fields = {"resistance": "1 kohm", "tolerance": "1 %", "tempco": "50 ppm/K"}
parts = [read_part("resistor", {"part": f"{name}{i}", **fields}, where="") for i in range(count)]
print("ready", flush=True)
sys.stdin.readline()
with open_catalogue(path, write=True) as catalogue:
    if one_by_one:
        for part in parts:
            catalogue.add(part)
    else:
        print(len(catalogue.merge(parts).new))
"""


def started(path: Path, name: str, count: int, how: str) -> subprocess.Popen[str]:
    """Start a program that loads parts when it is told to."""
    command = [sys.executable, "-c", LOAD, str(path), name, str(count), how]
    return subprocess.Popen(command, stdin=subprocess.PIPE, stdout=subprocess.PIPE, stderr=subprocess.PIPE, text=True)


def all_at_once(programs: list[subprocess.Popen[str]]) -> list[str]:
    """Wait until all are ready, tell all to go, and return what they print; each must end well."""
    for program in programs:
        assert program.stdout is not None
        assert program.stdout.readline() == "ready\n"
    for program in programs:
        assert program.stdin is not None
        program.stdin.write("go\n")
        program.stdin.flush()
    ended = [program.communicate(timeout=60) for program in programs]
    assert [(program.returncode, errors) for program, (_, errors) in zip(programs, ended, strict=True)] == [
        (0, "") for _ in programs
    ]
    return [answer.strip() for answer, _ in ended]


@pytest.mark.parametrize("how", ["merge", "add"])
def test_writers_at_once_lose_nothing(tmp_path: Path, how: str) -> None:
    """Four programs that write at once into a file that is not there yet all succeed, and every part is there."""
    path = tmp_path / "parts.db"
    count = 200 if how == "merge" else 5
    all_at_once([started(path, name, count, how) for name in "ABCD"])
    with open_catalogue(path) as catalogue:
        assert len(catalogue.parts("resistor")) == 4 * count
    assert list(tmp_path.iterdir()) == [path]


def test_the_same_load_at_once_loads_once(tmp_path: Path) -> None:
    """Of three programs that load the same parts at once, one finds them new and two the same."""
    path = tmp_path / "parts.db"
    assert sorted(all_at_once([started(path, "A", 50, "merge") for _ in range(3)])) == ["0", "0", "50"]


def test_a_lock_held_for_good_is_in_use(
    stocked: Path, sql: Sql, resistor: Make, monkeypatch: pytest.MonkeyPatch
) -> None:
    """A writer gives up after its wait, saying that the catalogue is in use; readers are not held up by a writer."""
    monkeypatch.setattr(connection, "WAIT_S", 0.05)
    with sql(stocked) as other:
        other.execute("BEGIN IMMEDIATE")
        other.execute("UPDATE state SET changes = 99")
        with open_catalogue(stocked) as catalogue:
            assert len(catalogue.parts("resistor")) == 3
            assert catalogue.info().changes == 1
        words = r"in use by another process.*\(database is locked\)"
        with pytest.raises(Unusable, match=words), open_catalogue(stocked, write=True) as catalogue:
            catalogue.add(resistor("R9"))
        other.execute("ROLLBACK")
        other.execute("BEGIN EXCLUSIVE")
        with pytest.raises(Unusable, match="in use by another process"):
            open_catalogue(stocked)


def test_the_wait_for_a_lock_is_half_a_minute(stocked: Path) -> None:
    """Every connection waits 30 s for a lock, enforces keys and trusts no schema; a writer syncs every step."""
    with connection.connected(stocked, "rw") as opened:
        connection.make_durable(opened, 1)
        names = ("busy_timeout", "foreign_keys", "trusted_schema", "cell_size_check", "synchronous", "cache_spill")
        found = {name: opened.execute(f"PRAGMA {name}").fetchone()[0] for name in names}
    assert found == {
        "busy_timeout": 30_000,
        "foreign_keys": 1,
        "trusted_schema": 0,
        "cell_size_check": 1,
        "synchronous": 3,
        "cache_spill": 0,
    }


def test_an_open_reader_blocks_no_writer(stocked: Path, sql: Sql) -> None:
    """While a reader holds its catalogue open, another program can lock the file for itself alone."""
    with open_catalogue(stocked) as catalogue, sql(stocked) as other:
        assert len(catalogue.parts("resistor")) == 3
        other.execute("BEGIN EXCLUSIVE")
        assert other.in_transaction
        other.execute("UPDATE resistor SET note = 'held'")
        other.execute("COMMIT")
        assert other.execute("SELECT DISTINCT note FROM resistor").fetchall() == [("held",)]


@pytest.mark.parametrize("write", [False, True])
def test_a_crashed_writers_journal_is_rolled_back(
    stocked: Path,
    tmp_path: Path,
    sql: Sql,
    resistor: Make,
    write: bool,  # noqa: FBT001 - a parameter of the test
) -> None:
    """What a writer left half done when it was killed is undone by the next command, reader or writer."""
    crashed = tmp_path / "crashed" / "parts.db"
    crashed.parent.mkdir()
    with sql(stocked) as other:
        other.execute("PRAGMA cache_size = 1")
        other.execute("BEGIN IMMEDIATE")
        other.execute("UPDATE resistor SET description = printf('%.9000c', 'x')")
        shutil.copy(stocked, crashed)
        shutil.copy(f"{stocked}-journal", f"{crashed}-journal")
        other.execute("ROLLBACK")
    assert crashed.read_bytes() != stocked.read_bytes()
    with open_catalogue(crashed, write=write) as catalogue:
        if write:
            catalogue.add(resistor("R9"))
        assert catalogue.get("resistor", "R1") == resistor("R1", description="thin film")
    assert list(crashed.parent.iterdir()) == [crashed]


def test_a_load_that_fails_halfway_leaves_nothing(tmp_path: Path, stocked: Path, resistor: Make) -> None:
    """A part that the tables refuse, which only a wrong model could let through, takes the whole load back."""
    before = stocked.read_bytes()
    wrong = resistor("R8").model_copy(update={"tolerance": 2.0})
    with pytest.raises(Unusable, match="refuses a value"), open_catalogue(stocked, write=True) as catalogue:
        catalogue.merge([resistor("R7"), wrong])
    assert stocked.read_bytes() == before
    assert list(tmp_path.iterdir()) == [stocked]


def test_a_limit_on_file_sizes_is_a_disk_error(tmp_path: Path) -> None:
    """A file that may not grow gives exit status 4's fault, and the catalogue stays readable and as it was."""
    path = tmp_path / "parts.db"
    all_at_once([started(path, "A", 10, "merge")])
    before = path.read_bytes()
    limited = (
        "import resource, signal\n"
        "signal.signal(signal.SIGXFSZ, signal.SIG_IGN)\n"
        f"resource.setrlimit(resource.RLIMIT_FSIZE, ({len(before)}, {len(before)}))\n"
    )
    command = [sys.executable, "-c", limited + LOAD, str(path), "B", "3000", "merge"]
    ended = subprocess.run(command, input="go\n", capture_output=True, text=True, timeout=60, check=False)
    assert "Unusable" in ended.stderr
    assert "disk error, or a limit on file sizes; nothing was changed" in ended.stderr
    assert path.read_bytes() == before
    with open_catalogue(path) as catalogue:
        assert len(catalogue.parts("resistor")) == 10


@pytest.mark.skipif(os.geteuid() != 0 or sys.platform != "linux", reason="only root on Linux gives up its rights here")
def test_a_read_only_catalogue_is_read_and_not_written(stocked: Path) -> None:
    """Without the right to write a catalogue is read all the same, and writing says that it is read-only."""
    for each in (stocked.parent, *stocked.parent.parents):
        if str(each).startswith("/tmp/pytest"):  # noqa: S108 - the test's own folder
            each.chmod(0o755)
    stocked.chmod(0o444)
    program = (
        "import os, sys\nfrom pathlib import Path\nfrom selector.catalogue import open_catalogue\n"
        "import sqlite_utils\nos.setuid(65534)\n"
        "print(len(open_catalogue(Path(sys.argv[1])).parts('resistor')))\n"
        "open_catalogue(Path(sys.argv[1]), write=True).remove('resistor', 'R1')\n"
    )
    command = [sys.executable, "-c", program, str(stocked)]
    ended = subprocess.run(command, capture_output=True, text=True, timeout=60, check=False)
    assert ended.stdout == "3\n"
    assert "read-only, or its folder is" in ended.stderr


def test_reading_imports_nothing_heavy(stocked: Path) -> None:
    """A reader needs neither pandas nor sqlite-utils nor rapidfuzz nor numpy."""
    program = (
        "import sys\nfrom pathlib import Path\nfrom selector.catalogue import open_catalogue\n"
        "open_catalogue(Path(sys.argv[1])).parts('resistor')\n"
        "print([name for name in ('pandas', 'sqlite_utils', 'rapidfuzz', 'matplotlib') if name in sys.modules])\n"
    )
    command = [sys.executable, "-c", program, str(stocked)]
    ended = subprocess.run(command, capture_output=True, text=True, timeout=60, check=True)
    assert ended.stdout == "[]\n"


@pytest.mark.parametrize(
    ("name", "words"),
    [
        ("SQLITE_BUSY", "in use by another process"),
        ("SQLITE_BUSY_SNAPSHOT", "in use by another process"),
        ("SQLITE_LOCKED", "in use by another process"),
        ("SQLITE_READONLY", "read-only, or its folder is"),
        ("SQLITE_READONLY_DIRECTORY", "read-only, or its folder is"),
        ("SQLITE_FULL", "disk full; nothing was changed"),
        ("SQLITE_IOERR_WRITE", "disk error"),
        ("SQLITE_CORRUPT", "damaged"),
        ("SQLITE_CORRUPT_INDEX", "damaged"),
        ("SQLITE_NOTADB", "is no catalogue"),
        ("SQLITE_CANTOPEN", "cannot be opened"),
        ("SQLITE_CANTOPEN_ISDIR", "cannot be opened"),
        ("SQLITE_ERROR", "damaged"),
        ("", "damaged"),
    ],
)
def test_each_error_of_sqlite_is_said_plainly(name: str, words: str) -> None:
    """Every error name has its words and, behind them, what SQLite said."""
    error = sqlite3.OperationalError("as SQLite says")
    if name:
        error.sqlite_errorname = name
    fault = fault_of(error, "parts.db")
    assert fault.where == "parts.db"
    assert fault.what.startswith(words)
    assert fault.what.endswith("(as SQLite says)")
    assert fault.remedy


def test_many_rows_load_in_one_piece(tmp_path: Path, resistor: Make) -> None:
    """Five thousand parts are loaded at once and all read back."""
    path = tmp_path / "parts.db"
    one = resistor("R")
    with open_catalogue(path, write=True) as catalogue:
        catalogue.merge(one.model_copy(update={"part": f"R{number}"}) for number in range(5000))
    with open_catalogue(path) as catalogue:
        assert sum(len(catalogue.parts(kind)) for kind in KINDS) == 5000
