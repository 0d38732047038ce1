"""The habits of style.md that a machine can hold: sizes, registries, docstrings of tests, no law by name."""

from __future__ import annotations

import ast
import importlib
import re
from collections.abc import Iterator, Mapping
from pathlib import Path

import pytest

from selector.budget import METHODS
from selector.gain import LAWS, Law
from selector.parts import KINDS, Part

CHECKOUT = Path(__file__).resolve().parents[1]
PACKAGE = CHECKOUT / "selector"
SOURCES = sorted(PACKAGE.rglob("*.py")) + sorted((CHECKOUT / "scripts").rglob("*.py"))
TESTS = sorted((CHECKOUT / "tests").rglob("test_*.py"))
FILE_LINES, FILE_LINES_MOST = 400, 250
FUNCTION_LINES, FUNCTION_LINES_MOST = 60, 30
MOSTLY = 0.9
# What an entry of a registry is called in its file, the registry, and the folder of the entries.
REGISTRIES = (
    ("selector.budget.terms", "TERMS", "TERM"),
    ("selector.limits.each", "LIMITS", "LIMIT"),
    ("selector.bill.cautions", "CAUTIONS", "CAUTION"),
    ("selector.report.formats", "FORMATS", "FORMAT"),
)
# What each entry of a registry of classes is derived from, the registry, and the folder of the classes.
CLASSES: tuple[tuple[str, Mapping[str, object], type], ...] = (
    ("selector.gain", LAWS, Law),
    ("selector.parts", KINDS, Part),
    ("selector.budget.methods", METHODS, object),
)
REASONED = re.compile(r"# noqa: [A-Z]+[0-9]+(, [A-Z]+[0-9]+)* - (?!the same$|as above$)\S")
PLAIN = (ast.Import, ast.ImportFrom, ast.Assign, ast.AnnAssign)

Function = ast.FunctionDef | ast.AsyncFunctionDef


def functions(tree: ast.AST) -> Iterator[Function]:
    """Yield every function of a tree, methods and inner ones too."""
    for node in ast.walk(tree):
        if isinstance(node, Function):
            yield node


def lines_of(function: Function) -> int:
    """Return how many lines a function has, its docstring left out."""
    first = function.body[0]
    text = 0
    if ast.get_docstring(function) is not None:
        text = (first.end_lineno or first.lineno) - first.lineno + 1
    return (function.end_lineno or function.lineno) - function.lineno + 1 - text


def compared_names(tree: ast.AST, names: frozenset[str]) -> Iterator[int]:
    """Yield the line of every comparison with, or case of, a string that is one of some names."""
    for node in ast.walk(tree):
        if isinstance(node, ast.Compare):
            parts: list[ast.AST] = [node.left, *node.comparators]
        elif isinstance(node, ast.MatchValue):
            parts = [node.value]
        else:
            continue
        inner = (each for part in parts for each in ast.walk(part))
        if any(isinstance(each, ast.Constant) and each.value in names for each in inner):
            yield node.lineno


def logic(tree: ast.Module) -> Iterator[int]:
    """Yield the line of every statement that is neither an import, an assignment nor the docstring."""
    for number, node in enumerate(tree.body):
        docstring = number == 0 and isinstance(node, ast.Expr) and isinstance(node.value, ast.Constant)
        types = isinstance(node, ast.If) and isinstance(node.test, ast.Name) and node.test.id == "TYPE_CHECKING"
        if not (docstring or types or isinstance(node, PLAIN)):
            yield node.lineno


def read(path: Path) -> ast.Module:
    """Return the tree of a source file."""
    return ast.parse(path.read_text(encoding="utf-8"), filename=str(path))


def classes_of(folder: str, base: type) -> Iterator[type]:
    """Yield the classes derived from a base that the files of a folder define, the base itself left out."""
    package = importlib.import_module(folder)
    for path in sorted(Path(str(package.__file__)).parent.glob("[!_]*.py")):
        module = importlib.import_module(f"{folder}.{path.stem}")
        for each in vars(module).values():
            defined = isinstance(each, type) and each.__module__ == module.__name__
            if defined and issubclass(each, base) and each is not base:
                yield each


def place(path: Path, line: int) -> str:
    """Return file and line as a message names them."""
    return f"{path.relative_to(CHECKOUT)}:{line}"


def test_files_are_short() -> None:
    """No file has over 400 lines, and nine in ten have under 250."""
    counts = {str(path.relative_to(CHECKOUT)): len(path.read_text(encoding="utf-8").splitlines()) for path in SOURCES}
    assert [name for name, count in counts.items() if count > FILE_LINES] == []
    assert sum(count < FILE_LINES_MOST for count in counts.values()) >= MOSTLY * len(counts)


def test_functions_are_short() -> None:
    """No function has over 60 lines without its docstring, and nine in ten have under 30."""
    counts = {
        place(path, function.lineno): lines_of(function) for path in SOURCES for function in functions(read(path))
    }
    assert [where for where, count in counts.items() if count > FUNCTION_LINES] == []
    assert sum(count < FUNCTION_LINES_MOST for count in counts.values()) >= MOSTLY * len(counts)


def test_no_law_is_chosen_by_name() -> None:
    """Nothing outside gain/ compares with the name of a gain law: it asks the law."""
    names = frozenset(LAWS)
    elsewhere = [path for path in SOURCES if PACKAGE / "gain" not in path.parents]
    assert [place(path, line) for path in elsewhere for line in compared_names(read(path), names)] == []


def test_init_files_hold_no_logic() -> None:
    """An __init__.py holds its docstring, imports and assignments."""
    inits = [path for path in SOURCES if path.name == "__init__.py"]
    assert [place(path, line) for path in inits for line in logic(read(path))] == []


def test_every_silenced_rule_has_its_reason() -> None:
    """Each `noqa` names its rules and, behind a dash, says why; none points to another line for its reason."""
    files = [*SOURCES, *sorted((CHECKOUT / "tests").rglob("*.py"))]
    found = [
        place(path, number)
        for path in files
        for number, line in enumerate(path.read_text(encoding="utf-8").splitlines(), 1)
        if "# noqa" in line and path != Path(__file__) and not REASONED.search(line)
    ]
    assert found == []


def test_every_test_says_what_fact_it_holds() -> None:
    """Each test function has a docstring."""
    silent = [
        place(path, function.lineno)
        for path in TESTS
        for function in functions(read(path))
        if function.name.startswith("test_") and not ast.get_docstring(function)
    ]
    assert silent == []


@pytest.mark.parametrize(("folder", "registry", "entry"), REGISTRIES)
def test_registry_holds_each_file_of_its_folder_once(folder: str, registry: str, entry: str) -> None:
    """A registry lists what the files beside it define: nothing twice, nothing left out, names unique."""
    package = importlib.import_module(folder)
    files = sorted(Path(str(package.__file__)).parent.glob("[!_]*.py"))
    defined = [getattr(importlib.import_module(f"{folder}.{path.stem}"), entry) for path in files]
    found = getattr(package, registry)
    listed = list(found.values() if isinstance(found, dict) else found)
    assert sorted(map(id, listed)) == sorted(map(id, defined))
    assert len({each.name for each in listed}) == len(listed)
    assert not isinstance(found, dict) or list(found) == [each.name for each in listed]


@pytest.mark.parametrize(("folder", "registry", "base"), CLASSES)
def test_registry_holds_each_class_of_its_folder_once(folder: str, registry: Mapping[str, object], base: type) -> None:
    """A registry of classes lists every class of its sort that a file beside it defines, and no other."""
    listed = [each if isinstance(each, type) else type(each) for each in registry.values()]
    assert sorted(map(str, listed)) == sorted(map(str, classes_of(folder, base)))


def test_every_law_has_a_file_of_its_own() -> None:
    """A gain law is one class in one file, named as the law is."""
    for name, law in LAWS.items():
        assert name == law.name
        assert type(law).__module__ == f"selector.gain.{name.replace('-', '_')}"


def test_the_checks_of_this_file_can_fail() -> None:
    """A law by name, logic in an __init__ and a long function are found where they stand."""
    text = 'if law == "fixed":\n    pass\nmatch law:\n    case "fixed":\n        pass\nfound = law in ("fixed",)\n'
    assert sorted(compared_names(ast.parse(text), frozenset({"fixed"}))) == [1, 4, 6]
    assert list(logic(ast.parse('"""Text."""\nimport os\nA = 1\nfor b in A:\n    pass\n'))) == [4]
    assert REASONED.search("a  # noqa: S608 - names of ours")
    assert not any(
        map(REASONED.search, ("a  # noqa", "a  # noqa: S608", "a  # noqa: S608  why", "# noqa: S1 - as above"))
    )
    long = "def f():\n    '''Text.\n\n    More.\n    '''\n" + "    a = 1\n" * 61
    assert [lines_of(each) for each in functions(ast.parse(long))] == [62]
