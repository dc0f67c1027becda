"""The public names, and how little is loaded before it is needed."""

import subprocess
import sys

import pytest

import bidcheck

HEAVY = ("numpy", "scipy", "pandas", "matplotlib", "openpyxl", "xlsxwriter", "pint", "jinja2", "rich")


def loaded_by(program: str) -> set[str]:
    """Which heavy libraries, or click, a small program loads."""
    asked = (*HEAVY, "click")
    code = f"{program}\nimport sys\nprint(*[name for name in {asked!r} if name in sys.modules])"
    done = subprocess.run([sys.executable, "-c", code], capture_output=True, text=True, check=True)
    return set(done.stdout.splitlines()[-1].split())


@pytest.mark.parametrize("name", bidcheck.__all__)
def test_every_public_name_is_there(name):
    assert getattr(bidcheck, name) is not None
    assert name in dir(bidcheck)


def test_a_name_that_is_not_there():
    with pytest.raises(AttributeError, match="evaluat"):
        _ = bidcheck.evaluat


def test_importing_the_package_loads_nothing_heavy():
    assert loaded_by("import bidcheck") == set()


@pytest.mark.parametrize(
    "arguments",
    [["--help"], ["--version"], ["evaluate", "--help"], ["curve", "--help"], ["checks", "--help"]],
)
def test_help_loads_click_alone(arguments):
    program = (
        "from bidcheck.cli import main\n"
        f"try:\n    main({arguments!r}, prog_name='bidcheck')\nexcept SystemExit as end:\n    assert end.code == 0"
    )
    assert loaded_by(program) == {"click"}


def test_the_loading_is_seen():
    assert loaded_by("import bidcheck.curve") == {"numpy"}
