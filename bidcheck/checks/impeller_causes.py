"""The single mistake that would bring a head coefficient to what is expected."""

from collections.abc import Iterator
from dataclasses import dataclass, replace

from bidcheck.case import Case
from bidcheck.errors import OutOfRange
from bidcheck.estimates.expected import MULTISTAGE
from bidcheck.estimates.head_coefficient import HIGHEST_NQ, LOWEST_NQ, head_coefficient, optimum_head_coefficient
from bidcheck.estimates.loss_ceiling import loss_ceiling
from bidcheck.explain import CONVERTED, UNIT_MISTAKES, Quantity, possible
from bidcheck.hydraulics.driver import synchronous_speed
from bidcheck.hydraulics.specific_speed import specific_speed
from bidcheck.limits import within

CLOSE = 0.12
"""How near to the expected head coefficient a mistake must bring the offered one. Source: common practice, no source;
half the scatter of honest impellers and a little."""
MOST_NAMED = 3
"""More would explain nothing."""
MOST_STAGES = 16
"""Stages looked at. Source: common practice, no source; offers with more are rare."""
STAGES_BEYOND = (0.75, 1.3)
"""Head coefficient over the expected one, outside which another number of stages is thought of. Source: common
practice, no source."""
ABOUT = (0.75, 1.4)
"""Head offered over head asked for within which a curve is taken to be in the units it says. Source: common practice,
no source."""
INCH = 25.4
"""Millimetres. Source: definition of the inch."""


@dataclass(frozen=True, slots=True)
class Figures:
    """What a head coefficient and the expected one rest on, in SI: flow of one eye, head of all stages."""

    flow: float
    head: float
    speed_rpm: float
    diameter: float
    stages: int

    def ratio(self) -> float:
        """Head coefficient over the expected one, which is held at the ends of its range of specific speed."""
        head = self.head / self.stages
        nq = min(max(specific_speed(self.speed_rpm, self.flow, head), LOWEST_NQ), HIGHEST_NQ)
        return head_coefficient(head, self.speed_rpm, self.diameter) / optimum_head_coefficient(nq)

    def ceiling(self, eyes: int) -> float:
        """Efficiency the losses leave, with clean cold water; 0 outside its range."""
        head = self.head / self.stages
        try:
            found = loss_ceiling(
                nq=specific_speed(self.speed_rpm, self.flow, head),
                flow=self.flow * eyes,
                head_per_stage=head,
                speed_rpm=self.speed_rpm,
                diameter=self.diameter,
                viscosity=1.0e-6,
                density=998.2,
            )
        except OutOfRange:
            return 0.0
        return found.efficiency


def likely_causes(case: Case, leaving: float | None = None) -> tuple[str, ...]:
    """Words of every single mistake that brings the head coefficient near what is expected, the nearest first.

    Empty where the bid states no diameter, the coefficient is plausible as it stands, or nothing would do. Flow and
    head in other units are looked at only where the curve misses the duty: a curve that meets it is in the units it
    says. With `leaving`, only those under which the losses would leave that efficiency.
    """
    figures = figures_of(case)
    if figures is None or within(figures.ratio(), case.inquiry.limits.head_coefficient).holds:
        return ()
    found: list[tuple[float, str]] = []
    kinds = [_units(figures, case), _other_speeds(figures, case), _other_stages(figures, case)]
    for kind in kinds:
        near = [
            (abs(meant.ratio() - 1.0), words)
            for words, meant in kind
            if leaving is None or meant.ceiling(case.bid.suction_eyes) >= leaving
        ]
        found += [item for item in near if item[0] <= CLOSE]
    return tuple(words for _, words in sorted(found)[:MOST_NAMED])


def figures_of(case: Case) -> Figures | None:
    """Figures of the curve that the estimates were taken from; None where one is missing."""
    estimates, bid = case.estimates, case.bid
    flow, head, impeller = estimates.best_flow, estimates.best_head, estimates.impeller
    if flow is None or head is None or impeller is None or impeller.diameter is None:
        return None
    return Figures(flow / bid.suction_eyes, head * bid.stages, bid.speed_rpm, impeller.diameter, bid.stages)


def _units(figures: Figures, case: Case) -> Iterator[tuple[str, Figures]]:
    """Diameter, and flow or head where the duty is missed, in another unit."""
    yield "the diameter is in inches under mm", replace(figures, diameter=figures.diameter * INCH)
    yield "the diameter is in mm under inches", replace(figures, diameter=figures.diameter / INCH)
    yield "the diameter is in cm under mm", replace(figures, diameter=figures.diameter * 10.0)
    yield "the diameter is in mm under cm", replace(figures, diameter=figures.diameter / 10.0)
    if case.curve is None or case.curve.head is None or _meets_duty(case):
        return
    headings: dict[Quantity, float] = {"flow": case.curve.head.flow_unit, "head": case.curve.head.value_unit}
    here = possible(UNIT_MISTAKES, headings)
    for mistake in UNIT_MISTAKES:
        words = mistake.words if mistake in here else f"{mistake.words}, {CONVERTED}"
        if mistake.quantity == "flow":
            yield words, replace(figures, flow=figures.flow / mistake.factor)
        elif mistake.quantity == "head":
            yield words, replace(figures, head=figures.head / mistake.factor)


def _meets_duty(case: Case) -> bool:
    """Whether the head offered at rated flow is about that asked for."""
    head, rated = case.at_duty.head, case.inquiry.duty.rated_head
    return head is not None and "head" not in case.at_duty.from_claims and ABOUT[0] <= head / rated <= ABOUT[1]


def _other_speeds(figures: Figures, case: Case) -> Iterator[tuple[str, Figures]]:
    """The curve belongs to another ordinary motor speed at the same slip, or is at the offered speed already."""
    ordinary = [(f, poles) for f in (50.0, 60.0) for poles in (2, 4, 6, 8)]
    own = min(ordinary, key=lambda one: abs(synchronous_speed(*one) / figures.speed_rpm - 1.0))
    for frequency, poles in ordinary:
        if (frequency, poles) != own and (frequency == own[0] or poles == own[1]):
            meant = figures.speed_rpm * synchronous_speed(frequency, poles) / synchronous_speed(*own)
            words = f"the curve belongs to about {meant:.0f} 1/min ({frequency:.0f} Hz, {poles} poles)"
            yield words, replace(figures, speed_rpm=meant)
    drawn = {curve.speed_rpm for curve in case.bid.curves if case.max_curve and curve.file == case.max_curve.file}
    for speed in drawn:
        ratio = figures.speed_rpm / speed
        if abs(ratio - 1.0) > CLOSE:
            words = f"the curve is at the offered speed already, not at {speed:.0f} 1/min"
            yield words, replace(figures, flow=figures.flow / ratio, head=figures.head / ratio**2)


def _other_stages(figures: Figures, case: Case) -> Iterator[tuple[str, Figures]]:
    """The number of stages that suits head, diameter and speed best, where the bid is of a kind that has several."""
    if case.bid.stages == 1 and case.bid.arrangement not in (*MULTISTAGE, "vertical turbine"):
        return
    if STAGES_BEYOND[0] < figures.ratio() < STAGES_BEYOND[1]:
        return  # a stage more or less among several would explain any honest impeller
    others = [replace(figures, stages=count) for count in range(1, MOST_STAGES + 1) if count != figures.stages]
    best = min(others, key=lambda meant: abs(meant.ratio() - 1.0))
    count = "one stage" if best.stages == 1 else f"{best.stages} stages"
    yield f"head is that of {count}, not of {figures.stages}", best
