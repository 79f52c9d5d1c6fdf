/**
 * Hands a text to the browser as a file to keep.
 *
 * @param mime such as `text/csv`; the text goes out in UTF-8
 */
export function downloadText(fileName: string, text: string, mime: string): void {
  const address = URL.createObjectURL(new Blob([text], { type: `${mime};charset=utf-8` }))
  const link = document.createElement('a')
  link.href = address
  link.download = fileName
  document.body.append(link)
  link.click()
  link.remove()
  // The browser needs the address until it has begun to read.
  setTimeout(() => URL.revokeObjectURL(address), 60_000)
}
