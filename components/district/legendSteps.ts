/** One step of a painted map. */
export interface LegendStep {
  readonly low: number
  readonly high: number
  readonly count: number
}

/**
 * Steps of a map between its limits, each with the number of values in it.
 *
 * @param values what is painted
 * @param breaks rising limits between the steps; a value on a limit belongs to the step above
 * @example legendSteps([1, 2, 3], [3]).map(({ count }) => count) // => [2, 1]
 */
export function legendSteps(values: readonly number[], breaks: readonly number[]): LegendStep[] {
  if (values.length === 0) return []
  const least = values.reduce((low, value) => Math.min(low, value), Infinity)
  const most = values.reduce((high, value) => Math.max(high, value), -Infinity)
  const edges = [least, ...breaks, most]
  return edges.slice(0, -1).map((low, place) => {
    const high = edges[place + 1] ?? most
    const isLast = place === edges.length - 2
    const count = values.filter((value) => value >= low && (isLast || value < high)).length
    return { low, high, count }
  })
}
