"""The window of specific speed in which pumps of a flow are ordinarily built."""

import math

import numpy as np

from bidcheck.errors import OutOfRange

LOW_ENDS = ((18.0, 10.0), (180.0, 11.0), (360.0, 13.0), (720.0, 13.0), (1800.0, 19.0), (18000.0, 29.0))
"""Flow [m³/h] and the nq where the curve of that flow begins. Source: Hydraulic Institute chart, read by pixel."""

HIGH_END = 90.0
"""Largest nq of the chart."""


def specific_speed_window(flow: float) -> tuple[float, float]:
    """Lowest and highest ordinary nq at a flow.

    Parameters
    ----------
    flow : float
        Total flow at best efficiency. [m³/s]

    Returns
    -------
    low, high : float
        nq, total flow. Between readings the low end is interpolated over the logarithm of flow; below 18 and above
        18 000 m³/h the last reading is kept.

    Raises
    ------
    OutOfRange
        If flow is not positive.

    Notes
    -----
    Valid for: 18 to 18 000 m³/h; kept constant outside.
    Source: Hydraulic Institute data library, ends of the curves of the chart of attainable efficiency.
    Mark: text

    Examples
    --------
    >>> specific_speed_window(450 / 3600)
    (13.0, 90.0)
    """
    if flow <= 0:
        raise OutOfRange("the window of specific speed needs a positive flow")
    logs = [math.log(q) for q, _ in LOW_ENDS]
    return float(np.interp(math.log(3600.0 * flow), logs, [nq for _, nq in LOW_ENDS])), HIGH_END
