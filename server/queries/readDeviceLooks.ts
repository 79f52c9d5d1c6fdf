import type { Context } from '@/server/context'
import type { Scope } from '@/server/database'
import { presentDeviceLooks, presentLooks } from '@/server/presenters/presentLooks'
import { rankLooks } from '@/server/run/rankLooks'
import type { DeviceLooks } from '@/shared/schemas/nextLook'
import { readLookBasis } from './readLookBasis'
import { readLookFigure } from './readLookFigure'

/** Where to look next on the beats of the person who asks, one entry a round that has a ranking. */
export async function readDeviceLooks(scope: Scope, now: Context['now']): Promise<DeviceLooks[]> {
  const beats = await scope.select<{ beat_id: string; round_id: string }>(
    `SELECT beat_id, round_id FROM beat
     WHERE organisation_id = $organisationId AND surveyor_id = $personId AND deleted_at IS NULL ORDER BY round_id, beat_id`,
    { organisationId: scope.organisationId, personId: scope.personId },
  )
  const beatIds = new Set(beats.map(({ beat_id }) => beat_id))
  const lists: DeviceLooks[] = []
  for (const roundId of new Set(beats.map(({ round_id }) => round_id))) {
    const basis = await readLookBasis(scope, roundId)
    if (!basis) continue
    const figure = await readLookFigure(scope, roundId)
    const looks = presentLooks(rankLooks(basis, figure), basis.rows)
    lists.push({
      roundId,
      figure,
      runNumber: basis.run.number,
      rankedAt: now().toISOString(),
      roundCount: looks.length,
      looks: presentDeviceLooks(looks, beatIds),
    })
  }
  return lists
}
