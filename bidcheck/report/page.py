"""The evaluation as one self-contained HTML page: opens from a file, prints, needs no network."""

import re
from dataclasses import dataclass, replace
from typing import Any

from bidcheck.evaluation import BidEvaluation, Evaluation
from bidcheck.finding import Finding, Verdict
from bidcheck.limits import Limit, limit_names
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.report.beside import beside, source_in_words, sources_of
from bidcheck.report.figures import efficiency_figure, head_figure, npsh_figure, without
from bidcheck.report.format import figure, plain
from bidcheck.report.page_template import template
from bidcheck.report.tabulation import margin_in_words, tabulation
from bidcheck.report.window_map import off_the_map, window_figure
from bidcheck.report.words import (
    CAUTION,
    HOW_SHARP,
    MARK_WORDS,
    OUTCOME_WORDS,
    VERDICT_MARKS,
    VERDICT_WORDS,
    against,
    counted,
    limit_in_words,
    message,
    question,
)

PLURAL = {Verdict.FAIL: "fails", Verdict.QUERY: "queries", Verdict.REMARK: "remarks"}


@dataclass(frozen=True, slots=True)
class Spoken:
    """One finding in words."""

    verdict: str
    word: str
    mark: str
    check: str
    subject: str
    message: str
    limit: str
    origin: str
    known: str
    question: str
    accepted: str
    source: str


def evaluation_page(evaluation: Evaluation, *, system: UnitSystem) -> str:
    """Write the page.

    Parameters
    ----------
    evaluation : Evaluation
    system : UnitSystem
        Units to print.

    Returns
    -------
    str
        HTML text; the same evaluation gives the same bytes.
    """
    inquiry = evaluation.inquiry
    return template("page.html.j2").render(
        tag=plain(inquiry.tag),
        title=plain(inquiry.title),
        duty=_duty(evaluation, system),
        limit_set=inquiry.limits.set_name,
        version=evaluation.version,
        summary=[_summary(bid, system) for bid in evaluation.bids],
        bids=[_bid(bid, system) for bid in evaluation.bids],
        unreadable=[
            {"bidder": plain(bid.bidder), "problems": [plain(str(problem)) for problem in bid.problems]}
            for bid in inquiry.unreadable
        ],
        table=tabulation(evaluation, system),
        figures=_figures(evaluation, system),
        estimates=[_estimate(bid, system) for bid in evaluation.bids],
        beside=beside(evaluation, system),
        limits=_limits(evaluation, system),
        mark_words=MARK_WORDS,
        assumptions=inquiry.assumptions,
        inputs=inquiry.inputs,
        sources=sorted({finding.source for bid in evaluation.bids for finding in bid.findings}),
        caution=CAUTION,
        how_sharp=HOW_SHARP,
    )


def _duty(evaluation: Evaluation, system: UnitSystem) -> list[tuple[str, str]]:
    """The duty, a name and a figure each."""
    duty, liquid = evaluation.inquiry.duty, evaluation.inquiry.liquid
    return [
        ("rated flow", figure(duty.rated_flow, Kind.FLOW, system)),
        ("rated head", figure(duty.rated_head, Kind.HEAD, system)),
        ("smallest flow", figure(duty.min_flow, Kind.FLOW, system)),
        ("largest flow", figure(duty.max_flow, Kind.FLOW, system)),
        ("NPSH available", "from suction data" if evaluation.inquiry.suction else _npsha(evaluation, system)),
        ("pumps running", f"{duty.pumps_running} of {duty.pumps_installed} installed"),
        ("liquid", f"{plain(liquid.name)}, {figure(liquid.density, Kind.DENSITY, system)}"),
    ]


def _npsha(evaluation: Evaluation, system: UnitSystem) -> str:
    """NPSH available at rated and at the largest flow."""
    duty = evaluation.inquiry.duty
    words = figure(duty.npsha, Kind.NPSH, system)
    if duty.npsha_at_max_flow is not None:
        words += f", {figure(duty.npsha_at_max_flow, Kind.NPSH, system)} at the largest flow"
    return words


def _summary(bid: BidEvaluation, system: UnitSystem) -> dict[str, str]:
    """One row of the first table."""
    case = bid.case
    estimate = case.estimates.efficiency
    counts = counted(bid.findings)
    loud = [
        _count(counts[verdict], verdict)
        for verdict in (Verdict.FAIL, Verdict.QUERY, Verdict.NO_DATA, Verdict.REMARK)
        if counts[verdict]
    ]
    accepted = bid.accepted_deviations
    return {
        "name": plain(case.bid.name),
        "title": plain(case.bid.title),
        "anchor": plain(case.bid.bidder),
        "outcome": OUTCOME_WORDS[bid.outcome] + (f", with {accepted} accepted" if accepted else ""),
        "outcome_id": bid.outcome.value,
        "against": ", ".join(loud) or "nothing",
        "ratio": figure(case.at_duty.flow_over_bep, Kind.WHOLE_SHARE, system),
        "offered": figure(case.estimates.offered_efficiency, Kind.SHARE, system),
        "expected": figure(estimate.expected if estimate is not None else None, Kind.SHARE, system),
        "margin": margin_in_words(bid, system),
        "power": figure(case.at_duty.power, Kind.POWER, system),
    }


def _count(number: int, verdict: Verdict) -> str:
    """A number of verdicts in words: "1 query", "2 queries"."""
    word = VERDICT_WORDS[verdict] if number == 1 else PLURAL.get(verdict, VERDICT_WORDS[verdict])
    return f"{number} {word}"


def _spoken(finding: Finding, system: UnitSystem) -> Spoken:
    """A finding in words, for the template."""
    limit = finding.limit
    return Spoken(
        verdict=finding.verdict.value,
        word=VERDICT_WORDS[finding.verdict],
        mark=VERDICT_MARKS[finding.verdict],
        check=finding.check,
        subject=plain(finding.subject),
        message=message(finding, system),
        limit="" if limit is None else limit_in_words(limit, system),
        origin="" if limit is None else plain(limit.origin),
        known="" if limit is None else MARK_WORDS[limit.mark],
        question=question(finding, system),
        accepted=plain(finding.accepted or ""),
        source=finding.source,
    )


def _bid(bid: BidEvaluation, system: UnitSystem) -> dict[str, Any]:
    """What stands against one bid, what passed, what was assumed."""
    quiet = (Verdict.PASS, Verdict.NOT_APPLICABLE)
    return {
        "name": plain(bid.case.bid.name),
        "title": plain(bid.case.bid.title),
        "anchor": plain(bid.case.bid.bidder),
        "outcome": OUTCOME_WORDS[bid.outcome],
        "outcome_id": bid.outcome.value,
        "loud": _asked_once([_spoken(finding, system) for finding in against(bid.findings)]),
        "quiet": [_spoken(finding, system) for finding in bid.findings if finding.verdict in quiet],
        "assumptions": [
            {"what": plain(item.what), "value": plain(item.value), "why": plain(item.why)}
            for item in bid.case.assumptions
        ],
    }


def _asked_once(findings: list[Spoken]) -> list[Spoken]:
    """The same findings, a question that was asked before left out."""
    asked: set[str] = set()
    once = []
    for item in findings:
        once.append(replace(item, question="") if item.question in asked else item)
        asked.add(item.question)
    return once


def _figures(evaluation: Evaluation, system: UnitSystem) -> list[dict[str, Any]]:
    """Figures with captions; SVG of our own making is markup, captions are text."""
    from markupsafe import Markup

    made = (
        (
            "Head",
            head_figure(evaluation, system),
            "Fitted head of each bid as pumped at the offered diameter, with its points; the cross is the duty, the"
            " shaded band the range from smallest to largest flow. Nothing is drawn beyond a bidder's points.",
            without(evaluation, "head"),
        ),
        (
            "Efficiency",
            efficiency_figure(evaluation, system),
            "Fitted efficiency of each bid. At each best efficiency (maximum diameter where a curve of it is given) the"
            " wide bar over the bid's marker is the independent expectation with its error, the short line what the"
            " published chart calls attainable; bars that would meet are moved apart.",
            without(evaluation, "efficiency"),
        ),
        (
            "NPSH",
            npsh_figure(evaluation, system),
            "Fitted NPSH3 of each bid against NPSH available at the flows the inquiry gives it for (joined by straight"
            " lines). Beneath it, dashed, the highest NPSH3 that keeps the margin the bids are held against; dotted"
            " where that margin is raised for high suction specific speed.",
            without(evaluation, "npsh3"),
        ),
        (
            "Specific speed by flow",
            window_figure(evaluation, system),
            "Best efficiency point of each bid (maximum diameter where a curve of it is given) by flow and specific"
            " speed of total flow. The shaded window is where ordinary impellers are built, after the ends of a"
            " published chart of the Hydraulic Institute; dashed, the nearest reading is held. Grey lines are what the"
            " chart calls practically attainable. Outside the window a list of like installations is worth asking for,"
            " no more.",
            off_the_map(evaluation),
        ),
    )
    return [
        {"name": name, "svg": Markup(svg), "caption": caption, "without": ", ".join(missing)}
        for name, svg, caption, missing in made
        if svg
    ]


def _estimate(bid: BidEvaluation, system: UnitSystem) -> dict[str, Any]:
    """The independent picture of one bid."""
    estimates = bid.case.estimates
    estimate = estimates.efficiency
    shares = {
        name: figure(getattr(estimate, name) if estimate is not None else None, Kind.SHARE, system)
        for name in ("expected", "attainable", "implausible_above", "ceiling")
    }
    offered = estimates.offered_efficiency
    below = estimate.market_share_below(offered) if estimate is not None and offered is not None else None
    return shares | {
        "name": plain(bid.case.bid.name),
        "offered": figure(offered, Kind.SHARE, system),
        "nq": figure(estimates.nq, Kind.SPECIFIC_SPEED, system),
        "nss": figure(estimates.nss, Kind.SUCTION_SPECIFIC_SPEED, system),
        "npsh3": figure(estimates.suction.ordinary if estimates.suction else None, Kind.NPSH, system),
        "market": figure(below, Kind.WHOLE_SHARE, system),
        "basis": estimates.basis,
        "reason": estimate.reason if estimate is not None else "",
        "expected_from": estimate.expected_from if estimate is not None else "",
        "sources": [source_in_words(quantity, source, system) for quantity, source in sources_of(estimates)],
    }


def _limits(evaluation: Evaluation, system: UnitSystem) -> list[dict[str, str]]:
    """Every limit in force."""
    names, limits = limit_names(), evaluation.inquiry.limits

    def spelt(meaning: str) -> str:
        """A meaning with the figure of any other limit it names."""
        return re.sub("`(.+?)`", lambda found: _bound(getattr(limits, found[1]), system), meaning)

    return [
        {
            "meaning": spelt(names[limit.name][1]),
            "words": limit_in_words(limit, system) + (", mandatory" if limit.mandatory else ""),
            "origin": plain(limit.origin),
            "mark": limit.mark,
        }
        for limit in limits.all()
    ]


def _bound(limit: Limit, system: UnitSystem) -> str:
    """The figure of a limit alone, to stand in a sentence."""
    return figure(limit.at_least if limit.at_most is None else limit.at_most, limit.kind, system)
