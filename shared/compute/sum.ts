/**
 * Compensated sum: the rounding error of each addition is carried along and added at the end,
 * so that totals over many small parts keep all digits a double can hold.
 *
 * @param values finite numbers, any length; the sum of none is 0
 * @returns their sum, same unit
 * @see Neumaier, A. (1974). Rundungsfehleranalyse einiger Verfahren zur Summation endlicher Summen.
 *   Zeitschrift für Angewandte Mathematik und Mechanik 54, 39–51.
 * @example
 * sum([1, 1e100, 1, -1e100]) // => 2
 */
export function sum(values: Iterable<number>): number {
  let total = 0
  let lost = 0
  for (const value of values) {
    const next = total + value
    lost += Math.abs(total) >= Math.abs(value) ? total - next + value : value - next + total
    total = next
  }
  return total + lost
}
