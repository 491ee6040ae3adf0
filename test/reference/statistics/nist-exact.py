"""Solves each data set of nist-strd.json in exact rational arithmetic and writes nist-exact.json beside it.

An independent check of the certified digits, and the source of the figures that NIST does not certify: both R2,
Durbin-Watson, leverage. Run: python3 nist-exact.py (Python 3.11, standard library only; decimal literals are read as the
decimals they are, not as doubles).
"""

import json
from fractions import Fraction
from decimal import Decimal, getcontext
from pathlib import Path

getcontext().prec = 40
here = Path(__file__).parent


def solve(matrix, sides):
    """Gauss-Jordan on fractions: the inverse times each right-hand side."""
    n = len(matrix)
    rows = [list(matrix[i]) + [side[i] for side in sides] for i in range(n)]
    for i in range(n):
        pivot = next(r for r in range(i, n) if rows[r][i] != 0)
        rows[i], rows[pivot] = rows[pivot], rows[i]
        rows[i] = [value / rows[i][i] for value in rows[i]]
        for r in range(n):
            if r != i and rows[r][i] != 0:
                rows[r] = [a - rows[r][i] * b for a, b in zip(rows[r], rows[i])]
    return [[rows[i][n + s] for i in range(n)] for s in range(len(sides))]


def digits(value, root=False):
    number = Decimal(value.numerator) / Decimal(value.denominator)
    return f"{number.sqrt() if root else number:.20e}"


def exact(data):
    y = [Fraction(value) for value in data["y"]]
    x = data["x"] if isinstance(data["x"][0], list) else [data["x"]]
    x = [[Fraction(value) for value in column] for column in x]
    n = len(y)
    columns = [[value**power for value in x[0]] for power in range(1, data["powers"] + 1)] if len(x) == 1 else x
    if data["intercept"]:
        columns = [[Fraction(1)] * n] + columns
    k = len(columns)
    dot = lambda a, b: sum(p * q for p, q in zip(a, b))
    normal = [[dot(a, b) for b in columns] for a in columns]
    unit = [[Fraction(int(i == j)) for i in range(k)] for j in range(k)]
    b, *inverse = solve(normal, [[dot(a, y) for a in columns]] + unit)
    fitted = [sum(b[j] * columns[j][t] for j in range(k)) for t in range(n)]
    e = [p - q for p, q in zip(y, fitted)]
    rss = dot(e, e)
    mean = sum(y) / n
    centred = sum((value - mean) ** 2 for value in y)
    about = centred if data["intercept"] else dot(y, y)
    tested = k - 1 if data["intercept"] else k
    variance = rss / (n - k)
    leverage = [
        sum(columns[i][t] * inverse[i][j] * columns[j][t] for i in range(k) for j in range(k)) for t in range(n)
    ]
    return {
        "coefficients": [digits(value) for value in b],
        "standardErrors": [digits(variance * inverse[j][j], root=True) for j in range(k)],
        "residualStandardDeviation": digits(variance, root=True),
        "rSquaredCentred": digits(1 - rss / centred),
        "rSquaredUncentred": digits(1 - rss / dot(y, y)),
        "fStatistic": digits((about - rss) / tested / variance) if rss else None,
        "durbinWatson": digits(sum((p - q) ** 2 for p, q in zip(e[1:], e)) / rss) if rss else None,
        "leverage": [digits(value) for value in leverage],
        "residuals": [digits(value) for value in e],
    }


# parse_float=str keeps every decimal as printed.
sets = json.loads((here / "nist-strd.json").read_text(), parse_float=str)
(here / "nist-exact.json").write_text(json.dumps({name: exact(data) for name, data in sets.items()}, indent=1) + "\n")
