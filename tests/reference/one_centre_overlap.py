#!/usr/bin/env python3
"""Prints the table of tests/basis/slater_radial_test.cpp: one-centre overlaps by quadrature.

    python3 tests/reference/one_centre_overlap.py

The integral of R_a R_b r^2 is done numerically at 60 digits (mpmath), not by the closed form the
program uses. Every exponent is exact in binary.
"""
from mpmath import mp, mpf, quad, exp, sqrt, factorial, nstr

mp.dps = 60
PAIRS = [((1, "1"), (1, "1.25")), ((2, "1.625"), (2, "1.25")), ((2, "0.5"), (1, "5.75")),
         ((7, "0.5"), (1, "9.5"))]


def radial(n, zeta, r):
    return (2 * zeta) ** (n + mpf(1) / 2) / sqrt(factorial(2 * n)) * r ** (n - 1) * exp(-zeta * r)


for (na, za), (nb, zb) in PAIRS:
    a, b = mpf(za), mpf(zb)
    scale = 1 / (a + b)
    value = quad(lambda r: radial(na, a, r) * radial(nb, b, r) * r * r,
                 [scale * k for k in (0, 1, 2, 4, 8, 16, 32, 64, 128, 256)])
    print(f"{{{{{na}, {za}}}, {{{nb}, {zb}}}, {nstr(value, 25)}}},")
