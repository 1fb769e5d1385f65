"""Answers questions on distributions and tests with scipy and statsmodels: JSON in, JSON out."""
import json
import sys

import numpy as np
from scipy import optimize, special, stats


def anderson(values):
    # scipy's statistic; p only where statsmodels is there to give it.
    statistic = stats.anderson(np.array(values)).statistic
    try:
        from statsmodels.stats.diagnostic import normal_ad
    except ImportError:
        return [statistic, None]
    return [statistic, normal_ad(np.array(values))[1]]


def ljung_box(values, lags):
    # The formula in numpy, the probability from scipy.
    x = np.array(values) - np.mean(values)
    n = len(x)
    r = np.array([np.dot(x[k:], x[:-k]) / np.dot(x, x) for k in range(1, lags + 1)])
    q = n * (n + 2) * np.sum(r**2 / (n - np.arange(1, lags + 1)))
    return [q, stats.chi2.sf(q, lags)]


def reml(values, labels):
    # Restricted likelihood with dense matrices, its score brought to zero by a general root finder.
    y = np.array(values)
    n = len(y)
    parts = []
    for depth in range(len(labels[0])):
        names = ["/".join(row[: depth + 1]) for row in labels]
        parts.append(np.equal.outer(names, names).astype(float))
    parts.append(np.eye(n))
    ones = np.ones((n, 1))

    def score(logs):
        v = sum(np.exp(t) * part for t, part in zip(logs, parts))
        inverse = np.linalg.inv(v)
        p = inverse - inverse @ ones @ ones.T @ inverse / (ones.T @ inverse @ ones)
        py = p @ y
        return [np.exp(t) * (np.sum(p * part) - py @ part @ py) for t, part in zip(logs, parts)]

    start = np.full(len(parts), np.log(np.var(y) / len(parts)))
    found = optimize.root(score, start, tol=1e-13)
    return list(np.exp(found.x))


calls = {
    "t.cdf": stats.t.cdf,
    "f.sf": stats.f.sf,
    "f.cdf": stats.f.cdf,
    "f.ppf": stats.f.ppf,
    "chi2.cdf": stats.chi2.cdf,
    "chi2.sf": stats.chi2.sf,
    "chi2.ppf": stats.chi2.ppf,
    "beta.cdf": stats.beta.cdf,
    "beta.ppf": stats.beta.ppf,
    "norm.cdf": stats.norm.cdf,
    "norm.ppf": stats.norm.ppf,
    "norm.logcdf": stats.norm.logcdf,
    "nct.cdf": stats.nct.cdf,
    "gammaln": special.gammaln,
    "quantile": lambda values, p: np.quantile(values, p),
    "theilslopes": lambda y, x: list(stats.theilslopes(y, x))[:1] + list(stats.theilslopes(y, x))[2:],
    "kendall.exact": lambda x, y: stats.kendalltau(x, y, method="exact").pvalue,
    "anderson": anderson,
    "ljung-box": ljung_box,
    "reml": reml,
}

answers = []
for name, arguments in json.load(sys.stdin):
    answer = calls[name](*arguments)
    answers.append([None if a is None else float(a) for a in np.atleast_1d(np.array(answer, dtype=object))])
json.dump(answers, sys.stdout)
