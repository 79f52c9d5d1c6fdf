import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'
import { normaliseWasteCode } from './normaliseWasteCode'

/** One stream of waste that left, and what became of it. */
export interface WasteStream {
  readonly code: string
  readonly massKg: number
  /** Prepared for re-use, recycled or otherwise recovered [kg], ≤ massKg. */
  readonly recoveredKg: number
  /** True when the recovery was of energy: then it does not count. */
  readonly isEnergyRecovery?: boolean
  /** Stated by the carrier; otherwise the asterisk of the code decides. */
  readonly isHazardous?: boolean
}

/** How a district stands against the target of the directive. */
export interface RecoveryShare {
  readonly share: number
  readonly meetsTarget: boolean
  readonly countedKg: number
  readonly recoveredKg: number
}

/** Share by weight to be recovered (Directive 2008/98/EC, Article 11(2)(b)). */
export const RECOVERY_TARGET_SHARE = 0.7

const SOIL_AND_STONES = '17 05 04'

/**
 * Share of non-hazardous construction and demolition waste that is materially recovered,
 *
 *     R = Σ recovered (not as energy) / Σ mass,   without hazardous waste and without 17 05 04
 *
 * @param streams masses [kg], 0 ≤ recovered ≤ mass
 * @returns share [–], in [0, 1], compared with the 70 % target, and both sums [kg]
 * @throws {ComputeError} `negative-amount`, `share-out-of-range` more recovered than came, `unknown-code`,
 *   `undefined-statistic` when no stream counts
 * @see Directive 2008/98/EC, Article 11(2)(b); Commission Decision 2011/753/EU, annex III.
 * @example
 * recoveryShare([{ code: '17 01 01', massKg: 100, recoveredKg: 80 }, { code: '17 05 04', massKg: 900, recoveredKg: 0 }]).share // => 0.8
 */
export function recoveryShare(streams: readonly WasteStream[]): RecoveryShare {
  const counted = streams.filter((stream) => {
    const { code, massKg, recoveredKg } = stream
    if (!(massKg >= 0 && recoveredKg >= 0)) throw new ComputeError('negative-amount', { ...stream })
    if (recoveredKg > massKg) throw new ComputeError('share-out-of-range', { ...stream })
    const printed = normaliseWasteCode(code)
    return printed !== SOIL_AND_STONES && !(stream.isHazardous ?? printed.endsWith('*'))
  })
  const countedKg = sum(counted.map(({ massKg }) => massKg))
  if (countedKg === 0) throw new ComputeError('undefined-statistic', { countedKg })
  const recoveredKg = sum(counted.map((stream) => (stream.isEnergyRecovery === true ? 0 : stream.recoveredKg)))
  const share = recoveredKg / countedKg
  return { share, meetsTarget: share >= RECOVERY_TARGET_SHARE, countedKg, recoveredKg }
}
