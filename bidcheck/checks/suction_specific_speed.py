"""Suction specific speed is not higher than owners accept.

A large impeller eye buys a low NPSH3 at best efficiency and pays for it with rough running at part flow. Owners
therefore cap suction specific speed. The cap comes from a survey of large split-case refinery pumps and is a limit,
not a law: small end suction pumps did not show the same trend. Taken at best efficiency, maximum diameter, flow per
eye.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import suction_specific_speed, text
from bidcheck.checks.request import asked_in_water
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within


def run(case: Case) -> Iterator[Measured]:
    """Compare suction specific speed with the caps."""
    nss, limits = case.estimates.nss, case.inquiry.limits
    if nss is None:
        yield asked_in_water(case, "best efficiency", "NPSH3 at best efficiency")
        return
    high = within(nss, limits.suction_specific_speed_high)
    ordinary = within(nss, limits.suction_specific_speed)
    evidence = {"nss": suction_specific_speed(nss), "basis": text(case.estimates.nss_basis)}
    if not high.holds and not case.bid.inducer and not (ordinary.limit.mandatory and not ordinary.holds):
        yield Measured(subject="best efficiency", holds=high, evidence=evidence, wording="no inducer")
    else:
        yield Measured(subject="best efficiency", holds=ordinary, evidence=evidence)


CHECK = Check(
    name="suction-specific-speed",
    group="suction",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("suction_specific_speed", "suction_specific_speed_high"),
    source="common practice, no source",
    wordings={
        "": Wording(
            "Suction specific speed is {nss} ({basis}).",
            "Your NPSH3 puts suction specific speed at {nss}. Please state the minimum continuous stable flow with"
            " the test or operating data behind it.",
        ),
        "no inducer": Wording(
            "Suction specific speed is {nss} without an inducer ({basis}): a very large eye, which runs rough at part"
            " flow.",
            "Your NPSH3 puts suction specific speed at {nss} without an inducer. Please state the minimum continuous"
            " stable flow with the test or operating data behind it.",
        ),
    },
)
