/** Tells screen readers and hyphenation which language the page is in. */
export function setDocumentLanguage(language: string): void {
  document.documentElement.lang = language
}
