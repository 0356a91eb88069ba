#!/usr/bin/env python3
"""Makes the CSV files beside it: tails of the F, t, chi-squared, normal and noncentral F distributions, and their inverses.

Run with /usr/bin/python3 and Debian's python3-mpmath. Nothing here shares a method with the code under test:
  central tails    the positive series of 2F1(a+b, 1; a+1; x) where it is short, otherwise Gauss-Legendre quadrature of the density
                   in log f (80 nodes a panel), prefactors from mpmath's loggamma, all at 80 digits;
  noncentral tails the plain Poisson mixture at 80 digits; for even df2 the finite Laguerre sum, which has no mixture in it,
                   at as many digits as its complement needs; for df1 = 1 quadrature of a normal interval over a chi-squared scale;
  inverses         the argument at which the value was made, moved by one Newton step at 80 digits to belong exactly to the
                   rounded value (the rounding is 1e-16, so the step's own error is below 1e-25).
Every routine is compared with a second one (mpmath's betainc, gammainc, or the other route) before a file is written; the largest
disagreement is in the first line of each file. All inputs are doubles, written so that they read back exactly.
"""
import math
import multiprocessing
import os
import platform
import random
import sys

import mpmath
from mpmath import mp, mpf

mp.dps = 80
HERE = os.path.dirname(os.path.abspath(__file__))
NODES = 80


def legendre_rule(n):
    """Nodes and weights on [-1, 1] by Newton's method on the Legendre recurrence."""
    rule = []
    for i in range(n):
        z = mp.cos(mp.pi * (i + mpf(3) / 4) / (n + mpf(1) / 2))
        for _ in range(12):
            before, now = mpf(1), z
            for k in range(2, n + 1):
                before, now = now, ((2 * k - 1) * z * now - (k - 1) * before) / k
            slope = n * (z * now - before) / (z * z - 1)
            step = now / slope
            z -= step
            if abs(step) < mpf(10) ** -75:
                break
        rule.append((z, 2 / ((1 - z * z) * slope * slope)))
    return rule


RULE = legendre_rule(NODES)


def tail_integral(g, slope_sign):
    """Integral of exp(g(s)) for s from 0 in the direction of slope_sign, g concave and falling that way, g(0) = 0."""
    end = mpf(1) / 1000
    while g(slope_sign * end) > -185:
        end *= 2
    low = end / 2
    for _ in range(6):
        middle = (low + end) / 2
        if g(slope_sign * middle) > -185:
            low = middle
        else:
            end = middle
    panels = max(10, int(mp.ceil(end / 1)))
    half = end / panels / 2
    total = mpf(0)
    for k in range(panels):
        centre = half * (2 * k + 1)
        part = mpf(0)
        for z, w in RULE:
            part += w * mp.exp(g(slope_sign * (centre + half * z)))
        total += part * half
        if part * half < total * mpf(10) ** -75:
            break
    return total


def positive_series(x, a, n):
    """sum of (n)_k/(a+1)_k x^k"""
    term = total = mpf(1)
    k = 0
    small = mpf(10) ** -78
    while True:
        term = term * x * (n + k) / (a + 1 + k)
        total += term
        k += 1
        if term < total * small and x * (n + k) < (a + 1 + k):
            return total


def log_density(f, a, b):
    """log of f times the F density"""
    return a * mp.log(a * f) + b * mp.log(b) - (a + b) * mp.log(a * f + b) - (mp.loggamma(a) + mp.loggamma(b) - mp.loggamma(a + b))


def work_of_series(x, a, n):
    if x * n < a:
        return 12 * math.sqrt(float(a)) + 185 / max(1e-12, -math.log(float(x))) if x > mpf(1) / 2 else 300
    return 185 / max(1e-12, -math.log(float(x)))


def f_tails(f, df1, df2, route=None):
    """(lower, upper, log f times density)"""
    f, a, b = mpf(f), mpf(df1) / 2, mpf(df2) / 2
    n = a + b
    x, y = a * f / (a * f + b), b / (a * f + b)
    ld = log_density(f, a, b)
    d = mp.exp(ld)
    upper_side = f >= 1
    near, near_a, near_b = (y, b, a) if upper_side else (x, a, b)
    short = near * n < near_a * 2 and work_of_series(near, near_a, n) < 4000
    if route is None:
        route = 'series' if short else 'quadrature'
    if route == 'series':
        value = d / near_a * positive_series(near, near_a, n)
    else:
        sign = 1 if upper_side else -1
        value = d * tail_integral(lambda s: a * s - n * mp.log1p(x * mp.expm1(s)), sign)
    return (1 - value, value, ld) if upper_side else (value, 1 - value, ld)


def gamma_tails(q, shape):
    """Tails of a gamma variable with this shape at q."""
    q, a = mpf(q), mpf(shape)
    d = mp.exp(a * mp.log(q) - q - mp.loggamma(a))
    if q >= a + 1:
        value = d * tail_integral(lambda s: a * s - q * mp.expm1(s), 1)
        return 1 - value, value
    term = total = 1 / a
    k = a
    while term > total * mpf(10) ** -80:
        k += 1
        term = term * q / k
        total += term
    return d * total, 1 - d * total


def mixture(f, df1, df2, lam):
    """(lower, upper, -d lower/d lambda) of the noncentral F as a plain Poisson mixture, every term by a stable recurrence."""
    f, a, b, mu = mpf(f), mpf(df1) / 2, mpf(df2) / 2, mpf(lam) / 2
    x = a * f / (a * f + b)
    small = mpf(10) ** -75

    def start(j):
        lower, upper, ld = f_tails(f * a / (a + j), 2 * (a + j), df2)
        w = mp.exp(-mu + j * mp.log(mu) - mp.loggamma(j + 1))
        return w * lower, w * upper, w * mp.exp(ld) / (a + j)

    # Lower tail from above: P_j = P_{j+1} (j+1)/mu + Q_j.
    top = int(float(mu) + 19 * math.sqrt(float(mu)) + 120)
    p, _, q = start(top)
    lower, slope = p, q
    for j in range(top - 1, -1, -1):
        ratio = (j + 1) / mu
        q = q * ratio * (a + j + 1) / (x * (a + b + j))
        p = p * ratio + q
        lower += p
        slope += q
        if p < lower * small and ratio < 1 and j < top - 200:
            break
    # Upper tail from below: P_{j+1} = (P_j + Q_j) mu/(j+1).
    j = max(0, int(float(mu) - 19 * math.sqrt(float(mu)) - 120))
    _, p, q = start(j)
    upper = p
    while True:
        ratio = mu / (j + 1)
        p = (p + q) * ratio
        q = q * ratio * x * (a + b + j) / (a + j + 1)
        upper += p
        j += 1
        if p < upper * small and ratio < 1 and p + q < p / ratio:
            break
    return lower, upper, slope / 2


def laguerre(f, df1, df2, lam):
    """(lower, upper) for even df2 as a finite sum: x^a exp(-mu y) sum over i < df2/2 of y^i L_i^(a-1)(-mu x)."""
    def value():
        ff, a, mu = mpf(f), mpf(df1) / 2, mpf(lam) / 2
        b = int(df2) // 2
        x, y = a * ff / (a * ff + b), b / (a * ff + b)
        before, now, total, power = mpf(0), mpf(1), mpf(0), mpf(1)
        for i in range(b):
            total += power * now
            power *= y
            before, now = now, ((2 * i + 1 + (a - 1) + mu * x) * now - (i + a - 1) * before) / (i + 1)
        return x ** a * mp.exp(-mu * y) * total
    lower = value()
    digits = mp.dps
    with mp.workdps(digits + 420):
        upper = 1 - value()
    return lower, +upper


def scaled_normal(f, df2, lam):
    """Lower tail for df1 = 1: P(|Z + sqrt(lambda)| <= sqrt(f W/df2)), W chi-squared, by quadrature over log W."""
    f, b, root = mpf(f), mpf(df2) / 2, mp.sqrt(mpf(lam))

    def integrand(s):
        w = mp.exp(s)
        r = mp.sqrt(f * w / b)  # W = 2 w, so this is sqrt(f W/df2)
        inside = (mp.erfc((root - r) / mp.sqrt(2)) - mp.erfc((root + r) / mp.sqrt(2))) / 2
        return inside * mp.exp(b * s - w - mp.loggamma(b))
    # Locate the mode and the width on a coarse grid, then panels of that width.
    grid = [mp.log(b) + mpf(i) / 20 for i in range(-400, 161)]
    values = [integrand(s) for s in grid]
    best = max(values)
    keep = [s for s, v in zip(grid, values) if v > best * mpf(10) ** -70]
    low, high = keep[0] - mpf(1) / 20, keep[-1] + mpf(1) / 20
    panels = max(12, int((high - low) * 4))
    half = (high - low) / panels / 2
    return half * sum(w * integrand(low + half * (2 * k + 1 + z)) for k in range(panels) for z, w in RULE)


def rate(f, a, b):
    """Exponent of the tail: -log of f times the density, up to slow factors; in doubles, only to place points."""
    return (a + b) * math.log1p(a / (a + b) * (f - 1)) - a * math.log(f) if f > 0 else math.inf


def point_at(target, a, b, upper):
    low, high = (1.0, 1e300) if upper else (1e-300, 1.0)
    if rate(high if upper else low, a, b) < target:
        return None
    for _ in range(200):
        middle = math.sqrt(low) * math.sqrt(high)
        if (rate(middle, a, b) > target) == upper:
            high = middle
        else:
            low = middle
    return float('%.7g' % high)


def text(v, digits=32):
    return mp.nstr(v, digits, min_fixed=0, max_fixed=0)


def f_points():
    rng = random.Random(20240229)
    points = []
    for a2 in [0.5, 1, 1.7, 2, 3, 7, 40, 199.3, 3000]:
        for b2 in [1, 1.5, 2, 5, 12.25, 100, 999.5, 1e4, 1e6, 1e7, 1e8, 3.3e10]:
            for target in [0.02, 0.6, 5, 60, 300, 695]:
                if rng.random() < 0.62:
                    points.append((point_at(target, a2 / 2, b2 / 2, True), a2, b2))
            for target in [0.02, 0.6, 5, 60, 695]:
                if rng.random() < 0.3:
                    points.append((point_at(target, a2 / 2, b2 / 2, False), a2, b2))
            if rng.random() < 0.4:
                points.append((point_at(rng.choice([2000, 9000, 46000]), a2 / 2, b2 / 2, True), a2, b2))
            points.append((rng.choice([1.0, 1.0000001, 0.9999, 1.03, 0.97]), a2, b2))
    for _ in range(120):
        a2 = float('%.5g' % math.exp(rng.uniform(math.log(0.5), math.log(3000))))
        b2 = float('%.5g' % math.exp(rng.uniform(0, math.log(1e8))))
        points.append((point_at(math.exp(rng.uniform(-3, 6.5)), a2 / 2, b2 / 2, rng.random() < 0.7), a2, b2))
    for f, a2, b2 in [(3.49, 2, 1e8), (3.49, 1, 1e12), (1.2, 5000, 5000), (0.8, 2e4, 3e5), (1.01, 1e5, 1e6), (4, 0.1, 50), (30, 0.05, 0.2), (0.1, 0.02, 3), (1.5, 7, 0.3), (1.0003, 3e7, 5e7), (0.9996, 3e7, 1e9), (1.00001, 1e10, 3e12), (0.999, 2.5e6, 1e8), (1.2, 5e6, 5e6), (1.004, 2.1e6, 1e12), (0.99, 3e6, 4e6), (1.03, 1e7, 3e6), (0.9999, 4e8, 2e7), (1.0, 1e7, 4e6), (1.0, 4e6, 1e7), (1e-20, 3, 8), (1e20, 3, 8)]:
        points.append((float(f), float(a2), float(b2)))
    return [p for p in points if p[0] is not None]


def f_row(p):
    f, a2, b2 = p
    lower, upper, ld = f_tails(f, a2, b2)
    row = [repr(f), repr(float(a2)), repr(float(b2)), text(upper), text(lower), text(mp.log(upper) if upper < 0.5 else mp.log1p(-lower))]
    inverse = None
    if mpf('1e-300') < upper and lower > mpf('1e-8'):
        rounded = float(upper)
        inverse = [repr(rounded), repr(float(a2)), repr(float(b2)), text(mpf(f) * mp.exp((upper - mpf(rounded)) / mp.exp(ld)))]
    return row, inverse


def t_row(p):
    t, df = p
    lower, upper, ld = f_tails(mpf(t) ** 2, 1, df)
    row = [repr(t), repr(df), text(upper), text(mp.log(upper) if upper < 0.5 else mp.log1p(-lower))]
    inverse = None
    if mpf('1e-299') < upper and lower > mpf('1e-8'):
        rounded = float(upper / 2)
        inverse = [repr(rounded), repr(df), text(mpf(t) * mp.exp((upper - 2 * mpf(rounded)) / mp.exp(ld) / 2))]
    return row, inverse


def chi_row(p):
    x, df = p
    lower, upper = gamma_tails(mpf(x) / 2, mpf(df) / 2)
    return [repr(x), repr(df), text(upper), text(mp.log(upper) if upper < 0.5 else mp.log1p(-lower))]


def normal_row(z):
    upper = mp.erfc(mpf(z) / mp.sqrt(2)) / 2
    row = [repr(z), text(upper)]
    inverse = None
    if z <= 0 or upper > mpf('1e-9'):
        # P(Z <= root) = rounded; the lower tail at z is the upper tail at -z
        lower = mp.erfc(-mpf(z) / mp.sqrt(2)) / 2
        rounded = float(lower)
        density = mp.exp(-mpf(z) ** 2 / 2) / mp.sqrt(2 * mp.pi)
        inverse = [repr(rounded), text(mpf(z) + (mpf(rounded) - lower) / density)] if rounded > 1e-300 else None
    return row, inverse


def noncentral_points():
    rng = random.Random(7)
    points = []
    for a2 in [0.5, 1, 2, 5.5, 30, 300, 3000]:
        for b2 in [1, 3.5, 12.25, 100, 1998, 1e5, 1e6, 1e8]:
            for lam in [1e-3, 0.03, 0.4, 2.2, 12.5, 80, 1000, 20000]:
                if rng.random() < (0.2 if lam > 5000 else 0.9):
                    spread = (2 * (a2 + 2 * lam) / a2 ** 2 + 2 * (1 + lam / a2) ** 2 / b2) ** 0.5
                    mean = 1 + lam / a2
                    z = rng.choice([-30, -8, -4, -1.6, -0.5, 0.7, 2.5, 6, 15, 40])
                    f = mean + z * spread if z > 0 or mean + z * spread > 0 else mean * math.exp(z * min(2, spread / mean) / 2)
                    points.append((float('%.6g' % f), float(a2), float(b2), float(lam)))
    for lam in [1e5, 1e5, 1e5, 3e5]:
        a2, b2 = rng.choice([1.0, 12.0, 250.5]), rng.choice([45.5, 1e4, 1e7])
        f = (1 + lam / a2) * (1 + rng.choice([-1, 1]) * rng.uniform(3, 25) * ((4 / lam) + 2 / b2) ** 0.5)
        points.append((float('%.6g' % abs(f)), a2, b2, lam))
    for lam, b2 in [(1e6, 33.5), (1e6, 1e4), (1e6, 1e8), (1e6, 1e8), (1e7, 55.5), (1e7, 1e6), (1e7, 3e8), (3e7, 999.5), (3e7, 1e6)]:
        a2 = rng.choice([0.7, 3.0, 41.0])
        f = (1 + lam / a2) * (1 + rng.choice([-1, 1]) * rng.uniform(1, 20) * ((4 / lam) + 2 / b2) ** 0.5 * 0.7)
        points.append((float('%.9g' % abs(f)), a2, b2, lam))
    points += [(1.5, 2.0, 20.0, 2.2), (0.4, 1.0, 199998.0, 12.5), (1e-12, 3.0, 50.0, 9.0), (400.0, 1.0, 1e6, 30.0), (600.0, 2.0, 1e8, 4.0), (0.9, 8.0, 0.7, 3.0)]
    return points


def laguerre_points():
    rng = random.Random(11)
    points = []
    for lam in [3e-9, 0.5, 40, 5000, 1e5, 1e6, 3e7, 1e8, 1e10, 1e15, 1e23, 1e30]:
        for a2 in [0.5, 1, 6, 77.7, 3000]:
            for b2 in [2, 6, 40, 200]:
                if rng.random() < 0.8:
                    factor = math.exp(rng.choice([-3, -1, -0.4, 0, 0.5, 2]) * min(1.0, 3 / math.sqrt(b2)) * rng.uniform(0.5, 1.5))
                    points.append((float('%.6g' % ((1 + lam / a2) * factor)), float(a2), float(b2), float(lam)))
    return points


def in_range(v):
    return mpf('1e-305') < v


def noncentral_row(p):
    f, a2, b2, lam = p
    lower, upper, slope = mixture(f, a2, b2, lam)
    row = [repr(f), repr(a2), repr(b2), repr(lam), text(lower), text(upper)]
    inverse = []
    central = f_tails(f, a2, b2)
    # Only where the inverse is well posed: the value must differ from the central one by a thousandth of itself.
    if in_range(lower) and central[0] - lower > mpf('1e-3') * min(lower, upper) and upper > mpf('1e-4'):
        c = float(lower)
        inverse.append(['cumulative', repr(f), repr(a2), repr(b2), repr(c), text(mpf(lam) + (lower - mpf(c)) / slope)])
    if in_range(upper) and central[0] - lower > mpf('1e-3') * min(lower, upper) and lower > mpf('1e-4'):
        c = float(upper)
        inverse.append(['power', repr(f), repr(a2), repr(b2), repr(c), text(mpf(lam) - (upper - mpf(c)) / slope)])
    return row, inverse


def laguerre_row(p):
    f, a2, b2, lam = p
    lower, upper = laguerre(f, a2, b2, lam)
    return [repr(f), repr(a2), repr(b2), repr(lam), text(lower), text(upper)]


def apart(u, v):
    return abs(u - v) / abs(v)


def checks():
    """Largest relative disagreement of each routine with a second one."""
    central = mpf(0)
    rng = random.Random(5)
    for _ in range(25):
        f, a2, b2 = rng.uniform(0.2, 5), rng.uniform(0.5, 60), rng.uniform(1, 60)
        lower, upper, _d = f_tails(f, a2, b2)
        x = mpf(a2) * mpf(f) / (mpf(a2) * mpf(f) + mpf(b2))
        central = max(central, apart(mp.betainc(mpf(a2) / 2, mpf(b2) / 2, 0, x, regularized=True), lower))
        for route in ('series', 'quadrature'):
            other = f_tails(f, a2, b2, route)
            central = max(central, apart(other[0], lower), apart(other[1], upper))
    for f, a2, b2 in [(1.5, 7, 1500), (1.02, 300, 4000.5), (4, 1, 700), (0.9, 3000, 1e8), (0.3, 40, 1e6)]:
        one, two = f_tails(f, a2, b2, 'series'), f_tails(f, a2, b2, 'quadrature')
        central = max(central, apart(one[0], two[0]), apart(one[1], two[1]))
    gamma = mpf(0)
    for q, a in [(0.3, 0.5), (3, 2.25), (80, 30), (25, 30.5), (900, 2)]:
        gamma = max(gamma, apart(gamma_tails(q, a)[1], mp.gammainc(mpf(a), mpf(q), regularized=True)))
    mixed = mpf(0)
    for f, a2, b2, lam in [(1.5, 2.0, 20.0, 2.2), (7.0, 5.5, 100.0, 80.0), (30.0, 30.0, 12.0, 300.0), (90.0, 1.0, 6.0, 5.0)]:
        one, two = mixture(f, a2, b2, lam), laguerre(f, a2, b2, lam)
        mixed = max(mixed, apart(one[0], two[0]), apart(one[1], two[1]))
    normal = mpf(0)
    for f, b2, lam in [(2.0, 30.5, 9.0), (40.0, 12.25, 60.0)]:
        normal = max(normal, apart(mixture(f, 1, b2, lam)[0], scaled_normal(f, b2, lam)))
    return central, gamma, mixed, normal


def write(name, what, columns, rows, disagreement):
    with open(os.path.join(HERE, name), 'w', encoding='utf-8', newline='\n') as out:
        out.write('# %s. make_values.py; Python %s, mpmath %s (%s), %d digits; second route agrees to %s\n'
                  % (what, platform.python_version(), mpmath.__version__, mpmath.libmp.BACKEND, mp.dps, mp.nstr(disagreement, 2)))
        out.write(','.join(columns) + '\n')
        for row in rows:
            out.write(','.join(row) + '\n')
    print(name, len(rows), flush=True)


def main():
    wanted = set(sys.argv[1:])
    central, gamma, mixed, normal = checks()
    print('checks', [mp.nstr(v, 3) for v in (central, gamma, mixed, normal)], flush=True)
    assert max(central, gamma, mixed, normal) < mpf('1e-50')
    rng = random.Random(3)
    with multiprocessing.Pool(2) as pool:
        if not wanted or 'f' in wanted:
            both = pool.map(f_row, f_points(), 8)
            write('fisher_f.csv', 'F distribution', ['f', 'df1', 'df2', 'survival', 'cumulative', 'log_survival'], [r for r, _ in both], central)
            write('fisher_f_quantile.csv', 'F quantiles', ['p', 'df1', 'df2', 'f'], [i for _, i in both if i], central)
        if not wanted or 't' in wanted:
            points = []
            for df in [0.5, 1, 2, 2.7, 5, 11.3, 30, 100, 998.5, 1e4, 1e6, 1e8, 2e11]:
                for t in [1e-3, 0.05, 0.3, 0.67, 1, 1.3, 1.65, 1.96, 2.3, 2.6, 3.3, 4.5, 6, 8.4, 11, 15, 22, 30, 37, 60, 120, 250, 1e3, 1e6, 1e30, 1e140]:
                    if t * t < 46000 * 3 or df < 20:
                        points.append((float('%.9g' % (t * rng.uniform(0.9, 1.1))), float(df)))
            both = pool.map(t_row, points, 8)
            write('student_t.csv', 't distribution, both tails', ['t', 'df', 'two_sided', 'log_two_sided'], [r for r, _ in both], central)
            write('student_t_quantile.csv', 't quantiles, upper tail', ['p', 'df', 't'], [i for _, i in both if i], central)
        if not wanted or 'c' in wanted:
            points = []
            for df in [0.5, 1, 2, 3, 5.5, 10, 33, 100, 1000.5, 1e4, 1e6]:
                for z in [-12, -5, -2, -0.7, -0.1, 0.1, 0.9, 2, 3, 4.5, 6, 9, 13, 20, 28, 36, 60, 120, 200]:
                    # the cube-root normal approximation, only to place points
                    root = 1 - 2 / (9 * df) + z * rng.uniform(0.9, 1.1) * math.sqrt(2 / (9 * df))
                    if root > 0:
                        points.append((float('%.8g' % (df * root ** 3)), float(df)))
                for share in [1e-6, 0.1, 0.5, 1, 2, 10, 50]:
                    points.append((float('%.8g' % (df * share)), float(df)))
            write('chi_squared.csv', 'chi-squared distribution', ['x', 'df', 'survival', 'log_survival'], pool.map(chi_row, points, 8), gamma)
        if not wanted or 'z' in wanted:
            zs = [float('%.7g' % rng.uniform(-38, 38)) for _ in range(250)] + [float('%.7g' % rng.gauss(0, 2)) for _ in range(250)]
            zs += [0.0, 1e-9, -1e-9, 1.959963984540054, 37.5, -37.5]
            both = pool.map(normal_row, zs, 8)
            write('standard_normal.csv', 'normal upper tail', ['z', 'upper_tail'], [r for r, _ in both], mpf(0))
            write('standard_normal_quantile.csv', 'normal quantiles', ['p', 'z'], [i for _, i in both if i], mpf(0))
        if not wanted or 'n' in wanted:
            both = pool.map(noncentral_row, noncentral_points(), 1)
            rows = [r for r, _ in both] + pool.map(laguerre_row, laguerre_points(), 4)
            write('noncentral_f.csv', 'noncentral F (mixture, then Laguerre sums)', ['f', 'df1', 'df2', 'lambda', 'cumulative', 'survival'], rows, max(mixed, normal))
            write('noncentral_f_inverse.csv', 'noncentrality with this cumulative or power', ['kind', 'f', 'df1', 'df2', 'p', 'lambda'], [i for _, each in both for i in each], max(mixed, normal))


if __name__ == '__main__':
    main()
