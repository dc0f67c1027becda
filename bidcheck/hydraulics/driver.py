"""Speed of alternating-current motors."""

from bidcheck.errors import OutOfRange
from bidcheck.hydraulics.ranges import require_positive


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
