"""Every test in this folder, and every table of formulas, names the source of its figures, directly beside it."""

from pathlib import Path

import pytest

import bidcheck
from tests.published.sources import sources_of_tests, unsourced_tables, unsourced_tests

HERE = Path(__file__).parent
SELF = Path(__file__).name
MODULES = sorted(path for path in HERE.rglob("*.py") if path.name != SELF)
PACKAGE = Path(bidcheck.__file__).parent
FORMULAS = sorted(path for part in ("estimates", "hydraulics") for path in (PACKAGE / part).glob("*.py"))


@pytest.mark.parametrize("module", MODULES, ids=lambda path: path.name)
def test_every_published_test_names_its_source(module):
    assert unsourced_tests(module.read_text(encoding="utf-8")) == []


@pytest.mark.parametrize("module", [*MODULES, *FORMULAS], ids=lambda path: path.name)
def test_every_table_names_its_source(module):
    assert unsourced_tables(module.read_text(encoding="utf-8")) == []


def test_there_are_modules_to_look_at():
    assert {"test_viscous.py", "test_efficiency_duties.py"} <= {path.name for path in MODULES}
    assert {"market_surface.py", "us_rule.py", "driver.py"} <= {path.name for path in FORMULAS}


@pytest.mark.parametrize("module", FORMULAS, ids=lambda path: path.name)
def test_a_table_whose_source_line_is_removed_is_refused(module):
    text = module.read_text(encoding="utf-8")
    lines = text.splitlines(keepends=True)
    for number, line in enumerate(lines):
        if line.startswith("# Source:"):
            end = number + 1
            while lines[end].startswith("#"):
                end += 1
            assert unsourced_tables("".join(lines[:number] + lines[end:])) != [], f"line {number + 1}"


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
    assert unsourced_tests(text) == ["test_a"]


@pytest.mark.parametrize(
    "text",
    [
        "# source: a table\ndef test_a():\n    assert True\n",
        "# source: a table\n# source: continued\n@parametrize('x', [1])\ndef test_a(x):\n    assert True\n",
        "class TestIt:\n    # source: a table\n    def test_a(self):\n        assert True\n",
    ],
)
def test_a_test_with_a_source_is_accepted(text):
    assert unsourced_tests(text) == []
    assert all(source.startswith("a table") for source in sources_of_tests(text).values())


@pytest.mark.parametrize(
    ("text", "missing"),
    [
        ("A = (1.0, 2.0, 3.0)\n", ["A"]),
        ("# Source: a book\nA = (1.0, 2.0, 3.0)\n", []),
        ("# Source: a book\nA = (1.0, 2.0, 3.0)\nB = (1.0, 2.0, 4.0)\n", []),
        ("# Source: a book\nA = (1.0, 2.0, 3.0)\n\nB = (1.0, 2.0, 4.0)\n", ["B"]),
        ('A = (1.0, 2.0, 3.0)\n"""What it is. Source: a book."""\n', []),
        ('A = (1.0, 2.0, 3.0)\n"""What it is."""\n', ["A"]),
        ("A = 1.0, 2.0\n", []),
        ("A = {'x': (1, 2), 'y': (-3.5, 4)}\n", ["A"]),
    ],
)
def test_tables_without_a_source_are_refused(text, missing):
    assert unsourced_tables(text) == missing
