import betaincinv from '@stdlib/math-base-special-betaincinv'
import { ComputeError } from '@/shared/compute/errors'
import { requireProbability } from './requireProbability'

/** From this tail on the complement ν/(ν + t²) is so near to 1 that the small part t²/(ν + t²) is sought instead. */
const MIDDLE = 0.1

/**
 * Quantile of Student's t distribution, by the inverse of the regularised incomplete beta function,
 *
 *     P(|T| > t) = I_x(ν/2, ½),   x = ν/(ν + t²).
 *
 * @param probability p [–], in (0, 1)
 * @param degreesOfFreedom ν [–], > 0
 * @throws {ComputeError} `share-out-of-range`, `parameter-not-positive`
 * @remarks relative error below 2e-10 for 1e-20 ≤ p ≤ 0.5, 0.5 ≤ ν ≤ 1e7, below 1e-12 up to ν = 1e4, against SciPy 1.17
 * @see Abramowitz & Stegun (1964), eq. 26.5.27 and 26.7.1.
 * @example
 * studentQuantile(0.975, 10) // => 2.2281388519649385
 * studentQuantile(0.75, 1) // => 1
 */
export function studentQuantile(probability: number, degreesOfFreedom: number): number {
  requireProbability(probability)
  if (!(degreesOfFreedom > 0)) throw new ComputeError('parameter-not-positive', { degreesOfFreedom })
  const tail = Math.min(probability, 1 - probability)
  if (tail === 0.5) return 0
  const sign = Math.sign(probability - 0.5)
  if (tail > MIDDLE) {
    const small = betaincinv(1 - 2 * tail, 0.5, degreesOfFreedom / 2)
    return sign * Math.sqrt((degreesOfFreedom * small) / (1 - small))
  }
  const x = betaincinv(2 * tail, degreesOfFreedom / 2, 0.5)
  return sign * Math.sqrt(degreesOfFreedom * (1 / x - 1))
}
