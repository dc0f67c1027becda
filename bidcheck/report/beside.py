"""What each bid offers beside what the sources expect of it: impeller, shape of the curve, suction, regulations."""

from collections.abc import Callable
from dataclasses import dataclass

from bidcheck.evaluation import Evaluation
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.report.format import NOTHING, figure
from bidcheck.second_opinion import Estimates, ShapeEstimate, ShapeRatio, Source


@dataclass(frozen=True, slots=True)
class Beside:
    """One item: what was offered and what is expected, a pair of texts for each bid."""

    item: str
    pairs: list[tuple[str, str]]


Pair = Callable[[Estimates, UnitSystem], tuple[str, str]]


def beside(evaluation: Evaluation, system: UnitSystem) -> list[Beside]:
    """Items down, bids across, in the units asked for."""
    return [
        Beside(name, [pair(bid.case.estimates, system) for bid in evaluation.bids])
        for name, pair in (
            ("head coefficient at best efficiency", _coefficient),
            ("head coefficient at shutoff", _coefficient_at_shutoff),
            ("impeller diameter, by head coefficient", _diameter),
            ("impeller diameter, by the Cordier line", _cordier),
            ("shutoff head over head at best efficiency", _shape(lambda shape: shape.shutoff_head)),
            ("shutoff power over power at best efficiency", _shape(lambda shape: shape.shutoff_power)),
            ("efficiency at 75 % of best efficiency flow, over the best", _shape(lambda shape: shape.part_load, True)),
            ("efficiency at 110 % of best efficiency flow, over the best", _shape(lambda shape: shape.over_load, True)),
            ("NPSH3 at best efficiency", _npsh3),
            ("minimum efficiency index, (EU) 547/2012 (0.40 where it applies)", _eu),
            ("shaft power over the greatest 10 CFR 431 allows (100 % where it applies)", _us),
        )
    ]


def sources_of(estimates: Estimates) -> list[tuple[str, Source]]:
    """Every source of one bid with the quantity it speaks of."""
    found: list[tuple[str, Source]] = []
    if estimates.efficiency is not None:
        found += [("best efficiency", source) for source in estimates.efficiency.sources]
    if estimates.impeller is not None:
        found += [("impeller", source) for source in estimates.impeller.sources]
    if estimates.shape is not None:
        shape = estimates.shape
        for words, ratio in (
            ("shutoff head over best", shape.shutoff_head),
            ("shutoff power over best", shape.shutoff_power),
            ("efficiency at 75 % flow over best", shape.part_load),
            ("efficiency at 110 % flow over best", shape.over_load),
        ):
            found += [(words, source) for source in ratio.sources]
    if estimates.suction is not None:
        found += [("NPSH3 at best efficiency", source) for source in estimates.suction.sources]
    return found


def source_in_words(quantity: str, source: Source, system: UnitSystem) -> dict[str, str]:
    """One source with its value, or why it gives none."""
    return {
        "quantity": quantity,
        "name": source.name,
        "value": figure(source.value, source.kind, system),
        "reason": source.reason,
        "valid": source.valid,
        "mark": source.mark,
        "origin": source.origin,
    }


def _pair(offered: float | None, expected: float | None, kind: Kind, system: UnitSystem) -> tuple[str, str]:
    return figure(offered, kind, system), figure(expected, kind, system)


def _coefficient(estimates: Estimates, system: UnitSystem) -> tuple[str, str]:
    found = estimates.impeller
    return (NOTHING, NOTHING) if found is None else _pair(found.offered, found.expected, Kind.RATIO, system)


def _coefficient_at_shutoff(estimates: Estimates, system: UnitSystem) -> tuple[str, str]:
    found = estimates.impeller
    if found is None:
        return NOTHING, NOTHING
    return _pair(found.offered_at_shutoff, found.expected_at_shutoff, Kind.RATIO, system)


def _diameter(estimates: Estimates, system: UnitSystem) -> tuple[str, str]:
    found = estimates.impeller
    return (
        (NOTHING, NOTHING) if found is None else _pair(found.diameter, found.expected_diameter, Kind.DIAMETER, system)
    )


def _cordier(estimates: Estimates, system: UnitSystem) -> tuple[str, str]:
    found = estimates.impeller
    return (NOTHING, NOTHING) if found is None else _pair(found.diameter, found.cordier_diameter, Kind.DIAMETER, system)


def _shape(which: Callable[[ShapeEstimate], ShapeRatio], share: bool = False) -> Pair:
    """Pair of one ratio of the shape; shares in per cent, the others as so many times."""
    kind = Kind.SHARE if share else Kind.RATIO

    def pair(estimates: Estimates, system: UnitSystem) -> tuple[str, str]:
        if estimates.shape is None:
            return NOTHING, NOTHING
        ratio = which(estimates.shape)
        return figure(ratio.offered, kind, system), _range(ratio.expected, kind, system)

    return pair


def _range(expected: tuple[float, float] | None, kind: Kind, system: UnitSystem) -> str:
    """The range as "1.2 to 1.4", one figure where both ends print alike."""
    if expected is None:
        return NOTHING
    low, high = (figure(value, kind, system) for value in expected)
    return low if low == high else f"{low} to {high}"


def _npsh3(estimates: Estimates, system: UnitSystem) -> tuple[str, str]:
    found = estimates.suction
    if found is None:
        return NOTHING, NOTHING
    return figure(found.offered, Kind.NPSH, system), _range((found.low, found.high), Kind.NPSH, system)


def _eu(estimates: Estimates, system: UnitSystem) -> tuple[str, str]:
    found = estimates.regulation
    if found is None:
        return NOTHING, NOTHING
    if found.eu_index is None:
        return NOTHING, f"not covered: {found.eu_reason}"
    return figure(found.eu_index, Kind.RATIO, system), ""


def _us(estimates: Estimates, system: UnitSystem) -> tuple[str, str]:
    found = estimates.regulation
    if found is None:
        return NOTHING, NOTHING
    if found.us_ratio is None:
        return NOTHING, f"not covered: {found.us_reason}"
    return figure(found.us_ratio, Kind.SHARE, system), ""
