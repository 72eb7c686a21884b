import { nightSpectrum } from '../../docker-free-scripts/demo/night-spectrum.mjs'

/** Nine lines of OH(5-2) are chosen; the list knows five more between them that are measured beside them: 14 areas. */
export const benchSettings = {
  observable: 'photon-emission', lineList: 'oh-meinel', bands: ['5-2'], strengthSet: 'brooke2016', continuumOrder: 2,
  lines: ['P1(2)', 'P1(3)', 'P1(4)', 'P1(5)', 'P2(2)', 'P2(3)', 'P2(4)', 'P2(5)', 'P2(6)'],
}

/** An invented, seeded spectrum of 1024 pixels that all take part in the fit, 5 of them to a line's FWHM. */
export const benchSpectrum = index => nightSpectrum({
  band: '5-2', medium: 'vacuum', temperature: 180 + index / 10, seed: 1 + index, head: ['Invented bench data.'], start: 1088.6, pixelWidth: 0.026, fwhm: 0.13,
})
