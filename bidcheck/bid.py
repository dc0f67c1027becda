"""One bidder's offer as read, in SI. `Stated` figures keep the digits the bidder printed."""

from dataclasses import dataclass
from typing import Literal

from bidcheck.arrangement import Arrangement
from bidcheck.curve import Curve
from bidcheck.quantity import Assumption, Stated


@dataclass(frozen=True, slots=True, kw_only=True)
class Claims:
    """Figures the bidder states apart from the curve, at rated flow unless named otherwise. [m, fraction, W, m³/s]"""

    head: Stated | None = None
    efficiency: Stated | None = None
    power: Stated | None = None
    npsh3: Stated | None = None
    bep_flow: Stated | None = None
    bep_efficiency: Stated | None = None
    shutoff_head: Stated | None = None
    min_continuous_flow: Stated | None = None
    max_allowable_flow: Stated | None = None
    max_power: Stated | None = None


@dataclass(frozen=True, slots=True, kw_only=True)
class GuaranteeOffered:
    """The guarantee the bidder offers."""

    standard: str | None = None
    grade: str | None = None
    what: Literal["power", "efficiency"] | None = None


@dataclass(frozen=True, slots=True, kw_only=True)
class Driver:
    """The driver offered: rating [W], speed [1/min], efficiency, poles, frequency [Hz]."""

    rating: float | None = None
    speed_rpm: float | None = None
    efficiency: float | None = None
    poles: int | None = None
    frequency: float | None = None


@dataclass(frozen=True, slots=True, kw_only=True)
class Casing:
    """Pressure the casing is rated for [Pa gauge]."""

    max_pressure: float | None = None


@dataclass(frozen=True, slots=True, kw_only=True)
class Adder:
    """Something to be paid on top of the price, in the bid's currency."""

    item: str
    amount: float


@dataclass(frozen=True, slots=True, kw_only=True)
class Commercial:
    """Price with its currency, delivery and validity as written, and adders."""

    price: float | None = None
    currency: str = ""
    delivery: str | None = None
    validity: str | None = None
    adders: tuple[Adder, ...] = ()


@dataclass(frozen=True, slots=True, kw_only=True)
class ExceptionTaken:
    """A deviation the bidder declares from a clause of the inquiry."""

    clause: str
    text: str


@dataclass(frozen=True, eq=False, slots=True, kw_only=True)
class Bid:
    """One revision of one bid. Diameters [m], speed [1/min] at full load.

    Equality is identity: a bid holds arrays.
    """

    bidder: str
    revision: str
    folder: str
    """Folder of this revision inside the inquiry folder, for messages."""
    arrangement: Arrangement
    speed_rpm: float
    curves: tuple[Curve, ...]
    title: str = ""
    model: str = ""
    stages: int = 1
    suction_eyes: int = 1
    inducer: bool = False
    drive: Literal["fixed", "variable"] = "fixed"
    casing_type: Literal["volute", "diffuser"] | None = None
    impeller_rated: float | None = None
    impeller_max: float | None = None
    impeller_min: float | None = None
    impeller_material: str = ""
    """As the bidder words it; empty where not stated."""
    performance_basis: Literal["pump", "bowl"] | None = None
    references: int | None = None
    claims: Claims = Claims()
    guarantee: GuaranteeOffered = GuaranteeOffered()
    driver: Driver = Driver()
    casing: Casing = Casing()
    commercial: Commercial = Commercial()
    exceptions: tuple[ExceptionTaken, ...] = ()
    assumptions: tuple[Assumption, ...] = ()

    @property
    def name(self) -> str:
        """Bidder and revision, as printed: "birch b"."""
        return f"{self.bidder} {self.revision}"
