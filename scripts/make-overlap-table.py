#!/usr/bin/python3
"""Writes tests/reference/two_centre_overlaps.csv: overlaps of Slater functions to 40 digits.

    scripts/make-overlap-table.py            rewrite the table (needs Debian's python3-mpmath)

Method: the integrand in prolate spheroidal coordinates is expanded in monomials xi^i eta^j with
whole-number coefficients, and the products A_i(alpha) B_j(beta) of Mulliken, Rieke, Orloff and
Orloff, J. Chem. Phys. 17, 1248 (1949), are summed at 250 digits, where the cancellation that
plagues this sum in double precision does no harm. The program integrates otherwise (see
src/overlap). Every 40th pair is integrated a second time here, without any expansion, by Gauss
quadrature of the orbitals themselves in two dimensions, and the script stops if the two differ.

Exponents and distances are exact in binary and the choice of rows is the same in every run.
"""
import math
import pathlib
import random

from mpmath import mp, mpf, exp, factorial, nstr, sqrt
from mpmath.calculus.quadrature import GaussLegendre

DIGITS = 40
mp.dps = 250
TABLE = pathlib.Path(__file__).resolve().parent.parent / "tests/reference/two_centre_overlaps.csv"

# Polar functions Theta_lm = sqrt(p/q) sin^m(theta) P(cos theta), normalised over theta:
# (p, q, coefficients of P by ascending power).
POLAR = {
    (0, 0): (1, 2, [1]),
    (1, 0): (3, 2, [0, 1]), (1, 1): (3, 4, [1]),
    (2, 0): (5, 8, [-1, 0, 3]), (2, 1): (15, 4, [0, 1]), (2, 2): (15, 16, [1]),
    (3, 0): (7, 8, [0, -3, 0, 5]), (3, 1): (21, 32, [-1, 0, 5]), (3, 2): (105, 16, [0, 1]),
    (3, 3): (35, 32, [1]),
}


def times(p, q):
    out = {}
    for (i, j), a in p.items():
        for (k, l), b in q.items():
            out[i + k, j + l] = out.get((i + k, j + l), 0) + a * b
    return out


def power(p, k):
    out = {(0, 0): 1}
    for _ in range(k):
        out = times(out, p)
    return out


RA, RB = {(1, 0): 1, (0, 1): 1}, {(1, 0): 1, (0, 1): -1}       # r_a, r_b in units of R/2
ZA, ZB = {(0, 0): 1, (1, 1): 1}, {(0, 0): -1, (1, 1): 1}       # z measured from a and from b
RHO2 = {(2, 0): 1, (0, 0): -1, (2, 2): -1, (0, 2): 1}          # (xi^2 - 1)(1 - eta^2)


def angular(l, m, z, r):
    """r^l Theta_lm without sqrt(p/q) and without rho^m."""
    out = {}
    for k, c in enumerate(POLAR[l, m][2]):
        if c:
            for key, value in times(power(z, k), power(r, l - m - k)).items():
                out[key] = out.get(key, 0) + c * value
    return out


def integrand(na, la, nb, lb, m):
    w = times(power(RA, na - la), power(RB, nb - lb))
    w = times(w, times(angular(la, m, ZA, RA), angular(lb, m, ZB, RB)))
    return times(w, power(RHO2, m))


def a_integrals(alpha, count):
    """A_k = int_1^inf xi^k e^(-alpha xi) dxi."""
    e = exp(-alpha)
    out = [e / alpha]
    for k in range(1, count):
        out.append((e + k * out[-1]) / alpha)
    return out


def b_integrals(beta, count):
    """B_k = int_-1^1 eta^k e^(-beta eta) deta."""
    if abs(beta) < 1:
        out = []
        for k in range(count):
            total, term = mpf(0), mpf(1)
            for j in range(170):
                if (k + j) % 2 == 0:
                    total += 2 * term / (k + j + 1)
                term *= -beta / (j + 1)
            out.append(total)
        return out
    plus, minus = exp(beta), exp(-beta)
    out = [(plus - minus) / beta]
    for k in range(1, count):
        out.append(((-1) ** k * plus - minus + k * out[-1]) / beta)
    return out


def radial_norm(n, zeta):
    return (2 * zeta) ** n * sqrt(2 * zeta) / sqrt(factorial(2 * n))


def polar_norm(l, m):
    p, q, _ = POLAR[l, m]
    return sqrt(mpf(p) / q)


def overlaps(na, la, za, nb, lb, zb, distance):
    alpha, beta = distance * (za + zb) / 2, distance * (za - zb) / 2
    a, b = a_integrals(alpha, na + nb + 1), b_integrals(beta, na + nb + 1)
    scale = radial_norm(na, za) * radial_norm(nb, zb) * (distance / 2) ** (na + nb + 1)
    out = []
    for m in range(min(la, lb) + 1):
        total = sum(c * a[i] * b[j] for (i, j), c in integrand(na, la, nb, lb, m).items())
        out.append(total * scale * polar_norm(la, m) * polar_norm(lb, m))
    return out


def quadrature_rule():
    return GaussLegendre(mp).calc_nodes(5, mp.prec)  # 48 points on [-1, 1]


def overlaps_by_quadrature(na, la, za, nb, lb, zb, distance):
    """The orbitals themselves, multiplied point by point, in panels of xi and eta.

    Panels end where the exponential has fallen by e^-200 from its largest value.
    """
    alpha, beta = distance * (za + zb) / 2, distance * (za - zb) / 2
    steps = [mpf(s) for s in (0, 20, 80, 200)]
    xi_edges = [1 + s / alpha for s in steps]
    reach = [s for s in (0, 20, 80) if s < 2 * abs(beta)] + [min(2 * abs(beta), 200)]
    if beta == 0:
        eta_edges = [mpf(-1), mpf(1)]
    elif beta > 0:
        eta_edges = [-1 + s / beta for s in reach]
    else:
        eta_edges = [1 + s / beta for s in reach][::-1]

    def polar(l, m, cosine, sine):
        return polar_norm(l, m) * sine ** m * sum(
            c * cosine ** k for k, c in enumerate(POLAR[l, m][2]))

    def points(edges):
        for low, high in zip(edges, edges[1:]):
            for x, w in RULE:
                yield (low + high + (high - low) * x) / 2, w * (high - low) / 2

    eta_points = list(points(eta_edges))
    out = [mpf(0)] * (min(la, lb) + 1)
    for xi, w_xi in points(xi_edges):
        for eta, w_eta in eta_points:
            ra, rb = distance * (xi + eta) / 2, distance * (xi - eta) / 2
            ca, cb = (1 + xi * eta) / (xi + eta), (xi * eta - 1) / (xi - eta)
            rho = distance / 2 * sqrt((xi * xi - 1) * (1 - eta * eta))
            f = radial_norm(na, za) * ra ** (na - 1) * exp(-za * ra)
            f *= radial_norm(nb, zb) * rb ** (nb - 1) * exp(-zb * rb)
            f *= (distance / 2) ** 3 * (xi * xi - eta * eta) * w_xi * w_eta
            for m in range(len(out)):
                out[m] += f * polar(la, m, ca, rho / ra) * polar(lb, m, cb, rho / rb)
    return out


def binary(value, bits=6):
    """Rounded to a multiple of 2^-bits, so that it is exact in binary and short in decimal."""
    return max(1, round(value * 2 ** bits)) / 2 ** bits


def chosen_pairs():
    draw = random.Random(1930)

    def log_uniform(low, high):
        return math.exp(draw.uniform(math.log(low), math.log(high)))

    def shell():
        l = draw.choice([0, 1, 2, 3])
        return draw.randint(l + 1, 7), l

    rows = []

    def add(kind, a, za, b, zb, distance):
        rows.append((kind, a, za, b, zb, distance))

    # Anything with anything; the distance out to where the overlap is about 1e-18.
    for _ in range(640):
        za, zb = binary(log_uniform(0.5, 20)), binary(log_uniform(0.5, 20))
        add("ordinary", shell(), za, shell(), zb, binary(log_uniform(0.5, 60 / min(za, zb) + 1)))
    # Equal and nearly equal exponents: beta is zero or small.
    for _ in range(120):
        za = binary(log_uniform(0.5, 20))
        for step in draw.sample([0, 2 ** -40, 2 ** -20, 2 ** -10, 2 ** -6, 2 ** -4, 2 ** -2], 2):
            add("ordinary", shell(), za, shell(), za + step, binary(log_uniform(0.5, 40)))
    # The shortest distance of the range, ratios from 1 to 40.
    for _ in range(100):
        add("ordinary", shell(), binary(log_uniform(0.5, 20)), shell(),
            binary(log_uniform(0.5, 20)), 0.5)
    # The corners of the range, highest n and l.
    for a in ((7, 3), (7, 0), (4, 3), (1, 0)):
        for b in ((7, 3), (5, 2), (1, 0)):
            for za in (0.5, 20.0):
                for zb in (0.5, 20.0):
                    for distance in (0.5, 3.5):
                        add("ordinary", a, za, b, zb, distance)
    # Far apart: down to the smallest doubles and beyond.
    for _ in range(60):
        za, zb = binary(log_uniform(0.5, 20)), binary(log_uniform(0.5, 20))
        add("ordinary", shell(), za, shell(), zb, binary(draw.uniform(50, 800) / min(za, zb)))
    # Everything the type of the exponent admits, and shorter distances.
    for _ in range(150):
        za, zb = binary(log_uniform(1.2e-3, 1e3), 12), binary(log_uniform(1.2e-3, 1e3), 12)
        add("wide", shell(), za, shell(), zb, binary(log_uniform(0.1, 60 / min(za, zb) + 0.2), 12))
    for _ in range(40):
        add("wide", shell(), binary(log_uniform(1.2e-3, 1), 12), shell(),
            binary(log_uniform(1.2e-3, 1), 12), binary(log_uniform(0.1, 0.5), 12))
    return rows


RULE = None


def main():
    global RULE
    lines, checked = [], 0
    for number, (kind, a, za, b, zb, distance) in enumerate(chosen_pairs()):
        arguments = (*a, mpf(za), *b, mpf(zb), mpf(distance))
        values = overlaps(*arguments)
        if number % 40 == 0:
            with mp.workdps(60):
                RULE = RULE or quadrature_rule()
                second = overlaps_by_quadrature(*arguments)
            for value, other in zip(values, second):
                if abs(value - other) > mpf(10) ** -30:
                    raise SystemExit(f"{arguments}: {nstr(value, 40)} but quadrature gives "
                                     f"{nstr(other, 40)}")
            checked += 1
        for m, value in enumerate(values):
            lines.append(f"{kind},{a[0]},{a[1]},{za!r},{b[0]},{b[1]},{zb!r},{distance!r},{m},"
                         f"{nstr(value, DIGITS, min_fixed=0, max_fixed=0)}")
    header = f"""\
# Two-centre overlaps of Slater-type orbitals in the diatomic frame, z from a to b for both.
# source: none; computed for this table from the definition of the functions
# method: sum of A_i(alpha) B_j(beta) at {mp.dps} digits; {checked} pairs also by two-dimensional Gauss
#   quadrature of the orbitals, equal to 1e-30
# digits: {DIGITS}; zeta (1/bohr) and distance (bohr) are exact
# command: scripts/make-overlap-table.py
range,n_a,l_a,zeta_a,n_b,l_b,zeta_b,distance,m,overlap
"""
    TABLE.write_text(header + "\n".join(lines) + "\n")
    print(f"{len(lines)} overlaps written, {checked} pairs checked by quadrature")


if __name__ == "__main__":
    main()
