"""Comparisons of the predictive values of two tests on the same subjects, from one row for each call.

    /usr/bin/python3 make-predictive.py > predictive.csv        (numpy 1.24, statsmodels 0.13)

Grade R. Three routes, none of them the formulas of the library:

- generalised score: statsmodels' score test of a marginal logistic regression of status on test (independence as working correlation), one row for
  each call, clustered by subject; and the formula of Leisenring, Alonzo and Pepe (2000) written as loops over subjects and their rows. The script stops when they
  differ by more than 1e-8.
- weighted generalised score: Kosinski's (2013) formula as printed, (difference)^2 / ((p (1 - p) - 2 C) (1/n1 + 1/n2)).
- relative predictive value: gradient of the logarithm by central differences in the eight cells, times the multinomial covariance; beside it the
  formula of Moskowitz and Pepe (2006), from memory, which the script holds to 1e-6 of it.

columns: the cells with the condition (both, first only, second only, neither), without it (the same), value (PPV or NPV), first, second, generalised (chi-square),
weighted (chi-square), relative, log_variance
"""
import warnings

import numpy as np
import statsmodels.api as sm

warnings.filterwarnings("ignore")


def calls(with_condition, without_condition, positive):
    """Rows (subject, second test, right) for each call."""
    rows = []
    subject = 0
    for cells, has in ((with_condition, True), (without_condition, False)):
        for count, results in zip(cells, ((1, 1), (1, 0), (0, 1), (0, 0))):
            for _ in range(count):
                for which in (0, 1):
                    if bool(results[which]) == positive:
                        rows.append((subject, which, int(has == positive)))
                subject += 1
    return np.array(rows)


def generalised_loops(rows):
    d_mean, z_mean = rows[:, 2].mean(), rows[:, 1].mean()
    top = 0.0
    bottom = 0.0
    for subject in np.unique(rows[:, 0]):
        own = rows[rows[:, 0] == subject]
        top += sum(d * (z - z_mean) for _, z, d in own)
        bottom += sum((d - d_mean) * (z - z_mean) for _, z, d in own) ** 2
    return top ** 2 / bottom


def generalised_gee(rows):
    y = rows[:, 2].astype(float)
    z = rows[:, 1].astype(float)
    ones = np.ones_like(y)
    small = sm.GEE(y, ones[:, None], groups=rows[:, 0], family=sm.families.Binomial()).fit(ctol=1e-13, maxiter=500)
    full = sm.GEE(y, np.column_stack([ones, z]), groups=rows[:, 0], family=sm.families.Binomial())
    return full.compare_score_test(small)["statistic"]


def weighted(rows):
    n1, n2 = (rows[:, 1] == 0).sum(), (rows[:, 1] == 1).sum()
    first, second = rows[rows[:, 1] == 0, 2].mean(), rows[rows[:, 1] == 1, 2].mean()
    p = rows[:, 2].mean()
    c = 0.0
    for subject in np.unique(rows[:, 0]):
        own = rows[rows[:, 0] == subject]
        if len(own) == 2:
            c += (1 - p) ** 2 if own[0, 2] else p ** 2
    c /= n1 + n2
    return (first - second) ** 2 / ((p * (1 - p) - 2 * c) * (1 / n1 + 1 / n2))


def log_relative(cells, positive):
    w, wo = cells[:4], cells[4:]
    right, wrong = (w, wo) if positive else (wo[::-1], w[::-1])
    # of negative results the order reversed is: both, second only positive (first alone negative), first only positive, neither
    t1, t2 = right[0] + right[1], right[0] + right[2]
    n1, n2 = t1 + wrong[0] + wrong[1], t2 + wrong[0] + wrong[2]
    return np.log(t1) - np.log(n1) - np.log(t2) + np.log(n2)


def numeric_variance(cells, positive):
    x = np.array(cells, dtype=np.longdouble)
    n = x.sum()
    gradient = np.zeros(8, dtype=np.longdouble)
    for i in range(8):
        h = np.longdouble(1e-5) * max(1, x[i])
        total = 0
        # fourth-order central differences
        for k, weight in ((-2, 1), (-1, -8), (1, 8), (2, -1)):
            y = x.copy()
            y[i] += k * h
            total += weight * log_relative(y, positive)
        gradient[i] = total / (12 * h)
    p = x / n
    covariance = n * (np.diag(p) - np.outer(p, p))
    return float(gradient @ covariance @ gradient)


def moskowitz_pepe(cells):
    """p5..p7 with the condition (both, first only, second only), p1..p3 without; the variance of log(PPV first / PPV second)."""
    n = sum(cells)
    p5, p6, p7 = (c / n for c in cells[:3])
    p1, p2, p3 = (c / n for c in cells[4:7])
    a = (p5 + p6) / (p5 + p6 + p1 + p2)
    b = (p5 + p7) / (p5 + p7 + p1 + p3)
    sigma = (p6 * (1 - b) + p5 * (b - a) + 2 * (p7 + p3) * a * b + p7 * (1 - 3 * a)) / ((p5 + p6) * (p5 + p7))
    return sigma / n


TABLES = [
    (40, 8, 4, 6, 10, 6, 9, 117), (3, 5, 2, 1, 2, 1, 4, 12), (20, 10, 5, 15, 3, 12, 7, 28), (1, 2, 3, 4, 5, 6, 7, 8), (150, 20, 35, 10, 25, 60, 30, 300),
    (0, 12, 9, 7, 0, 4, 11, 20), (6, 0, 3, 1, 2, 5, 0, 9), (2, 3, 1, 1, 1, 2, 4, 1),
    # a cohort of screening size with a rare condition
    (30, 12, 6, 4, 40, 90, 60, 1500),
]


def main():
    print("w_both,w_first,w_second,w_neither,o_both,o_first,o_second,o_neither,value,first,second,generalised,weighted,relative,log_variance")
    for cells in TABLES:
        for value, positive in (("PPV", True), ("NPV", False)):
            rows = calls(cells[:4], cells[4:], positive)
            loops, gee = generalised_loops(rows), generalised_gee(rows)
            assert abs(loops - gee) < 1e-8 * max(1, loops), (cells, value, loops, gee)
            first, second = rows[rows[:, 1] == 0, 2].mean(), rows[rows[:, 1] == 1, 2].mean()
            variance = numeric_variance(cells, positive)
            if positive:
                printed = moskowitz_pepe(cells)
                assert abs(printed / variance - 1) < 1e-6, (cells, printed, variance)
            print(",".join([str(c) for c in cells] + [value] + [repr(float(x)) for x in (first, second, loops, weighted(rows), first / second, variance)]))


main()
