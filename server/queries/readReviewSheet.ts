import type { Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import { presentConflict, presentPhotoMeta, type ConflictRow, type PhotoRow } from '@/server/presenters/presentChange'
import { OUTLINE_COLUMNS, OUTLINE_GEOMETRY, presentOutline, type OutlineRow } from '@/server/presenters/presentOutline'
import { presentQueueEntry, QUEUE_COLUMNS, QUEUE_TABLES, type QueueRow } from '@/server/presenters/presentQueueEntry'
import type { ReviewSheet } from '@/shared/api/review'
import type { AreaGeometry } from '@/shared/schemas/primitives'
import type { SheetAnswers, SheetState } from '@/shared/schemas/sheet'
import type { PhotoEntity } from '@/shared/schemas/sync'

interface SheetRow extends QueueRow, Omit<OutlineRow, 'outline_id' | 'reference'> {
  round_id: string
  question: string | null
  reviewed_by_name: string | null
  reviewed_at: Date | null
  geometry: AreaGeometry | null
}

/**
 * One sheet with everything a planner needs to judge it.
 *
 * @param withDeleted whether one that was just deleted is shown as well
 * @throws {Refusal} `not-found`
 */
export async function readReviewSheet(scope: Scope, sheetId: string, withDeleted = false): Promise<ReviewSheet> {
  const wanted = { organisationId: scope.organisationId, sheetId }
  const [row] = await scope.select<SheetRow>(
    `SELECT ${OUTLINE_COLUMNS}, ${QUEUE_COLUMNS}, s.round_id, s.question, reviewer.name AS reviewed_by_name,
       s.reviewed_at, ${OUTLINE_GEOMETRY} AS geometry
     FROM ${QUEUE_TABLES}
     LEFT JOIN person reviewer ON reviewer.organisation_id = s.organisation_id AND reviewer.person_id = s.reviewed_by
     WHERE s.organisation_id = $organisationId AND s.sheet_id = $sheetId AND ($withDeleted OR s.deleted_at IS NULL)`,
    { ...wanted, withDeleted },
  )
  if (!row) throw notFound('sheet')
  return {
    ...presentQueueEntry(row),
    roundId: row.round_id,
    ...presentPlace(row),
    answers: row.answers,
    review: {
      state: row.state,
      question: row.question,
      reviewedByName: row.reviewed_by_name,
      reviewedAt: row.reviewed_at?.toISOString() ?? null,
    },
    photos: await readPhotos(scope, wanted),
    conflicts: await readConflicts(scope, wanted),
    revisions: await readRevisions(scope, wanted),
  } satisfies ReviewSheet
}

function presentPlace(row: SheetRow): Pick<ReviewSheet, 'outline' | 'geometry'> {
  const { outline_id, reference } = row
  if (outline_id === null || reference === null) return { outline: null, geometry: null }
  return { outline: presentOutline({ ...row, outline_id, reference }), geometry: row.geometry }
}

type Wanted = { organisationId: string; sheetId: string }

async function readPhotos(scope: Scope, wanted: Wanted): Promise<ReviewSheet['photos']> {
  const rows = await scope.select<PhotoRow & { photo_id: string; state: PhotoEntity['state'] }>(
    `SELECT photo_id, sheet_id, sha256, bytes, mime, width_px, height_px, tag, taken_at, state FROM photo
     WHERE organisation_id = $organisationId AND sheet_id = $sheetId AND deleted_at IS NULL
     ORDER BY taken_at NULLS LAST, photo_id`,
    wanted,
  )
  return rows.map((row) => ({ ...presentPhotoMeta(row.photo_id, row), state: row.state }))
}

async function readConflicts(scope: Scope, wanted: Wanted): Promise<ReviewSheet['conflicts']> {
  const rows = await scope.select<ConflictRow & { conflict_id: string }>(
    `SELECT c.conflict_id, c.sheet_id, c.field_group, c.kept, c.set_aside, c.state,
       k.name AS kept_by_name, a.name AS set_aside_by_name
     FROM conflict c
     LEFT JOIN person k ON k.organisation_id = c.organisation_id AND k.person_id = c.kept_by
     LEFT JOIN person a ON a.organisation_id = c.organisation_id AND a.person_id = c.set_aside_by
     WHERE c.organisation_id = $organisationId AND c.sheet_id = $sheetId
     ORDER BY c.state, c.created_at, c.conflict_id`,
    wanted,
  )
  return rows.map((row) => ({ ...presentConflict(row), conflictId: row.conflict_id }))
}

/** What the sheet said before, and as the last what it says now; a state that was noted already is not repeated. */
async function readRevisions(scope: Scope, wanted: Wanted): Promise<ReviewSheet['revisions']> {
  const rows = await scope.select<{
    revision: number
    state: SheetState
    by_name: string
    at: Date
    answers: SheetAnswers
  }>(
    `SELECT DISTINCT ON (v.change_no) v.revision, v.state, p.name AS by_name, v.at, v.answers
     FROM (
       SELECT revision, state, answers, by_person, at, change_no FROM sheet_revision
       WHERE organisation_id = $organisationId AND sheet_id = $sheetId
       UNION ALL
       SELECT revision, state, answers,
         CASE WHEN state = 'handed-in' THEN recorded_by ELSE coalesce(reviewed_by, recorded_by) END,
         CASE WHEN state = 'handed-in' THEN recorded_at ELSE coalesce(reviewed_at, recorded_at) END, change_no
       FROM sheet WHERE organisation_id = $organisationId AND sheet_id = $sheetId
     ) AS v
     JOIN person p ON p.organisation_id = $organisationId AND p.person_id = v.by_person
     ORDER BY v.change_no`,
    wanted,
  )
  return rows.map(({ by_name, at, ...row }) => ({ ...row, byName: by_name, at: at.toISOString() }))
}
