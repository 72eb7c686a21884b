"""scipy.optimize.least_squares of two temperatures and two scales to tables {energy, weight, intensity, sigma, start: [T1, T2], C2}.

Parameters ln T1, ln T2 and scales in units of their linear least-squares values at the start; MINPACK's lmder, tolerances 1e-15, analytic derivatives.
"""
import json
import sys

import numpy as np
from scipy.optimize import least_squares

answers = []
for table in json.load(sys.stdin):
    energy = table['C2'] * np.array(table['energy'])
    weight = np.array(table['weight']) / np.array(table['sigma'])
    y = np.array(table['intensity']) / np.array(table['sigma'])

    def columns(t):
        return weight[:, None] * np.exp(-energy[:, None] / np.exp(t))

    unit = np.linalg.lstsq(columns(np.log(table['start'])), y, rcond=None)[0]

    def residuals(p):
        return columns(p[:2]) @ (unit * p[2:]) - y

    def jacobian(p):
        c = columns(p[:2])
        return np.column_stack([c * (unit * p[2:]) * energy[:, None] / np.exp(p[:2]), c * unit])

    fit = least_squares(residuals, [*np.log(table['start']), 1, 1], jac=jacobian, method='lm', ftol=1e-15, xtol=1e-15, gtol=1e-15, max_nfev=100000)
    q, r = np.linalg.qr(fit.jac)
    inverse = np.linalg.inv(r)
    covariance = inverse @ inverse.T
    order = np.argsort(fit.x[:2])
    t = np.exp(fit.x[:2])[order]
    # In T and scale: d T = T d ln T.
    size = np.concatenate([np.exp(fit.x[:2]), unit])
    full = covariance * np.outer(size, size)
    places = [order[0], order[1], 2 + order[0], 2 + order[1]]
    answers.append({'temperatures': t.tolist(), 'scales': (unit * fit.x[2:])[order].tolist(), 'chi2': float(2 * fit.cost),
                    'uncertainties': np.sqrt(np.diag(full))[places].tolist()})
print(json.dumps(answers))
