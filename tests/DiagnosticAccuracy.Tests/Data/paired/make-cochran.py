"""Cochran's Q and Holm's adjustment by general-purpose routines.

    /usr/bin/python3 make-cochran.py > cochran.csv        (statsmodels 0.13)

Grade R. columns: name, results (one word of 0 and 1 a subject, one character a test), q, p, then the p-values of McNemar's asymptotic test for the
pairs (0,1), (0,2), ..., and the same adjusted by Holm's procedure, each as one field with blanks between.
"""
import numpy as np
from statsmodels.stats.contingency_tables import cochrans_q, mcnemar
from statsmodels.stats.multitest import multipletests

rng = np.random.default_rng(20240607)


def draw(n, shares, shared):
    """Results with some dependence: a subject follows its own draw with probability `shared`."""
    own = rng.random((n, 1))
    each = rng.random((n, len(shares)))
    follows = rng.random((n, 1)) < shared
    return (np.where(follows, own, each) < np.array(shares)).astype(int)


print("name,results,q,p,pairs,holm")
for name, n, shares, shared in (
    ("three", 40, (0.9, 0.8, 0.6), 0.5), ("four", 60, (0.9, 0.85, 0.8, 0.5), 0.6), ("two", 50, (0.8, 0.6), 0.4), ("seven", 90, (0.5,) * 6 + (0.75,), 0.7),
    ("alike", 45, (0.7, 0.7, 0.7), 0.8),
):
    x = draw(n, shares, shared)
    q = cochrans_q(x)
    pairs = []
    for i in range(x.shape[1]):
        for j in range(i + 1, x.shape[1]):
            table = np.array([[np.sum((x[:, i] == a) & (x[:, j] == b)) for b in (1, 0)] for a in (1, 0)])
            pairs.append(mcnemar(table, exact=False, correction=False).pvalue)
    holm = multipletests(pairs, method="holm")[1] if len(pairs) > 1 else pairs
    words = " ".join("".join(str(v) for v in row) for row in x)
    print(",".join([name, words, repr(float(q.statistic)), repr(float(q.pvalue)), " ".join(repr(float(p)) for p in pairs), " ".join(repr(float(p)) for p in holm)]))
