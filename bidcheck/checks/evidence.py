"""Short names for evidence of each kind. Values in SI; shares and efficiencies as fractions."""

from typing import TYPE_CHECKING

from bidcheck.curve import COLUMN_KINDS, Column
from bidcheck.finding import Evidence
from bidcheck.quantity import Kind

if TYPE_CHECKING:
    from bidcheck.case import Case


def flow(value: float) -> Evidence:
    """Flow [m³/s]."""
    return Evidence(value, Kind.FLOW)


def head(value: float) -> Evidence:
    """Head [m]."""
    return Evidence(value, Kind.HEAD)


def npsh(value: float) -> Evidence:
    """NPSH [m]."""
    return Evidence(value, Kind.NPSH)


def power(value: float) -> Evidence:
    """Power [W]."""
    return Evidence(value, Kind.POWER)


def share(value: float) -> Evidence:
    """Efficiency or ratio [fraction], printed in per cent with a decimal."""
    return Evidence(value, Kind.SHARE)


def whole_share(value: float) -> Evidence:
    """Ratio [fraction], printed in whole per cent."""
    return Evidence(value, Kind.WHOLE_SHARE)


def points(value: float) -> Evidence:
    """Difference of efficiencies [fraction], printed in points."""
    return Evidence(value, Kind.POINTS)


def ratio(value: float) -> Evidence:
    """Bare ratio."""
    return Evidence(value, Kind.RATIO)


def count(value: int) -> Evidence:
    """Number of things."""
    return Evidence(float(value), Kind.COUNT)


def specific_speed(value: float) -> Evidence:
    """Specific speed nq."""
    return Evidence(value, Kind.SPECIFIC_SPEED)


def suction_specific_speed(value: float) -> Evidence:
    """Suction specific speed, metric."""
    return Evidence(value, Kind.SUCTION_SPECIFIC_SPEED)


def diameter(value: float) -> Evidence:
    """Diameter [m]."""
    return Evidence(value, Kind.DIAMETER)


def speed(value: float) -> Evidence:
    """Rotational speed [1/min]."""
    return Evidence(value, Kind.SPEED)


def tip_speed(value: float) -> Evidence:
    """Tip speed [m/s]."""
    return Evidence(value, Kind.TIP_SPEED)


def text(value: str) -> Evidence:
    """Words."""
    return Evidence(value, Kind.TEXT)


def whose_words(case: "Case") -> dict[str, Evidence]:
    """What the efficiency judged is, and how to speak of it to the bidder."""
    words = {
        "": ("best efficiency", "Your curve peaks at"),
        "best efficiency": ("declared best efficiency", "You declare as best efficiency"),
        "rated flow": ("efficiency claimed at rated flow", "You claim at rated flow"),
    }
    what, you = words[case.estimates.declared]
    if case.derived_efficiency:
        what, you = "best efficiency that follows from flow, head and power,", "Your flow, head and power give"
    return {"what": text(what), "you": text(you)}


def whose_curve(case: "Case") -> dict[str, Evidence]:
    """How to speak of the curve as pumped, to the reader and to the bidder: it may be corrected for viscosity here."""
    if not case.brought_from_water:
        return {"whose": text("the bidder's own curve"), "yours": text("your curve")}
    brought = "brought to the liquid's viscosity by ANSI/HI 9.6.7,"
    return {"whose": text(f"the bidder's water curve, {brought}"), "yours": text(f"your water curve, {brought}")}


def of_column(value: float, column: Column) -> Evidence:
    """A figure of a column of the curve, in its SI."""
    return Evidence(value, COLUMN_KINDS[column])
