"""Speed and efficiency of alternating-current motors."""

import math
from typing import Literal

from bidcheck.errors import OutOfRange
from bidcheck.hydraulics.ranges import require_inside, require_positive

EfficiencyClass = Literal["IE2", "IE3", "IE4"]
"""Classes of IEC 60034-30-1."""

# Source: UK SI 2021/745 for IEC 60034-30-1, 50 Hz: A, B, C, D by class and poles
_COEFFICIENTS: dict[tuple[EfficiencyClass, int], tuple[float, float, float, float]] = {
    ("IE2", 2): (0.2972, -3.3454, 13.0651, 79.0770),
    ("IE2", 4): (0.0278, -1.9247, 10.4395, 80.9761),
    ("IE2", 6): (0.0148, -2.4978, 13.2470, 77.5603),
    ("IE3", 2): (0.3569, -3.3076, 11.6108, 82.2503),
    ("IE3", 4): (0.0773, -1.8951, 9.2984, 83.7025),
    ("IE3", 6): (0.1252, -2.6130, 11.9963, 80.4769),
    ("IE4", 2): (0.3400, -3.0479, 10.2930, 84.8208),
    ("IE4", 4): (0.2412, -2.3608, 8.4460, 86.8321),
    ("IE4", 6): (0.3598, -3.2107, 10.7933, 84.1070),
}


def motor_efficiency(rating: float, poles: int, efficiency_class: EfficiencyClass = "IE3") -> float:
    """Nominal efficiency of an induction motor of a class, 50 Hz, full load.

    Parameters
    ----------
    rating : float
        Rated output. [W]
    poles : int
        2, 4 or 6.
    efficiency_class : str
        "IE2", "IE3" or "IE4".

    Returns
    -------
    float
        Efficiency. [fraction]

    Raises
    ------
    OutOfRange
        Outside 0.75 to 200 kW or 2 to 6 poles.

    Notes
    -----
    η = A x³ + B x² + C x + D in per cent, x = log₁₀ P, P in kW.
    Source: IEC 60034-30-1, coefficients as printed in UK SI 2021/745
    Valid for: 0.75 to 200 kW, 2, 4 and 6 poles, 50 Hz
    Mark: text

    Examples
    --------
    >>> motor_efficiency(37e3, poles=4)
    0.939
    """
    require_inside("rating", rating, 0.75, 200.0, unit="kW", factor=1e-3)
    found = _COEFFICIENTS.get((efficiency_class, poles))
    if found is None:
        raise OutOfRange(f"no coefficients for {poles} poles; 2, 4 and 6 are covered")
    A, B, C, D = found
    x = math.log10(rating / 1000.0)
    return (A * x**3 + B * x**2 + C * x + D) / 100.0


def synchronous_speed(frequency: float, poles: int) -> float:
    """Speed of the rotating field of a motor.

    Parameters
    ----------
    frequency : float
        Frequency of the supply. [Hz]
    poles : int
        Number of poles, even.

    Returns
    -------
    float
        Synchronous speed; an induction motor under load runs below it. [1/min]

    Raises
    ------
    OutOfRange
        If the frequency is not positive or the poles are not an even number from 2.

    Notes
    -----
    n = 120 f / poles.
    Source: definition of a pole pair: one turn per cycle and pole pair
    Valid for: even numbers of poles
    Mark: derived

    Examples
    --------
    >>> synchronous_speed(50.0, poles=4)
    1500.0
    """
    require_positive(frequency=frequency)
    if poles < 2 or poles % 2:
        raise OutOfRange(f"a motor has an even number of poles, found {poles}")
    return 120.0 * frequency / poles
