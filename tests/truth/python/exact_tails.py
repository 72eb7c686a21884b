"""Distribution functions in decimals of 60 digits, of 480 where a tail needs them: [[kind, arguments], ...] in, their values out.

Kinds: lowerGamma, upperGamma (a, x) and lowerBeta, upperBeta (a, b, x), a and b whole or half numbers, and the distributions made of them.
A kind that ends in "Brackets" has a quantile and a probability as its first two arguments and gives 1 when the exact
distribution function passes the probability within 1e-12 of the quantile, else 0.
Series: DLMF 8.7.1 and 8.17.7, 8.17.8, all terms positive.
"""
import json
import sys
from decimal import Decimal, getcontext, localcontext
from fractions import Fraction
from functools import lru_cache

FULL, QUICK = 480, 60
getcontext().prec = FULL
getcontext().Emin, getcontext().Emax = -10**7, 10**7
HALF = Fraction(1, 2)


@lru_cache
def pi():
    """Machin 1706: 16 arctan 1/5 - 4 arctan 1/239."""
    def arctan(n):
        term, total, k = Decimal(1) / n, Decimal(0), 1
        while abs(term) > Decimal(10) ** -490:
            total += term / k if k % 4 == 1 else -term / k
            term /= n * n
            k += 2
        return total
    return 16 * arctan(5) - 4 * arctan(239)


@lru_cache(maxsize=None)
def gamma(a):
    """Gamma of a whole or half number, always to the full number of digits."""
    with localcontext() as context:
        context.prec = FULL
        product, step = (pi().sqrt(), HALF) if a.denominator == 2 else (Decimal(1), Fraction(1))
        while step < a:
            product *= decimal(step)
            step += 1
        return product


def decimal(x):
    x = Fraction(x)
    return Decimal(x.numerator) / Decimal(x.denominator)


def series(ratio):
    """1 + ratio(0) + ratio(0) ratio(1) + ..."""
    total = term = Decimal(1)
    small = Decimal(10) ** (5 - getcontext().prec)
    n = 0
    while True:
        term *= ratio(n)
        if term < total * small:
            return total
        total += term
        n += 1


def lower_gamma(a, x):
    if x == 0:
        return Decimal(0)
    top = decimal(x)
    return (decimal(a) * top.ln() - top).exp() / gamma(Fraction(a + 1)) * series(lambda n: top / decimal(a + 1 + n))


def lower_beta(a, b, x):
    if x <= 0 or x >= 1:
        return Decimal(0 if x <= 0 else 1)
    if x > HALF:
        return 1 - lower_beta(b, a, 1 - x)
    top = decimal(x)
    front = (decimal(a) * top.ln() + decimal(b) * (1 - top).ln()).exp() * gamma(Fraction(a + b)) / gamma(Fraction(a + 1)) / gamma(Fraction(b))
    return front * series(lambda n: top * decimal(a + b + n) / decimal(a + 1 + n))


def chi2(x, dof):
    return lower_gamma(Fraction(dof) / 2, Fraction(x) / 2)


def fisher(x, m, n):
    x, m, n = Fraction(x), Fraction(m), Fraction(n)
    return lower_beta(m / 2, n / 2, m * x / (m * x + n)) if x > 0 else Decimal(0)


def fisher_tail(x, m, n):
    x, m, n = Fraction(x), Fraction(m), Fraction(n)
    return lower_beta(n / 2, m / 2, n / (m * x + n)) if x > 0 else Decimal(1)


def student_tail(x, dof):
    x, n = Fraction(x), Fraction(dof)
    half = lower_beta(n / 2, HALF, n / (n + x * x)) / 2
    return half if x >= 0 else 1 - half


def erfc(x):
    square = Fraction(x) ** 2
    return 1 - lower_gamma(HALF, square) if x >= 0 else 1 + lower_gamma(HALF, square)


# Sums of positive terms only, whatever their size.
whole = ('chiSquareCdf',)
functions = {
    'erfc': erfc,
    'chiSquareCdf': chi2,
    'chiSquareTail': lambda x, dof: 1 - chi2(x, dof),
    'fisherCdf': fisher,
    'fisherTail': fisher_tail,
    'studentTail': student_tail,
    'normalTail': lambda z: lower_gamma_tail(z),
}


def lower_gamma_tail(z):
    half = (1 - lower_gamma(HALF, Fraction(z) ** 2 / 2)) / 2
    return half if z >= 0 else 1 - half


def brackets(name, x, probability, *rest):
    below, above = (evaluate(name, [Fraction(x) * (1 + sign * Fraction(1, 10**12)), *rest]) > Decimal(probability) for sign in (-1, 1))
    return int(below != above)


def evaluate(name, arguments):
    """With few digits first; when a difference of nearly equal numbers has eaten them, with all."""
    getcontext().prec = QUICK
    quick = functions[name](*arguments)
    if abs(quick) > Decimal(10) ** -30 or name in whole:
        return quick
    getcontext().prec = FULL
    return functions[name](*arguments)


def value(name, arguments):
    return brackets(name[:-8], *arguments) if name.endswith('Brackets') else evaluate(name, arguments)


print(json.dumps([float(value(name, arguments)) for name, arguments in json.load(sys.stdin)]))
