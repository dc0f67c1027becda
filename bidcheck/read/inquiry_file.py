"""inquiry.toml to an Inquiry without its bids."""

from collections.abc import Sequence
from typing import Any

from bidcheck.inquiry import (
    DensityCase,
    Duty,
    Economics,
    GuaranteeWanted,
    Inquiry,
    ProfilePoint,
    Site,
    Suction,
    System,
)
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.read.limit_sets import LIMIT_SETS, limit_set, read_overrides
from bidcheck.read.liquid import read_liquid
from bidcheck.read.nearest import nearest
from bidcheck.read.table import Table
from bidcheck.units import from_si

REGULATIONS = ("EU 547/2012", "10 CFR 431")
"""Regulations on efficiency the checks know."""
HOURS_OF_A_YEAR = 8784.0
"""Hours of a leap year, the most a profile can hold (arithmetic)."""


def read_inquiry_table(top: Table) -> Inquiry | None:
    """Read inquiry.toml; problems and assumptions are noted in its source. None where it cannot be built."""
    source = top.source
    top.require("tag", '"P-2101 A/B"')
    tag, title = top.text("tag"), top.text("title")
    units = top.word("units", ("SI", "US"))
    if "units" not in top:
        source.assume("units of the report", "SI", "not given")
    duty, liquid = _duty(top.table("duty")), read_liquid(top.table("liquid"))
    inquiry_limits = top.table("limits")
    limits = read_overrides(inquiry_limits, limit_set(_set_name(inquiry_limits)))
    parts: dict[str, Any] = {
        "suction": _suction(top),
        "system": _system(top),
        "site": _site(top.table("site")),
        "profile": _profile(top.tables("profile")),
        "economics": _economics(top),
        "guarantee": _guarantee(top.table("guarantee")),
        "density_cases": _density_cases(top.tables("density_cases")),
    }
    _check_suction(top, has_vapour_pressure=liquid is None or liquid.vapour_pressure is not None)
    top.close()
    if source.problems or tag is None or duty is None or liquid is None:
        return None
    return Inquiry(
        tag=tag,
        title=title or "",
        units=UnitSystem(units or "SI"),
        duty=duty,
        liquid=liquid,
        limits=limits,
        assumptions=tuple(source.assumptions),
        **parts,
    )


def _duty(table: Table) -> Duty | None:
    """[duty]: per running pump."""
    table.require("rated_flow", '"450 m3/h"')
    table.require("rated_head", '"62 m"')
    rated, head = table.figure("rated_flow", Kind.FLOW), table.figure("rated_head", Kind.HEAD)
    flows: dict[str, Any] = {key: table.figure(key, Kind.FLOW) for key in ("min_flow", "normal_flow", "max_flow")}
    npsha: dict[str, Any] = {key: table.figure(key, Kind.NPSH) for key in ("npsha", "npsha_at_max_flow")}
    running, installed = table.count("pumps_running"), table.count("pumps_installed")
    _check_order(table, {"rated_flow": rated, **flows})
    if running is not None and installed is not None and running > installed:
        table.problem("pumps_running", f"{running} pumps run but pumps_installed is {installed}")
    if "pumps_running" not in table:
        table.source.assume("pumps running", "1", "not given")
    if "pumps_installed" not in table:
        table.source.assume("pumps installed", str(running or 1), "not given; no stand-by pump")
    if rated is None or head is None:
        return None
    pumps: dict[str, Any] = {"pumps_running": running or 1, "pumps_installed": installed or running or 1}
    return Duty(rated_flow=rated, rated_head=head, **flows, **npsha, **pumps)


def _check_order(table: Table, flows: dict[str, float | None]) -> None:
    """Smallest flow ≤ rated and normal flow ≤ largest flow."""
    above = {"min_flow": ("max_flow", "rated_flow", "normal_flow"), "rated_flow": ("max_flow",)}
    for low, highs in {**above, "normal_flow": ("max_flow",)}.items():
        for high in highs:
            smaller, larger = flows[low], flows[high]
            if smaller is not None and larger is not None and smaller > larger * (1.0 + 1e-9):
                table.problem(low, f'found "{table.data[low]}", above {high} "{table.data[high]}"')
                break


def _suction(top: Table) -> Suction | None:
    """[suction], from which NPSH available follows."""
    table = top.table("suction")
    if "suction" not in top:
        return None
    table.require("pressure", '"1.013 bar(a)"')
    table.require("liquid_level", '"3.0 m"')
    table.require("friction_loss", '"0.4 m"')
    pressure = table.figure("pressure", Kind.PRESSURE, absolute=True)
    level = table.figure("liquid_level", Kind.LENGTH, "any")
    loss = table.figure("friction_loss", Kind.HEAD, "zero or above")
    largest = table.figure("max_pressure", Kind.PRESSURE, "any", absolute=False)
    if pressure is None or level is None or loss is None:
        return None
    return Suction(pressure=pressure, liquid_level=level, friction_loss=loss, max_pressure=largest)


def _check_suction(top: Table, *, has_vapour_pressure: bool) -> None:
    """NPSH available comes from one place, and [suction] needs the vapour pressure."""
    if "suction" not in top:
        return
    duty = top.data.get("duty")
    for key in ("npsha", "npsha_at_max_flow"):
        if isinstance(duty, dict) and key in duty:
            top.source.problem_at(
                ("duty", key),
                f"[duty] {key}: is given and [suction] as well, from which it would follow; delete one of them",
            )
    if not has_vapour_pressure:
        top.source.problem_at(
            ("liquid",),
            '[liquid] vapour_pressure is missing, [suction] needs it; write vapour_pressure = "2.34 kPa(a)"',
        )


def _system(top: Table) -> System | None:
    """[system]."""
    table = top.table("system")
    if "system" not in top:
        return None
    table.require("static_head", '"35 m"')
    static = table.figure("static_head", Kind.HEAD, "any")
    return None if static is None else System(static_head=static)


def _site(table: Table) -> Site:
    """[site]; a regulation that is not known would silently not apply, so it is refused."""
    regulations = table.texts("regulations")
    for name in regulations:
        if name not in REGULATIONS:
            table.problem("regulations", f'"{name}" is not known; {nearest(name, REGULATIONS)}')
    return Site(
        frequency=table.figure("frequency", Kind.FREQUENCY),
        altitude=table.figure("altitude", Kind.LENGTH, "any"),
        ambient=table.figure("ambient", Kind.TEMPERATURE),
        regulations=regulations,
    )


def _profile(tables: Sequence[Table]) -> tuple[ProfilePoint, ...]:
    """[[profile]]: states of operation of the whole plant."""
    points: list[ProfilePoint] = []
    for table in tables:
        table.require("flow", '"900 m3/h"')
        table.require("hours", '"4000 h/year"')
        flow, head = table.figure("flow", Kind.FLOW), table.figure("head", Kind.HEAD)
        seconds = table.figure("hours", Kind.TIME)
        if flow is not None and seconds is not None:
            points.append(ProfilePoint(flow=flow, hours=from_si(seconds, "h", Kind.TIME), head=head))
    total = sum(point.hours for point in points)
    if total > HOURS_OF_A_YEAR * (1.0 + 1e-9):
        tables[0].problem("hours", f"the states of the profile add up to {total:.0f} h, a year has 8760")
    return tuple(points)


def _economics(top: Table) -> Economics | None:
    """[economics]."""
    table = top.table("economics")
    if "economics" not in top:
        return None
    table.require("energy_price", '"0.11 EUR/kWh"')
    table.require("years", "20")
    table.require("discount_rate", '"8 %"')
    price = table.money("energy_price", Kind.MONEY_PER_ENERGY)
    years, currency = _years(table), table.text("currency")
    rate = table.figure("discount_rate", Kind.SHARE, "zero or above")
    escalation = table.figure("energy_escalation", Kind.SHARE, "any")
    if price is not None and currency is not None and currency != price[1]:
        table.problem("currency", f'found "{currency}", but energy_price is in {price[1]}')
    if "energy_escalation" not in table:
        table.source.assume("yearly rise of the energy price", "0 %", "not given")
    if price is None or years is None or rate is None:
        return None
    return Economics(
        energy_price=price[0],
        years=years,
        discount_rate=rate,
        energy_escalation=escalation or 0.0,
        currency=price[1],
    )


def _years(table: Table) -> float | None:
    """Years as a bare number or with "years"."""
    value = table.data.get("years")
    if isinstance(value, int | float) and not isinstance(value, bool):
        table.known("years")
        if not 0.0 < value < float("inf"):
            table.problem("years", f"found {value}, must be above zero")
            return None
        return float(value)
    seconds = table.figure("years", Kind.TIME)
    return None if seconds is None else from_si(seconds, "years", Kind.TIME)


def _guarantee(table: Table) -> GuaranteeWanted:
    """[guarantee]: what the purchaser requires."""
    return GuaranteeWanted(
        standard=table.text("standard"),
        grade=table.text("grade"),
        witnessed=table.flag("witnessed"),
        npsh_test=table.text("npsh_test"),
    )


def _density_cases(tables: Sequence[Table]) -> tuple[DensityCase, ...]:
    """[[density_cases]]."""
    cases: list[DensityCase] = []
    for table in tables:
        table.require("name", '"start-up"')
        table.require("density", '"1000 kg/m3"')
        name, density = table.text("name"), table.figure("density", Kind.DENSITY)
        if name is not None and any(case.name == name for case in cases):
            table.problem("name", f'"{name}" is given twice')
        elif name is not None and density is not None:
            cases.append(DensityCase(name=name, density=density))
    return tuple(cases)


def _set_name(table: Table) -> str:
    """Name of the set of limits, "general-water" where none is given."""
    name = table.word("set", LIMIT_SETS)
    if "set" not in table:
        table.source.assume("set of limits", LIMIT_SETS[0], "not given")
    return name or LIMIT_SETS[0]
