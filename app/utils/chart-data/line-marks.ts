export interface LineMark { label: string, band: string, x: number, used: boolean, /** 0 is the upper row; labels that would touch take turns. */ row: number }

/**
 * Vacuum wavelength (nm) of each line with a row for its label: neighbours closer than `gap` (a share of the
 * range) go to the next row, so that labels stay legible.
 */
export function lineMarks(lines: { label: string, band: string, wavenumber: number, used: boolean }[], range: [number, number], gap = 0.06): LineMark[] {
  const width = (range[1] - range[0]) * gap
  const lastInRow: number[] = []
  return lines
    .map(({ label, band, wavenumber, used }) => ({ label, band, used, x: 1e7 / wavenumber }))
    .filter(mark => mark.x >= range[0] && mark.x <= range[1])
    .sort((a, b) => a.x - b.x)
    .map((mark) => {
      const free = lastInRow.findIndex(x => mark.x - x >= width)
      const row = free >= 0 ? free : Math.min(lastInRow.length, 2)
      lastInRow[row] = mark.x
      return { ...mark, row }
    })
}

/** The line a pointer at `x` means: the nearest one within two per cent of the range, else none. */
export function nearestMark(marks: LineMark[], x: number, range: [number, number]): LineMark | null {
  const reach = 0.02 * (range[1] - range[0])
  const [nearest] = [...marks].sort((a, b) => Math.abs(a.x - x) - Math.abs(b.x - x))
  return nearest && Math.abs(nearest.x - x) <= reach ? nearest : null
}
