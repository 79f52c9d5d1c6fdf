import { lookStrata, type LookStratum } from '@/shared/compute/nextLook/lookStrata'
import { plannedVisits } from '@/shared/compute/survey/allocation'
import type { UseOrUnknown } from '@/shared/compute/factors/vocabulary'
import type { RankedLook } from '@/shared/schemas/nextLook'

export interface BeatPlan {
  /** Null: buildings that no beat has. */
  readonly beatId: string | null
  readonly onListCount: number
  readonly visitCount: number
}

export interface StratumPlan extends LookStratum<UseOrUnknown> {
  readonly visitCount: number
}

/** How many of the first visits of the list fall on each beat, most first. */
export function visitsByBeat(looks: readonly RankedLook[], visits: number): BeatPlan[] {
  const plans = new Map<string | null, BeatPlan>()
  looks.forEach(({ beatId }, place) => {
    const { onListCount, visitCount } = plans.get(beatId) ?? { onListCount: 0, visitCount: 0 }
    plans.set(beatId, { beatId, onListCount: onListCount + 1, visitCount: visitCount + Number(place < visits) })
  })
  return [...plans.values()].sort((a, b) => b.visitCount - a.visitCount || b.onListCount - a.onListCount)
}

/** The same number of visits over strata of use among what is not recorded, by Neyman. */
export function visitsByStratum(looks: readonly RankedLook[], visits: number): StratumPlan[] {
  const strata = lookStrata(
    looks
      .filter(({ state }) => state === 'to-do')
      .map(({ use, meanKg, fallKg2 }) => ({ stratum: use, meanKg, wholeKg2: fallKg2 })),
  )
  if (strata.length === 0 || visits < 1) return strata.map((stratum) => ({ ...stratum, visitCount: 0 }))
  const planned = plannedVisits(visits, strata)
  return strata.map((stratum, index) => ({ ...stratum, visitCount: planned[index] ?? 0 }))
}
