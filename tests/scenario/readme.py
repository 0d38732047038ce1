"""The examples of README.md: what its console blocks say against what the commands print.

`python -m tests.scenario.readme` writes what the commands print now into README.md.
"""

from __future__ import annotations

import os
import re
import subprocess
import sys
import tempfile
from pathlib import Path

CHECKOUT = Path(__file__).resolve().parents[2]
README = CHECKOUT / "README.md"
BLOCK = re.compile(r"(?<=^```console\n)(.*?)(?=^```$)", re.DOTALL | re.MULTILINE)
SECONDS = re.compile(r"(?<=exact, )\d+(\.\d+)? m?s$", re.MULTILINE)


def printed(text: str, folder: Path) -> str:
    """Return README's text with every console block as its commands print it, run in `folder` in their order."""
    for name in ("scripts", "data"):
        link = folder / name
        if not link.exists():
            link.symlink_to(CHECKOUT / name)
    environment = {name: value for name, value in os.environ.items() if not name.startswith("SELECTOR_")}
    environment |= {"COLUMNS": "80", "PYTHONIOENCODING": "utf-8", "XDG_DATA_HOME": str(folder / "share")}
    environment.pop("FORCE_COLOR", None)
    return BLOCK.sub(lambda block: _run(block.group(1), folder, environment), text)


def _run(block: str, folder: Path, environment: dict[str, str]) -> str:
    shown = []
    for command in _commands(block):
        shown.append("$ " + command.replace("\n", "\n> ") + "\n")
        if command.startswith("export "):
            name, _, value = command.removeprefix("export ").partition("=")
            environment[name] = value
            continue
        done = subprocess.run(  # noqa: S602 - README's own commands, as a person types them
            command.replace("\\\n", " "),
            shell=True,
            executable="/bin/bash",
            cwd=folder,
            env=environment,
            capture_output=True,
            text=True,
            encoding="utf-8",
            check=False,
        )
        shown.append(done.stdout + done.stderr)
    return "".join(shown)


def _commands(block: str) -> list[str]:
    commands: list[str] = []
    for line in block.splitlines():
        if line.startswith("$ "):
            commands.append(line.removeprefix("$ "))
        elif line.startswith("> ") and commands and commands[-1].endswith("\\"):
            commands[-1] += "\n" + line.removeprefix("> ")
    return commands


def timeless(text: str) -> str:
    """Return the text without the times that a run took."""
    return SECONDS.sub("0.0 s", text)


def main() -> int:
    """Write README.md anew; return 0."""
    with tempfile.TemporaryDirectory() as folder:
        README.write_text(printed(README.read_text(encoding="utf-8"), Path(folder)), encoding="utf-8")
    return 0


if __name__ == "__main__":
    sys.exit(main())
