"""The arrows between the parts of the package, as a table, and the search for what goes against them."""

import ast
from collections.abc import Iterator
from pathlib import Path

ORDER: tuple[tuple[str, ...], ...] = (
    ("errors", "quantity", "numerals", "unit_table", "unit_refusals", "units"),
    ("arrangement", "curve", "limits", "bid", "inquiry", "second_opinion", "case", "finding", "evaluation"),
    ("hydraulics",),
    ("estimates", "fit", "guarantee", "explain"),
    ("basis",),
    ("appraise",),
    ("prepare",),
    ("checks",),
    ("money",),
    ("line", "shop_test"),
    ("read", "record", "report"),
    ("cli", "__main__"),
)
"""Parts from the bottom to the top: a part imports only what stands below it."""
FREE_AMONG_THEMSELVES = (0, 1, len(ORDER) - 1)
"""Rows of `ORDER` whose parts may import each other."""
LATE = {("bidcheck.evaluation", "report"), ("bidcheck.evaluation", "pandas")}
"""Frames are methods of the evaluation and load the report only when called."""
NEVER_A_BID = dict.fromkeys(("hydraulics", "estimates"), ("bid", "inquiry", "curve", "evaluation"))
"""Formulas take and return plain numbers."""
ONLY_IN: dict[str, tuple[str, ...]] = {
    "click": ("bidcheck.cli",),
    "rich": ("bidcheck.cli", "bidcheck.report"),
    "pint": ("bidcheck.units",),
    "pandas": ("bidcheck.report",),
    "matplotlib": ("bidcheck.report",),
    "jinja2": ("bidcheck.report",),
    "markupsafe": ("bidcheck.report",),
    "xlsxwriter": ("bidcheck.report",),
    "openpyxl": ("bidcheck.read",),
    "tomllib": ("bidcheck.read", "bidcheck.record"),
    "csv": ("bidcheck.read", "bidcheck.record"),
    **dict.fromkeys(
        (
            *("os", "time", "datetime", "random", "secrets", "uuid", "tempfile", "shutil"),
            *("subprocess", "socket", "urllib", "http", "locale", "getpass", "platform"),
        ),
        ("bidcheck.cli",),
    ),
}
"""Libraries that some parts only may use: the outside world, the clock, chance and the environment stay in `cli`."""
MUTED = ("bidcheck.cli.guarded", "open")
"""Opens the null device, where output goes once its reader is gone."""
READS = frozenset({"open", "read_text", "read_bytes", "iterdir", "glob", "rglob"})
WRITES = frozenset({"write_text", "write_bytes", "mkdir", "unlink", "rename", "touch", "rmdir", "chmod", "symlink_to"})


def sources(package: Path) -> dict[str, str]:
    """Module name → source of every file of the package."""
    found = {}
    for path in sorted(package.rglob("*.py")):
        parts = path.relative_to(package.parent).with_suffix("").parts
        found[".".join(parts[:-1] if parts[-1] == "__init__" else parts)] = path.read_text(encoding="utf-8")
    return found


def violations(modules: dict[str, str]) -> list[str]:
    """Everything that goes against the arrows, a line each."""
    found: list[str] = []
    for module, source in modules.items():
        tree = ast.parse(source)
        if module != "bidcheck":
            found += [f"{module}: {text}" for name in imported(tree) for text in _import_faults(module, name)]
        found += [f"{module}:{line}: {text}" for line, text in _call_faults(module, tree)]
    return found


def imported(tree: ast.AST) -> Iterator[str]:
    """Full names of what is imported anywhere in a file, inside functions and for types too."""
    for node in ast.walk(tree):
        if isinstance(node, ast.Import):
            yield from (alias.name for alias in node.names)
        elif isinstance(node, ast.ImportFrom) and node.level:
            yield "." * node.level + (node.module or "")
        elif isinstance(node, ast.ImportFrom) and node.module == "bidcheck":
            yield from (f"bidcheck.{alias.name}" for alias in node.names if alias.name != "__version__")
        elif isinstance(node, ast.ImportFrom) and node.module:
            yield node.module


def _row(part: str) -> int | None:
    return next((row for row, parts in enumerate(ORDER) if part in parts), None)


def _import_faults(module: str, name: str) -> Iterator[str]:
    """What is wrong with one import."""
    top, _, rest = name.partition(".")
    if name.startswith("."):
        yield f"imports {name}; write imports in full"
    elif top != "bidcheck":
        allowed = ONLY_IN.get(top)
        if allowed is not None and not module.startswith(allowed) and (module, top) not in LATE:
            yield f"imports {top}, which only {' and '.join(allowed)} may"
    else:
        part, target = module.split(".")[1], rest.split(".")[0]
        own, below = _row(part), _row(target)
        if own is None or below is None:
            yield f"imports {name}: {part if own is None else target} has no place in the order of parts yet"
        elif target in NEVER_A_BID.get(part, ()):
            yield f"imports {name}, but formulas take and return plain numbers"
        elif part != target and (module, target) not in LATE and not _downwards(own, below):
            yield f"imports {name}, which does not stand below it"


def _downwards(own: int, below: int) -> bool:
    """Whether a part of row `own` may import one of row `below`."""
    return below < own or (below == own and own in FREE_AMONG_THEMSELVES)


def _call_faults(module: str, tree: ast.AST) -> Iterator[tuple[int, str]]:
    """Files touched and chance used where they may not be."""
    for node in ast.walk(tree):
        if not isinstance(node, ast.Call):
            continue
        method = isinstance(node.func, ast.Attribute)
        name = node.func.attr if isinstance(node.func, ast.Attribute) else getattr(node.func, "id", "")
        opens = name in READS and (method or name == "open") and not _packaged(node)
        if opens and not module.startswith("bidcheck.read") and (module, name) != MUTED:
            yield node.lineno, f"{name}: only read opens inputs"
        if method and name in WRITES and not module.startswith("bidcheck.cli"):
            yield node.lineno, f"{name}: only cli writes files"
        if ".random." in f".{ast.unparse(node.func)}" and not (name == "default_rng" and node.args):
            yield node.lineno, "chance without a seed passed in"


def _packaged(call: ast.Call) -> bool:
    """Whether a file that ships with the package is read, by importlib.resources."""
    return any(isinstance(node, ast.Call) and getattr(node.func, "id", "") == "files" for node in ast.walk(call.func))
