"""Values of scipy.special and scipy.stats for the calls given on standard input: [[name, arguments], ...]."""
import json
import sys

from scipy import special, stats

functions = {
    'logGamma': special.gammaln,
    'erf': special.erf,
    'erfc': special.erfc,
    'lowerGamma': special.gammainc,
    'upperGamma': special.gammaincc,
    'incompleteBeta': special.betainc,
    'normalCdf': special.ndtr,
    'normalQuantile': special.ndtri,
    'chiSquareCdf': lambda x, dof: special.chdtr(dof, x),
    'chiSquareTail': lambda x, dof: special.chdtrc(dof, x),
    'chiSquareQuantile': lambda p, dof: stats.chi2.ppf(p, dof),
    'fisherCdf': lambda x, m, n: stats.f.cdf(x, m, n),
    'fisherTail': lambda x, m, n: stats.f.sf(x, m, n),
    'fisherQuantile': lambda p, m, n: stats.f.ppf(p, m, n),
    'studentCdf': lambda x, dof: stats.t.cdf(x, dof),
    'studentTail': lambda x, dof: stats.t.sf(x, dof),
}
print(json.dumps([float(functions[name](*arguments)) for name, arguments in json.load(sys.stdin)]))
