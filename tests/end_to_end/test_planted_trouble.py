"""Each example bid shows exactly the trouble planted in it."""

import hashlib
from pathlib import Path

import pytest

import bidcheck
from bidcheck import Outcome, Verdict
from tests.build import EXAMPLES
from tests.rewrite_units import rewrite_in_us_units

LOUD = (Verdict.REMARK, Verdict.QUERY, Verdict.FAIL, Verdict.NO_DATA)

COOLING_WATER = {
    "alder": (Outcome.ACCEPTABLE, set()),
    "birch": (
        Outcome.ACCEPTABLE_AFTER_QUERIES,
        {("efficiency-claim", Verdict.QUERY), ("efficiency-peers", Verdict.REMARK)},
    ),
    "cedar": (Outcome.ACCEPTABLE_AFTER_QUERIES, {("bep-match", Verdict.QUERY)}),
    "dogwood": (Outcome.NOT_ACCEPTABLE, {("npsh-margin", Verdict.FAIL)}),
    "elm": (Outcome.ACCEPTABLE_AFTER_QUERIES, {("power-balance", Verdict.QUERY), ("odd-point", Verdict.QUERY)}),
}
BOILER_FEED = {
    "hazel": (Outcome.ACCEPTABLE, set()),
    "juniper": (
        Outcome.INCOMPLETE,
        {
            ("curve-stability", Verdict.REMARK),
            ("missing-data", Verdict.NO_DATA),
            ("npsh-margin", Verdict.NO_DATA),
            ("npsh-claim", Verdict.NO_DATA),
            ("npsh-form", Verdict.NO_DATA),
            ("suction-specific-speed", Verdict.NO_DATA),
        },
    ),
    "larch": (
        Outcome.ACCEPTABLE_AFTER_QUERIES,
        {("npsh-claim", Verdict.QUERY), ("suction-specific-speed", Verdict.QUERY)},
    ),
}


def loud(evaluation: bidcheck.Evaluation) -> dict[str, tuple[Outcome, set[tuple[str, Verdict]]]]:
    """Outcome and everything said of each bid."""
    return {
        bid.case.bid.bidder: (
            bid.outcome,
            {(finding.check, finding.verdict) for finding in bid.findings if finding.verdict in LOUD},
        )
        for bid in evaluation.bids
    }


def verdicts(evaluation: bidcheck.Evaluation) -> dict[tuple[str, str, str], Verdict]:
    """Verdict of every finding by bidder, check and subject."""
    return {
        (bid.case.bid.bidder, finding.check, finding.subject): finding.verdict
        for bid in evaluation.bids
        for finding in bid.findings
    }


@pytest.mark.parametrize(("folder", "expected"), [("cooling_water", COOLING_WATER), ("boiler_feed", BOILER_FEED)])
def test_exactly_the_planted_trouble(folder, expected):
    assert loud(bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / folder))) == expected


def test_birch_is_called_implausible_not_impossible():
    evaluation = bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / "cooling_water"))
    (birch,) = (bid for bid in evaluation.bids if bid.case.bid.bidder == "birch")
    (claim,) = (f for f in birch.findings if (f.check, f.subject) == ("efficiency-claim", "best efficiency"))
    assert "implausible" in claim.wording.message


def test_elm_names_the_mistake_and_the_value_that_would_fit():
    evaluation = bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / "cooling_water"))
    (elm,) = (bid for bid in evaluation.bids if bid.case.bid.bidder == "elm")
    (balance,) = (f for f in elm.findings if f.check == "power-balance" and f.subject == "all points")
    assert "hp under a kW heading" in str(balance.evidence["mistakes"].value)
    (odd,) = (f for f in elm.findings if f.check == "odd-point" and f.verdict is Verdict.QUERY)
    assert abs(float(odd.evidence["would_fit"].value) - float(odd.evidence["found"].value)) > 2.0


def test_us_units_give_the_same_verdicts(tmp_path):
    rewrite_in_us_units(EXAMPLES / "cooling_water", tmp_path / "us")
    metric = bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / "cooling_water"))
    us = bidcheck.evaluate(bidcheck.read_inquiry(tmp_path / "us"))
    assert verdicts(us) == verdicts(metric)


def fingerprint(folder: Path) -> dict[str, str]:
    """Hash of every file below a folder."""
    return {
        str(path.relative_to(folder)): hashlib.sha256(path.read_bytes()).hexdigest()
        for path in sorted(folder.rglob("*"))
        if path.is_file()
    }


def test_nothing_is_written_into_the_inquiry_folder():
    before = fingerprint(EXAMPLES / "cooling_water")
    bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / "cooling_water"))
    assert fingerprint(EXAMPLES / "cooling_water") == before
