"""Reference values for two proportions of the same subjects, made with mpmath (60 digits), by definitions and not by closed forms.

    python3 make-fixtures.py > fixtures.csv        (mpmath 1.2.1; about a minute)

Grade R: recomputed with general-purpose routines, never published.

Restricted maxima of the likelihood are found by bisection on its derivative along the hypothesis, not by the closed form of a quadratic; the
variance of the score statistic is written out from the four cell probabilities there; limits are found by bisection on the statistic. Binomial tails
of McNemar's exact form are summed in rational arithmetic.

columns: kind, method, a, b, c, d (both, first only, second only, neither), parameter, lower, upper
limits: parameter is the two-sided error probability. tests: parameter is the bound, lower the statistic, upper the p-value (upper tail).
mcnemar: lower holds the p-value.
"""
from fractions import Fraction
from math import comb
from mpmath import mp, mpf, sqrt, log, exp, erfc, inf

mp.dps = 60


def upper_tail(z):
    return erfc(z / sqrt(mpf(2))) / 2


def z_of(error):
    error = mpf(error)
    return mp.findroot(lambda z: log(2 * upper_tail(z) / error), float(sqrt(max(-2 * log(error), mpf(1)))) * 0.9)


def bisect(f, lo, hi):
    """The sign change of f between lo and hi; f(lo) > 0 >= f(hi) or the reverse."""
    rising = f(hi) > 0
    for _ in range(260):
        mid = (lo + hi) / 2
        if (f(mid) > 0) == rising:
            hi = mid
        else:
            lo = mid
        if abs(hi - lo) < mpf(10) ** -45:
            break
    return (lo + hi) / 2


def share(count, probability):
    if count == 0:
        return mpf(0)
    return inf if probability <= 0 else count / probability


def falling_root(f, lo, hi):
    """Where a derivative of a concave likelihood changes its sign, or the end that it points to."""
    eps = (hi - lo) * mpf(10) ** -50
    if f(lo + eps) <= 0:
        return lo
    if f(hi - eps) >= 0:
        return hi
    return bisect(f, lo + eps, hi - eps)


def difference_statistic(a, b, c, d, delta):
    """z of p1 - p2 = delta, cells p12 = q + delta, p21 = q, the concordant rest split as observed."""
    n = mpf(a + b + c + d)
    lo, hi = max(mpf(0), -delta), (1 - delta) / 2

    def slope(q):
        return share(b, q + delta) + share(c, q) - 2 * share(a + d, 1 - delta - 2 * q)

    q = falling_root(slope, lo, hi)
    p12, p21 = q + delta, q
    variance = (p12 + p21 - (p12 - p21) ** 2) / n
    excess = mpf(b - c) / n - delta
    return mpf(0) if excess == 0 else excess / sqrt(variance)


def ratio_statistic(a, b, c, r):
    """z of p1 = r p2 among the m with a positive result: shares t11, t12, t21 with t11 + t12 = r (t11 + t21)."""
    m = mpf(a + b + c)
    # t21 is free: t11 = (1 - (1 + r) t21) / r, t12 = (r - 1 + t21) / r
    lo, hi = max(mpf(0), 1 - r), 1 / (1 + r)

    def slope(t):
        return share(c, t) + share(b, r - 1 + t) - (1 + r) * share(a, 1 - (1 + r) * t)

    t21 = falling_root(slope, lo, hi)
    t11 = (1 - (1 + r) * t21) / r
    t12 = (r - 1 + t21) / r
    # variance of x1 - r x2 from the cells, given that the mean is 0
    variance = m * (t11 * (1 - r) ** 2 + t12 + t21 * r ** 2)
    excess = mpf(a + b) - r * mpf(a + c)
    return mpf(0) if excess == 0 else excess / sqrt(variance)


def tango(a, b, c, d, z):
    n = mpf(a + b + c + d)
    est = mpf(b - c) / n
    tiny = mpf(10) ** -48

    def limit(sign):
        end = mpf(sign)
        if est == end:
            return end
        return bisect(lambda x: difference_statistic(a, b, c, d, x) + sign * z, est, end * (1 - tiny))

    return limit(-1), limit(1)


def nam_blackwelder(a, b, c, d, z):
    def limit(sign):
        if a + b == 0 and sign < 0:
            return mpf(0)
        if a + c == 0 and sign > 0:
            return inf
        return exp(bisect(lambda x: ratio_statistic(a, b, c, exp(x)) + sign * z, mpf(-60), mpf(60)))

    return limit(-1), limit(1)


def wilson(x, n, z):
    x, n = mpf(x), mpf(n)
    centre = (2 * x + z * z) / (2 * (n + z * z))
    half = z * sqrt(z * z + 4 * x * (1 - x / n)) / (2 * (n + z * z))
    lower = mpf(0) if x == 0 else centre - half
    return lower, (mpf(1) if x == n else centre + half)


def newcombe(a, b, c, d, z, correct):
    n = mpf(a + b + c + d)
    p1, p2 = (a + b) / n, (a + c) / n
    l1, u1 = wilson(a + b, n, z)
    l2, u2 = wilson(a + c, n, z)
    product = mpf(a + b) * (c + d) * (a + c) * (b + d)
    top = mpf(a) * d - mpf(b) * c
    if correct:
        top = top - n / 2 if top > n / 2 else (mpf(0) if top >= 0 else top)
    phi = top / sqrt(product) if product > 0 else mpf(0)
    delta = p1 - p2
    low = (p1 - l1) ** 2 - 2 * phi * (p1 - l1) * (u2 - p2) + (u2 - p2) ** 2
    high = (p2 - l2) ** 2 - 2 * phi * (p2 - l2) * (u1 - p1) + (u1 - p1) ** 2
    low = low if low > mpf(10) ** -55 else mpf(0)
    high = high if high > mpf(10) ** -55 else mpf(0)
    return delta - sqrt(low), delta + sqrt(high)


def wald(a, b, c, d, z, discordant, concordant):
    b, c = mpf(b) + discordant, mpf(c) + discordant
    n = b + c + a + d + 2 * mpf(concordant)
    p12, p21 = b / n, c / n
    se = sqrt((p12 + p21 - (p12 - p21) ** 2) / n)
    return max(mpf(-1), p12 - p21 - z * se), min(mpf(1), p12 - p21 + z * se)


def bonett_price_ratio(a, b, c, d, z):
    x1, x2, m = mpf(a + b), mpf(a + c), mpf(a + b + c)
    p1, p2 = (x1 + 1) / (m + 2), (x2 + 1) / (m + 2)
    big = sqrt((b + c + 2) / ((x1 + 1) * (x2 + 1)))
    k = z * big / (sqrt((1 - p1) / (x1 + 1)) + sqrt((1 - p2) / (x2 + 1)))
    l1, u1 = wilson(x1, m, k)
    l2, u2 = wilson(x2, m, k)
    return l1 / u2, (inf if l2 == 0 else u1 / l2)


def log_ratio(a, b, c, d, z):
    x1, x2 = mpf(a + b), mpf(a + c)
    s = sqrt(1 / x1 + 1 / x2 - 2 * mpf(a) / (x1 * x2))
    return x1 / x2 * exp(-z * s), x1 / x2 * exp(z * s)


def exact(b, c, mid):
    n = b + c
    if n == 0:
        return Fraction(1)
    k = min(b, c)
    density = Fraction(comb(n, k), 2 ** n)
    tail = sum(Fraction(comb(n, i), 2 ** n) for i in range(k + 1))
    if b == c:
        return 1 - density / 2 if mid else Fraction(1)
    return 2 * tail - density if mid else min(Fraction(1), 2 * tail)


def show(x):
    if x == inf:
        return "inf"
    return mp.nstr(mpf(x), 20, strip_zeros=True, min_fixed=0, max_fixed=0)


TABLES = [
    (1, 1, 7, 12), (59, 6, 16, 80), (43, 0, 1, 0), (4, 9, 3, 16), (20, 12, 2, 16), (0, 30, 0, 0), (0, 0, 12, 0), (54, 0, 0, 0), (53, 0, 0, 1),
    (0, 0, 0, 7), (0, 3, 0, 7), (0, 0, 3, 7), (0, 2, 5, 0), (1, 0, 0, 0), (0, 1, 0, 0), (0, 0, 1, 0), (0, 0, 0, 1), (1, 1, 1, 1), (0, 1, 1, 0), (794, 150, 86, 570),
    (48, 1, 0, 1), (12, 5, 5, 2), (0, 4, 1, 95), (99990, 4, 6, 0), (0, 3, 1, 999999996), (10 ** 12, 3, 9, 10 ** 12), (7 * 10 ** 11, 2 * 10 ** 10, 2 * 10 ** 10 + 300000, 10 ** 11),
    (10 ** 6, 999, 1300, 10 ** 5), (5, 10 ** 9, 10 ** 9 + 100, 3),
]


def main():
    print("kind,method,a,b,c,d,parameter,lower,upper")

    def row(kind, method, table, parameter, lower, upper):
        print(",".join([kind, method] + [str(x) for x in table] + [parameter, show(lower), show(upper) if upper is not None else ""]))

    for table in TABLES:
        a, b, c, d = table
        for error in ("0.05", "0.2", "0.001"):
            z = z_of(error)
            row("difference", "TangoScore", table, error, *tango(*table, z))
            row("difference", "NewcombeHybrid", table, error, *newcombe(*table, z, False))
            row("difference", "NewcombeHybridPhiCorrected", table, error, *newcombe(*table, z, True))
            row("difference", "BonettPrice", table, error, *wald(*table, z, 1, 0))
            row("difference", "AgrestiMin", table, error, *wald(*table, z, mpf("0.5"), mpf("0.5")))
            row("difference", "Wald", table, error, *wald(*table, z, 0, 0))
            if a + b + c > 0:
                row("ratio", "NamBlackwelderScore", table, error, *nam_blackwelder(*table, z))
                row("ratio", "BonettPriceHybrid", table, error, *bonett_price_ratio(*table, z))
            if a + b > 0 and a + c > 0 and b + c > 0:
                row("ratio", "WaldLog", table, error, *log_ratio(*table, z))
        for bound in ("-0.1", "-0.05", "-0.001", "0", "0.02", "0.5"):
            z = difference_statistic(*table, mpf(bound))
            row("difference-test", "", table, bound, z, upper_tail(z))
        if a + b + c > 0:
            for bound in ("0.8", "0.95", "1", "1.05", "1.5"):
                z = ratio_statistic(a, b, c, mpf(bound))
                row("ratio-test", "", table, bound, z, upper_tail(z))

    for b in (0, 1, 2, 3, 5, 8, 12, 25, 100, 1000):
        for c in (0, 1, 2, 4, 8, 12, 30, 110, 1000):
            for method, mid in (("ExactConditional", False), ("MidP", True)):
                p = exact(b, c, mid)
                row("mcnemar", method, (3, b, c, 4), "", mpf(p.numerator) / p.denominator, None)


main()
