"""The purchaser's inquiry as read: one duty, its liquid and site, the limits in force, the bids received. SI inside."""

from dataclasses import dataclass

from bidcheck.bid import Bid
from bidcheck.errors import Problem
from bidcheck.limits import Limits
from bidcheck.quantity import Assumption, UnitSystem


@dataclass(frozen=True, slots=True, kw_only=True)
class Duty:
    """Flows and heads of one running pump. [m³/s, m]"""

    rated_flow: float
    rated_head: float
    min_flow: float | None = None
    normal_flow: float | None = None
    max_flow: float | None = None
    npsha: float | None = None
    npsha_at_max_flow: float | None = None
    pumps_running: int = 1
    pumps_installed: int = 1


@dataclass(frozen=True, slots=True, kw_only=True)
class Liquid:
    """The liquid as pumped: temperature [K], density [kg/m³], kinematic viscosity [m²/s], vapour pressure [Pa abs]."""

    name: str
    density: float
    viscosity: float
    temperature: float | None = None
    vapour_pressure: float | None = None
    solids: str | None = None


@dataclass(frozen=True, slots=True, kw_only=True)
class Suction:
    """Suction side of one pump: pressure on the liquid [Pa absolute], level above datum [m], loss at rated flow [m]."""

    pressure: float
    liquid_level: float
    friction_loss: float
    max_pressure: float | None = None


@dataclass(frozen=True, slots=True, kw_only=True)
class System:
    """System curve of all running pumps together: static head [m], friction from the duty."""

    static_head: float


@dataclass(frozen=True, slots=True, kw_only=True)
class Site:
    """Where the pump runs: mains frequency [Hz], altitude [m], ambient temperature [K], regulations that apply."""

    frequency: float | None = None
    altitude: float | None = None
    ambient: float | None = None
    regulations: tuple[str, ...] = ()


@dataclass(frozen=True, slots=True, kw_only=True)
class ProfilePoint:
    """One state of operation of the whole plant: total flow [m³/s], head [m], time per year [h]."""

    flow: float
    hours: float
    head: float | None = None


@dataclass(frozen=True, slots=True, kw_only=True)
class Economics:
    """What energy and time cost. Price per joule in `currency`."""

    energy_price: float
    years: float
    discount_rate: float
    energy_escalation: float = 0.0
    currency: str = ""


@dataclass(frozen=True, slots=True, kw_only=True)
class GuaranteeWanted:
    """What the inquiry requires of a guarantee and of the shop test."""

    standard: str | None = None
    grade: str | None = None
    witnessed: bool | None = None
    npsh_test: str | None = None


@dataclass(frozen=True, slots=True, kw_only=True)
class DensityCase:
    """Another density the pump must handle, such as at start-up. [kg/m³]"""

    name: str
    density: float


@dataclass(frozen=True, slots=True)
class InputFile:
    """A file that was read, with the hash of its bytes."""

    file: str
    sha256: str


@dataclass(frozen=True, slots=True)
class UnreadableBid:
    """A bid left out because it could not be read, with every problem found in it."""

    bidder: str
    problems: tuple[Problem, ...]


@dataclass(frozen=True, eq=False, slots=True, kw_only=True)
class Inquiry:
    """One inquiry with its bids. `bids` holds every revision read, in order of bidder then revision."""

    tag: str
    title: str
    units: UnitSystem
    duty: Duty
    liquid: Liquid
    limits: Limits
    suction: Suction | None = None
    system: System | None = None
    site: Site = Site()
    profile: tuple[ProfilePoint, ...] = ()
    economics: Economics | None = None
    guarantee: GuaranteeWanted = GuaranteeWanted()
    density_cases: tuple[DensityCase, ...] = ()
    assumptions: tuple[Assumption, ...] = ()
    bids: tuple[Bid, ...] = ()
    unreadable: tuple[UnreadableBid, ...] = ()
    inputs: tuple[InputFile, ...] = ()

    def latest_bids(self) -> tuple[Bid, ...]:
        """The latest revision of every bidder, in order of bidder."""
        latest: dict[str, Bid] = {}
        for bid in self.bids:
            if bid.bidder not in latest or bid.revision > latest[bid.bidder].revision:
                latest[bid.bidder] = bid
        return tuple(latest[name] for name in sorted(latest))
