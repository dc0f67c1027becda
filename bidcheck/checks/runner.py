"""Run checks over a case: from measured comparisons to findings."""

from collections.abc import Iterable

from bidcheck.case import Case
from bidcheck.checks.request import COMMON
from bidcheck.checks.verdicts import missed
from bidcheck.finding import Check, Finding, Measured, Verdict, Wording


def verdict_of(check: Check, measured: Measured) -> Verdict:
    """Verdict of one comparison: outright where the check gives it, else by the limit."""
    if measured.verdict is not None:
        return measured.verdict
    if measured.holds is None:
        raise ValueError(f"{check.name}: a comparison needs a verdict or a comparison with a limit")
    return Verdict.PASS if measured.holds.holds else missed(measured.holds.limit, check.otherwise)


def wording_of(check: Check, measured: Measured) -> Wording:
    """Wording of one comparison: the check's own, else one of those all checks share."""
    return check.wordings.get(measured.wording) or COMMON[measured.wording]


def finding_of(check: Check, measured: Measured) -> Finding:
    """Make a finding of one comparison."""
    limit = measured.limit if measured.limit is not None else (measured.holds.limit if measured.holds else None)
    return Finding(
        check=check.name,
        group=check.group,
        subject=measured.subject,
        verdict=verdict_of(check, measured),
        wording=wording_of(check, measured),
        evidence=measured.evidence,
        limit=limit,
        source=check.source,
        decisive=measured.decisive,
    )


def run_checks(case: Case, checks: Iterable[Check]) -> tuple[Finding, ...]:
    """Run checks in order.

    Raises
    ------
    ValueError
        If a check yields two comparisons of one subject: a mistake of the check.
    """
    findings: list[Finding] = []
    seen: set[tuple[str, str]] = set()
    for check in checks:
        for measured in check.run(case):
            key = (check.name, measured.subject)
            if key in seen:
                raise ValueError(f"{check.name} speaks twice about {measured.subject!r}")
            seen.add(key)
            findings.append(finding_of(check, measured))
    return tuple(findings)
