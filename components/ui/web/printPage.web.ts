/** Opens the browser's own printing of the page as it stands. */
export const printPage: (() => void) | null = () => {
  window.print()
}
