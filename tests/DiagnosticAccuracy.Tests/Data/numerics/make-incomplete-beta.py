#!/usr/bin/env python3
"""Reference values of the regularised incomplete beta function, its quantile and the binomial density.

Writes incomplete-beta.csv, incomplete-beta-quantile.csv, binomial-density.csv and special-functions.csv (the
elementary and gamma functions used by them) beside this script, in a minute or two.
Needs mpmath only. Every input is a double, and mpmath is given exactly that double.

How the values are found (DIGITS significant digits are printed):

  series   I_x(a,b) = x^a (1-x)^b / (a B(a,b)) * 2F1(a+b, 1; a+1; x); all the terms are positive. Summed
           in fixed point with integers, for the tail whose series is the shorter one. The other tail is
           the complement to 1, taken with enough bits that at least 60 digits of it remain.
  panel    for large shapes, the ratio tail / (x^a y^b / B) = integral over s > 0 of
           exp(-a s - (a+b) log(y + x exp(-s))) by a 120 point Gauss-Legendre rule with 90 digits.

Every row of incomplete-beta.csv for which both are affordable is computed by both, and the script stops
when they differ by more than 1e-45. Of the rows with shapes up to 1000 every fifth is compared with mpmath's
betainc at 400 digits (a hypergeometric series in other parameters), to 1e-55. Quantiles are Newton steps on the
logarithm of the tail in the logit of x, with the same two evaluators, until a step is below 1e-55.
Binomial densities are the textbook formula with loggamma at 120 digits.
"""
import random
import sys
import os
from mpmath.libmp import MPZ
from mpmath import mp, mpf, loggamma, log, exp, sqrt, expm1, nstr

DIGITS = 50
HERE = os.path.dirname(os.path.abspath(__file__))
mp.dps = 120

SHAPES = [1e-3, 1e-2, .1, .5, 1.0, 2.5, 10.0, 100.0, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9]


def log_beta(a, b):
    with mp.workdps(140):
        return loggamma(a) + loggamma(b) - loggamma(a + b)


_norm = {}


def norm(a, b):
    key = (a, b)
    if key not in _norm:
        _norm[key] = log_beta(a, b)
    return _norm[key]


def log_prefix(a, b, x, y):
    """log of x^a y^b / B(a,b)."""
    return a * log(x) + b * log(y) - norm(a, b)


def series_length(a, b, x, y, bits):
    """Number of terms of 2F1(a+b,1;a+1;x) until a term is below 2^-bits of the first, and the largest term's log2."""
    with mp.workdps(40):
        lx = log(x)
        base = loggamma(a + 1) - loggamma(a + b)

        def lt(n):
            return (loggamma(a + b + n) + n * lx - loggamma(a + 1 + n) + base) / log(mpf(2))
        peak = mpf(0)
        # the ratio (a+b+n) x / (a+1+n) is 1 at n = ((a+b) x - a - 1) / y
        top = (b * x - a * y - 1) / y
        if top > 0:
            peak = lt(top)
        n = mpf(8) + max(top, 0)
        while lt(n) > -bits and n < mpf(10) ** 13:
            n *= 1.25
        return int(n), int(peak) + 1


def series_sum(a, b, x, bits, count):
    """2F1(a+b,1;a+1;x) by fixed point; the rational inputs are exact up to 2^-bits."""
    one = MPZ(1) << bits
    # shapes as exact rationals with a common power of two denominator
    sh = 0
    for v in (a, b):
        m, e = v.man_exp
        sh = max(sh, -e)
    ia = int(a * mpf(2) ** sh)
    ib = int(b * mpf(2) ** sh)
    unit = MPZ(1) << sh
    xi = MPZ(int(x * mpf(2) ** bits))
    num = MPZ(ia + ib)
    dnm = MPZ(ia) + unit
    term = one
    total = one
    for _ in range(count + 1):
        term = ((term * xi) >> bits) * num // dnm
        if term == 0:
            break
        total += term
        num += unit
        dnm += unit
    return mpf(int(total)) / mpf(int(one))


def tails_series(a, b, x, y, limit=3000000):
    """(lower, upper) or None when it would take too long."""
    best = None
    for side in (0, 1):
        aa, bb, xx, yy = (a, b, x, y) if side == 0 else (b, a, y, x)
        count, peak = series_length(aa, bb, xx, yy, 300)
        if best is None or count < best[0]:
            best = (count, peak, side, aa, bb, xx, yy)
    count, peak, side, aa, bb, xx, yy = best
    if count > limit:
        return None
    # size of the other tail decides the precision
    bits = 320 + peak
    for _ in range(3):
        count, peak = series_length(aa, bb, xx, yy, bits)
        if count > limit:
            return None
        with mp.workprec(bits + 200 + peak):
            f = series_sum(aa, bb, mpf(xx), bits, count)
            lbeta = loggamma(aa) + loggamma(bb) - loggamma(aa + bb)
            yyy = 1 - xx if abs(xx) < abs(yy) else yy
            xxx = xx if abs(xx) < abs(yy) else 1 - yy
            t = exp(aa * log(xxx) + bb * log(yyy) - lbeta) / aa * f
            other = 1 - t
            if other > 0 and other > mpf(2) ** (-(bits - peak - 230)):
                if side == 0:
                    return +t, +other
                return +other, +t
        bits += 1100
    return None


_rule = None


def rule():
    global _rule
    if _rule is None:
        n = 120
        out = []
        with mp.workdps(110):
            for i in range(1, n + 1):
                z = mp.cos(mp.pi * (mpf(i) - mpf(1) / 4) / (n + mpf(1) / 2))
                for _ in range(9):
                    p0, p1 = mpf(1), z
                    for k in range(2, n + 1):
                        p0, p1 = p1, ((2 * k - 1) * z * p1 - (k - 1) * p0) / k
                    dp = n * (z * p1 - p0) / (z * z - 1)
                    dz = p1 / dp
                    z -= dz
                    if abs(dz) < mpf(10) ** -100:
                        break
                out.append(((1 + z) / 2, 1 / ((1 - z * z) * dp * dp)))
        _rule = out
    return _rule


def tails_panel(a, b, x, y):
    """(lower, upper) by quadrature, for min(a,b) large; None otherwise."""
    if min(a, b) < 900:
        return None
    with mp.workdps(90):
        low = x * b <= y * a
        aa, bb, xx, yy = (a, b, x, y) if low else (b, a, y, x)
        lam = aa * yy - bb * xx
        var = (aa + bb) * xx * yy
        goal = mpf(150)
        top = 2 * goal / (lam + sqrt(lam * lam + 2 * goal * var))
        top *= 1 + top / 4
        n = aa + bb
        if xx < yy:
            f = [w * exp(-aa * top * t - n * mp.log1p(xx * expm1(-top * t))) for t, w in rule()]
        else:
            f = [w * exp(bb * top * t - n * mp.log1p(yy * expm1(top * t))) for t, w in rule()]
        t = exp(log_prefix(aa, bb, xx, yy)) * top * sum(f)
        return (t, 1 - t) if low else (1 - t, t)


checked = 0
checked_betainc = 0


def tails(a, b, x, y, thorough=False):
    global checked
    p = tails_panel(a, b, x, y)
    if p is not None and not thorough:
        return p
    s = tails_series(a, b, x, y, 400000 if p is not None else 3000000)
    if p is not None and s is not None:
        for u, v in zip(p, s):
            if min(u, v) > 0 and abs(u - v) > mpf(10) ** -45 * abs(v):
                raise SystemExit("routes differ: %s %s %s: %s %s" % (a, b, x, u, v))
        checked += 1
    r = s if s is not None else p
    return r


def start(a, b, p):
    """A logit of x near the p quantile (lower tail p <= 1/2); Abramowitz & Stegun 26.5.22 or the leading power."""
    lb = norm(a, b)
    power = (log(p) + log(a) + lb) / a
    if a < 1 or b < 1:
        if power < -1:
            return power
        if power < 0 and -a * expm1(power) > 1:
            # b < 1: I_x is between x^a / (a B) and x^a y^(b-1) / (a B)
            power += (1 - b) * log(-expm1(power)) / a
            return power - log(-expm1(power))
        up = (log(1 - p) + log(b) + lb) / b
        return -up if up < -1 else mpf(0)
    if (b - 1) * exp(power) / (a + 1) < 0.1:
        return power - mp.log1p(-exp(power))
    t = sqrt(-2 * log(p))
    z = t - (2.515517 + .802853 * t + .010328 * t * t) / (1 + 1.432788 * t + .189269 * t * t + .001308 * t ** 3)
    lam = (z * z - 3) / 6
    h = 2 / (1 / (2 * a - 1) + 1 / (2 * b - 1))
    w = z * sqrt(h + lam) / h - (1 / (2 * b - 1) - 1 / (2 * a - 1)) * (lam + mpf(5) / 6 - 2 / (3 * h))
    return max(log(a / b) - 2 * w, power)


def quantile(a, b, p, tol, most=200):
    """(x, y) with I_x(a,b) = p, or None."""
    w = start(a, b, p)
    for _ in range(most):
        if w < -5000 or w > 5000:
            return None
        x = 1 / (1 + exp(-w))
        y = 1 / (1 + exp(w))
        r = tails(a, b, x, y)
        if r is None or r[0] <= 0:
            return None
        rho = exp(log_prefix(a, b, x, y)) / r[0]
        f = log(r[0] / p)
        n = -f / rho
        lam = a * y - b * x
        h2 = lam - rho
        h3 = h2 * h2 - (a + b) * x * y - rho * h2
        den = 1 + h2 * n + h3 * n * n / 6
        d = n * (1 + h2 * n / 2) / den
        if abs(h2 * n) > 1 or den <= 0.2:
            d = n
        if abs(d) > 5:
            d = 5 * d / abs(d)
        w += d
        if abs(d) < tol:
            return 1 / (1 + exp(-w)), 1 / (1 + exp(w))
    return None


def check_betainc(a, b, x, r):
    global checked_betainc
    with mp.workdps(400):
        v = mp.betainc(mpf(a), mpf(b), 0, x, regularized=True)
        for u, t in ((v, r[0]), (1 - v, r[1])):
            if abs(u - t) > mpf(10) ** -55 * abs(t):
                raise SystemExit("betainc differs: %s %s %s: %s %s" % (a, b, x, u, t))
    checked_betainc += 1


def row_tails(out, a, b, x):
    """x is a double."""
    if not (0 < x < 1):
        return
    X = mpf(x)
    if log_prefix(mpf(a), mpf(b), X, 1 - X) < -760:
        return  # one of the tails is below 1e-304
    r = tails(mpf(a), mpf(b), X, 1 - X, thorough=True)
    if r is None or min(r) <= mpf(10) ** -304:
        return
    if max(a, b) <= 1000 and len(out) % 5 == 0:
        check_betainc(a, b, X, r)
    out.append("%r,%r,%r,%s,%s" % (a, b, x, nstr(r[0], DIGITS, min_fixed=0, max_fixed=0), nstr(r[1], DIGITS, min_fixed=0, max_fixed=0)))


def note(text):
    print(text, file=sys.stderr, flush=True)


def make_tails():
    rnd = random.Random(20240229)
    out = []
    targets = [1e-300, 1e-100, 1e-20, 1e-10, 1e-3, .025, .5]
    for a in SHAPES:
        for b in SHAPES:
            wanted = [(t, s) for t in targets for s in (0, 1)]
            for t, s in rnd.sample(wanted, 6):
                aa, bb = (mpf(a), mpf(b)) if s == 0 else (mpf(b), mpf(a))
                q = quantile(aa, bb, mpf(t), mpf(10) ** -2 / sqrt(aa + bb + 1), most=25)
                if q is None:
                    continue
                x = q[0] if s == 0 else q[1]
                row_tails(out, a, b, float(x))
            row_tails(out, a, b, rnd.random())
            row_tails(out, a, b, 10 ** rnd.uniform(-12, 0))
        note("tails %g: %d rows, %d by both routes" % (a, len(out), checked))
    for a, b in ((7.3, 12.9), (33.0, 1234.5), (150.25, 149.0), (160.0, 160.0), (420.5, 9999.75), (3.0, 1e6 - 3), (77777.0, 22224.0),
                 (149.9, 1e9), (151.0, 1e9), (1.0000001, 5e4), (0.999, 5e4), (0.3, 0.7), (250.0, 1e3), (20.0, 20.0), (60.0, 80.0),
                 (1e12, 3e13), (1e15, 1e15), (2.5, 1e12), (1e15, 40.0), (5e10, 700.0)):
        m = a / (a + b)
        sd = (m * (1 - m) / (a + b + 1)) ** .5
        for k in (-20, -6, -4.1, -3.9, -3, -2, -1, -.3, 0, .2, .9, 1.7, 2.5, 3.5, 4.2, 7, 25):
            row_tails(out, a, b, m + k * sd)
    return "a,b,x,lower,upper", out


def make_quantiles():
    rnd = random.Random(7654321)
    out = []

    def add(a, b, t, side):
        aa, bb = (mpf(a), mpf(b)) if side == "lower" else (mpf(b), mpf(a))
        T = mpf(t)
        if T > mpf(1) / 2:
            q = quantile(bb, aa, 1 - T, mpf(10) ** -55)
            q = q and (q[1], q[0])
        elif bb == 1:
            q = (exp(log(T) / aa), -expm1(log(T) / aa))
        elif aa == 1:
            q = (-expm1(mp.log1p(-T) / bb), exp(mp.log1p(-T) / bb))
        else:
            q = quantile(aa, bb, T, mpf(10) ** -55)
        if q is None or min(q) < mpf(10) ** -304:
            return
        if side == "upper":
            q = (q[1], q[0])
        out.append("%r,%r,%r,%s,%s,%s" % (a, b, t, side, nstr(q[0], DIGITS, min_fixed=0, max_fixed=0), nstr(q[1], DIGITS, min_fixed=0, max_fixed=0)))

    targets = [1e-300, 1e-100, 1e-20, 1e-13, 1e-6, .005, .025, .05, .3, .5, .8, .975, .999999]
    for a in SHAPES:
        for b in SHAPES:
            for t in rnd.sample(targets, 3):
                add(a, b, t, rnd.choice(["lower", "upper"]))
        note("quantiles %g: %d rows" % (a, len(out)))
    for n in (1, 2, 10, 500, 12345, 1000000):
        for t in (.5e-12, 1e-12, 1e-13, 1e-30, 1e-100, 1e-300, .025, .005, .5, .975):
            add(1.0, float(n), t, "upper")
            add(1.0, float(n), t, "lower")
            add(float(n), 1.0, t, "lower")
            add(float(n), 1.0, t, "upper")
    for x, n in ((1, 10), (3, 10), (9, 10), (5, 20), (1, 100), (2, 100), (37, 100), (99, 100), (250, 500), (499, 500), (17, 1000), (4321, 10000),
                 (1, 100000), (99999, 100000), (123456, 1000000), (999, 1000000)):
        for t in (.025, .005, .5e-6):
            add(float(x), float(n - x + 1), t, "lower")
            add(float(x + 1), float(n - x), t, "upper")
    return "a,b,tail,side,x,complement", out


def make_binomial():
    rnd = random.Random(99)
    out = []

    def add(x, n, p):
        X, N, P = mpf(x), mpf(n), mpf(p)
        if not 0 <= X <= N:
            return
        with mp.workdps(140):
            v = loggamma(N + 1) - loggamma(X + 1) - loggamma(N - X + 1) + X * log(P) + (N - X) * mp.log1p(-P)
            if v < -695:
                return
            out.append("%r,%r,%r,%s" % (x, n, p, nstr(exp(v), DIGITS, min_fixed=0, max_fixed=0)))
    for n in (1.0, 2.0, 5.0, 17.0, 100.0, 999.0, 1e4, 123456.0, 1e6, 1e7, 1e8, 1e9):
        for p in (1e-12, 1e-6, .001, .0371, .25, .5, .61803, .95, .999, 1 - 2.0 ** -40):
            sd = (n * p * (1 - p)) ** .5
            for k in (-35, -12, -4, -1, 0, .5, 2, 6, 20, 34):
                x = float(round(n * p + k * sd))
                add(x, n, p)
            add(0.0, n, p)
            add(n, n, p)
            add(n * p + rnd.uniform(-3, 3) * sd, n, p)
    return "x,n,p,density", sorted(set(out), key=out.index)


def make_special():
    rnd = random.Random(4)
    out = []

    def add(name, x, y, value):
        out.append("%s,%r,%r,%s" % (name, x, y, nstr(value, DIGITS, min_fixed=0, max_fixed=0)))
    with mp.workdps(400):
        for i in range(120):
            x = 10 ** rnd.uniform(-18, 3) * (1 if i % 2 else -1)
            if x > -1:
                add("log1p", x, 0.0, mp.log1p(mpf(x)))
                add("log1pmx", x, 0.0, mp.log1p(mpf(x)) - mpf(x))
            if abs(x) < 600:
                add("expm1", x, 0.0, expm1(mpf(x)))
        for i in range(120):
            x = rnd.uniform(-1, 1.5)
            add("log1p", x, 0.0, mp.log1p(mpf(x)))
            add("log1pmx", x, 0.0, mp.log1p(mpf(x)) - mpf(x))
            add("expm1", x, 0.0, expm1(mpf(x)))
    with mp.workdps(150):
        for x in [float(k) for k in range(1, 20)] + [10 ** rnd.uniform(-3, 10) for i in range(120)] + [k + .5 for k in range(16)]:
            X = mpf(x)
            add("stirling", x, 0.0, loggamma(X) - ((X - mpf(1) / 2) * log(X) - X + log(2 * mp.pi) / 2))
            add("loggamma", x, 0.0, loggamma(X))
        for i in range(150):
            x = 10 ** rnd.uniform(-3, 9)
            y = 10 ** rnd.uniform(-3, 9)
            add("logbeta", x, y, loggamma(mpf(x)) + loggamma(mpf(y)) - loggamma(mpf(x) + mpf(y)))
            y = 10 ** rnd.uniform(-6, 0)
            add("gammaratio", x, y, loggamma(mpf(x) + mpf(y)) - loggamma(mpf(x)))
    return "function,x,y,value", out


if __name__ == "__main__":
    which = sys.argv[1:] or ["special-functions", "binomial-density", "incomplete-beta-quantile", "incomplete-beta"]
    for name in which:
        head, rows = {"incomplete-beta": make_tails, "incomplete-beta-quantile": make_quantiles, "binomial-density": make_binomial, "special-functions": make_special}[name]()
        with open(os.path.join(HERE, name + ".csv"), "w", newline="\n") as f:
            f.write(head + "\n" + "\n".join(rows) + "\n")
        note("%s: %d rows; %d tail pairs were computed by both routes, %d checked with betainc" % (name, len(rows), checked, checked_betainc))
