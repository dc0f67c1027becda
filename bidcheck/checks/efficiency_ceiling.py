"""Claimed best efficiency leaves room for the losses no pump escapes.

Disc friction of the offered diameter, leakage through the neck rings, the best hydraulic efficiency known and small
mechanical losses add up to a ceiling. A claim above it, beyond the doubt of the fit, contradicts the diameter,
speed and flow of the same bid – unless one mistake in diameter, speed or stages would explain it, which is asked.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.derived_efficiency import mistakes_behind
from bidcheck.checks.evidence import points, share, text, whose_words
from bidcheck.checks.impeller_causes import likely_causes
from bidcheck.checks.request import asked, not_applicable
from bidcheck.explain import in_words
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import Limit, within
from bidcheck.quantity import Kind

ORIGIN = "disc friction (Daily and Nece), leakage (Gülich), hydraulic efficiency 97 %, mechanical 99.5 %"


def run(case: Case) -> Iterator[Measured]:
    """Compare best efficiency with the loss ceiling."""
    estimate, claim = case.estimates.efficiency, case.estimates.offered_efficiency
    if case.water and not case.estimates.corrected and case.curve is not None:
        yield asked("best efficiency", "water curve")
        return
    if estimate is None or claim is None:
        yield asked("best efficiency", "best efficiency")
        return
    if estimate.ceiling is None:
        yield not_applicable("best efficiency", estimate.reason or "the loss ceiling is not defined here")
        return
    limit = Limit("efficiency_ceiling", Kind.SHARE, None, estimate.ceiling, ORIGIN, "crossed", mandatory=True)
    interval = case.estimates.offered_interval
    doubt = interval if interval is not None and interval < float("inf") else 0.02
    evidence = {
        "claim": share(claim),
        "ceiling": share(estimate.ceiling),
        "above_ceiling": points(max(claim - estimate.ceiling, 0.0)),
        "doubt": points(doubt),
    }
    evidence |= whose_words(case)
    evidence |= {name.replace(" ", "_"): share(loss) for name, loss in estimate.ceiling_terms.items()}
    compared = within(claim, limit, slack=doubt)
    causes = () if compared.holds else (*likely_causes(case, claim - doubt), *mistakes_behind(case))
    if causes:
        evidence["causes"] = text(in_words(causes))
        yield Measured(
            subject="best efficiency", verdict=Verdict.QUERY, limit=limit, evidence=evidence, wording="explained"
        )
        return
    above = "above" if case.max_curve is not None and case.max_curve.impeller is not None else "above, no diameter"
    yield Measured(
        subject="best efficiency", holds=compared, evidence=evidence, wording="" if compared.holds else above
    )


CHECK = Check(
    name="efficiency-ceiling",
    group="efficiency",
    run=run,
    otherwise=Verdict.FAIL,
    source="loss balance: Daily and Nece 1960 (disc friction), Gülich Table 3.5 (leakage)",
    wordings={
        "above, no diameter": Wording(
            "{what} {claim} is {above_ceiling} above the ceiling {ceiling} that disc friction, leakage and the"
            " best hydraulic efficiency leave for the smallest diameter likely at this speed and head.",
            "{you} {claim}, more than the losses of any likely impeller leave at this speed, head and"
            " flow ({ceiling}). Please state the impeller diameter, and correct the efficiency or the figures it"
            " belongs to.",
        ),
        "explained": Wording(
            "{what} {claim} is {above_ceiling} above the ceiling {ceiling} that the losses leave for the"
            " offered diameter, speed and flow. It would be explained if {causes}.",
            "{you} {claim}, more than the losses of your diameter, speed and flow leave ({ceiling}). It"
            " looks as if {causes}. Please confirm and correct.",
        ),
        "": Wording("{what} {claim} stays below the loss ceiling, {ceiling}."),
        "above": Wording(
            "{what} {claim} is {above_ceiling} above the ceiling {ceiling} that disc friction, leakage and"
            " the best hydraulic efficiency leave for the offered diameter, speed and flow.",
            "{you} {claim}, more than the losses of your own impeller diameter, speed and flow leave"
            " ({ceiling}). Please correct the efficiency, or the diameter, speed or flow it belongs to.",
        ),
    },
)
