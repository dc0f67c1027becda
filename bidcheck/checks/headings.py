"""The units a curve was written in."""

from bidcheck.curve import Curve
from bidcheck.explain import Quantity


def headings_of(curve: Curve | None) -> dict[Quantity, float]:
    """One unit of each heading in SI, 0 where not known."""
    if curve is None or curve.head is None:
        return {}
    power = 0.0 if curve.power is None else curve.power.value_unit
    return {"flow": curve.head.flow_unit, "head": curve.head.value_unit, "power": power}
