"""The estimates of one bid for evaluation.json, every source with its range."""

from typing import Any

from bidcheck.quantity import Kind
from bidcheck.report.json_figures import in_unit, number
from bidcheck.second_opinion import (
    EfficiencyEstimate,
    Estimates,
    ImpellerEstimate,
    RegulationEstimate,
    ShapeEstimate,
    Source,
    SuctionEstimate,
)


def estimates_json(estimates: Estimates) -> dict[str, Any]:
    """Estimates of one bid as `evaluation.schema.json` has them, null where there are none.

    Parameters
    ----------
    estimates : Estimates

    Returns
    -------
    dict
        Efficiencies as fractions, diameters in mm, NPSH3 in m.
    """
    return {
        "efficiency": _efficiency(estimates.efficiency, estimates.offered_efficiency),
        "head_coefficient": _impeller(estimates.impeller),
        "shape": _shape(estimates.shape),
        "npsh3": _npsh3(estimates.suction),
        "regulation": _regulation(estimates.regulation),
    }


def _impeller(found: ImpellerEstimate | None) -> dict[str, Any] | None:
    """Head coefficients and diameters, offered and expected."""
    if found is None:
        return None
    return {
        "offered": in_unit(found.offered, Kind.RATIO),
        "expected": in_unit(found.expected, Kind.RATIO),
        "offered_over_expected": in_unit(found.ratio, Kind.RATIO),
        "offered_at_shutoff": in_unit(found.offered_at_shutoff, Kind.RATIO),
        "expected_at_shutoff": in_unit(found.expected_at_shutoff, Kind.RATIO),
        "diameter_mm": in_unit(found.diameter, Kind.DIAMETER),
        "expected_diameter_mm": in_unit(found.expected_diameter, Kind.DIAMETER),
        "cordier_diameter_mm": in_unit(found.cordier_diameter, Kind.DIAMETER),
        "tip_speed_ms": in_unit(found.tip_speed, Kind.TIP_SPEED),
        "sources": [_source(source) for source in found.sources],
    }


def _shape(found: ShapeEstimate | None) -> dict[str, Any] | None:
    """Ratios to best efficiency, offered and as each source expects them."""
    if found is None:
        return None
    ratios = {
        "shutoff_head_over_bep": found.shutoff_head,
        "shutoff_power_over_bep": found.shutoff_power,
        "efficiency_at_075_over_best": found.part_load,
        "efficiency_at_110_over_best": found.over_load,
    }
    return {
        name: {
            "offered": in_unit(ratio.offered, Kind.RATIO),
            "sources": [_source(source) for source in ratio.sources],
        }
        for name, ratio in ratios.items()
    }


def _npsh3(found: SuctionEstimate | None) -> dict[str, Any] | None:
    """NPSH3 at best efficiency, offered and of ordinary impellers."""
    if found is None:
        return None
    return {
        "offered_m": in_unit(found.offered, Kind.NPSH),
        "expected_m": in_unit(found.ordinary, Kind.NPSH),
        "ordinary_from_m": in_unit(found.low, Kind.NPSH),
        "ordinary_to_m": in_unit(found.high, Kind.NPSH),
        "growth_exponent": in_unit(found.growth, Kind.RATIO),
        "sources": [_source(source) for source in found.sources],
    }


def _regulation(found: RegulationEstimate | None) -> dict[str, Any] | None:
    """The curve against both regulations, whether or not the inquiry names them."""
    if found is None:
        return None
    return {
        "eu_class": found.eu_class,
        "eu_minimum_efficiency_index": in_unit(found.eu_index, Kind.RATIO),
        "eu_load_points": found.eu_points,
        "eu_reason": found.eu_reason,
        "us_class": found.us_class,
        "us_power_over_allowed": in_unit(found.us_ratio, Kind.SHARE),
        "us_reason": found.us_reason,
    }


def _efficiency(estimate: EfficiencyEstimate | None, offered: float | None) -> dict[str, Any] | None:
    """The whole independent picture."""
    if estimate is None:
        return None
    below = estimate.market_share_below(offered) if offered is not None else None
    shares = {
        "offered": offered,
        "expected": estimate.expected,
        "attainable": estimate.attainable,
        "ceiling": estimate.ceiling,
        "market_spread": estimate.sigma,
        "implausible_above": estimate.implausible_above,
        "remark_above": estimate.remark_above,
        "remark_below": estimate.remark_below,
        "query_below": estimate.query_below,
        "market_share_below": below,
    }
    return {name: in_unit(value, Kind.SHARE) for name, value in shares.items()} | {
        "market_class": estimate.market_class,
        "expected_from": estimate.expected_from,
        "ceiling_terms": {name: number(value) for name, value in estimate.ceiling_terms.items()},
        "reason": estimate.reason,
        "sources": [_source(source) for source in estimate.sources],
    }


def _source(source: Source) -> dict[str, Any]:
    return {
        "name": source.name,
        "value": in_unit(source.value, source.kind),
        "unit": source.kind.json_unit or source.kind.suffix,
        "valid": source.valid,
        "reason": source.reason,
        "mark": source.mark,
        "origin": source.origin,
    }
