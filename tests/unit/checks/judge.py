"""Run one check over a case built from the sound bid, with parts replaced."""

from dataclasses import replace
from typing import Any

from bidcheck.case import Case
from bidcheck.checks.runner import run_checks
from bidcheck.curve import BestEfficiency
from bidcheck.finding import Check, Finding
from bidcheck.prepare import prepare
from tests.build import M3H, inquiry, sound_bid


def sound_case(bid: dict[str, Any] | None = None, **asked: Any) -> Case:
    """Case of the sound bid, its fields and those of the inquiry replaced."""
    return prepare(inquiry(**asked), sound_bid(**(bid or {})))


def with_bep(case: Case, flow_m3h: float, interval_m3h: tuple[float, float] | None = None) -> Case:
    """The case with best efficiency flow set, in m³/h."""
    assert case.fits is not None
    low_high = None if interval_m3h is None else (interval_m3h[0] * M3H, interval_m3h[1] * M3H)
    bep = BestEfficiency(flow_m3h * M3H, 62.0, 0.825, low_high)
    fits = replace(case.fits, bep=bep)
    return replace(case, fits=fits, pumped=fits, max_fits=fits)


def judge(check: Check, case: Case) -> dict[str, Finding]:
    """Findings of one check by subject."""
    return {finding.subject: finding for finding in run_checks(case, [check])}
