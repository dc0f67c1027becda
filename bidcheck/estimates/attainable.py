"""Maximum practically attainable efficiency, after the chart of the Hydraulic Institute."""

import math

from bidcheck.errors import OutOfRange


def attainable_efficiency(nq: float, flow: float) -> float:
    """Efficiency the chart calls practically attainable.

    Parameters
    ----------
    nq : float
        Specific speed, total flow by the convention of the chart.
    flow : float
        Flow at best efficiency. [m³/s]

    Returns
    -------
    float
        [fraction]

    Raises
    ------
    OutOfRange
        Outside the chart.

    Notes
    -----
    With x = ln nq, y = ln Q in m³/h:
    η% = -100.0258 + 80.1369 x + 13.6583 y - 11.0310 x² - 1.8581 y² + 0.5736 x y + 0.0760 y³.
    Valid for: nq 10 to 80, 18 to 18 000 m³/h, clean cold water.
    Source: Hydraulic Institute data library, chart of attainable efficiency, read by pixel (0.3 point); fit derived,
    rms 0.26 point over 81 readings, largest 0.72.
    Mark: text

    Examples
    --------
    >>> attainable_efficiency(25.0, 100 / 3600)
    0.8305
    """
    Q, hair = 3600.0 * flow, 1e-9
    if not 10.0 * (1 - hair) <= nq <= 80.0 * (1 + hair) or not 18.0 * (1 - hair) <= Q <= 18000.0 * (1 + hair):
        raise OutOfRange(f"asked at {Q:.4g} m³/h and nq {nq:.3g}; the chart covers 18 to 18 000 m³/h, nq 10 to 80")
    x, y = math.log(nq), math.log(Q)
    percent = -100.0258 + 80.1369 * x + 13.6583 * y - 11.0310 * x**2 - 1.8581 * y**2 + 0.5736 * x * y + 0.0760 * y**3
    return percent / 100.0
