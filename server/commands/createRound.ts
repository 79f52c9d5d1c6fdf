import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { notFound, unusable } from '@/server/errors'
import { readRound } from '@/server/queries/readRound'
import type { createRound as endpoint, RoundWithBeats } from '@/shared/api/rounds'
import { recordAudit } from './recordAudit'
import { takeChangeNumbers } from './takeChangeNumbers'

type Wish = z.output<typeof endpoint.body>

/**
 * Opens a round. Its frame is every outline of the district as it stands now; each becomes a building whose id is the
 * id of its sheet as well.
 *
 * @throws {Refusal} `not-found` for the district, `input-not-usable` when it has no outlines
 */
export async function createRound(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  wish: Wish,
): Promise<RoundWithBeats> {
  return database.withScope(actor, async (scope) => {
    const roundId = randomUUID()
    const { organisationId, personId } = scope
    const outlineIds = await readFrame(scope, wish.districtId)
    await scope.execute(
      `INSERT INTO round (organisation_id, round_id, district_id, name, starts_on, ends_on, created_by)
       VALUES ($organisationId, $roundId, $districtId, $name, $startsOn, $endsOn, $personId)`,
      { organisationId, personId, roundId, ...wish },
    )
    await recordAudit(scope, { action: 'round-opened', subjectType: 'round', subjectId: roundId })
    const first = await takeChangeNumbers(scope, outlineIds.length)
    await scope.execute(
      `INSERT INTO round_building (organisation_id, building_id, round_id, outline_id, change_no)
       SELECT $organisationId, gen_random_uuid(), $roundId, o.id::uuid, $first::bigint + o.position - 1
       FROM json_array_elements_text($outlineIds::json) WITH ORDINALITY AS o(id, position)`,
      { organisationId, roundId, outlineIds: JSON.stringify(outlineIds), first },
    )
    return readRound(scope, roundId)
  })
}

async function readFrame(scope: Scope, districtId: string): Promise<string[]> {
  const { organisationId } = scope
  const [district] = await scope.select(
    'SELECT name FROM district WHERE organisation_id = $organisationId AND district_id = $districtId',
    { organisationId, districtId },
  )
  if (!district) throw notFound('district')
  const rows = await scope.select<{ outline_id: string }>(
    `SELECT outline_id FROM outline WHERE organisation_id = $organisationId AND district_id = $districtId
     ORDER BY reference`,
    { organisationId, districtId },
  )
  if (rows.length > 0) return rows.map(({ outline_id }) => outline_id)
  throw unusable('The district has no outlines to survey. Nothing was changed; import outlines first.', [
    { pointer: '/body/districtId', code: 'district-empty', detail: 'the district has no outlines' },
  ])
}
