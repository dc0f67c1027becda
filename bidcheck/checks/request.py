"""Missing figures: what is asked for, in one wording wherever it is missed."""

from typing import TYPE_CHECKING, Literal

from bidcheck.checks.evidence import text
from bidcheck.finding import Measured, Verdict, Wording

if TYPE_CHECKING:
    from bidcheck.case import Case

Item = Literal[
    "head curve at the offered diameter",
    "efficiency or power",
    "efficiency",
    "best efficiency",
    "efficiency beside best efficiency",
    "NPSH3 at rated flow",
    "NPSH3 at best efficiency",
    "NPSH3 at the largest flow",
    "shutoff head",
    "driver rating",
    "minimum continuous flow",
    "largest allowable flow",
    "impeller diameters",
    "rated impeller diameter",
    "maximum impeller diameter",
    "guarantee",
    "casing rating",
    "head at rated flow",
    "curve for the liquid as pumped",
    "motor efficiency",
    "water curve",
    "flow, head, efficiency and power together",
]
"""What a bid can be asked to supply."""

REQUESTS: dict[Item, str] = {
    "head curve at the offered diameter": (
        "Please send head against flow, from shutoff to the end of the curve, at the offered diameter and speed."
    ),
    "efficiency or power": "Please send efficiency or shaft power against flow at the offered diameter and speed.",
    "efficiency": "Please send efficiency against flow at the offered diameter and speed.",
    "best efficiency": (
        "Please send the efficiency curve at the offered diameter to beyond best efficiency, and state the"
        " best efficiency flow."
    ),
    "efficiency beside best efficiency": (
        "Please send efficiency against flow from three quarters of best efficiency flow to beyond 110 % of it."
    ),
    "NPSH3 at rated flow": "Please state NPSH3 at rated flow, for cold water, without reduction for other liquids.",
    "NPSH3 at best efficiency": "Please send NPSH3 against flow to beyond best efficiency flow.",
    "NPSH3 at the largest flow": "Please send NPSH3 against flow up to the largest flow of the inquiry.",
    "shutoff head": "Please state the head at shutoff at the offered diameter.",
    "driver rating": "Please state rating, speed and efficiency of the driver offered.",
    "minimum continuous flow": (
        "Please state the minimum continuous flow at the offered diameter, and whether stability or"
        " temperature sets it."
    ),
    "largest allowable flow": "Please state the largest allowable flow at the offered diameter.",
    "impeller diameters": "Please state rated, maximum and minimum impeller diameter.",
    "rated impeller diameter": "Please state the impeller diameter offered.",
    "maximum impeller diameter": "Please state the maximum and minimum impeller diameter.",
    "guarantee": "Please state the acceptance standard and grade, and whether power or efficiency is guaranteed.",
    "casing rating": "Please state the largest allowable casing pressure.",
    "head at rated flow": "Please state the head at rated flow at the offered diameter and speed.",
    "curve for the liquid as pumped": "Please send head, efficiency, shaft power and NPSH3 for the liquid, density and"
    " viscosity of the inquiry, and say how they were corrected.",
    "motor efficiency": "Power is stated as motor input: please state the motor's efficiency, or the shaft power.",
    "water curve": "Please send the curve for clean cold water as well.",
    "flow, head, efficiency and power together": "Please send head, efficiency and shaft power at the same flows.",
}
"""What is missing → the request to the bidder."""

MISSING = Wording("Not checked: the bid gives no {missing}.", "{request}")
OURS = Wording("Not checked: the inquiry gives no {missing}.")
NOT_APPLICABLE = Wording("Not applicable: {reason}.")


def asked(subject: str, missing: Item, *, decisive: bool = False) -> Measured:
    """No data, with the request to the bidder to supply `missing`, a key of `REQUESTS`."""
    evidence = {"missing": text(missing), "request": text(REQUESTS[missing])}
    return Measured(subject=subject, verdict=Verdict.NO_DATA, evidence=evidence, wording="missing", decisive=decisive)


def asked_for_curve(case: "Case", subject: str, *, decisive: bool = False) -> Measured:
    """No data because there is no curve of the offered diameter, or none for the liquid as pumped."""
    missing: Item = "head curve at the offered diameter" if case.fits is None else "curve for the liquid as pumped"
    return asked(subject, missing, decisive=decisive)


def asked_in_water(case: "Case", subject: str, missing: Item) -> Measured:
    """No data because the curve for water is wanted, or `missing` where there is one, or no curve at all."""
    return asked(subject, "water curve" if case.water and case.curve is not None else missing)


def ours(subject: str, missing: str) -> Measured:
    """No data because the inquiry itself lacks a figure; nothing to ask the bidder."""
    return Measured(subject=subject, verdict=Verdict.NO_DATA, evidence={"missing": text(missing)}, wording="ours")


def not_applicable(subject: str, reason: str) -> Measured:
    """The check does not apply, and why."""
    return Measured(
        subject=subject, verdict=Verdict.NOT_APPLICABLE, evidence={"reason": text(reason)}, wording="not applicable"
    )


COMMON: dict[str, Wording] = {"missing": MISSING, "ours": OURS, "not applicable": NOT_APPLICABLE}
"""Wordings every check shares."""
