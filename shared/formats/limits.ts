export const maxPixels = 1_000_000
export const minPixels = 2
export const maxColumns = 64
/** Characters of a heading or of the first row of numbers; a real one has some hundreds. */
export const maxLineLength = 20_000
/** Characters that are read of a column's name. */
export const maxNameLength = 200
