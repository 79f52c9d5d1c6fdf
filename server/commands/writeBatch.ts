import type { Scope } from '@/server/database'
import type { Problem } from '@/shared/schemas/problem'
import { deriveSheet } from '@/shared/schemas/deriveSheet'
import { uuidArray } from '@/server/queries/uuidArray'
import type { BatchDraft, SheetWrite } from './batchDraft'

/** A mutation that was judged now, as it is remembered. */
export interface JudgedNow {
  readonly mutationId: string
  readonly seq: number
  readonly sha256: string
  readonly outcome: 'applied' | 'rejected' | 'blocked'
  readonly change: number | null
  readonly problem: Problem | null
}
/** A number that stands for a mutation judged under another number. */
export interface NumberedAgain {
  readonly mutationId: string
  readonly seq: number
  readonly sha256: string
}
/** A mutation that was set apart, with all it says. */
export interface Quarantined {
  readonly mutationId: string
  readonly reason: Problem
  readonly payload: unknown
  readonly entityType: string | null
  readonly entityId: string | null
}

export interface BatchRecord {
  readonly judged: readonly JudgedNow[]
  readonly numberedAgain: readonly NumberedAgain[]
  readonly quarantined: readonly Quarantined[]
  readonly lastSeq: number
}

/**
 * Writes all a batch did in one statement, however large it is: each kind of row from one JSON parameter. Only the parts
 * that are needed are in it.
 */
export async function writeBatch(scope: Scope, draft: BatchDraft, record: BatchRecord): Promise<void> {
  const { organisationId, personId } = scope
  const { deviceId, now } = draft.sender
  const parts = partsOf(draft, record).filter(({ count }) => count > 0)
  const steps = parts.map(({ name, sql }) => `${name} AS (${sql})`)
  await scope.execute(
    `${steps.length > 0 ? `WITH ${steps.join(',\n')}` : ''}
     UPDATE device SET last_seq = $lastSeq, last_seen_at = $now
     WHERE organisation_id = $organisationId AND device_id = $deviceId`,
    {
      organisationId,
      personId,
      deviceId,
      now,
      lastSeq: record.lastSeq,
      ...Object.fromEntries(parts.map(({ name, parameter }) => [name, parameter])),
    },
  )
}

interface Part {
  readonly name: string
  readonly count: number
  /** The one parameter all rows of the part come from. */
  readonly parameter: string
  readonly sql: string
}

const asJson = (rows: readonly unknown[]) => ({ count: rows.length, parameter: JSON.stringify(rows) })
const asIds = (ids: readonly string[]) => ({ count: ids.length, parameter: uuidArray(ids) })

function partsOf(draft: BatchDraft, record: BatchRecord): Part[] {
  const sheets = [...draft.sheetWrites.values()]
  const marks = [...draft.photoMarks].map(([photoId, mark]) => ({ photoId, ...mark }))
  const settled = [...draft.settled].map(([conflictId, change]) => ({ conflictId, change }))
  return [
    {
      name: 'revisions',
      ...asIds(sheets.flatMap(({ sheetId }) => (draft.targets.sheets.has(sheetId) ? [sheetId] : []))),
      sql: KEEP_REVISIONS,
    },
    { name: 'sheets', ...asJson(sheets.map(sheetRow)), sql: WRITE_SHEETS },
    { name: 'photos', ...asJson([...draft.photoWrites.values()]), sql: WRITE_PHOTOS },
    { name: 'marks', ...asJson(marks), sql: MARK_PHOTOS },
    { name: 'conflicts', ...asJson(draft.conflictWrites), sql: WRITE_CONFLICTS },
    { name: 'settled', ...asJson(settled), sql: SETTLE_CONFLICTS },
    { name: 'judged', ...asJson(record.judged), sql: WRITE_JUDGED },
    { name: 'numbered', ...asJson(record.numberedAgain), sql: WRITE_NUMBERED },
    { name: 'quarantined', ...asJson(record.quarantined), sql: WRITE_QUARANTINED },
  ]
}

/** Columns that are null are left out: the text is read token by token. */
function sheetRow({ sheetId, building, record, recordedBy, change }: SheetWrite) {
  const { finding, use, structure, ...derived } = deriveSheet(record.answers)
  return {
    sheetId,
    roundId: building.roundId,
    outlineId: building.outlineId,
    beatId: building.beatId,
    answers: record.answers,
    versions: record.versions,
    writers: record.writers,
    state: record.state,
    revision: record.revision,
    question: record.question ?? undefined,
    reviewChange: record.reviewChange,
    deleteChange: record.deletion?.change,
    deleteDevice: record.deletion?.deviceId,
    recordedBy,
    change,
    finding,
    use,
    structure,
    ...derived,
  }
}

/** What a sheet said before it changes; the table is called `s`. By whom: the planner once reviewed, else the surveyor. */
export const REVISION_OF_SHEET = `s.organisation_id, s.sheet_id, s.revision, s.state, s.answers,
  CASE WHEN s.state = 'handed-in' THEN s.recorded_by ELSE coalesce(s.reviewed_by, s.recorded_by) END,
  CASE WHEN s.state = 'handed-in' THEN s.recorded_at ELSE coalesce(s.reviewed_at, s.recorded_at) END, s.change_no`

const KEEP_REVISIONS = `
  INSERT INTO sheet_revision (organisation_id, sheet_id, revision, state, answers, by_person, at, change_no)
  SELECT ${REVISION_OF_SHEET} FROM unnest($revisions::uuid[]) AS n(id)
  CROSS JOIN LATERAL (SELECT * FROM sheet WHERE organisation_id = $organisationId AND sheet_id = n.id LIMIT 1) s
  ON CONFLICT DO NOTHING`

const WRITE_SHEETS = `
  INSERT INTO sheet (organisation_id, sheet_id, round_id, beat_id, outline_id, answers, versions, writers, state, revision,
    question, review_change, recorded_by, recorded_at, change_no, deleted_at, delete_change, delete_device,
    finding, use, structure, year_from, year_to, footprint_m2, gross_floor_area_m2, floor_area_cv)
  SELECT $organisationId, r."sheetId", r."roundId", r."beatId", r."outlineId", r.answers, r.versions, r.writers, r.state,
    r.revision, r.question, r."reviewChange", r."recordedBy", $now, r.change,
    CASE WHEN r."deleteChange" IS NOT NULL THEN $now::timestamptz END, r."deleteChange", r."deleteDevice",
    r.finding, r.use, r.structure, r."yearFrom", r."yearTo", r."footprintM2", r."grossFloorAreaM2", r."floorAreaCv"
  FROM json_to_recordset($sheets::json) AS r("sheetId" uuid, "roundId" uuid, "beatId" uuid, "outlineId" uuid,
    answers jsonb, versions jsonb, writers jsonb, state text, revision integer, question text, "reviewChange" bigint,
    "recordedBy" uuid, change bigint, "deleteChange" bigint, "deleteDevice" uuid, finding text, use text, structure text,
    "yearFrom" integer, "yearTo" integer, "footprintM2" float8, "grossFloorAreaM2" float8, "floorAreaCv" float8)
  ON CONFLICT (organisation_id, sheet_id) DO UPDATE SET
    beat_id = excluded.beat_id, answers = excluded.answers, versions = excluded.versions, writers = excluded.writers,
    state = excluded.state, revision = excluded.revision, question = excluded.question,
    review_change = excluded.review_change, recorded_by = excluded.recorded_by, recorded_at = excluded.recorded_at,
    change_no = excluded.change_no, deleted_at = excluded.deleted_at, delete_change = excluded.delete_change,
    delete_device = excluded.delete_device, finding = excluded.finding, use = excluded.use,
    structure = excluded.structure, year_from = excluded.year_from, year_to = excluded.year_to,
    footprint_m2 = excluded.footprint_m2, gross_floor_area_m2 = excluded.gross_floor_area_m2,
    floor_area_cv = excluded.floor_area_cv`

const WRITE_PHOTOS = `
  INSERT INTO photo (organisation_id, photo_id, sheet_id, beat_id, sha256, bytes, mime, width_px, height_px, tag, taken_at,
    state, taken_by, change_no)
  SELECT $organisationId, r."photoId", r."sheetId", r."beatId", r.sha256, r.bytes, r.mime, r."widthPx", r."heightPx",
    r.tag, r."takenAt", 'declared', $personId, r.change
  FROM json_to_recordset($photos::json) AS r("photoId" uuid, "sheetId" uuid, "beatId" uuid, sha256 text, bytes integer,
    mime text, "widthPx" integer, "heightPx" integer, tag text, "takenAt" timestamptz, change bigint)
  ON CONFLICT (organisation_id, photo_id) DO UPDATE SET
    tag = excluded.tag, taken_at = excluded.taken_at, change_no = excluded.change_no, deleted_at = NULL`

const MARK_PHOTOS = `
  UPDATE photo p SET change_no = r.change, deleted_at = CASE WHEN r."isDeleted" THEN $now::timestamptz END
  FROM json_to_recordset($marks::json) AS r("photoId" uuid, "isDeleted" boolean, change bigint)
  WHERE p.organisation_id = $organisationId AND p.photo_id = r."photoId"`

/** Whose device wrote a value; unknown devices stand for the person who recorded the sheet. */
const WRITE_CONFLICTS = `
  INSERT INTO conflict (organisation_id, conflict_id, sheet_id, beat_id, field_group, kept, set_aside, kept_by,
    set_aside_by, state, change_no)
  SELECT $organisationId, r."conflictId", r."sheetId", r."beatId", r."group", r.kept, r."setAside",
    coalesce(k.person_id, r."recordedBy"), coalesce(a.person_id, r."recordedBy"), 'open', r.change
  FROM json_to_recordset($conflicts::json) AS r("conflictId" uuid, "sheetId" uuid, "beatId" uuid, "group" text, kept jsonb,
    "setAside" jsonb, "keptDevice" text, "setAsideDevice" text, "recordedBy" uuid, change bigint)
  LEFT JOIN device k ON k.organisation_id = $organisationId AND k.device_id::text = r."keptDevice"
  LEFT JOIN device a ON a.organisation_id = $organisationId AND a.device_id::text = r."setAsideDevice"`

const SETTLE_CONFLICTS = `
  UPDATE conflict c SET state = 'settled', settled_by = $personId, settled_at = $now, change_no = r.change
  FROM json_to_recordset($settled::json) AS r("conflictId" uuid, change bigint)
  WHERE c.organisation_id = $organisationId AND c.conflict_id = r."conflictId"`

const WRITE_JUDGED = `
  INSERT INTO applied_mutation (organisation_id, mutation_id, device_id, seq, payload_sha256, outcome, change_no, problem, at)
  SELECT $organisationId, r."mutationId", $deviceId, r.seq, r.sha256, r.outcome, r.change, r.problem, $now
  FROM json_to_recordset($judged::json) AS r("mutationId" uuid, seq bigint, sha256 text, outcome text, change bigint,
    problem jsonb)`

const WRITE_NUMBERED = `
  INSERT INTO applied_sequence (organisation_id, device_id, seq, mutation_id, payload_sha256)
  SELECT $organisationId, $deviceId, r.seq, r."mutationId", r.sha256
  FROM json_to_recordset($numbered::json) AS r("mutationId" uuid, seq bigint, sha256 text)`

const WRITE_QUARANTINED = `
  INSERT INTO quarantine (organisation_id, mutation_id, device_id, person_id, reason, payload, received_at, entity_type,
    entity_id)
  SELECT $organisationId, r."mutationId", $deviceId, $personId, r.reason, r.payload, $now, r."entityType", r."entityId"
  FROM json_to_recordset($quarantined::json) AS r("mutationId" uuid, reason jsonb, payload jsonb, "entityType" text,
    "entityId" uuid)`
