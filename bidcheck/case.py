"""Everything a check may look at for one bid: the inquiry, the bid, its fits, the estimates, the other bids."""

from collections.abc import Mapping
from dataclasses import dataclass

from bidcheck.bid import Bid
from bidcheck.curve import Column, Curve, Fits
from bidcheck.inquiry import Inquiry
from bidcheck.quantity import Assumption


@dataclass(frozen=True, slots=True)
class Source:
    """One independent estimate: value as a fraction, or None with the reason it does not apply.

    `spread` is the band it is stated with, as a fraction, None where its source gives none.
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
class Estimates:
    """What a pump of this duty should show, and the specific speeds it rests on (water, maximum diameter where given).

    nq in 1/min, m³/s, m per stage: `nq` for total flow, `nq_eye` per suction eye. `nss` per eye, metric. `basis` says
    in words which curve they were taken from. None where the curve gives no best efficiency point.
    """

    nq: float | None
    nq_eye: float | None
    nss: float | None
    basis: str
    efficiency: EfficiencyEstimate | None
    offered_efficiency: float | None
    """Efficiency at best efficiency point of the bidder's own curve on the same basis (maximum diameter)."""
    offered_interval: float | None
    """Half the 95 % interval of it."""
    trim_allowance: float
    """What trimming may have cost the efficiency where only a trimmed curve is given [fraction]; given to the bidder
    on the low side only."""
    npsh3_expected: float | None
    """NPSH3 at the maximum diameter's best efficiency flow at ordinary suction specific speed [m]."""


@dataclass(frozen=True, slots=True, kw_only=True)
class AtFlow:
    """What the offered pump does at one flow, as pumped, rated diameter. None where the bid gives no figure there."""

    flow: float
    head: float | None
    efficiency: float | None
    power: float | None
    npsh3: float | None
    npsha: float | None
    flow_over_bep: float | None
    from_claims: tuple[Column, ...] = ()
    """Figures taken from the bidder's claims because the curve does not reach this flow."""

    @property
    def npsh_margin(self) -> float | None:
        """NPSH available less NPSH3 [m]."""
        if self.npsha is None or self.npsh3 is None:
            return None
        return self.npsha - self.npsh3


@dataclass(frozen=True, eq=False, slots=True, kw_only=True)
class Case:
    """One bid prepared for the checks.

    `curve` holds the points of the rated diameter at the offered speed and stages, in water; `fits` is fitted
    through them. `pumped` is the same for the liquid, density and viscosity of the inquiry. `max_curve` and
    `max_fits` belong to the maximum diameter where the bid gives a curve of it, else they are those of the rated
    diameter. None where the bid gives no such curve.
    """

    inquiry: Inquiry
    bid: Bid
    curve: Curve | None
    fits: Fits | None
    pumped: Fits | None
    max_curve: Curve | None
    max_fits: Fits | None
    estimates: Estimates
    at_duty: AtFlow
    operating: tuple[tuple[str, AtFlow], ...]
    """Flows the pump must serve, with their names: "rated", "smallest flow", "normal flow", "largest flow"."""
    water: str
    """Why there is no curve in water to judge efficiency and specific speed by; empty where there is one."""
    all_bids: tuple[Bid, ...]
    """The latest revision of every bid of the inquiry, this one included; one tuple shared by all cases."""
    assumptions: tuple[Assumption, ...]
