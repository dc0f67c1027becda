"""The checks, one file each, and the explicit list of them in the order of the report."""

from bidcheck.checks import (
    bep_match,
    curve_coverage,
    curve_stability,
    declared_bep,
    duty_head,
    efficiency_ceiling,
    efficiency_claim,
    flow_range,
    missing_data,
    npsh_margin,
    odd_point,
    power_balance,
    rated_on_curve,
    specific_speed_window,
    suction_specific_speed,
)
from bidcheck.finding import Check

ALL: tuple[Check, ...] = (
    curve_coverage.CHECK,
    odd_point.CHECK,
    power_balance.CHECK,
    rated_on_curve.CHECK,
    declared_bep.CHECK,
    missing_data.CHECK,
    duty_head.CHECK,
    flow_range.CHECK,
    efficiency_claim.CHECK,
    efficiency_ceiling.CHECK,
    bep_match.CHECK,
    npsh_margin.CHECK,
    suction_specific_speed.CHECK,
    specific_speed_window.CHECK,
    curve_stability.CHECK,
)
