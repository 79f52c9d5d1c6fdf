/** What the doubt of a figure comes from. */
export type DoubtCause = 'measurement' | 'factor' | 'lifetime' | 'chance'

export interface CauseShare {
  readonly cause: DoubtCause
  readonly share: number
}

const CAUSES: readonly DoubtCause[] = ['measurement', 'factor', 'lifetime', 'chance']

/**
 * Causes of the variance of a figure, largest first, without those that add nothing.
 *
 * @param shares share of the variance by cause [–]
 * @example dominantCauses({ measurement: 0.2, factor: 0.8, lifetime: 0, chance: 0 })[0]?.cause // => 'factor'
 */
export function dominantCauses(shares: Readonly<Record<DoubtCause, number>>): CauseShare[] {
  return CAUSES.map((cause) => ({ cause, share: shares[cause] }))
    .filter(({ share }) => Number.isFinite(share) && share > 0)
    .sort((one, other) => other.share - one.share)
}
