import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'
import { normalQuantile } from '@/shared/compute/uncertainty/normalQuantile'
import { studentQuantile } from '@/shared/compute/uncertainty/studentQuantile'

/** A stratum and what its sample showed. */
export interface SampledStratum {
  /** Buildings in the frame N_h and in the sample n_h. */
  readonly frameCount: number
  readonly sampleCount: number
  readonly mean: number
  /** s², with n − 1; of no consequence in a fully surveyed stratum. */
  readonly variance: number
}

export interface Estimate {
  readonly value: number
  readonly standardError: number
  readonly intervalT: readonly [number, number]
  readonly intervalZ: readonly [number, number]
}

export interface StratifiedEstimate {
  readonly total: Estimate
  readonly mean: Estimate
  /** Σn_h − H. */
  readonly degreesOfFreedom: number
}

/**
 * Stratified estimate of a total and a mean with finite-population correction,
 *
 *     T̂ = Σ N_h ȳ_h,   V(T̂) = Σ N_h² (1 − n_h/N_h) s_h²/n_h,   df = Σ n_h − H.
 *
 * A fully surveyed stratum adds nothing to the variance; one building of several says nothing of the spread and is
 * refused: merge strata.
 *
 * @param confidence of the intervals, in (0, 1)
 * @throws {ComputeError} `empty-input`, `stratum-too-small`, `parameter-out-of-range`
 * @see Cochran, W. G. (1977). Sampling Techniques, 3rd ed., ch. 5.
 * @example
 * stratifiedEstimate([{ frameCount: 3, sampleCount: 3, mean: 10, variance: 4 }]).total.standardError // => 0
 */
export function stratifiedEstimate(strata: readonly SampledStratum[], confidence = 0.95): StratifiedEstimate {
  if (strata.length === 0) throw new ComputeError('empty-input', { what: 'strata' })
  const frameCount = sum(strata.map((stratum) => stratum.frameCount))
  const total = sum(strata.map((stratum) => stratum.frameCount * stratum.mean))
  const standardError = Math.sqrt(sum(strata.map(varianceOfTotal)))
  const degreesOfFreedom = sum(strata.map(({ sampleCount }) => sampleCount)) - strata.length
  const make = (scale: number): Estimate => {
    const [value, error] = [total / scale, standardError / scale]
    const around = (quantile: number): readonly [number, number] => [value - quantile * error, value + quantile * error]
    const upper = (1 + confidence) / 2
    return {
      value,
      standardError: error,
      intervalT: error === 0 || degreesOfFreedom < 1 ? around(0) : around(studentQuantile(upper, degreesOfFreedom)),
      intervalZ: around(normalQuantile(upper)),
    }
  }
  return { total: make(1), mean: make(frameCount), degreesOfFreedom }
}

function varianceOfTotal({ frameCount, sampleCount, variance }: SampledStratum): number {
  if (!(sampleCount >= 1 && sampleCount <= frameCount))
    throw new ComputeError('parameter-out-of-range', { sampleCount, frameCount })
  if (sampleCount === frameCount) return 0
  if (sampleCount < 2) throw new ComputeError('stratum-too-small', { sampleCount, frameCount })
  if (!(variance >= 0)) throw new ComputeError('parameter-out-of-range', { variance })
  return frameCount ** 2 * (1 - sampleCount / frameCount) * (variance / sampleCount)
}
