import { ComputeError } from '@/shared/compute/errors'
import type { MassGroup } from './massGroup.types'

/**
 * The shared error of each factor by its id.
 *
 * @returns coefficient of variation [–] by id, in the order of first mention
 * @throws {ComputeError} `factor-ambiguous` when one id is named with two different errors
 * @example
 * sharedFactorCvs([{ factors: [{ factorId: 'f', meanKgPerM2: 8, sharedCv: 0.2 }], areasM2: [], areaCv: 0 }]).get('f') // => 0.2
 */
export function sharedFactorCvs(groups: readonly MassGroup[]): Map<string, number> {
  const cvs = new Map<string, number>()
  for (const { factors } of groups) {
    for (const { factorId, sharedCv } of factors) {
      const before = cvs.get(factorId)
      if (before !== undefined && before !== sharedCv)
        throw new ComputeError('factor-ambiguous', { factorId, cvs: [before, sharedCv] })
      cvs.set(factorId, sharedCv)
    }
  }
  return cvs
}
