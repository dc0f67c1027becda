"""Arrangements whose honest pumps differ most from the published shapes of ordinary ones."""

from bidcheck.bid import Bid
from bidcheck.finding import Verdict

UNLIKE = ("solids handling", "vertical turbine", "submersible multistage", "sealless")
"""Few wide vanes, mixed flow bowls, wells, losses of a can or a magnet: shape, head coefficient and NPSH3 of these are
never more than a remark. Source: common practice, no source."""


def at_most_remark(bid: Bid, verdict: Verdict) -> Verdict:
    """The verdict, a query softened to a remark for those arrangements; a fail is a purchaser's own limit and stays."""
    return Verdict.REMARK if verdict is Verdict.QUERY and bid.arrangement in UNLIKE else verdict
