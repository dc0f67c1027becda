"""No point lies off its own curve.

One misread or mistyped figure among good ones spoils whatever is computed from the curve. A point is called odd
when it lies farther from the curve through the other points than chance allows (externally studentised residual
beyond a Bonferroni bound at 1 %) and by more than 1 % of the curve's largest value. It is left out of the fit and
shown with the value that would fit.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import flow, of_column, share, text
from bidcheck.checks.request import asked
from bidcheck.checks.verdicts import missed
from bidcheck.curve import COLUMN_WORDS, COLUMNS, Column, Fits, OddPoint
from bidcheck.finding import Check, Evidence, Measured, Verdict, Wording
from bidcheck.limits import within


def run(case: Case) -> Iterator[Measured]:
    """Report every odd point and every fit in doubt."""
    if case.fits is None or case.curve is None:
        yield asked("all curves", "head curve at the offered diameter")
        return
    for odd in case.fits.odd_points:
        yield _odd(case, case.curve.file, odd)
    if not case.fits.odd_points:
        yield Measured(subject="all curves", verdict=Verdict.PASS, limit=case.inquiry.limits.odd_point, wording="none")
    for column in COLUMNS:
        yield from _doubtful(case.fits, column)


def _odd(case: Case, file: str, odd: OddPoint) -> Measured:
    """One odd point with the value that would fit."""
    limit = case.inquiry.limits.odd_point
    large = not within(abs(odd.deviation), limit).holds
    name = file.rsplit("/", 1)[-1]
    return Measured(
        subject=f"{name}:{odd.line} {odd.column}",
        verdict=missed(limit, Verdict.QUERY) if large else Verdict.REMARK,
        limit=limit,
        evidence={
            "quantity": text(COLUMN_WORDS[odd.column]),
            "place": text(f"{name}, line {odd.line}"),
            "flow": flow(odd.flow),
            "found": of_column(odd.value, odd.column),
            "would_fit": of_column(odd.would_fit, odd.column),
            "deviation": share(abs(odd.deviation)),
        },
    )


def _doubtful(fits: Fits, column: Column) -> Iterator[Measured]:
    """A fit in doubt that differs from a shape-preserving interpolation at the duty."""
    fit = fits.of(column)
    if fit is None or fit.guard_flow is None or fit.guard_difference is None:
        return
    evidence: dict[str, Evidence] = {
        "quantity": text(COLUMN_WORDS[column]),
        "flow": flow(fit.guard_flow),
        "fitted": of_column(fit.at(fit.guard_flow), column),
        "interpolated": of_column(fit.at(fit.guard_flow) + fit.guard_difference, column),
    }
    yield Measured(subject=f"{column} fit", verdict=Verdict.REMARK, evidence=evidence, wording="doubtful fit")


CHECK = Check(
    name="odd-point",
    group="as submitted",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("odd_point",),
    source="externally studentised residuals with a Bonferroni bound; the shares are common practice, no source",
    wordings={
        "": Wording(
            "{quantity} {found} at {flow} ({place}) lies off its own curve by {deviation} of the curve's largest"
            " value; {would_fit} would fit. The point is left out of the fit.",
            "Please confirm {quantity} at {flow}: you give {found}, the other points suggest {would_fit}.",
        ),
        "none": Wording("No point lies off its own curve."),
        "doubtful fit": Wording(
            "The few or uneven points of {quantity} leave the fit in doubt: {fitted} by the polynomial and"
            " {interpolated} by interpolation at {flow}."
        ),
    },
)
