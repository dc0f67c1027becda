"""`bidcheck checks`: the list, one check explained, a name that is not there."""

import pytest

from bidcheck.checks import ALL
from tests.unit.cli.fakes import invoke


def test_every_check_is_listed():
    shown = invoke("checks").stdout
    assert all(check.name in shown for check in ALL)


@pytest.mark.parametrize("name", [check.name for check in ALL])
def test_every_check_is_explained(name):
    done = invoke("checks", name)
    assert done.exit_code == 0
    assert done.stdout.startswith(name)
    assert "source:" in done.stdout


def test_the_set_asked_for_is_shown():
    assert "limits (general-water)" in invoke("checks", "npsh-margin").stdout
    assert "limits (process)" in invoke("checks", "npsh-margin", "--set", "process").stdout


def test_a_misspelt_name_is_refused_with_the_nearest():
    done = invoke("checks", "npsh-margn")
    assert done.exit_code == 2
    assert 'nearest is "npsh-margin"' in done.stderr


def test_an_unknown_name_is_refused_with_the_way_on():
    done = invoke("checks", "\x1bxyzzy")
    assert done.exit_code == 2
    assert 'no check is called "xyzzy"; bidcheck checks lists them' in done.stderr
