import { sheetFlags } from '@/server/policies/sheetFlags'
import type { QueueEntry } from '@/shared/api/review'
import type { RegisterAttributes } from '@/shared/schemas/outline'
import type { SheetAnswers, SheetState } from '@/shared/schemas/sheet'

export interface QueueRow {
  sheet_id: string
  outline_id: string | null
  reference: string | null
  street: string | null
  house_number: string | null
  outline_footprint_m2: number | null
  register_year: number | null
  register_storeys: number | null
  register_height_m: number | null
  register_use: RegisterAttributes['use']
  answers: SheetAnswers
  state: SheetState
  revision: number
  change_no: string
  recorded_by_name: string
  recorded_at: Date
  gross_floor_area_m2: number | null
  photo_count: number
  open_conflict_count: number
  distance_m: number | null
}

/** Columns of {@link QueueRow}, for a SELECT from {@link QUEUE_TABLES}. */
export const QUEUE_COLUMNS = `s.sheet_id, s.outline_id, o.reference, o.street, o.house_number,
  o.footprint_m2 AS outline_footprint_m2, o.register_year, o.register_storeys, o.register_height_m, o.register_use,
  s.answers, s.state, s.revision, s.change_no, recorder.name AS recorded_by_name, s.recorded_at, s.gross_floor_area_m2,
  (SELECT count(*)::integer FROM photo p WHERE p.organisation_id = s.organisation_id AND p.sheet_id = s.sheet_id
    AND p.deleted_at IS NULL AND p.state <> 'refused') AS photo_count,
  (SELECT count(*)::integer FROM conflict c WHERE c.organisation_id = s.organisation_id AND c.sheet_id = s.sheet_id
    AND c.state = 'open') AS open_conflict_count,
  CASE WHEN s.answers -> 'position' IS NOT NULL THEN ST_Distance(o.geometry::geography, ST_SetSRID(ST_MakePoint(
    (s.answers #>> '{position,longitude}')::float8, (s.answers #>> '{position,latitude}')::float8), 4326)::geography)
  END AS distance_m`

export const QUEUE_TABLES = `sheet s
  JOIN person recorder ON recorder.organisation_id = s.organisation_id AND recorder.person_id = s.recorded_by
  LEFT JOIN outline o ON o.organisation_id = s.organisation_id AND o.outline_id = s.outline_id`

export function presentQueueEntry(row: QueueRow): QueueEntry {
  const place = [row.street, row.house_number].filter((part) => part !== null).join(' ')
  return {
    sheetId: row.sheet_id,
    outlineId: row.outline_id,
    reference: row.reference ?? '',
    label: place || (row.reference ?? ''),
    state: row.state,
    revision: row.revision,
    change: Number(row.change_no),
    flags: sheetFlags({
      answers: row.answers,
      outlineFootprintM2: row.outline_footprint_m2,
      register: {
        year: row.register_year,
        storeys: row.register_storeys,
        heightM: row.register_height_m,
        use: row.register_use,
      },
      grossFloorAreaM2: row.gross_floor_area_m2,
      distanceM: row.distance_m,
      photoCount: row.photo_count,
      openConflictCount: row.open_conflict_count,
    }),
    recordedByName: row.recorded_by_name,
    recordedAt: row.recorded_at.toISOString(),
    grossFloorAreaM2: row.gross_floor_area_m2,
    photoCount: row.photo_count,
  } satisfies QueueEntry
}
