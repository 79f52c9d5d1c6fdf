import type { Context } from '@/server/context'
import type { Actor } from '@/server/database'
import { readRound } from '@/server/queries/readRound'
import type { RoundWithBeats } from '@/shared/api/rounds'
import { bumpScopeEpoch } from './bumpScopeEpoch'
import { findMoves } from './findMoves'
import { moveBuildings } from './moveBuildings'
import { recordAudit } from './recordAudit'
import { lockRound, readBeat } from './saveBeat'

/** Dissolves a beat: its buildings are without one, recorded sheets stay. @throws {Refusal} `not-found` */
export async function removeBeat(
  { database, now }: Pick<Context, 'database' | 'now'>,
  actor: Actor,
  { roundId, beatId }: { roundId: string; beatId: string },
): Promise<RoundWithBeats> {
  return database.withScope(actor, async (scope) => {
    await lockRound(scope, roundId)
    const { surveyor_id } = await readBeat(scope, roundId, beatId)
    const moves = await findMoves(scope, { roundId, beatId, outlineIds: [] })
    await scope.execute(
      'UPDATE beat SET deleted_at = $now WHERE organisation_id = $organisationId AND beat_id = $beatId',
      { organisationId: scope.organisationId, beatId, now: now() },
    )
    await bumpScopeEpoch(scope, [surveyor_id])
    await recordAudit(scope, { action: 'beat-dissolved', subjectType: 'beat', subjectId: beatId, detail: { roundId } })
    await moveBuildings(scope, moves, [beatId])
    return readRound(scope, roundId)
  })
}
