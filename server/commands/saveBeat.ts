import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import { requireSurveyor } from '@/server/policies/requireSurveyor'
import { readRound } from '@/server/queries/readRound'
import type { createBeat, RoundWithBeats } from '@/shared/api/rounds'
import { bumpScopeEpoch } from './bumpScopeEpoch'
import { findMoves } from './findMoves'
import { moveBuildings } from './moveBuildings'
import { recordAudit } from './recordAudit'

type Wish = z.output<typeof createBeat.body>

/**
 * Makes a beat, or changes its name, surveyor and outlines. Outlines of another beat move over with what was recorded
 * on them; outlines that are no longer named are without a beat.
 *
 * @param beatId a beat of the round to change; a new one is made when absent
 * @throws {Refusal} `not-found`, `input-not-usable`
 */
export async function saveBeat(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  { roundId, beatId }: { roundId: string; beatId?: string },
  wish: Wish,
): Promise<RoundWithBeats> {
  return database.withScope(actor, async (scope) => {
    await lockRound(scope, roundId)
    await saveOne(scope, { roundId, beatId }, wish)
    return readRound(scope, roundId)
  })
}

/**
 * Makes several beats in one transaction: all of them or none.
 *
 * @throws {Refusal} `not-found`, `input-not-usable`
 */
export async function shareOutBeats(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  roundId: string,
  wishes: readonly Wish[],
): Promise<RoundWithBeats> {
  return database.withScope(actor, async (scope) => {
    await lockRound(scope, roundId)
    for (const wish of wishes) await saveOne(scope, { roundId }, wish)
    return readRound(scope, roundId)
  })
}

async function saveOne(
  scope: Scope,
  { roundId, beatId }: { roundId: string; beatId?: string },
  wish: Wish,
): Promise<void> {
  const before = beatId === undefined ? undefined : await readBeat(scope, roundId, beatId)
  if (wish.surveyorId !== null) await requireSurveyor(scope, wish.surveyorId)
  const savedId = beatId ?? randomUUID()
  const moves = await findMoves(scope, { roundId, beatId: savedId, outlineIds: wish.outlineIds })
  await writeBeat(scope, { beatId: savedId, roundId, name: wish.name, surveyorId: wish.surveyorId })
  if (before?.surveyor_id !== wish.surveyorId) {
    await bumpScopeEpoch(scope, [before?.surveyor_id ?? null, wish.surveyorId])
  }
  await recordAudit(scope, {
    action: before ? 'beat-changed' : 'beat-made',
    subjectType: 'beat',
    subjectId: savedId,
    detail: { roundId, surveyorId: wish.surveyorId, movedCount: moves.length },
  })
  await moveBuildings(scope, moves, [savedId])
}

/** One planner at a time shares out the buildings of a round. @throws {Refusal} `not-found` */
export async function lockRound(scope: Scope, roundId: string): Promise<void> {
  const [round] = await scope.select(
    'SELECT name FROM round WHERE organisation_id = $organisationId AND round_id = $roundId FOR NO KEY UPDATE',
    { organisationId: scope.organisationId, roundId },
  )
  if (!round) throw notFound('round')
}

/** @throws {Refusal} `not-found` for a beat of another round, or one that was dissolved */
export async function readBeat(scope: Scope, roundId: string, beatId: string): Promise<{ surveyor_id: string | null }> {
  const [beat] = await scope.select<{ surveyor_id: string | null }>(
    `SELECT surveyor_id FROM beat WHERE organisation_id = $organisationId AND round_id = $roundId
       AND beat_id = $beatId AND deleted_at IS NULL`,
    { organisationId: scope.organisationId, roundId, beatId },
  )
  if (!beat) throw notFound('beat')
  return beat
}

async function writeBeat(
  scope: Scope,
  beat: { beatId: string; roundId: string; name: string; surveyorId: string | null },
): Promise<void> {
  // Change number 0 stands for an instant only: moving the buildings numbers every beat it is told of.
  await scope.execute(
    `INSERT INTO beat (organisation_id, beat_id, round_id, name, surveyor_id, change_no)
     VALUES ($organisationId, $beatId, $roundId, $name, $surveyorId, 0)
     ON CONFLICT (organisation_id, beat_id) DO UPDATE SET name = excluded.name, surveyor_id = excluded.surveyor_id`,
    { organisationId: scope.organisationId, ...beat },
  )
}
