"""Formulas of noise, heat and filters; floats and arrays alike, SI units."""
