"""No two bids offer one pump, unknown to the purchaser.

Bidders buy hydraulics from one another. Where two head curves coincide within reading accuracy once brought to one
speed, and to one diameter where both are stated, and efficiency and NPSH3 agree as well, the bids are likely one
pump: then competition is less than it seems. Where head, NPSH3 and the stated diameters are one and efficiency alone
differs, the bidder that claims more is asked for the test; other bids are never named to a bidder. Pumps of like size
and specific speed resemble one another, so a coincidence of head alone is no finding.
"""

from collections.abc import Iterator
from typing import NamedTuple

import numpy as np

from bidcheck.case import Case
from bidcheck.checks.evidence import points, share, text
from bidcheck.checks.request import asked_for_curve, not_applicable
from bidcheck.checks.verdicts import missed
from bidcheck.curve import Fit
from bidcheck.finding import Check, Evidence, Measured, Verdict, Wording
from bidcheck.limits import Limit, within

LOOKED_AT = 12
"""Flows at which two curves are compared."""
LEAST_OVERLAP = 0.7
"""Share of the longer curve that both must cover. Source: common practice, no source."""
SAME_DIAMETER, SAME_NPSH3, SAME_EFFICIENCY = 0.005, 0.05, 0.01
"""Agreement of diameters and NPSH3, relative, and of efficiencies, that backs a coincidence of head. Source: common
practice, no source."""
LIKE = 0.05
"""Relative difference of specific speed beyond which two curves cannot coincide; saves looking."""


class Match(NamedTuple):
    """Another bid with the same head curve."""

    name: str
    deviation: float
    """Greatest relative difference of head."""
    ahead: float | None
    """Best efficiency of this bid less that of the other; None where one gives none."""
    alike: bool
    """Whether efficiency and NPSH3 agree wherever both bids give them, and one of them is given."""
    same_npsh3: bool
    same_diameter: bool | None
    """Whether the ratio of the curves is that of speeds and stated diameters; None where one bid states none."""


def run(case: Case) -> Iterator[Measured]:
    """Look for another bid with the same curves."""
    if case.fits is None or case.fits.head is None:
        yield asked_for_curve(case, "other bids")
        return
    if len(case.bids) < 2:
        yield not_applicable("other bids", "there is no other bid to compare with")
        return
    limit = case.inquiry.limits.same_hydraulics
    found = [match for other in case.bids if other.bid is not case.bid and (match := _match(case, other)) is not None]
    matches = [match for match in found if within(match.deviation, limit).holds]
    judged = [_judged(case, match) for match in sorted(matches, key=lambda match: match.deviation)]
    order = list(Verdict)
    yield max(judged, key=lambda one: order.index(one.verdict or Verdict.PASS)) if judged else _none(case)


def _none(case: Case, wording: str = "") -> Measured:
    limit = case.inquiry.limits.same_hydraulics
    return Measured(subject="other bids", verdict=Verdict.PASS, limit=limit, wording=wording)


def _judged(case: Case, match: Match) -> Measured:
    """What one pump in two bids means for the case."""
    limits = case.inquiry.limits
    evidence = {"other": text(match.name), "deviation": share(match.deviation)}
    if match.ahead is not None:
        evidence["ahead"] = points(match.ahead)
    if match.alike and (match.same_npsh3 or match.same_diameter is not False):
        verdict = missed(limits.same_hydraulics, Verdict.REMARK)
        wording = "one pump" if match.same_diameter is not False else "one pump, other diameter"
        return _found(verdict, limits.same_hydraulics, evidence, wording)
    more = limits.same_hydraulics_efficiency
    near = within(2.0 * match.deviation, limits.same_hydraulics).holds
    if not (match.same_npsh3 and match.same_diameter and near) or match.ahead is None:
        return _none(case, "like")
    if not within(match.ahead, more).holds:
        return _found(missed(more, Verdict.QUERY), more, evidence, "claims more")
    if not within(-match.ahead, more).holds:
        evidence["ahead"] = points(-match.ahead)
        return _found(Verdict.REMARK, more, evidence, "claims less")
    return _none(case, "like")


def _found(verdict: Verdict, limit: Limit, evidence: dict[str, Evidence], wording: str) -> Measured:
    return Measured(subject="other bids", verdict=verdict, limit=limit, evidence=evidence, wording=wording)


def _match(case: Case, other: Case) -> Match | None:
    """How nearly the curves coincide at the ratio that suits them best; None where they are not comparable."""
    mine, theirs = case.fits, other.fits
    if mine is None or theirs is None or case.bid.suction_eyes != other.bid.suction_eyes or not _alike(case, other):
        return None
    stages = case.bid.stages / other.bid.stages
    best: tuple[float, float] | None = None
    for ratio in _ratios(case, other):
        head = _deviation(mine.head, theirs.head, ratio, ratio**2 * stages)
        if head is not None and (best is None or head < best[0]):
            best = head, ratio
    if best is None:
        return None
    deviation, ratio = best
    speed = case.bid.speed_rpm / other.bid.speed_rpm  # a trim leaves NPSH3 as it is
    npsh3 = _deviation(mine.npsh3, theirs.npsh3, speed, speed**2)
    efficiency = _deviation(mine.efficiency, theirs.efficiency, ratio, 1.0, relative=False)
    same_npsh3 = npsh3 is not None and npsh3 <= SAME_NPSH3
    same_efficiency = efficiency is not None and efficiency <= SAME_EFFICIENCY
    agree = (same_npsh3 or npsh3 is None) and (same_efficiency or efficiency is None)
    peaks = (mine.bep, theirs.bep)
    return Match(
        other.bid.name,
        deviation,
        peaks[0].efficiency - peaks[1].efficiency if peaks[0] is not None and peaks[1] is not None else None,
        alike=agree and (same_npsh3 or same_efficiency),
        same_npsh3=same_npsh3,
        same_diameter=_same_diameter(case, other, ratio),
    )


def _same_diameter(case: Case, other: Case, ratio: float) -> bool | None:
    """Whether the ratio of the curves is that of speeds and diameters; None where one bid states no diameter."""
    mine, theirs = case.bid.impeller_rated, other.bid.impeller_rated
    if mine is None or theirs is None:
        return None
    speed = case.bid.speed_rpm / other.bid.speed_rpm
    return abs(ratio / (speed * mine / theirs) - 1.0) <= SAME_DIAMETER


def _alike(case: Case, other: Case) -> bool:
    """Whether specific speeds are near enough for the curves to coincide; true where one is unknown.

    At another speed specific speed stays; at another diameter it goes against the diameter.
    """
    a, b = case.estimates.nq, other.estimates.nq
    if a is None or b is None:
        return True
    speed = case.bid.speed_rpm / other.bid.speed_rpm
    return any(abs(a / b * ratio / speed - 1.0) <= LIKE for ratio in _ratios(case, other))


def _ratios(case: Case, other: Case) -> Iterator[float]:
    """Factors that bring the other bid's flow to this one: speed alone, and speed with diameter."""
    speed = case.bid.speed_rpm / other.bid.speed_rpm
    yield speed
    mine, theirs = case.bid.impeller_rated, other.bid.impeller_rated
    if mine is not None and theirs is not None and abs(mine / theirs - 1.0) > SAME_DIAMETER:
        yield speed * mine / theirs


def _deviation(
    mine: Fit | None, theirs: Fit | None, ratio: float, factor: float, *, relative: bool = True
) -> float | None:
    """Greatest difference over the flows both cover, over the largest value; None where they share too little."""
    if mine is None or theirs is None:
        return None
    low, high = max(mine.domain[0], ratio * theirs.domain[0]), min(mine.domain[1], ratio * theirs.domain[1])
    length = max(mine.domain[1] - mine.domain[0], ratio * (theirs.domain[1] - theirs.domain[0]))
    if high - low < LEAST_OVERLAP * length:
        return None
    flow = np.linspace(low, high, LOOKED_AT)
    own, brought = mine.polynomial(flow), theirs.polynomial(flow / ratio) * factor
    largest = float(np.max(np.abs(own))) if relative else 1.0
    return float(np.max(np.abs(own - brought))) / largest if largest > 0 else None


CHECK = Check(
    name="same-hydraulics",
    group="as submitted",
    run=run,
    otherwise=Verdict.REMARK,
    limits=("same_hydraulics", "same_hydraulics_efficiency"),
    source="affinity laws; common practice, no source, for how near is one",
    wordings={
        "": Wording("No other bid has the same curves once brought to one speed."),
        "like": Wording(
            "Another bid has a like head curve once brought to one speed; efficiency, NPSH3 or diameter tell them"
            " apart."
        ),
        "claims less": Wording(
            "{other} offers the same head curve once brought to one speed, within {deviation} of head: likely one pump,"
            " for which it claims {ahead} more efficiency than this bid."
        ),
        "one pump, other diameter": Wording(
            "{other} offers the same curves once brought to one speed, within {deviation} of head, at another impeller"
            " diameter: likely one pump in two bids, and one of the diameters is wrong."
        ),
        "one pump": Wording(
            "{other} offers the same curves once brought to one speed, within {deviation} of head: likely one pump in"
            " two bids."
        ),
        "claims more": Wording(
            "{other} offers the same head curve once brought to one speed, within {deviation} of head: likely one pump,"
            " but this bid claims {ahead} more efficiency.",
            "Please send the certified test of the hydraulic you offer, with standard and grade, and the efficiency you"
            " guarantee at rated flow.",
        ),
    },
)
