/** Correct significant digits of a number: -log10 of its relative error (the LRE of McCullough 1998), at most `most`. */
export function correctDigits(found: number, truth: number, most = 15): number {
  if (found === truth) return most
  const error = truth === 0 ? Math.abs(found) : Math.abs(found / truth - 1)
  return Number.isFinite(error) ? Math.max(0, Math.min(most, -Math.log10(error))) : 0
}

export const fewestDigits = (found: ArrayLike<number>, truth: ArrayLike<number>, most = 15) =>
  Array.from(truth).reduce((least, value, i) => Math.min(least, correctDigits(found[i], value, most)), most)

/** |a / b - 1|, 0 where both are equal. */
export const relativeError = (found: number, truth: number) => found === truth ? 0 : Math.abs(found / truth - 1)
