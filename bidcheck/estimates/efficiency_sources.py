"""Every independent source of efficiency for one pump: its value, or why it gives none.

nq per eye, flow total, head per stage throughout.
"""

import math
from collections.abc import Callable
from dataclasses import dataclass

from bidcheck.case import Source
from bidcheck.errors import OutOfRange
from bidcheck.estimates.attainable import attainable_efficiency
from bidcheck.estimates.context import anderson_efficiency, corripio_efficiency
from bidcheck.estimates.guelich import multistage_efficiency, single_stage_efficiency
from bidcheck.estimates.market_surface import (
    ESCC_1450,
    ESCC_2900,
    ESCCI_1450,
    ESCCI_2900,
    ESOB_1450,
    ESOB_2900,
    MSS_2900,
    MSV_2900,
    MarketClass,
    market_efficiency,
    nominal_flow,
)
from bidcheck.estimates.us_rule import CONSTANTS, us_minimum_efficiency
from bidcheck.hydraulics.constants import NS_PER_NQ

SURVEYED: dict[str, tuple[MarketClass, ...]] = {
    "end suction": (ESOB_1450, ESOB_2900),
    "close coupled": (ESCC_1450, ESCC_2900),
    "in-line": (ESCCI_1450, ESCCI_2900),
    "vertical multistage": (MSV_2900,),
    "submersible multistage": (MSS_2900,),
}
"""Arrangement → classes of the survey, one per nominal speed."""
HORIZONTAL_MULTISTAGE = (MSV_2900, MSS_2900)
"""A horizontal multistage pump is taken as the mean of these two."""
US_CLASSES = {
    "end suction": "ESFM",
    "close coupled": "ESCC",
    "in-line": "IL",
    "vertical multistage": "RSV",
    "submersible multistage": "ST",
}
MULTISTAGE = ("horizontal multistage", "vertical multistage", "submersible multistage")


@dataclass(frozen=True, slots=True)
class Pump:
    """What the estimate needs to know of a pump, at best efficiency."""

    arrangement: str
    nq: float
    nq_eye: float
    flow: float
    head_per_stage: float
    speed_rpm: float
    diameter: float | None
    viscosity: float


def _nearest_class(classes: tuple[MarketClass, ...], speed_rpm: float) -> MarketClass:
    """The class whose nominal speed is nearest by ratio."""
    return min(classes, key=lambda one: abs(math.log(one.nominal_speed_rpm / speed_rpm)))


def classes_of(pump: Pump) -> tuple[MarketClass, ...]:
    """Classes whose mean is the survey's value; empty where the survey has none."""
    if pump.arrangement == "horizontal multistage":
        return HORIZONTAL_MULTISTAGE
    classes = SURVEYED.get(pump.arrangement, ())
    return (_nearest_class(classes, pump.speed_rpm),) if classes else ()


def _tried(
    name: str,
    valid: str,
    mark: str,
    origin: str,
    formula: Callable[[], float],
) -> Source:
    """A source with its value, or with the reason why it gives none."""
    try:
        return Source(name, formula(), valid, "", mark, origin)
    except OutOfRange as error:
        return Source(name, None, valid, str(error), mark, origin)


def _absent(name: str, valid: str, mark: str, origin: str, reason: str) -> Source:
    return Source(name, None, valid, reason, mark, origin)


def market_source(pump: Pump) -> Source:
    """Middle of the surveyed market."""
    name, mark, origin = "market survey, middle", "text", "Regulation (EU) No 547/2012, Annex III; middle derived"
    valid = "6 to 1000 m³/h at nominal speed, nq 8 to 80, clean cold water; surveyed before the floor of 2015"
    classes = classes_of(pump)
    if not classes:
        return _absent(name, valid, mark, origin, f"the survey has no class for {pump.arrangement} pumps")

    def middle() -> float:
        values = [
            market_efficiency(one, 0.5, pump.nq_eye, nominal_flow(pump.flow, pump.speed_rpm, one.nominal_speed_rpm))
            for one in classes
        ]
        return math.fsum(values) / len(values)

    return _tried(name, valid, mark, origin, middle)


def guelich_source(pump: Pump) -> Source:
    """Gülich's formula, single stage or multistage."""
    multistage = pump.arrangement in MULTISTAGE
    formula = multistage_efficiency if multistage else single_stage_efficiency
    return _tried(
        "Gülich, multistage" if multistage else "Gülich, single stage",
        "18 m³/h and more, nq 7 to 100",
        "memory" if multistage else "crossed",
        "Gülich, Centrifugal Pumps, Table 3.9",
        lambda: formula(pump.nq_eye, pump.flow),
    )


def chart_source(pump: Pump) -> Source:
    """The more generous reading of the chart, by total flow or by eye."""

    def generous() -> float:
        values: list[float] = []
        refusal = OutOfRange("outside the chart")
        for nq in (pump.nq, pump.nq_eye):
            try:
                values.append(attainable_efficiency(nq, pump.flow))
            except OutOfRange as error:
                refusal = error
        if not values:
            raise refusal
        return max(values)

    return _tried(
        "chart of attainable efficiency",
        "18 to 18 000 m³/h, nq 10 to 80, clean cold water",
        "text",
        "Hydraulic Institute data library; fit derived",
        generous,
    )


def _us_floor(pump: Pump) -> Source:
    """The floor of the US rule, for context."""
    name, valid = "US minimum", "25 US gpm and more, head to 459 ft, Ns to 5000 for end suction, clean cold water"
    mark, origin = "text", "10 CFR 431 Subpart Y"
    label = US_CLASSES.get(pump.arrangement)
    if label is None:
        return _absent(name, valid, mark, origin, f"the rule has no class for {pump.arrangement} pumps")
    if pump.head_per_stage > 459 * 0.3048:
        return _absent(name, valid, mark, origin, "head above 459 ft")
    ns = NS_PER_NQ * pump.nq
    if label in ("ESCC", "ESFM") and ns > 5000:
        return _absent(name, valid, mark, origin, "specific speed above Ns 5000")
    fast = pump.speed_rpm > math.sqrt(1800.0 * 3600.0)
    gpm = pump.flow * 3600.0 * 4.402868 * (3600.0 if fast else 1800.0) / pump.speed_rpm
    return _tried(name, valid, mark, origin, lambda: us_minimum_efficiency(CONSTANTS[label][fast], ns, gpm))


def context_sources(pump: Pump) -> tuple[Source, ...]:
    """Sources shown beside the others, never deciding."""
    return (
        _us_floor(pump),
        _tried(
            "by flow alone",
            "50 to 5000 US gpm",
            "crossed",
            "Corripio, Chrien and Evans 1982",
            lambda: corripio_efficiency(pump.flow * 3600.0 * 4.402868),
        ),
        _tried(
            "statistical, by flow and specific speed",
            "0.001 to 10 m³/s, nq 7 to 100",
            "memory",
            "Anderson, as printed in the Pump Handbook",
            lambda: anderson_efficiency(pump.nq_eye, pump.flow),
        ),
    )
