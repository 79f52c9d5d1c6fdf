import { sheetGroups, SHEET_GROUPS, type SheetAnswers, type SheetGroup } from '@/shared/schemas/sheet'
import { mergeDeletion } from './mergeDeletion'
import { mergeSheet } from './mergeSheet'
import type { MergeResult, SheetRecord, Writing } from './sheetRecord.types'

/** What two people wrote, and which of both shall count. */
export interface Choice {
  readonly group: string
  readonly setAside: unknown
  readonly choice: 'kept' | 'set-aside'
}

/**
 * Settles a conflict by a surveyor's choice. The kept value counts already, so choosing it changes nothing; the other
 * one is written by the rules of every write, so that what came after the conflict is not overwritten unseen (rule G8).
 */
export function mergeChoice(sheet: SheetRecord, { group, setAside, choice }: Choice, writing: Writing): MergeResult {
  if (choice === 'kept') return { sheet, setAside: [], isChanged: false }
  if (group === 'deletion') return mergeDeletion(sheet, writing)
  return mergeSheet(sheet, answersOf(group, setAside), writing)
}

/**
 * Settles a conflict by a planner's choice: it counts as it is, and the state of the sheet stays.
 */
export function settleByPlanner(
  sheet: SheetRecord,
  { group, setAside, choice }: Choice,
  writing: Writing,
): MergeResult {
  if (choice === 'kept') return { sheet, setAside: [], isChanged: false }
  if (group === 'deletion') {
    const deletion = sheet.deletion ?? { change: writing.change, deviceId: writing.deviceId }
    return { sheet: { ...sheet, deletion }, setAside: [], isChanged: sheet.deletion === null }
  }
  const set = answersOf(group, setAside)
  const groups = SHEET_GROUPS.filter((name) => name in set)
  const stamp = <Value>(value: Value) => Object.fromEntries(groups.map((name) => [name, value]))
  return {
    sheet: {
      ...sheet,
      answers: { ...sheet.answers, ...set },
      versions: { ...sheet.versions, ...stamp(writing.change) },
      writers: { ...sheet.writers, ...stamp(writing.deviceId) },
    },
    setAside: [],
    isChanged: groups.length > 0,
  }
}

/** A value that was set aside, as answers; nothing when it is no value of its group (any more). */
function answersOf(group: string, value: unknown): SheetAnswers {
  if (!isSheetGroup(group)) return {}
  const result = sheetGroups[group].safeParse(value)
  return result.success ? { [group]: result.data } : {}
}

function isSheetGroup(group: string): group is SheetGroup {
  return Object.hasOwn(sheetGroups, group)
}
