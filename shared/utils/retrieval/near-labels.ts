/** Edit distance of two words (Levenshtein), small alphabets and short words. */
export function editDistance(a: string, b: string): number {
  let row = Array.from({ length: b.length + 1 }, (_, j) => j)
  for (let i = 1; i <= a.length; i++) {
    const next = [i]
    for (let j = 1; j <= b.length; j++) next[j] = Math.min(row[j] + 1, next[j - 1] + 1, row[j - 1] + (a[i - 1] === b[j - 1] ? 0 : 1))
    row = next
  }
  return row[b.length]
}

/** The labels most like a word, nearest first. */
export function nearLabels(word: string, labels: readonly string[], count = 4): string[] {
  const wanted = word.toUpperCase().replaceAll(/\s/g, '')
  const ranked = [...new Set(labels)].map(label => ({ label, distance: editDistance(wanted, label.toUpperCase()) }))
  return ranked.sort((a, b) => a.distance - b.distance).slice(0, count).map(({ label }) => label)
}
