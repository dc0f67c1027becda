"""Power from efficiency and efficiency from power, where a curve gives only one of them."""

import numpy as np

from bidcheck.curve import Floats, Points

STANDARD_GRAVITY = 9.80665
"""Standard acceleration of free fall [m/s²]; 3rd General Conference on Weights and Measures, 1901."""


def derived_points(head: Points, other: Points, density: float) -> Points | None:
    """Points of power from efficiency, or of efficiency from power, at the flows where head is given too.

    One formula serves both: ρ g Q H over the one is the other.

    Parameters
    ----------
    head : Points
        Flow and head. [m³/s, m]
    other : Points
        Efficiency, to derive power; or power, to derive efficiency. [fraction or W]
    density : float
        Of the liquid the power is given for. [kg/m³]

    Returns
    -------
    Points or None
        At flows above zero with a positive divisor; half digits by propagation of those of flow, head and the other
        column (root of the sum of squares); line 0. None where no flow is common.

    Notes
    -----
    P = ρ g Q H/η. Valid for head and power stated for the same stages, power at the pump shaft. A derived
    efficiency above 1 is returned as it is: it shows that the figures contradict each other.
    Source: ISO 17769-1:2012, pump power output and pump efficiency.

    Examples
    --------
    >>> one, q = np.array([1.0]), np.array([0.1])
    >>> head = Points(q, 50 * one, 0 * one, 0.05 * one, np.array([2]))
    >>> efficiency = Points(q, 0.8 * one, 0 * one, 0.0005 * one, np.array([2]))
    >>> derived_points(head, efficiency, 1000.0).value
    array([61291.6])
    """
    _, at_head, at_other = np.intersect1d(head.flow, other.flow, assume_unique=True, return_indices=True)
    usable = (head.flow[at_head] > 0.0) & (other.value[at_other] > 0.0) & (head.value[at_head] > 0.0)
    at_head, at_other = at_head[usable], at_other[usable]
    if len(at_head) == 0:
        return None
    flow, lift, divisor = head.flow[at_head], head.value[at_head], other.value[at_other]
    value = density * STANDARD_GRAVITY * flow * lift / divisor
    flow_half = head.flow_half_digit[at_head]
    share: Floats = np.sqrt(
        (flow_half / flow) ** 2
        + (head.value_half_digit[at_head] / lift) ** 2
        + (other.value_half_digit[at_other] / divisor) ** 2
    )
    return Points(flow, value, flow_half, share * value, np.zeros(len(flow), dtype=np.int64))
