"""Builders of sound objects for unit tests, in trade SI units; each keyword replaces one figure."""

from collections.abc import Sequence
from pathlib import Path
from typing import Any

import numpy as np

from bidcheck.bid import Bid, Claims, Driver
from bidcheck.curve import Curve, Points
from bidcheck.inquiry import Duty, Inquiry, Liquid
from bidcheck.quantity import Stated, UnitSystem

M3H = 1 / 3600.0


def points(
    flow_m3h: Sequence[float],
    values: Sequence[float],
    factor: float = 1.0,
    half_digit: float = 0.05,
    flow_half_digit: float = 0.5,
) -> Points:
    """Points of one column: flows in m³/h, values times `factor` in SI, lines counted from 2."""
    n = len(flow_m3h)
    return Points(
        flow=np.array(flow_m3h, dtype=float) * M3H,
        value=np.array(values, dtype=float) * factor,
        flow_half_digit=np.full(n, flow_half_digit * M3H),
        value_half_digit=np.full(n, half_digit * factor),
        line=np.arange(2, n + 2),
    )


def sound_curve(**changes: Any) -> Curve:
    """A single-stage pump, 460 m³/h and 61.9 m at best efficiency 82.5 %, 1480 rpm, in trade digits."""
    flow = [0, 80, 160, 240, 320, 400, 440, 480, 520, 580]
    q = np.array(flow, dtype=float)
    head = np.round(74.0 + 0.002 * q - 6.2e-5 * q**2, 1)
    x = q / 460.0
    efficiency = np.round(82.5 * (1 - np.abs(1 - x) ** 2.3), 1)
    efficiency[0] = 0.0
    running = q > 0
    power = np.where(running, 998.2 * 9.80665 * q * M3H * head / np.where(running, efficiency / 100, 1) / 1000, 38.0)
    npsh3 = np.round(2.4 + 1.9 * (x**2), 1)
    fields: dict[str, Any] = {
        "file": "bids/alder/curve.csv",
        "impeller": 0.412,
        "speed_rpm": 1480.0,
        "stages": 1,
        "liquid": "water",
        "density": 998.2,
        "power_at": "shaft",
        "head": points(flow, list(head)),
        "efficiency": points(flow, list(efficiency), 0.01),
        "power": points(flow, list(np.round(power, 1)), 1000.0),
        "npsh3": points(flow[2:], list(npsh3[2:])),
    }
    fields.update(changes)
    return Curve(**fields)


def stated(value: float, half_digit: float, text: str = "as stated") -> Stated:
    """A claim in SI."""
    return Stated(value, half_digit, text)


def sound_bid(**changes: Any) -> Bid:
    """The bid of the sound curve, complete, named alder a."""
    fields: dict[str, Any] = {
        "bidder": "alder",
        "revision": "a",
        "folder": "bids/alder",
        "arrangement": "end suction",
        "speed_rpm": 1480.0,
        "curves": (sound_curve(),),
        "impeller_rated": 0.412,
        "impeller_max": 0.430,
        "impeller_min": 0.340,
        "claims": Claims(
            head=stated(62.3, 0.05, "62.3 m"),
            efficiency=stated(0.825, 0.0005, "82.5 %"),
            power=stated(92400.0, 50.0, "92.4 kW"),
            npsh3=stated(4.2, 0.05, "4.2 m"),
            bep_flow=stated(460 * M3H, 0.5 * M3H, "460 m3/h"),
            bep_efficiency=stated(0.825, 0.0005, "82.5 %"),
            min_continuous_flow=stated(140 * M3H, 0.5 * M3H, "140 m3/h"),
        ),
        "driver": Driver(rating=110000.0, speed_rpm=1480.0, efficiency=0.95, poles=4, frequency=50.0),
    }
    fields.update(changes)
    return Bid(**fields)


def inquiry(**changes: Any) -> Inquiry:
    """The inquiry the sound bid answers: 450 m³/h at 62 m, NPSH available 6.8 m, cold water."""
    from bidcheck.read.limit_sets import limit_set

    fields: dict[str, Any] = {
        "tag": "P-101",
        "title": "cooling water pump",
        "units": UnitSystem.SI,
        "duty": Duty(
            rated_flow=450 * M3H,
            rated_head=62.0,
            max_flow=520 * M3H,
            min_flow=300 * M3H,
            npsha=6.8,
            npsha_at_max_flow=6.3,
        ),
        "liquid": Liquid(name="water", density=998.2, viscosity=1.004e-6, temperature=293.15, vapour_pressure=2339.0),
        "limits": limit_set("general-water"),
        "bids": (sound_bid(),),
    }
    fields.update(changes)
    return Inquiry(**fields)


EXAMPLES = Path(__file__).parent.parent / "example_bids"
