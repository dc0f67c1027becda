"""The best efficiency point an estimate is asked for, and what each source of the combination gives for it."""

from dataclasses import dataclass

from bidcheck.arrangement import Arrangement
from bidcheck.errors import OutOfRange
from bidcheck.estimates import guelich
from bidcheck.estimates.attainable import chart_efficiency
from bidcheck.estimates.expected import MULTISTAGE, table_efficiency
from bidcheck.estimates.head_coefficient import diameter_for_head, optimum_head_coefficient
from bidcheck.estimates.loss_ceiling import LossBalance, loss_balance, loss_ceiling

SMALLER_DIAMETER = 1.2
"""Head coefficient over the optimum assumed for the ceiling where no diameter is stated: the upper end of what is
plausible. Source: common practice, no source."""


@dataclass(frozen=True, slots=True, kw_only=True)
class Shape:
    """The best efficiency point an estimate is asked for, in SI; `nq` on total flow, `nq_eye` per suction eye."""

    arrangement: Arrangement
    nq: float
    nq_eye: float
    flow: float
    head_per_stage: float
    speed_rpm: float
    stages: int
    diameter: float | None
    viscosity: float
    density: float

    @property
    def multistage(self) -> bool:
        """Whether forms for multistage pumps apply."""
        return self.stages > 1 or self.arrangement in MULTISTAGE


def table_of(shape: Shape) -> float:
    """Gülich's efficiency of the form that fits, per suction eye.

    Parameters
    ----------
    shape : Shape
        The best efficiency point.

    Returns
    -------
    float
        Efficiency. [fraction]

    Raises
    ------
    OutOfRange
        Below 18 m³/h or outside nq 7 to 100.

    Notes
    -----
    Source: Gülich, Centrifugal Pumps, Table 3.9
    Valid for: from 18 m³/h, nq 7 to 100 per suction eye
    Mark: crossed

    Examples
    --------
    >>> table_of(Shape(arrangement="end suction", nq=20.0, nq_eye=20.0, flow=0.010, head_per_stage=20.0,
    ...                speed_rpm=1450, stages=1, diameter=None, viscosity=1e-6, density=998.2))
    0.6870
    """
    return table_efficiency(shape.nq_eye, shape.flow, shape.multistage)


def attainable_of(shape: Shape) -> float:
    """Attainable efficiency A.

    Parameters
    ----------
    shape : Shape
        The best efficiency point.

    Returns
    -------
    float
        The chart at total flow's or the eye's specific speed, the more generous, and not below Gülich's. [fraction]

    Raises
    ------
    OutOfRange
        Where the chart covers neither.

    Notes
    -----
    Source: Hydraulic Institute, chart of maximum practically attainable efficiency; Gülich, Table 3.9
    Valid for: 18 to 18 000 m³/h, nq 10 to 80
    Mark: text

    Examples
    --------
    >>> attainable_of(Shape(arrangement="end suction", nq=27.85, nq_eye=27.85, flow=130 / 3600, head_per_stage=55.0,
    ...                     speed_rpm=2960, stages=1, diameter=None, viscosity=1e-6, density=998.2))
    0.850
    """
    found: list[float] = []
    refused: OutOfRange | None = None
    for nq in (shape.nq, shape.nq_eye):
        try:
            found.append(chart_efficiency(nq, shape.flow))
        except OutOfRange as error:
            refused = error
    if not found and refused is not None:
        raise refused
    return max(*found, table_of(shape))


def ceiling_of(shape: Shape) -> LossBalance:
    """Ceiling from the losses.

    Parameters
    ----------
    shape : Shape
        The best efficiency point.

    Returns
    -------
    LossBalance
        With the offered diameter or, where none is stated, that of 1.2 times the optimum head coefficient.

    Raises
    ------
    OutOfRange
        Outside the range below.

    Notes
    -----
    Source: balance of power; disc friction Daily and Nece (1960), leakage Gülich Table 3.5
    Valid for: nq 7 to 100 per suction eye
    Mark: crossed

    Examples
    --------
    >>> ceiling_of(Shape(arrangement="end suction", nq=27.85, nq_eye=27.85, flow=130 / 3600, head_per_stage=55.0,
    ...           speed_rpm=2960, stages=1, diameter=0.2145, viscosity=1e-6, density=998.2)).efficiency
    0.920
    """
    diameter = shape.diameter
    if diameter is None:
        coefficient = SMALLER_DIAMETER * optimum_head_coefficient(shape.nq_eye)
        diameter = diameter_for_head(shape.head_per_stage, shape.speed_rpm, coefficient)
    return loss_ceiling(
        nq=shape.nq_eye,
        flow=shape.flow,
        head_per_stage=shape.head_per_stage,
        speed_rpm=shape.speed_rpm,
        diameter=diameter,
        viscosity=shape.viscosity,
        density=shape.density,
    )


def balance_of(shape: Shape) -> LossBalance:
    """Balance of losses for information; it decides nothing.

    Parameters
    ----------
    shape : Shape
        The best efficiency point.

    Returns
    -------
    LossBalance
        Gülich's hydraulic efficiency, full leakage, offered or optimum diameter.

    Raises
    ------
    OutOfRange
        Outside the range below.

    Notes
    -----
    Source: balance of power; disc friction Daily and Nece (1960), leakage Gülich Table 3.5
    Valid for: from 18 m³/h, nq 7 to 100 per suction eye
    Mark: crossed

    Examples
    --------
    >>> balance_of(Shape(arrangement="end suction", nq=27.85, nq_eye=27.85, flow=130 / 3600, head_per_stage=55.0,
    ...           speed_rpm=2960, stages=1, diameter=0.2145, viscosity=1e-6, density=998.2)).efficiency
    0.844
    """
    diameter = shape.diameter
    if diameter is None:
        coefficient = optimum_head_coefficient(shape.nq_eye)
        diameter = diameter_for_head(shape.head_per_stage, shape.speed_rpm, coefficient)
    return loss_balance(
        nq=shape.nq_eye,
        flow=shape.flow,
        head_per_stage=shape.head_per_stage,
        speed_rpm=shape.speed_rpm,
        diameter=diameter,
        viscosity=shape.viscosity,
        density=shape.density,
        hydraulic_efficiency=guelich.guelich_hydraulic(shape.nq_eye, shape.flow),
    )
