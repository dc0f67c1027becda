"""Constants of nature that every formula shares."""

G = 9.80665
"""Standard acceleration of free fall [m/s²]. Source: 3rd General Conference on Weights and Measures (1901)."""

STANDARD_AIR_PRESSURE = 101_325.0
"""Standard pressure of the air at sea level [Pa]. Source: 10th General Conference on Weights and Measures (1954)."""
