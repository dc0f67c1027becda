"""The whole line, from an inquiry with its bids to the evaluation. The first file to read."""

from dataclasses import replace

from bidcheck import __version__
from bidcheck.case import Case
from bidcheck.checks import ALL
from bidcheck.checks.runner import run_checks
from bidcheck.evaluation import BidEvaluation, Evaluation, outcome_of
from bidcheck.inquiry import Inquiry
from bidcheck.prepare import prepare


def evaluate(inquiry: Inquiry) -> Evaluation:
    """Evaluate the latest revision of every bid of an inquiry.

    Parameters
    ----------
    inquiry : Inquiry
        As read by `bidcheck.read_inquiry`, or built in memory.

    Returns
    -------
    Evaluation
        Bids in the order of their names.
    """
    cases = tuple(prepare(inquiry, bid) for bid in inquiry.latest_bids())
    together = [replace(case, bids=cases) for case in cases]
    return Evaluation(inquiry=inquiry, bids=tuple(judged(case) for case in together), version=__version__)


def judged(case: Case) -> BidEvaluation:
    """Run every check over one case and add the findings up."""
    findings = run_checks(case, ALL)
    return BidEvaluation(case=case, findings=findings, outcome=outcome_of(findings))
