"""Constants of nature and of the trade."""

GRAVITY = 9.80665
"""Standard acceleration of gravity [m/s²]. Source: CGPM 1901, exact."""

NS_PER_NQ = 51.645
"""US specific speed (rpm, US gpm, ft) over nq (1/min, m³/s, m). Source: derived, √15850.3 · 3.28084^-0.75."""

NQ_PER_TYPE_NUMBER = 52.919
"""nq over the type number K of ISO 9906: 60/(2π) · g^0.75. Source: derived from the definition of K."""
