import { ComputeError } from '@/shared/compute/errors'

export interface FrameCoverage {
  readonly countShare: number
  readonly areaShare: number
  /** Area of the frame that nobody looked at [m²]: shown, never counted as zero. */
  readonly remainderM2: number
  /** 1 − n/N. */
  readonly finitePopulationCorrection: number
}

/**
 * How much of the frame is covered, by count and by area.
 *
 * @throws {ComputeError} `parameter-not-positive`, `share-out-of-range` when more is surveyed than there is
 * @see Särndal, C.-E., Swensson, B. & Wretman, J. (1992). Model Assisted Survey Sampling, ch. 14.
 * @example
 * frameCoverage({ frameCount: 4, surveyedCount: 3, frameAreaM2: 100, surveyedAreaM2: 80 }).remainderM2 // => 20
 */
export function frameCoverage(counts: {
  readonly frameCount: number
  readonly surveyedCount: number
  readonly frameAreaM2: number
  readonly surveyedAreaM2: number
}): FrameCoverage {
  const { frameCount, surveyedCount, frameAreaM2, surveyedAreaM2 } = counts
  if (!(frameCount > 0) || !(frameAreaM2 > 0))
    throw new ComputeError('parameter-not-positive', { frameCount, frameAreaM2 })
  const countShare = surveyedCount / frameCount
  const areaShare = surveyedAreaM2 / frameAreaM2
  if (!(countShare >= 0 && countShare <= 1 && areaShare >= 0 && areaShare <= 1))
    throw new ComputeError('share-out-of-range', { countShare, areaShare })
  return {
    countShare,
    areaShare,
    remainderM2: frameAreaM2 - surveyedAreaM2,
    finitePopulationCorrection: 1 - countShare,
  }
}
