"""Flow, head, power and efficiency agree with one another.

Efficiency is ρgQH/P; a bid that states all four must keep to it. Where it does not, either one figure is stated on
another basis (units, density, motor input, per stage or per pump), which is asked, or the figures contradict each
other. The middle of all points decides, so that one misread point does not; the tolerance comes from the printed
digits.
"""

from collections.abc import Iterator
from dataclasses import replace

import numpy as np

from bidcheck.case import Case
from bidcheck.checks.derived_efficiency import mistakes_behind
from bidcheck.checks.evidence import flow, share, text
from bidcheck.checks.headings import headings_of
from bidcheck.checks.motor_losses import ordinary_motor
from bidcheck.checks.request import asked, not_applicable
from bidcheck.checks.verdicts import missed
from bidcheck.curve import Column, Curve, Floats, Points
from bidcheck.explain import (
    BALANCE,
    MOTOR_PART_LOAD,
    Quantity,
    closing,
    density_mistakes,
    frequency_mistakes,
    in_words,
    mistakes_that_close,
    motor_mistakes,
    pump_mistakes,
    stage_mistakes,
)
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.hydraulics.power_balance import efficiency_from_power, printed_digits_tolerance
from bidcheck.limits import Limit, within
from bidcheck.quantity import unit_of

DIGITS_AND = 0.005
"""Added to the tolerance from printed digits. Source: common practice, no source; computed exports agree to 0.2 %."""


LOADED = 0.7
"""Share of rated flow from which a motor is near its load. Source: common practice, no source."""


def run(case: Case) -> Iterator[Measured]:
    """Compare the efficiency that follows from flow, head and power with the one stated, on the curve and in claims."""
    yield from _of_curve(case)
    yield _claims(case)


def _of_curve(case: Case) -> Iterator[Measured]:
    """The points of the curve."""
    curve = case.curve
    if curve is None or curve.head is None:
        yield asked("all points", "head curve at the offered diameter")
        return
    if curve.efficiency is None or curve.power is None:
        if curve.efficiency is None and curve.power is None:
            yield asked("all points", "efficiency or power")
        else:
            yield _derived(case)
        return
    odd = {(point.column, point.line) for point in case.fits.odd_points} if case.fits is not None else set()
    rows = balanced_rows(curve, odd)
    if not rows[0].size:
        yield asked("all points", "flow, head, efficiency and power together")
        return
    yield _systematic(case, *rows[1:])
    yield from _single_points(case, *rows)


def _derived(case: Case) -> Measured:
    """One of efficiency and power stated: nothing to compare, but efficiency that follows cannot exceed 100 %."""
    fit = case.fits.efficiency if case.fits is not None else None
    best = case.fits.bep.efficiency if case.fits is not None and case.fits.bep is not None else 0.0
    top = max(best, *(fit.at(flow) for flow in fit.domain)) if fit is not None and fit.derived else 0.0
    if top <= 1.0:
        return not_applicable("all points", "only one of efficiency and power is stated, nothing to compare it with")
    evidence = {"follows": share(top)}
    causes = mistakes_behind(case)
    if causes:
        evidence["mistakes"] = text(in_words(causes))
    return Measured(
        subject="all points",
        verdict=Verdict.QUERY if causes else Verdict.FAIL,
        evidence=evidence,
        wording="impossible, explained" if causes else "impossible",
    )


def balanced_rows(curve: Curve, leave_out: set[tuple[Column, int]]) -> tuple[Floats, Floats, Floats, Floats]:
    """Points where all four figures stand.

    Returns
    -------
    line, flow, gap, tolerance : arrays, shape (n,)
        `gap` is the efficiency that follows over the one stated; `tolerance` comes from the printed digits. [-]
    """
    columns = [points for points in (curve.head, curve.efficiency, curve.power) if points is not None]
    shared = sorted(set.intersection(*(set(points.line.tolist()) for points in columns)))
    names: tuple[Column, ...] = ("head", "efficiency", "power")
    shared = [line for line in shared if not any((name, line) in leave_out for name in names)]
    H, eta, P = (_rows(points, shared) for points in columns)
    keep = (H[0] > 0) & (H[1] > 0) & (eta[1] > 0) & (P[1] > 0)
    rows = [
        _balance(curve.density, *figures)
        for figures in zip(
            zip(H[0][keep].tolist(), H[2][keep].tolist(), strict=True),
            zip(H[1][keep].tolist(), H[3][keep].tolist(), strict=True),
            zip(eta[1][keep].tolist(), eta[3][keep].tolist(), strict=True),
            zip(P[1][keep].tolist(), P[3][keep].tolist(), strict=True),
            strict=True,
        )
    ]
    gap, tolerance = np.array([row[0] for row in rows]), np.array([row[1] for row in rows])
    return np.array(shared, dtype=float)[keep], H[0][keep], gap, tolerance + DIGITS_AND


Printed = tuple[float, float]
"""A figure and half a unit in its last printed place."""


def _balance(density: float, flow: Printed, head: Printed, efficiency: Printed, power: Printed) -> Printed:
    """Gap and tolerance of one point."""
    gap = efficiency_from_power(density, flow[0], head[0], power[0]) / efficiency[0]
    return gap, printed_digits_tolerance(flow=flow, head=head, power=power, efficiency=efficiency)


def _rows(points: Points, lines: list[int]) -> tuple[Floats, Floats, Floats, Floats]:
    """Flow, value and their half digits on the lines given."""
    index = np.flatnonzero(np.isin(points.line, lines))
    return points.flow[index], points.value[index], points.flow_half_digit[index], points.value_half_digit[index]


def _systematic(case: Case, Q: Floats, gap: Floats, tolerance: Floats) -> Measured:
    """The gap in the middle of all points."""
    at = int(np.argmin(np.abs(Q - case.inquiry.duty.rated_flow)))
    middle, allowed = float(np.median(gap)), float(np.median(tolerance))
    if any(curve.power_at == "motor input" for curve in case.bid.curves):
        allowed += MOTOR_PART_LOAD
    of_water = case.curve is not None and case.curve.liquid == "water"
    near = gap[LOADED * case.inquiry.duty.rated_flow <= Q]
    loaded = float(np.median(near)) if near.size else middle
    found = _judged(case, middle, allowed, headings_of(case.curve), loaded=loaded, of_water=of_water)
    return replace(found, evidence={**found.evidence, "nearest_flow": flow(float(Q[at]))})


def _claims(case: Case) -> Measured:
    """Head, efficiency and power claimed at rated flow, where the curve does not give both of the last two."""
    claims, duty, curve = case.bid.claims, case.inquiry.duty, case.curve
    if curve is not None and curve.efficiency is not None and curve.power is not None:
        return not_applicable("claims", "the curve gives efficiency and power itself")
    head = claims.head.value if claims.head is not None else case.at_duty.head
    if claims.efficiency is None or claims.power is None or head is None or head <= 0 or not _above_zero(case):
        return not_applicable("claims", "head, efficiency and power are not all claimed at rated flow")
    density, half = case.inquiry.liquid.density, claims.head.half_digit if claims.head is not None else 0.0
    middle = efficiency_from_power(density, duty.rated_flow, head, claims.power.value) / claims.efficiency.value
    allowed = DIGITS_AND + printed_digits_tolerance(
        flow=(duty.rated_flow, 0.0),
        head=(head, half),
        power=(claims.power.value, claims.power.half_digit),
        efficiency=(claims.efficiency.value, claims.efficiency.half_digit),
    )
    headings: dict[Quantity, float] = {"power": unit_of(claims.power)}
    found = _judged(case, middle, allowed, headings, loaded=middle, of_water=False)
    return replace(found, subject="claims", wording=f"claims, {found.wording}".removesuffix(", "))


def _above_zero(case: Case) -> bool:
    """Whether efficiency and power claimed are positive."""
    claims = case.bid.claims
    return all(claim is not None and claim.value > 0 for claim in (claims.efficiency, claims.power))


def _judged(
    case: Case, middle: float, allowed: float, headings: dict[Quantity, float], *, loaded: float, of_water: bool
) -> Measured:
    """One gap: closed, explained by a single mistake, small, or a contradiction.

    `loaded` is the gap where a motor is near its load, by which motor losses are told.
    """
    limits, bid, off = case.inquiry.limits, case.bid, abs(middle - 1.0)
    evidence = {"followed_over_stated": share(middle), "gap": share(off), "tolerance": share(allowed)}

    def found(verdict: Verdict, limit: Limit, wording: str = "") -> Measured:
        return Measured(subject="all points", verdict=verdict, limit=limit, evidence=evidence, wording=wording)

    if off <= allowed:
        return found(Verdict.PASS, limits.power_balance)
    small = within(off, limits.power_balance, slack=allowed).holds
    motor = motor_mistakes(bid.driver.efficiency, None if small else ordinary_motor(case))
    others = (
        *stage_mistakes(bid.stages),
        *pump_mistakes(case.inquiry.duty.pumps_running),
        *frequency_mistakes(),
        *density_mistakes(case.inquiry.liquid.density, of_water=of_water),
    )
    mistakes = (*closing(middle, BALANCE, others, headings), *mistakes_that_close(loaded, BALANCE, motor))
    if mistakes:
        evidence["mistakes"] = text(in_words(mistakes))
        return found(missed(limits.power_balance, Verdict.QUERY), limits.power_balance, "explained")
    if small:
        tiny = within(off, limits.power_balance_scatter, slack=allowed).holds
        verdict = Verdict.REMARK if tiny else missed(limits.power_balance_scatter, Verdict.QUERY)
        return found(verdict, limits.power_balance_scatter, "off")
    return found(missed(limits.power_balance, Verdict.FAIL), limits.power_balance, "contradiction")


def _single_points(case: Case, line: Floats, Q: Floats, gap: Floats, tolerance: Floats) -> Iterator[Measured]:
    """Points that fall out of the balance the others keep."""
    limit = case.inquiry.limits.power_balance
    middle = float(np.median(gap))
    name = case.curve.file.rsplit("/", 1)[-1] if case.curve is not None else ""
    for k in range(len(gap)):
        off = abs(float(gap[k]) / middle - 1.0)
        if not within(off, limit, slack=float(tolerance[k])).holds:
            yield Measured(
                subject=f"{name}:{int(line[k])}",
                verdict=Verdict.REMARK,
                limit=limit,
                evidence={
                    "flow": flow(float(Q[k])),
                    "gap": share(off),
                    "place": text(f"{name}, line {int(line[k])}"),
                },
                wording="one point",
            )


CHECK = Check(
    name="power-balance",
    group="as submitted",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("power_balance", "power_balance_scatter"),
    source="P = ρgQH/η; tolerance from the printed digits of each figure plus 0.5 %",
    wordings={
        "": Wording(
            "Efficiency that follows from flow, head and power is {followed_over_stated} of that stated, in the"
            " middle of all points; printed digits leave {tolerance}."
        ),
        "impossible": Wording(
            "Efficiency that follows from flow, head and power reaches {follows}: more power leaves the pump than"
            " enters it.",
            "Your flow, head and shaft power give an efficiency of {follows}. Please correct the figures.",
        ),
        "impossible, explained": Wording(
            "Efficiency that follows from flow, head and power reaches {follows}. It would be explained if {mistakes}.",
            "Your flow, head and shaft power give an efficiency of {follows}. It looks as if {mistakes}. Please confirm"
            " and correct.",
        ),
        "claims": Wording(
            "Efficiency that follows from the head and power claimed at rated flow is {followed_over_stated} of that"
            " claimed; printed digits leave {tolerance}."
        ),
        "claims, off": Wording(
            "Efficiency that follows from the head and power claimed at rated flow is {followed_over_stated} of that"
            " claimed; printed digits leave {tolerance}.",
            "Your claims disagree at rated flow: ρgQH/P comes to {followed_over_stated} of the efficiency claimed."
            " Please say which figure holds.",
        ),
        "claims, explained": Wording(
            "Efficiency that follows from the head and power claimed at rated flow is {followed_over_stated} of that"
            " claimed. One mistake would close the gap: {mistakes}.",
            "Your claims disagree at rated flow: ρgQH/P comes to {followed_over_stated} of the efficiency claimed. It"
            " looks as if {mistakes}. Please confirm and correct.",
        ),
        "claims, contradiction": Wording(
            "Head, power and efficiency claimed at rated flow contradict one another: the efficiency that follows is"
            " {followed_over_stated} of that claimed, and no single mistake of units, stages, density or basis explains"
            " it.",
            "Your claims contradict one another at rated flow: ρgQH/P comes to {followed_over_stated} of the efficiency"
            " claimed. Please correct them.",
        ),
        "off": Wording(
            "Efficiency that follows from flow, head and power is {followed_over_stated} of that stated, in the"
            " middle of all points; printed digits leave {tolerance}, and no single mistake explains the {gap}.",
            "Your head, power and efficiency disagree by {gap} (ρgQH/P against η). Please say which of them is"
            " guaranteed, and correct the others.",
        ),
        "explained": Wording(
            "Efficiency that follows from flow, head and power is {followed_over_stated} of that stated. One"
            " mistake would close the gap: {mistakes}.",
            "Your head, power and efficiency disagree: ρgQH/P comes to {followed_over_stated} of the stated"
            " efficiency. It looks as if {mistakes}. Please confirm and correct.",
        ),
        "contradiction": Wording(
            "Efficiency that follows from flow, head and power is {followed_over_stated} of that stated, off by"
            " {gap}; no single mistake of units, stages, density or basis explains it.",
            "Your head, power and efficiency contradict each other by {gap} (ρgQH/P against η). Please state which"
            " are right and send corrected curves.",
        ),
        "one point": Wording(
            "At {flow} ({place}) head, power and efficiency disagree by {gap}, though they agree elsewhere: one is"
            " likely misread."
        ),
    },
)
