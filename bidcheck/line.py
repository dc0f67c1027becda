"""The whole line, from an inquiry with its bids to the evaluation. The first file to read."""

from bidcheck import __version__
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
    cases = [prepare(inquiry, bid) for bid in inquiry.latest_bids()]
    bids = []
    for case in cases:
        findings = run_checks(case, ALL)
        bids.append(BidEvaluation(case=case, findings=findings, outcome=outcome_of(findings)))
    return Evaluation(inquiry=inquiry, bids=tuple(bids), version=__version__)
