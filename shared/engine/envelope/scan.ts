/** The grid point low 2^k of smallest chi2, by plain evaluation; the first of equals. */
export function scanByEvaluation(profile: { evaluate: (beta: number) => number, scanChi2: number }, low: number, count: number): number {
  let best = 0
  let smallest = Infinity
  for (let k = 0; k < count; k++) {
    const chi2 = profile.evaluate(low * 2 ** k)
    if (chi2 < smallest) {
      smallest = chi2
      best = k
    }
  }
  profile.scanChi2 = smallest
  return best
}

/** Points low, low ratio, ... and high, ascending. */
export function scanPoints(low: number, high: number, ratio: number): number[] {
  const points: number[] = []
  for (let x = low; x < high; x *= ratio) points.push(x)
  points.push(high)
  return points
}
