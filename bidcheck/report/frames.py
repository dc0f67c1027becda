"""The evaluation as pandas frames."""

from typing import TYPE_CHECKING

from bidcheck.evaluation import Evaluation
from bidcheck.quantity import UnitSystem
from bidcheck.report.tabulation import tabulation
from bidcheck.report.words import limit_in_words, message, question

if TYPE_CHECKING:
    import pandas


def findings_frame(evaluation: Evaluation, system: UnitSystem | None = None) -> "pandas.DataFrame":
    """All findings of all bids, a row each.

    Parameters
    ----------
    evaluation : Evaluation
    system : UnitSystem, optional
        Units of the texts; those of the inquiry where not given.

    Returns
    -------
    pandas.DataFrame
        Columns bidder, revision, group, check, subject, verdict, message, limit, origin, question, accepted.
    """
    import pandas as pd

    units = system or evaluation.inquiry.units
    rows = [
        {
            "bidder": bid.case.bid.bidder,
            "revision": bid.case.bid.revision,
            "group": finding.group,
            "check": finding.check,
            "subject": finding.subject,
            "verdict": finding.verdict.value,
            "message": message(finding, units),
            "limit": "" if finding.limit is None else limit_in_words(finding.limit, units),
            "origin": "" if finding.limit is None else finding.limit.origin,
            "question": question(finding, units),
            "accepted": finding.accepted,
        }
        for bid in evaluation.bids
        for finding in bid.findings
    ]
    return pd.DataFrame(rows)


def tabulation_frame(evaluation: Evaluation, system: UnitSystem | None = None) -> "pandas.DataFrame":
    """The tabulation: items down (index), "required" and the bidders across; texts with units."""
    import pandas as pd

    table = tabulation(evaluation, system or evaluation.inquiry.units)
    columns = {"required": [row.required for row in table.rows]}
    for index, name in enumerate(table.bidders):
        columns[name] = [row.values[index] for row in table.rows]
    return pd.DataFrame(columns, index=pd.Index([row.item for row in table.rows], name="item"))
