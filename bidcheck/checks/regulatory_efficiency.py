"""The pump meets the least efficiency the law asks for, where the inquiry says that law applies.

Held against the regulations the inquiry names under [site], and only where their scope covers the pump: kind, size,
head, speed, clean water. The European index is read from three load points of the bidder's curve at the largest
diameter given; where what trimming may have cost and the doubt of the fit would make up for a miss, that is a remark.
The United States rule judges an index with the motor, so there the offered curve against the least efficient pump
allowed is a remark. A curve is not a type test: the bidder states the index, the program asks where its own reading
falls short.
"""

import re
from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import count, ratio, share, text
from bidcheck.checks.request import asked_in_water, not_applicable
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within
from bidcheck.second_opinion import RegulationEstimate

EU, US = "EU 547/2012", "10 CFR 431"
COLDEST, HOTTEST = 263.15, 393.15
"""Water from −10 to 120 °C [K]. Source: Regulation (EU) No 547/2012, Article 2."""
STEEPEST = 0.4
"""Greatest slope of the normal distribution, per spread."""


NOT_CLEAN = frozenset(
    {
        "waste",
        "sewage",
        "sea",
        "salt",
        "storm",
        "foul",
        "dirty",
        "produced",
        "brine",
        "slurry",
        "raw",
        "glycol",
        "sludge",
        "sand",
    }
)
"""Words beside "water" that mean it is not clean. Source: common practice, no source."""


def run(case: Case) -> Iterator[Measured]:
    """Hold the curve against each regulation the inquiry names."""
    for name in (EU, US):
        if name not in case.inquiry.site.regulations:
            yield not_applicable(name, "the inquiry does not name this regulation as applying")
        elif reason := _other_liquid(case):
            yield not_applicable(name, reason)
        elif case.estimates.regulation is None:
            yield asked_in_water(case, name, "best efficiency")
        else:
            yield (_eu if name == EU else _us)(case, case.estimates.regulation)


def _other_liquid(case: Case) -> str:
    """Reason why the liquid is none the regulations cover; empty for clean water."""
    liquid = case.inquiry.liquid
    words = set(re.findall(r"[a-z]+", liquid.name.lower()))
    if "water" not in words or words & NOT_CLEAN or liquid.solids:
        return "the regulation covers pumps for clean water only"
    if liquid.temperature is not None and not COLDEST <= liquid.temperature <= HOTTEST:
        return "the regulation covers water from −10 to 120 °C only"
    return ""


def _eu(case: Case, found: RegulationEstimate) -> Measured:
    """The minimum efficiency index as far as the curve tells."""
    if found.eu_index is None:
        return not_applicable(EU, found.eu_reason)
    estimates = case.estimates
    sigma = estimates.efficiency.sigma if estimates.efficiency is not None else None
    interval = estimates.offered_interval or 0.0
    doubt = (interval if interval < float("inf") else 0.0) + estimates.trim_allowance
    slack = STEEPEST * doubt / sigma if sigma else 0.0
    evidence = {
        "class": text(found.eu_class),
        "index": ratio(found.eu_index),
        "load_points": count(found.eu_points),
        "basis": text(estimates.basis),
    }
    limit = case.inquiry.limits.minimum_efficiency_index
    words = "eu" if found.eu_points > 1 else "eu, one point"
    if within(found.eu_index, limit).holds or not within(found.eu_index, limit, slack=slack).holds:
        return Measured(subject=EU, holds=within(found.eu_index, limit), evidence=evidence, wording=words)
    return Measured(subject=EU, verdict=Verdict.REMARK, limit=limit, evidence=evidence, wording="eu, near")


def _us(case: Case, found: RegulationEstimate) -> Measured:
    """Power over that of the least efficient pump allowed."""
    if found.us_ratio is None:
        return not_applicable(US, found.us_reason)
    evidence = {"class": text(found.us_class), "ratio": share(found.us_ratio), "basis": text(case.estimates.basis)}
    compared = within(found.us_ratio, case.inquiry.limits.us_power_ratio)
    return Measured(subject=US, holds=compared, evidence=evidence, wording="us")


CHECK = Check(
    name="regulatory-efficiency",
    group="efficiency",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("minimum_efficiency_index", "us_power_ratio"),
    source="Regulation (EU) No 547/2012, Annexes II and III; 10 CFR 431 Subpart Y (80 FR 22939)",
    wordings={
        "eu": Wording(
            "Minimum efficiency index of the offered curve is about {index}, from {load_points} load points ({class};"
            " {basis}).",
            "Your curve reads as a minimum efficiency index of about {index}; the limit is {limit}. Please"
            " state the index of this pump at full diameter and the test behind it.",
        ),
        "eu, one point": Wording(
            "Minimum efficiency index is estimated at {index} from best efficiency alone ({class}; {basis}); the"
            " regulation looks at three load points.",
            "Your best efficiency reads as a minimum efficiency index of about {index}; the limit is {limit}."
            " Please state the index of this pump at full diameter and the test behind it.",
        ),
        "eu, near": Wording(
            "Minimum efficiency index of the offered curve is about {index}, below what the regulation asks for by no"
            " more than trimming and the fit may explain ({class}; {basis}). Ask for the index of the full diameter"
            " before award."
        ),
        "us": Wording(
            "Shaft power over the load points of the rule is {ratio} of that of the least efficient pump it allows"
            " (class {class}; {basis}; motor left out). Ask for the pump energy index before award."
        ),
    },
)
