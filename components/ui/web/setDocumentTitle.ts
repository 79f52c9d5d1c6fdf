/** Only a browser shows a document's title. */
export function setDocumentTitle(_title: string): void {}
