"""Specific speeds in ordinary use at a flow."""

import math
from typing import NamedTuple

import numpy as np

from bidcheck.hydraulics.ranges import inside, require_positive

# Source: Hydraulic Institute, chart of attainable efficiency: low ends of its curves read by pixel, m³/h and nq
_LOW_ENDS = ((18.0, 10.0), (180.0, 11.0), (360.0, 13.0), (720.0, 13.0), (1800.0, 19.0), (18_000.0, 29.0))

HIGHEST_NQ = 90.0
"""Largest specific speed of the chart."""


class SpecificSpeedWindow(NamedTuple):
    """Ordinary range of nq at a flow; `held` where the flow is beyond the readings and the nearest one is used."""

    low: float
    high: float
    held: bool


def specific_speed_window(flow: float) -> SpecificSpeedWindow:
    """Range of specific speed in ordinary use.

    Parameters
    ----------
    flow : float
        Best efficiency flow, total. [m³/s]

    Returns
    -------
    SpecificSpeedWindow
        nq on total flow, from and to; outside it the hydraulics are unusual, which asks for references and no more.

    Raises
    ------
    OutOfRange
        If the flow is not positive.

    Notes
    -----
    Readings at 18, 180, 360, 720, 1800 and 18 000 m³/h, straight lines in the logarithm of flow between them; below and
    above the nearest reading is held.
    Source: Hydraulic Institute, chart of attainable efficiency, low ends of its curves and its largest specific speed
    Valid for: 18 to 18 000 m³/h; beyond, held and said so
    Mark: text

    Examples
    --------
    >>> specific_speed_window(1800 / 3600)
    SpecificSpeedWindow(low=19.0, high=90.0, held=False)
    """
    require_positive(flow=flow)
    flows = [reading[0] for reading in _LOW_ENDS]
    low = float(np.interp(math.log(3600.0 * flow), np.log(flows), [reading[1] for reading in _LOW_ENDS]))
    return SpecificSpeedWindow(low, HIGHEST_NQ, not inside(3600.0 * flow, flows[0], flows[-1]))
