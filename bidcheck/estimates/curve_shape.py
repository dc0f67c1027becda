"""Shape of a curve against specific speed: shutoff head, shutoff power, efficiency beside best efficiency."""

import math
from collections.abc import Callable, Sequence

import numpy as np

from bidcheck.errors import OutOfRange
from bidcheck.estimates.head_coefficient import optimum_head_coefficient, shutoff_head_coefficient
from bidcheck.estimates.market_surface import OVER_LOAD, PART_LOAD
from bidcheck.hydraulics.ranges import require_inside
from bidcheck.quantity import Kind
from bidcheck.second_opinion import ShapeRatio, Source

# Source: Hydraulic Institute, sketch of curve shapes by specific speed, read by pixel, "approximate"
_NQ = (20.0, 60.0, 200.0)
_SHUTOFF_HEAD = (1.15, 1.41, 2.82)
_SHUTOFF_POWER = (0.36, 0.64, 2.04)
_SHARE = (0.25, 0.50, 0.75, 1.00, 1.10, 1.25)
_EFFICIENCY = (
    (0.41, 0.73, 0.93, 1.00, 0.99, 0.93),
    (0.36, 0.67, 0.90, 1.00, 0.98, 0.82),
    (0.31, 0.63, 0.86, 1.00, 0.90, 0.50),
)

LOWEST_NQ, HIGHEST_NQ = 10.0, 200.0
"""Range of specific speed. From 20 down to 10 the reading at 20 is held. Source: common practice, no source."""

PART, OVER = 0.75, 1.10
"""Shares of best efficiency flow at which efficiency is looked at. Source: load points of (EU) No 547/2012."""

REGULATED_NQ = (6.0, 80.0)
"""Specific speeds of the regulation's scope. Source: Regulation (EU) No 547/2012, Article 1."""

_SKETCH = "Hydraulic Institute, sketch of curve shapes, read by pixel, approximate"
_SKETCH_RANGE = "nq 20 to 200 per suction eye, held down to nq 10"


def _between(nq: float, readings: Sequence[float]) -> float:
    """Straight line in the logarithm of specific speed between the three readings."""
    require_inside("specific speed nq", nq, LOWEST_NQ, HIGHEST_NQ)
    return float(np.interp(math.log(nq), np.log(_NQ), readings))


def sketch_shutoff_head(nq: float) -> float:
    """Shutoff head over head at best efficiency, of an ordinary pump.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]

    Returns
    -------
    float
        H₀/H_BEP.

    Raises
    ------
    OutOfRange
        Outside nq 10 to 200.

    Notes
    -----
    1.15, 1.41 and 2.82 at nq 20, 60 and 200, straight lines in ln nq between; held below 20.
    Source: Hydraulic Institute, sketch of curve shapes by specific speed, read by pixel
    Valid for: nq 10 to 200
    Mark: text

    Examples
    --------
    >>> sketch_shutoff_head(60.0)
    1.41
    """
    return _between(nq, _SHUTOFF_HEAD)


def shutoff_head_ratio(nq: float) -> float:
    """Shutoff head over head at best efficiency, from the two head coefficients.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]

    Returns
    -------
    float
        H₀/H_BEP.

    Raises
    ------
    OutOfRange
        Outside nq 7 to 100.

    Notes
    -----
    ψ₀/ψ_opt = 1.083 e^(0.47 nq/100).
    Source: from memory, Gülich, Centrifugal Pumps, head coefficients at shutoff and at best efficiency
    Valid for: nq 7 to 100
    Mark: memory

    Examples
    --------
    >>> shutoff_head_ratio(60.0)
    1.435
    """
    return shutoff_head_coefficient(nq) / optimum_head_coefficient(nq)


def sketch_shutoff_power(nq: float) -> float:
    """Shaft power at shutoff over that at best efficiency, of an ordinary pump.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]

    Returns
    -------
    float
        P₀/P_BEP.

    Raises
    ------
    OutOfRange
        Outside nq 10 to 200.

    Notes
    -----
    0.36, 0.64 and 2.04 at nq 20, 60 and 200, straight lines in ln nq between; held below 20.
    Source: Hydraulic Institute, sketch of curve shapes by specific speed, read by pixel
    Valid for: nq 10 to 200
    Mark: text

    Examples
    --------
    >>> sketch_shutoff_power(20.0)
    0.36
    """
    return _between(nq, _SHUTOFF_POWER)


def sketch_efficiency(nq: float, flow_over_bep: float) -> float:
    """Efficiency beside best efficiency over the best, of an ordinary pump.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    flow_over_bep : float
        Flow over best efficiency flow, 0.25 to 1.25.

    Returns
    -------
    float
        η/η_BEP.

    Raises
    ------
    OutOfRange
        Outside nq 10 to 200 or the shares of flow read.

    Notes
    -----
    Readings at 0.25, 0.5, 0.75, 1, 1.1 and 1.25 for nq 20, 60 and 200; straight lines in flow and in ln nq between;
    held below nq 20.
    Source: Hydraulic Institute, sketch of curve shapes by specific speed, read by pixel
    Valid for: nq 10 to 200, 0.25 to 1.25 of best efficiency flow
    Mark: text

    Examples
    --------
    >>> sketch_efficiency(60.0, 0.75), sketch_efficiency(20.0, 1.10)
    (0.90, 0.99)
    """
    require_inside("flow over best efficiency flow", flow_over_bep, _SHARE[0], _SHARE[-1])
    return _between(nq, [float(np.interp(flow_over_bep, _SHARE, row)) for row in _EFFICIENCY])


def _asked(
    name: str, valid: str, mark: str, origin: str, *, value: Callable[[], float], kind: Kind = Kind.RATIO
) -> Source:
    """One source of a ratio, or why it gives none."""
    try:
        return Source(name, value(), valid, "", mark, origin, kind=kind)
    except OutOfRange as error:
        return Source(name, None, valid, str(error), mark, origin, kind=kind)


def _sketch(value: Callable[[], float], kind: Kind = Kind.RATIO) -> Source:
    return _asked("sketch of curve shapes", _SKETCH_RANGE, "text", _SKETCH, value=value, kind=kind)


def _regulation(nq: float, ratio: float) -> Source:
    """Ratio of the load points of the regulation: one figure for all pumps of its scope."""

    def value() -> float:
        require_inside("specific speed nq", nq, *REGULATED_NQ)
        return ratio

    origin = "Regulation (EU) No 547/2012, Annex III"
    return _asked(
        "load points of the regulation", "clean water, nq 6 to 80", "memory", origin, value=value, kind=Kind.SHARE
    )


def shutoff_head_shape(nq: float, offered: float | None) -> ShapeRatio:
    """Shutoff head over head at best efficiency, offered and expected.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    offered : float or None
        Of the bidder's curve.

    Returns
    -------
    ShapeRatio

    Notes
    -----
    Source: Hydraulic Institute, sketch of curve shapes; Gülich, head coefficients
    Valid for: any specific speed; each source refuses outside its range
    Mark: text

    Examples
    --------
    >>> [round(source.value, 2) for source in shutoff_head_shape(60.0, 1.3).sources]
    [1.41, 1.44]
    """
    origin = "Gülich, Centrifugal Pumps, head coefficients at shutoff and at best efficiency"
    coefficients = _asked("head coefficients", "nq 7 to 100", "memory", origin, value=lambda: shutoff_head_ratio(nq))
    return ShapeRatio(offered, (_sketch(lambda: sketch_shutoff_head(nq)), coefficients))


def shutoff_power_shape(nq: float, offered: float | None) -> ShapeRatio:
    """Shutoff power over power at best efficiency, offered and expected.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    offered : float or None
        Of the bidder's curve.

    Returns
    -------
    ShapeRatio

    Notes
    -----
    Source: Hydraulic Institute, sketch of curve shapes
    Valid for: any specific speed; the source refuses outside its range
    Mark: text

    Examples
    --------
    >>> shutoff_power_shape(20.0, 0.5).sources[0].value
    0.36
    """
    return ShapeRatio(offered, (_sketch(lambda: sketch_shutoff_power(nq)),))


def efficiency_shape(nq: float, flow_over_bep: float, offered: float | None) -> ShapeRatio:
    """Efficiency at 0.75 or 1.10 of best efficiency flow over the best, offered and expected.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    flow_over_bep : float
        0.75 or 1.10.
    offered : float or None
        Of the bidder's curve.

    Returns
    -------
    ShapeRatio

    Notes
    -----
    Source: Hydraulic Institute, sketch of curve shapes; load points of Regulation (EU) No 547/2012 from memory
    Valid for: any specific speed; each source refuses outside its range
    Mark: text

    Examples
    --------
    >>> [source.value for source in efficiency_shape(20.0, 0.75, 0.94).sources]
    [0.93, 0.947]
    """
    ratio = PART_LOAD if flow_over_bep < 1.0 else OVER_LOAD
    return ShapeRatio(
        offered, (_sketch(lambda: sketch_efficiency(nq, flow_over_bep), Kind.SHARE), _regulation(nq, ratio))
    )
