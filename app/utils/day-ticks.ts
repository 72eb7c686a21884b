const day = 86_400_000
const steps = [1, 2, 7, 14, 28, 91, 182, 365].map(days => days * day)

/** Marks on a time axis at whole days, at most `most` of them. */
export function dayTicks(from: number, to: number, most = 8): number[] {
  const step = steps.find(candidate => (to - from) / candidate <= most) ?? Math.ceil((to - from) / most / day) * day
  const first = Math.ceil(from / day) * day
  return Array.from({ length: Math.max(0, Math.floor((to - first) / step) + 1) }, (_, index) => first + index * step)
}
