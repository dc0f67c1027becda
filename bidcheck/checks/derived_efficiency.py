"""The single mistake behind an efficiency that follows from head and power and is more than a pump can give."""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.headings import headings_of
from bidcheck.explain import (
    BALANCE,
    UNIT_MISTAKES,
    Mistake,
    density_mistakes,
    possible,
    pump_mistakes,
    stage_mistakes,
)

MOST_NAMED = 3
"""More would explain nothing."""


def mistakes_behind(case: Case) -> tuple[str, ...]:
    """Words of each mistake in flow, head or power without which best efficiency would be an ordinary one.

    Empty where the bid states efficiency itself, or nothing is expected of the pump. The nearest to what is expected
    comes first.
    """
    fit = case.max_fits.efficiency if case.max_fits is not None else None
    claim, estimate = case.estimates.offered_efficiency, case.estimates.efficiency
    if fit is None or not fit.derived or claim is None or estimate is None:
        return ()
    low, high, expected = estimate.remark_below, estimate.remark_above, estimate.expected
    if low is None or high is None or expected is None:
        return ()
    found: list[tuple[float, str]] = []
    for mistake in _candidates(case):
        meant = claim / mistake.factor ** BALANCE[mistake.quantity]
        if low <= meant <= high:
            found.append((abs(meant - expected), mistake.words))
    return tuple(words for _, words in sorted(found)[:MOST_NAMED])


def _candidates(case: Case) -> Iterator[Mistake]:
    """Mistakes that could have happened."""
    yield from possible(UNIT_MISTAKES, headings_of(case.max_curve))
    yield from stage_mistakes(case.bid.stages)
    yield from pump_mistakes(case.inquiry.duty.pumps_running)
    yield from density_mistakes(
        case.inquiry.liquid.density, of_water=case.max_curve is None or case.max_curve.liquid == "water"
    )
