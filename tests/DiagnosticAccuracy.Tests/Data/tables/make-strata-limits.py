# Makes strata-limits.json: pooled ratios and their limits where one side of every table is empty.
#     python3 make-strata-limits.py > strata-limits.json      (Debian's SciPy 1.10, statsmodels 0.13, R 4.2)
# Odds ratio: R's mantelhaen.test, Mantel-Haenszel with the Robins-Breslow-Greenland variance, and exact = TRUE for the exact conditional limits.
# Its exact limits are good to two or three digits only; odds_product is the same limit from the product of SciPy's noncentral hypergeometric probabilities.
# Likelihood ratios: statsmodels for the estimate; for the limits the stratified score statistic with the maximum of each stratum's likelihood where its
# derivative is zero, and the statistic brought to the normal quantile, both by Brent's method.
import json
import subprocess
import sys
import numpy as np
from scipy import optimize, stats
from statsmodels.stats.contingency_tables import StratifiedTable


def r(tables, exact):
    cells = ",".join(str(v) for tp, fp, fn, tn in tables for v in (tp, fp, fn, tn))
    code = (f"x <- array(c({cells}), dim = c(2, 2, {len(tables)}));"
            f"t <- mantelhaen.test(x, exact = {'TRUE' if exact else 'FALSE, correct = FALSE'});"
            "cat(format(c(t$estimate, t$conf.int), digits = 17))")
    return [float(v) for v in subprocess.run(["Rscript", "-e", code], capture_output=True, text=True, check=True).stdout.split()]


def restricted(x1, n1, x0, n0, ratio):
    """The p0 at which the derivative of x1 log(r p) + (n1 - x1) log(1 - r p) + x0 log p + (n0 - x0) log(1 - p) is zero; r p is p1."""
    if x1 + x0 == 0:
        return 0.0
    top = min(1.0, 1.0 / ratio)

    def slope(p):
        return (x1 + x0) / p - (n1 - x1) * ratio / (1 - ratio * p) - (n0 - x0) / (1 - p)

    at_top = slope(top * (1 - 1e-15))
    return top if at_top > 0 else optimize.brentq(slope, top * 1e-12, top * (1 - 1e-15), xtol=1e-17, rtol=1e-15)


def score(groups, log_ratio):
    ratio = np.exp(log_ratio)
    difference = variance = 0.0
    for x1, n1, x0, n0 in groups:
        w = n1 * n0 / (n1 + n0)
        p0 = restricted(x1, n1, x0, n0, ratio)
        p1 = ratio * p0
        difference += w * (x1 / n1 - ratio * x0 / n0)
        variance += w * w * (p1 * (1 - p1) / n1 + ratio ** 2 * p0 * (1 - p0) / n0)
    return difference / np.sqrt(variance)


def limit(groups, z, lo, hi):
    return float(np.exp(optimize.brentq(lambda t: score(groups, t) - z, lo, hi, xtol=1e-13, rtol=1e-13)))


def product(tables, tail):
    def excess(log_odds):
        return sum(stats.nchypergeom_fisher.logpmf(tp, tp + fp + fn + tn, tp + fn, tp + fp, np.exp(log_odds)) for tp, fp, fn, tn in tables) - np.log(tail)
    return float(np.exp(optimize.brentq(excess, -3.0, 9.0, xtol=1e-13, rtol=1e-13)))


z = stats.norm.ppf(0.975)
out = {"ordinary": [], "empty": []}
for tables in [
    [(90, 20, 10, 180), (30, 11, 9, 60), (12, 3, 5, 41)],
    [(5, 2, 1, 9), (0, 1, 4, 12), (7, 0, 2, 5), (3, 3, 3, 3)],
    [(4, 6, 9, 3), (2, 8, 7, 5)],
]:
    negative = StratifiedTable([np.array([[fn, tp], [tn, fp]], dtype=float) for tp, fp, fn, tn in tables])
    out["ordinary"].append({"tables": tables, "odds": r(tables, False), "lr_negative": float(negative.riskratio_pooled)})
for tables in [
    [(50, 0, 5, 90), (30, 0, 4, 60)],
    [(7, 0, 2, 15), (3, 0, 0, 8), (4, 0, 1, 22), (1, 0, 1, 5)],
    [(12, 0, 3, 20)],
]:
    groups = [(tp, tp + fn, fp, fp + tn) for tp, fp, fn, tn in tables]
    out["empty"].append({
        "tables": tables,
        "odds_exact": r(tables, True)[1] if len(tables) > 1 else None,
        "odds_product": product(tables, 0.025),
        "lr_positive_lower": limit(groups, z, -2.0, 9.0),
    })
# All results positive in both strata: the ratio is 1, and the score limits are not.
all_positive = [(5, 4, 0, 0), (3, 6, 0, 0)]
groups = [(tp, tp + fn, fp, fp + tn) for tp, fp, fn, tn in all_positive]
out["all_positive"] = {"tables": all_positive, "lower": limit(groups, z, -4.0, -1e-9), "upper": limit(groups, -z, 1e-9, 4.0)}
json.dump(out, sys.stdout, indent=1)
