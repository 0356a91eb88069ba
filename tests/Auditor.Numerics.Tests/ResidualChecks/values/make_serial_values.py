"""Values for the tests of the checks that need an order: /usr/bin/python3 make_serial_values.py > serial.json

Durbin-Watson: d from its definition, p by Imhof's integral over the eigenvalues of M A M (mpmath, 60 digits; trapezoid rule after u = exp(x); numpy's
eigenvalues for 2,000 rows). Breusch-Godfrey of weighted rows and Ljung-Box: numpy from the definitions. Unit root: statsmodels' coint, adfuller,
mackinnoncrit, mackinnonp. Data are sums of sines, or walks from Knuth's 64-bit linear congruential generator (multiplier 6364136223846793005, increment
1442695040888963407; the top 53 bits), so that nothing but this script makes them.
"""
import json
import sys
import mpmath as mp
import numpy as np
import scipy
import statsmodels
from statsmodels.tsa.adfvalues import mackinnoncrit, mackinnonp
from statsmodels.tsa.stattools import adfuller, coint

mp.mp.dps = 60


def uniforms(count, seed):
    values, state = [], seed
    for _ in range(count):
        state = (state * 6364136223846793005 + 1442695040888963407) % 2**64
        values.append((state >> 11) / 2**53 - 0.5)
    return np.array(values)


def differences(units, periods):
    order = sorted(range(len(units)), key=lambda i: (units[i], periods[i]))
    a = np.zeros((len(units), len(units)))
    for i, j in zip(order, order[1:]):
        if units[i] == units[j] and periods[j] == periods[i] + 1:
            a[i, i] += 1
            a[j, j] += 1
            a[i, j] -= 1
            a[j, i] -= 1
    return a


def imhof(eigenvalues, step):
    """P(sum of eigenvalue times chi-square on 1 < 0)."""
    total, x = mp.mpf(0), mp.mpf(-110)
    while x < 60:
        u = mp.e ** x
        theta = sum(mp.atan(v * u) for v in eigenvalues) / 2
        rho = sum(mp.log1p((v * u) ** 2) for v in eigenvalues) / 4
        if rho > 120:
            break
        total += mp.sin(theta) * mp.exp(-rho)
        x += step
    return mp.mpf(1) / 2 - total * step / mp.pi


def imhof_double(eigenvalues):
    x = np.arange(-40, 20, 0.05)
    u = np.exp(x)
    theta = np.arctan(np.outer(u, eigenvalues)).sum(axis=1) / 2
    rho = np.log1p(np.outer(u, eigenvalues) ** 2).sum(axis=1) / 4
    return 0.5 - (np.sin(theta) * np.exp(-rho)).sum() * 0.05 / np.pi


def durbin_watson(name, columns, y, units, periods):
    n = len(y)
    x = np.column_stack([np.ones(n)] + columns)
    a = differences(units, periods)
    e = y - x @ np.linalg.lstsq(x, y, rcond=None)[0]
    d = e @ a @ e / (e @ e)
    if n <= 60:
        xm = mp.matrix(x.tolist())
        m = mp.eye(n) - xm * ((xm.T * xm) ** -1) * xm.T
        em = m * mp.matrix(y.tolist())
        am = mp.matrix(a.tolist())
        dm = (em.T * am * em)[0] / (em.T * em)[0]
        values = sorted(mp.eigsy(m * (am - dm * mp.eye(n)) * m, eigvals_only=True), key=abs)[x.shape[1]:]
        p = float(imhof(values, mp.mpf(1) / 20))
        d = float(dm)
    else:
        q = np.linalg.qr(x)[0]
        m = np.eye(n) - q @ q.T
        values = np.linalg.eigvalsh(m @ (a - d * np.eye(n)) @ m)
        p = float(imhof_double(values[np.argsort(abs(values))[x.shape[1]:]]))
    return dict(name=name, columns=[list(c) for c in columns], response=list(y), units=units, periods=periods, d=float(d), p=p)


def durbin_watson_cases():
    t = np.arange(40.0)
    one = [0] * 40
    noise = uniforms(40, 11)
    smooth = np.sin(0.3 * t) + 0.02 * noise
    alternating = np.where(t % 2 == 0, 1.0, -1.0) + 0.3 * noise
    units = [int(i) // 10 for i in t]
    gaps = [int(i) % 10 + (3 if i % 10 > 6 else 0) for i in t]
    dummies = [np.array([1.0 * (u == k) for u in units]) for k in (1, 2, 3)]
    shuffled = [(7 * i) % 40 for i in range(40)]
    long = np.arange(2000.0)
    rough = uniforms(2000, 12)
    mild = rough + 0.05 * np.concatenate([[0], rough[:-1]])
    return [
        durbin_watson('trend, smooth residuals', [t, uniforms(40, 13)], 1 + 0.1 * t + smooth, one, list(range(40))),
        durbin_watson('noise', [t, uniforms(40, 13)], 1 + 0.1 * t + noise, one, list(range(40))),
        durbin_watson('alternating residuals', [t, uniforms(40, 13)], 1 + 0.1 * t + alternating, one, list(range(40))),
        durbin_watson('rows out of order', [t, uniforms(40, 13)], 1 + 0.1 * t + noise, one, shuffled),
        durbin_watson('four units with gaps', dummies + [uniforms(40, 14)], noise + 0.3 * np.sin(t), units, gaps),
        durbin_watson('two residual directions', [t[:5] ** k for k in (1, 2)], np.array([1.0, 3, 2, 5, 4]), [0] * 5, list(range(5))),
        durbin_watson('2,000 rows', [np.sin(long / 300)], mild, [0] * 2000, list(range(2000))),
    ]


def weighted_godfrey():
    n = 40
    t = np.arange(float(n))
    w, x = 1 + t % 4, uniforms(n, 21)
    y = 1 + x + np.sin(0.9 * t)
    root = np.sqrt(w)
    f = np.column_stack([root, root * x])
    e = root * y - f @ np.linalg.lstsq(f, root * y, rcond=None)[0]
    lags = [np.concatenate([np.zeros(k), e[:-k]]) for k in range(1, 5)]
    g = np.column_stack([f] + lags)
    u = e - g @ np.linalg.lstsq(g, e, rcond=None)[0]
    return dict(column=list(x), response=list(y), weights=list(w), statistic=float(n * (1 - u @ u / (e @ e))))


def unit_root_cases():
    cases = []
    for name, n, walks, trend, share in [
            ('one walk', 120, 1, 'c', 1.0), ('three walks', 200, 3, 'c', 1.0), ('trend', 90, 2, 'ct', 0.6), ('both trends', 90, 2, 'ctt', 0.8), ('short', 25, 1, 'c', 0.2)]:
        x = [np.cumsum(uniforms(n, 100 + 10 * n + k)) for k in range(walks)]
        e, shock = np.zeros(n), uniforms(n, 900 + n)
        for i in range(1, n):
            e[i] = share * e[i - 1] + shock[i]
        y = 1 + sum(x) + e
        t, p, _ = coint(y, np.column_stack(x), trend=trend)
        full = np.column_stack(x + [np.ones(n)] + [np.arange(1.0, n + 1) ** k for k in range(1, len(trend))])
        residual = y - full @ np.linalg.lstsq(full, y, rcond=None)[0]
        lags = adfuller(residual, regression='n')[2]
        cases.append(dict(name=name, columns=[list(c) for c in x], response=list(y), trend=trend, t=float(t), p_large_sample=float(p), lags=int(lags)))
    return cases


def simulated(trend, series, n, cuts, draws=400000, block=4000):
    """Share of draws of unrelated normal walks, n values each, whose statistic without lags is at most each cut."""
    generator, hits = np.random.default_rng(20260101), np.zeros(len(cuts))
    time = np.column_stack([np.arange(1.0, n + 1) ** k for k in range(len(trend))])
    q = np.linalg.qr(time)[0]
    for _ in range(draws // block):
        walks = np.cumsum(generator.standard_normal((block, n, series)), axis=1)
        walks -= q @ (q.T @ walks)
        y, x = walks[:, :, 0], walks[:, :, 1:]
        b = np.linalg.solve(x.transpose(0, 2, 1) @ x, x.transpose(0, 2, 1) @ y[:, :, None])
        e = y - (x @ b)[:, :, 0]
        before, change = e[:, :-1], np.diff(e, axis=1)
        slope = (before * change).sum(axis=1) / (before ** 2).sum(axis=1)
        rest = change - slope[:, None] * before
        t = slope * np.sqrt((before ** 2).sum(axis=1)) / np.sqrt((rest ** 2).sum(axis=1) / (n - 2))
        hits += [(t <= cut).sum() for cut in cuts]
    return dict(trend=trend, series=series, observations=n - 1, draws=draws, t=list(cuts), p=list(hits / draws))


def critical_values():
    return [dict(trend=trend, series=series, observations=n, values=[float(v) for v in mackinnoncrit(N=series, regression=trend, nobs=n)])
            for trend in ('c', 'ct', 'ctt') for series in range(1, 13) for n in (25, 100, 500)]


def large_sample_p():
    return [dict(trend=trend, series=series, t=float(t), p=float(mackinnonp(t, regression=trend, N=series)))
            for trend in ('c', 'ct', 'ctt') for series in range(1, 7) for t in np.arange(-8, -0.4, 0.5)]


json.dump(dict(
    made_by=f'Python {sys.version.split()[0]}, numpy {np.__version__}, scipy {scipy.__version__}, statsmodels {statsmodels.__version__}, mpmath {mp.__version__}',
    durbin_watson=durbin_watson_cases(), weighted_breusch_godfrey=weighted_godfrey(), unit_root=unit_root_cases(),
    simulated=[simulated('c', 2, 25, (-4.5, -4.0, -3.5, -3.0, -2.5, -2.0)), simulated('ct', 3, 90, (-5.9, -5.0, -4.5, -4.0, -3.5, -3.0)),
               simulated('c', 5, 40, (-5.5, -5.0, -4.5, -4.0, -3.5, -3.0))],
    critical_values=critical_values(), large_sample_p=large_sample_p()), sys.stdout, indent=1)
