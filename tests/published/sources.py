"""The sources that the tests of this folder, and the tables of the package, name."""

import ast
import re
from collections.abc import Iterator

Node = ast.FunctionDef | ast.AsyncFunctionDef


def functions_in(tree: ast.AST) -> Iterator[Node]:
    """Test functions of a module."""
    for node in ast.walk(tree):
        if isinstance(node, Node) and node.name.startswith("test"):
            yield node


def comment_above(lines: list[str], first: int) -> str:
    """What the lines `# source: ...` of the comment directly above line `first` (from 1) say, joined; empty if none."""
    found: list[str] = []
    above = first - 2
    while above >= 0 and lines[above].strip().startswith("#"):
        match = re.match(r"#\s*[Ss]ource: (\S.{2,})", lines[above].strip())
        if match:
            found.insert(0, match[1])
        above -= 1
    return " ".join(found)


def sources_of_tests(text: str) -> dict[str, str]:
    """Source by name of test function; empty where it names none."""
    lines = text.splitlines()
    return {
        node.name: comment_above(lines, min([node.lineno, *(item.lineno for item in node.decorator_list)]))
        for node in functions_in(ast.parse(text))
    }


def unsourced_tests(text: str) -> list[str]:
    """Names of the test functions without a source directly above."""
    return [name for name, source in sources_of_tests(text).items() if not source]


LEAST_FIGURES = 3
"""Figures from which a constant is a table."""


def unsourced_tables(text: str) -> list[str]:
    """Names of the tables of a module, constants of three figures or more, without a source above or beneath.

    Above is a comment `# Source: ...` that may stand over several tables in a row; beneath is a text with `Source:` or
    `Derived` in it.
    """
    lines = text.splitlines()
    body = ast.parse(text).body
    missing = []
    covered = False
    for place, node in enumerate(body):
        if not isinstance(node, ast.Assign | ast.AnnAssign) or node.value is None:
            covered = covered and isinstance(node, ast.Expr)
            continue
        first = place == 0 or body[place - 1].end_lineno is None or body[place - 1].end_lineno < node.lineno - 1
        above = comment_above(lines, node.lineno)
        covered = bool(above) or (covered and not first)
        if _figures(node.value) < LEAST_FIGURES or covered:
            continue
        beneath = body[place + 1] if place + 1 < len(body) else None
        words = beneath.value.value if isinstance(beneath, ast.Expr) and isinstance(beneath.value, ast.Constant) else ""
        if "Source:" not in str(words) and "Derived" not in str(words):
            target = node.targets[0] if isinstance(node, ast.Assign) else node.target
            missing.append(ast.unparse(target))
    return missing


def _figures(node: ast.AST) -> int:
    """Numbers inside a literal table, an array or an object; other calls and comprehensions are no tables."""
    if isinstance(node, ast.Call):
        name = ast.unparse(node.func).split(".")[-1]
        return sum(_figures(item) for item in node.args) if name == "array" or name[:1].isupper() else 0
    if isinstance(node, ast.Constant):
        return int(isinstance(node.value, int | float) and not isinstance(node.value, bool))
    if isinstance(node, ast.Tuple | ast.List | ast.Set):
        return sum(_figures(item) for item in node.elts)
    if isinstance(node, ast.Dict):
        return sum(_figures(item) for item in node.values)
    if isinstance(node, ast.UnaryOp):
        return _figures(node.operand)
    return 0
