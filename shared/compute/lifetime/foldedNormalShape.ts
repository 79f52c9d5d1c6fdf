import erf from '@stdlib/math-base-special-erf'

const ROOT_2_OVER_PI = Math.sqrt(2 / Math.PI)
/** From here on nothing is folded over that a double could hold. */
const NOTHING_FOLDED = 38

/**
 * Mean and sd of a folded normal law, in units of the sd of the whole law,
 *
 *     mean = √(2/π) e^(−α²/2) + α erf(α/√2),   var = 1 + α² − mean².
 *
 * @param alpha α = |μ|/σ of the whole law [–], ≥ 0
 * @returns mean and sd [–]; sd/mean is largest at α = 0, √(π/2 − 1) = 0.7555
 * @see Leone, F. C., Nelson, L. S. & Nottingham, R. B. (1961). The folded normal distribution. Technometrics 3, 543–550.
 * @example
 * foldedNormalShape(0).sd // => 0.6028102749890869
 */
export function foldedNormalShape(alpha: number): { readonly mean: number; readonly sd: number } {
  if (alpha > NOTHING_FOLDED) return { mean: alpha, sd: 1 }
  const mean = ROOT_2_OVER_PI * Math.exp(-0.5 * alpha * alpha) + alpha * erf(alpha * Math.SQRT1_2)
  return { mean, sd: Math.sqrt(1 + (alpha - mean) * (alpha + mean)) }
}
