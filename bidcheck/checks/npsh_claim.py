"""Claimed NPSH3 is one an ordinary impeller eye can show.

NPSH3 at best efficiency, speed and flow per eye make a suction specific speed. Ordinary impellers lie at 7 000 to
11 000 in US units; a claim that needs more than 13 000 without an inducer is hard to believe without a test, one below
6 000 is a poor eye or wrong data. Where metres and feet would explain it, that is said. Without NPSH3 at best
efficiency the figure at rated flow serves, if that is near best efficiency. Whether a high suction specific speed is
wise to buy is another check.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import npsh, suction_specific_speed, text
from bidcheck.checks.request import asked_in_water, not_applicable
from bidcheck.checks.unlike import at_most_remark
from bidcheck.checks.verdicts import missed
from bidcheck.estimates.npsh3_expected import HIGHEST_NSS, LOWEST_NSS
from bidcheck.explain import FEET, FOOT, SAME_UNIT
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within
from bidcheck.quantity import unit_of
from bidcheck.second_opinion import SuctionEstimate

RATED_DOUBT = 0.2
"""Relative doubt of a suction specific speed taken at rated flow, near best efficiency: NPSH3 goes with flow to the
power 1 to 2. Source: common practice, no source."""


def run(case: Case) -> Iterator[Measured]:
    """Place the suction specific speed that the claim implies."""
    if case.bid.inducer:
        yield not_applicable("best efficiency", "an inducer is offered, and the ordinary band is for impellers without")
        return
    estimates = case.estimates
    suction, nss = estimates.suction, estimates.nss
    if suction is None or suction.offered is None or nss is None:
        yield asked_in_water(case, "best efficiency", "NPSH3 at best efficiency")
        return
    yield _placed(case, suction, suction.offered, nss)


def _placed(case: Case, suction: SuctionEstimate, offered: float, nss: float) -> Measured:
    """The claim against the credible range, and units that would explain it."""
    limits, at_rated = case.inquiry.limits, case.estimates.nss_basis == "NPSH3 at rated flow"
    evidence = {
        "npsh3": npsh(offered),
        "where": text("at rated flow" if at_rated else "at best efficiency"),
        "nss": suction_specific_speed(nss),
        "ordinary_from": npsh(suction.low),
        "ordinary_to": npsh(suction.high),
    }
    doubt = RATED_DOUBT * nss if at_rated else 0.0
    high, low = within(nss, limits.nss_credible, slack=doubt), within(nss, limits.nss_sound, slack=doubt)
    if high.holds and low.holds:
        band = LOWEST_NSS <= nss <= HIGHEST_NSS
        return Measured(subject="best efficiency", holds=high, evidence=evidence, wording="" if band else "between")
    limit, wording = (limits.nss_credible, "low") if not high.holds else (limits.nss_sound, "high")
    cause = _units(nss, _heading(case), too_low=not high.holds)
    verdict = missed(limit, Verdict.QUERY)
    if cause:
        evidence["cause"] = text(cause)
        wording, verdict = "explained", Verdict.QUERY
    return Measured(
        subject="best efficiency",
        verdict=at_most_remark(case.bid, verdict),
        limit=limit,
        evidence=evidence,
        wording=wording,
    )


def _heading(case: Case) -> float:
    """One unit that NPSH3 was written in, in SI; 0 where not known."""
    curve, claim = case.max_curve, case.bid.claims.npsh3
    if curve is not None and curve.npsh3 is not None:
        return curve.npsh3.value_unit
    return unit_of(claim) if claim is not None else 0.0


def _units(nss: float, heading: float, *, too_low: bool) -> str:
    """Metres and feet mixed up, where that would bring the claim into the ordinary band."""
    factor, under = FEET**0.75, FOOT if too_low else 1.0
    meant = nss / factor if too_low else nss * factor
    if not LOWEST_NSS <= meant <= HIGHEST_NSS:
        return ""
    if heading and abs(heading / under - 1.0) > SAME_UNIT:
        return ""
    return "NPSH3 is in m under a ft heading" if too_low else "NPSH3 is in ft under an m heading"


CHECK = Check(
    name="npsh-claim",
    group="suction",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("nss_credible", "nss_sound"),
    source="common practice, no source: ordinary suction specific speeds",
    wordings={
        "": Wording(
            "NPSH3 {npsh3} {where} is what ordinary impellers show ({ordinary_from} to {ordinary_to}; suction"
            " specific speed {nss})."
        ),
        "between": Wording(
            "NPSH3 {npsh3} {where} is outside what ordinary impellers show, {ordinary_from} to {ordinary_to}, and not"
            " beyond belief (suction specific speed {nss})."
        ),
        "low": Wording(
            "NPSH3 {npsh3} {where} is hard to believe without an inducer: ordinary impellers need"
            " {ordinary_from} to {ordinary_to}. It implies a suction specific speed of {nss}.",
            "You state NPSH3 {npsh3} {where}; ordinary impellers of this speed and flow need {ordinary_from} to"
            " {ordinary_to}. Please send the NPSH test of this hydraulic, at 3 % head drop, with cold water.",
        ),
        "high": Wording(
            "NPSH3 {npsh3} {where} is poor for this speed and flow, or wrong: ordinary impellers need"
            " {ordinary_from} to {ordinary_to} (suction specific speed {nss})."
        ),
        "explained": Wording(
            "NPSH3 {npsh3} {where} lies outside what ordinary impellers show, {ordinary_from} to"
            " {ordinary_to}. One mistake would explain it: {cause}.",
            "You state NPSH3 {npsh3} {where}, where {ordinary_from} to {ordinary_to} is ordinary. It looks as"
            " if {cause}. Please confirm and correct.",
        ),
    },
)
