"""The impeller a duty calls for, beside the one offered: head coefficient, diameter, tip speed."""

import math
from collections.abc import Callable

from bidcheck.errors import OutOfRange
from bidcheck.estimates.head_coefficient import (
    cordier_ratio,
    diameter_for_head,
    head_coefficient,
    optimum_head_coefficient,
    shutoff_head_coefficient,
)
from bidcheck.hydraulics.ranges import require_positive
from bidcheck.quantity import Kind
from bidcheck.second_opinion import ImpellerEstimate, Source

_OPTIMUM = "Gülich, Centrifugal Pumps, equation 3.26"
_RADIAL = "nq 7 to 100 per suction eye"


def tip_speed(diameter: float, speed_rpm: float) -> float:
    """Speed of the impeller's outer edge.

    Parameters
    ----------
    diameter : float
        Outer diameter. [m]
    speed_rpm : float
        Rotational speed. [1/min]

    Returns
    -------
    float
        u₂. [m/s]

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    u₂ = π D n/60.
    Source: definition
    Valid for: any positive figures
    Mark: derived

    Examples
    --------
    >>> tip_speed(0.400, 1480)
    31.0
    """
    require_positive(diameter=diameter, speed=speed_rpm)
    return math.pi * diameter * speed_rpm / 60.0


def cordier_diameter(flow: float, head_per_stage: float, speed_rpm: float) -> float:
    """Diameter on the Cordier line.

    Parameters
    ----------
    flow : float
        Best efficiency flow of one suction eye. [m³/s]
    head_per_stage : float
        Head of one stage. [m]
    speed_rpm : float
        Rotational speed. [1/min]

    Returns
    -------
    float
        Outer diameter of the best machines; for a comparison only. [m]

    Raises
    ------
    OutOfRange
        If a figure is not positive or the type number outside 0.3 to 5.

    Notes
    -----
    Source: Cordier (1953), readings as quoted in the literature
    Valid for: type number 0.3 to 5, nq 16 to 265
    Mark: crossed

    Examples
    --------
    >>> cordier_diameter(130 / 3600, head_per_stage=55.0, speed_rpm=2960)
    0.211
    """
    return 1.0 / cordier_ratio(1.0, head_per_stage, flow, speed_rpm)


def _source(name: str, kind: Kind, valid: str, mark: str, *, origin: str, value: Callable[[], float]) -> Source:
    """One source, or why it gives nothing."""
    try:
        return Source(name, value(), valid, "", mark, origin, kind=kind)
    except OutOfRange as error:
        return Source(name, None, valid, str(error), mark, origin, kind=kind)


def _sources(
    nq_eye: float, flow_per_eye: float, head: float, speed_rpm: float
) -> tuple[Source, Source, Source, Source]:
    """Optimum and shutoff head coefficient, diameter by the first, diameter by the Cordier line."""
    return (
        _source(
            "head coefficient at best efficiency",
            Kind.RATIO,
            _RADIAL,
            "crossed",
            origin=_OPTIMUM,
            value=lambda: optimum_head_coefficient(nq_eye),
        ),
        _source(
            "head coefficient at shutoff",
            Kind.RATIO,
            _RADIAL,
            "memory",
            origin="Gülich, Centrifugal Pumps, chapter 3",
            value=lambda: shutoff_head_coefficient(nq_eye),
        ),
        _source(
            "diameter by head coefficient",
            Kind.DIAMETER,
            _RADIAL,
            "derived",
            origin=_OPTIMUM,
            value=lambda: diameter_for_head(head, speed_rpm, optimum_head_coefficient(nq_eye)),
        ),
        _source(
            "diameter by the Cordier line, ratio check only",
            Kind.DIAMETER,
            "type number 0.3 to 5, nq 16 to 265 per suction eye",
            "crossed",
            origin="Cordier (1953), readings as quoted in the literature",
            value=lambda: cordier_diameter(flow_per_eye, head, speed_rpm),
        ),
    )


def estimate_impeller(
    *,
    nq_eye: float,
    flow_per_eye: float,
    head_per_stage: float,
    speed_rpm: float,
    diameter: float | None = None,
    shutoff_head_per_stage: float | None = None,
) -> ImpellerEstimate:
    """Head coefficient and diameter at one best efficiency point, offered and expected.

    Parameters
    ----------
    nq_eye : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    flow_per_eye, head_per_stage : float
        Best efficiency flow of one suction eye, head of one stage. [m³/s, m]
    speed_rpm : float
        Rotational speed. [1/min]
    diameter : float or None
        Outer diameter of the impeller the point belongs to; None where the bid states none. [m]
    shutoff_head_per_stage : float or None
        Head of one stage at shutoff, same diameter. [m]

    Returns
    -------
    ImpellerEstimate

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    ψ by its definition; expected ψ = 1.21 e^(−0.77 nq/100); diameters by it and by the Cordier line side by side.
    Source: Gülich, Centrifugal Pumps, equation 3.26; Cordier (1953)
    Valid for: nq 7 to 100 per suction eye; what a source does not cover is None with its reason
    Mark: crossed

    Examples
    --------
    >>> estimate = estimate_impeller(nq_eye=27.85, flow_per_eye=130 / 3600, head_per_stage=55.0, speed_rpm=2960,
    ...                              diameter=0.214)
    >>> round(estimate.ratio, 2), round(estimate.expected_diameter, 3), round(estimate.cordier_diameter, 3)
    (1.0, 0.214, 0.212)
    """
    require_positive(specific_speed=nq_eye, flow=flow_per_eye, head_per_stage=head_per_stage, speed=speed_rpm)
    sources = _sources(nq_eye, flow_per_eye, head_per_stage, speed_rpm)
    optimum, shutoff, by_coefficient, by_cordier = sources
    offered = at_shutoff = edge = None
    if diameter is not None:
        offered = head_coefficient(head_per_stage, speed_rpm, diameter)
        edge = tip_speed(diameter, speed_rpm)
        if shutoff_head_per_stage is not None and shutoff_head_per_stage > 0:
            at_shutoff = head_coefficient(shutoff_head_per_stage, speed_rpm, diameter)
    return ImpellerEstimate(
        offered=offered,
        offered_at_shutoff=at_shutoff,
        expected=optimum.value,
        expected_at_shutoff=shutoff.value,
        diameter=diameter,
        expected_diameter=by_coefficient.value,
        cordier_diameter=by_cordier.value,
        tip_speed=edge,
        sources=sources,
    )
