/** Relative populations (2J+1) exp(-B J(J+1)/kT) of a rigid rotor, J = 0 ... levels - 1, the tallest at 1. `theta` is kT/B. */
export function rotorEnvelope(levels: number, theta: number): number[] {
  const heights = Array.from({ length: levels }, (_, j) => (2 * j + 1) * Math.exp(-j * (j + 1) / theta))
  const tallest = Math.max(...heights)
  return heights.map(height => height / tallest)
}

/** One stroke of an envelope picture; both lengths are shares of the picture. */
export interface EnvelopeStroke { label: string, x: number, measured: number, model: number | null }

/** Places a result's lines along their upper energy and scales the strokes to the strongest. Lines that are not positive hang at zero length. */
export function envelopeStrokes(lines: { label: string, termEnergy: number, intensity: number, model: number | null }[]): EnvelopeStroke[] {
  const energies = lines.map(line => line.termEnergy)
  const low = Math.min(...energies)
  const span = Math.max(...energies) - low || 1
  const tallest = Math.max(...lines.map(line => Math.max(line.intensity, line.model ?? 0))) || 1
  const share = (value: number) => Math.max(0, value) / tallest
  return lines.map(line => ({
    label: line.label,
    x: lines.length === 1 ? 0.5 : (line.termEnergy - low) / span,
    measured: share(line.intensity),
    model: line.model == null ? null : share(line.model),
  }))
}
