"""`bidcheck` itself: help, version, commands loaded late, misspelt commands."""

import importlib

import pytest

import bidcheck
from bidcheck.cli import COMMANDS
from tests.unit.cli.fakes import invoke


def test_version():
    assert invoke("--version").stdout == f"bidcheck, version {bidcheck.__version__}\n"


def test_help_lists_every_command():
    shown = invoke("--help").stdout
    assert all(name in shown for name in COMMANDS)


@pytest.mark.parametrize("name", COMMANDS)
def test_every_command_loads_and_has_help(name):
    assert importlib.import_module(f"bidcheck.cli.{name}_command").command.name == name
    done = invoke(name, "--help")
    assert done.exit_code == 0
    assert done.stdout.startswith(f"Usage: bidcheck {name}")


def test_a_misspelt_command_names_the_nearest():
    done = invoke("evalute", "folder")
    assert done.exit_code == 2
    assert 'nearest is "evaluate"' in done.stderr


def test_an_unknown_command_cannot_steer_the_terminal():
    done = invoke("\x1b[31mred")
    assert done.exit_code == 2
    assert "\x1b" not in done.stderr
