import type { Scope } from '@/server/database'
import { lockChangeOrder, takeChangeNumbers } from './takeChangeNumbers'
import { REVISION_OF_SHEET } from './writeBatch'

export interface SheetAsSeen {
  readonly sheetId: string
  /** Change number of the sheet the planner looked at. */
  readonly change: number
}
export interface ReviewWord {
  readonly state: 'checked' | 'sent-back'
  readonly question: string | null
  readonly now: Date
}

/**
 * Puts the planner's word on sheets that are still as they were seen. What they said before is kept as a revision, each
 * gets a change number, and the audit trail a line.
 *
 * @returns ids of the sheets that now have the word; one that had the same word already counts and does not change
 */
export async function reviewSheets(scope: Scope, sheets: readonly SheetAsSeen[], word: ReviewWord): Promise<string[]> {
  await lockChangeOrder(scope)
  const first = await takeChangeNumbers(scope, sheets.length)
  const rows = await scope.select<{ sheet_id: string }>(REVIEW, {
    organisationId: scope.organisationId,
    personId: scope.personId,
    sheets: JSON.stringify(
      sheets.map(({ sheetId, change }, position) => ({ sheetId, change, number: first + position })),
    ),
    ...word,
    action: word.state === 'checked' ? 'sheet-checked' : 'sheet-sent-back',
  })
  return rows.map(({ sheet_id }) => sheet_id)
}

const REVIEW = `
  WITH seen AS (
    SELECT DISTINCT ON (w."sheetId") w.number, s.*
    FROM json_to_recordset($sheets::json) AS w("sheetId" uuid, change bigint, number bigint)
    JOIN sheet s ON s.organisation_id = $organisationId AND s.sheet_id = w."sheetId" AND s.change_no = w.change
    WHERE s.deleted_at IS NULL ORDER BY w."sheetId", w.number
  ), kept AS (
    INSERT INTO sheet_revision (organisation_id, sheet_id, revision, state, answers, by_person, at, change_no)
    SELECT ${REVISION_OF_SHEET} FROM seen s
    ON CONFLICT DO NOTHING
  ), changed AS (
    UPDATE sheet t SET state = $state, question = $question, reviewed_by = $personId, reviewed_at = $now,
      review_change = s.number, change_no = s.number
    FROM seen s
    WHERE t.organisation_id = $organisationId AND t.sheet_id = s.sheet_id
      AND (t.state <> $state OR t.question IS DISTINCT FROM $question)
    RETURNING t.sheet_id, t.revision
  ), noted AS (
    INSERT INTO audit_entry (organisation_id, person_id, action, subject_type, subject_id, detail)
    SELECT $organisationId, $personId, $action, 'sheet', sheet_id::text, json_build_object('revision', revision)::jsonb
    FROM changed
  )
  SELECT sheet_id FROM seen`
