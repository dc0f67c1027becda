from dataclasses import replace

import pytest

from bidcheck.evaluation import Outcome, outcome_of
from bidcheck.finding import Finding, Verdict, Wording
from bidcheck.limits import Limit, within
from bidcheck.quantity import Kind


def finding(verdict: Verdict, *, decisive: bool = False, accepted: str | None = None) -> Finding:
    return Finding(
        check="bep-match",
        group="operating region",
        subject="rated",
        verdict=verdict,
        wording=Wording("m"),
        evidence={},
        limit=None,
        source="common practice, no source",
        decisive=decisive,
        accepted=accepted,
    )


@pytest.mark.parametrize(
    ("findings", "outcome"),
    [
        ([], Outcome.ACCEPTABLE),
        ([finding(Verdict.PASS), finding(Verdict.REMARK), finding(Verdict.NOT_APPLICABLE)], Outcome.ACCEPTABLE),
        ([finding(Verdict.QUERY)], Outcome.ACCEPTABLE_AFTER_QUERIES),
        ([finding(Verdict.QUERY), finding(Verdict.NO_DATA, decisive=True)], Outcome.INCOMPLETE),
        ([finding(Verdict.NO_DATA)], Outcome.ACCEPTABLE),
        ([finding(Verdict.FAIL), finding(Verdict.NO_DATA, decisive=True)], Outcome.NOT_ACCEPTABLE),
        ([finding(Verdict.FAIL, accepted="agreed")], Outcome.ACCEPTABLE),
        ([finding(Verdict.FAIL, accepted="agreed"), finding(Verdict.QUERY)], Outcome.ACCEPTABLE_AFTER_QUERIES),
    ],
)
def test_what_findings_add_up_to(findings, outcome):
    assert outcome_of(tuple(findings)) is outcome


LIMIT = Limit("rated_over_bep", Kind.WHOLE_SHARE, 0.8, 1.1, "test", "practice")


@pytest.mark.parametrize(
    ("value", "slack", "holds"),
    [
        (0.8, 0.0, True),
        (0.8 * (1 - 1e-12), 0.0, True),
        (0.7999, 0.0, False),
        (0.7999, 0.001, True),
        (1.1, 0.0, True),
        (1.1001, 0.0, False),
        (1.1001, 0.001, True),
    ],
)
def test_exactly_at_the_limit_passes(value, slack, holds):
    assert within(value, LIMIT, slack).holds is holds


def test_a_limit_limits_something():
    with pytest.raises(ValueError, match="needs at_least or at_most"):
        replace(LIMIT, at_least=None, at_most=None)
    with pytest.raises(ValueError, match="above at_most"):
        replace(LIMIT, at_least=2.0)
