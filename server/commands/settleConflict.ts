import type { Context } from '@/server/context'
import type { Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import type { SignedIn } from '@/server/middleware/signedIn'
import { SHEET_JSON, toTargetSheet } from '@/server/queries/readPushTargets'
import { readReviewSheet } from '@/server/queries/readReviewSheet'
import type { ReviewSheet } from '@/shared/api/review'
import { deriveSheet } from '@/shared/schemas/deriveSheet'
import { settleByPlanner, type Choice } from '@/shared/sync/mergeChoice'
import type { MergeResult } from '@/shared/sync/sheetRecord.types'
import { recordAudit } from './recordAudit'
import { retryOnContention } from './retryOnContention'
import { lockChangeOrder, takeChangeNumbers } from './takeChangeNumbers'
import { REVISION_OF_SHEET } from './writeBatch'

/**
 * Chooses one of the two values of a conflict. One that is settled already stays as it was settled.
 *
 * @throws {Refusal} `not-found`
 */
export async function settleConflict(
  { database, now }: Pick<Context, 'database' | 'now'>,
  signedIn: SignedIn,
  { conflictId, choice }: { conflictId: string; choice: Choice['choice'] },
): Promise<ReviewSheet> {
  return retryOnContention(() =>
    database.withScope(signedIn, async (scope) => {
      await lockChangeOrder(scope)
      const conflict = await readConflict(scope, conflictId)
      if (conflict.state === 'open') {
        const first = await takeChangeNumbers(scope, 2)
        const { record } = await readSheet(scope, conflict.sheet_id)
        const writing = { deviceId: signedIn.deviceId, seen: 0, change: first }
        const chosen = { group: conflict.field_group, setAside: conflict.set_aside, choice }
        const settled = settleByPlanner(record, chosen, writing)
        if (settled.isChanged) await writeSettled(scope, conflict.sheet_id, settled, { change: first, now: now() })
        await closeConflict(scope, conflictId, { change: first + 1, now: now() })
        await recordAudit(scope, {
          action: 'conflict-settled',
          subjectType: 'sheet',
          subjectId: conflict.sheet_id,
          detail: { conflictId, group: conflict.field_group, choice },
        })
      }
      return readReviewSheet(scope, conflict.sheet_id, true)
    }),
  )
}

interface ConflictRow {
  sheet_id: string
  field_group: string
  set_aside: unknown
  state: 'open' | 'settled'
}

async function readConflict(scope: Scope, conflictId: string): Promise<ConflictRow> {
  const [row] = await scope.select<ConflictRow>(
    `SELECT sheet_id, field_group, set_aside, state FROM conflict
     WHERE organisation_id = $organisationId AND conflict_id = $conflictId`,
    { organisationId: scope.organisationId, conflictId },
  )
  if (!row) throw notFound('conflict')
  return row
}

async function readSheet(scope: Scope, sheetId: string) {
  const [row] = await scope.select<{ sheet: Parameters<typeof toTargetSheet>[0] }>(
    `SELECT ${SHEET_JSON} AS sheet FROM sheet s WHERE s.organisation_id = $organisationId AND s.sheet_id = $sheetId`,
    { organisationId: scope.organisationId, sheetId },
  )
  if (!row) throw notFound('sheet')
  return toTargetSheet(row.sheet)
}

async function writeSettled(
  scope: Scope,
  sheetId: string,
  { sheet }: MergeResult,
  { change, now }: { change: number; now: Date },
): Promise<void> {
  const { finding, use, structure, ...derived } = deriveSheet(sheet.answers)
  await scope.execute(
    `WITH kept AS (
       INSERT INTO sheet_revision (organisation_id, sheet_id, revision, state, answers, by_person, at, change_no)
       SELECT ${REVISION_OF_SHEET} FROM sheet s WHERE s.organisation_id = $organisationId AND s.sheet_id = $sheetId
       ON CONFLICT DO NOTHING
     )
     UPDATE sheet SET answers = $answers::jsonb, versions = $versions::jsonb, writers = $writers::jsonb,
       change_no = $change, deleted_at = CASE WHEN $deleteChange::bigint IS NOT NULL THEN $now::timestamptz END,
       delete_change = $deleteChange, delete_device = $deleteDevice, finding = $finding, use = $use,
       structure = $structure, year_from = $yearFrom, year_to = $yearTo, footprint_m2 = $footprintM2,
       gross_floor_area_m2 = $grossFloorAreaM2, floor_area_cv = $floorAreaCv
     WHERE organisation_id = $organisationId AND sheet_id = $sheetId`,
    {
      organisationId: scope.organisationId,
      sheetId,
      answers: JSON.stringify(sheet.answers),
      versions: JSON.stringify(sheet.versions),
      writers: JSON.stringify(sheet.writers),
      change,
      now,
      deleteChange: sheet.deletion?.change ?? null,
      deleteDevice: sheet.deletion?.deviceId ?? null,
      finding,
      use,
      structure,
      ...derived,
    },
  )
}

async function closeConflict(
  scope: Scope,
  conflictId: string,
  { change, now }: { change: number; now: Date },
): Promise<void> {
  await scope.execute(
    `UPDATE conflict SET state = 'settled', settled_by = $personId, settled_at = $now, change_no = $change
     WHERE organisation_id = $organisationId AND conflict_id = $conflictId`,
    { organisationId: scope.organisationId, personId: scope.personId, conflictId, change, now },
  )
}
