const C2 = 1.438776877

/** Six lines of an invented rotor at a temperature, with their molecular data in line. */
export function lineTable(temperature: number, name = 'test table') {
  const lines = Array.from({ length: 6 }, (_, i) => {
    const termUpper = 10 + 12 * i * i
    const gUpper = 2 * (2 * i + 3)
    const intensity = 100 * gUpper * Math.exp(-C2 * termUpper / temperature)
    return { label: `L${i + 1}`, wavenumber: 6600 - 10 * i, termUpper, termLower: 0, gUpper, gLower: gUpper, A: 10, intensity, sigma: 0.01 * intensity }
  })
  return { observable: 'photon-emission', name, lines }
}
