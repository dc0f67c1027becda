"""Losses of motor and converter that an efficiency may have been stated with."""

from bidcheck.case import Case
from bidcheck.hydraulics.driver import motor_efficiency
from bidcheck.second_opinion import EfficiencyEstimate

CONVERTER = 0.97
"""Efficiency of a frequency converter near full load. Source: common practice, no source."""
SMALLEST_MOTOR, LARGEST_MOTOR = 750.0, 200e3
"""Range of the standard for motor efficiency [W]; its ends serve beyond. Source: IEC 60034-30-1."""


def losses_that_explain(case: Case, estimate: EfficiencyEstimate, claim: float) -> tuple[str, ...]:
    """Losses of other machines that would put a low claim into the ordinary band, were they counted in it.

    Without a stated motor efficiency that of an IE3 motor of the offered rating is taken.
    """
    motor, drive = case.bid.driver, case.bid.drive
    eta, words = motor.efficiency, "the efficiency of the motor offered"
    if eta is None:
        eta, words = ordinary_motor(case), "the efficiency of an ordinary motor of this size"
    low, high = estimate.remark_below, estimate.remark_above
    if eta is None or low is None or high is None:
        return ()
    allowance = case.estimates.trim_allowance
    kinds = [(eta, f"efficiency is that of pump and motor together ({words}, {100 * eta:.1f} %)")]
    if drive == "variable":
        both = f"efficiency is wire to water, motor and converter included ({words} and 97 %)"
        kinds.append((eta * CONVERTER, both))
    return tuple(said for share_kept, said in kinds if low - allowance <= claim / share_kept <= high)


def ordinary_motor(case: Case) -> float | None:
    """Efficiency of an IE3 motor for the power at rated flow; None outside the standard."""
    rating = case.bid.driver.rating or (case.at_duty.power or 0.0) * 1.1
    if rating <= 0:
        return None
    return motor_efficiency(min(max(rating, SMALLEST_MOTOR), LARGEST_MOTOR), _poles(case))


def _poles(case: Case) -> int:
    """Poles of the driver, as stated or as speed has them, within those the standard covers."""
    stated = case.bid.driver.poles
    if stated in (2, 4, 6):
        return stated
    return min((2, 4, 6), key=lambda poles: abs(case.bid.speed_rpm - 6600.0 / poles))
