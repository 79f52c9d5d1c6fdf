import { SHEET_GROUPS } from '@/shared/schemas/sheet'
import { isConcurrent } from './mergeSheet'
import type { MergeResult, SheetRecord, Writing } from './sheetRecord.types'

/**
 * Deletes a sheet, unless somebody else wrote on it after what the deleter had on screen, or a planner spoke on it: then
 * it stays and the deletion is set aside for a person to decide (rule G6).
 */
export function mergeDeletion(sheet: SheetRecord, writing: Writing): MergeResult {
  if (sheet.deletion !== null) return { sheet, setAside: [], isChanged: false }
  const wasEdited = SHEET_GROUPS.some((group) => isConcurrent(sheet, group, writing))
  const wasReviewed = sheet.state === 'checked' || sheet.reviewChange > writing.seen
  if (!wasEdited && !wasReviewed) {
    const deletion = { change: writing.change, deviceId: writing.deviceId }
    return { sheet: { ...sheet, deletion }, setAside: [], isChanged: true }
  }
  return {
    sheet,
    setAside: [
      {
        group: 'deletion',
        kept: { isDeleted: false },
        setAside: { isDeleted: true },
        keptDeviceId: lastWriter(sheet),
        setAsideDeviceId: writing.deviceId,
      },
    ],
    isChanged: false,
  }
}

/** Takes a deletion back; the sheet is as it was. */
export function mergeUndeletion(sheet: SheetRecord): MergeResult {
  if (sheet.deletion === null) return { sheet, setAside: [], isChanged: false }
  return { sheet: { ...sheet, deletion: null }, setAside: [], isChanged: true }
}

function lastWriter(sheet: SheetRecord): string | null {
  let last: string | null = null
  let newest = -1
  for (const group of SHEET_GROUPS) {
    const version = sheet.versions[group] ?? -1
    if (version <= newest) continue
    newest = version
    last = sheet.writers[group] ?? null
  }
  return last
}
