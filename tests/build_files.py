"""Builders of inquiry folders on disk for tests of reading."""

from pathlib import Path

INQUIRY = """\
tag = "P-101"
units = "SI"
[duty]
rated_flow = "450 m3/h"
rated_head = "62 m"
pumps_running = 1
pumps_installed = 1
[liquid]
name = "glycol"
density = "1050 kg/m3"
viscosity = "3 cSt"
[limits]
set = "general-water"
"""

BID = """\
bidder = "birch"
arrangement = "end suction"
speed = "1480 rpm"
stages = 1
suction_eyes = 1
inducer = false
drive = "fixed"
impeller_rated = "412 mm"
[[curves]]
file = "curve.csv"
impeller = "412 mm"
speed = "1480 rpm"
liquid = "water"
density = "998.2 kg/m3"
power_at = "shaft"
"""

CURVE = """\
flow [m3/h], head [m], efficiency [%], power [kW], npsh3 [m]
0, 74.0, 0.0, 38.0,
240, 70.9, 62.1, 74.6, 2.9
450, 62.3, 82.5, 92.4, 4.2
520, 57.3, 81.1, 99.9, 4.9
"""


def write_bid(root: Path, bidder: str, bid: str = BID, curve: str | bytes = CURVE, revision: str = "") -> Path:
    """Write one bid; the bidder's name is put into `bid`."""
    folder = root / "bids" / bidder / revision
    folder.mkdir(parents=True, exist_ok=True)
    (folder / "bid.toml").write_text(bid.replace('"birch"', f'"{bidder}"'), encoding="utf-8")
    data = curve if isinstance(curve, bytes) else curve.encode()
    (folder / "curve.csv").write_bytes(data)
    return folder


def write_inquiry(root: Path, inquiry: str = INQUIRY, bid: str = BID, curve: str | bytes = CURVE) -> Path:
    """Write an inquiry with one bid, birch."""
    root.mkdir(exist_ok=True)
    (root / "inquiry.toml").write_text(inquiry, encoding="utf-8")
    write_bid(root, "birch", bid, curve)
    return root
