import string
from dataclasses import replace

import pytest

import bidcheck
from bidcheck.checks import ALL
from bidcheck.checks.request import COMMON
from bidcheck.evaluation import Evaluation, Outcome
from bidcheck.finding import Evidence, Finding, Verdict, Wording
from bidcheck.limits import Limit
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.report.reference import GROUPS
from bidcheck.report.words import (
    MARK_WORDS,
    OUTCOME_WORDS,
    VERDICT_MARKS,
    VERDICT_WORDS,
    against,
    limit_in_words,
    message,
    question,
)
from tests.build import EXAMPLES


@pytest.fixture(scope="module")
def evaluation() -> Evaluation:
    return bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / "cooling_water"))


def finding(**changes: object) -> Finding:
    base = Finding(
        check="bep-match",
        group="operating region",
        subject="rated",
        verdict=Verdict.QUERY,
        wording=Wording("Rated flow {rated} of {who}.", "Why {rated}, against {limit}?"),
        evidence={"rated": Evidence(0.125, Kind.FLOW), "who": Evidence("{rated} <b>", Kind.TEXT)},
        limit=Limit("rated_over_bep", Kind.WHOLE_SHARE, 0.8, 1.1, "API 610", "text"),
        source="API 610",
    )
    return replace(base, **changes)  # type: ignore[arg-type]


def test_every_word_and_mark_exists_and_verdicts_differ_without_colour():
    assert set(VERDICT_WORDS) == set(VERDICT_MARKS) == set(Verdict)
    assert len(set(VERDICT_MARKS.values())) == len(Verdict)
    assert set(OUTCOME_WORDS) == set(Outcome)


def test_messages_are_filled_in_the_units_asked_for():
    assert message(finding(), UnitSystem.SI) == "Rated flow 450 m³/h of {rated} <b>."
    assert question(finding(), UnitSystem.US) == "Why 1981 US gpm, against 80 % to 110 %?"


def test_only_what_is_open_asks():
    assert question(finding(verdict=Verdict.PASS), UnitSystem.SI) == ""
    assert question(finding(verdict=Verdict.REMARK), UnitSystem.SI) == ""


def test_the_gravest_comes_first():
    some = tuple(finding(verdict=verdict, subject=verdict.value) for verdict in Verdict)
    assert [item.verdict for item in against(some)] == [
        Verdict.FAIL,
        Verdict.QUERY,
        Verdict.NO_DATA,
        Verdict.REMARK,
    ]


@pytest.mark.parametrize(
    ("low", "high", "words"), [(0.8, 1.1, "80 % to 110 %"), (0.8, None, "at least 80 %"), (None, 1.1, "at most 110 %")]
)
def test_limits_in_words(low, high, words):
    limit = Limit("x", Kind.WHOLE_SHARE, low, high, "o", "text")
    assert limit_in_words(limit, UnitSystem.SI) == words


def test_every_finding_of_the_examples_can_be_worded(evaluation):
    for bid in evaluation.bids:
        for item in bid.findings:
            for system in UnitSystem:
                text = message(item, system)
                assert text
                assert "{" not in text
                question(replace(item, verdict=Verdict.QUERY), system)
                assert item.limit is None or (item.limit.origin and item.limit.mark in MARK_WORDS)


def test_every_check_is_well_formed():
    assert len({check.name for check in ALL}) == len(ALL)
    for check in ALL:
        assert check.group in GROUPS
        assert check.source
        for wording in (*check.wordings.values(), *COMMON.values()):
            for template in (wording.message, wording.question):
                assert all(
                    name == "" or name.isidentifier() for _, name, _, _ in string.Formatter().parse(template) if name
                )


def test_queries_of_a_check_always_ask():
    for check in ALL:
        asks = any(wording.question for wording in check.wordings.values())
        assert check.otherwise is not Verdict.QUERY or asks


@pytest.mark.parametrize(
    ("low", "high", "words"),
    [(1.361, 1.362, "1.36 is expected"), (1.36, 1.37, "1.36 to 1.37 is expected"), (1.3, 11.3, "1.30 to 11.3 is")],
)
def test_a_range_whose_ends_print_alike_is_one_figure(low, high, words):
    evidence = {"low": Evidence(low, Kind.RATIO), "high": Evidence(high, Kind.RATIO)}
    finding = Finding(
        check="curve-shape",
        group="curve form",
        subject="shutoff head",
        verdict=Verdict.PASS,
        wording=Wording("{low} to {high} is expected."),
        evidence=evidence,
        limit=None,
        source="",
    )
    assert message(finding, UnitSystem.SI).startswith(words)
