import { SHEET_GROUPS, type SheetGroup } from '@/shared/schemas/sheet'
import { canonicalJson } from '@/shared/sync/canonicalJson'
import type { MergeResult, SheetRecord, Writing } from '@/shared/sync/sheetRecord.types'

/**
 * Nothing that the writer had not seen, and did not write, may go without being laid aside; a checked sheet does not
 * change under a writer who had not seen the check; nothing is deleted over unseen work.
 *
 * @throws {Error} naming what happened
 */
export function requireNothingSilent(before: SheetRecord, merged: MergeResult, writing: Writing): void {
  const laid = new Set(merged.setAside.map(({ setAside }) => canonicalJson(setAside)))
  const changed = SHEET_GROUPS.filter((group) => hasChanged(before, merged.sheet, group))
  const silent = changed.find(
    (group) => !hasSeen(before, group, writing) && !laid.has(canonicalJson(before.answers[group])),
  )
  if (silent) throw new Error(`${silent} overwritten silently`)
  if (isCheckUnseen(before, writing) && changed.length > 0) throw new Error('a checked sheet changed unseen')
  const isNewlyDeleted = before.deletion === null && merged.sheet.deletion !== null
  if (isNewlyDeleted && !SHEET_GROUPS.every((group) => hasSeen(before, group, writing))) {
    throw new Error('deleted over unseen work')
  }
}

function isCheckUnseen({ state, reviewChange, deletion }: SheetRecord, { seen }: Writing): boolean {
  return state === 'checked' && reviewChange > seen && deletion === null
}

function hasChanged(before: SheetRecord, after: SheetRecord, group: SheetGroup): boolean {
  const was = before.answers[group]
  return was !== undefined && canonicalJson(was) !== canonicalJson(after.answers[group])
}

/** Whether the writer knew what stands in a group, or that all of it was deleted. */
function hasSeen(
  { versions, writers, deletion }: SheetRecord,
  group: SheetGroup,
  { seen, deviceId }: Writing,
): boolean {
  if ((versions[group] ?? 0) <= seen || writers[group] === deviceId) return true
  return deletion !== null && (deletion.change <= seen || deletion.deviceId === deviceId)
}
