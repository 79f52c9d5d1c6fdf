import type { CodeTotal } from './codeTotals'
import { recoveryShare, type RecoveryShare } from '@/shared/compute/waste/recoveryShare'
import type { YardPlan } from '@/shared/schemas/yardPlan'

/** One waste code of a span of years, and what the yard recovers of it. */
export interface RecoveryRow {
  readonly code: string
  readonly text: string
  readonly massKg: number
  /** Null where the contractor has not said what is recovered. */
  readonly share: number | null
  readonly recoveredKg: number
  /** Hazardous waste is left out of the target. */
  readonly counts: boolean
}

/** What a yard recovers of a span of years, code by code. A share that was not said recovers nothing. */
export function recoveryRows(totals: readonly CodeTotal[], shares: YardPlan['recoveryShares']): RecoveryRow[] {
  return totals.map(({ code, text, massKg, isHazardous }) => {
    const share = shares[code] ?? null
    return { code, text, massKg: massKg.likely, share, recoveredKg: (share ?? 0) * massKg.likely, counts: !isHazardous }
  })
}

/** The rows beside the target of the directive; null when nothing counts. */
export function recoveryOf(rows: readonly RecoveryRow[]): RecoveryShare | null {
  const streams = rows.map(({ code, massKg, recoveredKg, counts }) => ({
    code,
    massKg,
    recoveredKg,
    isHazardous: !counts,
  }))
  return streams.some(({ massKg, isHazardous }) => massKg > 0 && !isHazardous) ? recoveryShare(streams) : null
}
