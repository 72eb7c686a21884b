"""
scipy.optimize.curve_fit measures the lines of the spectra of standard input: default tolerances, no jac, vectorised model.
It starts from the engine's shift and width, and from the areas and the continuum that are best there.
The shift is fitted as the wavelength of the first component: around zero the steps of its finite differences would be too small.
Prints seconds per spectrum of each pass and, per spectrum, areas with their standard uncertainties.
"""
import json
import sys
import time

import numpy as np
from scipy.optimize import curve_fit

FWHM_PER_SIGMA = 2 * np.sqrt(2 * np.log(2))


class Spectrum:
    def __init__(self, job):
        self.x, self.values, self.sigma, self.share = (np.array(job[key]) for key in ('x', 'values', 'sigma', 'share'))
        centre = np.array(job['centre'])
        self.offset = (centre - centre[0])[:, None]
        self.line = np.array(job['line'])
        self.lines = job['lines']
        self.basis = np.array(job['basis'])
        linear = np.array([self.model(self.x, centre[0], job['fwhm'], *unit) for unit in np.eye(self.lines + len(self.basis))])
        best = np.linalg.lstsq((linear / self.sigma).T, self.values / self.sigma, rcond=None)[0]
        self.start = [centre[0], job['fwhm'], *best]

    def model(self, x, first, fwhm, *linear):
        width = fwhm / FWHM_PER_SIGMA
        z = x - (self.offset + first)
        z /= width
        z *= z
        z *= -0.5
        np.exp(z, out=z)
        linear = np.array(linear)
        strength = linear[self.line] * self.share / (width * np.sqrt(2 * np.pi))
        return strength @ z + linear[self.lines:] @ self.basis

    def fit(self):
        p, covariance = curve_fit(self.model, self.x, self.values, p0=self.start, sigma=self.sigma, absolute_sigma=True)
        areas = slice(2, 2 + self.lines)
        return {'areas': list(p[areas]), 'u': list(np.sqrt(np.diag(covariance))[areas])}


job = json.load(sys.stdin)
spectra = [Spectrum(each) for each in job['spectra']]
answers = []
seconds = []
for _ in range(job['passes']):
    begin = time.perf_counter()
    answers = [spectrum.fit() for spectrum in spectra]
    seconds.append((time.perf_counter() - begin) / len(spectra))
print(json.dumps({'seconds': seconds, 'answers': answers}, allow_nan=False))
