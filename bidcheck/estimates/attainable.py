"""Greatest efficiency practically attainable, after the chart of the Hydraulic Institute."""

import math

from bidcheck.hydraulics.ranges import require_inside

LOWEST_FLOW, HIGHEST_FLOW = 18.0, 18_000.0
"""Range of flow of the chart [m³/h]."""

LOWEST_NQ, HIGHEST_NQ = 10.0, 80.0
"""Range of specific speed of the fit."""


def chart_efficiency(nq: float, flow: float) -> float:
    """Read the chart of maximum practically attainable efficiency.

    Parameters
    ----------
    nq : float
        Specific speed, total flow as the chart has it. [1/min, m³/s, m per stage]
    flow : float
        Best efficiency flow, total. [m³/s]

    Returns
    -------
    float
        Efficiency at best efficiency point with clean cold water. [fraction]

    Raises
    ------
    OutOfRange
        Outside the range below.

    Notes
    -----
    η = −100.0258 + 80.1369 x + 13.6583 y − 11.0310 x² − 1.8581 y² + 0.5736 x y + 0.0760 y³ in per cent, x = ln nq,
    y = ln Q in m³/h; fitted to 81 readings, root mean square 0.26, largest 0.72 points.
    Source: Hydraulic Institute, chart of maximum practically attainable efficiency, read by pixel
    Valid for: 18 to 18 000 m³/h, nq 10 to 80
    Mark: text

    Examples
    --------
    >>> chart_efficiency(25.0, 100 / 3600)
    0.8305
    """
    require_inside("flow", flow, LOWEST_FLOW, HIGHEST_FLOW, unit="m³/h", factor=3600.0)
    require_inside("specific speed nq", nq, LOWEST_NQ, HIGHEST_NQ)
    x, y = math.log(nq), math.log(3600.0 * flow)
    linear = -100.0258 + 80.1369 * x + 13.6583 * y
    return (linear - 11.0310 * x**2 - 1.8581 * y**2 + 0.5736 * x * y + 0.0760 * y**3) / 100.0
