"""What estimates that owe nothing to the bidder say of one bid: frozen, SI inside, None where nothing can be said."""

from collections.abc import Mapping
from dataclasses import dataclass
from typing import Literal

from bidcheck.quantity import Kind


@dataclass(frozen=True, slots=True)
class Source:
    """One independent estimate: value in SI of its kind, or None with the reason it does not apply.

    `spread` is the band it is stated with, None where its source gives none.
    """

    name: str
    value: float | None
    valid: str
    """Range it holds in, in words."""
    reason: str
    """Why it gives no value here; empty where it does."""
    mark: str
    origin: str
    """Where it is published."""
    spread: float | None = None
    kind: Kind = Kind.SHARE


@dataclass(frozen=True, slots=True, kw_only=True)
class EfficiencyEstimate:
    """Independent picture of efficiency at best efficiency, fractions. None where there is none to give.

    The thresholds are those of the combination: a claim above `ceiling` contradicts the losses, above
    `implausible_above` or `attainable` asks for a test, above `remark_above` is worth a remark; below
    `remark_below` or `query_below` it is poor for its class.
    """

    sources: tuple[Source, ...]
    market_class: str
    """Class of the market survey used, empty where there is none."""
    market_median: float | None
    """Median of the surveyed market at this size and speed; None where the survey does not reach."""
    expected: float | None
    expected_from: str
    """Which source the expected value comes from, in words."""
    attainable: float | None
    ceiling: float | None
    ceiling_terms: Mapping[str, float]
    """Losses behind the ceiling, as shares."""
    sigma: float | None
    """Spread of merit on the market, fraction; None where the class has none."""
    implausible_above: float | None
    remark_above: float | None
    remark_below: float | None
    query_below: float | None
    lenient_low: bool
    """Whether a low claim is never more than a remark (small, narrow, solids-handling, sealless, multistage)."""
    reason: str
    """Why nothing can be judged; empty where something can."""

    def market_share_below(self, efficiency: float) -> float | None:
        """Share of the surveyed market with a lower efficiency at this size and speed; None without a class."""
        from math import erf, sqrt

        if self.market_median is None or self.sigma is None:
            return None
        return 0.5 * (1.0 + erf((efficiency - self.market_median) / self.sigma / sqrt(2.0)))


@dataclass(frozen=True, slots=True, kw_only=True)
class ImpellerEstimate:
    """Head coefficient and diameter at best efficiency of the curve looked at, beside those expected there.

    Diameters [m]. The offered figures are None where the bid states no diameter of the curve.
    """

    offered: float | None
    """Head coefficient at best efficiency, ψ = 2gH/u²."""
    offered_at_shutoff: float | None
    expected: float | None
    expected_at_shutoff: float | None
    diameter: float | None
    expected_diameter: float | None
    """By the expected head coefficient."""
    cordier_diameter: float | None
    tip_speed: float | None
    """Of the diameter offered [m/s]."""
    sources: tuple[Source, ...]

    @property
    def ratio(self) -> float | None:
        """Offered head coefficient over the expected one."""
        return None if self.offered is None or self.expected is None else self.offered / self.expected


@dataclass(frozen=True, slots=True)
class ShapeRatio:
    """A ratio of the offered curve, and what each source expects of it at the same specific speed."""

    offered: float | None
    """None where the points do not reach."""
    sources: tuple[Source, ...]

    @property
    def expected(self) -> tuple[float, float] | None:
        """Least and greatest of the sources that apply; None where none does."""
        values = [source.value for source in self.sources if source.value is not None]
        return (min(values), max(values)) if values else None


@dataclass(frozen=True, slots=True, kw_only=True)
class ShapeEstimate:
    """Shape of the offered curve: ratios to best efficiency point."""

    shutoff_head: ShapeRatio
    shutoff_power: ShapeRatio
    part_load: ShapeRatio
    """Efficiency at 0.75 of best efficiency flow over the best."""
    over_load: ShapeRatio
    """Efficiency at 1.10 of best efficiency flow over the best."""


@dataclass(frozen=True, slots=True, kw_only=True)
class SuctionEstimate:
    """NPSH3 at best efficiency beside that of an ordinary impeller eye [m].

    `ordinary` is between `low` and `high`, the ends of the ordinary band of suction specific speed. `growth` is the
    exponent of flow with which the offered NPSH3 rises beyond best efficiency, None where the points do not show it.
    """

    offered: float | None
    ordinary: float
    low: float
    high: float
    growth: float | None
    sources: tuple[Source, ...]


@dataclass(frozen=True, slots=True, kw_only=True)
class RegulationEstimate:
    """Where the offered curve stands against two regulations; the reason where one does not cover it.

    `eu_index` is the minimum efficiency index as far as a curve tells, `eu_points` the number of load points behind it
    (three, or one where the curve does not reach). `us_ratio` is shaft power over that of the least efficient pump
    the rule allows, over three load points, motor left out.
    """

    eu_class: str
    eu_index: float | None
    eu_points: int
    eu_reason: str
    us_class: str
    us_ratio: float | None
    us_reason: str


@dataclass(frozen=True, slots=True, kw_only=True)
class Estimates:
    """What a pump of this duty should show, and the specific speeds it rests on (water, maximum diameter where given).

    nq in 1/min, m³/s, m per stage: `nq` for total flow, `nq_eye` per suction eye. `nss` per eye, metric. `basis` says
    in words which curve they were taken from. None where the curve gives no best efficiency point.
    """

    nq: float | None
    nq_eye: float | None
    nss: float | None
    nss_basis: str
    """Which NPSH3 the suction specific speed is taken from, in words; empty where there is none."""
    basis: str
    best_flow: float | None
    """Best efficiency flow with water that everything here belongs to [m³/s]."""
    best_head: float | None
    """Head of one stage there [m]."""
    declared: Literal["", "best efficiency", "rated flow"]
    """Where best efficiency is the bidder's word because the points show none: the one declared, or the claim at rated
    flow in its place; empty where the points show it."""
    efficiency: EfficiencyEstimate | None
    offered_efficiency: float | None
    """Efficiency at best efficiency point of the bidder's own curve on the same basis (maximum diameter)."""
    offered_interval: float | None
    """Half the 95 % interval of it."""
    trim_allowance: float
    """What trimming may have cost the efficiency where only a trimmed curve is given [fraction]; given to the bidder
    on the low side only."""
    corrected: bool
    """Whether the bidder's figures were brought from a viscous liquid to water; nothing above a remark stands on it."""
    impeller: ImpellerEstimate | None
    shape: ShapeEstimate | None
    suction: SuctionEstimate | None
    regulation: RegulationEstimate | None
