// OH X2Pi Meinel bands: term energies and strengths of tests/truth/airglow/oh-meinel (its NOTES.md says how they were reduced).
import { readFileSync } from 'node:fs'

const folder = new URL('../../tests/truth/airglow/oh-meinel/', import.meta.url)
const recommended = ['P1(2)', 'P1(3)', 'P1(4)', 'P1(5)']

const strengthSets = [
  {
    name: 'brooke2016',
    title: 'Brooke et al. 2016',
    citation: 'Brooke, J. S. A., et al. 2016, J. Quant. Spectrosc. Radiat. Transfer 168, 142',
    absolute: true,
    note: 'From lg gf with three decimals (up to 0.12 %). Only lines above 1 micrometre.',
  },
  {
    name: 'mies1974',
    title: 'Mies 1974, as used by Rousselot et al. 2000',
    citation: 'Mies, F. H. 1974, J. Mol. Spectrosc. 53, 150; from the fluxes of Rousselot, P., et al. 2000, Astron. Astrophys. 354, 1134',
    absolute: false,
    note: 'Only ratios within one upper vibrational level mean anything. No bands with a change of v by 6.',
  },
  {
    name: 'hitran',
    title: 'HITRAN 16OH',
    citation: 'HITRAN 16OH records 1.51 to 1.70 micrometre, edition not stated in the file; see Gordon, I. E., et al. 2022, J. Quant. Spectrosc. Radiat. Transfer 277, 107949',
    absolute: true,
    note: 'Covers few bands, 3-1 P1 among them.',
  },
  {
    name: 'theoretical',
    title: 'Honl-London factors, nu^3, no Herman-Wallis correction',
    citation: 'Two-by-two Hund case (a) Hamiltonian per v; closed formulas of Hill & Van Vleck and of Kovacs 1969 (named from memory)',
    absolute: false,
    comparisonOnly: true,
    note: 'Neglects the coupling of rotation and vibration: P1(2)-P1(5) at 190 K read 2 to 20 K too warm. For comparison only.',
  },
]

function readCsv(name) {
  const [header, ...rows] = readFileSync(new URL(name, folder), 'utf8').trim().split('\n').map(row => row.split(','))
  return rows.map(cells => Object.fromEntries(header.map((key, i) => [key, cells[i] ?? ''])))
}

function strengthsOf(row, theoretical) {
  const found = [['brooke2016', row.A_brooke2016_s1], ['mies1974', row.A_mies1974_rel], ['hitran', row.A_hitran_s1], ['theoretical', theoretical]]
  return Object.fromEntries(found.filter(([, value]) => Number(value) > 0).map(([name, value]) => [name, Number(value)]))
}

const componentOf = (row, theoretical) => ({
  component: row.parity,
  wavenumber: Number(row.vacuum_wavenumber_cm1),
  termUpper: Number(row.E_upper_cm1),
  termLower: Number(row.E_lower_cm1),
  gUpper: 2 * Number(row.J_upper) + 1,
  gLower: 2 * Number(row.J_lower) + 1,
  strengths: strengthsOf(row, theoretical),
})

function cautionOf(id) {
  const upper = id.split('-')[0]
  return `Levels v'=${upper}, N' 1-4 of OH at about 87 km. The number stands for the air's temperature only while collisions keep these levels in balance; lines from higher N' read warmer.`
}

function bandOf(id, rows, theoretical) {
  const lines = new Map()
  for (const row of rows) {
    const line = lines.get(row.label) ?? { label: row.label, branch: row.branch, components: [] }
    line.components.push(componentOf(row, theoretical.get(`${id} ${row.label} ${row.parity}`)))
    lines.set(row.label, line)
  }
  return { id, title: `OH(${id})`, caution: cautionOf(id), recommendedLines: recommended, lines: [...lines.values()] }
}

export function ohMeinel() {
  const theoretical = new Map(readCsv('oh_honl_london_rel.csv').map(row => [`${row.band} ${row.label} ${row.parity}`, row.A_honl_london_rel]))
  const byBand = groupByBand(readCsv('oh_meinel_lines.csv'))
  return {
    id: 'oh-meinel',
    version: '1.0.0',
    title: 'OH Meinel bands, main branches',
    species: 'OH',
    energyZero: 'v=0, 2Pi3/2, J=1.5, e; hyperfine structure ignored',
    provenance: [
      'Term energies: weighted least squares over 16 648 transitions of Brooke et al. 2016 (v up to 10, J up to 25.5)',
      'Checked against HITRAN (median 0.0004 cm-1) and Osterbrock et al. 1996, PASP 108, 277; 1997, PASP 109, 614 (0.004 Angstrom rms)',
      'Degeneracies are 2J+1 for each Lambda component; the proton spin factor 2 is common and left out',
      'Method and checks: tests/truth/airglow/oh-meinel/NOTES.md',
    ],
    licence: 'Published data; cite the sources of the positions and of the strength set that is used',
    recommendedObservable: 'photon-emission',
    strengthSets,
    bands: [...byBand].map(([id, rows]) => bandOf(id, rows, theoretical)),
  }
}

function groupByBand(rows) {
  const groups = new Map()
  for (const row of rows) groups.set(row.band, [...(groups.get(row.band) ?? []), row])
  return groups
}
