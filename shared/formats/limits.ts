export const maxPixels = 1_000_000
export const minPixels = 2
export const maxColumns = 64
