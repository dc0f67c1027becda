"""Everything a check may look at for one bid: the inquiry, the bid, its fits, the estimates, the other bids."""

from dataclasses import dataclass

from bidcheck.bid import Bid
from bidcheck.curve import Column, Curve, Fits
from bidcheck.inquiry import Inquiry
from bidcheck.quantity import Assumption
from bidcheck.second_opinion import Estimates


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
    assumptions: tuple[Assumption, ...]
    bids: "tuple[Case, ...]" = ()
    """Every bid of the inquiry prepared alike, this one included, for comparisons between bids; one tuple shared by
    all cases. Empty where a bid is looked at alone."""

    @property
    def brought_from_water(self) -> bool:
        """Whether `pumped` is the bidder's water curve corrected for viscosity here, not a curve of the bidder's."""
        return self.pumped is not None and self.fits is not None and self.pumped.head is not self.fits.head

    @property
    def derived_efficiency(self) -> bool:
        """Whether the efficiency judged follows from head and power, because the bid states none."""
        fit = self.max_fits.efficiency if self.max_fits is not None else None
        return fit is not None and fit.derived and not self.estimates.declared
