import { ComputeError } from '@/shared/compute/errors'
import type { Lognormal } from './lognormal.types'

/**
 * Lognormal by median and geometric standard deviation: μ = ln median, σ = ln GSD.
 *
 * @param median in any unit, > 0
 * @param geometricSd GSD [–], ≥ 1
 * @throws {ComputeError} `parameter-not-positive`, `parameter-out-of-range`
 * @see Limpert, E., Stahel, W. & Abbt, M. (2001). Log-normal distributions across the sciences. BioScience 51, 341–352.
 * @example
 * lognormalFromMedian(640, 1.6) // => { logMean: 6.461468176353717, logSd: 0.47000362924573563 }
 */
export function lognormalFromMedian(median: number, geometricSd: number): Lognormal {
  if (!(median > 0 && median < Infinity)) throw new ComputeError('parameter-not-positive', { median })
  if (!(geometricSd >= 1 && geometricSd < Infinity)) throw new ComputeError('parameter-out-of-range', { geometricSd })
  return { logMean: Math.log(median), logSd: Math.log(geometricSd) }
}
