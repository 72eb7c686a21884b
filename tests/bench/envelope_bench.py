"""scipy.optimize.curve_fit on the tables of standard input: default tolerances, no jac, vectorised model. Prints seconds per fit and T."""
import json
import sys
import time

import numpy as np
from scipy.optimize import curve_fit

job = json.load(sys.stdin)
energy = np.array(job['energy'])
weight = np.array(job['weight'])
sigma = np.array(job['sigma'])
tables = [np.array(table) for table in job['tables']]


def model(e, beta, scale):
    return scale * weight * np.exp(-e * beta)


def run():
    answers = []
    for intensity in tables:
        p, covariance = curve_fit(model, energy, intensity, p0=job['start'], sigma=sigma, absolute_sigma=True)
        answers.append([1 / p[0], float(np.sqrt(covariance[0, 0])) / p[0] ** 2])
    return answers


answers = run()
seconds = []
for _ in range(job['repeats']):
    begin = time.perf_counter()
    run()
    seconds.append((time.perf_counter() - begin) / len(tables))
print(json.dumps({'seconds': seconds, 'answers': answers}))
