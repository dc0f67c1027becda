import html
import re
from dataclasses import replace
from html.parser import HTMLParser

import pytest

import bidcheck
from bidcheck.bid import Claims
from bidcheck.errors import Problem
from bidcheck.evaluation import Evaluation, Outcome
from bidcheck.inquiry import UnreadableBid
from bidcheck.quantity import UnitSystem
from bidcheck.report.format import tied
from bidcheck.report.page import evaluation_page
from bidcheck.report.words import CAUTION, OUTCOME_WORDS, against, message, question
from tests.build import EXAMPLES, inquiry, sound_bid, sound_curve

HOSTILE = "<script>alert(1)</script>\"' onload=x {{ 7*7 }}"
VOID = {"meta", "link", "br", "img", "input", "hr", "path", "use"}


class Outline(HTMLParser):
    """Headings in order, tags left open, references and ids of a page."""

    def __init__(self) -> None:
        super().__init__()
        self.headings: list[int] = []
        self.open: list[str] = []
        self.scripts = 0
        self.refs: list[str] = []
        self.ids: list[str] = []
        self.bare_th = 0

    def handle_starttag(self, tag, attrs):
        self._seen(tag, dict(attrs))
        if tag not in VOID:
            self.open.append(tag)

    def handle_startendtag(self, tag, attrs):
        self._seen(tag, dict(attrs))

    def handle_endtag(self, tag):
        if tag not in VOID:
            assert self.open.pop() == tag

    def _seen(self, tag, attrs):
        self.scripts += tag in ("script", "iframe", "object", "embed", "link", "img")
        self.scripts += any(name.startswith("on") for name in attrs)
        self.bare_th += tag == "th" and "scope" not in attrs
        if re.fullmatch("h[1-6]", tag):
            self.headings.append(int(tag[1]))
        self.refs += [attrs[name] for name in ("src", "href", "xlink:href", "data", "action") if name in attrs]
        if "id" in attrs:
            self.ids.append(attrs["id"])


def outline(page: str) -> Outline:
    found = Outline()
    found.feed(page)
    found.close()
    assert found.open == []
    return found


def words_of(page: str) -> str:
    """Text of a page as a person reads it."""
    text = re.sub(r"<(style|svg)\b.*?</\1>", " ", page, flags=re.DOTALL)
    return html.unescape(re.sub(r"<[^>]+>", "", text)).replace("\u00a0", " ")


def example(name: str) -> Evaluation:
    return bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / name))


@pytest.fixture(scope="module", params=["cooling_water", "boiler_feed"])
def evaluation(request) -> Evaluation:
    return example(request.param)


@pytest.fixture(scope="module", params=list(UnitSystem))
def system(request) -> UnitSystem:
    return request.param


@pytest.fixture(scope="module")
def page(evaluation, system) -> str:
    return evaluation_page(evaluation, system=system)


def test_two_renderings_are_the_same_bytes(evaluation, system, page):
    assert evaluation_page(evaluation, system=system) == page


def test_every_outcome_message_and_question_is_on_the_page(evaluation, system, page):
    text = words_of(page)
    for bid in evaluation.bids:
        assert OUTCOME_WORDS[bid.outcome] in text
        for finding in against(bid.findings):
            assert message(finding, system) in text
            assert question(finding, system) in text


def test_the_gravest_finding_of_a_bid_comes_first(page):
    order = ["fail", "query", "no-data", "remark"]
    for article in re.findall(r"<article.*?</article>", page, flags=re.DOTALL):
        verdicts = [order.index(found) for found in re.findall(r'<div class="finding ([a-z-]+)', article)]
        assert verdicts == sorted(verdicts)


def test_headings_step_down_one_at_a_time_and_every_heading_cell_has_a_scope(page):
    found = outline(page)
    assert found.headings[0] == 1
    assert found.headings.count(1) == 1
    assert all(after - before <= 1 for before, after in zip(found.headings, found.headings[1:], strict=False))
    assert found.bare_th == 0


def test_nothing_is_loaded_from_elsewhere_and_nothing_runs(page):
    found = outline(page)
    assert found.scripts == 0
    assert all(ref.startswith("#") for ref in found.refs)
    assert {ref[1:] for ref in found.refs} <= set(found.ids)
    assert not re.search(r"url\((?!#)|@import|@font-face", page)
    assert page.startswith("<!DOCTYPE html>\n<html lang=")


def test_no_id_stands_twice(page):
    ids = outline(page).ids
    assert len(ids) == len(set(ids))


def test_us_units_leave_no_metric_flow_head_or_power(evaluation):
    text = evaluation_page(evaluation, system=UnitSystem.US)
    shown = re.sub(r"<table class=\"inputs\".*?</table>", "", words_of(text), flags=re.DOTALL)
    figures = "".join(re.findall(r"<svg.*?</svg>", text, flags=re.DOTALL))
    assert "US gpm" in shown
    assert "flow [US gpm]" in figures
    for unit in ("m³/h", "m3/h", "kW", "[m]"):
        assert unit not in figures
    first = shown[: shown.index("passed or not applicable")]
    assert not re.search(r"\d (m³/h|m|kW)\b", first)


def test_limits_and_inputs_all_stand_on_the_page(evaluation, system, page):
    text = words_of(page)
    for limit in evaluation.inquiry.limits.all():
        assert tied(limit.origin).replace("\u00a0", " ") in text
    for item in evaluation.inquiry.inputs:
        assert item.file in text
        assert item.sha256 in text
    assert words_of(page).count(CAUTION) == 1


@pytest.mark.parametrize("where", ["tag", "title"])
def test_text_of_the_inquiry_is_escaped(where):
    page = evaluation_page(bidcheck.evaluate(inquiry(**{where: HOSTILE})), system=UnitSystem.SI)
    assert "<script" not in page
    assert outline(page).scripts == 0
    assert HOSTILE in words_of(page)


def test_text_of_a_bidder_is_escaped_everywhere_it_appears():
    bid = sound_bid(bidder=HOSTILE, title=HOSTILE, model=HOSTILE, revision="<b>")
    left_out = UnreadableBid(HOSTILE, (Problem(HOSTILE, HOSTILE, 3),))
    evaluation = bidcheck.evaluate(inquiry(bids=(bid,), unreadable=(left_out,)))
    page = evaluation_page(evaluation, system=UnitSystem.SI)
    assert "<script" not in page
    assert "<b>" not in re.sub("<b>(To ask|Accepted):</b>", "", page)
    assert outline(page).scripts == 0
    assert "{{ 7*7 }}" in page


def test_a_bid_left_out_is_named_with_every_problem():
    problems = (Problem("bids/fir/bid.toml", "no such key", 3), Problem("bids/fir/curve.csv", "no flow column", 1))
    evaluation = bidcheck.evaluate(inquiry(unreadable=(UnreadableBid("fir", problems),)))
    text = words_of(evaluation_page(evaluation, system=UnitSystem.SI))
    assert "fir is left out" in text
    for problem in problems:
        assert str(problem) in text
    assert text.index("fir is left out") < text.index("What stands against each bid")


@pytest.mark.parametrize("missing", ["head", "efficiency", "power", "npsh3"])
def test_a_curve_without_one_column_makes_a_page(missing):
    bids = (sound_bid(), sound_bid(bidder="cedar", curves=(sound_curve(**{missing: None}),), claims=Claims()))
    text = words_of(evaluation_page(bidcheck.evaluate(inquiry(bids=bids)), system=UnitSystem.SI))
    assert text.count("Not drawn") == {"head": 2, "npsh3": 1}.get(missing, 0)  # no head, no specific speed


def test_a_bid_without_any_curve_is_named_beneath_every_figure():
    bids = (sound_bid(), sound_bid(bidder="cedar", curves=(), claims=Claims()))
    text = words_of(evaluation_page(bidcheck.evaluate(inquiry(bids=bids)), system=UnitSystem.SI))
    assert text.count("Not drawn, for want of points: cedar a.") == 4


def test_an_inquiry_without_a_readable_bid_says_so():
    evaluation = bidcheck.evaluate(inquiry(bids=()))
    text = words_of(evaluation_page(evaluation, system=UnitSystem.SI))
    assert "No bid could be evaluated." in text


def test_an_accepted_finding_is_shown_with_its_reason():
    evaluation = example("cooling_water")
    bid = next(bid for bid in evaluation.bids if bid.outcome is Outcome.ACCEPTABLE_AFTER_QUERIES)
    reason = "spare impeller <ordered>"
    findings = tuple(
        replace(finding, accepted=reason) if finding is against(bid.findings)[0] else finding
        for finding in bid.findings
    )
    page = evaluation_page(replace(evaluation, bids=(replace(bid, findings=findings),)), system=UnitSystem.SI)
    text = words_of(page)
    assert f"Accepted: {reason}" in text
    assert "with 1 accepted" in text


def test_a_limit_origin_from_the_inquiry_is_escaped():
    base = inquiry()
    limits = replace(base.limits, rated_over_bep=replace(base.limits.rated_over_bep, origin="<i>clause 4</i>"))
    page = evaluation_page(bidcheck.evaluate(inquiry(limits=limits)), system=UnitSystem.SI)
    assert "<i>clause" not in page
    assert "<i>clause 4</i>" in words_of(page)


def test_limits_are_told_by_figures_not_by_names(page):
    assert "nss_ordinary" not in page
    assert "above at most" not in page
    assert "where suction specific speed is above" in words_of(page)
    assert "`" not in words_of(page)


def test_no_line_breaks_between_a_figure_and_its_unit(evaluation):
    page = evaluation_page(evaluation, system=UnitSystem.SI)
    rated = page[page.index("rated flow") : page.index("rated head")]
    assert "m³/h" in rated
    assert " m³/h" not in rated


def test_the_same_question_is_asked_once_per_bid():
    page = words_of(evaluation_page(example("boiler_feed"), system=UnitSystem.US))
    assert page.count("Please state NPSH3 at rated flow") == 1
