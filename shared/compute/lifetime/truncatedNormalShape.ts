import { normalHazard } from './normalHazard'

/** Below this the closed form would subtract nearly equal numbers; the series is exact to 1e-13 there. */
const FAR_BELOW = -200

/**
 * Mean and sd of a normal law cut off at 0, in units of the sd of the whole law,
 *
 *     mean = α + λ,   var = 1 − λ(λ + α),   λ = φ(α)/Φ(α).
 *
 * @param alpha α = μ/σ of the whole law [–]
 * @returns mean and sd [–]; sd/mean tends to 1 for α → −∞
 * @remarks relative error of the sd below 1e-9 for α > −200, better than 1e-12 for α > −10
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1994). Continuous Univariate Distributions, vol. 1, (13.134)–(13.135).
 * @example
 * truncatedNormalShape(0).mean // => 0.7978845608028654
 */
export function truncatedNormalShape(alpha: number): { readonly mean: number; readonly sd: number } {
  if (alpha < FAR_BELOW) {
    const square = 1 / (alpha * alpha)
    const mean = (1 - square * (2 - square * (10 - 74 * square))) / -alpha
    const variance = square * (1 - square * (6 - square * (50 - 518 * square)))
    return { mean, sd: Math.sqrt(variance) }
  }
  const lambda = normalHazard(-alpha)
  return { mean: alpha + lambda, sd: Math.sqrt(1 - lambda * (lambda + alpha)) }
}
