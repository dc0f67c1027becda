"""bid.toml to a Bid; its curves are read by `bid_curves`."""

from collections.abc import Callable, Sequence
from dataclasses import dataclass
from typing import Any, Literal

from bidcheck.arrangement import ARRANGEMENTS, Arrangement
from bidcheck.bid import (
    Adder,
    Bid,
    Casing,
    Claims,
    Commercial,
    Driver,
    ExceptionTaken,
    GuaranteeOffered,
)
from bidcheck.curve import Curve
from bidcheck.numerals import clipped
from bidcheck.quantity import Kind
from bidcheck.read.bid_curves import Basis
from bidcheck.read.table import Table

_DRIVES: tuple[Literal["fixed", "variable"], ...] = ("fixed", "variable")
_CASINGS: tuple[Literal["volute", "diffuser"], ...] = ("volute", "diffuser")
_BASES: tuple[Literal["pump", "bowl"], ...] = ("pump", "bowl")
_GUARANTEED: tuple[Literal["power", "efficiency"], ...] = ("power", "efficiency")

ReadCurves = Callable[[Sequence[Table], Basis], tuple[Curve, ...]]
"""Reads the [[curves]] tables of a bid; problems are noted in their source."""


@dataclass(frozen=True, slots=True)
class Place:
    """Where a bid lies: its bidder and revision by folder, and that folder inside the inquiry folder."""

    bidder: str
    revision: str
    folder: str


def read_bid_table(top: Table, place: Place, liquid_density: float | None, read_curves: ReadCurves) -> Bid | None:
    """Read bid.toml.

    Parameters
    ----------
    top : Table
        Problems and assumptions are noted in its source.
    place : Place
    liquid_density : float or None
        Of the liquid of the inquiry, for curves drawn as pumped; None where the inquiry could not be read. [kg/m³]
    read_curves : callable

    Returns
    -------
    Bid or None
        None where there are problems.
    """
    source = top.source
    _check_identity(top, place)
    arrangement, stages = _arrangement_and_stages(top)
    top.require("speed", '"1480 rpm"')
    speed = top.figure("speed", Kind.SPEED)
    diameters = {key: top.figure(key, Kind.DIAMETER) for key in ("impeller_rated", "impeller_max", "impeller_min")}
    basis = Basis(speed, stages, diameters["impeller_rated"], liquid_density)
    tables = top.tables("curves")
    if not tables and "curves" not in top:
        top.require("[[curves]]", '"curve.csv" as its file: [[curves]] and beneath it file = "curve.csv"')
    parts: dict[str, Any] = {
        **diameters,
        "title": top.text("title") or "",
        "model": top.text("model") or "",
        "impeller_material": top.text("impeller_material") or "",
        "suction_eyes": _suction_eyes(top, arrangement),
        "inducer": bool(top.flag("inducer")),
        "drive": top.word("drive", _DRIVES) or "fixed",
        "casing_type": top.word("casing_type", _CASINGS),
        "performance_basis": top.word("performance_basis", _BASES),
        "references": top.count("references", at_least=0),
        "claims": _claims(top.table("claims")),
        "guarantee": _guarantee(top.table("guarantee")),
        "driver": _driver(top.table("driver")),
        "casing": Casing(max_pressure=top.table("casing").figure("max_pressure", Kind.PRESSURE, absolute=False)),
        "commercial": _commercial(top.table("commercial")),
        "exceptions": _exceptions(top.tables("exceptions")),
    }
    curves = read_curves(tables, basis)
    _assume_defaults(top)
    top.close()
    if source.problems or arrangement is None or speed is None:
        return None
    return Bid(
        bidder=place.bidder,
        revision=place.revision,
        folder=place.folder,
        arrangement=arrangement,
        speed_rpm=speed,
        stages=stages,
        curves=curves,
        assumptions=tuple(source.assumptions),
        **parts,
    )


def _check_identity(top: Table, place: Place) -> None:
    """`bidder` and `revision` agree with the folders."""
    top.require("bidder", f'"{place.bidder}"')
    bidder, revision = top.text("bidder"), top.text("revision")
    if bidder is not None and bidder != place.bidder:
        cure = f'write bidder = "{place.bidder}" or rename the folder; a name for display goes into title'
        top.problem("bidder", f'found "{clipped(bidder)}" in folder "{place.bidder}"; {cure}')
    if revision is not None and revision != place.revision:
        top.problem("revision", f'found "{revision}" in the folder of revision {place.revision}; correct one of them')


def _arrangement_and_stages(top: Table) -> tuple[Arrangement | None, int]:
    """Arrangement, and stages: 1 where not given, which a multistage pump cannot be silently."""
    top.require("arrangement", f'"end suction"; known are {", ".join(ARRANGEMENTS)}')
    arrangement, stages = top.word("arrangement", ARRANGEMENTS), top.count("stages")
    if "stages" not in top:
        if arrangement is not None and "multistage" in arrangement:
            top.require("stages", "6")
        else:
            top.source.assume("stages", "1", "not given")
    return arrangement, stages or 1


def _suction_eyes(top: Table, arrangement: Arrangement | None) -> int:
    """Suction eyes: 2 for double suction, else 1, where not given."""
    eyes = top.count("suction_eyes")
    if eyes is not None and eyes > 2:
        top.problem("suction_eyes", f"found {eyes}, an impeller has 1 or 2")
    usual = 2 if arrangement == "double suction" else 1
    if "suction_eyes" not in top:
        top.source.assume("suction eyes", str(usual), f"not given; usual for {arrangement or 'this arrangement'}")
    return eyes or usual


def _assume_defaults(top: Table) -> None:
    """Note the plain defaults."""
    for key, what, value in (("inducer", "inducer", "none"), ("drive", "drive", "fixed speed")):
        if key not in top:
            top.source.assume(what, value, "not given")


def _claims(table: Table) -> Claims:
    """[claims]."""
    return Claims(
        head=table.quantity("head", Kind.HEAD),
        efficiency=table.efficiency("efficiency"),
        power=table.quantity("power", Kind.POWER),
        npsh3=table.quantity("npsh3", Kind.NPSH),
        bep_flow=table.quantity("bep_flow", Kind.FLOW),
        bep_efficiency=table.efficiency("bep_efficiency"),
        shutoff_head=table.quantity("shutoff_head", Kind.HEAD),
        min_continuous_flow=table.quantity("min_continuous_flow", Kind.FLOW),
        max_allowable_flow=table.quantity("max_allowable_flow", Kind.FLOW),
        max_power=table.quantity("max_power", Kind.POWER),
    )


def _guarantee(table: Table) -> GuaranteeOffered:
    """[guarantee] offered."""
    return GuaranteeOffered(
        standard=table.text("standard"), grade=table.text("grade"), what=table.word("what", _GUARANTEED)
    )


def _driver(table: Table) -> Driver:
    """[driver]."""
    efficiency, poles = table.efficiency("efficiency"), table.count("poles", at_least=2)
    if poles is not None and poles % 2:
        table.problem("poles", f"found {poles}, poles come in pairs")
    return Driver(
        rating=table.figure("rating", Kind.POWER),
        speed_rpm=table.figure("speed", Kind.SPEED),
        efficiency=None if efficiency is None else efficiency.value,
        poles=poles,
        frequency=table.figure("frequency", Kind.FREQUENCY),
    )


def _commercial(table: Table) -> Commercial:
    """[commercial] and its adders, all in one currency."""
    price = table.money("price")
    adders: list[Adder] = []
    currency = price[1] if price is not None else ""
    for adder in table.tables("adders"):
        adder.require("item", '"factory test"')
        adder.require("amount", '"2400 EUR"')
        item, amount = adder.text("item"), adder.money("amount", sign="any")
        if amount is not None and currency and amount[1] != currency:
            adder.problem("amount", f"is in {amount[1]}, other amounts of this bid are in {currency}; use one currency")
        elif amount is not None and item is not None:
            currency = amount[1]
            adders.append(Adder(item=item, amount=amount[0]))
    return Commercial(
        price=None if price is None else price[0],
        currency=currency,
        delivery=table.text("delivery"),
        validity=table.text("validity"),
        adders=tuple(adders),
    )


def _exceptions(tables: Sequence[Table]) -> tuple[ExceptionTaken, ...]:
    """[[exceptions]]."""
    taken: list[ExceptionTaken] = []
    for table in tables:
        table.require("clause", '"4.3"')
        table.require("text", '"what is offered instead"')
        clause, text = table.text("clause"), table.text("text")
        if clause is not None and text is not None:
            taken.append(ExceptionTaken(clause=clause, text=text))
    return tuple(taken)
