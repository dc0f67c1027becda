"""The [[curves]] tables of a bid, or a curve file alone, to Curve objects with the basis they are stated on."""

from collections.abc import Sequence
from dataclasses import dataclass
from math import isclose
from pathlib import Path, PurePosixPath
from typing import Any, Literal

from bidcheck.curve import Column, Curve, Points
from bidcheck.errors import InputError
from bidcheck.inquiry import InputFile
from bidcheck.quantity import Kind
from bidcheck.read.curve_csv import read_curve_csv
from bidcheck.read.source import Source, capped, read_text
from bidcheck.read.table import Table
from bidcheck.units import from_si

COLD_WATER = 998.2
"""Density a curve for water is taken to be stated for: clean cold water at 20 °C (IAPWS-IF97: 998.16). [kg/m³]"""

_LIQUIDS: tuple[Literal["water", "as pumped"], ...] = ("water", "as pumped")
_POWER_AT: tuple[Literal["shaft", "motor input"], ...] = ("shaft", "motor input")


@dataclass(frozen=True, slots=True)
class Basis:
    """What a curve takes from its bid where it does not say: speed [1/min], stages, diameter [m], density [kg/m³]."""

    speed_rpm: float | None
    stages: int
    impeller: float | None
    liquid_density: float | None


def read_curves(
    tables: Sequence[Table], basis: Basis, root: Path, folder: str, inputs: list[InputFile]
) -> tuple[tuple[Curve, ...], list[Source]]:
    """Read the curves of a bid.

    Parameters
    ----------
    tables : sequence of Table
        The [[curves]] tables; what is wrong with them is noted in their source.
    basis : Basis
    root : Path
        The inquiry folder.
    folder : str
        The bid's folder inside it.
    inputs : list of InputFile
        The files read are appended.

    Returns
    -------
    curves : tuple of Curve
    sources : list of Source
        One per curve file, with its problems.
    """
    curves: list[Curve] = []
    sources: list[Source] = []
    files: set[str] = set()
    impellers: list[float | None] = []
    for table in tables:
        table.require("file", '"curve.csv"')
        name = table.text("file")
        stated = _stated_basis(table, basis)
        if any(_same(stated["impeller"], other) for other in impellers):
            table.problem("impeller", _same_impeller(stated["impeller"]))
        impellers.append(stated["impeller"])
        if name is None or not _stays_inside(table, name, root / folder):
            continue
        if name in files:
            table.problem("file", f'"{name}" is the file of another curve already')
            continue
        files.add(name)
        source = Source(f"{folder}/{name}")
        sources.append(source)
        points = _read_points(root / folder / name, source, inputs)
        if stated["speed_rpm"] is not None:
            curves.append(_curve(source.file, stated, points))
    return tuple(curves), sources


def _same(one: float | None, other: float | None) -> bool:
    """Whether two diameters are one, or both unknown."""
    return one == other if one is None or other is None else isclose(one, other, rel_tol=1e-6)


def _same_impeller(impeller: object) -> str:
    """Two curves cannot be told apart."""
    if isinstance(impeller, float):
        return f"{1000.0 * impeller:.6g} mm has a curve already; each diameter has one"
    return 'is given for neither of two curves; write impeller = "412 mm" in each'


def _stated_basis(table: Table, basis: Basis) -> dict[str, Any]:
    """The basis of one curve; what it does not state is an assumption."""
    assume, label = table.source.assume, f"of curve {table.data.get('file', '')}"
    speed, stages = table.figure("speed", Kind.SPEED), table.count("stages")
    impeller, density = table.figure("impeller", Kind.DIAMETER), table.figure("density", Kind.DENSITY)
    liquid, power_at = table.word("liquid", _LIQUIDS), table.word("power_at", _POWER_AT)
    if "impeller" not in table and basis.impeller is not None:
        assume(f"impeller diameter {label}", f"{1000.0 * basis.impeller:.6g} mm", "not given; the rated diameter")
    if "speed" not in table and basis.speed_rpm is not None:
        assume(f"speed {label}", f"{basis.speed_rpm:.6g} 1/min", "not given; the speed of the bid")
    if "stages" not in table and basis.stages > 1:
        assume(f"stages {label}", str(basis.stages), "not given; head taken as that of all stages of the pump")
    if "liquid" not in table:
        assume(f"liquid {label}", "water", "not given")
    if "density" not in table:
        density = _assumed_density(table, basis, as_pumped=liquid == "as pumped")
    if "power_at" not in table:
        assume(f"power {label}", "shaft power", "not given")
    return {
        "impeller": impeller if "impeller" in table else basis.impeller,
        "speed_rpm": speed or basis.speed_rpm,
        "stages": stages or basis.stages,
        "liquid": liquid or "water",
        "density": density or COLD_WATER,
        "power_at": power_at or "shaft",
    }


def _assumed_density(table: Table, basis: Basis, *, as_pumped: bool) -> float:
    """Cold water, or the liquid of the inquiry for a curve drawn as pumped."""
    use_liquid = as_pumped and basis.liquid_density is not None
    density = basis.liquid_density if use_liquid and basis.liquid_density is not None else COLD_WATER
    why = "the liquid of the inquiry, since the curve is as pumped" if use_liquid else "cold water"
    shown = f"{from_si(density, 'kg/m³', Kind.DENSITY):.6g} kg/m³"
    table.source.assume(f"density of curve {table.data.get('file', '')}", shown, f"not given; {why}")
    return density


def _stays_inside(table: Table, name: str, folder: Path) -> bool:
    """Whether a file lies in the bid's own folder, links followed."""
    path = PurePosixPath(name.replace("\\", "/"))
    inside = not (path.is_absolute() or ".." in path.parts or ":" in name or "\x00" in name)
    try:
        inside = inside and (folder / name).resolve().is_relative_to(folder.resolve())
    except (OSError, RuntimeError, ValueError):
        inside = False
    if not inside:
        table.problem("file", f'"{name}" leads out of the folder of the bid; put the file there and write its name')
    return inside


def _read_points(path: Path, source: Source, inputs: list[InputFile]) -> dict[Column, Points]:
    """Points of a file; every problem goes to `source`."""
    try:
        text = read_text(path, source.file, inputs)
    except InputError as error:
        source.problems.extend(error.problems)
        return {}
    return read_curve_csv(text, source)


def _curve(file: str, stated: dict[str, Any], points: dict[Column, Points]) -> Curve:
    """A curve from its basis and points."""
    return Curve(
        file=file,
        head=points.get("head"),
        efficiency=points.get("efficiency"),
        power=points.get("power"),
        npsh3=points.get("npsh3"),
        **stated,
    )


def read_curve_file(path: str | Path, *, speed_rpm: float, impeller: float | None = None) -> tuple[Curve, ...]:
    """Read a curve file alone, without bid or inquiry: one stage, cold water of 998.2 kg/m³, shaft power.

    Parameters
    ----------
    path : str or Path
    speed_rpm : float
        Speed the points are stated for, above zero: the file does not tell it. [1/min]
    impeller : float, optional
        Diameter, where known. [m]

    Returns
    -------
    tuple of Curve
        One curve; a tuple, since a file of several is conceivable.

    Raises
    ------
    InputError
        With every problem of the file.
    ValueError
        If `speed_rpm` is not above zero.
    """
    if not speed_rpm > 0.0:
        raise ValueError("the speed of a curve must be above zero")
    source = Source(str(path))
    points = _read_points(Path(path), source, [])
    if source.problems:
        raise InputError(capped(source.problems))
    stated: dict[str, Any] = {
        "impeller": impeller,
        "speed_rpm": speed_rpm,
        "stages": 1,
        "liquid": "water",
        "density": COLD_WATER,
        "power_at": "shaft",
    }
    return (_curve(source.file, stated, points),)
