#!/usr/bin/env python3
"""Values of elementary functions for tests/inversion/math, from Python's decimal module at 80 digits.
Each entry: x (a double), and the value as two doubles whose sum it is to about 32 digits.
python3 tests/reference/generate_elementary.py > tests/reference/elementary.json"""
import json
import random
from decimal import Decimal as D, getcontext

getcontext().prec = 80
ONE = D(1)


def arctangent_of_inverse(n):
    total, term, k = D(0), ONE / n, 0
    while abs(term) > D(10) ** -85:
        total += term / (2 * k + 1) * (-1) ** k
        term /= n * n
        k += 1
    return total


PI = 4 * (4 * arctangent_of_inverse(5) - arctangent_of_inverse(239))  # Machin 1706


def sine(x):
    x = x % (2 * PI)
    if x > PI:
        x -= 2 * PI
    total, term, k = D(0), x, 1
    while abs(term) > D(10) ** -85:
        total += term
        term *= -x * x / ((k + 1) * (k + 2))
        k += 2
    return total


FUNCTIONS = {
    'exp': lambda x: x.exp(),
    'expm1': lambda x: x.exp() - 1,
    'log': lambda x: x.ln(),
    'log1p': lambda x: (1 + x).ln(),
    'log2': lambda x: x.ln() / D(2).ln(),
    'sin': sine,
    'cos': lambda x: sine(x + PI / 2),
    'pow2': lambda x: (x * D(2).ln()).exp(),
    'pow10': lambda x: (x * D(10).ln()).exp(),
}

random.seed(20)
linear = lambda low, high, count: [random.uniform(low, high) for _ in range(count)]
sizes = lambda low, high, count: [10 ** random.uniform(low, high) for _ in range(count)]
signed = lambda values: [v * random.choice((-1, 1)) for v in values]
POINTS = {
    'exp': linear(-745, 709, 150) + linear(-1, 1, 100) + signed(sizes(-18, 0, 50)),
    'expm1': linear(-40, 709, 100) + linear(-2, 2, 150) + signed(sizes(-18, 0, 50)),
    'log': sizes(-307, 308, 100) + linear(0.5, 2, 150) + [5e-324, 1e-310, 1 + 2**-52, 1 - 2**-53],
    'log1p': sizes(-18, 308, 100) + linear(-0.999, 2, 150) + signed(sizes(-18, -1, 50)),
    'log2': sizes(-307, 308, 100) + linear(0.5, 2, 100),
    'sin': linear(-7, 7, 150) + signed(sizes(-18, 6.2, 100)) + [k * 1.5707963267948966 for k in (1, 2, 3, 1000, 100001)],
    'cos': linear(-7, 7, 150) + signed(sizes(-18, 6.2, 100)) + [k * 1.5707963267948966 for k in (1, 2, 3, 1000, 100001)],
    'pow2': linear(-60, 60, 100) + linear(-1, 1, 50) + linear(-1000, 1000, 50),
    'pow10': linear(-22, 22, 150),
}
table = {}
for name, function in FUNCTIONS.items():
    rows = []
    for x in POINTS[name]:
        y = function(D(x))
        high = float(y)
        rows.append([x, high, float(y - D(high))])
    table[name] = rows
print(json.dumps(table, separators=(',', ':')).replace(']],', ']],\n'))
