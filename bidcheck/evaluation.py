"""What an evaluation came to: per bid the outcome and all that led to it."""

from dataclasses import dataclass
from enum import StrEnum
from typing import TYPE_CHECKING

from bidcheck.case import Case
from bidcheck.finding import Finding, Verdict
from bidcheck.inquiry import Inquiry

if TYPE_CHECKING:
    import pandas


class Outcome(StrEnum):
    """What the findings add up to for a bid, as offered."""

    ACCEPTABLE = "acceptable"
    ACCEPTABLE_AFTER_QUERIES = "acceptable-after-queries"
    INCOMPLETE = "incomplete"
    NOT_ACCEPTABLE = "not-acceptable"


def outcome_of(findings: tuple[Finding, ...]) -> Outcome:
    """Add findings up: an open fail, else decisive data missing, else an open query decides."""
    still_open = [finding for finding in findings if finding.accepted is None]
    if any(finding.verdict is Verdict.FAIL for finding in still_open):
        return Outcome.NOT_ACCEPTABLE
    if any(finding.verdict is Verdict.NO_DATA and finding.decisive for finding in still_open):
        return Outcome.INCOMPLETE
    if any(finding.verdict is Verdict.QUERY for finding in still_open):
        return Outcome.ACCEPTABLE_AFTER_QUERIES
    return Outcome.ACCEPTABLE


@dataclass(frozen=True, eq=False, slots=True, kw_only=True)
class BidEvaluation:
    """One bid's part of the evaluation."""

    case: Case
    findings: tuple[Finding, ...]
    outcome: Outcome

    @property
    def accepted_deviations(self) -> int:
        """How many findings were accepted in spite of their verdict."""
        return sum(finding.accepted is not None for finding in self.findings)


@dataclass(frozen=True, eq=False, slots=True, kw_only=True)
class Evaluation:
    """The evaluation of one inquiry. `bids` in the order of the bidders' names."""

    inquiry: Inquiry
    bids: tuple[BidEvaluation, ...]
    version: str

    def findings_frame(self) -> "pandas.DataFrame":
        """All findings of all bids, a row each, messages in the inquiry's units."""
        from bidcheck.report.frames import findings_frame

        return findings_frame(self)

    def tabulation_frame(self) -> "pandas.DataFrame":
        """The tabulation: items down, bidders across, in the inquiry's units."""
        from bidcheck.report.frames import tabulation_frame

        return tabulation_frame(self)
