/** Only a browser prints the page it shows. */
export function usePrinting(): boolean {
  return false
}
