"""The public names, and what loading them costs."""

import subprocess
import sys

import pytest

import bidcheck

HEAVY = ("numpy", "scipy", "pandas", "matplotlib", "openpyxl", "pint", "jinja2", "rich", "click")


def loaded(code: str) -> set[str]:
    """Heavy libraries in memory after running some code in a fresh interpreter."""
    tail = f"; import sys; print('LOADED', *[name for name in {HEAVY} if name in sys.modules])"
    done = subprocess.run([sys.executable, "-c", code + tail], capture_output=True, text=True, check=True)
    (line,) = (line for line in done.stdout.splitlines() if line.startswith("LOADED"))
    return set(line.split()[1:])


@pytest.mark.parametrize("name", bidcheck.__all__)
def test_every_public_name_is_there(name):
    assert getattr(bidcheck, name) is not None
    assert name in dir(bidcheck)


def test_names_that_are_not_public_are_refused():
    with pytest.raises(AttributeError, match="no attribute 'evaluation_json'"):
        _ = bidcheck.evaluation_json


def test_functions_are_not_shadowed_by_modules():
    from bidcheck import evaluate, read_inquiry

    assert callable(evaluate)
    assert callable(read_inquiry)


def test_import_is_light():
    assert loaded("import bidcheck") == set()


@pytest.mark.parametrize("arguments", [["--help"], ["evaluate", "--help"], ["curve", "--help"], ["--version"]])
def test_help_loads_click_alone(arguments):
    assert loaded(f"from bidcheck.cli import main; main({arguments!r}, standalone_mode=False)") == {"click"}


def test_probe_sees_what_is_loaded():
    assert "numpy" in loaded("import numpy")
