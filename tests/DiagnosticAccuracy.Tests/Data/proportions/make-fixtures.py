"""Reference values for one and two proportions, made with mpmath (110 digits) and numpy, by definitions and not by closed forms.

    python3 make-fixtures.py > fixtures.csv        (mpmath 1.2.1, numpy 1.24; about two minutes)

Grade R: recomputed with general-purpose routines, never published.

Binomial and hypergeometric tails are summed term by term; limits are found by bisection; restricted maxima of the likelihood are
found by bisection on its derivative, not by the closed form of a quadratic or cubic.

columns: kind, method, x1, n1, x2, n2, error (two-sided error probability), lower, upper
For kind "test" the columns lower and upper hold the statistic and the one-sided p-value, and error holds the bound on the difference.
"""
import sys
from mpmath import mp, mpf, binomial, log, exp, sqrt, erfinv, ncdf, inf, loggamma, betainc
import numpy as np

mp.dps = 110


def z_of(error):
    error = mpf(error)
    return mp.findroot(lambda z: log(mp.erfc(z / sqrt(2)) / error), float(sqrt(max(-2 * log(error), mpf(1)))) * 0.9)


def bisect(f, lo, hi, steps=190):
    """f rises or falls between lo and hi; returns the sign change."""
    rising = f(hi) > 0
    for _ in range(steps):
        mid = (lo + hi) / 2
        if (f(mid) > 0) == rising:
            hi = mid
        else:
            lo = mid
        if hi - lo < mpf(10) ** -40 * abs(hi):
            break
    return (lo + hi) / 2


def bisect_log(f, lo, hi):
    return exp(bisect(lambda t: f(exp(t)), log(lo), log(hi)))


TINY = mpf(10) ** -120


def tail(x, n, p, upto):
    """P(X <= x) when upto, else P(X >= x), summed over the side with fewer terms."""
    x, n = int(x), int(n)
    if upto:
        terms = range(0, x + 1)
        rest = range(x + 1, n + 1)
    else:
        terms = range(x, n + 1)
        rest = range(0, x)

    def total(r):
        if len(r) == 0:
            return mpf(0)
        k = r[0]
        t = exp(loggamma(n + 1) - loggamma(k + 1) - loggamma(n - k + 1) + k * log(p) + (n - k) * mp.log1p(-p))
        s = t
        for k in r[1:]:
            t = t * (n - k + 1) / k * p / (1 - p)
            s += t
        return s

    return total(terms) if len(terms) <= len(rest) else 1 - total(rest)


def binomial_limits(x, n, error, share):
    """share of the observed count in each tail: 1 exact, 1/2 mid-P."""
    a = mpf(error) / 2
    up = lambda p: (1 - share) * tail(x + 1, n, p, False) + share * tail(x, n, p, False)
    down = lambda p: (1 - share) * tail(x - 1, n, p, True) + share * tail(x, n, p, True)
    lower = mpf(0) if x == 0 else bisect_log(lambda p: up(p) - a, TINY, 1 - mpf(10) ** -45)
    upper = mpf(1) if x == n else bisect_log(lambda p: down(p) - a, TINY, 1 - mpf(10) ** -45)
    return lower, upper


def jeffreys(x, n, error):
    a = mpf(error) / 2
    f = lambda p: betainc(x + mpf(1) / 2, n - x + mpf(1) / 2, 0, p, regularized=True)
    g = lambda p: betainc(x + mpf(1) / 2, n - x + mpf(1) / 2, p, 1, regularized=True)
    lower = mpf(0) if x == 0 else bisect_log(lambda p: f(p) - a, TINY, 1 - mpf(10) ** -45)
    upper = mpf(1) if x == n else bisect_log(lambda p: g(p) - a, TINY, 1 - mpf(10) ** -45)
    return lower, upper


def xlogy(x, y):
    return mpf(0) if x == 0 else x * log(y)


def likelihood(x, n, error):
    z = z_of(error)
    ph = mpf(x) / n
    best = xlogy(x, ph) + xlogy(n - x, 1 - ph)
    dev = lambda p: 2 * (best - xlogy(x, p) - xlogy(n - x, 1 - p)) - z * z
    lower = mpf(0) if x == 0 else bisect_log(dev, TINY, ph if x < n else mpf(1) - mpf(10) ** -49)
    upper = mpf(1) if x == n else bisect_log(dev, ph if x > 0 else TINY, 1 - mpf(10) ** -49)
    return lower, upper


def score(x1, n1, x2, n2, p1_of, contrast, lo, hi, factor):
    """Statistic under p1 = p1_of(p2): contrast is (p1hat - p1_of(p2hat)), slope squared multiplies the second variance."""
    d1 = (p1_of(mpf(1)) - p1_of(mpf(0)))
    derivative = lambda p: (0 if x1 == 0 else x1 * d1 / p1_of(p)) - (0 if x1 == n1 else (n1 - x1) * d1 / (1 - p1_of(p))) \
        + (0 if x2 == 0 else x2 / p) - (0 if x2 == n2 else (n2 - x2) / (1 - p))
    e = (hi - lo) * mpf(10) ** -45
    if derivative(lo + e) <= 0:
        p2 = lo
    elif derivative(hi - e) >= 0:
        p2 = hi
    else:
        p2 = bisect(derivative, lo + e, hi - e)
    p1 = p1_of(p2)
    v = (p1 * (1 - p1) / n1 + d1 * d1 * p2 * (1 - p2) / n2) * factor
    return contrast / sqrt(v)


def ratio_limits(x1, n1, x2, n2, error, corrected):
    z = z_of(error)
    factor = mpf(n1 + n2) / (n1 + n2 - 1) if corrected else mpf(1)
    p1, p2 = mpf(x1) / n1, mpf(x2) / n2
    s = lambda r: score(x1, n1, x2, n2, lambda p: r * p, p1 - r * p2, mpf(0), min(mpf(1), 1 / r), factor)
    est = p1 / p2 if x2 else None
    lower = mpf(0) if x1 == 0 else bisect_log(lambda r: s(r) - z, mpf(10) ** -12, (est if est else mpf(10) ** 12) * (1 - mpf(10) ** -20))
    upper = inf if x2 == 0 else bisect_log(lambda r: s(r) + z, (est if est else mpf(10) ** -12) * (1 + mpf(10) ** -20), mpf(10) ** 12)
    return lower, upper


def difference_score(x1, n1, x2, n2, d, factor):
    return score(x1, n1, x2, n2, lambda p: p + d, mpf(x1) / n1 - mpf(x2) / n2 - d, max(mpf(0), -d), min(mpf(1), 1 - d), factor)


def difference_limits(x1, n1, x2, n2, error, corrected):
    z = z_of(error)
    factor = mpf(n1 + n2) / (n1 + n2 - 1) if corrected else mpf(1)
    est = mpf(x1) / n1 - mpf(x2) / n2
    e = mpf(10) ** -40
    s = lambda d: difference_score(x1, n1, x2, n2, d, factor)
    lower = mpf(-1) if est == -1 else bisect(lambda d: s(d) - z, -1 + e, est - e, 140)
    upper = mpf(1) if est == 1 else bisect(lambda d: s(d) + z, est + e, 1 - e, 140)
    return lower, upper


def odds_limits(a, b, c, d, error, share):
    """Sums the noncentral hypergeometric terms."""
    alpha = mpf(error) / 2
    s, n1, n2 = a + c, a + b, c + d
    lo, hi = max(0, s - n2), min(n1, s)
    width = 40 * int((1 / (1 / (a + 1.0) + 1 / (b + 1.0) + 1 / (c + 1.0) + 1 / (d + 1.0))) ** 0.5 + 3)
    ks = [k for k in range(max(lo, a - width), min(hi, a + width) + 1)]
    base = loggamma(a + 1) + loggamma(b + 1) + loggamma(c + 1) + loggamma(d + 1)
    w = {k: exp(base - loggamma(k + 1) - loggamma(n1 - k + 1) - loggamma(s - k + 1) - loggamma(n2 - s + k + 1)) for k in ks}

    def tails(theta):
        below = above = mpf(0)
        for k in ks:
            t = w[k] * exp((k - a) * theta)
            if k < a:
                below += t
            elif k > a:
                above += t
        return below, above

    def up(theta):
        below, above = tails(theta)
        return (above + share) / (above + below + 1) - alpha

    def down(theta):
        below, above = tails(theta)
        return (below + share) / (above + below + 1) - alpha

    est = log((a + mpf(1) / 2) * (d + mpf(1) / 2) / ((b + mpf(1) / 2) * (c + mpf(1) / 2)))
    se = sqrt(sum(1 / (v + mpf(1) / 2) for v in (a, b, c, d)))
    reach = z_of(error) * se * 4 + 2
    steps = 110 if len(ks) < 400 else 60
    lower = mpf(0) if a == lo else exp(bisect(up, est - reach, est + reach, steps))
    upper = inf if a == hi else exp(bisect(down, est - reach, est + reach, steps))
    return lower, upper


def odds_limits_large(a, b, c, d, error, share):
    """The same for large cells, with extended doubles and cumulated ratios of neighbouring terms."""
    a, b, c, d = (np.longdouble(v) for v in (a, b, c, d))
    sd = float(1 / np.sqrt(1 / a + 1 / b + 1 / c + 1 / d))
    j = np.arange(0, int(12 * sd), dtype=np.longdouble)

    def one_side(a, b, c, d, theta):
        # sum over k above a of t(k)/t(a)
        logs = np.cumsum(np.log((b - j) / (a + 1 + j)) + np.log((c - j) / (d + 1 + j)) + theta)
        return np.sum(np.exp(logs))

    alpha = np.longdouble(error) / 2

    def excess(theta, sides):
        above = one_side(a, b, c, d, theta)
        below = one_side(b, a, d, c, -theta)
        mine = above if sides == "lower" else below
        return float(np.log((mine + share) / (above + below + 1)) - np.log(alpha))

    est = np.log(a / b * (d / c))
    out = []
    for side, sign in (("lower", -1), ("upper", 1)):
        # secant
        z = float(z_of(error))
        t0, t1 = est + sign * z / sd, est + sign * (z + 1e-3) / sd
        f0, f1 = excess(t0, side), excess(t1, side)
        for _ in range(6):
            if f1 == f0:
                break
            t2 = t1 - f1 * (t1 - t0) / (f1 - f0)
            t0, f0, t1 = t1, f1, t2
            if abs(t1 - t0) < 1e-19:
                break
            f1 = excess(t1, side)
        out.append(mpf(np.format_float_positional(np.exp(t1), precision=25, unique=False)))
    return out[0], out[1]


def show(v):
    return "inf" if v == inf else mp.nstr(v, 20, min_fixed=0, max_fixed=0) if v else "0"


def row(kind, method, x1, n1, x2, n2, error, pair):
    print(",".join([kind, method, str(x1), str(n1), str(x2), str(n2), error, show(pair[0]), show(pair[1])]))
    sys.stdout.flush()


print("kind,method,x1,n1,x2,n2,error,lower,upper")
for x, n in ((0, 1), (1, 1), (1, 2), (0, 30), (30, 30), (1, 30), (7, 30), (29, 30), (217, 231), (3, 1000), (997, 1000), (2, 1000000000)):
    for error in ("0.05", "0.2", "1e-12"):
        row("proportion", "ClopperPearson", x, n, 0, 0, error, binomial_limits(x, n, error, mpf(1)))
        row("proportion", "MidP", x, n, 0, 0, error, binomial_limits(x, n, error, mpf(1) / 2))
        row("proportion", "LikelihoodRatio", x, n, 0, 0, error, likelihood(x, n, error))
        if n <= 1000:
            row("proportion", "Jeffreys", x, n, 0, 0, error, jeffreys(x, n, error))

tables = ((36, 40, 16, 80), (0, 10, 3, 20), (5, 10, 0, 20), (10, 10, 20, 20), (1, 1, 0, 1), (0, 1, 1, 1), (29, 30, 30, 30), (7, 30, 1, 12),
          (1, 100000, 3, 100000), (99999, 100000, 99997, 100000), (950, 1000, 930, 1000),
          (999999999999, 1000000000000, 999999999990, 1000000000000), (1, 1000000000000, 3, 1000000000000))
for t in tables:
    for error in ("0.05", "0.2", "1e-6"):
        row("ratio", "Koopman", *t, error, ratio_limits(*t, error, False))
        row("ratio", "MiettinenNurminen", *t, error, ratio_limits(*t, error, True))

for t in tables + ((0, 10, 0, 20), (20, 20, 10, 10), (0, 1, 0, 1), (10, 10, 0, 20), (1, 5, 9, 9)):
    for error in ("0.05", "0.2", "1e-6"):
        row("difference", "Mee", *t, error, difference_limits(*t, error, False))
        row("difference", "MiettinenNurminen", *t, error, difference_limits(*t, error, True))
    for bound in ("-0.1", "0", "0.05"):
        d = mpf(bound)
        x1, n1, x2, n2 = t
        if bound == "0" and (x1 + x2 == 0 or x1 + x2 == n1 + n2):
            continue
        s = difference_score(*t, d, mpf(1))
        row("test", "FarringtonManning", *t, bound, (s, mp.erfc(s / sqrt(2)) / 2))

# The pairs of Newcombe 1998 (Stat Med 17:873), whose recomputed score limits in differences-independent.csv are good to 9e-10 only.
for t in ((56, 70, 48, 80), (9, 10, 3, 10), (6, 7, 2, 7), (5, 56, 0, 29), (0, 10, 0, 10), (10, 10, 0, 10)):
    row("difference", "Mee", *t, "0.05", difference_limits(*t, "0.05", False))
    row("difference", "MiettinenNurminen", *t, "0.05", difference_limits(*t, "0.05", True))

for t in ((90, 10, 20, 180), (3, 0, 1, 4), (0, 10, 1, 4), (1, 1, 1, 1), (2, 5, 7, 1), (0, 3, 4, 0), (12, 1, 0, 9), (1, 29, 28, 2), (815, 208, 115, 327),
          (30000, 20000, 10000, 10000), (5, 1000000, 1, 900000)):
    for error in ("0.05", "0.2", "1e-6"):
        if max(t) > 1000 and error == "1e-6" and min(t) > 1000:
            continue
        a, b, c, d = t
        row("odds", "ExactConditional", a, a + b, c, c + d, error, odds_limits(*t, error, mpf(1)))
        row("odds", "MidPConditional", a, a + b, c, c + d, error, odds_limits(*t, error, mpf(1) / 2))

for t in ((30000000, 20000000, 10000000, 10000000), (30000000000, 20000000000, 10000000000, 10000000000), (9000000000, 700000000000, 5000000000, 6000000000)):
    for error in ("0.05", "1e-6"):
        a, b, c, d = t
        row("odds", "ExactConditional", a, a + b, c, c + d, error, odds_limits_large(*t, error, 1))
        row("odds", "MidPConditional", a, a + b, c, c + d, error, odds_limits_large(*t, error, 0.5))
