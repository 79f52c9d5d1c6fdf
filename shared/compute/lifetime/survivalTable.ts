/** A survival function at yearly steps: entry j is age first + j. */
export interface SurvivalTable {
  readonly firstAgeYears: number
  readonly logSurvival: Float64Array
  readonly survival: Float64Array
  /** S(first + j) − S(first + j + 1), with the digits that the difference of two near numbers would lose. */
  readonly leaving: Float64Array
}

/**
 * A table from ln S at yearly steps, one step more than the table is long.
 *
 * @param logSurvival ln S, never rising [–]
 * @example
 * survivalTable(0, Float64Array.of(0, -0.5, -Infinity)).survival // => [1, 0.6065306597126334]
 */
export function survivalTable(firstAgeYears: number, logSurvival: Float64Array): SurvivalTable {
  const survival = logSurvival.map(Math.exp)
  const length = logSurvival.length - 1
  const leaving = Float64Array.from({ length }, (_, step) => {
    const [now, next] = [logSurvival[step]!, logSurvival[step + 1]!]
    return now === -Infinity ? 0 : -survival[step]! * Math.expm1(next - now)
  })
  return {
    firstAgeYears,
    logSurvival: logSurvival.subarray(0, length),
    survival: survival.subarray(0, length),
    leaving,
  }
}
