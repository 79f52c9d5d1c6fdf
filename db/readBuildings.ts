import type { SheetAnswers } from '@/shared/schemas/sheet'
import type { Statements } from './driver.types'
import { deviceSheetState } from './deviceSheetState'
import type { StoredBuilding } from './fieldStore.types'
import { readColumn, type BaseRow, type DraftRow, type OutboxRow } from './rows'
import { standingAnswers } from './standingAnswers'

type BagRow = Pick<OutboxRow, 'building_id' | 'payload' | 'status'>
type Where = 'beat_id = ?' | 'building_id = ?'

/** Buildings with what is recorded of them here, from five statements however many there are. */
export async function readBuildings(inside: Statements, where: Where, value: string): Promise<StoredBuilding[]> {
  const ids = `SELECT id FROM base WHERE type = 'building' AND ${where}`
  const buildings = await inside.all<BaseRow>(
    `SELECT id, change_no, fields FROM base WHERE type = 'building' AND ${where} ORDER BY id`,
    [value],
  )
  const sheets = await inside.all<BaseRow>(
    `SELECT id, change_no, fields FROM base WHERE type = 'sheet' AND id IN (${ids})`,
    [value],
  )
  const bag = await inside.all<BagRow>(
    `SELECT building_id, payload, status FROM outbox WHERE type = 'sheet' AND building_id IN (${ids}) ORDER BY seq`,
    [value],
  )
  const drafts = await inside.all<DraftRow>(`SELECT * FROM draft WHERE building_id IN (${ids})`, [value])
  const photos = await inside.all<{ sheet_id: string; count: number }>(
    `SELECT sheet_id, count(*) AS count FROM (
       SELECT photo_id, sheet_id FROM photo WHERE is_removed = 0 AND sheet_id IN (${ids})
       UNION SELECT id, building_id FROM base WHERE type = 'photo' AND building_id IN (${ids})
         AND id NOT IN (SELECT photo_id FROM photo WHERE is_removed = 1)
     ) GROUP BY sheet_id`,
    [value, value],
  )
  const sheetOf = new Map(sheets.map((row) => [row.id, row.fields]))
  const bagOf = new Map<string, BagRow[]>()
  for (const row of bag) bagOf.set(row.building_id, [...(bagOf.get(row.building_id) ?? []), row])
  const draftOf = new Map(drafts.map((row) => [row.building_id, row.answers]))
  const photosOf = new Map(photos.map((row) => [row.sheet_id, row.count]))
  return buildings.map((row) =>
    storedBuilding({
      row,
      sheet: sheetOf.get(row.id),
      bag: bagOf.get(row.id) ?? [],
      draft: draftOf.get(row.id),
      photoCount: photosOf.get(row.id) ?? 0,
    }),
  )
}

interface Parts {
  readonly row: BaseRow
  readonly sheet: string | undefined
  readonly bag: readonly BagRow[]
  readonly draft: string | undefined
  readonly photoCount: number
}

function storedBuilding({ row, sheet, bag, draft, photoCount }: Parts): StoredBuilding {
  const confirmed = sheet === undefined ? null : readColumn.sheet(sheet)
  const drafted: SheetAnswers = readColumn.draft(draft ?? '{}')
  const waiting = bag.filter(({ status }) => status === null).length
  const state = deviceSheetState({
    confirmed: confirmed?.review.state ?? null,
    waiting,
    sent: bag.length - waiting,
    hasDraft: Object.keys(drafted).length > 0,
  })
  const sets = bag.map(({ payload }) => setOf(payload))
  return {
    buildingId: row.id,
    building: readColumn.building(row.fields),
    state,
    question: state === 'sent-back' ? (confirmed?.review.question ?? null) : null,
    photoCount,
    answers: standingAnswers(confirmed?.answers ?? {}, sets, drafted),
  }
}

function setOf(payload: string): SheetAnswers {
  const parsed: unknown = JSON.parse(payload)
  return typeof parsed === 'object' && parsed !== null && 'set' in parsed ? readColumn.sheetSet(payload) : {}
}
