"""The lock files pin everything by hash and tell nothing about where they were made."""

from __future__ import annotations

import re
import tomllib
from pathlib import Path

import pytest

CHECKOUT = Path(__file__).resolve().parents[2]
LOCKS = ("requirements.txt", "requirements-dev.txt")
PIN = re.compile(r"([a-z0-9][a-z0-9-]*)==([0-9][0-9A-Za-z.+!-]*)(?: ; ([^\\]+?))?")
HASH = re.compile(r"--hash=sha256:[0-9a-f]{64}")


def requirements(lock: str) -> list[tuple[str, list[str]]]:
    """Return each requirement of a lock file, `name==version ; marker`, with its options."""
    text = (CHECKOUT / lock).read_text(encoding="utf-8")
    joined = re.sub(r"\s*\\\n\s*", " ", re.sub(r"^\s*#.*\n", "", text, flags=re.MULTILINE))
    found = []
    for line in joined.splitlines():
        if line.strip():
            head, *options = line.split(" --")
            found.append((head, [f"--{option}" for option in options]))
    return found


@pytest.mark.parametrize("lock", LOCKS)
def test_every_requirement_is_pinned_and_hashed(lock: str) -> None:
    """A requirement names one version and at least one sha256, and no option but hashes."""
    entries = requirements(lock)
    assert len(entries) > 10
    for head, options in entries:
        assert PIN.fullmatch(head), head
        assert options, head
        assert all(HASH.fullmatch(option) for option in options), head


@pytest.mark.parametrize("lock", LOCKS)
def test_no_index_host_or_path_stands_in_a_lock_file(lock: str) -> None:
    """No index, host, link or path of the machine that wrote the lock file stands in it."""
    text = (CHECKOUT / lock).read_text(encoding="utf-8")
    assert not re.search(r"https?:|file:|--(extra-)?index|--find-links|--trusted|(^|\s)/|@ |\.\./|\w/\w", text)


def test_development_lock_holds_the_run_time_lock() -> None:
    """Tests run with exactly the versions that users get."""
    development = {head for head, _ in requirements("requirements-dev.txt")}
    runtime = {head for head, _ in requirements("requirements.txt")}
    names = {head.split("==")[0] for head in runtime}
    differing = {head for head in runtime - development if not head.startswith("colorama==")}
    assert not differing
    assert names <= {head.split("==")[0] for head in development}


def test_every_declared_dependency_is_locked() -> None:
    """What pyproject.toml asks for stands in the lock files."""
    project = tomllib.loads((CHECKOUT / "pyproject.toml").read_text(encoding="utf-8"))
    for lock, wanted in (
        ("requirements.txt", project["project"]["dependencies"]),
        ("requirements-dev.txt", project["dependency-groups"]["dev"]),
    ):
        locked = {head.split("==")[0] for head, _ in requirements(lock)}
        assert {re.split(r"[^A-Za-z0-9-]", name)[0] for name in wanted} <= locked
