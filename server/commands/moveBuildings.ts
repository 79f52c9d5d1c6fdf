import type { Scope } from '@/server/database'
import { lockChangeOrder, takeChangeNumbers } from './takeChangeNumbers'

/** A building of the frame that goes from one beat, or none, to another, or none. */
export interface BuildingMove {
  readonly buildingId: string
  readonly fromBeatId: string | null
  readonly toBeatId: string | null
}

type EntityType = 'building' | 'sheet' | 'photo' | 'conflict'
interface Follower {
  readonly type: EntityType
  readonly id: string
  readonly move: BuildingMove
}

/**
 * Moves buildings with everything recorded on them. Each moved row gets a change number, so the new beat's device pulls
 * it; each that leaves a beat leaves an exit there, so the old beat's device drops it; each beat concerned changes too,
 * because its count does.
 *
 * @param beatIds beats that changed for another reason as well: a name, a surveyor, being dissolved
 */
export async function moveBuildings(
  scope: Scope,
  moves: readonly BuildingMove[],
  beatIds: readonly string[],
): Promise<void> {
  const touched = new Set(beatIds)
  for (const { fromBeatId, toBeatId } of moves) {
    if (fromBeatId !== null) touched.add(fromBeatId)
    if (toBeatId !== null) touched.add(toBeatId)
  }
  await lockChangeOrder(scope)
  const followers = await findFollowers(scope, moves)
  const exits = followers.filter(({ move }) => move.fromBeatId !== null)
  const count = touched.size + followers.length + exits.length
  if (count === 0) return
  let next = await takeChangeNumbers(scope, count)

  await numberBeats(
    scope,
    [...touched].map((beatId) => ({ id: beatId, change: next++ })),
  )
  const numbered = followers.map(({ type, id, move }) => ({ type, id, beat: move.toBeatId, change: next++ }))
  for (const type of ['building', 'sheet', 'photo', 'conflict'] as const) {
    await moveRows(
      scope,
      type,
      numbered.filter((row) => row.type === type),
    )
  }
  await leaveExits(
    scope,
    exits.map(({ type, id, move }) => ({ type, id, beat: move.fromBeatId, change: next++ })),
  )
}

async function findFollowers(scope: Scope, moves: readonly BuildingMove[]): Promise<Follower[]> {
  if (moves.length === 0) return []
  const rows = await scope.select<{ type: EntityType; id: string; building_id: string }>(
    `WITH moved AS (SELECT value::uuid AS building_id FROM json_array_elements_text($ids::json))
     SELECT 'building' AS type, building_id AS id, building_id FROM moved
     UNION ALL
     SELECT 'sheet', s.sheet_id, s.sheet_id FROM sheet s JOIN moved m ON m.building_id = s.sheet_id
     WHERE s.organisation_id = $organisationId
     UNION ALL
     SELECT 'photo', p.photo_id, p.sheet_id FROM photo p JOIN moved m ON m.building_id = p.sheet_id
     WHERE p.organisation_id = $organisationId
     UNION ALL
     SELECT 'conflict', c.conflict_id, c.sheet_id FROM conflict c JOIN moved m ON m.building_id = c.sheet_id
     WHERE c.organisation_id = $organisationId`,
    { organisationId: scope.organisationId, ids: JSON.stringify(moves.map(({ buildingId }) => buildingId)) },
  )
  const moveOf = new Map(moves.map((move) => [move.buildingId, move]))
  return rows.flatMap(({ type, id, building_id }) => {
    const move = moveOf.get(building_id)
    return move ? [{ type, id, move }] : []
  })
}

interface NumberedRow {
  readonly type: EntityType
  readonly id: string
  readonly beat: string | null
  readonly change: number
}

const tables: Readonly<Record<EntityType, { table: string; key: string }>> = {
  building: { table: 'round_building', key: 'building_id' },
  sheet: { table: 'sheet', key: 'sheet_id' },
  photo: { table: 'photo', key: 'photo_id' },
  conflict: { table: 'conflict', key: 'conflict_id' },
}

async function moveRows(scope: Scope, type: EntityType, rows: readonly NumberedRow[]): Promise<void> {
  if (rows.length === 0) return
  const { table, key } = tables[type]
  await scope.execute(
    `UPDATE ${table} t SET beat_id = r.beat, change_no = r.change
     FROM json_to_recordset($rows::json) AS r(id uuid, beat uuid, change bigint)
     WHERE t.organisation_id = $organisationId AND t.${key} = r.id`,
    { organisationId: scope.organisationId, rows: JSON.stringify(rows) },
  )
}

async function numberBeats(scope: Scope, rows: readonly { id: string; change: number }[]): Promise<void> {
  await scope.execute(
    `UPDATE beat t SET change_no = r.change FROM json_to_recordset($rows::json) AS r(id uuid, change bigint)
     WHERE t.organisation_id = $organisationId AND t.beat_id = r.id`,
    { organisationId: scope.organisationId, rows: JSON.stringify(rows) },
  )
}

async function leaveExits(scope: Scope, rows: readonly NumberedRow[]): Promise<void> {
  if (rows.length === 0) return
  await scope.execute(
    `INSERT INTO scope_exit (organisation_id, beat_id, entity_type, entity_id, change_no)
     SELECT $organisationId, r.beat, r.type, r.id, r.change
     FROM json_to_recordset($rows::json) AS r(beat uuid, type text, id uuid, change bigint)`,
    { organisationId: scope.organisationId, rows: JSON.stringify(rows) },
  )
}
