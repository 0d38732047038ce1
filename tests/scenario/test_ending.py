"""How the program ends: streams that are closed, full or of another encoding, and signals."""

from __future__ import annotations

import errno
import os
import pty
import shlex
import signal
import subprocess
import time
from pathlib import Path

import pytest

from tests.scenario.conftest import DATA, Run, command, surroundings

PUMP = DATA / "irrigation_pump.toml"
FULL = Path("/dev/full")


def shell(words: str, folder: Path, catalogue: Path, **more: str) -> subprocess.CompletedProcess[str]:
    """Run a line of the shell in which `$S` is the program."""
    environment = surroundings(folder, {"SELECTOR_CATALOGUE": str(catalogue), **more})
    return subprocess.run(
        ["/bin/bash", "-c", words.replace("$S", shlex.join(command()))],
        cwd=folder,
        env=environment,
        capture_output=True,
        text=True,
        stdin=subprocess.DEVNULL,
        check=False,
    )


@pytest.mark.skipif(not FULL.exists(), reason="no /dev/full on this system")
@pytest.mark.parametrize("words", ["series 4k7", "--help", "--version", "parts list", "parts template shunt"])
def test_full_output_ends_with_4(words: str, tmp_path: Path, loaded: Path) -> None:
    """An answer that cannot be written is one line on the standard error and the status 4."""
    done = shell(f"$S {words} > /dev/full", tmp_path, loaded)
    assert done.returncode == 4
    assert done.stderr == "standard output: cannot be written: No space left on device\n"


@pytest.mark.parametrize("words", ["series 4k7", "--help", "parts list --format csv"])
def test_closed_pipe_is_silent(words: str, tmp_path: Path, loaded: Path) -> None:
    """Where nobody reads the answer, the program ends without a word."""
    done = shell(f"set -o pipefail; (sleep 0.2; $S {words}; echo $? >&2) | true", tmp_path, loaded)
    assert done.stderr in ("141\n", "0\n")


@pytest.mark.parametrize("closed", ["<&-", ">&-", "2>&-", "<&- >&- 2>&-"])
@pytest.mark.parametrize("words", ["series 4k7", "parts show nothing", "load s.csv --dry-run"])
def test_closed_streams_are_survived(words: str, closed: str, tmp_path: Path, loaded: Path) -> None:
    """Whichever of the three streams is closed, the program ends with a status of its own and no traceback."""
    (tmp_path / "s.csv").write_text("kind,part\nresistor,R1\n", encoding="utf-8")
    done = shell(f"$S {words} {closed}", tmp_path, loaded)
    assert done.returncode in (0, 3, 4)
    assert "Traceback" not in done.stderr
    assert "Exception" not in done.stderr


@pytest.mark.parametrize("encoding", ["ascii", "latin-1", "cp1252", "utf-8"])
def test_every_encoding_is_served(encoding: str, tmp_path: Path, run_own: Run) -> None:
    """A character that the output's encoding lacks is written as an escape; nothing fails."""
    fields = ("part=Ω-1", "resistance=1k", "tolerance=1%", "tempco=25ppm/K")
    assert run_own("parts", "add", "resistor", *fields).returncode == 0
    done = shell("$S parts list", tmp_path, tmp_path / "own.db", PYTHONIOENCODING=encoding)
    assert done.returncode == 0, done.stderr
    assert ("Ω-1" if encoding == "utf-8" else "\\u03a9-1") in done.stdout


def test_no_control_character_of_data_is_printed(run_own: Run, tmp_path: Path) -> None:
    """What turns a terminal's head is written as an escape, in an answer and in an error."""
    fields = ("part=R1", "resistance=1k", "tolerance=1%", "tempco=25ppm/K", "note=a\x1b[31mb\u202ec")
    assert run_own("parts", "add", "resistor", *fields).returncode == 0
    assert "a\\x1b[31mb\\u202ec" in run_own("parts", "show", "R1").stdout
    done = run_own("parts", "show", "\x1b[2J")
    assert done.returncode == 3
    assert "\\x1b[2J" in done.stderr
    (tmp_path / "a\nb.toml").write_text("", encoding="utf-8")
    assert run_own("query", "a\nb.toml").stderr.startswith("a\\x0ab.toml, current.min: missing")


def opened_by_a_reader(pipe: Path) -> int:
    """Return the writing end of a pipe once somebody reads it; fail where nobody does within half a minute."""
    for _ in range(3000):
        try:
            return os.open(pipe, os.O_WRONLY | os.O_NONBLOCK)
        except OSError as error:
            if error.errno != errno.ENXIO:  # which says that nobody reads yet
                raise
            time.sleep(0.01)
    pytest.fail("nobody reads the pipe")


def wait_until_it_waits(process: subprocess.Popen[bytes]) -> None:
    """Return once a process has nothing to do: asleep at five looks in a row. A signal just before it would be late."""
    asleep = 0
    for _ in range(3000):
        state = Path(f"/proc/{process.pid}/stat").read_text(encoding="utf-8").rpartition(")")[2].split()[0]
        asleep = asleep + 1 if state == "S" else 0
        if asleep == 5:
            return
        time.sleep(0.01)
    pytest.fail("the command never waits")


@pytest.mark.parametrize(
    ("number", "status"),
    [(signal.SIGINT, 130), (signal.SIGTERM, 143), (signal.SIGHUP, 129)],
    ids=str,
)
def test_signal_ends_a_wait(number: signal.Signals, status: int, tmp_path: Path) -> None:
    """A command that waits for a pipe that never speaks ends by a signal, at once and without a word."""
    os.mkfifo(tmp_path / "pipe")
    process = subprocess.Popen(
        command("query", "pipe"),
        cwd=tmp_path,
        env=surroundings(tmp_path),
        stderr=subprocess.PIPE,
        stdout=subprocess.PIPE,
    )
    pipe = opened_by_a_reader(tmp_path / "pipe")
    wait_until_it_waits(process)
    process.send_signal(number)
    out, err = process.communicate(timeout=30)
    os.close(pipe)
    assert (process.returncode, out, err) == (status, b"", b"")


def test_global_options_stand_anywhere(run: Run, loaded: Path) -> None:
    """`--catalogue` and `--version` count before and behind the command; behind `--` they are words."""
    first = run("--catalogue", loaded, "parts", "list", "--kind", "switch", SELECTOR_CATALOGUE="nowhere")
    last = run("parts", "list", "--kind", "switch", f"--catalogue={loaded}", SELECTOR_CATALOGUE="nowhere")
    assert first.stdout == last.stdout != ""
    assert run("query", "--version").stdout == run("--version").stdout
    assert run("parts", "show", "--", "--version").returncode == 3


@pytest.mark.parametrize("words", ["", "query", "bill", "check", "load", "parts", "parts add", "spec", "fill", "demo"])
def test_help_needs_nothing(words: str, run: Run) -> None:
    """Help is given whatever the catalogue, the home and the terminal are."""
    done = run(*words.split(), "--help", SELECTOR_CATALOGUE="/dev/null", HOME="/nowhere", TERM="odd", COLUMNS="1")
    assert (done.returncode, done.stderr) == (0, "")
    assert done.stdout.startswith("Usage: selector")
    assert "\x1b" not in done.stdout


def test_spec_is_begun_shown_and_described(run: Run, tmp_path: Path) -> None:
    """A new spec is a file that `query` takes, with what was set; it is not written over; the schema is JSON."""
    done = run("spec", "new", "mine.toml", "--set", "limits.burden=80 mV", "--set", "title=Mine")
    assert (done.returncode, done.stdout) == (0, "")
    assert 'burden = "80 mV"' in (tmp_path / "mine.toml").read_text("utf-8")
    assert run("spec", "show", "mine.toml").stdout.count("80 mV") == 1
    assert run("query", "mine.toml", "--set", "limits.burden=1 uV").returncode == 1
    assert run("spec", "schema").stdout.startswith("{")
    assert run("spec", "new", "-").stdout.startswith("# What is to be measured.")


def test_new_spec_is_asked_for_on_a_terminal(tmp_path: Path) -> None:
    """On a terminal each required entry is asked for; a wrong answer is told and asked for again."""
    terminal, end = pty.openpty()
    words = command("spec", "new", "asked.toml", "--set", "current.min=1 mA")
    process = subprocess.Popen(words, cwd=tmp_path, env=surroundings(tmp_path), stdin=end, stdout=end, stderr=end)
    os.close(end)
    os.write(terminal, b"much\n1 A\n" + b"\n" * 20)
    shown = b""
    while True:
        try:
            block = os.read(terminal, 4096)
        except OSError:
            break
        if not block:
            break
        shown += block
    os.close(terminal)
    assert process.wait(timeout=10) == 0, shown
    assert b'"much" is no current' in shown
    text = (tmp_path / "asked.toml").read_text("utf-8")
    assert 'max = "1 A"' in text
    assert 'min = "1 mA"' in text
