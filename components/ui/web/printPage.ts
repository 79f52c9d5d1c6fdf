/** Only a browser prints the page it shows. */
export const printPage: (() => void) | null = null
