import { ComputeError } from '@/shared/compute/errors'

export interface CombinedMultiplier {
  readonly product: number
  /** The product within its bounds: what is used. */
  readonly applied: number
  readonly isClamped: boolean
}

/** Widest effect that condition, vacancy and pressure together may have on the hazard. Common practice. */
export const MULTIPLIER_BOUNDS = { least: 0.2, most: 5 } as const

/**
 * Multipliers of the hazard combine by product, held within bounds that are shown with the result.
 *
 * @param multipliers each > 0 [–]; none gives 1
 * @param bounds least and most [–]; 0.2 to 5 unless given
 * @throws {ComputeError} `parameter-not-positive`, `interval-reversed`
 * @see Cox, D. R. (1972). Regression models and life-tables. Journal of the Royal Statistical Society B 34, 187–220.
 * @example
 * combinedMultiplier([1.6, 1.8, 3]) // => { product: 8.64, applied: 5, isClamped: true }
 */
export function combinedMultiplier(
  multipliers: readonly number[],
  { least, most }: { readonly least: number; readonly most: number } = MULTIPLIER_BOUNDS,
): CombinedMultiplier {
  if (!(least > 0)) throw new ComputeError('parameter-not-positive', { least })
  if (!(least <= most)) throw new ComputeError('interval-reversed', { least, most })
  let product = 1
  for (const multiplier of multipliers) {
    if (!(multiplier > 0 && multiplier < Infinity)) throw new ComputeError('parameter-not-positive', { multiplier })
    product *= multiplier
  }
  const applied = Math.min(most, Math.max(least, product))
  return { product, applied, isClamped: applied !== product }
}
