import type { NextLooks } from '@/shared/compute/nextLook/nextLook'
import type { LookRow } from '@/server/run/lookFrame.types'
import { isRecorded } from '@/server/run/rankLooks'
import type { DeviceLooks, RankedLook } from '@/shared/schemas/nextLook'

/** The looks of a round in their order; what could not be reached is not on the list, because nobody can look at it. */
export function presentLooks({ looks }: NextLooks, rows: readonly LookRow[]): RankedLook[] {
  const listed = reachableLooks(looks, rows)
  const settledKg2 = listed.reduce((sum, { fallKg2 }) => sum + fallKg2, 0)
  return listed.map((look) => ({ ...look, settleShare: look.fallKg2 / settledKg2 }))
}

function reachableLooks(looks: NextLooks['looks'], rows: readonly LookRow[]): Omit<RankedLook, 'settleShare'>[] {
  const rowOf = new Map(rows.map((row) => [row.buildingId, row]))
  return looks.flatMap(
    ({
      buildingId,
      floorAreaM2,
      meanKg,
      wholeKg2,
      fallShare,
      byAttributeKg2,
      reason,
    }): Omit<RankedLook, 'settleShare'>[] => {
      const row = rowOf.get(buildingId)
      if (!row || row.finding === 'inaccessible') return []
      return [
        {
          buildingId,
          outlineId: row.outlineId,
          beatId: row.beatId,
          label: labelOf(row),
          state: row.state ?? 'to-do',
          use: (isRecorded(row) ? row.use : row.registerUse) ?? 'unknown',
          floorAreaM2,
          meanKg,
          fallKg2: wholeKg2,
          fallShare,
          byAttributeKg2: { ...byAttributeKg2 },
          reason,
        },
      ]
    },
  )
}

/** Of a whole round's list, what lies on the beats of one device. */
export function presentDeviceLooks(looks: readonly RankedLook[], beatIds: ReadonlySet<string>): DeviceLooks['looks'] {
  return looks.flatMap(({ buildingId, beatId, settleShare, reason, state }, place) =>
    beatId !== null && beatIds.has(beatId)
      ? [{ buildingId, rank: place + 1, settleShare, reason, isRecorded: state !== 'to-do' }]
      : [],
  )
}

function labelOf({ street, houseNumber, reference }: LookRow): string {
  return [street, houseNumber].filter(Boolean).join(' ') || reference
}
