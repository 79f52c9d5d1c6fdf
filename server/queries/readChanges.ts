import type { Scope } from '@/server/database'
import { OUTLINE_COLUMNS, OUTLINE_GEOMETRY } from '@/server/presenters/presentOutline'
import {
  presentBeatChange,
  presentBuildingChange,
  presentConflictChange,
  presentPhotoChange,
  presentSheetChange,
  type BeatChangeRow,
  type BuildingChangeRow,
  type ConflictChangeRow,
  type PhotoChangeRow,
  type SheetChangeRow,
} from '@/server/presenters/presentChange'
import type { Change } from '@/shared/schemas/sync'
import type { ChangeKey, PulledType } from './readChangeKeys'
import { uuidArray } from './uuidArray'

type Fields = ReadonlyMap<string, Change>

/** The things behind some keys as they stand in this snapshot, in the order of the keys. */
export async function readChanges(scope: Scope, keys: readonly ChangeKey[]): Promise<Change[]> {
  const idsOf = (type: PulledType) => keys.flatMap((key) => (key.type === type && !key.isGone ? [key.id] : []))
  const found: Record<PulledType, Fields> = {
    beat: await read<BeatChangeRow>(scope, BEATS, idsOf('beat'), presentBeatChange),
    building: await read<BuildingChangeRow>(scope, BUILDINGS, idsOf('building'), presentBuildingChange),
    sheet: await read<SheetChangeRow>(scope, SHEETS, idsOf('sheet'), presentSheetChange),
    photo: await read<PhotoChangeRow>(scope, PHOTOS, idsOf('photo'), presentPhotoChange),
    conflict: await read<ConflictChangeRow>(scope, CONFLICTS, idsOf('conflict'), presentConflictChange),
  }
  return keys.map(({ type, id, change, isGone }) => {
    const present = isGone ? undefined : found[type].get(id)
    return present ?? { type: 'gone', of: type, id, change }
  })
}

async function read<Row extends object>(
  scope: Scope,
  sql: string,
  ids: readonly string[],
  present: (row: Row) => Change,
): Promise<Fields> {
  if (ids.length === 0) return new Map()
  const rows = await scope.select<Row>(sql, { organisationId: scope.organisationId, ids: uuidArray(ids) })
  return new Map(rows.map((row) => present(row)).map((change) => [change.id, change]))
}

const BEATS = `
  SELECT b.beat_id AS id, b.change_no, b.name, b.round_id, r.name AS round_name, d.name AS district_name,
    r.starts_on::text, r.ends_on::text,
    (SELECT count(*)::integer FROM round_building x
     WHERE x.organisation_id = b.organisation_id AND x.beat_id = b.beat_id) AS building_count
  FROM beat b
  JOIN round r ON r.organisation_id = b.organisation_id AND r.round_id = b.round_id
  JOIN district d ON d.organisation_id = r.organisation_id AND d.district_id = r.district_id
  WHERE b.organisation_id = $organisationId AND b.beat_id = ANY ($ids::uuid[])`

const BUILDINGS = `
  SELECT b.building_id AS id, b.change_no, b.round_id, b.beat_id, ${OUTLINE_COLUMNS}, ${OUTLINE_GEOMETRY} AS geometry
  FROM round_building b
  JOIN outline o ON o.organisation_id = b.organisation_id AND o.outline_id = b.outline_id
  WHERE b.organisation_id = $organisationId AND b.building_id = ANY ($ids::uuid[])`

const SHEETS = `
  SELECT s.sheet_id AS id, s.change_no, s.round_id, s.beat_id, s.answers, s.state, s.question, s.revision,
    reviewer.name AS reviewed_by_name, s.reviewed_at, recorder.name AS recorded_by_name, s.recorded_at
  FROM sheet s
  JOIN person recorder ON recorder.organisation_id = s.organisation_id AND recorder.person_id = s.recorded_by
  LEFT JOIN person reviewer ON reviewer.organisation_id = s.organisation_id AND reviewer.person_id = s.reviewed_by
  WHERE s.organisation_id = $organisationId AND s.sheet_id = ANY ($ids::uuid[])`

const PHOTOS = `
  SELECT photo_id AS id, change_no, sheet_id, sha256, bytes, mime, width_px, height_px, tag, taken_at, state, refusal
  FROM photo WHERE organisation_id = $organisationId AND photo_id = ANY ($ids::uuid[])`

const CONFLICTS = `
  SELECT c.conflict_id AS id, c.change_no, c.sheet_id, c.field_group, c.kept, c.set_aside, c.state,
    k.name AS kept_by_name, a.name AS set_aside_by_name
  FROM conflict c
  LEFT JOIN person k ON k.organisation_id = c.organisation_id AND k.person_id = c.kept_by
  LEFT JOIN person a ON a.organisation_id = c.organisation_id AND a.person_id = c.set_aside_by
  WHERE c.organisation_id = $organisationId AND c.conflict_id = ANY ($ids::uuid[])`
