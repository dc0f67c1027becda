"""Claimed best efficiency is plausible for a pump of this size and specific speed.

The efficiency of the bidder's curve at best efficiency is held against estimates that do not come from the bidder:
the middle of the surveyed market of its class, and what a published chart calls practically attainable. A claim
above the attainable asks for a test; one far above it is called implausible. A low claim is poor for its class or
stated on another basis. The curve of the largest diameter given is judged, and that of the rated diameter must not be
better than it.

On the low side what trimming may have cost is given to the bidder, and where losses of motor or frequency converter
would explain it, that is said before anything else. Where the points show no best efficiency, the one declared is
placed, or the claim at rated flow on the high side, and the curve is asked for. A curve brought to water from a viscous
liquid is never more than a remark.

No such estimate can show an overstatement of 3 points, and 5 seldom; 8 mostly and 10 nearly always for end suction and
double suction pumps at four poles or slower, less often for in-line, small and faster ones. docs/validation.md has the
figures.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.derived_efficiency import mistakes_behind
from bidcheck.checks.evidence import points, share, specific_speed, text, whose_words
from bidcheck.checks.motor_losses import losses_that_explain
from bidcheck.checks.request import asked, not_applicable
from bidcheck.curve import BestEfficiency, Fits
from bidcheck.explain import in_words
from bidcheck.finding import Check, Evidence, Measured, Verdict, Wording
from bidcheck.limits import Limit, Mark, within
from bidcheck.quantity import Kind
from bidcheck.second_opinion import EfficiencyEstimate

CHART = "Hydraulic Institute chart of attainable efficiency, clean cold water"

MIDDLE = "{distance} {side} the expected {expected}"
BEYOND = "{above_attainable} above what the published chart calls practically attainable ({attainable})"
CERTIFIED_TEST = (
    "{you} {claim}; for this flow and specific speed the published chart of attainable efficiency gives"
    " {attainable}. Please send the certified test of this hydraulic, with standard and grade."
)
TEST_CERTIFICATE = (
    "{you} {claim}, above {attainable}, which the published chart calls practically attainable. Please"
    " send a test certificate of this hydraulic."
)


def run(case: Case) -> Iterator[Measured]:
    """Place the efficiency at best efficiency among the independent estimates."""
    estimate, claim = case.estimates.efficiency, case.estimates.offered_efficiency
    if case.water and not case.estimates.corrected and case.curve is not None:
        yield asked("best efficiency", "water curve")
    elif estimate is None or claim is None:
        yield asked("best efficiency", "best efficiency")
    elif estimate.reason:
        yield not_applicable("best efficiency", estimate.reason)
    else:
        yield _placed(case, estimate, claim)
    if case.estimates.corrected:
        yield asked("water curve", "water curve")
    if case.estimates.declared:
        yield asked("efficiency curve", "best efficiency")
    yield _trimmed(case)


def _trimmed(case: Case) -> Measured:
    """Best efficiency at the rated diameter against that at the largest, which trimming does not raise."""
    rated = case.fits.bep if case.fits is not None else None
    largest = case.max_fits.bep if case.max_fits is not None else None
    if case.fits is case.max_fits or rated is None or largest is None:
        return not_applicable("rated diameter", "there are no best efficiencies of two diameters to compare")
    gain = rated.efficiency - largest.efficiency
    doubt = sum(_width(fits, bep) for fits, bep in ((case.fits, rated), (case.max_fits, largest)))
    evidence = {"rated": share(rated.efficiency), "largest": share(largest.efficiency), "gain": points(gain)}
    compared = within(gain, case.inquiry.limits.trim_gain, slack=doubt)
    wording = "trimmed" if compared.holds else "trimmed above"
    return Measured(subject="rated diameter", holds=compared, evidence=evidence, wording=wording)


def _width(fits: Fits | None, bep: BestEfficiency) -> float:
    """Half the 95 % interval of the best efficiency of one curve; nothing where it cannot be told."""
    if fits is None or fits.efficiency is None:
        return 0.0
    width = fits.efficiency.half_width(bep.flow)
    return width if width < float("inf") else 0.0


def _limit(name: str, at_least: float | None, at_most: float | None, origin: str, mark: Mark) -> Limit:
    return Limit(name, Kind.SHARE, at_least, at_most, origin, mark)


def _placed(case: Case, estimate: EfficiencyEstimate, claim: float) -> Measured:
    """The first step of the ladder that the claim stands on, from the top."""
    high = _above(estimate, claim, _doubt(case))
    if high is None and case.estimates.declared == "rated flow" and _below(estimate, claim, 0.0) is not None:
        return asked("best efficiency", "best efficiency")
    low = _below(estimate, claim, case.estimates.trim_allowance) if high is None else None
    step = high or low
    wording, verdict, limit = step if step is not None else ("", Verdict.PASS, _band(estimate))
    evidence = _evidence(case, estimate, claim)
    if low is not None and (causes := losses_that_explain(case, estimate, claim) or mistakes_behind(case)):
        evidence["causes"] = text(in_words(causes))
        wording = f"{wording}, explained"
    if high is not None and verdict is Verdict.QUERY and (causes := mistakes_behind(case)):
        evidence["causes"] = text(in_words(causes))
        wording = "high, explained"
    elif wording == "above attainable" and "market_below" not in evidence and estimate.expected is not None:
        wording = "above attainable, not surveyed"
    if estimate.expected is None and wording != "high, explained":
        wording = f"{wording}, no expected value".removeprefix(", ")
    if case.estimates.corrected and verdict is Verdict.QUERY:
        verdict = Verdict.REMARK
    return Measured(
        subject="best efficiency",
        verdict=verdict,
        limit=limit,
        evidence=evidence,
        wording=wording,
    )


def _band(estimate: EfficiencyEstimate) -> Limit | None:
    """The band in which nothing is said."""
    low = estimate.remark_below
    tops = [value for value in (estimate.remark_above, estimate.attainable) if value is not None]
    high = min(tops) if tops else None
    if low is None and high is None:
        return None
    if low is not None and high is not None and low > high:
        low = None
    return _limit("efficiency_band", low, high, estimate.expected_from or CHART, "derived")


def _doubt(case: Case) -> float:
    """Half the 95 % interval of the fitted best efficiency, given to the bidder on the high side."""
    interval = case.estimates.offered_interval
    return interval if interval is not None and interval < float("inf") else 0.0


def _above(estimate: EfficiencyEstimate, claim: float, doubt: float) -> tuple[str, Verdict, Limit] | None:
    """Steps above the expected value."""
    top, attainable, remark = estimate.implausible_above, estimate.attainable, estimate.remark_above
    if top is not None:
        origin = f"a quarter of the way to 100 % beyond the {CHART}"
        limit = _limit("efficiency_implausible", None, top, origin, "derived")
        if not within(claim, limit, slack=doubt).holds:
            return "implausible", Verdict.QUERY, limit
    if attainable is not None:
        limit = _limit("efficiency_attainable", None, attainable, CHART, "text")
        if not within(claim, limit, slack=doubt).holds:
            return "above attainable", Verdict.QUERY, limit
    if remark is not None:
        origin = "1.64 times the error of the estimate above the expected value"
        limit = _limit("efficiency_high", None, remark, origin, "derived")
        if not within(claim, limit, slack=doubt).holds:
            return "high", Verdict.REMARK, limit
    return None


def _below(estimate: EfficiencyEstimate, claim: float, allowance: float) -> tuple[str, Verdict, Limit] | None:
    """Steps below the expected value."""
    if estimate.query_below is not None:
        origin = "two spreads of the surveyed market below its middle"
        limit = _limit("efficiency_very_low", estimate.query_below, None, origin, "derived")
        if not within(claim, limit, slack=allowance).holds:
            verdict = Verdict.REMARK if estimate.lenient_low else Verdict.QUERY
            return "very low", verdict, limit
    if estimate.remark_below is not None:
        origin = "1.28 spreads of the surveyed market below its middle, about the worst tenth"
        limit = _limit("efficiency_low", estimate.remark_below, None, origin, "derived")
        if not within(claim, limit, slack=allowance).holds:
            return "low", Verdict.REMARK, limit
    return None


def _evidence(case: Case, estimate: EfficiencyEstimate, claim: float) -> dict[str, Evidence]:
    """The whole picture: claim, expected, attainable, distance, place in the market, specific speed."""
    found: dict[str, Evidence] = {"claim": share(claim)} | whose_words(case)
    if case.estimates.nq is not None:
        found["nq"] = specific_speed(case.estimates.nq)
    if estimate.expected is not None:
        found["expected"] = share(estimate.expected)
        found["distance"] = points(abs(claim - estimate.expected))
        found["side"] = text("above" if claim >= estimate.expected else "below")
    if estimate.attainable is not None:
        found["attainable"] = share(estimate.attainable)
        found["above_attainable"] = points(abs(claim - estimate.attainable))
    below = estimate.market_share_below(claim)
    if below is not None:
        found["market_below"] = share(below)
    if estimate.ceiling is not None:
        found["ceiling"] = share(estimate.ceiling)
    return found


CHECK = Check(
    name="efficiency-claim",
    group="efficiency",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("trim_gain",),
    source=(
        "Regulation (EU) 547/2012 market surface; Gülich, Centrifugal Pumps, Table 3.9; Hydraulic Institute chart of"
        " attainable efficiency"
    ),
    wordings={
        "": Wording("{what} {claim} is plausible: {distance} {side} the expected {expected}."),
        "trimmed": Wording(
            "Best efficiency {rated} at the rated diameter agrees with {largest} at the largest: trimming does not"
            " raise it."
        ),
        "trimmed above": Wording(
            "Best efficiency {rated} at the rated diameter is {gain} above the {largest} of the largest diameter, where"
            " trimming lowers it.",
            "Your curve of the rated diameter peaks at {rated}, that of the largest at {largest}. Trimming does not"
            " raise efficiency: please say which holds, and send the test behind it.",
        ),
        "no expected value": Wording(
            "{what} {claim} stays below what the published chart calls attainable; for this arrangement and"
            " size there is no expected value, so a low claim is not judged."
        ),
        "implausible": Wording(f"{{what}} {{claim}} is implausible: {MIDDLE}, and {BEYOND}.", CERTIFIED_TEST),
        "implausible, no expected value": Wording(f"{{what}} {{claim}} is implausible: {BEYOND}.", CERTIFIED_TEST),
        "above attainable": Wording(
            f"{{what}} {{claim}} is {BEYOND}; {MIDDLE}. Of the surveyed market {{market_below}} lies below it.",
            TEST_CERTIFICATE,
        ),
        "above attainable, not surveyed": Wording(f"{{what}} {{claim}} is {BEYOND}; {MIDDLE}.", TEST_CERTIFICATE),
        "above attainable, no expected value": Wording(f"{{what}} {{claim}} is {BEYOND}.", TEST_CERTIFICATE),
        "high": Wording(f"{{what}} {{claim}} is high for this size and specific speed: {MIDDLE}."),
        "low": Wording(
            f"{{what}} {{claim}} is low for this size and specific speed: {MIDDLE}, about the worst tenth of the"
            " surveyed market."
        ),
        "high, explained": Wording(
            "{what} {claim} is more than pumps of this size and specific speed show. It would be explained if"
            " {causes}.",
            "{you} {claim}, more than pumps of this size and specific speed show. It looks as if {causes}. Please"
            " confirm and correct.",
        ),
        "low, explained": Wording(
            f"{{what}} {{claim}} is low for this size and specific speed: {MIDDLE}, about the worst tenth of the"
            " surveyed market. Something else would explain it: {causes}."
        ),
        "very low, explained": Wording(
            f"{{what}} {{claim}} is very low for a pump alone: {MIDDLE}. Likely cause: {{causes}}.",
            "{you} {claim}. It looks as if {causes}. Please confirm, and state the efficiency of the pump"
            " alone at shaft power.",
        ),
        "very low": Wording(
            f"{{what}} {{claim}} is very low for this size and specific speed: {MIDDLE}.",
            "{you} {claim}, well below what pumps of this size and specific speed show. Please confirm"
            " units, stages and best efficiency flow, and that no motor or gear losses are included.",
        ),
    },
)
