import type { Lognormal } from './lognormal.types'
import { lognormalQuantile } from './lognormalQuantile'

/** What is shown of a figure in doubt, in its unit; p10 ≤ p50 ≤ p90. */
export interface PercentileBand {
  readonly p10: number
  readonly p50: number
  readonly p90: number
}

/**
 * P10, P50 and P90 of a lognormal: median·e^(∓1.2816 σ).
 *
 * @see Limpert, E., Stahel, W. & Abbt, M. (2001). BioScience 51, 341–352.
 * @example
 * lognormalBand(lognormalFromMedian(640, 1.6)) // => { p10: 350.42064982760115, p50: 640, p90: 1168.8808870182556 }
 */
export function lognormalBand(law: Lognormal): PercentileBand {
  return { p10: lognormalQuantile(law, 0.1), p50: Math.exp(law.logMean), p90: lognormalQuantile(law, 0.9) }
}
