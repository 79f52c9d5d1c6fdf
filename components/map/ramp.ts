/** Five steps from little to much; each is darker than the one before, so that they read in grey as well. */
export const RAMP = ['#F5E6D3', '#E5BE9B', '#CF8C66', '#A9502F', '#661E0E'] as const

/**
 * Limits between the steps of a map, so that each holds about the same number of things.
 *
 * @param values what is painted; those that are not finite are left out
 * @param steps number of steps, ≥ 1
 * @returns `steps` − 1 limits, rising; fewer when many values are equal
 * @example quantileBreaks([1, 2, 3, 4], 2) // => [3]
 */
export function quantileBreaks(values: readonly number[], steps: number = RAMP.length): number[] {
  const sorted = values.filter((value) => Number.isFinite(value)).sort((one, other) => one - other)
  const limits = Array.from(
    { length: steps - 1 },
    (_, step) => sorted[Math.floor(((step + 1) * sorted.length) / steps)],
  )
  const found = limits.filter((limit) => limit !== undefined)
  return found.filter((limit, place) => limit > (found[place - 1] ?? sorted[0] ?? Infinity))
}

/** Colour of a value between the limits: the step it falls in, spread over the ramp. */
export function rampColour(value: number, breaks: readonly number[]): string {
  const step = breaks.filter((limit) => value >= limit).length
  const spread = breaks.length === 0 ? 0 : Math.round((step * (RAMP.length - 1)) / breaks.length)
  return RAMP[spread] ?? RAMP[0]
}
