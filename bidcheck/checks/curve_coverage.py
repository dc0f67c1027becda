"""The curve has enough points and reaches from shutoff to beyond the largest flow asked for.

Nothing is read beyond the points a bidder supplies, so a curve that stops short hides what the pump does there: the
peak of efficiency, the steep end of NPSH3, the largest power. A sound bid gives at least five points of each
quantity, from shutoff to beyond the largest flow the inquiry asks for and beyond best efficiency.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import count, flow, text, whole_share
from bidcheck.checks.request import asked
from bidcheck.checks.verdicts import missed
from bidcheck.curve import COLUMN_WORDS, COLUMNS, Fits
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within


def largest_flow(case: Case) -> float:
    """Largest flow the inquiry asks one pump to serve [m³/s]."""
    return max(at.flow for _, at in case.operating)


def run(case: Case) -> Iterator[Measured]:
    """Count the points of each quantity and see how far they reach."""
    if case.fits is None or case.curve is None:
        yield asked("head", "head curve at the offered diameter")
        return
    limits = case.inquiry.limits
    for column in COLUMNS:
        points = case.curve.points(column)
        if points is None:
            continue
        counted = within(len(points), limits.curve_points)
        yield Measured(
            subject=f"{column} points",
            holds=counted,
            evidence={"quantity": text(COLUMN_WORDS[column]), "points": count(len(points))},
            wording="points",
        )
        last, asked_flow = float(points.flow[-1]), largest_flow(case)
        yield Measured(
            subject=f"{column} reach",
            holds=within(last / asked_flow, limits.curve_reach),
            evidence={
                "quantity": text(COLUMN_WORDS[column]),
                "last_flow": flow(last),
                "largest_flow": flow(asked_flow),
            },
        )
    yield from _ends(case, case.fits)


def _ends(case: Case, fits: Fits) -> Iterator[Measured]:
    """Look at shutoff and at the end beyond best efficiency."""
    if fits.head is not None:
        first = fits.head.domain[0]
        yield Measured(
            subject="shutoff",
            verdict=Verdict.PASS if fits.head.covers(0.0) else Verdict.REMARK,
            evidence={"first_flow": flow(first)},
            wording="shutoff",
        )
    if fits.bep is not None and fits.efficiency is not None:
        last = fits.efficiency.domain[1]
        yield Measured(
            subject="end of curve",
            holds=within(last / fits.bep.flow, case.inquiry.limits.curve_beyond_bep),
            evidence={
                "last_flow": flow(last),
                "bep_flow": flow(fits.bep.flow),
                "ratio": whole_share(last / fits.bep.flow),
            },
            wording="end of curve",
        )
    elif fits.bep_beyond is not None:
        yield Measured(
            subject="end of curve",
            verdict=missed(case.inquiry.limits.curve_beyond_bep, Verdict.REMARK),
            limit=case.inquiry.limits.curve_beyond_bep,
            evidence={"last_flow": flow(fits.bep_beyond)},
            wording="still rising",
        )


CHECK = Check(
    name="curve-coverage",
    group="as submitted",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("curve_points", "curve_reach", "curve_beyond_bep"),
    source="common practice, no source",
    wordings={
        "": Wording(
            "Points of {quantity} end at {last_flow}; the largest flow asked for is {largest_flow}.",
            "Your points of {quantity} end at {last_flow}. Please extend them to beyond {largest_flow}, the largest"
            " flow of the inquiry.",
        ),
        "points": Wording(
            "The curve has {points} points of {quantity}.",
            "Please send at least five points of {quantity} between shutoff and the end of the curve; {points} do not"
            " fix it.",
        ),
        "shutoff": Wording("The head curve starts at {first_flow}."),
        "end of curve": Wording(
            "The efficiency curve ends at {last_flow}, {ratio} of best efficiency flow {bep_flow}.",
            "Please extend the efficiency curve beyond {last_flow}, so that its peak is seen from both sides.",
        ),
        "still rising": Wording(
            "Efficiency still rises at the last point, {last_flow}: best efficiency lies beyond the points."
        ),
    },
)
