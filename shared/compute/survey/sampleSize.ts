import { ComputeError } from '@/shared/compute/errors'
import { normalQuantile } from '@/shared/compute/uncertainty/normalQuantile'

export interface SampleSize {
  /** Without and with the finite-population correction. */
  readonly infinite: number
  readonly finite: number
  readonly rounded: number
}

/**
 * Sample size for a proportion with margin e: n0 = z²p(1 − p)/e², n = n0/(1 + (n0 − 1)/N), rounded up.
 *
 * @throws {ComputeError} `share-out-of-range`, `parameter-not-positive`
 * @see Cochran (1977), §4.4.
 * @example
 * sampleSizeForProportion(1240, 0.5, 0.05, 0.95).rounded // => 294
 */
export function sampleSizeForProportion(
  frameCount: number,
  proportion: number,
  margin: number,
  confidence: number,
): SampleSize {
  if (!(proportion >= 0 && proportion <= 1)) throw new ComputeError('share-out-of-range', { proportion })
  requirePositive(frameCount, margin)
  const infinite = (normalQuantile((1 + confidence) / 2) ** 2 * proportion * (1 - proportion)) / margin ** 2
  return rounded(infinite, infinite / (1 + (infinite - 1) / frameCount))
}

/**
 * Sample size for a mean with relative margin e: n0 = (z·CV/e)², n = n0/(1 + n0/N), rounded up.
 *
 * @throws {ComputeError} `parameter-not-positive`
 * @see Cochran (1977), §4.6.
 * @example
 * sampleSizeForMean(1240, 0.9, 0.1, 0.9).rounded // => 187
 */
export function sampleSizeForMean(
  frameCount: number,
  cv: number,
  relativeMargin: number,
  confidence: number,
): SampleSize {
  if (!(cv >= 0)) throw new ComputeError('parameter-out-of-range', { cv })
  requirePositive(frameCount, relativeMargin)
  const infinite = ((normalQuantile((1 + confidence) / 2) * cv) / relativeMargin) ** 2
  return rounded(infinite, infinite / (1 + infinite / frameCount))
}

function requirePositive(frameCount: number, margin: number): void {
  if (!(frameCount > 0) || !(margin > 0)) throw new ComputeError('parameter-not-positive', { frameCount, margin })
}

function rounded(infinite: number, finite: number): SampleSize {
  return { infinite, finite, rounded: Math.ceil(finite - 1e-9) }
}
