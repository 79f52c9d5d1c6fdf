/** Only a browser's document has a language. */
export function setDocumentLanguage(_language: string): void {}
