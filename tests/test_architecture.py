"""The floors of the house: imports point down only, and each outside package has its home."""

from __future__ import annotations

import importlib
import sys
from collections.abc import Iterable, Mapping
from pathlib import Path

import grimp
import pytest

FLOORS = (
    ("__main__",),
    ("cli",),
    ("app",),
    ("report", "catalogue", "ingest"),
    ("bill", "handover"),
    ("explore",),
    ("search",),
    ("limits",),
    ("budget",),
    ("candidate",),
    ("parts", "spec"),
    ("gain", "physics", "series"),
    ("units",),
    ("errors", "guard", "real"),
)
ARRAYS = ("search", "limits", "budget", "candidate", "gain", "physics", "real")
HOMES = {
    "typer": ("cli",),
    "click": ("cli",),
    "rich": ("cli", "report"),
    "platformdirs": ("cli", "app", "catalogue"),
    "sqlite3": ("catalogue",),
    "sqlite_utils": ("catalogue",),
    "rapidfuzz": ("ingest", "catalogue.find"),
    "pandas": ("report", "ingest"),
    "pydantic": ("parts", "spec"),
    "pydantic_core": ("parts", "spec"),
    "numpy": ARRAYS,
    "tomllib": ("app", "ingest", "spec"),
}


def wrong_imports(graph: grimp.ImportGraph, package: str, floors: tuple[tuple[str, ...], ...]) -> list[str]:
    """Return every import inside a package that points up or sideways, and every room that is on no floor.

    The package's own `__init__` may import any room, and any room may take the version from it.
    """
    height = {room: -number for number, rooms in enumerate(floors) for room in rooms}
    found = []
    for importer, imported in inner_imports(graph, package):
        source, target = room_of(importer), room_of(imported)
        if not source or source == target:
            continue
        if not target:
            lines = [
                detail["line_contents"] for detail in graph.get_import_details(importer=importer, imported=imported)
            ]
            if not all("__version__" in line for line in lines):
                found.append(f"{importer} imports the whole of {imported}")
        elif source not in height or target not in height:
            found.append(f"{importer} -> {imported}: a room that is on no floor")
        elif height[target] >= height[source]:
            found.append(f"{importer} -> {imported}")
    return found


def inner_imports(graph: grimp.ImportGraph, package: str) -> Iterable[tuple[str, str]]:
    """Yield importer and imported of every import inside a package, in order."""
    for importer in sorted(graph.modules):
        if importer.split(".")[0] == package:
            for imported in sorted(graph.find_modules_directly_imported_by(importer)):
                if imported.split(".")[0] == package:
                    yield importer, imported


def room_of(module: str) -> str:
    """Return the part of a module's name below the package: `selector.gain.law` is in `gain`."""
    return ".".join(module.split(".")[1:2])


def strangers(graph: grimp.ImportGraph, package: str, homes: Mapping[str, tuple[str, ...]]) -> list[str]:
    """Return every import of an outside package away from its home, and of one that has no home."""
    found = []
    for importer in sorted(module for module in graph.modules if module.split(".")[0] == package):
        inside = importer.partition(".")[2]
        for imported in sorted(graph.find_modules_directly_imported_by(importer)):
            if imported.split(".")[0] == package:
                continue
            if imported not in homes and imported in sys.stdlib_module_names:
                continue
            if not any(inside == home or inside.startswith(f"{home}.") for home in homes.get(imported, ())):
                found.append(f"{importer} -> {imported}")
    return found


@pytest.fixture(scope="module")
def graph() -> grimp.ImportGraph:
    """Return every import of the package, those inside functions and for types alike."""
    return grimp.build_graph("selector", include_external_packages=True, cache_dir=None)


@pytest.fixture
def made_up(tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> grimp.ImportGraph:
    """Return the imports of a package with one wrong import of each sort."""
    for name, text in {
        "__init__": "__version__ = '1'",
        "cli": "import house.units",
        "gain": "def late():\n    import house.cli",
        "physics": "from house import gain, __version__",
        "units": "import sqlite3",
        "attic": "import house.units",
        "search": "import json, house",
        "catalogue": "import sqlite3, tiny_unheard_of",
    }.items():
        (tmp_path / "house").mkdir(exist_ok=True)
        (tmp_path / "house" / f"{name}.py").write_text(f"{text}\n", encoding="utf-8")
    monkeypatch.syspath_prepend(tmp_path)
    importlib.invalidate_caches()
    return grimp.build_graph("house", include_external_packages=True, cache_dir=None)


def test_imports_point_down_only(graph: grimp.ImportGraph) -> None:
    """No room imports one above it or beside it, and every room has a floor."""
    assert len(graph.modules) > 50
    assert wrong_imports(graph, "selector", FLOORS) == []


def test_outside_packages_stay_in_their_homes(graph: grimp.ImportGraph) -> None:
    """Each dependency is imported only where it lives, and none is imported that was not declared."""
    assert strangers(graph, "selector", HOMES) == []


def test_every_room_of_the_floors_exists(graph: grimp.ImportGraph) -> None:
    """The list of floors names no room that is gone, but for those that are still to be built."""
    rooms = {room_of(module) for module in graph.modules if module.startswith("selector.")}
    named = {room for floor in FLOORS for room in floor}
    assert rooms <= named
    assert named - rooms <= {"explore", "handover"}


def test_a_wrong_import_is_found(made_up: grimp.ImportGraph) -> None:
    """A late import upwards, one sideways, one of the whole package and a room without a floor are all found."""
    assert wrong_imports(made_up, "house", FLOORS) == [
        "house.attic -> house.units: a room that is on no floor",
        "house.gain -> house.cli",
        "house.physics -> house.gain",
        "house.search imports the whole of house",
    ]


def test_a_stranger_is_found(made_up: grimp.ImportGraph) -> None:
    """A database in the wrong room and a package that nobody declared are both found."""
    assert strangers(made_up, "house", HOMES) == ["house.catalogue -> tiny_unheard_of", "house.units -> sqlite3"]
