/** Hands a file to the browser. */
export function download(name: string, content: Blob | string): void {
  const url = typeof content === 'string' ? content : URL.createObjectURL(content)
  const link = document.createElement('a')
  link.href = url
  link.download = name
  link.click()
  if (typeof content !== 'string') setTimeout(() => URL.revokeObjectURL(url), 10_000)
}
