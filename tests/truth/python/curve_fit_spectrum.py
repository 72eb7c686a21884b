"""scipy.optimize.curve_fit of all areas, shift, ln width and a polynomial at once to {wavelength, values, sigma, centres, areas, fwhm, order}."""
import json
import sys

import numpy as np
from scipy.optimize import curve_fit

task = json.load(sys.stdin)
x, y, s = (np.array(task[key]) for key in ('wavelength', 'values', 'sigma'))
centres, n = np.array(task['centres']), len(task['centres'])
u = (2 * x - x[0] - x[-1]) / (x[-1] - x[0])
powers = np.vander(u, task['order'] + 1, increasing=True)
per_sigma = 2 * np.sqrt(2 * np.log(2))


def profiles(p):
    sigma = np.exp(p[n + 1]) / per_sigma
    z = (x[:, None] - centres[None, :] - p[n]) / sigma
    return sigma, z, np.exp(-z * z / 2) / (sigma * np.sqrt(2 * np.pi))


def model(_, *p):
    return profiles(p)[2] @ np.array(p[:n]) + powers @ np.array(p[n + 2:])


def jacobian(_, *p):
    sigma, z, g = profiles(p)
    areas = np.array(p[:n])
    return np.column_stack([g, (g * z / sigma) @ areas, (g * (z * z - 1)) @ areas, powers])


start = [*task['areas'], 0.0, np.log(task['fwhm']), *np.zeros(task['order'] + 1)]
p, c = curve_fit(model, x, y, p0=start, sigma=s, absolute_sigma=True, jac=jacobian, method='lm', ftol=1e-15, xtol=1e-15, gtol=1e-15, maxfev=10000)
chi2 = float(np.sum(((y - model(x, *p)) / s) ** 2))
print(json.dumps({'areas': p[:n].tolist(), 'covariance': c[:n, :n].ravel().tolist(), 'shift': p[n], 'uShift': np.sqrt(c[n, n]),
                  'fwhm': np.exp(p[n + 1]), 'uFwhm': np.exp(p[n + 1]) * np.sqrt(c[n + 1, n + 1]), 'chi2': chi2}))
