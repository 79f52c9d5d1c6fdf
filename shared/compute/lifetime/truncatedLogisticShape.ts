import { dilogarithmOfMinusExp } from './dilogarithmOfMinusExp'
import { softplus } from './softplus'

/** From here on nothing is cut off that a double could hold. */
const NOTHING_CUT = 40

/**
 * Mean and sd of a logistic law cut off at 0, in units of its scale,
 *
 *     mean = ln(1 + e^z)(1 + e^(−z)),   E T² = −2 Li₂(−e^z)(1 + e^(−z)).
 *
 * @param z location/scale of the whole law [–]
 * @returns mean and sd [–]; sd/mean tends to 1 for z → −∞
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1995). Continuous Univariate Distributions, vol. 2, ch. 23.
 * @example
 * truncatedLogisticShape(0).mean // => 1.3862943611198906
 */
export function truncatedLogisticShape(z: number): { readonly mean: number; readonly sd: number } {
  if (z > NOTHING_CUT) return { mean: z, sd: Math.PI / Math.sqrt(3) }
  const start = Math.exp(softplus(-z))
  const mean = softplus(z) * start
  return { mean, sd: Math.sqrt(2 * dilogarithmOfMinusExp(z) * start - mean * mean) }
}
