import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'

export interface PlannedStratum {
  readonly frameCount: number
  /** Standard deviation S_h expected in the stratum. */
  readonly sd: number
}

/**
 * Shares a sample out over strata: in proportion to N_h, or to N_h·S_h (Neyman), not rounded.
 *
 * @param sampleCount n in all, ≥ 1
 * @throws {ComputeError} `empty-input`, `parameter-not-positive`
 * @see Neyman, J. (1934). Journal of the Royal Statistical Society 97, 558–625; Cochran (1977), §5.5.
 * @example
 * neymanAllocation(10, [{ frameCount: 50, sd: 1 }, { frameCount: 50, sd: 4 }]) // => [2, 8]
 */
export function neymanAllocation(sampleCount: number, strata: readonly PlannedStratum[]): number[] {
  return shareOut(
    sampleCount,
    strata.map(({ frameCount, sd }) => frameCount * sd),
  )
}

/**
 * As {@link neymanAllocation}, by the size of the strata alone.
 *
 * @throws {ComputeError} `empty-input`, `parameter-not-positive`
 * @see Cochran (1977), §5.4.
 * @example
 * proportionalAllocation(10, [{ frameCount: 40, sd: 1 }, { frameCount: 60, sd: 9 }]) // => [4, 6]
 */
export function proportionalAllocation(sampleCount: number, strata: readonly PlannedStratum[]): number[] {
  return shareOut(
    sampleCount,
    strata.map(({ frameCount }) => frameCount),
  )
}

/**
 * Whole numbers of buildings to visit: rounded up, at least two a stratum, never more than there are; what a full
 * stratum cannot take goes to the others.
 *
 * @throws {ComputeError} `empty-input`, `parameter-not-positive`
 * @see Cochran (1977), §5.8 (more than 100 per cent sampling).
 * @example
 * plannedVisits(12, [{ frameCount: 4, sd: 100 }, { frameCount: 100, sd: 1 }]) // => [4, 8]
 */
export function plannedVisits(sampleCount: number, strata: readonly PlannedStratum[]): number[] {
  const full = new Set<number>()
  for (;;) {
    const open = strata.map((stratum, index) => (full.has(index) ? { ...stratum, sd: 0 } : stratum))
    const left = sampleCount - sum([...full].map((index) => strata[index]!.frameCount))
    const shares = open.every(({ sd }) => sd === 0) ? open.map(() => 0) : neymanAllocation(Math.max(1, left), open)
    const spilling = shares.findIndex((share, index) => !full.has(index) && share > strata[index]!.frameCount)
    if (spilling === -1) {
      return shares.map((share, index) => {
        const { frameCount } = strata[index]!
        return full.has(index) ? frameCount : Math.min(frameCount, Math.max(2, Math.ceil(share - 1e-9)))
      })
    }
    full.add(spilling)
  }
}

/**
 * Standard error of the total that an allocation promises, √Σ N_h² (1 − n_h/N_h) S_h²/n_h.
 *
 * @throws {ComputeError} `length-mismatch`
 * @see Cochran (1977), eq. 5.9.
 * @example
 * promisedStandardError([4], [{ frameCount: 4, sd: 9 }]) // => 0
 */
export function promisedStandardError(allocation: readonly number[], strata: readonly PlannedStratum[]): number {
  if (allocation.length !== strata.length)
    throw new ComputeError('length-mismatch', { allocation: allocation.length, strata: strata.length })
  return Math.sqrt(
    sum(
      strata.map(
        ({ frameCount, sd }, index) =>
          frameCount ** 2 * (1 - allocation[index]! / frameCount) * (sd ** 2 / allocation[index]!),
      ),
    ),
  )
}

function shareOut(sampleCount: number, weights: readonly number[]): number[] {
  if (weights.length === 0) throw new ComputeError('empty-input', { what: 'strata' })
  const whole = sum(weights)
  if (!(sampleCount > 0) || !(whole > 0))
    throw new ComputeError('parameter-not-positive', { sampleCount, weights: whole })
  return weights.map((weight) => (sampleCount * weight) / whole)
}
