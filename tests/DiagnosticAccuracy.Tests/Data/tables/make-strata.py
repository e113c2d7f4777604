# Makes strata.json: pooled ratios and homogeneity of stratified 2x2 tables, and the kappa of several raters, by statsmodels and SciPy.
#     python3 make-strata.py > strata.json      (Debian's python3-statsmodels 0.13)
import json
import numpy as np
from scipy import stats
from statsmodels.stats.contingency_tables import StratifiedTable
from statsmodels.stats.inter_rater import fleiss_kappa

rng = np.random.default_rng(11)
out = {"strata": [], "raters": []}
sets = [
    [(90, 20, 10, 180), (30, 11, 9, 60), (12, 3, 5, 41)],
    [(5, 2, 1, 9), (0, 1, 4, 12), (7, 0, 2, 5), (3, 3, 3, 3)],
    [(100000, 2000, 900, 400000), (30, 12, 11, 31)],
]
for tables in sets:
    # rows: with, without; columns: positive, negative
    st = StratifiedTable([np.array([[tp, fn], [fp, tn]], dtype=float) for tp, fp, fn, tn in tables])
    bd = st.test_equal_odds(adjust=True)
    lo, hi = st.oddsratio_pooled_confint()
    sens = stats.chi2_contingency([[t[0] for t in tables], [t[2] for t in tables]], correction=False)
    spec = stats.chi2_contingency([[t[3] for t in tables], [t[1] for t in tables]], correction=False)
    out["strata"].append({
        "tables": tables,
        "dor": st.oddsratio_pooled, "dor_lower": lo, "dor_upper": hi, "dor_log_se": st.logodds_pooled_se,
        "lr_positive": st.riskratio_pooled,
        "breslow_day_tarone": bd.statistic, "breslow_day_p": bd.pvalue,
        "sensitivity_chi2": sens[0], "sensitivity_p": sens[1], "specificity_chi2": spec[0], "specificity_p": spec[1],
    })
for subjects, raters, categories in ((10, 14, 5), (30, 3, 2), (25, 6, 4)):
    table = rng.multinomial(raters, rng.dirichlet(np.ones(categories) * 2), size=subjects)
    table[: subjects // 2] = 0
    for i in range(subjects // 2):
        table[i, i % categories] = raters - 1
        table[i, (i + 1) % categories] += 1
    out["raters"].append({"table": table.tolist(), "kappa": fleiss_kappa(table)})
json.dump(out, __import__("sys").stdout, indent=1)
