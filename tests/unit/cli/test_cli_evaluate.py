"""`bidcheck evaluate`: exit codes, errors, where it writes and where it refuses to."""

import pytest

from bidcheck.errors import InputError, OutOfRange, Problem
from bidcheck.quantity import UnitSystem
from tests.unit.cli.fakes import Fakes, evaluation, finding, invoke


@pytest.fixture
def fakes(monkeypatch, tmp_path):
    monkeypatch.chdir(tmp_path)
    return Fakes(monkeypatch)


def test_prints_the_table_and_exits_with_0(fakes):
    done = invoke("evaluate", "one")
    assert (done.exit_code, done.stdout, done.stderr) == (0, "the table\n", "")
    assert fakes.skipped == [False]


def test_skip_unreadable_is_handed_on(fakes):
    invoke("evaluate", "one", "--skip-unreadable")
    assert fakes.skipped == [True]


@pytest.mark.parametrize(
    ("option", "of_inquiry", "printed"),
    [
        ([], UnitSystem.US, UnitSystem.US),
        (["--units", "SI"], UnitSystem.US, UnitSystem.SI),
        (["--units", "US"], UnitSystem.SI, UnitSystem.US),
    ],
)
def test_units_are_those_of_the_inquiry_unless_asked_for(fakes, option, of_inquiry, printed):
    fakes.read["one"] = evaluation(units=of_inquiry)
    invoke("evaluate", "one", *option)
    assert fakes.systems == [printed]


@pytest.mark.parametrize(
    ("fail_on", "verdict", "accepted", "code"),
    [
        ("fail", "fail", None, 3),
        ("fail", "query", None, 0),
        ("fail", "fail", "agreed", 0),
        ("query", "query", None, 3),
        ("query", "fail", None, 3),
        ("query", "remark", None, 0),
        ("query", "no-data", None, 0),
        ("query", "query", "agreed", 0),
        (None, "fail", None, 0),
    ],
)
def test_fail_on(fakes, fail_on, verdict, accepted, code):
    fakes.read["one"] = evaluation(finding("pass"), finding(verdict, accepted))
    option = [] if fail_on is None else ["--fail-on", fail_on]
    assert invoke("evaluate", "one", *option).exit_code == code


@pytest.mark.parametrize(("fail_on", "code"), [("query", 3), ("fail", 0)])
def test_an_incomplete_bid_counts_as_a_query(fakes, fail_on, code):
    fakes.read["one"] = evaluation(finding("no-data", decisive=True))
    assert invoke("evaluate", "one", "--fail-on", fail_on).exit_code == code


def test_every_problem_on_a_line_of_standard_error(fakes):
    fakes.read["one"] = InputError(
        [Problem("bids/elm/bid.toml", "first", 2), Problem("bids/elm/curve.csv", "second", 9, 4)]
    )
    done = invoke("evaluate", "one")
    assert done.exit_code == 1
    assert done.stdout == ""
    assert done.stderr == "bids/elm/bid.toml:2: first\nbids/elm/curve.csv:9:4: second\n"


def test_unreadable_wins_over_fail_on_and_the_other_folder_is_printed(fakes):
    fakes.read["bad"] = InputError([Problem("inquiry.toml", "wrong", 3)])
    fakes.read["gone"] = InputError([Problem("gone", "there is no such folder")])
    fakes.read["good"] = evaluation(finding("fail"))
    done = invoke("evaluate", "bad", "gone", "good", "--fail-on", "fail")
    assert done.exit_code == 1
    assert done.stdout.strip() == "the table"
    assert done.stderr.splitlines() == ["bad/inquiry.toml:3: wrong", "gone: there is no such folder"]


def test_another_error_on_purpose_needs_no_traceback(fakes):
    fakes.read["one"] = OutOfRange("flow asked beyond the points")
    done = invoke("evaluate", "one")
    assert (done.exit_code, done.stderr) == (1, "flow asked beyond the points\n")


def test_a_mistake_of_ours_is_two_lines_that_say_so(fakes):
    fakes.read["one"] = KeyError("head\x1b[2J\nbids/alder: forged line")
    done = invoke("evaluate", "one")
    assert done.exit_code == 1
    said, what = done.stderr.splitlines()
    assert said.startswith("this is a mistake in bidcheck, not in your files; please report it")
    assert what.startswith("KeyError")
    assert "bidcheck/cli/evaluate_command.py:" in what
    assert "Traceback" not in done.output


def test_trace_lets_a_mistake_of_ours_through(fakes):
    fakes.read["one"] = KeyError("head")
    assert isinstance(invoke("--trace", "evaluate", "one").exception, KeyError)
    assert "--trace" not in invoke("--help").stdout


def test_text_from_inputs_cannot_steer_the_terminal_or_forge_a_line(fakes):
    fakes.read["one"] = InputError([Problem("bids/elm\x1b[31m/bid.toml", "a\x07b\x9b2J\nbids/alder: c\u202ed")])
    done = invoke("evaluate", "one")
    assert done.stderr == "bids/elm[31m/bid.toml: ab2J bids/alder: cd\n"


def test_json_on_standard_output_replaces_the_table(fakes):
    done = invoke("evaluate", "one", "--json", "-")
    assert done.stdout_bytes == '{"η": 1}\n'.encode()
    assert fakes.systems == []


def test_json_in_a_file_stands_beside_the_table(fakes, tmp_path):
    done = invoke("evaluate", "one", "--json", "new.json")
    assert done.stdout == "the table\n"
    assert (tmp_path / "new.json").read_bytes() == '{"η": 1}\n'.encode()
    assert done.stderr == "written: new.json\n"


def test_json_takes_one_folder(fakes):
    done = invoke("evaluate", "one", "two", "--json", "-")
    assert done.exit_code == 2
    assert "--json takes one folder" in done.stderr


def test_out_makes_the_folder_and_leaves_nothing_else_in_it(fakes, tmp_path):
    assert invoke("evaluate", "one", "--out", "deep/report", "--units", "US").exit_code == 0
    written = {path.name: path.read_text(encoding="utf-8") for path in (tmp_path / "deep/report").iterdir()}
    assert written == {"report.html": "<p>US</p>\n", "evaluation.json": '{"η": 1}\n'}


def test_several_folders_get_a_folder_each(fakes, tmp_path):
    assert invoke("evaluate", "one", "two", "--out", "reports").exit_code == 0
    assert sorted(path.name for path in (tmp_path / "reports").iterdir()) == ["one", "two"]


def test_two_inquiries_of_one_name_do_not_overwrite_each_other(fakes, tmp_path):
    done = invoke("evaluate", "a/pump", "b/pump", "--out", "reports")
    assert done.exit_code == 2
    assert "one name" in done.stderr
    assert not (tmp_path / "reports").exists()


def test_nothing_is_written_when_a_text_cannot_be_made(fakes, tmp_path, monkeypatch):
    def fails(_evaluation, system):
        raise ValueError("no page")

    monkeypatch.setattr("bidcheck.report.page.evaluation_page", fails)
    assert invoke("evaluate", "one", "--out", "reports", "--json", "new.json").exit_code == 1
    assert list(tmp_path.iterdir()) == []


def inquiry_folder(tmp_path):
    (tmp_path / "one" / "bids" / "alder").mkdir(parents=True)
    (tmp_path / "one" / "inquiry.toml").write_text("as it was", encoding="utf-8")


@pytest.mark.parametrize(
    ("options", "words"),
    [
        (["--out", "one/bids"], "lies among the bids"),
        (["--out", "one/bids/new/deep"], "lies among the bids"),
        (["--out", "one/inquiry.toml"], "is a file"),
        (["--out", "one/inquiry.toml/deep"], "is a file"),
        (["--json", "one/bids/alder/bid.toml"], "lies among the bids"),
        (["--json", "one/inquiry.toml"], "would be overwritten"),
        (["--json", "nowhere/new.json"], "there is no folder"),
        (["--json", "one"], "is a folder"),
        (["--out", "x\x1b[31m\ny", "--json", "one"], "is a folder"),
    ],
)
def test_refused_before_any_work(fakes, tmp_path, options, words):
    inquiry_folder(tmp_path)
    done = invoke("evaluate", "one", *options)
    assert done.exit_code == 2, done.output
    assert words in done.stderr
    assert "\x1b" not in done.stderr
    assert fakes.skipped == []
    assert (tmp_path / "one" / "inquiry.toml").read_text(encoding="utf-8") == "as it was"


def test_out_may_be_the_inquiry_folder_itself(fakes, tmp_path):
    inquiry_folder(tmp_path)
    assert invoke("evaluate", "one", "--out", "one").exit_code == 0
    assert (tmp_path / "one" / "report.html").exists()


def test_a_file_that_cannot_be_written_is_named_as_given(fakes, monkeypatch):
    def full(*_args, **_options):
        raise OSError(28, "No space left on device", "/somewhere/.bidcheck-x.part")

    monkeypatch.setattr("tempfile.mkstemp", full)
    done = invoke("evaluate", "one", "--json", "new.json")
    assert (done.exit_code, done.stderr) == (1, "new.json: No space left on device\n")


@pytest.mark.parametrize("arguments", [["evaluate"], ["evaluate", "one", "--units", "metric"], ["evaluat", "one"]])
def test_wrong_usage(fakes, arguments):
    assert invoke(*arguments).exit_code == 2
