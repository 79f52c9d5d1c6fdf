import { massBand, type MassBand } from '@/shared/compute/run/massBand'

/**
 * Band that is to be expected of a figure after the first n looks of a list,
 *
 *     Var_n = Var − Σ_{i ≤ n} fall_i,
 *
 * with the mean as it stands: it will move, but nobody knows which way.
 *
 * @param meanKg mean now [kg], ≥ 0
 * @param varianceKg2 variance now [kg²], ≥ the sum of the falls
 * @param fallsKg2 expected falls in the order of the looks [kg²]
 * @param looks n, 0 to the number of falls; more counts as all
 * @throws {ComputeError} `negative-amount`
 * @see `expectedFall` for the derivation, `massBand` for the quantiles.
 * @example
 * bandAfterLooks(100, 625, [225, 400], 2).p90Kg // => 100
 */
export function bandAfterLooks(
  meanKg: number,
  varianceKg2: number,
  fallsKg2: readonly number[],
  looks: number,
): MassBand {
  let left = varianceKg2
  for (const fallKg2 of fallsKg2.slice(0, looks)) left -= fallKg2
  return massBand(meanKg, left < 0 && left > -1e-9 * varianceKg2 ? 0 : left)
}
