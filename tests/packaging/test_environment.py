"""scripts/selector makes the environment it needs, once, and says in one line why where it cannot."""

from __future__ import annotations

import hashlib
import json
import os
import signal
import subprocess
import sys
import zipfile
from collections.abc import Callable
from dataclasses import dataclass
from pathlib import Path

import pytest

SCRIPTS = Path(__file__).resolve().parents[2] / "scripts"
SYSTEM_PATH = "/usr/bin:/bin"
MAIN = """
import json, sys
import tiny
print(json.dumps({"arguments": sys.argv[1:], "tiny": tiny.VERSION, "path": sys.path}))
"""
PLAIN = """#!/bin/sh
exec "{python}" "$@"
"""
WITHOUT_ENSUREPIP = """#!/bin/sh
case "$*" in *ensurepip*) exit 1 ;; esac
exec "{python}" "$@"
"""
WITHOUT_PIP = """#!/bin/sh
case "$*" in *ensurepip* | *pip*) exit 1 ;; esac
exec "{python}" "$@"
"""
TOO_OLD = """#!/bin/sh
case "$*" in *print*) echo "Python 3.9" ;; *) exit 1 ;; esac
"""


@dataclass(frozen=True)
class Checkout:
    """A checkout of two files beside the real scripts, with one package of its own in its lock file."""

    root: Path

    @property
    def environment(self) -> Path:
        """Return where the environment is made."""
        return self.root / ".venv"

    def lock(self, version: str, digest: str | None = None) -> None:
        """Write a lock file that asks for one version of the package `tiny`."""
        wheel = self.root.parent / f"tiny-{version}-py3-none-any.whl"
        with zipfile.ZipFile(wheel, "w") as archive:
            archive.writestr("tiny.py", f"VERSION = {version!r}\n")
            archive.writestr(
                f"tiny-{version}.dist-info/METADATA", f"Metadata-Version: 2.1\nName: tiny\nVersion: {version}\n"
            )
            archive.writestr(
                f"tiny-{version}.dist-info/WHEEL",
                "Wheel-Version: 1.0\nGenerator: test\nRoot-Is-Purelib: true\nTag: py3-none-any\n",
            )
            archive.writestr(f"tiny-{version}.dist-info/RECORD", "")
        digest = digest or hashlib.sha256(wheel.read_bytes()).hexdigest()
        line = f"tiny @ {wheel.as_uri()} --hash=sha256:{digest}\n"
        (self.root / "requirements.txt").write_text(line, encoding="utf-8")

    def pythons(self, script: str) -> Path:
        """Return a folder in which every name of an interpreter is a script."""
        folder = self.root.parent / "interpreters"
        folder.mkdir(exist_ok=True)
        for name in ("python3", "python3.11", "python3.12", "python3.13", "python3.14"):
            (folder / name).write_text(script.format(python=Path(sys.executable).resolve()), encoding="utf-8")
            (folder / name).chmod(0o755)
        return folder

    def begin(self, *arguments: str, script: str = PLAIN, start: Path | None = None) -> subprocess.Popen[str]:
        """Start scripts/selector from another folder."""
        path = f"{self.pythons(script)}:{SYSTEM_PATH}"
        return subprocess.Popen(
            [start or self.root / "scripts" / "selector", *arguments],
            cwd=self.root.parent,
            env={**os.environ, "PATH": path},
            stdin=subprocess.DEVNULL,
            stdout=subprocess.PIPE,
            stderr=subprocess.PIPE,
            text=True,
            start_new_session=True,
        )

    def run(self, *arguments: str, script: str = PLAIN, start: Path | None = None) -> tuple[int, str, list[str]]:
        """Return exit status, stdout and the lines of stderr of scripts/selector."""
        process = self.begin(*arguments, script=script, start=start)
        out, err = process.communicate(timeout=120)
        return process.returncode, out, err.splitlines()


@pytest.fixture
def make(tmp_path: Path) -> Callable[[], Checkout]:
    """Return what makes a checkout in a folder whose name has a space."""

    def made() -> Checkout:
        checkout = Checkout(tmp_path / "check out")
        (checkout.root / "selector").mkdir(parents=True)
        (checkout.root / "selector" / "__init__.py").touch()
        (checkout.root / "selector" / "__main__.py").write_text(MAIN, encoding="utf-8")
        (checkout.root / "scripts").mkdir()
        for name in ("selector", "environment.sh"):
            (checkout.root / "scripts" / name).write_bytes((SCRIPTS / name).read_bytes())
            (checkout.root / "scripts" / name).chmod(0o755)
        checkout.lock("1.0")
        return checkout

    return made


def test_first_start_then_later_starts_then_a_changed_lock(make: Callable[[], Checkout]) -> None:
    """The first start sets up with one line, later ones go straight on, a changed lock file is followed."""
    checkout = make()
    status, out, lines = checkout.run("demo", "two words", "")
    assert (status, len(lines)) == (0, 1), lines
    answer = json.loads(out)
    assert answer["arguments"] == ["demo", "two words", ""]
    assert str(checkout.root) in answer["path"]
    assert "" not in answer["path"]

    link = checkout.root.parent / "link"
    link.symlink_to(checkout.root / "scripts" / "selector")
    assert checkout.run("again", script=TOO_OLD, start=link)[::2] == (0, [])

    checkout.lock("2.0")
    status, out, lines = checkout.run()
    assert (status, json.loads(out)["tiny"], len(lines)) == (0, "2.0", 1)


def test_two_first_starts_at_once(make: Callable[[], Checkout]) -> None:
    """Of two first starts one sets up and the other waits; both give their answer."""
    checkout = make()
    both = [checkout.begin(name) for name in ("one", "two")]
    answers = [process.communicate(timeout=120) for process in both]
    assert [process.returncode for process in both] == [0, 0], answers
    assert [json.loads(out)["arguments"] for out, _ in answers] == [["one"], ["two"]]
    assert sum("setting up" in err for _, err in answers) == 1


def test_interrupted_setup_is_made_anew(make: Callable[[], Checkout]) -> None:
    """A set-up killed on its way leaves nothing that a later start takes for complete."""
    checkout = make()
    process = checkout.begin()
    assert process.stderr is not None
    assert "setting up" in process.stderr.readline()
    os.killpg(process.pid, signal.SIGKILL)
    process.communicate()
    assert not (checkout.environment / "locked").exists()
    status, out, lines = checkout.run("after")
    assert (status, json.loads(out)["arguments"], len(lines)) == (0, ["after"], 1)


def test_system_pip_fills_the_environment_where_ensurepip_is_missing(make: Callable[[], Checkout]) -> None:
    """Without ensurepip the system's pip does its work; without that too, one line names the Debian package."""
    checkout = make()
    status, out, lines = checkout.run(script=WITHOUT_PIP)
    assert (status, out) == (4, "")
    assert len(lines) == 1
    assert "python3-venv" in lines[0]
    has_pip = subprocess.run([Path(sys.executable).resolve(), "-c", "import pip"], capture_output=True, check=False)
    if has_pip.returncode != 0:
        pytest.skip("the interpreter of this environment has no pip beside it")
    status, out, lines = checkout.run(script=WITHOUT_ENSUREPIP)
    assert (status, json.loads(out)["tiny"], len(lines)) == (0, "1.0", 1)


def test_old_python_is_told_in_one_line(make: Callable[[], Checkout]) -> None:
    """Python 3.9 ends with exit 4 and one line that names both versions."""
    checkout = make()
    status, out, lines = checkout.run(script=TOO_OLD)
    assert (status, out, len(lines)) == (4, "", 1)
    assert "3.11" in lines[0]
    assert "3.9" in lines[0]


def test_foreign_environment_is_left_alone(make: Callable[[], Checkout]) -> None:
    """A .venv that somebody else made is neither used nor deleted."""
    checkout = make()
    checkout.environment.mkdir()
    (checkout.environment / "theirs").touch()
    status, out, lines = checkout.run()
    assert (status, out, len(lines)) == (4, "", 1)
    assert (checkout.environment / "theirs").exists()


def test_package_with_another_hash_is_refused(make: Callable[[], Checkout]) -> None:
    """A package whose bytes are not those of the lock file ends the set-up with exit 4 and the reason."""
    checkout = make()
    checkout.lock("1.0", digest="0" * 64)
    status, out, lines = checkout.run()
    assert (status, out) == (4, "")
    assert "requirements.txt could not be installed" in lines[-1]
    assert not (checkout.environment / "locked").exists()
