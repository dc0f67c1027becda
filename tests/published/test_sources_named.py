"""Every test in this folder names the source of its figures, directly above it."""

import ast
from pathlib import Path

import pytest

HERE = Path(__file__).parent
SELF = Path(__file__).name
MODULES = sorted(path for path in HERE.rglob("*.py") if path.name != SELF)


def unsourced(text: str) -> list[str]:
    """Names of the test functions whose comment directly above holds no line `# source: ` with words after it."""
    lines = text.splitlines()
    missing = []
    for node in ast.walk(ast.parse(text)):
        if not isinstance(node, ast.FunctionDef | ast.AsyncFunctionDef) or not node.name.startswith("test"):
            continue
        first = min([node.lineno, *(decorator.lineno for decorator in node.decorator_list)])
        above = first - 2
        named = False
        while above >= 0 and lines[above].strip().startswith("#"):
            comment = lines[above].strip()
            named = named or (comment.startswith("# source: ") and len(comment) > len("# source: ") + 3)
            above -= 1
        if not named:
            missing.append(node.name)
    return missing


@pytest.mark.parametrize("module", MODULES, ids=lambda path: path.name)
def test_every_published_test_names_its_source(module):
    assert unsourced(module.read_text(encoding="utf-8")) == []


def test_there_are_modules_to_look_at():
    assert {"test_viscous.py", "test_efficiency_duties.py"} <= {path.name for path in MODULES}


@pytest.mark.parametrize(
    "text",
    [
        "def test_a():\n    assert True\n",
        "# source: a table\n\ndef test_a():\n    assert True\n",
        "# source:\ndef test_a():\n    assert True\n",
        "@parametrize('x', [1])\n# source: below its decorator\ndef test_a(x):\n    assert True\n",
        "class TestIt:\n    # a remark\n    def test_a(self):\n        assert True\n",
    ],
)
def test_a_test_without_a_source_is_refused(text):
    assert unsourced(text) == ["test_a"]


@pytest.mark.parametrize(
    "text",
    [
        "# source: a table\ndef test_a():\n    assert True\n",
        "# source: a table\n# continued\n@parametrize('x', [1])\ndef test_a(x):\n    assert True\n",
        "class TestIt:\n    # source: a table\n    def test_a(self):\n        assert True\n",
    ],
)
def test_a_test_with_a_source_is_accepted(text):
    assert unsourced(text) == []
