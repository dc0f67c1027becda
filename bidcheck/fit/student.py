"""Quantiles of Student's t, in closed form for whole degrees of freedom."""

from functools import lru_cache
from math import cos, pi, sin, sqrt, tan

from bidcheck.errors import OutOfRange


def _central_probability(angle: float, freedom: int) -> float:
    """Probability that |t| ≤ √ν tan(angle), Abramowitz and Stegun 26.7.3 and 26.7.4."""
    c2 = cos(angle) ** 2
    odd = freedom % 2 == 1
    term = cos(angle) if odd else 1.0
    total = 0.0
    for k in range(freedom // 2):
        total += term
        term *= c2 * ((2 * k + 2) / (2 * k + 3) if odd else (2 * k + 1) / (2 * k + 2))
    return 2.0 / pi * (angle + sin(angle) * total) if odd else sin(angle) * total


@lru_cache(maxsize=1024)
def student_quantile(confidence: float, freedom: int) -> float:
    """Student's t that |t| stays below with the given probability.

    Parameters
    ----------
    confidence : float
        Two-sided probability, between 0 and 1.
    freedom : int
        Degrees of freedom, 1 or more.

    Returns
    -------
    float
        t such that the probability of |T| ≤ t is `confidence`.

    Raises
    ------
    OutOfRange
        Outside the range it is valid for.

    Notes
    -----
    Valid for confidence 0 < c < 1, freedom 1 to 1000.
    Source: Abramowitz and Stegun, Handbook of Mathematical Functions, 26.7.3 and 26.7.4, solved by bisection.

    Examples
    --------
    >>> student_quantile(0.95, 5)
    2.571
    """
    if not (0.0 < confidence < 1.0 and 1 <= freedom <= 1000):
        raise OutOfRange(f"Student's t asked at confidence {confidence} and {freedom} degrees of freedom")
    low, high = 0.0, pi / 2
    while high - low > 1e-15:
        middle = 0.5 * (low + high)
        if middle in (low, high):
            break
        if _central_probability(middle, freedom) < confidence:
            low = middle
        else:
            high = middle
    return sqrt(freedom) * tan(0.5 * (low + high))
