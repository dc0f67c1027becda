"""The main command: what it prints, what it writes, what it refuses."""

import json
import shutil
from pathlib import Path

import jsonschema
import pytest

from tests.end_to_end.command import EXAMPLES, run

COOLING = EXAMPLES / "cooling_water"


def schema() -> dict[str, object]:
    path = EXAMPLES.parent / "bidcheck" / "report" / "evaluation.schema.json"
    loaded: dict[str, object] = json.loads(path.read_text(encoding="utf-8"))
    return loaded


@pytest.fixture
def copy(tmp_path: Path) -> Path:
    target = tmp_path / "inquiry"
    shutil.copytree(COOLING, target)
    return target


@pytest.mark.parametrize("folder", ["cooling_water", "boiler_feed"])
def test_json_keeps_to_the_schema_and_repeats_byte_for_byte(folder):
    first, second = (run("evaluate", EXAMPLES / folder, "--json", "-") for _ in range(2))
    assert first.returncode == 0, first.stderr
    assert first.stdout == second.stdout
    jsonschema.validate(json.loads(first.stdout), schema())


def test_out_writes_page_and_json_that_repeat(tmp_path):
    for name in ("one", "two"):
        done = run("evaluate", COOLING, "--out", tmp_path / name)
        assert done.returncode == 0, done.stderr
    for name in ("report.html", "evaluation.json"):
        assert (tmp_path / "one" / name).read_bytes() == (tmp_path / "two" / name).read_bytes()


def test_terminal_says_what_against_what_and_what_to_ask():
    done = run("evaluate", COOLING)
    assert done.returncode == 0, done.stderr
    for words in (
        "alder a",
        "acceptable after queries",
        "not acceptable",
        "implausible",
        "hp under a kW heading",
        "ask:",
    ):
        assert words in done.stdout
    assert "Traceback" not in done.stdout + done.stderr


def test_us_units_are_printed_on_request():
    done = run("evaluate", COOLING, "--units", "US")
    assert "US gpm" in done.stdout
    assert "m³/h" not in done.stdout


def test_fail_on(copy):
    assert run("evaluate", copy, "--fail-on", "fail").returncode == 3
    assert run("evaluate", copy, "--fail-on", "query").returncode == 3
    for name in ("birch", "cedar", "dogwood", "elm"):
        shutil.rmtree(copy / "bids" / name)
    assert run("evaluate", copy, "--fail-on", "query").returncode == 0


def break_cedar(copy: Path) -> None:
    (copy / "bids" / "cedar" / "bid.toml").write_text(
        'bidder = "cedar"\narrangment = "end suction"\n', encoding="utf-8"
    )


def test_one_unreadable_bid_stops_unless_told_otherwise(copy):
    break_cedar(copy)
    done = run("evaluate", copy)
    assert done.returncode == 1
    assert "bids/cedar/bid.toml:2" in done.stderr
    assert "arrangement" in done.stderr
    assert done.stdout == ""


def test_skip_unreadable_says_so_in_every_output(copy, tmp_path):
    break_cedar(copy)
    done = run("evaluate", copy, "--skip-unreadable", "--out", tmp_path / "out")
    assert done.returncode == 0, done.stderr
    page = (tmp_path / "out" / "report.html").read_text(encoding="utf-8")
    document = json.loads((tmp_path / "out" / "evaluation.json").read_text(encoding="utf-8"))
    assert "cedar" in done.stdout
    assert "cedar" in page
    assert [item["bidder"] for item in document["unreadable"]] == ["cedar"]
    assert "cedar" not in [bid["bidder"] for bid in document["bids"]]
    jsonschema.validate(document, schema())


FIVE_MISTAKES = """\
flow [m3/h], head [m], efficiency [%], power [kW], npsh3 [m]
0, 74.0, 0, 38,
100, 73,6, 40, 50, 2.5
200, 71.9, 184, 60, 2.8
300, n/a, 75, 72, 3.1
400, -64.9, 81, 86, 3.6
500, 59.5, 82, 1.000.5, 4.4
"""


def test_five_mistakes_give_five_messages_with_lines(copy):
    (copy / "bids" / "alder" / "curve.csv").write_text(FIVE_MISTAKES, encoding="utf-8")
    done = run("evaluate", copy)
    assert done.returncode == 1
    for line in (3, 4, 5, 6, 7):
        assert f"bids/alder/curve.csv:{line}" in done.stderr
    assert "Traceback" not in done.stderr


def test_curve_without_an_inquiry():
    done = run("curve", COOLING / "bids" / "alder" / "curve.csv")
    assert done.returncode == 0, done.stderr
    assert "best efficiency" in done.stdout.lower()


def test_wrong_usage_and_missing_folder(tmp_path):
    assert run("evaluate").returncode == 2
    assert run("evaluate", COOLING, COOLING, "--json", "-").returncode == 2
    missing = run("evaluate", tmp_path / "nowhere")
    assert missing.returncode in (1, 2)
    assert "Traceback" not in missing.stderr


def test_checks_are_listed_and_explained():
    listed = run("checks")
    assert "bep-match" in listed.stdout
    explained = run("checks", "npsh-margin")
    assert "9.6.1" in explained.stdout
    unknown = run("checks", "npsh-margn")
    assert unknown.returncode == 2
    assert "npsh-margin" in unknown.stderr
