"""scipy.optimize.curve_fit of (beta, scale) to tables {energy, weight, intensity, sigma, start, C2}; energies in cm^-1."""
import json
import sys

import numpy as np
from scipy.optimize import curve_fit

answers = []
for table in json.load(sys.stdin):
    energy = table['C2'] * np.array(table['energy'])
    weight = np.array(table['weight'])
    # Parameters near 1: beta in units of its start, the scale of the largest intensity.
    unit = np.max(np.abs(table['intensity'])) / np.max(weight * np.exp(-energy * table['start']))

    def model(_, beta, scale):
        return unit * scale * weight * np.exp(-energy * beta * table['start'])

    p, c = curve_fit(model, energy, table['intensity'], p0=[1, 1], sigma=table['sigma'], absolute_sigma=True,
                     ftol=1e-15, xtol=1e-15, gtol=1e-15, maxfev=10000)
    beta, u = p[0] * table['start'], np.sqrt(c[0, 0]) * table['start']
    answers.append({'temperature': 1 / beta, 'uncertainty': u / beta ** 2, 'scale': p[1] * unit, 'uScale': np.sqrt(c[1, 1]) * unit})
print(json.dumps(answers))
