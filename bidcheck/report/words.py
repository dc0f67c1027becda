"""Verdicts, outcomes, limits and findings in words."""

import re
from collections.abc import Mapping

from bidcheck.evaluation import Outcome
from bidcheck.finding import Finding, Verdict
from bidcheck.limits import Limit, Mark
from bidcheck.quantity import UnitSystem
from bidcheck.report.format import figure

OUTCOME_WORDS: dict[Outcome, str] = {
    Outcome.ACCEPTABLE: "acceptable",
    Outcome.ACCEPTABLE_AFTER_QUERIES: "acceptable after queries",
    Outcome.INCOMPLETE: "incomplete",
    Outcome.NOT_ACCEPTABLE: "not acceptable",
}
VERDICT_WORDS: dict[Verdict, str] = {
    Verdict.PASS: "pass",
    Verdict.REMARK: "remark",
    Verdict.QUERY: "query",
    Verdict.FAIL: "fail",
    Verdict.NO_DATA: "no data",
    Verdict.NOT_APPLICABLE: "not applicable",
}
VERDICT_MARKS: dict[Verdict, str] = {
    Verdict.PASS: "✓",
    Verdict.REMARK: "!",
    Verdict.QUERY: "?",
    Verdict.FAIL: "✕",
    Verdict.NO_DATA: "○",
    Verdict.NOT_APPLICABLE: "–",
}
"""A sign beside each word, so that verdicts differ without colour."""
MARK_WORDS: dict[Mark, str] = {
    "text": "read in the text named",
    "crossed": "recalled, and reproduced by a second source or computation",
    "memory": "from memory, the text was not at hand",
    "practice": "common practice of the trade, no single source",
    "derived": "follows from published formulas",
    "purchaser": "set by the inquiry",
    "bidder": "stated by the bidder",
}
LOUD = (Verdict.FAIL, Verdict.QUERY, Verdict.NO_DATA, Verdict.REMARK)
"""Verdicts that stand against a bid or are worth knowing, the gravest first."""
CAUTION = (
    "bidcheck screens bids; it does not certify a pump. Limits from memory or common practice are marked as such. The"
    " purchaser's specification, the applicable edition of each standard, local codes and the judgement of a licensed"
    " engineer come first."
)
HOW_SHARP = (
    "How sharp the efficiency estimate is: an overstatement of 3 points cannot be shown by it, 5 seldom; 8 mostly and"
    " 10 nearly always for end suction and double suction pumps at four poles or slower, less often for in-line, small"
    " and faster ones."
)


def limit_in_words(limit: Limit, system: UnitSystem) -> str:
    """A limit as a phrase.

    Examples
    --------
    >>> from bidcheck.quantity import Kind
    >>> limit_in_words(Limit("rated_over_bep", Kind.WHOLE_SHARE, 0.8, 1.1, "", "text"), UnitSystem.SI)
    '80 % to 110 %'
    """
    low = None if limit.at_least is None else figure(limit.at_least, limit.kind, system)
    high = None if limit.at_most is None else figure(limit.at_most, limit.kind, system)
    if low is not None and high is not None:
        return f"{low} to {high}"
    return f"at least {low}" if high is None else f"at most {high}"


_ONE_FIGURE = re.compile(r"(?<![\w.])(\d[\d.]*(?: (?:%|m|ft|mm|in))?) to \1(?=[\s,;:.)]|$)")
"""A range whose ends print alike, which is one figure."""


class _Filled(dict[str, str]):
    """Evidence as text; a name a template uses and the finding lacks is a mistake of ours."""

    def __missing__(self, name: str) -> str:
        raise KeyError(f"a wording asks for {{{name}}}, which the finding does not give")


def _fill(template: str, finding: Finding, system: UnitSystem) -> str:
    values = _Filled({name: figure(item.value, item.kind, system) for name, item in finding.evidence.items()})
    values["subject"] = finding.subject
    if finding.limit is not None:
        values["limit"] = limit_in_words(finding.limit, system)
    return _ONE_FIGURE.sub(r"\1", template.format_map(values))


def message(finding: Finding, system: UnitSystem) -> str:
    """What was found, in the units asked for."""
    text = _fill(finding.wording.message, finding, system)
    return text[:1].upper() + text[1:]


def question(finding: Finding, system: UnitSystem) -> str:
    """The question to the bidder; empty where there is nothing to ask."""
    text = _fill(finding.wording.question, finding, system) if asks(finding) else ""
    return text[:1].upper() + text[1:]


def asks(finding: Finding) -> bool:
    """Whether a finding asks its question: fails, queries and missing data do."""
    return finding.verdict in (Verdict.FAIL, Verdict.QUERY, Verdict.NO_DATA) and bool(finding.wording.question)


def against(findings: tuple[Finding, ...]) -> list[Finding]:
    """Findings that stand against a bid or are worth knowing, the gravest first."""
    return sorted(
        (finding for finding in findings if finding.verdict in LOUD), key=lambda item: LOUD.index(item.verdict)
    )


def counted(findings: tuple[Finding, ...]) -> Mapping[Verdict, int]:
    """How many findings of each verdict."""
    return {verdict: sum(finding.verdict is verdict for finding in findings) for verdict in Verdict}
