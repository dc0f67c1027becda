import io
import re
from dataclasses import replace

import pytest
from rich.console import Console

import bidcheck
from bidcheck.bid import Claims
from bidcheck.errors import Problem
from bidcheck.evaluation import Evaluation
from bidcheck.inquiry import UnreadableBid
from bidcheck.quantity import UnitSystem
from bidcheck.report.terminal import print_evaluation
from tests.build import EXAMPLES, inquiry, sound_bid, sound_curve


def printed(evaluation: Evaluation, width: int = 120, system: UnitSystem = UnitSystem.SI) -> str:
    out = io.StringIO()
    print_evaluation(evaluation, Console(file=out, width=width, highlight=False), system)
    return out.getvalue()


@pytest.fixture(scope="module")
def evaluation() -> Evaluation:
    return bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / "cooling_water"))


@pytest.mark.parametrize("width", [80, 100, 120, 140])
def test_fits_the_width_and_trails_no_blanks(evaluation, width):
    lines = printed(evaluation, width).splitlines()
    assert max(len(line) for line in lines) <= width
    wrapped = [line for line in lines if line.startswith("    ")]
    assert not any(line.endswith(" ") for line in wrapped)


def test_every_bid_has_its_outcome_and_alder_nothing_against_it(evaluation):
    text = printed(evaluation)
    assert re.search(r"alder a  acceptable\n  \d+ passed", text)
    for words in ("birch a  acceptable after queries", "dogwood a  not acceptable", "limit:", "ask:"):
        assert words in text


def test_how_sharp_the_estimate_is_stands_wherever_it_speaks(evaluation):
    assert "How sharp" in printed(evaluation)
    quiet = replace(evaluation, bids=tuple(bid for bid in evaluation.bids if bid.case.bid.bidder == "cedar"))
    assert "How sharp" not in printed(quiet)


def test_a_question_is_asked_once_per_bid():
    text = printed(bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / "boiler_feed")), system=UnitSystem.US)
    assert text.count("Please state NPSH3 at rated flow") == 1
    assert "US gpm" in text


def test_bids_left_out_are_named_and_text_cannot_colour(evaluation):
    left_out = UnreadableBid("fir\x1b[31m", (Problem("bids/fir/bid.toml", "no such key \x07", 3),))
    text = printed(replace(evaluation, inquiry=replace(evaluation.inquiry, unreadable=(left_out,))))
    assert "left out: could not be read" in text
    assert "bids/fir/bid.toml:3" in text
    assert "\x1b" not in text
    assert "\x07" not in text


def test_no_line_breaks_between_a_figure_and_its_unit(evaluation):
    for width in range(80, 140, 7):
        findings = printed(evaluation, width).split("alder a  acceptable\n", 1)[1]
        for line in findings.splitlines():
            assert line.split()[:1] not in (["m"], ["m."], ["%"], ["%."], ["m³/h"], ["kW"])


def test_checks_wanting_the_same_thing_are_told_together():
    bare = sound_bid(curves=(sound_curve(npsh3=None),), claims=Claims())
    text = printed(bidcheck.evaluate(inquiry(bids=(bare,))), 140)
    assert text.count("the bid gives no NPSH3 at best efficiency") == 1
    assert "for want of it not checked either: npsh-form, suction-specific-speed" in text
