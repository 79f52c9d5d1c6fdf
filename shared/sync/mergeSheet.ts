import { SHEET_GROUPS, type SheetAnswers, type SheetGroup } from '@/shared/schemas/sheet'
import { canonicalJson } from './canonicalJson'
import type { MergeResult, SetAside, SheetRecord, Writing } from './sheetRecord.types'

/**
 * Merges the groups of one `set` into a sheet, group by group, in the order the server received them. No clock enters.
 *
 * A group is concurrent when it was written after what the surveyor had on screen, by another device. Then different
 * values meet: on a sheet that is not checked the arriving one counts and the other is set aside; on a checked sheet
 * the checked one counts and the arriving one is a proposal. A check that the surveyor had not seen is concurrent with
 * every group. Whoever answers having seen the planner's word raises the revision and hands the sheet in again
 * (rules G1 to G7).
 *
 * @param before the sheet as it stands, null when there is none
 */
export function mergeSheet(before: SheetRecord | null, set: SheetAnswers, writing: Writing): MergeResult {
  const { sheet, setAside: ofDeletion } = bringBack(before ?? NEW_SHEET, writing)
  const setAside: SetAside[] = [...ofDeletion]
  const written: SheetGroup[] = []
  for (const group of SHEET_GROUPS) {
    if (set[group] === undefined) continue
    const verdict = judgeGroup(sheet, group, set[group], writing)
    if (verdict === 'wins' || verdict === 'follows') written.push(group)
    const kept = { value: sheet.answers[group], deviceId: sheet.writers[group] }
    const come = { value: set[group], deviceId: writing.deviceId }
    if (verdict === 'proposal') setAside.push(lay(group, kept, come))
    if (verdict === 'wins') setAside.push(lay(group, come, kept))
  }
  return {
    sheet: { ...writeGroups(sheet, set, written, writing), ...revise(sheet, written, writing) },
    setAside,
    isChanged: written.length > 0 || before === null || before.deletion !== null,
  }
}

/** Having seen the planner's word and written again is an answer: the next revision is handed in. */
function revise(sheet: SheetRecord, written: readonly SheetGroup[], { seen }: Writing): Partial<SheetRecord> {
  if (sheet.state === 'handed-in' || written.length === 0 || seen < sheet.reviewChange) return {}
  return { state: 'handed-in', revision: sheet.revision + 1, question: null }
}

/** A sheet of which nothing is written yet. */
export const NEW_SHEET: SheetRecord = Object.freeze({
  answers: {},
  versions: {},
  writers: {},
  state: 'handed-in',
  revision: 1,
  question: null,
  reviewChange: 0,
  deletion: null,
})

/** Whether a group was written after what the writer had on screen, by another device. */
export function isConcurrent(sheet: SheetRecord, group: SheetGroup, { seen, deviceId }: Writing): boolean {
  return (sheet.versions[group] ?? 0) > seen && sheet.writers[group] !== deviceId
}

type Verdict = 'follows' | 'wins' | 'proposal' | 'said-already'

function judgeGroup(sheet: SheetRecord, group: SheetGroup, arriving: unknown, writing: Writing): Verdict {
  const isChecked = sheet.state === 'checked'
  const isContested = isConcurrent(sheet, group, writing) || (isChecked && writing.seen < sheet.reviewChange)
  if (!isContested) return 'follows'
  const current = sheet.answers[group]
  if (current !== undefined && canonicalJson(current) === canonicalJson(arriving)) return 'said-already'
  return isChecked ? 'proposal' : 'wins'
}

function writeGroups(
  sheet: SheetRecord,
  set: SheetAnswers,
  groups: readonly SheetGroup[],
  writing: Writing,
): SheetRecord {
  const of = <Value>(valueOf: (group: SheetGroup) => Value) =>
    Object.fromEntries(groups.map((group) => [group, valueOf(group)]))
  return {
    ...sheet,
    answers: { ...sheet.answers, ...of((group) => set[group]) },
    versions: { ...sheet.versions, ...of(() => writing.change) },
    writers: { ...sheet.writers, ...of(() => writing.deviceId) },
  }
}

/** Writing on a deleted sheet: who knew of the deletion begins afresh, who did not brings the sheet back. */
function bringBack(sheet: SheetRecord, writing: Writing): Pick<MergeResult, 'sheet' | 'setAside'> {
  const { deletion } = sheet
  if (deletion === null) return { sheet, setAside: [] }
  if (deletion.deviceId === writing.deviceId || writing.seen >= deletion.change) {
    return { sheet: { ...NEW_SHEET, revision: sheet.revision + 1 }, setAside: [] }
  }
  const edited = { value: { isDeleted: false }, deviceId: writing.deviceId }
  const deleted = { value: { isDeleted: true }, deviceId: deletion.deviceId }
  return { sheet: { ...sheet, deletion: null }, setAside: [lay('deletion', edited, deleted)] }
}

interface Said {
  readonly value: unknown
  readonly deviceId: string | undefined
}

function lay(group: SetAside['group'], kept: Said, setAside: Said): SetAside {
  return {
    group,
    kept: kept.value ?? null,
    setAside: setAside.value ?? null,
    keptDeviceId: kept.deviceId ?? null,
    setAsideDeviceId: setAside.deviceId ?? null,
  }
}
