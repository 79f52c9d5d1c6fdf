import betaincinv from '@stdlib/math-base-special-betaincinv'
import erfinv from '@stdlib/math-base-special-erfinv'
import gammaincinv from '@stdlib/math-base-special-gammaincinv'
import { ComputeError } from '@/shared/compute/errors'

/**
 * Quantile of the standard normal distribution, z = √2·erf⁻¹(2p − 1).
 *
 * @param probability p, in (0, 1)
 * @throws {ComputeError} `share-out-of-range`
 * @see Abramowitz & Stegun (1964), §26.2.
 * @example
 * normalQuantile(0.975) // => 1.959963984540054
 */
export function normalQuantile(probability: number): number {
  requireProbability(probability)
  return Math.SQRT2 * erfinv(2 * probability - 1)
}

/**
 * Quantile of Student's t distribution, by the inverse of the regularised incomplete beta function.
 *
 * @param probability p, in (0, 1)
 * @param degreesOfFreedom ν, > 0
 * @throws {ComputeError} `share-out-of-range`, `parameter-not-positive`
 * @see Abramowitz & Stegun (1964), eq. 26.5.27 and 26.7.
 * @example
 * studentQuantile(0.975, 10) // => 2.2281388519649385
 */
export function studentQuantile(probability: number, degreesOfFreedom: number): number {
  requireProbability(probability)
  if (!(degreesOfFreedom > 0)) throw new ComputeError('parameter-not-positive', { degreesOfFreedom })
  const tail = Math.min(probability, 1 - probability)
  if (tail === 0.5) return 0
  const x = betaincinv(2 * tail, degreesOfFreedom / 2, 0.5)
  return Math.sign(probability - 0.5) * Math.sqrt(degreesOfFreedom * (1 / x - 1))
}

/**
 * Quantile of the chi-square distribution, 2·P⁻¹(p; ν/2).
 *
 * @param probability p, in (0, 1)
 * @param degreesOfFreedom ν, > 0
 * @throws {ComputeError} `share-out-of-range`, `parameter-not-positive`
 * @see Abramowitz & Stegun (1964), §26.4.
 * @example
 * chiSquareQuantile(0.95, 2) // => 5.991464547107979
 */
export function chiSquareQuantile(probability: number, degreesOfFreedom: number): number {
  requireProbability(probability)
  if (!(degreesOfFreedom > 0)) throw new ComputeError('parameter-not-positive', { degreesOfFreedom })
  return 2 * gammaincinv(probability, degreesOfFreedom / 2)
}

function requireProbability(probability: number): void {
  if (!(probability > 0 && probability < 1)) throw new ComputeError('share-out-of-range', { probability })
}
