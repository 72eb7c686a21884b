const signatures: [number[], string][] = [
  [[0x1F, 0x8B], 'a gzip archive (unpack it first)'],
  [[0x50, 0x4B, 0x03, 0x04], 'a zip archive or a spreadsheet (unpack it, or save the sheet as CSV)'],
  [[0x25, 0x50, 0x44, 0x46], 'a PDF document'],
  [[0x89, 0x50, 0x4E, 0x47], 'a PNG picture'],
  [[0xFF, 0xD8, 0xFF], 'a JPEG picture'],
  [[0x89, 0x48, 0x44, 0x46], 'an HDF5 or netCDF-4 file'],
  [[0x43, 0x44, 0x46, 0x01], 'a netCDF file'],
  [[0x43, 0x44, 0x46, 0x02], 'a netCDF file'],
  [[0xD0, 0xCF, 0x11, 0xE0], 'an old spreadsheet (save the sheet as CSV)'],
]

/** Files that are often sent by mistake, in words; null when the bytes begin like none of them. */
export function foreignFormat(bytes: Uint8Array): string | null {
  return signatures.find(([start]) => start.every((byte, index) => bytes[index] === byte))?.[1] ?? null
}
