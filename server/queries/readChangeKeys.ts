import type { Scope } from '@/server/database'
import type { Change } from '@/shared/schemas/sync'
import { uuidArray } from './uuidArray'

export type PulledType = Exclude<Change['type'], 'gone'>

/** That something changed, and when in the order of changes. */
export interface ChangeKey {
  readonly type: PulledType
  readonly id: string
  readonly change: number
  /** Deleted, or out of these beats. */
  readonly isGone: boolean
}

export interface ChangeRange {
  /** Beats whose things are looked at. */
  readonly beatIds: readonly string[]
  /** All beats of the person: what left one of them for another has not gone. */
  readonly scopeBeatIds: readonly string[]
  readonly after: number
  readonly upTo: number
  readonly limit: number
}

/** Keys of everything in some beats that changed in a range, in the order of changes. */
export async function readChangeKeys(scope: Scope, range: ChangeRange): Promise<ChangeKey[]> {
  if (range.beatIds.length === 0 || range.after >= range.upTo || range.limit === 0) return []
  const rows = await scope.select<{ type: PulledType; id: string; change_no: string; is_gone: boolean }>(CHANGE_KEYS, {
    organisationId: scope.organisationId,
    beatIds: uuidArray(range.beatIds),
    scopeBeatIds: uuidArray(range.scopeBeatIds),
    after: range.after,
    upTo: range.upTo,
    limit: range.limit,
  })
  return rows.map(({ type, id, change_no, is_gone }) => ({ type, id, change: Number(change_no), isGone: is_gone }))
}

const branch = (type: PulledType, table: string, key: string, isGone: string) => `
  (SELECT '${type}' AS type, ${key} AS id, change_no, ${isGone} AS is_gone FROM ${table}
   WHERE organisation_id = $organisationId AND beat_id = ANY ($beatIds::uuid[])
     AND change_no > $after AND change_no <= $upTo
   ORDER BY change_no LIMIT $limit)`

const stays = (type: PulledType, table: string, key: string) => `
  WHEN '${type}' THEN EXISTS (SELECT FROM ${table} t WHERE t.organisation_id = $organisationId AND t.${key} = e.entity_id
    AND t.beat_id = ANY ($scopeBeatIds::uuid[]))`

const CHANGE_KEYS = `
  SELECT * FROM (
    ${branch('beat', 'beat', 'beat_id', 'deleted_at IS NOT NULL')}
    UNION ALL ${branch('building', 'round_building', 'building_id', 'false')}
    UNION ALL ${branch('sheet', 'sheet', 'sheet_id', 'deleted_at IS NOT NULL')}
    UNION ALL ${branch('photo', 'photo', 'photo_id', 'deleted_at IS NOT NULL')}
    UNION ALL ${branch('conflict', 'conflict', 'conflict_id', 'false')}
    UNION ALL
    (SELECT e.entity_type, e.entity_id, e.change_no, true FROM scope_exit e
     WHERE e.organisation_id = $organisationId AND e.beat_id = ANY ($beatIds::uuid[])
       AND e.change_no > $after AND e.change_no <= $upTo
       AND NOT CASE e.entity_type
         ${stays('building', 'round_building', 'building_id')}
         ${stays('sheet', 'sheet', 'sheet_id')}
         ${stays('photo', 'photo', 'photo_id')}
         ${stays('conflict', 'conflict', 'conflict_id')}
         ELSE false END
     ORDER BY e.change_no LIMIT $limit)
  ) AS changed ORDER BY change_no LIMIT $limit`
