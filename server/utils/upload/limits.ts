const MEGABYTE = 1024 * 1024

export interface UploadLimits { fileBytes: number, files: number, requestBytes: number, fields: number, fieldBytes: number }
export const uploadLimits: UploadLimits = { fileBytes: 32 * MEGABYTE, files: 200, requestBytes: 256 * MEGABYTE, fields: 10, fieldBytes: 64 * 1024 }

export const inWords = (bytes: number) => bytes >= MEGABYTE ? `${Math.round(bytes / MEGABYTE)} MB` : `${Math.round(bytes / 1024)} kB`
