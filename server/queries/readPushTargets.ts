import type { Scope } from '@/server/database'
import type { SheetRecord } from '@/shared/sync/sheetRecord.types'
import { uuidArray } from './uuidArray'

/** How long after losing a beat what was recorded there is still taken, by the server's clock (rule P8). */
export const LATE_WORK_DAYS = 30

export interface TargetBuilding {
  readonly roundId: string
  readonly outlineId: string
  readonly beatId: string | null
  /** Whether the acting person walks its beat, or did so lately. */
  readonly isAllowed: boolean
}

export interface TargetSheet {
  readonly record: SheetRecord
  readonly change: number
  readonly recordedBy: string
}

export interface TargetPhoto {
  readonly sheetId: string
  readonly sha256: string
  readonly bytes: number
  readonly takenBy: string
  readonly change: number
  readonly isDeleted: boolean
}

export interface TargetConflict {
  readonly sheetId: string
  readonly group: string
  readonly setAside: unknown
  readonly keptBy: string | null
  readonly setAsideBy: string | null
  readonly isOpen: boolean
  readonly change: number
}

/** Everything the mutations of a batch touch, as it stands under the lock of the change order. */
export interface PushTargets {
  readonly buildings: ReadonlyMap<string, TargetBuilding>
  readonly sheets: ReadonlyMap<string, TargetSheet>
  readonly photos: ReadonlyMap<string, TargetPhoto>
  readonly conflicts: ReadonlyMap<string, TargetConflict>
  /** Thing → mutation that would have made it and was rejected. */
  readonly rejectedMakers: ReadonlyMap<string, string>
}

interface Wanted {
  readonly sheetIds: readonly string[]
  readonly photoIds: readonly string[]
  readonly conflictIds: readonly string[]
}

/** Reads all in one statement, however large the batch. */
export async function readPushTargets(scope: Scope, wanted: Wanted, now: Date): Promise<PushTargets> {
  const [row] = await scope.select<TargetRows>(TARGETS, {
    organisationId: scope.organisationId,
    personId: scope.personId,
    sheetIds: uuidArray(wanted.sheetIds),
    photoIds: uuidArray(wanted.photoIds),
    conflictIds: uuidArray(wanted.conflictIds),
    lateSince: new Date(now.getTime() - LATE_WORK_DAYS * 86_400_000),
  })
  return {
    buildings: mapOf(row?.buildings, ({ id, ...building }) => [id, building]),
    sheets: mapOf(row?.sheets, (sheet) => [sheet.id, toTargetSheet(sheet)]),
    photos: mapOf(row?.photos, ({ id, ...photo }) => [id, photo]),
    conflicts: mapOf(row?.conflicts, ({ id, ...conflict }) => [id, conflict]),
    rejectedMakers: mapOf(row?.rejected, ({ id, mutationId }) => [id, mutationId]),
  }
}

interface SheetJson extends Omit<SheetRecord, 'reviewChange' | 'deletion'> {
  readonly id: string
  readonly change: number
  readonly recordedBy: string
  readonly reviewChange: number | null
  readonly deleteChange: number | null
  readonly deleteDevice: string | null
}

interface TargetRows {
  readonly buildings: (TargetBuilding & { id: string })[] | null
  readonly sheets: SheetJson[] | null
  readonly photos: (TargetPhoto & { id: string })[] | null
  readonly conflicts: (TargetConflict & { id: string })[] | null
  readonly rejected: { id: string; mutationId: string }[] | null
}

function mapOf<Row, Value>(rows: Row[] | null | undefined, entry: (row: Row) => [string, Value]): Map<string, Value> {
  return new Map((rows ?? []).map(entry))
}

/** A sheet whose state came from elsewhere than a planner's act here counts as reviewed at its last change. */
export function toTargetSheet({
  id: _id,
  change,
  recordedBy,
  deleteChange,
  deleteDevice,
  ...row
}: SheetJson): TargetSheet {
  const reviewChange = row.reviewChange ?? (row.state === 'handed-in' ? 0 : change)
  const deletion = deleteChange === null ? null : { change: deleteChange, deviceId: deleteDevice ?? '' }
  return { change, recordedBy, record: { ...row, reviewChange, deletion } }
}

/** Columns of a sheet as JSON; the table is called `s`. */
export const SHEET_JSON = `json_build_object('id', s.sheet_id, 'answers', s.answers, 'versions', s.versions,
  'writers', s.writers, 'state', s.state, 'revision', s.revision, 'question', s.question,
  'reviewChange', s.review_change, 'change', s.change_no, 'recordedBy', s.recorded_by,
  'deleteChange', CASE WHEN s.deleted_at IS NOT NULL THEN coalesce(s.delete_change, s.change_no) END,
  'deleteDevice', s.delete_device)`

/**
 * Rows of a table by ids, each found by its key: the LIMIT keeps the planner from reading all rows of an organisation
 * where it does not know yet how many there are.
 */
const byId = (table: string, key: string, ids: string) => `
  SELECT t.* FROM ${ids} AS n(id) CROSS JOIN LATERAL (
    SELECT * FROM ${table} WHERE organisation_id = $organisationId AND ${key} = n.id LIMIT 1) t`

const TARGETS = `
  WITH named_photo AS MATERIALIZED (${byId('photo', 'photo_id', 'unnest($photoIds::uuid[])')}),
  named_conflict AS MATERIALIZED (${byId('conflict', 'conflict_id', 'unnest($conflictIds::uuid[])')}),
  named AS MATERIALIZED (
    SELECT id FROM unnest($sheetIds::uuid[]) AS n(id)
    UNION SELECT sheet_id FROM named_photo UNION SELECT sheet_id FROM named_conflict
  ), named_building AS MATERIALIZED (${byId('round_building', 'building_id', 'named')})
  SELECT
    (SELECT json_agg(json_build_object('id', b.building_id, 'roundId', b.round_id, 'outlineId', b.outline_id,
        'beatId', b.beat_id, 'isAllowed', b.beat_id IN (
          SELECT o.beat_id FROM beat o
          WHERE o.organisation_id = $organisationId AND o.surveyor_id = $personId AND o.deleted_at IS NULL
        ) IS TRUE OR EXISTS (
          SELECT FROM beat_assignment a
          WHERE a.organisation_id = $organisationId AND a.person_id = $personId
            AND (a.until_at IS NULL OR a.until_at > $lateSince)
            AND (a.beat_id = b.beat_id OR EXISTS (
              SELECT FROM scope_exit e
              WHERE e.organisation_id = $organisationId AND e.beat_id = a.beat_id AND e.entity_type = 'building'
                AND e.entity_id = b.building_id AND e.at > $lateSince)))))
      FROM named_building b) AS buildings,
    (SELECT json_agg(${SHEET_JSON}) FROM (${byId('sheet', 'sheet_id', 'named')}) s) AS sheets,
    (SELECT json_agg(json_build_object('id', p.photo_id, 'sheetId', p.sheet_id, 'sha256', p.sha256, 'bytes', p.bytes,
        'takenBy', p.taken_by, 'change', p.change_no, 'isDeleted', p.deleted_at IS NOT NULL)) FROM named_photo p) AS photos,
    (SELECT json_agg(json_build_object('id', c.conflict_id, 'sheetId', c.sheet_id, 'group', c.field_group,
        'setAside', c.set_aside, 'keptBy', c.kept_by, 'setAsideBy', c.set_aside_by, 'isOpen', c.state = 'open',
        'change', c.change_no)) FROM named_conflict c) AS conflicts,
    (SELECT json_agg(json_build_object('id', m.entity_id, 'mutationId', m.mutation_id))
      FROM unnest($sheetIds::uuid[] || $photoIds::uuid[]) AS n(id) CROSS JOIN LATERAL (
        SELECT q.entity_id, q.mutation_id FROM quarantine q
        WHERE q.organisation_id = $organisationId AND q.state = 'waiting' AND q.entity_id = n.id
          AND q.person_id = $personId
        ORDER BY q.received_at DESC LIMIT 1) m) AS rejected`
