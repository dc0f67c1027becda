"""NPSH available exceeds NPSH3 by a margin, at rated flow and at the largest flow.

At NPSH3 the pump already loses 3 % of its head to cavitation. The margin is wanted as a ratio and as a difference,
the stricter of the two, and a larger one where suction specific speed is high. NPSH3 rises and NPSH available falls
with flow, so a pump that is safe at rated flow can cavitate at the largest.
"""

from collections.abc import Iterator

from bidcheck.case import AtFlow, Case
from bidcheck.checks.evidence import flow, npsh, ratio, suction_specific_speed
from bidcheck.checks.request import asked, ours
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import Limit, within

REQUESTED = {"rated": "NPSH3 at rated flow", "largest flow": "NPSH3 at the largest flow"}


def run(case: Case) -> Iterator[Measured]:
    """Compare NPSH available with NPSH3 at rated and at the largest flow."""
    for subject, at in case.operating:
        if subject not in REQUESTED:
            continue
        if at.npsh3 is None:
            yield asked(subject, REQUESTED[subject], decisive=subject == "rated")
        elif at.npsha is None:
            yield ours(subject, f"NPSH available at {'rated flow' if subject == 'rated' else 'the largest flow'}")
        else:
            yield _margin(case, subject, at, at.npsh3, at.npsha)


def is_raised(case: Case, at: AtFlow) -> bool:
    """Whether the larger margin is wanted: high suction specific speed, outside the region that excuses it."""
    limits, nss = case.inquiry.limits, case.estimates.nss
    if nss is None or within(nss, limits.nss_ordinary).holds:
        return False
    over_bep = at.flow_over_bep
    return over_bep is None or not within(over_bep, limits.npsh_ordinary_region).holds


def governing(case: Case, at: AtFlow, npsh3: float) -> Limit:
    """Of margin and ratio, the one that asks for more NPSH available."""
    limits = case.inquiry.limits
    raised = is_raised(case, at)
    margin = limits.npsh_margin_raised if raised else limits.npsh_margin
    share = limits.npsh_ratio_raised if raised else limits.npsh_ratio
    by_ratio = npsh3 * (share.at_least or 1.0)
    return margin if npsh3 + (margin.at_least or 0.0) >= by_ratio else share


def _margin(case: Case, subject: str, at: AtFlow, npsh3: float, npsha: float) -> Measured:
    """One flow."""
    limits = case.inquiry.limits
    evidence = {
        "flow": flow(at.flow),
        "npsha": npsh(npsha),
        "npsh3": npsh(npsh3),
        "margin": npsh(npsha - npsh3),
        "ratio": ratio(npsha / npsh3),
    }
    if case.estimates.nss is not None:
        evidence["nss"] = suction_specific_speed(case.estimates.nss)
    floor = within(npsha - npsh3, limits.npsh_floor)
    if not floor.holds:
        return Measured(subject=subject, holds=floor, evidence=evidence, wording="none left")
    limit = governing(case, at, npsh3)
    figure = npsha / npsh3 if limit.name.startswith("npsh_ratio") else npsha - npsh3
    return Measured(subject=subject, holds=within(figure, limit), evidence=evidence)


CHECK = Check(
    name="npsh-margin",
    group="suction",
    run=run,
    otherwise=Verdict.QUERY,
    limits=(
        "npsh_margin",
        "npsh_ratio",
        "npsh_margin_raised",
        "npsh_ratio_raised",
        "npsh_ordinary_region",
        "npsh_floor",
        "nss_ordinary",
    ),
    source="Hydraulic Institute 9.6.1 (2012 approach)",
    wordings={
        "": Wording(
            "At {flow} NPSH available {npsha} exceeds NPSH3 {npsh3} by {margin} (ratio {ratio}).",
            "At {flow} your NPSH3 of {npsh3} leaves a margin of {margin} to the {npsha} available. Please offer a"
            " margin of {limit}, or show by a witnessed NPSH test that this one suffices.",
        ),
        "none left": Wording(
            "At {flow} NPSH3 {npsh3} is more than the {npsha} available: margin {margin}.",
            "At {flow} your NPSH3 of {npsh3} exceeds the {npsha} available. Please offer a pump that runs there"
            " without loss of head.",
        ),
    },
)
