"""`bidcheck curve`: one curve file alone."""

import pytest

from tests.unit.cli.fakes import invoke

CURVE = """\
flow [m3/h], head [m], efficiency [%], power [kW], npsh3 [m]
0, 74.0, 0, 38.0,
100, 73.6, 40.0, 50.0, 2.5
200, 71.9, 65.0, 60.2, 2.8
300, 69.0, 78.0, 72.2, 3.1
400, 64.9, 83.0, 85.2, 3.6
500, 59.5, 81.0, 99.9, 4.4
600, 52.9, 72.0, 119.9, 5.5
"""


@pytest.fixture
def curve(tmp_path, monkeypatch):
    monkeypatch.chdir(tmp_path)
    path = tmp_path / "curve.csv"
    path.write_text(CURVE, encoding="utf-8")
    return path


def test_best_efficiency_is_told_without_an_inquiry(curve):
    done = invoke("curve", "curve.csv")
    assert done.exit_code == 0, done.stderr
    assert "best efficiency" in done.stdout
    assert "specific speed nq" not in done.stdout
    assert "left out: the file names no speed" in done.stdout


def test_a_speed_adds_specific_speeds(curve):
    shown = invoke("curve", "curve.csv", "--speed", "1480 rpm").stdout
    assert "specific speed nq" in shown
    assert "left out: the file names no speed" not in shown


def test_units(curve):
    assert "US gpm" in invoke("curve", "curve.csv", "--units", "US").stdout


@pytest.mark.parametrize("speed", ["0 rpm", "-5 rpm", "1480", "1480 m", "fast"])
def test_a_speed_that_is_none_is_wrong_usage(curve, speed):
    done = invoke("curve", "curve.csv", f"--speed={speed}")
    assert done.exit_code == 2
    assert "--speed" in done.stderr


def test_a_picture_is_drawn(curve, tmp_path):
    done = invoke("curve", "curve.csv", "--picture", "curve.svg")
    assert done.exit_code == 0, done.stderr
    assert "<svg" in (tmp_path / "curve.svg").read_text(encoding="utf-8")


@pytest.mark.parametrize(
    ("picture", "words"),
    [("curve.csv", "ends in .svg"), ("curve.png", "ends in .svg"), ("nowhere/a.svg", "there is no folder")],
)
def test_a_picture_cannot_go_there(curve, picture, words):
    done = invoke("curve", "curve.csv", "--picture", picture)
    assert done.exit_code == 2
    assert words in done.stderr
    assert curve.read_text(encoding="utf-8") == CURVE


def test_a_curve_named_svg_is_not_overwritten_by_its_picture(curve, tmp_path):
    (tmp_path / "link.svg").symlink_to(curve)
    done = invoke("curve", "curve.csv", "--picture", "link.svg")
    assert done.exit_code == 2
    assert "would be overwritten" in done.stderr


def test_problems_are_told_with_file_and_line(curve):
    curve.write_text(CURVE.replace("69.0", "n/a\x1b[31m"), encoding="utf-8")
    done = invoke("curve", "curve.csv")
    assert done.exit_code == 1
    assert "curve.csv:5" in done.stderr
    assert "\x1b" not in done.stderr


def test_a_file_that_is_not_there():
    done = invoke("curve", "no_such_curve.csv")
    assert done.exit_code == 1
    assert done.stderr == "no_such_curve.csv: there is no such file\n"
