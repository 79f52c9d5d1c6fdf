/** Names the browser's tab after the screen, the product after it. */
export function setDocumentTitle(title: string): void {
  document.title = `${title} · Tallystone`
}
