"""Head, diameter, speed and stages of the bid belong to one impeller.

What head an impeller of a diameter and speed makes is a narrow matter: the head coefficient follows specific speed and
scatters by a fifth. A bid outside that has one of its figures on another basis: stages, diameter in inches, a curve of
another speed. Each single mistake that would close the gap is named. Without one, only a coefficient far outside is
asked about. Diameters by the head coefficient and by the Cordier line are shown beside the one offered. A stage too
many or too few among six changes the coefficient by a sixth and is not seen here.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import diameter, ratio, specific_speed, text
from bidcheck.checks.impeller_causes import figures_of, likely_causes
from bidcheck.checks.request import asked, asked_in_water, not_applicable
from bidcheck.checks.unlike import at_most_remark
from bidcheck.checks.verdicts import missed
from bidcheck.estimates.head_coefficient import LOWEST_NQ
from bidcheck.explain import in_words
from bidcheck.finding import Check, Evidence, Measured, Verdict, Wording
from bidcheck.limits import within
from bidcheck.second_opinion import ImpellerEstimate

EXTREME = (0.4, 2.0)
"""Head coefficient over the expected one, beyond which not even recessed or mixed flow impellers lie. Source: common
practice, no source."""


def run(case: Case) -> Iterator[Measured]:
    """Compare the head coefficient at best efficiency with the expected one."""
    impeller = case.estimates.impeller
    if impeller is None:
        yield asked_in_water(case, "best efficiency", "best efficiency")
    elif impeller.diameter is None:
        yield asked("best efficiency", "impeller diameters")
    else:
        figures = figures_of(case)
        assert figures is not None
        yield _placed(case, impeller, figures.ratio())


def _placed(case: Case, impeller: ImpellerEstimate, found: float) -> Measured:
    """The coefficient against what is plausible, and the mistake that would explain it."""
    limits, evidence = case.inquiry.limits, _evidence(case, impeller, found)
    compared, far = within(found, limits.head_coefficient), within(found, limits.head_coefficient_far)
    narrow = case.estimates.nq_eye is not None and case.estimates.nq_eye < LOWEST_NQ
    judged = found > EXTREME[1] or (narrow and found < EXTREME[0])
    if impeller.expected is None and not judged:
        reason = next(source.reason for source in impeller.sources if source.value is None)
        return not_applicable("best efficiency", reason)
    if compared.holds:
        return Measured(subject="best efficiency", holds=compared, evidence=evidence)
    limit = limits.head_coefficient if far.holds else limits.head_coefficient_far
    causes = likely_causes(case)
    if causes:
        evidence["causes"] = text(in_words(causes))
    elif far.holds:
        verdict = missed(limit, Verdict.REMARK)
        return Measured(subject="best efficiency", verdict=verdict, limit=limit, evidence=evidence, wording="off")
    verdict = missed(limit, Verdict.QUERY)
    return Measured(
        subject="best efficiency",
        verdict=verdict if causes and _extreme(found) else at_most_remark(case.bid, verdict),
        limit=limit,
        evidence=evidence,
        wording="explained" if causes else "far",
    )


def _extreme(found: float) -> bool:
    """Whether no impeller of any arrangement explains the coefficient, so that a mistake is asked about in all."""
    return not EXTREME[0] <= found <= EXTREME[1]


def _evidence(case: Case, impeller: ImpellerEstimate, found: float) -> dict[str, Evidence]:
    """Coefficients, diameters, specific speed; what is expected is held at the ends of its range."""
    assert impeller.offered is not None
    assert impeller.diameter is not None
    evidence = {
        "offered": ratio(impeller.offered),
        "expected": ratio(impeller.offered / found),
        "over_expected": ratio(found),
        "diameter": diameter(impeller.diameter),
        "expected_diameter": diameter(impeller.diameter * found**0.5),
    }
    if impeller.cordier_diameter is not None:
        evidence["cordier_diameter"] = diameter(impeller.cordier_diameter)
    if case.estimates.nq_eye is not None:
        evidence["nq_eye"] = specific_speed(case.estimates.nq_eye)
    return evidence


CHECK = Check(
    name="head-coefficient",
    group="hydraulics",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("head_coefficient", "head_coefficient_far"),
    source="Gülich, Centrifugal Pumps, equation 3.26; Cordier (1953) beside it",
    wordings={
        "": Wording(
            "Head coefficient {offered} at best efficiency agrees with {expected} expected; {diameter} offered,"
            " {expected_diameter} expected."
        ),
        "off": Wording(
            "Head coefficient {offered} at best efficiency is {over_expected} times the {expected} expected: unusual"
            " for {diameter}, where {expected_diameter} is expected at this head, flow and speed."
        ),
        "far": Wording(
            "Head coefficient {offered} at best efficiency is {over_expected} times the {expected} expected: {diameter}"
            " is offered where {expected_diameter} is expected at this head, flow and speed.",
            "An impeller of {diameter} at your speed and stages does not make the head of your curve; about"
            " {expected_diameter} is expected. Please confirm diameter, speed, stages and head.",
        ),
        "explained": Wording(
            "Head coefficient {offered} at best efficiency is {over_expected} times the {expected} expected: {diameter}"
            " is offered where {expected_diameter} is expected. It would be explained if {causes}.",
            "Your diameter ({diameter}), speed, stages and head do not belong together: about {expected_diameter} is"
            " expected. It looks as if {causes}. Please confirm and correct.",
        ),
    },
)
