const units = ['bytes', 'kB', 'MB', 'GB', 'TB', 'PB'] as const

/** "3.4 MB", by powers of 1000; three digits. */
export function bytesText(bytes: number): string {
  let value = bytes
  let unit = 0
  while (value >= 999.5 && unit < units.length - 1) {
    value /= 1000
    unit++
  }
  const digits = unit === 0 || value >= 99.95 ? 0 : value >= 9.995 ? 1 : 2
  return `${value.toFixed(digits)} ${unit === 0 && value === 1 ? 'byte' : units[unit]}`
}
