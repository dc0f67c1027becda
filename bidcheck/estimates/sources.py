"""Every independent source of efficiency for one duty, each with its value or the reason why it gives none."""

from collections.abc import Callable

from bidcheck.errors import OutOfRange
from bidcheck.estimates import context, guelich
from bidcheck.estimates.expected import MULTISTAGE, Expected
from bidcheck.estimates.market_surface import market_efficiency, nominal_flow
from bidcheck.estimates.shape import Shape, attainable_of, balance_of, ceiling_of, table_of
from bidcheck.estimates.us_rule import US_CLASS, outside_us_scope, us_minimum_efficiency, us_nominal_speed
from bidcheck.hydraulics.affinity import flow_at_speed, head_at_speed
from bidcheck.second_opinion import Source

FLOOR_MEI = 0.40
"""Minimum efficiency index required since 2015. Source: Regulation (EU) No 547/2012, Annex II."""

_EU = "Regulation (EU) No 547/2012, Annex III"
_EU_RANGE = "6 to 1000 m³/h at 1450 or 2900 rpm, nq 8 to 80; market surveyed before the 2015 floor"
_BALANCE = "balance of power; disc friction Daily and Nece (1960), leakage Gülich Table 3.5"


def _mean(values: list[float]) -> float:
    """Arithmetic mean."""
    return sum(values) / len(values)


def _source(
    name: str, valid: str, mark: str, origin: str, *, value: Callable[[], float], share: float | None = None
) -> Source:
    """Ask one source; `share` is its stated scatter as a share of 1 − η."""
    try:
        found = value()
    except OutOfRange as error:
        return Source(name, None, valid, str(error), mark, origin)
    if not 0.0 < found < 1.0:
        return Source(name, None, valid, "gives no efficiency at this flow and specific speed", mark, origin)
    return Source(name, found, valid, "", mark, origin, None if share is None else share * (1.0 - found))


def _market_sources(shape: Shape, expected: Expected) -> list[Source]:
    """Median and regulatory floor of the market survey."""
    names = " and ".join(one.name for one in expected.classes)
    label = f" ({names})" if names else ""
    median = Source(
        f"market survey, median{label}",
        expected.median,
        _EU_RANGE,
        expected.reason,
        "derived",
        _EU,
        expected.spread if expected.median is not None else None,
    )
    if not expected.classes:
        return [median]

    def floor() -> float:
        values = []
        for one in expected.classes:
            flow = nominal_flow(one, shape.flow, shape.speed_rpm)
            values.append(market_efficiency(one, FLOOR_MEI, shape.nq_eye, flow))
        return _mean(values)

    return [median, _source(f"market survey, floor since 2015{label}", _EU_RANGE, "text", _EU, value=floor)]


def _us_source(shape: Shape) -> list[Source]:
    """Least efficiency of the US rule, where a class of it fits."""
    us_class = US_CLASS.get(shape.arrangement)
    if us_class is None or (shape.stages > 1 and shape.arrangement not in MULTISTAGE):
        return []
    nominal = us_nominal_speed(shape.speed_rpm)
    flow = flow_at_speed(shape.flow, shape.speed_rpm, nominal)
    head = head_at_speed(shape.head_per_stage, shape.speed_rpm, nominal)

    def least() -> float:
        found = us_minimum_efficiency(us_class, nominal, shape.nq_eye, flow)
        outside = outside_us_scope(us_class, nq=shape.nq_eye, flow=flow, head=head)
        if outside:
            raise OutOfRange(f"the US rule does not reach here: {outside} at {nominal} rpm")
        return found

    return [
        _source(
            f"US minimum ({us_class}, {nominal} rpm)",
            "25 to 4403 US gpm at 1800 or 3600 rpm, nq 8 to 80, to 459 ft",
            "text",
            "10 CFR 431.464 and 431.465; 80 FR 22939",
            value=least,
        )
    ]


def _book_sources(shape: Shape) -> list[Source]:
    """Statistics, chart, balance of losses and ceiling."""
    form, mark = ("multistage", "memory") if shape.multistage else ("single stage", "crossed")
    stated = "offered diameter" if shape.diameter is not None else "no diameter offered"
    return [
        _source(
            f"statistics by size and specific speed, {form}",
            "from 18 m³/h, nq 7 to 100 per suction eye",
            mark,
            "Gülich, Centrifugal Pumps, Table 3.9",
            value=lambda: table_of(shape),
            share=guelich.SCATTER,
        ),
        _source(
            "chart of practically attainable efficiency",
            "18 to 18 000 m³/h, nq 10 to 80",
            "text",
            "Hydraulic Institute, chart of maximum practically attainable efficiency; not below Gülich, Table 3.9",
            value=lambda: attainable_of(shape),
        ),
        _source(
            "balance of losses, for information",
            "from 18 m³/h, nq 7 to 100 per suction eye",
            "crossed",
            _BALANCE,
            value=lambda: balance_of(shape).efficiency,
        ),
        _source(
            f"ceiling the losses leave, {stated}",
            "nq 7 to 100 per suction eye",
            "crossed",
            _BALANCE,
            value=lambda: ceiling_of(shape).efficiency,
        ),
    ]


def _context_sources(shape: Shape) -> list[Source]:
    """Two more, shown only."""
    return [
        _source(
            "by flow alone, context only",
            "50 to 5000 US gpm",
            "crossed",
            "Corripio, Chrien and Evans (1982)",
            value=lambda: context.corripio_efficiency(shape.flow),
        ),
        _source(
            "statistical comparison, context only",
            "range not stated by the source as recalled",
            "memory",
            "Anderson, as printed in the Pump Handbook",
            value=lambda: context.anderson_efficiency(shape.nq_eye, shape.flow),
        ),
    ]


def efficiency_sources(shape: Shape, expected: Expected) -> tuple[Source, ...]:
    """Every source for one best efficiency point, deciding ones first.

    Parameters
    ----------
    shape : Shape
        The best efficiency point.
    expected : Expected
        Expected efficiency and the market classes it rests on.

    Returns
    -------
    tuple of Source
        Each with its value, or None and the reason.

    Notes
    -----
    Source: as each source names
    Valid for: any positive figures; each source refuses outside its own range with the reason
    Mark: derived

    Examples
    --------
    >>> from bidcheck.estimates.expected import expected_efficiency
    >>> shape = Shape(arrangement="sealless", nq=20.0, nq_eye=20.0, flow=10 / 3600, head_per_stage=20.0,
    ...               speed_rpm=2900, stages=1, diameter=None, viscosity=1e-6, density=998.2)
    >>> expected = expected_efficiency(arrangement="sealless", nq_eye=20.0, flow=10 / 3600, speed_rpm=2900)
    >>> [source.name for source in efficiency_sources(shape, expected) if source.value is not None]
    ['ceiling the losses leave, no diameter offered', 'statistical comparison, context only']
    """
    return (
        *_market_sources(shape, expected),
        *_us_source(shape),
        *_book_sources(shape),
        *_context_sources(shape),
    )
