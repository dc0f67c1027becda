"""The [liquid] table. Water needs its temperature only; another liquid its density."""

from collections.abc import Callable

from bidcheck.errors import OutOfRange
from bidcheck.inquiry import Liquid
from bidcheck.numerals import split_quantity
from bidcheck.quantity import Kind
from bidcheck.read.table import Table
from bidcheck.units import from_si, knows

COLD = 293.15
"""Temperature taken for water where none is given: 20 °C (common practice, no source). [K]"""
VISCOSITY_OF_COLD_WATER = 1e-6
"""Kinematic viscosity taken for a liquid where none is given: 1 cSt, as cold water (common practice). [m²/s]"""


def read_liquid(table: Table) -> Liquid | None:
    """Read the liquid; what water needs and is not given is filled in as an assumption."""
    name, solids = table.text("name"), table.text("solids")
    given = {
        "temperature": table.figure("temperature", Kind.TEMPERATURE),
        "density": table.figure("density", Kind.DENSITY),
        "vapour_pressure": table.figure("vapour_pressure", Kind.PRESSURE, "above zero", absolute=True),
    }
    given["viscosity"] = _viscosity(table, given["density"])
    if name is not None and name.casefold() == "water":
        given = _with_water(table, given)
    elif "density" not in table:
        if "name" in table:
            table.require("density", '"870 kg/m3"; only water is known by its name')
        else:
            table.require("name", '"water" with temperature = "20 degC", or give density = "870 kg/m3"')
    density, viscosity = given["density"], given["viscosity"]
    if density is None:
        return None
    if viscosity is None:
        viscosity = VISCOSITY_OF_COLD_WATER
        table.source.assume("viscosity of the liquid", "1 cSt", "not given; that of cold water is used")
    return Liquid(
        name=name or "liquid",
        density=density,
        viscosity=viscosity,
        temperature=given["temperature"],
        vapour_pressure=given["vapour_pressure"],
        solids=solids,
    )


def _viscosity(table: Table, density: float | None) -> float | None:
    """Kinematic viscosity; a dynamic one is divided by the density given."""
    value = table.data.get("viscosity")
    _, unit = split_quantity(value) if isinstance(value, str) else ("", "")
    if not knows(unit, Kind.DYNAMIC_VISCOSITY):
        return table.figure("viscosity", Kind.KINEMATIC_VISCOSITY)
    dynamic = table.figure("viscosity", Kind.DYNAMIC_VISCOSITY)
    if dynamic is None or density is not None:
        return None if dynamic is None or density is None else dynamic / density
    if "density" not in table:
        table.problem("viscosity", f'found "{value}", a dynamic viscosity; give density as well, or write it in cSt')
    return None


def _with_water(table: Table, given: dict[str, float | None]) -> dict[str, float | None]:
    """Fill density, vapour pressure and viscosity of water from its temperature where they are not given."""
    from bidcheck.hydraulics.water import water_density, water_vapour_pressure, water_viscosity

    missing = [key for key in ("density", "vapour_pressure", "viscosity") if key not in table]
    if not missing or (given["temperature"] is None and "temperature" in table):
        return given
    temperature = given["temperature"]
    if temperature is None:
        temperature = given["temperature"] = COLD
        table.source.assume("temperature of the water", "20 °C", "not given")
    formulas: dict[str, tuple[Callable[[float], float], Kind, str, str]] = {
        "density": (water_density, Kind.DENSITY, "density of the liquid", "kg/m³"),
        "vapour_pressure": (water_vapour_pressure, Kind.PRESSURE, "vapour pressure of the liquid", "kPa(a)"),
        "viscosity": (water_viscosity, Kind.KINEMATIC_VISCOSITY, "viscosity of the liquid", "cSt"),
    }
    celsius = from_si(temperature, "°C", Kind.TEMPERATURE)
    try:
        for key in missing:
            formula, kind, what, unit = formulas[key]
            given[key] = value = float(formula(temperature))
            shown = f"{from_si(value, unit, kind):.4g} {unit}"
            table.source.assume(what, shown, f"not given; saturated water at {celsius:.4g} °C, IAPWS")
    except OutOfRange:
        wanted = ", ".join(missing)
        table.problem("temperature", f"found {celsius:.4g} °C; water is known from 5 to 150 °C: give {wanted} as well")
    return given
