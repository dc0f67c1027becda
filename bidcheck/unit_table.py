"""The closed table of unit spellings: kind → spelling → expression in pint's own words. The usual spelling comes first.

`gpm` alone is US gallons per minute, as in the standards of the trade; imperial gallons must be named.
"""

from bidcheck.quantity import Kind

_BASE_PRESSURES = {
    "bar": "bar",
    "kPa": "kilopascal",
    "Pa": "pascal",
    "MPa": "megapascal",
    "mbar": "millibar",
    "psi": "psi",
}
ABSOLUTE = {
    base: frozenset({f"{base}(a)".casefold(), f"{base}a".casefold(), f"{base}abs".casefold()})
    for base in _BASE_PRESSURES
}
"""Plain spellings of absolute pressures by base unit, case folded."""
GAUGE = {
    base: frozenset({f"{base}(g)".casefold(), f"{base}g".casefold(), f"{base}gauge".casefold()})
    for base in _BASE_PRESSURES
}
"""Plain spellings of gauge pressures by base unit, case folded."""

_FORMS_OF_PRESSURE = ("{}", "{}(a)", "{}a", "{} abs", "{}(g)", "{}g", "{} gauge")
_LENGTHS = {"m": "meter", "ft": "foot", "mm": "millimeter", "cm": "centimeter", "in": "inch", "inch": "inch"}
_HEADS = {"m": "meter", "ft": "foot"}
_US_GPM, _IMPERIAL_GPM = "gallon/minute", "imperial_gallon/minute"
_SHARES = {"%": "0.01", "percent": "0.01", "per cent": "0.01", "pct": "0.01", "fraction": "1", "-": "1", "": "1"}
_US_SPECIFIC_SPEED = "(gallon/minute)**0.5/foot**0.75"
_SPECIFIC_SPEEDS = {
    "metric": "meter**0.75/second**0.5",
    "US": _US_SPECIFIC_SPEED,
    "": "meter**0.75/second**0.5",
}

TABLE: dict[Kind, dict[str, str]] = {
    Kind.FLOW: {
        "m3/h": "meter**3/hour",
        "m³/h": "meter**3/hour",
        "m^3/h": "meter**3/hour",
        "m3/hr": "meter**3/hour",
        "m3/s": "meter**3/second",
        "m3/min": "meter**3/minute",
        "m3/d": "meter**3/day",
        "l/s": "liter/second",
        "l/min": "liter/minute",
        "l/h": "liter/hour",
        "US gpm": _US_GPM,
        "gpm": _US_GPM,
        "gpm (US)": _US_GPM,
        "gpm US": _US_GPM,
        "usgpm": _US_GPM,
        "imp gpm": _IMPERIAL_GPM,
        "gpm (imp)": _IMPERIAL_GPM,
        "igpm": _IMPERIAL_GPM,
        "Mgal/d": "1e6*gallon/day",
        "US MGD": "1e6*gallon/day",
        "bbl/d": "42*gallon/day",
        "ft3/s": "foot**3/second",
        "cfs": "foot**3/second",
    },
    Kind.HEAD: _HEADS,
    Kind.NPSH: _HEADS,
    Kind.LENGTH: _LENGTHS,
    Kind.DIAMETER: {"mm": "millimeter", "in": "inch", "inch": "inch", "m": "meter", "cm": "centimeter", "ft": "foot"},
    Kind.POWER: {
        "kW": "kilowatt",
        "W": "watt",
        "MW": "megawatt",
        "hp": "horsepower",
        "bhp": "horsepower",
        "PS": "metric_horsepower",
        "metric hp": "metric_horsepower",
    },
    Kind.SHARE: _SHARES,
    Kind.WHOLE_SHARE: _SHARES,
    Kind.POINTS: {"points": "0.01", "point": "0.01", "%": "0.01"},
    Kind.RATIO: {"": "1", "%": "0.01"},
    Kind.SPEED: {
        "rpm": "1/minute",
        "1/min": "1/minute",
        "min-1": "1/minute",
        "min^-1": "1/minute",
        "/min": "1/minute",
        "r/min": "1/minute",
        "rev/min": "1/minute",
    },
    Kind.PRESSURE: {
        form.format(base): expression for form in _FORMS_OF_PRESSURE for base, expression in _BASE_PRESSURES.items()
    },
    Kind.DENSITY: {
        "kg/m3": "kilogram/meter**3",
        "SG": "1000*kilogram/meter**3",
        "kg/l": "kilogram/liter",
        "kg/dm3": "kilogram/liter",
        "g/cm3": "gram/centimeter**3",
        "g/ml": "gram/milliliter",
        "t/m3": "1000*kilogram/meter**3",
        "lb/ft3": "pound/foot**3",
    },
    Kind.KINEMATIC_VISCOSITY: {
        "cSt": "1e-6*meter**2/second",
        "mm2/s": "millimeter**2/second",
        "m2/s": "meter**2/second",
        "St": "1e-4*meter**2/second",
    },
    Kind.DYNAMIC_VISCOSITY: {
        "mPa.s": "1e-3*pascal*second",
        "mPa·s": "1e-3*pascal*second",
        "mPas": "1e-3*pascal*second",
        "cP": "1e-3*pascal*second",
        "Pa.s": "pascal*second",
        "Pa·s": "pascal*second",
        "Pas": "pascal*second",
        "P": "0.1*pascal*second",
    },
    Kind.TEMPERATURE: {
        "degC": "degC",
        "°C": "degC",
        "C": "degC",
        "degF": "degF",
        "°F": "degF",
        "F": "degF",
        "K": "kelvin",
    },
    Kind.SPECIFIC_SPEED: _SPECIFIC_SPEEDS,
    Kind.SUCTION_SPECIFIC_SPEED: _SPECIFIC_SPEEDS,
    Kind.TIME: {
        "h": "hour",
        "h/year": "hour",
        "h/a": "hour",
        "h/y": "hour",
        "hours": "hour",
        "min": "minute",
        "s": "second",
        "d": "day",
        "years": "year",
        "year": "year",
        "y": "year",
        "a": "year",
    },
    Kind.FREQUENCY: {"Hz": "1/second"},
    Kind.TIP_SPEED: {"m/s": "meter/second", "ft/s": "foot/second", "ft/min": "foot/minute"},
    Kind.COUNT: {"": "1"},
    Kind.MONEY: {"": "1"},
    Kind.MONEY_PER_ENERGY: {
        "per kWh": "1/kilowatt_hour",
        "1/kWh": "1/kilowatt_hour",
        "/kWh": "1/kilowatt_hour",
        "/MWh": "1/megawatt_hour",
    },
    Kind.TEXT: {"": "1"},
}

SI: dict[Kind, str] = {
    Kind.FLOW: "meter**3/second",
    Kind.HEAD: "meter",
    Kind.NPSH: "meter",
    Kind.LENGTH: "meter",
    Kind.DIAMETER: "meter",
    Kind.POWER: "watt",
    Kind.SHARE: "1",
    Kind.WHOLE_SHARE: "1",
    Kind.POINTS: "1",
    Kind.RATIO: "1",
    Kind.SPEED: "1/minute",
    Kind.PRESSURE: "pascal",
    Kind.DENSITY: "kilogram/meter**3",
    Kind.KINEMATIC_VISCOSITY: "meter**2/second",
    Kind.DYNAMIC_VISCOSITY: "pascal*second",
    Kind.TEMPERATURE: "kelvin",
    Kind.SPECIFIC_SPEED: "meter**0.75/second**0.5",
    Kind.SUCTION_SPECIFIC_SPEED: "meter**0.75/second**0.5",
    Kind.TIME: "second",
    Kind.FREQUENCY: "1/second",
    Kind.TIP_SPEED: "meter/second",
    Kind.COUNT: "1",
    Kind.MONEY: "1",
    Kind.MONEY_PER_ENERGY: "1/joule",
    Kind.TEXT: "1",
}
"""What a kind is inside the program, in pint's words."""

CASE_MATTERS = frozenset({"MW", "MPa", "mbar", "MPa(a)", "MPaa", "MPaabs", "MPa(g)", "MPag", "MPagauge"}) | frozenset(
    {"mbar(a)", "mbara", "mbarabs", "mbar(g)", "mbarg", "mbargauge", "mPa.s", "mPas", "Pa.s", "Pas", "P", "Mgal/d"}
)
"""Plain spellings where m and M differ a millionfold or more, so that capitals are not forgiven."""

SHARES = frozenset({Kind.SHARE, Kind.WHOLE_SHARE})
NEED_NO_UNIT = SHARES | {Kind.RATIO, Kind.COUNT, Kind.TEXT}
"""Kinds that may be written as a bare number."""

EXAMPLE_NUMBER = {Kind.SHARE: "84", Kind.WHOLE_SHARE: "84", Kind.SPEED: "1480", Kind.FLOW: "450"}
"""Numbers for examples in messages."""

_REWRITTEN = str.maketrans({"³": "3", "²": "2", "⁻": "-", "¹": "1", "^": "", "·": ".", "⋅": ".", "*": ".", "º": "°"})


def plain_spelling(spelling: str) -> str:
    """A spelling without spaces, raised figures and other matters of taste."""
    return "".join(spelling.translate(_REWRITTEN).split())
