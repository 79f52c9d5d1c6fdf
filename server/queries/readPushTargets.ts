import type { Scope } from '@/server/database'
import type { SheetRecord } from '@/shared/sync/sheetRecord.types'

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
    sheetIds: JSON.stringify(wanted.sheetIds),
    photoIds: JSON.stringify(wanted.photoIds),
    conflictIds: JSON.stringify(wanted.conflictIds),
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

const TARGETS = `
  WITH named_photo AS (
    SELECT p.* FROM photo p JOIN json_array_elements_text($photoIds::json) AS n(id) ON p.photo_id = n.id::uuid
    WHERE p.organisation_id = $organisationId
  ), named_conflict AS (
    SELECT c.* FROM conflict c JOIN json_array_elements_text($conflictIds::json) AS n(id) ON c.conflict_id = n.id::uuid
    WHERE c.organisation_id = $organisationId
  ), named AS (
    SELECT id::uuid AS id FROM json_array_elements_text($sheetIds::json) AS n(id)
    UNION SELECT sheet_id FROM named_photo UNION SELECT sheet_id FROM named_conflict
  )
  SELECT
    (SELECT json_agg(json_build_object('id', b.building_id, 'roundId', b.round_id, 'outlineId', b.outline_id,
        'beatId', b.beat_id, 'isAllowed', coalesce(own.surveyor_id = $personId AND own.deleted_at IS NULL, false) OR EXISTS (
          SELECT FROM beat_assignment a
          WHERE a.organisation_id = $organisationId AND a.person_id = $personId
            AND (a.until_at IS NULL OR a.until_at > $lateSince)
            AND (a.beat_id = b.beat_id OR a.beat_id IN (
              SELECT e.beat_id FROM scope_exit e
              WHERE e.organisation_id = $organisationId AND e.beat_id = a.beat_id AND e.entity_type = 'building'
                AND e.entity_id = b.building_id AND e.at > $lateSince)))))
      FROM named n JOIN round_building b ON b.organisation_id = $organisationId AND b.building_id = n.id
      LEFT JOIN beat own ON own.organisation_id = b.organisation_id AND own.beat_id = b.beat_id) AS buildings,
    (SELECT json_agg(${SHEET_JSON})
      FROM named n JOIN sheet s ON s.organisation_id = $organisationId AND s.sheet_id = n.id) AS sheets,
    (SELECT json_agg(json_build_object('id', p.photo_id, 'sheetId', p.sheet_id, 'sha256', p.sha256, 'bytes', p.bytes,
        'takenBy', p.taken_by, 'change', p.change_no, 'isDeleted', p.deleted_at IS NOT NULL)) FROM named_photo p) AS photos,
    (SELECT json_agg(json_build_object('id', c.conflict_id, 'sheetId', c.sheet_id, 'group', c.field_group,
        'setAside', c.set_aside, 'keptBy', c.kept_by, 'setAsideBy', c.set_aside_by, 'isOpen', c.state = 'open',
        'change', c.change_no)) FROM named_conflict c) AS conflicts,
    (SELECT json_agg(json_build_object('id', q.entity_id, 'mutationId', q.mutation_id) ORDER BY q.received_at)
      FROM quarantine q
      WHERE q.organisation_id = $organisationId AND q.state = 'waiting' AND q.person_id = $personId
        AND q.entity_id IN (SELECT id FROM named UNION ALL
          SELECT id::uuid FROM json_array_elements_text($photoIds::json) AS m(id))) AS rejected`
