import { ComputeError } from '@/shared/compute/errors'
import type { MassGroup } from './massGroup.types'

/**
 * Refuses areas, factors and errors that cannot be.
 *
 * @throws {ComputeError} `negative-area`, `parameter-out-of-range`, `length-mismatch`
 * @example
 * requireMassGroup({ factors: [], areasM2: [100], areaCv: 0 }) // => undefined
 */
export function requireMassGroup({ factors, areasM2, areaCv, betweenBuildingsCv = 0 }: MassGroup): void {
  if (!(betweenBuildingsCv >= 0)) throw new ComputeError('parameter-out-of-range', { betweenBuildingsCv })
  for (const { factorId, meanKgPerM2, sharedCv } of factors) {
    if (!(meanKgPerM2 >= 0 && sharedCv >= 0))
      throw new ComputeError('parameter-out-of-range', { factorId, meanKgPerM2, sharedCv })
  }
  if (typeof areaCv !== 'number' && areaCv.length !== areasM2.length)
    throw new ComputeError('length-mismatch', { areas: areasM2.length, cvs: areaCv.length })
  for (let i = 0; i < areasM2.length; i++) {
    const [areaM2, cv] = [areasM2[i]!, typeof areaCv === 'number' ? areaCv : areaCv[i]!]
    if (!(areaM2 >= 0 && cv >= 0)) throw new ComputeError('negative-area', { areaM2, cv })
  }
}
