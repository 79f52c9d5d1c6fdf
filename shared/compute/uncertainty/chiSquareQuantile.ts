import gammaln from '@stdlib/math-base-special-gammaln'
import { ComputeError } from '@/shared/compute/errors'
import { bracketedRoot } from '@/shared/compute/lifetime/bracketedRoot'
import { gammaTail } from '@/shared/compute/lifetime/gammaTail'
import { requireProbability } from './requireProbability'

/**
 * Quantile of the chi-square distribution, 2·P⁻¹(ν/2; p), by halving on the smaller of both tails.
 *
 * @param probability p [–], in (0, 1)
 * @param degreesOfFreedom ν [–], > 0
 * @returns quantile [–], ≥ 0
 * @throws {ComputeError} `share-out-of-range`, `parameter-not-positive`
 * @remarks relative error below 1e-12 for 1e-20 ≤ p, 0.5 ≤ ν ≤ 8e4, against SciPy 1.17. The inverse of the
 *   special-function package (gammaincinv 0.2.3) errs in the fourth digit at ν = 1e4 and is not used.
 * @see Abramowitz & Stegun (1964), §26.4 and 6.5.12.
 * @example
 * chiSquareQuantile(0.95, 2) // => 5.991464547107979
 */
export function chiSquareQuantile(probability: number, degreesOfFreedom: number): number {
  requireProbability(probability)
  if (!(degreesOfFreedom > 0 && degreesOfFreedom < Infinity))
    throw new ComputeError('parameter-not-positive', { degreesOfFreedom })
  const shape = degreesOfFreedom / 2
  const excess =
    probability < 0.5
      ? (x: number) => Math.log(-Math.expm1(gammaTail(shape, x).logTail)) - Math.log(probability)
      : (x: number) => Math.log1p(-probability) - gammaTail(shape, x).logTail
  // P(a, x) ≤ x^a/Γ(a + 1), so no quantile lies below
  const least = Math.exp((Math.log(probability) + gammaln(shape + 1)) / shape)
  if (least === 0) return 0
  let most = 2 * Math.max(least, shape, 1)
  while (excess(most) < 0) most *= 2
  return 2 * bracketedRoot(excess, least * (1 - 1e-9), most)
}
