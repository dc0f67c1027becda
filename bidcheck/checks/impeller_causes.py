"""The single mistake that would bring a head coefficient to what is expected."""

from collections.abc import Iterator
from dataclasses import dataclass, replace

from bidcheck.bid import Bid
from bidcheck.errors import OutOfRange
from bidcheck.estimates.expected import MULTISTAGE
from bidcheck.estimates.head_coefficient import head_coefficient, optimum_head_coefficient
from bidcheck.explain import FEET, US_GALLONS
from bidcheck.hydraulics.driver import synchronous_speed
from bidcheck.hydraulics.specific_speed import specific_speed

CLOSE = 0.12
"""How near to the expected head coefficient a mistake must bring the offered one. Source: common practice, no source;
half the scatter of honest impellers and a little."""
MOST_NAMED = 3
"""More would explain nothing."""
MOST_STAGES = 16
INCH = 25.4


@dataclass(frozen=True, slots=True)
class Figures:
    """What a head coefficient and the expected one rest on, in SI: flow of one eye, head of all stages."""

    flow: float
    head: float
    speed_rpm: float
    diameter: float
    stages: int

    def ratio(self) -> float | None:
        """Head coefficient over the expected one; None where none is expected."""
        head = self.head / self.stages
        try:
            expected = optimum_head_coefficient(specific_speed(self.speed_rpm, self.flow, head))
        except OutOfRange:
            return None
        return head_coefficient(head, self.speed_rpm, self.diameter) / expected


def likely_causes(figures: Figures, bid: Bid) -> tuple[str, ...]:
    """Words of every single mistake that brings the head coefficient near what is expected, the nearest first."""
    found: list[tuple[float, str]] = []
    for words, meant in _candidates(figures, bid):
        ratio = meant.ratio()
        if ratio is not None and abs(ratio - 1.0) <= CLOSE:
            found.append((abs(ratio - 1.0), words))
    return tuple(words for _, words in sorted(found)[:MOST_NAMED])


def _candidates(figures: Figures, bid: Bid) -> Iterator[tuple[str, Figures]]:
    """Each mistake with the figures that would have been meant."""
    yield "the diameter is in inches under mm", replace(figures, diameter=figures.diameter * INCH)
    yield "the diameter is in mm under inches", replace(figures, diameter=figures.diameter / INCH)
    yield "the diameter is in cm under mm", replace(figures, diameter=figures.diameter * 10.0)
    yield "the diameter is in mm under cm", replace(figures, diameter=figures.diameter / 10.0)
    yield "head is in ft under an m heading", replace(figures, head=figures.head / FEET)
    yield "head is in m under a ft heading", replace(figures, head=figures.head * FEET)
    yield "flow is in US gpm under an m³/h heading", replace(figures, flow=figures.flow / US_GALLONS)
    yield "flow is in m³/h under a US gpm heading", replace(figures, flow=figures.flow * US_GALLONS)
    yield from _other_speeds(figures)
    if bid.stages > 1 or bid.arrangement in (*MULTISTAGE, "vertical turbine"):
        for stages in range(1, MOST_STAGES + 1):
            if stages != figures.stages:
                count = "one stage" if stages == 1 else f"{stages} stages"
                yield f"head is that of {count}, not of {figures.stages}", replace(figures, stages=stages)


def _other_speeds(figures: Figures) -> Iterator[tuple[str, Figures]]:
    """The curve belongs to another ordinary motor speed, at the same slip."""
    speeds = [
        (synchronous_speed(f, poles), f"{f:.0f} Hz, {poles} poles") for f in (50.0, 60.0) for poles in (2, 4, 6, 8)
    ]
    own, _ = min(speeds, key=lambda item: abs(item[0] / figures.speed_rpm - 1.0))
    for speed, words in speeds:
        if speed != own:
            meant = figures.speed_rpm * speed / own
            yield f"the curve belongs to about {meant:.0f} 1/min ({words})", replace(figures, speed_rpm=meant)
