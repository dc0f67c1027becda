"""Limits: thresholds with their origin. Every comparison of a figure with a limit is made here.

The fields of `Limits` are the register of limit names; `bidcheck/limit_sets/*.toml` give their values, an inquiry may
override any of them.
"""

from dataclasses import dataclass, field, fields
from typing import Literal

from bidcheck.quantity import Kind

Mark = Literal["text", "crossed", "memory", "practice", "derived", "purchaser", "bidder"]
"""How a value is known: read in the text named, recalled and reproduced, recalled only, common practice of the
trade, following from other formulas, set by the purchaser in the inquiry, or stated by the bidder."""

HAIR = 1e-9
"""Relative slack of every comparison, so that a figure exactly at its limit passes in any unit."""


@dataclass(frozen=True, slots=True)
class Limit:
    """A threshold: at least, at most, or both; where it comes from; whether it is mandatory."""

    name: str
    kind: Kind
    at_least: float | None
    at_most: float | None
    origin: str
    mark: Mark
    mandatory: bool = False
    missed: Literal["remark", "query"] | None = None
    """Verdict when the limit is missed, where it differs from the check's own; a mandatory limit missed is a fail."""

    def __post_init__(self) -> None:
        if self.at_least is None and self.at_most is None:
            raise ValueError(f"limit {self.name} needs at_least or at_most")
        if self.at_least is not None and self.at_most is not None and self.at_least > self.at_most:
            raise ValueError(f"limit {self.name} has at_least above at_most")


@dataclass(frozen=True, slots=True)
class Comparison:
    """A figure held against a limit."""

    value: float
    limit: Limit
    holds: bool


def within(value: float, limit: Limit, slack: float = 0.0) -> Comparison:
    """Compare `value` with `limit`; exactly at the limit holds.

    Parameters
    ----------
    value, slack : float
        Figure and the doubt it carries, both in SI of the limit's kind. The figure must miss the limit by more
        than `slack` for the comparison not to hold.
    """
    low, high = limit.at_least, limit.at_most
    holds = (low is None or value + slack >= low - HAIR * abs(low)) and (
        high is None or value - slack <= high + HAIR * abs(high)
    )
    return Comparison(value, limit, holds)


def named(kind: Kind, meaning: str) -> Limit:
    """Declare a limit name of the register: its kind and one line on what it limits."""
    return field(metadata={"kind": kind, "meaning": meaning})  # type: ignore[no-any-return]


@dataclass(frozen=True, slots=True, kw_only=True)
class Limits:
    """The set of limits in force."""

    set_name: str
    curve_points: Limit = named(Kind.COUNT, "points of each column of a curve")
    curve_reach: Limit = named(Kind.WHOLE_SHARE, "last flow with points over the largest flow asked for")
    curve_beyond_bep: Limit = named(Kind.WHOLE_SHARE, "last flow with points over best efficiency flow")
    odd_point: Limit = named(Kind.SHARE, "distance of a point from its own curve over the curve's largest value")
    power_balance: Limit = named(
        Kind.SHARE, "disagreement of stated efficiency with flow, head and power that no single mistake explains"
    )
    power_balance_scatter: Limit = named(
        Kind.SHARE, "disagreement of stated efficiency with flow, head and power that is only remarked on"
    )
    claim_on_curve: Limit = named(Kind.SHARE, "claim against the fitted curve, beyond printed digits and fit")
    declared_bep: Limit = named(Kind.WHOLE_SHARE, "declared best efficiency flow against that of the fitted points")
    declared_bep_efficiency: Limit = named(Kind.POINTS, "declared best efficiency against that of the fitted points")
    duty_head: Limit = named(Kind.SHARE, "head at rated flow over rated head")
    duty_head_floor: Limit = named(Kind.SHARE, "head at rated flow over rated head, below which the duty is not met")
    rated_over_bep: Limit = named(Kind.WHOLE_SHARE, "rated flow over best efficiency flow, at the diameter offered")
    efficiency_peers: Limit = named(
        Kind.POINTS, "best efficiency over what is expected of it, against the middle of the other bids"
    )
    trim_gain: Limit = named(
        Kind.POINTS,
        "best efficiency at the rated diameter over that at the largest diameter, which trimming does not raise",
    )
    efficiency_shape: Limit = named(
        Kind.POINTS, "efficiency at 75 and 110 % of best efficiency flow over the best, beyond what is expected"
    )
    efficiency_shape_far: Limit = named(
        Kind.POINTS,
        "efficiency at 75 and 110 % of best efficiency flow beyond what is expected, from where it is asked about",
    )
    minimum_efficiency_index: Limit = named(Kind.RATIO, "minimum efficiency index of the European regulation")
    us_power_ratio: Limit = named(
        Kind.SHARE, "shaft power over that of the least efficient pump the United States rule allows"
    )
    npsh_margin: Limit = named(Kind.NPSH, "NPSH available less NPSH3")
    npsh_ratio: Limit = named(Kind.RATIO, "NPSH available over NPSH3")
    npsh_margin_raised: Limit = named(
        Kind.NPSH, "NPSH available less NPSH3 where suction specific speed is above `nss_ordinary`"
    )
    npsh_ratio_raised: Limit = named(
        Kind.RATIO, "NPSH available over NPSH3 where suction specific speed is above `nss_ordinary`"
    )
    npsh_ordinary_region: Limit = named(
        Kind.WHOLE_SHARE, "flow over best efficiency flow inside which the ordinary NPSH margin always suffices"
    )
    npsh_floor: Limit = named(
        Kind.NPSH, "NPSH available less NPSH3, below which the pump cavitates beyond 3 % head loss"
    )
    nss_ordinary: Limit = named(
        Kind.SUCTION_SPECIFIC_SPEED, "suction specific speed up to which the ordinary NPSH margin holds"
    )
    suction_specific_speed: Limit = named(
        Kind.SUCTION_SPECIFIC_SPEED, "suction specific speed at best efficiency, maximum diameter"
    )
    suction_specific_speed_high: Limit = named(Kind.SUCTION_SPECIFIC_SPEED, "suction specific speed without an inducer")
    nss_credible: Limit = named(
        Kind.SUCTION_SPECIFIC_SPEED, "suction specific speed a claimed NPSH3 implies, without an inducer"
    )
    nss_sound: Limit = named(
        Kind.SUCTION_SPECIFIC_SPEED, "suction specific speed a claimed NPSH3 implies, below which it is poor or wrong"
    )
    npsh_fall: Limit = named(Kind.SHARE, "fall of NPSH3 with rising flow above 60 % of best efficiency flow")
    npsh_growth: Limit = named(Kind.RATIO, "exponent of flow with which NPSH3 rises beyond best efficiency")
    head_coefficient: Limit = named(Kind.RATIO, "head coefficient over that expected for the specific speed")
    head_coefficient_far: Limit = named(
        Kind.RATIO, "head coefficient over that expected, outside which it is asked about even without a likely cause"
    )
    tip_speed: Limit = named(Kind.TIP_SPEED, "speed of the impeller's outer edge, up to which grey cast iron is usual")
    shutoff_droop: Limit = named(Kind.SHARE, "fall of the head curve towards shutoff over shutoff head")
    shutoff_head_ordinary: Limit = named(Kind.WHOLE_SHARE, "shutoff head over head at best efficiency, always in order")
    shutoff_head_shape: Limit = named(
        Kind.RATIO, "shutoff head over head at best efficiency, over what is expected for the specific speed"
    )
    shutoff_power_ordinary: Limit = named(
        Kind.WHOLE_SHARE, "shutoff power over power at best efficiency, always in order"
    )
    shutoff_power_shape: Limit = named(
        Kind.RATIO, "shutoff power over power at best efficiency, over what is expected for the specific speed"
    )
    same_hydraulics: Limit = named(Kind.SHARE, "head of two bids brought to one speed, within which they are one pump")
    same_hydraulics_efficiency: Limit = named(
        Kind.POINTS, "best efficiency claimed above that of a bid with the same curves"
    )

    def all(self) -> tuple[Limit, ...]:
        """Every limit in force, in the order of the register."""
        return tuple(getattr(self, item.name) for item in fields(self) if item.name != "set_name")


def limit_names() -> dict[str, tuple[Kind, str]]:
    """Register of limit names: name → (kind, meaning)."""
    return {
        item.name: (item.metadata["kind"], item.metadata["meaning"])
        for item in fields(Limits)
        if item.name != "set_name"
    }
