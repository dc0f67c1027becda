"""Seeded sound bids with their inquiry: honest pumps, printed and read as bidders do. Test support."""

from dataclasses import replace

import numpy as np

from bidcheck.arrangement import Arrangement
from bidcheck.bid import Bid, Claims, Driver
from bidcheck.curve import Curve, Floats, Points
from bidcheck.estimates.efficiency import estimate_efficiency
from bidcheck.estimates.head_coefficient import diameter_for_head, optimum_head_coefficient
from bidcheck.hydraulics.suction import npsh3_from_suction_specific_speed
from bidcheck.inquiry import Duty, Inquiry
from tests.build import M3H, inquiry, stated
from tests.synthetic_curves import efficiency_shape, flows_over_best, head_shape, printed

SPEEDS = (980.0, 1480.0, 1780.0, 2960.0, 3560.0)
ESTIMATE_ERROR = 0.022
"""Error of the estimate on one honest pump. Source: the combination of the estimates, see docs/methods.md."""


def sound_inquiry(rng: np.random.Generator, noise: float | None = None) -> Inquiry:
    """One inquiry with one sound single-stage bid of 65 to 3300 m³/h, nq 15 to 60.

    Efficiency lies about the middle of the market by the error of the estimate, cut off at the attainable value.
    """
    while True:
        nq, flow = rng.uniform(15.0, 60.0), 10 ** rng.uniform(np.log10(65.0), np.log10(3300.0)) * M3H
        speed = float(rng.choice(SPEEDS))
        head = (speed * flow**0.5 / nq) ** (4.0 / 3.0)
        if 8.0 <= head <= 140.0:
            break
    estimate = estimate_efficiency(
        arrangement="end suction", nq=nq, nq_eye=nq, flow=flow, head_per_stage=head, speed_rpm=speed
    )
    assert estimate.expected is not None
    assert estimate.attainable is not None
    efficiency = min(rng.normal(estimate.expected, ESTIMATE_ERROR), estimate.attainable - 0.003)
    scatter = rng.uniform(0.001, 0.004) if noise is None else noise
    diameter = diameter_for_head(head, speed, optimum_head_coefficient(nq) * rng.uniform(0.92, 1.05))
    npsh3 = npsh3_from_suction_specific_speed(speed, flow, rng.uniform(7200.0, 10500.0) / 51.645)
    curve = _curve(rng, nq, flow, head, efficiency, npsh3, scatter, speed, round(diameter, 3))
    rated = round(rng.uniform(0.86, 1.04) * flow / M3H) * M3H
    duty_head = float(np.interp(rated, curve.head.flow, curve.head.value)) if curve.head is not None else head
    return inquiry(
        duty=Duty(
            rated_flow=rated,
            rated_head=round(duty_head * rng.uniform(0.975, 0.995), 1),
            max_flow=1.1 * rated,
            min_flow=0.7 * rated,
            npsha=round(1.5 * npsh3 + 2.0, 1),
            npsha_at_max_flow=round(1.7 * npsh3 + 2.0, 1),
        ),
        bids=(_bid(curve, speed, diameter, flow, efficiency),),
    )


def _bid(curve: Curve, speed: float, diameter: float, flow: float, efficiency: float) -> Bid:
    """The bid of a curve, its claims read off the curve."""
    assert curve.power is not None
    best = round(flow / M3H) * M3H
    return Bid(
        bidder="alder",
        revision="a",
        folder="bids/alder",
        arrangement="end suction",
        speed_rpm=speed,
        curves=(curve,),
        impeller_rated=round(diameter, 3),
        impeller_max=round(1.05 * diameter, 3),
        impeller_min=round(0.8 * diameter, 3),
        claims=Claims(
            bep_flow=stated(best, 0.5 * M3H),
            bep_efficiency=stated(round(efficiency, 3), 0.0005),
            min_continuous_flow=stated(0.3 * best, 0.5 * M3H),
        ),
        driver=Driver(rating=1.3 * float(curve.power.value.max()), speed_rpm=speed, efficiency=0.95),
    )


def _curve(  # noqa: PLR0917
    rng: np.random.Generator,
    nq: float,
    flow: float,
    head: float,
    efficiency: float,
    npsh3: float,
    scatter: float,
    speed: float,
    diameter: float,
) -> Curve:
    """Points of an honest pump: head, efficiency and NPSH3 by shape, power from them, all read with some scatter."""
    n = int(rng.integers(8, 14))
    x = flows_over_best(rng, n)
    x *= max(1.0, 1.22 / x[-1])
    q, q_half = printed(x * flow, 3 if flow < 0.25 else 4)
    x = q / flow
    true_head = head_shape(rng, x, nq)
    true_head *= head / float(np.interp(1.0, x, true_head))
    shape = efficiency_shape(rng, x, nq, int(rng.integers(3)))
    true_efficiency = np.clip(shape / max(float(shape.max()), 1.0), 0.0, None) * efficiency
    running = (x > 0.02) & (true_efficiency > 0.05)
    H, H_half = printed(true_head * _read(rng, n, scatter), 3)
    eta, eta_half = printed(true_efficiency * _read(rng, n, scatter), 3)
    power = np.where(running, 998.2 * 9.80665 * q * true_head / np.where(running, true_efficiency, 1.0), 0.0)
    P, P_half = printed(power * _read(rng, n, scatter), 3)
    rise = rng.uniform(1.6, 2.4)
    N, N_half = printed(npsh3 * (0.55 + 0.45 * np.maximum(x, 0.0) ** rise) * _read(rng, n, scatter), 2)
    lines = np.arange(2, n + 2)
    return Curve(
        file="bids/alder/curve.csv",
        impeller=diameter,
        speed_rpm=speed,
        stages=1,
        liquid="water",
        density=998.2,
        power_at="shaft",
        head=_points(q, H, q_half, H_half, lines),
        efficiency=_points(q, np.where(running, eta, 0.0), q_half, eta_half, lines),
        power=_points(q[running], P[running], q_half, P_half, lines[running]),
        npsh3=_points(q[x > 0.25], N[x > 0.25], q_half, N_half, lines[x > 0.25]),
    )


def _read(rng: np.random.Generator, n: int, scatter: float) -> Floats:
    """Factors of reading scatter."""
    return np.asarray(1.0 + scatter * rng.standard_normal(n), dtype=np.float64)


def _points(q: Floats, values: Floats, q_half: float, half: float, lines: "np.typing.NDArray[np.int64]") -> Points:
    """Points of one column with their half digits."""
    n = len(q)
    return Points(q.copy(), values.copy(), np.full(n, q_half), np.full(n, half), lines.copy())


UNLIKE = ("solids handling", "submersible multistage", "vertical turbine", "sealless")
"""Arrangements whose honest pumps lie furthest from the published shapes."""


def unlike_inquiry(rng: np.random.Generator, arrangement: Arrangement) -> Inquiry:
    """One inquiry with one honest wastewater, borehole, vertical turbine or sealless pump.

    Lower efficiency, smaller head coefficient, steeper head, poorer NPSH3 than an end suction pump of the same size.
    """
    stages = {"submersible multistage": int(rng.integers(2, 12)), "vertical turbine": int(rng.integers(1, 6))}
    count = stages.get(arrangement, 1)
    while True:
        nq, flow = rng.uniform(22.0, 75.0), 10 ** rng.uniform(np.log10(20.0), np.log10(1500.0)) * M3H
        speed = float(rng.choice(SPEEDS))
        head = (speed * flow**0.5 / nq) ** (4.0 / 3.0)
        if 4.0 <= head <= 80.0:
            break
    estimate = estimate_efficiency(
        arrangement="end suction", nq=nq, nq_eye=nq, flow=flow, head_per_stage=head, speed_rpm=speed
    )
    assert estimate.expected is not None
    efficiency = estimate.expected - rng.uniform(0.0, 0.12)
    diameter = diameter_for_head(head, speed, optimum_head_coefficient(nq) * rng.uniform(0.72, 1.1))
    npsh3 = npsh3_from_suction_specific_speed(speed, flow, rng.uniform(5000.0, 11000.0) / 51.645)
    scatter = rng.uniform(0.001, 0.004)
    curve = _curve(rng, nq, flow, head * count, efficiency, npsh3, scatter, speed, round(diameter, 3))
    assert curve.head is not None
    steeper = 1.0 + rng.uniform(0.0, 0.25) * (1.0 - np.minimum(curve.head.flow / flow, 1.0)) ** 2
    curve = replace(curve, stages=count, head=replace(curve.head, value=curve.head.value * steeper), power=None)
    rated = round(rng.uniform(0.86, 1.04) * flow / M3H) * M3H
    duty_head = float(np.interp(rated, curve.head.flow, curve.head.value)) if curve.head is not None else head
    bid = Bid(
        bidder="alder",
        revision="a",
        folder="bids/alder",
        arrangement=arrangement,
        speed_rpm=speed,
        stages=count,
        curves=(curve,),
        impeller_rated=round(diameter, 3),
        impeller_max=round(1.05 * diameter, 3),
    )
    duty = Duty(rated_flow=rated, rated_head=round(0.985 * duty_head, 1), npsha=round(1.6 * npsh3 + 2.0, 1))
    return inquiry(duty=duty, bids=(bid,))
