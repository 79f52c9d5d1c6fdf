import { ComputeError } from '@/shared/compute/errors'

/** A point of a path given as a table. */
export interface PathPoint {
  readonly year: number
  readonly value: number
}

/**
 * A path given by points, straight in between, level before the first and after the last.
 *
 * @param points years rising
 * @param firstYear first year asked for
 * @param years number of years
 * @returns value of each year, in the unit of the points
 * @throws {ComputeError} `empty-input`, `interval-reversed` when years do not rise, `not-a-number`
 * @see Common practice.
 * @example
 * tableGrowth([{ year: 2025, value: 10 }, { year: 2027, value: 20 }], 2024, 5) // => [10, 10, 15, 20, 20]
 */
export function tableGrowth(points: readonly PathPoint[], firstYear: number, years: number): Float64Array {
  const [first] = points
  const last = points.at(-1)
  if (!first || !last) throw new ComputeError('empty-input', { what: 'points' })
  points.forEach(({ year, value }, index) => {
    if (!Number.isFinite(year) || !Number.isFinite(value)) throw new ComputeError('not-a-number', { year, value })
    const before = points[index - 1]
    if (before && !(before.year < year)) throw new ComputeError('interval-reversed', { from: before.year, to: year })
  })
  let next = 0
  return Float64Array.from({ length: years }, (_, index) => {
    const year = firstYear + index
    if (year <= first.year) return first.value
    if (year >= last.year) return last.value
    while (points[next]!.year < year) next++
    const [left, right] = [points[next - 1]!, points[next]!]
    return left.value + ((right.value - left.value) * (year - left.year)) / (right.year - left.year)
  })
}
