"""Plain formulas of pumps and liquids: floats in, floats out, each with its source."""
