import erfcx from '@stdlib/math-base-special-erfcx'
import { logNormalTail } from './logNormalTail'

const ROOT_2_OVER_PI = Math.sqrt(2 / Math.PI)
const HALF_LOG_2_PI = 0.5 * Math.log(2 * Math.PI)

/**
 * Hazard of the standard normal distribution (inverse of Mills' ratio),
 *
 *     φ(z)/P(Z > z) = √(2/π)/erfcx(z/√2)
 *
 * @param z any number
 * @returns hazard [–], ≥ 0, near z for large z
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1994). Continuous Univariate Distributions, vol. 1, ch. 13.
 * @example
 * normalHazard(0) // => 0.7978845608028654
 * normalHazard(1000) // => 1000.000999998
 */
export function normalHazard(z: number): number {
  if (z > -5) return ROOT_2_OVER_PI / erfcx(z * Math.SQRT1_2)
  return Math.exp((-z * z) / 2 - HALF_LOG_2_PI - logNormalTail(z))
}
