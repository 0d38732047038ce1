"""The wheel carries all that a user needs, and works from an empty folder."""

from __future__ import annotations

import os
import subprocess
import sys
import sysconfig
import venv
import zipfile
from pathlib import Path

import pytest

CHECKOUT = Path(__file__).resolve().parents[2]


@pytest.fixture(scope="module")
def wheel(tmp_path_factory: pytest.TempPathFactory) -> Path:
    """Build the wheel from this checkout."""
    folder = tmp_path_factory.mktemp("wheel")
    command = [sys.executable, "-m", "build", "--wheel", "--no-isolation", "--outdir", str(folder), str(CHECKOUT)]
    built = subprocess.run(command, capture_output=True, text=True, check=False)
    assert built.returncode == 0, built.stderr
    return next(folder.glob("shunt_selector-*-py3-none-any.whl"))


@pytest.fixture(scope="module")
def installed(wheel: Path, tmp_path_factory: pytest.TempPathFactory) -> Path:
    """Install the wheel alone into a new environment and return that."""
    folder = tmp_path_factory.mktemp("environment")
    venv.create(folder, symlinks=True)
    pip = [sys.executable, "-m", "pip", "--python", str(folder / "bin" / "python")]
    command = [*pip, "install", "--no-deps", "--no-index", "--quiet", str(wheel)]
    done = subprocess.run(command, capture_output=True, text=True, check=False)
    assert done.returncode == 0, done.stderr
    return folder


def run(environment: Path, folder: Path, *arguments: str) -> subprocess.CompletedProcess[str]:
    """Run a command of the new environment, the dependencies taken from the environment of the tests."""
    away = {name: value for name, value in os.environ.items() if not name.startswith(("SELECTOR_", "XDG_"))}
    return subprocess.run(
        [environment / "bin" / arguments[0], *arguments[1:]],
        cwd=folder,
        env={**away, "HOME": str(folder), "PYTHONPATH": sysconfig.get_path("purelib")},
        capture_output=True,
        text=True,
        check=False,
    )


def test_wheel_holds_code_data_types_and_licence(wheel: Path) -> None:
    """Every module, every file of the scenario, the mark of typed code and the licence are in the wheel, no test is."""
    names = set(zipfile.ZipFile(wheel).namelist())
    code = {str(path.relative_to(CHECKOUT)) for path in (CHECKOUT / "selector").rglob("*.py")}
    data = {f"selector/{path.relative_to(CHECKOUT)}" for path in (CHECKOUT / "data").rglob("*.*")}
    assert code <= names
    assert len(data) >= 9
    assert data <= names
    assert "selector/py.typed" in names
    assert any(name.endswith("licenses/LICENSE") for name in names)
    assert {name.split("/")[0].split("-")[0] for name in names} == {"selector", "shunt_selector"}


def test_installed_package_is_the_one_of_the_wheel(installed: Path, tmp_path: Path) -> None:
    """The new environment imports the installed package, not the checkout."""
    done = run(installed, tmp_path, "python", "-c", "import selector; print(selector.__file__)")
    assert Path(done.stdout.strip()).is_relative_to(installed), done.stderr


def test_demo_runs_from_an_empty_folder(installed: Path, tmp_path: Path) -> None:
    """The installed command does the bundled main job in an empty folder and leaves nothing there."""
    done = run(installed, tmp_path, "selector", "demo")
    assert done.returncode == 0, done.stderr
    assert "Best:" in done.stdout
    assert list(tmp_path.iterdir()) == []
