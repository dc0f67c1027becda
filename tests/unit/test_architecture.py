"""The arrows between layers, and who may touch files, libraries, clock and environment."""

import ast
from collections.abc import Iterator
from pathlib import Path

import pytest

PACKAGE = Path(__file__).parents[2] / "bidcheck"

LAYERS = (
    {"cli"},
    {"report", "record", "read"},
    {"line", "shop_test", "prepare", "basis"},
    {"money"},
    {"checks"},
    {"explain", "guarantee", "fit", "estimates", "hydraulics"},
    {"inquiry", "bid", "curve", "limits", "case", "finding", "evaluation"},
    {"units", "unit_table", "unit_refusals", "numerals", "quantity", "errors"},
)
"""From top to bottom; an import goes down or stays on its layer."""
LATE_TO_REPORT = {"evaluation.py"}
"""The one exception: the frames of an evaluation are made in `report`, which is loaded when they are asked for."""

ONLY_IN = {
    "click": ("cli/",),
    "rich": ("cli/", "report/"),
    "matplotlib": ("report/",),
    "pint": ("units.py",),
    "jinja2": ("report/",),
    "pandas": ("report/", "evaluation.py"),
}
"""Library → where it may be imported; `evaluation.py` names pandas for its types alone."""
ONLY_AT_THE_TOP = {"time", "datetime", "random", "secrets", "uuid", "locale"}
"""Clock and chance: only `cli`."""
OPENS = {"open", "read_text", "read_bytes"}
WRITES = {"write_text", "write_bytes", "mkdir", "unlink", "rename", "touch", "rmtree", "savefig", "to_csv", "to_excel"}


def layer_of(unit: str) -> int | None:
    """Number of a layer from the top."""
    return next((number for number, names in enumerate(LAYERS) if unit in names), None)


def unit_of(file: str) -> str:
    """Package or module directly below `bidcheck` that a file belongs to."""
    return file.split("/", 1)[0].removesuffix(".py")


def imported(tree: ast.AST) -> Iterator[str]:
    """Full names of everything imported anywhere in a file, late imports included."""
    for node in ast.walk(tree):
        if isinstance(node, ast.Import):
            yield from (alias.name for alias in node.names)
        elif isinstance(node, ast.ImportFrom):
            assert node.level == 0, "imports are written in full"
            if node.module == "bidcheck":
                yield from (f"bidcheck.{alias.name}" for alias in node.names)
            else:
                yield str(node.module)


def violations(file: str, text: str) -> list[str]:
    """What one file, named from `bidcheck/` on, does that its place forbids."""
    tree = ast.parse(text)
    return [*_wrong_arrows(file, tree), *_wrong_libraries(file, tree), *_wrong_calls(file, tree)]


def _wrong_arrows(file: str, tree: ast.AST) -> Iterator[str]:
    """Imports that go up, or across between `read` and `report`."""
    here = unit_of(file)
    if file in ("__init__.py", "__main__.py"):
        return
    if layer_of(here) is None:
        yield f"{file}: belongs to no layer; give it a place in LAYERS"
        return
    for name in imported(tree):
        if not name.startswith("bidcheck."):
            continue
        there = name.split(".")[1]
        if there.startswith("__"):
            continue
        if layer_of(there) is None:
            yield f"{file}: imports {name}, which belongs to no layer"
        elif file in LATE_TO_REPORT and there == "report" and not _at_top(tree, name):
            continue
        elif layer_of(there) < layer_of(here):
            yield f"{file}: imports {name}, a layer above it"
        elif {here, there} == {"read", "report"}:
            yield f"{file}: imports {name}; read and report do not know each other"


def _at_top(tree: ast.AST, name: str) -> bool:
    """Whether a module is imported when the file is loaded."""
    assert isinstance(tree, ast.Module)
    return any(isinstance(node, ast.Import | ast.ImportFrom) and name in imported(node) for node in tree.body)


def _wrong_libraries(file: str, tree: ast.AST) -> Iterator[str]:
    """Libraries imported outside their place."""
    for name in imported(tree):
        library = name.split(".")[0]
        if library in ONLY_IN and not file.startswith(ONLY_IN[library]):
            yield f"{file}: imports {library}, which belongs in {', '.join(ONLY_IN[library])}"
        if library in ONLY_AT_THE_TOP and not file.startswith("cli/"):
            yield f"{file}: imports {library}; clock and chance stop at cli"
        if name.startswith("numpy.random"):
            yield f"{file}: imports {name}; clock and chance stop at cli"


def _wrong_calls(file: str, tree: ast.AST) -> Iterator[str]:
    """Files opened outside `read`, written outside `cli`, and the environment read below `cli`."""
    resources = any(name.startswith("importlib.resources") for name in imported(tree))
    for node in ast.walk(tree):
        if isinstance(node, ast.Attribute) and node.attr in ("environ", "getenv") and not file.startswith("cli/"):
            yield f"{file}:{node.lineno}: reads the environment"
        if not isinstance(node, ast.Call):
            continue
        called = node.func.attr if isinstance(node.func, ast.Attribute) else getattr(node.func, "id", "")
        if called in OPENS and not file.startswith(("read/", "cli/")) and not (resources and called != "open"):
            yield f"{file}:{node.lineno}: {called}() opens a file"
        if called in WRITES and not file.startswith("cli/") and not _into_memory(called, node):
            yield f"{file}:{node.lineno}: {called}() writes a file"
        if called == "open" and file.startswith("read/"):
            yield f"{file}:{node.lineno}: open() can write; read_bytes() cannot"
        if called == "print" and not file.startswith("cli/") and isinstance(node.func, ast.Name):
            yield f"{file}:{node.lineno}: prints"


def _into_memory(called: str, node: ast.Call) -> bool:
    """Whether a figure is saved into a buffer, not a file: its first argument is a name, never a text."""
    return called == "savefig" and bool(node.args) and isinstance(node.args[0], ast.Name)


def test_every_file_keeps_to_its_place():
    found = [
        violation
        for path in sorted(PACKAGE.rglob("*.py"))
        for violation in violations(path.relative_to(PACKAGE).as_posix(), path.read_text(encoding="utf-8"))
    ]
    assert not found, "\n".join(found)


PLANTED = [
    ("hydraulics/water.py", "from bidcheck.checks import ALL", "a layer above"),
    ("units.py", "from bidcheck.bid import Bid", "a layer above"),
    ("fit/column.py", "def late():\n    from bidcheck.line import evaluate", "a layer above"),
    ("checks/one.py", "import bidcheck.report.format", "a layer above"),
    ("checks/one.py", "from bidcheck import prepare", "a layer above"),
    ("evaluation.py", "from bidcheck.report.frames import findings_frame", "a layer above"),
    ("evaluation.py", "def late():\n    from bidcheck.read import read_inquiry", "a layer above"),
    ("read/table.py", "from bidcheck.report.format import plain", "do not know each other"),
    ("report/page.py", "from bidcheck.read import read_inquiry", "do not know each other"),
    ("stray.py", "", "belongs to no layer"),
    ("read/table.py", "import click", "imports click"),
    ("quantity.py", "import pint", "imports pint"),
    ("cli/curve_command.py", "from matplotlib import pyplot", "imports matplotlib"),
    ("checks/one.py", "from rich.table import Table", "imports rich"),
    ("line.py", "from datetime import date", "clock and chance"),
    ("fit/guard.py", "import random", "clock and chance"),
    ("fit/guard.py", "from numpy.random import default_rng", "clock and chance"),
    ("report/page.py", "import os\nhome = os.environ['HOME']", "environment"),
    ("report/page.py", "open('x')", "opens a file"),
    ("checks/one.py", "from pathlib import Path\nPath('x').read_text()", "opens a file"),
    ("report/page.py", "from pathlib import Path\nPath('x').write_text('')", "writes a file"),
    ("read/source.py", "from pathlib import Path\nPath('x').write_bytes(b'')", "writes a file"),
    ("read/source.py", "open('x')", "can write"),
    ("report/figures.py", "figure.savefig('x.svg')", "writes a file"),
    ("line.py", "print('x')", "prints"),
]


@pytest.mark.parametrize(("file", "text", "words"), PLANTED)
def test_a_planted_violation_is_caught(file, text, words):
    found = violations(file, text)
    assert any(words in violation for violation in found), found


ALLOWED = [
    ("checks/one.py", "from bidcheck.limits import within"),
    ("line.py", "from bidcheck import __version__"),
    ("evaluation.py", "def late():\n    from bidcheck.report.frames import findings_frame"),
    ("report/page.py", "from importlib.resources import files\nfiles('bidcheck').joinpath('x').read_text()"),
    ("report/figures.py", "figure.savefig(buffer)"),
    ("cli/write.py", "from pathlib import Path\nPath('x').write_text('')"),
]


@pytest.mark.parametrize(("file", "text"), ALLOWED)
def test_what_is_allowed_passes(file, text):
    assert violations(file, text) == []
