/** Content-Disposition for a file under its own name: only letters that the header's grammar takes (RFC 8187) go in as they are. */
export const attachment = (name: string): string =>
  `attachment; filename*=UTF-8''${encodeURIComponent(name.toWellFormed()).replace(/['()*]/g, letter => `%${letter.charCodeAt(0).toString(16).toUpperCase()}`)}`
