"""Kinds of quantity, how each is named in files and printed, and a figure as it was stated.

This is the one table that says in which units a kind is printed (SI and US), the suffix of its keys in
evaluation.json, and how many decimals it deserves. Conversion itself is done by `bidcheck.units`.
"""

import re
from dataclasses import dataclass
from enum import Enum, StrEnum
from typing import NamedTuple


class UnitSystem(StrEnum):
    """In which units figures are printed. Inside the program everything is SI."""

    SI = "SI"
    US = "US"


class Printed(NamedTuple):
    """How a kind is printed in one unit system."""

    unit: str
    """Spelling known to `bidcheck.units`; empty for a bare number."""
    decimals: int
    """Decimals shown for a figure of ordinary size."""


class KindOf(NamedTuple):
    """How one kind is written in evaluation.json and printed."""

    suffix: str
    """End of its keys in evaluation.json."""
    json_unit: str
    """Spelling of its unit in evaluation.json, known to `bidcheck.units`; empty for a bare number."""
    si: Printed
    us: Printed


class Kind(Enum):
    """What a number measures."""

    FLOW = "flow"
    HEAD = "head"
    NPSH = "NPSH"
    LENGTH = "length"
    DIAMETER = "diameter"
    POWER = "power"
    SHARE = "share"
    """A ratio of like things or an efficiency, a fraction inside, per cent in print."""
    WHOLE_SHARE = "share in whole per cent"
    """A ratio whose tenths of a per cent mean nothing, such as flow over best efficiency flow."""
    POINTS = "efficiency points"
    """A difference of two efficiencies, a fraction inside, percentage points in print and JSON."""
    RATIO = "ratio"
    SPEED = "rotational speed"
    """In revolutions per minute inside as well."""
    PRESSURE = "pressure"
    DENSITY = "density"
    KINEMATIC_VISCOSITY = "kinematic viscosity"
    DYNAMIC_VISCOSITY = "dynamic viscosity"
    TEMPERATURE = "temperature"
    SPECIFIC_SPEED = "specific speed"
    """nq = n √Q / H^0.75 in 1/min, m³/s, m; printed as nq in SI and Ns in US."""
    SUCTION_SPECIFIC_SPEED = "suction specific speed"
    TIME = "time"
    FREQUENCY = "frequency"
    TIP_SPEED = "tip speed"
    COUNT = "count"
    MONEY = "money"
    MONEY_PER_ENERGY = "money per energy"
    TEXT = "text"

    @property
    def suffix(self) -> str:
        """End of this kind's keys in evaluation.json."""
        return KINDS[self].suffix

    @property
    def json_unit(self) -> str:
        """Unit in evaluation.json, a spelling known to `bidcheck.units`; empty for a bare number."""
        return KINDS[self].json_unit

    def printed(self, system: UnitSystem) -> Printed:
        """Unit and decimals in `system`."""
        return KINDS[self].us if system is UnitSystem.US else KINDS[self].si


KINDS: dict[Kind, KindOf] = {
    Kind.FLOW: KindOf("m3h", "m3/h", Printed("m³/h", 0), Printed("US gpm", 0)),
    Kind.HEAD: KindOf("m", "m", Printed("m", 1), Printed("ft", 1)),
    Kind.NPSH: KindOf("m", "m", Printed("m", 1), Printed("ft", 1)),
    Kind.LENGTH: KindOf("m", "m", Printed("m", 1), Printed("ft", 1)),
    Kind.DIAMETER: KindOf("mm", "mm", Printed("mm", 0), Printed("in", 2)),
    Kind.POWER: KindOf("kw", "kW", Printed("kW", 1), Printed("hp", 1)),
    Kind.SHARE: KindOf("share", "fraction", Printed("%", 1), Printed("%", 1)),
    Kind.WHOLE_SHARE: KindOf("share", "fraction", Printed("%", 0), Printed("%", 0)),
    Kind.POINTS: KindOf("points", "%", Printed("points", 1), Printed("points", 1)),
    Kind.RATIO: KindOf("ratio", "", Printed("", 2), Printed("", 2)),
    Kind.SPEED: KindOf("rpm", "1/min", Printed("1/min", 0), Printed("rpm", 0)),
    Kind.PRESSURE: KindOf("bar", "bar", Printed("bar", 2), Printed("psi", 1)),
    Kind.DENSITY: KindOf("kgm3", "kg/m3", Printed("kg/m³", 0), Printed("SG", 3)),
    Kind.KINEMATIC_VISCOSITY: KindOf("cst", "cSt", Printed("cSt", 1), Printed("cSt", 1)),
    Kind.DYNAMIC_VISCOSITY: KindOf("mpas", "mPa.s", Printed("mPa·s", 1), Printed("cP", 1)),
    Kind.TEMPERATURE: KindOf("degc", "degC", Printed("°C", 0), Printed("°F", 0)),
    Kind.SPECIFIC_SPEED: KindOf("nq", "metric", Printed("", 1), Printed("US", 0)),
    Kind.SUCTION_SPECIFIC_SPEED: KindOf("metric", "metric", Printed("", 0), Printed("US", 0)),
    Kind.TIME: KindOf("h", "h", Printed("h", 0), Printed("h", 0)),
    Kind.FREQUENCY: KindOf("hz", "Hz", Printed("Hz", 0), Printed("Hz", 0)),
    Kind.TIP_SPEED: KindOf("ms", "m/s", Printed("m/s", 1), Printed("ft/s", 0)),
    Kind.COUNT: KindOf("count", "", Printed("", 0), Printed("", 0)),
    Kind.MONEY: KindOf("money", "", Printed("", 0), Printed("", 0)),
    Kind.MONEY_PER_ENERGY: KindOf("per_kwh", "1/kWh", Printed("per kWh", 3), Printed("per kWh", 3)),
    Kind.TEXT: KindOf("text", "", Printed("", 0), Printed("", 0)),
}


@dataclass(frozen=True, slots=True)
class Stated:
    """A figure as a person wrote it.

    Attributes
    ----------
    value : float
        In SI.
    half_digit : float
        Half a unit in the last place written, in SI: how far the true figure may lie from the printed one.
    text : str
        As written, unit included.
    """

    value: float
    half_digit: float
    text: str


_NUMBER = re.compile(r"[-+]?\d+(\.\d+)?(?=\s*[^\d\s.,])")


def unit_of(stated: Stated) -> float:
    """One of the units a figure was written in, in SI; 0 where the text does not tell.

    Examples
    --------
    >>> unit_of(Stated(128000.0, 50.0, "128.0 kW")), unit_of(Stated(0.5, 0.01, "half"))
    (1000.0, 0.0)
    """
    found = _NUMBER.match(stated.text.strip())
    number = float(found[0]) if found is not None else 0.0
    return stated.value / number if number else 0.0


@dataclass(frozen=True, slots=True)
class Assumption:
    """A value used because none was given. `what` names it, `value` says what was used, `why` where that comes from."""

    what: str
    value: str
    why: str
