"""The evaluation as JSON: trade SI units in key names, fractions for ratios, null never NaN, repeatable bytes."""

import json
import math
from collections.abc import Mapping
from typing import Any

from bidcheck.case import AtFlow
from bidcheck.curve import COLUMN_KINDS, COLUMNS, Fit, Fits
from bidcheck.evaluation import BidEvaluation, Evaluation
from bidcheck.finding import Evidence, Finding
from bidcheck.inquiry import Inquiry
from bidcheck.limits import Limit
from bidcheck.quantity import Assumption, Kind
from bidcheck.report.words import message, question
from bidcheck.second_opinion import (
    EfficiencyEstimate,
    Estimates,
    ImpellerEstimate,
    RegulationEstimate,
    ShapeEstimate,
    Source,
    SuctionEstimate,
)
from bidcheck.units import from_si

SCHEMA = "bidcheck/evaluation/1"
DIGITS = 9


def evaluation_json(evaluation: Evaluation) -> str:
    """Write an evaluation as JSON text that keeps to `evaluation.schema.json`.

    Parameters
    ----------
    evaluation : Evaluation

    Returns
    -------
    str
        Ends with a newline; the same evaluation gives the same bytes.
    """
    inquiry = evaluation.inquiry
    document = {
        "schema": SCHEMA,
        "version": evaluation.version,
        "inquiry": _inquiry(inquiry),
        "bids": [_bid(bid, inquiry) for bid in evaluation.bids],
        "unreadable": [
            {"bidder": bid.bidder, "problems": [str(problem) for problem in bid.problems]} for bid in inquiry.unreadable
        ],
        "ranking": [],
        "inputs": [{"file": item.file, "sha256": item.sha256} for item in inquiry.inputs],
    }
    return json.dumps(document, ensure_ascii=False, allow_nan=False, indent=1) + "\n"


def _number(value: float) -> float | None:
    """Nine significant digits; what is not finite is null."""
    if not math.isfinite(value):
        return None
    return float(f"{value:.{DIGITS}g}") + 0.0


def _in(value: float | None, kind: Kind) -> float | None:
    """A figure in the unit of its key, null where there is none."""
    if value is None:
        return None
    return _number(from_si(value, kind.json_unit, kind) if kind.json_unit else value)


def _inquiry(inquiry: Inquiry) -> dict[str, Any]:
    duty = inquiry.duty
    return {
        "tag": inquiry.tag,
        "title": inquiry.title,
        "duty": {
            "flow_m3h": _in(duty.rated_flow, Kind.FLOW),
            "head_m": _in(duty.rated_head, Kind.HEAD),
            "npsha_m": _in(duty.npsha, Kind.NPSH),
        },
        "limit_set": inquiry.limits.set_name,
        "limits": [{"name": limit.name} | _limit(limit) for limit in inquiry.limits.all()],
        "assumptions": _assumptions(inquiry.assumptions),
    }


def _limit(limit: Limit) -> dict[str, Any]:
    """A limit with its origin."""
    return {
        "at_least": _in(limit.at_least, limit.kind),
        "at_most": _in(limit.at_most, limit.kind),
        "unit": limit.kind.json_unit or limit.kind.suffix,
        "origin": limit.origin,
        "mark": limit.mark,
        "mandatory": limit.mandatory,
    }


def _assumptions(assumptions: tuple[Assumption, ...]) -> list[dict[str, str]]:
    return [{"what": item.what, "value": item.value, "why": item.why} for item in assumptions]


def _bid(bid: BidEvaluation, inquiry: Inquiry) -> dict[str, Any]:
    case = bid.case
    fits = case.fits
    return {
        "bidder": case.bid.bidder,
        "revision": case.bid.revision,
        "outcome": bid.outcome.value,
        "accepted_deviations": bid.accepted_deviations,
        "assumptions": _assumptions(case.assumptions),
        "bep": _bep(fits),
        "bep_beyond_m3h": _in(fits.bep_beyond, Kind.FLOW) if fits is not None else None,
        "at_duty": _at(case.at_duty),
        "at_max_diameter": _max_diameter(bid),
        "specific_speed": _specific_speed(case.estimates),
        "suction_specific_speed": _suction_specific_speed(case.estimates),
        "fits": {column: _fit(fits.of(column) if fits is not None else None) for column in COLUMNS},
        "estimates": _estimates(case.estimates),
        "findings": [_finding(finding, inquiry) for finding in bid.findings],
        "cost": None,
    }


def _bep(fits: Fits | None) -> dict[str, Any] | None:
    """Best efficiency point in water."""
    bep = fits.bep if fits is not None else None
    if bep is None:
        return None
    interval = bep.flow_interval
    return {
        "flow_m3h": _in(bep.flow, Kind.FLOW),
        "head_m": _in(bep.head, Kind.HEAD),
        "efficiency": _number(bep.efficiency),
        "flow_interval_m3h": None if interval is None else [_in(value, Kind.FLOW) for value in interval],
    }


def _at(at: AtFlow) -> dict[str, Any]:
    """Performance at rated flow, as pumped, rated diameter."""
    return {
        "head_m": _in(at.head, Kind.HEAD),
        "efficiency": _in(at.efficiency, Kind.SHARE),
        "power_kw": _in(at.power, Kind.POWER),
        "npsh3_m": _in(at.npsh3, Kind.NPSH),
        "flow_over_bep": _in(at.flow_over_bep, Kind.SHARE),
        "npsh_margin_m": _in(at.npsh_margin, Kind.NPSH),
        "from_claims": list(at.from_claims),
    }


def _max_diameter(bid: BidEvaluation) -> dict[str, Any] | None:
    """Best efficiency at the maximum diameter; null where the bid gives no curve of its own for it."""
    case = bid.case
    if case.max_curve is None or case.max_curve is case.curve or case.max_fits is None:
        return None
    return {"impeller_mm": _in(case.max_curve.impeller, Kind.DIAMETER), "bep": _bep(case.max_fits)}


def _specific_speed(estimates: Estimates) -> dict[str, Any] | None:
    if estimates.nq is None:
        return None
    return {
        "nq": _number(estimates.nq),
        "nq_per_eye": _in(estimates.nq_eye, Kind.SPECIFIC_SPEED),
        "ns_us": _number(from_si(estimates.nq, "US", Kind.SPECIFIC_SPEED)),
        "basis": estimates.basis,
    }


def _suction_specific_speed(estimates: Estimates) -> dict[str, Any] | None:
    if estimates.nss is None:
        return None
    return {
        "metric": _number(estimates.nss),
        "us": _number(from_si(estimates.nss, "US", Kind.SUCTION_SPECIFIC_SPEED)),
    }


def _fit(fit: Fit | None) -> dict[str, Any] | None:
    """A fit in m, fraction, kW, m over u = (2Q - lo - hi)/(hi - lo)."""
    if fit is None:
        return None
    kind = COLUMN_KINDS[fit.column]
    return {
        "degree": fit.degree,
        "coefficients": [_in(float(value), kind) for value in fit.polynomial.coef],
        "domain_m3h": [_in(value, Kind.FLOW) for value in fit.domain],
        "points": fit.points,
        "rms": _in(fit.rms, kind),
        "largest_residual": _in(fit.largest_residual, kind),
        "derived": fit.derived,
    }


def _estimates(estimates: Estimates) -> dict[str, Any]:
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
        "offered": _in(found.offered, Kind.RATIO),
        "expected": _in(found.expected, Kind.RATIO),
        "offered_over_expected": _in(found.ratio, Kind.RATIO),
        "offered_at_shutoff": _in(found.offered_at_shutoff, Kind.RATIO),
        "expected_at_shutoff": _in(found.expected_at_shutoff, Kind.RATIO),
        "diameter_mm": _in(found.diameter, Kind.DIAMETER),
        "expected_diameter_mm": _in(found.expected_diameter, Kind.DIAMETER),
        "cordier_diameter_mm": _in(found.cordier_diameter, Kind.DIAMETER),
        "tip_speed_ms": _in(found.tip_speed, Kind.TIP_SPEED),
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
            "offered": _in(ratio.offered, Kind.RATIO),
            "sources": [_source(source) for source in ratio.sources],
        }
        for name, ratio in ratios.items()
    }


def _npsh3(found: SuctionEstimate | None) -> dict[str, Any] | None:
    """NPSH3 at best efficiency, offered and of ordinary impellers."""
    if found is None:
        return None
    return {
        "offered_m": _in(found.offered, Kind.NPSH),
        "expected_m": _in(found.ordinary, Kind.NPSH),
        "ordinary_from_m": _in(found.low, Kind.NPSH),
        "ordinary_to_m": _in(found.high, Kind.NPSH),
        "growth_exponent": _in(found.growth, Kind.RATIO),
        "sources": [_source(source) for source in found.sources],
    }


def _regulation(found: RegulationEstimate | None) -> dict[str, Any] | None:
    """The curve against both regulations, whether or not the inquiry names them."""
    if found is None:
        return None
    return {
        "eu_class": found.eu_class,
        "eu_minimum_efficiency_index": _in(found.eu_index, Kind.RATIO),
        "eu_load_points": found.eu_points,
        "eu_reason": found.eu_reason,
        "us_class": found.us_class,
        "us_power_over_allowed": _in(found.us_ratio, Kind.SHARE),
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
    return {name: _in(value, Kind.SHARE) for name, value in shares.items()} | {
        "market_class": estimate.market_class,
        "expected_from": estimate.expected_from,
        "ceiling_terms": {name: _number(value) for name, value in estimate.ceiling_terms.items()},
        "reason": estimate.reason,
        "sources": [_source(source) for source in estimate.sources],
    }


def _source(source: Source) -> dict[str, Any]:
    return {
        "name": source.name,
        "value": _in(source.value, source.kind),
        "unit": source.kind.json_unit or source.kind.suffix,
        "valid": source.valid,
        "reason": source.reason,
        "mark": source.mark,
        "origin": source.origin,
    }


def _finding(finding: Finding, inquiry: Inquiry) -> dict[str, Any]:
    """One finding, its texts in the units of the inquiry."""
    return {
        "check": finding.check,
        "group": finding.group,
        "subject": finding.subject,
        "verdict": finding.verdict.value,
        "decisive": finding.decisive,
        "message": message(finding, inquiry.units),
        "evidence": _evidence(finding.evidence),
        "limit": None if finding.limit is None else _limit(finding.limit),
        "source": finding.source,
        "question": question(finding, inquiry.units),
        "accepted": finding.accepted,
    }


def _evidence(evidence: Mapping[str, Evidence]) -> dict[str, Any]:
    """Figures by name and unit; texts by their name alone."""
    found: dict[str, Any] = {}
    for name, item in evidence.items():
        if isinstance(item.value, str):
            found[name] = item.value
        else:
            found[f"{name}_{item.kind.suffix}"] = _in(item.value, item.kind)
    return found
