"""How often a bid is called ahead of the others: honest bids, and one among them that overstates. Seeded."""

from dataclasses import replace
from typing import NamedTuple

import numpy as np

from bidcheck.case import Case
from bidcheck.checks import efficiency_peers
from bidcheck.checks.runner import run_checks
from bidcheck.finding import Verdict
from bidcheck.prepare import prepare
from tests.build import inquiry, sound_bid

COUNTS = (3, 4, 6, 8)
INQUIRIES = 2000
ERROR, COMMON = 0.022, 0.02
"""Error of the estimate on single pumps, and an error all bids of an inquiry share [fractions]."""


class Ahead(NamedTuple):
    """Shares of inquiries by number of bids."""

    bids: int
    honest: float
    """With some honest bid called ahead."""
    eight: float
    """With the one overstated by 8 points called ahead."""
    ten: float


def peers_study(seed: int) -> list[Ahead]:
    """Shares by number of bids; distances alone are drawn, the check is the real one."""
    bids = [sound_bid(bidder=f"bid{number}") for number in range(max(COUNTS))]
    cases = [prepare(inquiry(bids=tuple(bids)), bid) for bid in bids]
    rng = np.random.default_rng(seed)
    found = []
    for count in COUNTS:
        honest = eight = ten = 0
        for _ in range(INQUIRIES):
            distances = rng.normal(0.0, COMMON) + rng.normal(0.0, ERROR, count)
            honest += any(_ahead(cases, distances, which) for which in range(count))
            eight += _ahead(cases, distances + 0.08 * (np.arange(count) == 0), 0)
            ten += _ahead(cases, distances + 0.10 * (np.arange(count) == 0), 0)
        found.append(Ahead(count, honest / INQUIRIES, eight / INQUIRIES, ten / INQUIRIES))
    return found


def _ahead(cases: list[Case], distances: "np.typing.NDArray[np.float64]", which: int) -> bool:
    """Whether the bid of this number is called ahead of the others."""
    drawn = [_at_distance(case, float(one)) for case, one in zip(cases, distances, strict=False)]
    together = replace(drawn[which], bids=tuple(drawn))
    (finding,) = run_checks(together, [efficiency_peers.CHECK])
    return finding.verdict in (Verdict.REMARK, Verdict.QUERY)


def _at_distance(case: Case, distance: float) -> Case:
    """The case with its claim so far from its own expectation."""
    assert case.estimates.efficiency is not None
    assert case.estimates.efficiency.expected is not None
    claim = case.estimates.efficiency.expected + distance
    return replace(case, estimates=replace(case.estimates, offered_efficiency=claim))
