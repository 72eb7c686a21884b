/** "39 min 29 s ahead of UTC", "5 h 20 min behind UTC". */
export function aheadWords(milliseconds: number): string {
  const seconds = Math.round(Math.abs(milliseconds) / 1000)
  if (seconds === 0) return 'the same as UTC'
  const parts = [[Math.floor(seconds / 3600), 'h'], [Math.floor(seconds / 60) % 60, 'min'], [seconds % 60, 's']] as const
  return `${parts.filter(([count]) => count > 0).map(([count, unit]) => `${count} ${unit}`).join(' ')} ${milliseconds > 0 ? 'ahead of' : 'behind'} UTC`
}
