"""Honest pumps of every class for the validation study, printed as bidders print them, and overstated. Seeded."""

from collections.abc import Iterator
from dataclasses import dataclass, replace
from typing import Literal

import numpy as np

from bidcheck.arrangement import Arrangement
from bidcheck.bid import Bid, Driver
from bidcheck.curve import Curve, Points
from bidcheck.estimates.efficiency import estimate_efficiency
from bidcheck.estimates.guelich import SCATTER
from bidcheck.estimates.head_coefficient import diameter_for_head, optimum_head_coefficient
from bidcheck.inquiry import Duty, Inquiry
from bidcheck.second_opinion import EfficiencyEstimate
from tests.build import M3H, inquiry
from tests.synthetic_curves import efficiency_shape, flows_over_best, head_shape, printed

Population = Literal["market", "median", "table"]
"""Where the true efficiency of a pump comes from.

market: merit drawn from the surveyed market, cut off at the attainable efficiency.
median: merit in the middle of the market, only the error of the estimate, 2.2 points.
table: Gülich's table with half its scatter as standard deviation; nothing of the survey in it.
"""
ERROR = 0.022
"""Error of the estimate on one honest pump [fraction]. Source: derived, scatter of the sources about one another."""


@dataclass(frozen=True, slots=True)
class Kind:
    """One kind of pump as it is offered: flows in m³/h, stages, speeds at 50 and 60 Hz."""

    name: str
    arrangement: Arrangement
    flows: tuple[float, float]
    speeds: tuple[float, ...]
    stages: int = 1
    eyes: int = 1


KINDS = (
    Kind("end suction, 4 poles", "end suction", (6.0, 3300.0), (1450.0, 1480.0, 1770.0)),
    Kind("end suction, 2 poles", "end suction", (6.0, 1000.0), (2900.0, 2960.0, 3550.0)),
    Kind("close coupled, 4 poles", "close coupled", (6.0, 600.0), (1450.0, 1760.0)),
    Kind("close coupled, 2 poles", "close coupled", (6.0, 400.0), (2900.0, 3520.0)),
    Kind("in-line, 4 poles", "in-line", (6.0, 1000.0), (1450.0, 1760.0)),
    Kind("in-line, 2 poles", "in-line", (6.0, 300.0), (2900.0, 3520.0)),
    Kind("vertical multistage", "vertical multistage", (6.0, 150.0), (2900.0, 3500.0), stages=8),
    Kind("submersible multistage", "submersible multistage", (6.0, 250.0), (2870.0, 3450.0), stages=10),
    Kind("double suction", "double suction", (150.0, 5000.0), (740.0, 985.0, 1485.0, 1780.0), eyes=2),
)


@dataclass(frozen=True, eq=False, slots=True)
class Pump:
    """One pump of the study: what it is, what the sources say of it, what it truly does, its points."""

    kind: Kind
    flow_m3h: float
    nq_eye: float
    estimate: EfficiencyEstimate
    efficiency: float
    bid: Bid
    duty: Duty


def pumps(population: Population, count: int, seed: int) -> Iterator[Pump]:
    """Draw pumps of all kinds in turn; flow even in its logarithm, specific speed even from 12 to 70 per eye."""
    rng = np.random.default_rng(seed)
    found = 0
    while found < count:
        pump = _draw(rng, KINDS[found % len(KINDS)], population)
        if pump is not None:
            found += 1
            yield pump


def _draw(rng: np.random.Generator, kind: Kind, population: Population) -> Pump | None:
    """One pump; None where its head would be out of the ordinary, or nothing can be expected of it."""
    flow = 10 ** rng.uniform(*np.log10(kind.flows)) * M3H
    nq_eye, speed = rng.uniform(12.0, 70.0), float(rng.choice(kind.speeds))
    head = (speed * (flow / kind.eyes) ** 0.5 / nq_eye) ** (4.0 / 3.0)
    if not 3.0 <= head <= 150.0:
        return None
    diameter = diameter_for_head(head, speed, optimum_head_coefficient(nq_eye) * rng.uniform(0.9, 1.06))
    estimate = estimate_efficiency(
        arrangement=kind.arrangement,
        nq=nq_eye * kind.eyes**0.5,
        nq_eye=nq_eye,
        flow=flow,
        head_per_stage=head,
        speed_rpm=speed,
        stages=kind.stages,
        suction_eyes=kind.eyes,
        diameter=diameter,
    )
    if estimate.expected is None:
        return None
    efficiency = _true_efficiency(rng, estimate, population)
    if efficiency is None:
        return None
    curve = _curve(rng, nq_eye, flow, head * kind.stages, efficiency=efficiency, speed=speed, stages=kind.stages)
    curve = replace(curve, impeller=round(diameter, 3))
    duty = Duty(rated_flow=flow, rated_head=0.99 * head * kind.stages)
    return Pump(kind, flow / M3H, nq_eye, estimate, efficiency, _bid(kind, speed, round(diameter, 3), curve), duty)


def _true_efficiency(rng: np.random.Generator, estimate: EfficiencyEstimate, population: Population) -> float | None:
    """What the pump truly reaches at best efficiency [fraction]."""
    if population == "table":
        table = next((s.value for s in estimate.sources if s.name.startswith("statistics by size")), None)
        return None if table is None else float(rng.normal(table, 0.5 * SCATTER * (1.0 - table)))
    assert estimate.expected is not None
    if population == "median":
        return float(rng.normal(estimate.expected, ERROR))
    centre, spread = estimate.market_median or estimate.expected, estimate.sigma or 0.044
    top = estimate.attainable if estimate.attainable is not None else 1.0
    for _ in range(1000):
        merit = float(rng.normal(centre, spread))
        if merit <= top:
            return merit
    return top


def _curve(
    rng: np.random.Generator,
    nq: float,
    flow: float,
    head: float,
    *,
    efficiency: float,
    speed: float,
    stages: int,
) -> Curve:
    """Points of the pump, read with 0.1 to 0.4 % of scatter and printed to three digits."""
    n = int(rng.integers(8, 14))
    x = flows_over_best(rng, n)
    x *= max(1.0, 1.22 / x[-1])
    q, q_half = printed(x * flow, 4)
    x = q / flow
    scatter = rng.uniform(0.001, 0.004)
    true_head = head_shape(rng, x, nq)
    true_head *= head / float(np.interp(1.0, x, true_head))
    shape = efficiency_shape(rng, x, nq, int(rng.integers(3)))
    true_efficiency = np.clip(shape / max(float(shape.max()), 1.0), 0.0, None) * efficiency
    running = (x > 0.02) & (true_efficiency > 0.05)
    H, H_half = printed(true_head * (1 + scatter * rng.standard_normal(n)), 3)
    eta, eta_half = printed(true_efficiency * (1 + scatter * rng.standard_normal(n)), 3)
    power = 998.2 * 9.80665 * q * true_head / np.where(running, true_efficiency, 1.0)
    P, P_half = printed(power * (1 + scatter * rng.standard_normal(n)), 3)
    lines = np.arange(2, n + 2)
    half = np.full(n, q_half)
    return Curve(
        file="bids/alder/curve.csv",
        impeller=None,
        speed_rpm=speed,
        stages=stages,
        liquid="water",
        density=998.2,
        power_at="shaft",
        head=Points(q.copy(), H, half.copy(), np.full(n, H_half), lines.copy()),
        efficiency=Points(q.copy(), np.where(running, eta, 0.0), half.copy(), np.full(n, eta_half), lines.copy()),
        power=_some(Points(q.copy(), P, half.copy(), np.full(n, P_half), lines.copy()), running),
        npsh3=None,
    )


def _some(points: Points, keep: "np.typing.NDArray[np.bool_]") -> Points:
    """The points kept."""
    return Points(
        points.flow[keep],
        points.value[keep],
        points.flow_half_digit[keep],
        points.value_half_digit[keep],
        points.line[keep],
    )


def _bid(kind: Kind, speed: float, diameter: float, curve: Curve) -> Bid:
    """The bid of a curve at its full diameter."""
    return Bid(
        bidder="alder",
        revision="a",
        folder="bids/alder",
        arrangement=kind.arrangement,
        speed_rpm=speed,
        curves=(curve,),
        stages=kind.stages,
        suction_eyes=kind.eyes,
        impeller_rated=diameter,
        impeller_max=diameter,
        driver=Driver(speed_rpm=speed),
    )


def overstated(pump: Pump, points: float) -> Inquiry:
    """The pump as a bid whose best efficiency is raised by so many points, its power lowered to agree."""
    (curve,) = pump.bid.curves
    assert curve.efficiency is not None
    assert curve.power is not None
    factor = 1.0 + points / 100.0 / pump.efficiency
    lifted = replace(
        curve,
        efficiency=replace(curve.efficiency, value=curve.efficiency.value * factor),
        power=replace(curve.power, value=curve.power.value / factor),
    )
    return inquiry(duty=pump.duty, bids=(replace(pump.bid, curves=(lifted,)),))
