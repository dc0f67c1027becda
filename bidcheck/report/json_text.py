"""The evaluation as JSON: trade SI units in key names, fractions for ratios, null never NaN, repeatable bytes."""

import json
from collections.abc import Mapping
from typing import Any

from bidcheck.case import AtFlow
from bidcheck.curve import COLUMN_KINDS, COLUMNS, Fit, Fits
from bidcheck.evaluation import BidEvaluation, Evaluation
from bidcheck.finding import Evidence, Finding
from bidcheck.inquiry import Inquiry
from bidcheck.limits import Limit
from bidcheck.quantity import Assumption, Kind
from bidcheck.report.json_estimates import estimates_json
from bidcheck.report.json_figures import in_unit, number
from bidcheck.report.words import message, question
from bidcheck.second_opinion import Estimates
from bidcheck.units import from_si

SCHEMA = "bidcheck/evaluation/1"


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


def _inquiry(inquiry: Inquiry) -> dict[str, Any]:
    duty = inquiry.duty
    return {
        "tag": inquiry.tag,
        "title": inquiry.title,
        "duty": {
            "flow_m3h": in_unit(duty.rated_flow, Kind.FLOW),
            "head_m": in_unit(duty.rated_head, Kind.HEAD),
            "npsha_m": in_unit(duty.npsha, Kind.NPSH),
        },
        "limit_set": inquiry.limits.set_name,
        "limits": [{"name": limit.name} | _limit(limit) for limit in inquiry.limits.all()],
        "assumptions": _assumptions(inquiry.assumptions),
    }


def _limit(limit: Limit) -> dict[str, Any]:
    """A limit with its origin."""
    return {
        "at_least": in_unit(limit.at_least, limit.kind),
        "at_most": in_unit(limit.at_most, limit.kind),
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
        "bep_beyond_m3h": in_unit(fits.bep_beyond, Kind.FLOW) if fits is not None else None,
        "at_duty": _at(case.at_duty),
        "at_max_diameter": _max_diameter(bid),
        "specific_speed": _specific_speed(case.estimates),
        "suction_specific_speed": _suction_specific_speed(case.estimates),
        "fits": {column: _fit(fits.of(column) if fits is not None else None) for column in COLUMNS},
        "estimates": estimates_json(case.estimates),
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
        "flow_m3h": in_unit(bep.flow, Kind.FLOW),
        "head_m": in_unit(bep.head, Kind.HEAD),
        "efficiency": number(bep.efficiency),
        "flow_interval_m3h": None if interval is None else [in_unit(value, Kind.FLOW) for value in interval],
    }


def _at(at: AtFlow) -> dict[str, Any]:
    """Performance at rated flow, as pumped, rated diameter."""
    return {
        "head_m": in_unit(at.head, Kind.HEAD),
        "efficiency": in_unit(at.efficiency, Kind.SHARE),
        "power_kw": in_unit(at.power, Kind.POWER),
        "npsh3_m": in_unit(at.npsh3, Kind.NPSH),
        "flow_over_bep": in_unit(at.flow_over_bep, Kind.SHARE),
        "npsh_margin_m": in_unit(at.npsh_margin, Kind.NPSH),
        "from_claims": list(at.from_claims),
    }


def _max_diameter(bid: BidEvaluation) -> dict[str, Any] | None:
    """Best efficiency at the maximum diameter; null where the bid gives no curve of its own for it."""
    case = bid.case
    if case.max_curve is None or case.max_curve is case.curve or case.max_fits is None:
        return None
    return {"impeller_mm": in_unit(case.max_curve.impeller, Kind.DIAMETER), "bep": _bep(case.max_fits)}


def _specific_speed(estimates: Estimates) -> dict[str, Any] | None:
    if estimates.nq is None:
        return None
    return {
        "nq": number(estimates.nq),
        "nq_per_eye": in_unit(estimates.nq_eye, Kind.SPECIFIC_SPEED),
        "ns_us": number(from_si(estimates.nq, "US", Kind.SPECIFIC_SPEED)),
        "basis": estimates.basis,
    }


def _suction_specific_speed(estimates: Estimates) -> dict[str, Any] | None:
    if estimates.nss is None:
        return None
    return {
        "metric": number(estimates.nss),
        "us": number(from_si(estimates.nss, "US", Kind.SUCTION_SPECIFIC_SPEED)),
        "basis": estimates.nss_basis,
    }


def _fit(fit: Fit | None) -> dict[str, Any] | None:
    """A fit in m, fraction, kW, m over u = (2Q - lo - hi)/(hi - lo)."""
    if fit is None:
        return None
    kind = COLUMN_KINDS[fit.column]
    return {
        "degree": fit.degree,
        "coefficients": [in_unit(float(value), kind) for value in fit.polynomial.coef],
        "domain_m3h": [in_unit(value, Kind.FLOW) for value in fit.domain],
        "points": fit.points,
        "rms": in_unit(fit.rms, kind),
        "largest_residual": in_unit(fit.largest_residual, kind),
        "derived": fit.derived,
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
            found[f"{name}_{item.kind.suffix}"] = in_unit(item.value, item.kind)
    return found
