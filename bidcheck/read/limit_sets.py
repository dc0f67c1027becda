"""Sets of limits: the shipped ones, and an inquiry's own limits put over them."""

import tomllib
from collections.abc import Mapping
from dataclasses import replace
from functools import cache
from importlib.resources import files
from typing import Any, Literal, get_args

from bidcheck.errors import InputError, Problem
from bidcheck.limits import Limit, Limits, Mark, limit_names
from bidcheck.quantity import Kind
from bidcheck.read.nearest import nearest
from bidcheck.read.source import Source
from bidcheck.read.table import Table
from bidcheck.units import spellings

LIMIT_SETS = ("general-water", "process")
"""Names of the shipped sets."""
_MARKS: tuple[Mark, ...] = get_args(Mark)
_MISSED: tuple[Literal["remark", "query"], ...] = ("remark", "query")


@cache
def limit_set(name: str) -> Limits:
    """Load a shipped set of limits.

    Parameters
    ----------
    name : str
        "general-water" or "process".

    Raises
    ------
    InputError
        If there is no such set.

    Examples
    --------
    >>> limit_set("general-water").rated_over_bep.at_most
    1.1
    """
    if name not in LIMIT_SETS:
        raise InputError([Problem("limits", f'there is no set "{name}"; {nearest(name, LIMIT_SETS)}')])
    file = f"limit_sets/{name}.toml"
    source = Source(file)
    table = Table(source, tomllib.loads((files("bidcheck") / "limit_sets" / f"{name}.toml").read_text("utf-8")))
    limits = {key: _read_limit(table, key, kind, shipped=True) for key, (kind, _) in limit_names().items()}
    table.close()
    if source.problems:
        raise InputError(source.problems)
    return Limits(set_name=name, **{key: limit for key, limit in limits.items() if limit is not None})


def limits_with(base: Limits, overrides: Mapping[str, object]) -> Limits:
    """Put limits of the purchaser over a set.

    Parameters
    ----------
    base : Limits
    overrides : mapping
        Limit name → `{"at_least": ..., "at_most": ..., "origin": ..., "mandatory": ...}` as written in the [limits]
        table. A limit given here replaces that of the set whole; its mark is "purchaser", it is not mandatory unless
        said so.

    Raises
    ------
    InputError
        With every unknown name, missing origin and unreadable figure.

    Examples
    --------
    >>> own = {"npsh_margin": {"at_least": "1.0 m", "origin": "spec 4.3"}}
    >>> limits_with(limit_set("process"), own).npsh_margin.at_least
    1.0
    """
    source = Source("limits")
    table = Table(source, overrides, "[limits]", ("limits",))
    limits = read_overrides(table, base)
    table.close()
    if source.problems:
        raise InputError(source.problems)
    return limits


def read_overrides(table: Table, base: Limits) -> Limits:
    """Limits of a [limits] table over `base`; problems are noted in the table's file."""
    own: dict[str, Any] = {
        name: limit
        for name, (kind, _) in limit_names().items()
        if (limit := _read_limit(table, name, kind, shipped=False)) is not None
        and _same_side(table, limit, getattr(base, name))
    }
    return replace(base, **own)


def _same_side(table: Table, limit: Limit, base: Limit) -> bool:
    """Whether a limit bounds from a side that its check looks at; a problem is noted where it does not."""
    for side, other in (("at_least", "at_most"), ("at_most", "at_least")):
        if getattr(limit, side) is not None and getattr(base, side) is None:
            table.problem(limit.name, f"has {side}, but this limit bounds from the other side; write {other}")
            return False
    return True


def _read_limit(parent: Table, name: str, kind: Kind, *, shipped: bool) -> Limit | None:
    """One limit; None where it is absent or wrong."""
    example = f'{{ at_least = {_example(kind)}, origin = "specification, clause" }}'
    if name not in parent:
        if shipped:
            parent.require(name, example)
        parent.known(name)
        return None
    if not isinstance(parent.data[name], dict):
        parent.known(name)
        parent.problem(name, f"is not a limit; write {name} = {example}")
        return None
    table = parent.table(name)
    low, high = table.figure("at_least", kind, "any"), table.figure("at_most", kind, "any")
    origin, mandatory = table.text("origin"), table.flag("mandatory")
    mark: Mark | None = table.word("mark", _MARKS) if shipped else "purchaser"
    missed = table.word("missed", _MISSED)
    if "origin" not in table:
        parent.problem(name, 'origin is missing; say where the limit comes from: origin = "specification, clause"')
    if "at_least" not in table and "at_most" not in table:
        parent.problem(name, f"has neither at_least nor at_most; write {name} = {example}")
    if low is not None and high is not None and low > high:
        parent.problem(name, "at_least is above at_most")
        return None
    if origin is None or mark is None or (low is None and high is None):
        return None
    return Limit(name, kind, low, high, origin, mark, bool(mandatory), missed)


def _example(kind: Kind) -> str:
    """A figure of a kind as it is written."""
    if kind in (Kind.COUNT, Kind.RATIO):
        return "5" if kind is Kind.COUNT else "1.1"
    if kind in (Kind.SPECIFIC_SPEED, Kind.SUCTION_SPECIFIC_SPEED):
        return '"11000 US"'
    return f'"1.0 {spellings(kind)[0]}"'
