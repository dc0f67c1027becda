"""NPSH available exceeds NPSH3 by a margin, at rated flow and at the largest flow.

At NPSH3 the pump already loses 3 % of its head to cavitation. The margin is wanted as a ratio and as a difference,
the stricter of the two, and a larger one where suction specific speed is high. NPSH3 rises and NPSH available falls
with flow, so a pump that is safe at rated flow can cavitate at the largest. Where suction specific speed is not known
and only the ordinary margin is kept, the NPSH3 curve is asked for.
"""

from collections.abc import Iterator

from bidcheck.case import AtFlow, Case
from bidcheck.checks import evidence as ev
from bidcheck.checks.request import Item, asked, ours
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import Comparison, Limit, Limits, within

REQUESTED: dict[str, Item] = {"rated": "NPSH3 at rated flow", "largest flow": "NPSH3 at the largest flow"}


def run(case: Case) -> Iterator[Measured]:
    """Compare NPSH available with NPSH3 at rated and at the largest flow."""
    for subject, at in case.operating:
        if subject not in REQUESTED:
            continue
        if at.npsh3 is None or at.npsh3 <= 0.0:
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


def margins(limits: Limits, raised: bool) -> tuple[Limit, Limit]:
    """Margin and ratio in force, ordinary or raised.

    A margin the purchaser sets holds at any suction specific speed, unless the purchaser sets the raised one as well.
    """
    return (
        _in_force(limits.npsh_margin, limits.npsh_margin_raised, raised),
        _in_force(limits.npsh_ratio, limits.npsh_ratio_raised, raised),
    )


def _in_force(ordinary: Limit, higher: Limit, raised: bool) -> Limit:
    """The ordinary limit or the raised one."""
    own = ordinary.mark == "purchaser" and higher.mark != "purchaser"
    return higher if raised and not own else ordinary


def _margin(case: Case, subject: str, at: AtFlow, npsh3: float, npsha: float) -> Measured:
    """One flow."""
    limits = case.inquiry.limits
    evidence = {
        "flow": ev.flow(at.flow),
        "npsha": ev.npsh(npsha),
        "npsh3": ev.npsh(npsh3),
        "margin": ev.npsh(npsha - npsh3),
        "ratio": ev.ratio(npsha / npsh3),
    }
    if case.estimates.nss is not None:
        evidence["nss"] = ev.suction_specific_speed(case.estimates.nss)
    floor = within(npsha - npsh3, limits.npsh_floor)
    if not floor.holds:
        return Measured(subject=subject, holds=floor, evidence=evidence, wording="none left")
    compared = compare(margins(limits, is_raised(case, at)), npsh3, npsha)
    if compared.holds and case.estimates.nss is None and not _raised_anyway(case, at, npsh3, npsha):
        return asked(subject, "NPSH3 at best efficiency")
    return Measured(subject=subject, holds=compared, evidence=evidence)


def _raised_anyway(case: Case, at: AtFlow, npsh3: float, npsha: float) -> bool:
    """Whether the margin holds even if suction specific speed, which is not known, were high; an excusing region"
    " counts.
    """
    limits, over_bep = case.inquiry.limits, at.flow_over_bep
    excused = over_bep is not None and within(over_bep, limits.npsh_ordinary_region).holds
    return excused or compare(margins(limits, raised=True), npsh3, npsha).holds


def compare(wanted: tuple[Limit, Limit], npsh3: float, npsha: float) -> Comparison:
    """The graver of both comparisons: a mandatory limit missed, else the one that asks for more NPSH available."""
    margin, ratio = within(npsha - npsh3, wanted[0]), within(npsha / npsh3, wanted[1])
    for compared in (margin, ratio):
        if not compared.holds and compared.limit.mandatory:
            return compared
    by_margin = npsh3 + (wanted[0].at_least or 0.0) >= npsh3 * (wanted[1].at_least or 1.0)
    return margin if by_margin else ratio


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
