"""How a pump is arranged: the kinds a bid may name."""

from typing import Literal

Arrangement = Literal[
    "end suction",
    "close coupled",
    "in-line",
    "double suction",
    "horizontal multistage",
    "vertical multistage",
    "submersible multistage",
    "vertical turbine",
    "solids handling",
    "sealless",
]
ARRANGEMENTS: tuple[Arrangement, ...] = (
    "end suction",
    "close coupled",
    "in-line",
    "double suction",
    "horizontal multistage",
    "vertical multistage",
    "submersible multistage",
    "vertical turbine",
    "solids handling",
    "sealless",
)
