"""The impeller's edge runs no faster than grey cast iron is usually allowed.

Tip speed is a hint on material and no more: above it bronze, ductile iron or steel is ordinary, and the bid should say
so. A bid that states another material passes with it; the words are the bidder's. The largest diameter given is looked
at, since it may be fitted later.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import diameter, speed, text, tip_speed
from bidcheck.checks.request import asked
from bidcheck.estimates.impeller import tip_speed as speed_of_edge
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within


def run(case: Case) -> Iterator[Measured]:
    """Compare the tip speed of the largest diameter named."""
    bid = case.bid
    named = [d for d in (bid.impeller_rated, bid.impeller_max, *(c.impeller for c in bid.curves)) if d is not None]
    if not named:
        yield asked("impeller", "impeller diameters")
        return
    largest = max(named)
    edge = speed_of_edge(largest, bid.speed_rpm)
    limit = case.inquiry.limits.tip_speed
    compared = within(edge, limit)
    evidence = {"tip_speed": tip_speed(edge), "diameter": diameter(largest), "speed": speed(bid.speed_rpm)}
    if bid.impeller_material:
        evidence["material"] = text(bid.impeller_material)
        if compared.holds or not _may_be_grey_iron(bid.impeller_material):
            yield Measured(
                subject="impeller", verdict=Verdict.PASS, limit=limit, evidence=evidence, wording="material stated"
            )
            return
    wording = "" if compared.holds else ("iron" if bid.impeller_material else "fast")
    yield Measured(subject="impeller", holds=compared, evidence=evidence, wording=wording)


OTHERS = (
    *(
        "steel",
        "bronze",
        "ductile",
        "nodular",
        "spheroidal",
        "gjs",
        "ggg",
        "duplex",
        "1.4",
        "cf8",
        "cf3",
        "ca6",
        "ca15",
    ),
    *("a743", "a890", "a216", "a536", "316", "304", "410", "white", "chrom", "nickel", "ni-hard", "titanium", "alloy"),
)
"""Words that name another material than grey cast iron. Source: common practice, no source."""


def _may_be_grey_iron(material: str) -> bool:
    """Whether the bidder's words leave open that it is grey cast iron."""
    words = material.lower()
    return not any(other in words for other in OTHERS)


CHECK = Check(
    name="tip-speed",
    group="hydraulics",
    run=run,
    otherwise=Verdict.REMARK,
    limits=("tip_speed",),
    source="from memory: usual limit of grey cast iron",
    wordings={
        "": Wording("Tip speed is {tip_speed} ({diameter} at {speed})."),
        "material stated": Wording("Tip speed is {tip_speed} ({diameter} at {speed}); impeller of {material}."),
        "iron": Wording(
            "Tip speed is {tip_speed} ({diameter} at {speed}) with an impeller of {material}: beyond what grey cast"
            " iron is usually allowed.",
            "Tip speed is {tip_speed}. Please state the tip speed the impeller's material is allowed.",
        ),
        "fast": Wording(
            "Tip speed is {tip_speed} ({diameter} at {speed}), beyond what grey cast iron is usually allowed: look at"
            " the material of the impeller.",
            "Tip speed is {tip_speed}. Please state the material of the impeller and the tip speed it is allowed.",
        ),
    },
)
