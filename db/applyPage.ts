import type { Change } from '@/shared/schemas/sync'
import type { Statements } from './driver.types'
import { readMeta, removeMeta, writeMeta } from './metaTable'
import type { PulledPage } from './syncStore.types'

type BaseTable = 'base' | 'base_next'

/**
 * Writes one page of a pull; a page that comes twice changes nothing (L2), rows of other beats go (L5). In a rebuild it
 * is written beside the rows that are there, and its last page takes their place (L7).
 */
export async function applyPage(inside: Statements, page: PulledPage): Promise<void> {
  const present = page.changes.filter((change) => change.type !== 'gone')
  const gone = page.changes.filter((change) => change.type === 'gone')
  const isRebuild = (await readMeta(inside, 'rebuildCursor')) !== null
  const into: BaseTable = isRebuild ? 'base_next' : 'base'
  await inside.run(
    `INSERT INTO ${into} (type, id, change_no, building_id, beat_id, fields)
     SELECT value ->> 'type', value ->> 'id', value ->> 'change', value ->> 'buildingId', value ->> 'beatId', value ->> 'fields'
     FROM json_each(?) WHERE true
     ON CONFLICT (type, id) DO UPDATE SET change_no = excluded.change_no, building_id = excluded.building_id,
       beat_id = excluded.beat_id, fields = excluded.fields WHERE excluded.change_no > ${into}.change_no`,
    [JSON.stringify(present.map(toRow))],
  )
  if (gone.length > 0) await dropGone(inside, into, gone)
  await confirmPhotos(inside, present)
  await dropOtherBeats(inside, 'base', page.beatIds)
  if (isRebuild) await dropOtherBeats(inside, 'base_next', page.beatIds)
  await writeMeta(inside, isRebuild ? 'rebuildCursor' : 'cursor', page.cursor)
  if (isRebuild && page.isLast) await swap(inside, page.cursor)
}

async function swap(inside: Statements, cursor: string): Promise<void> {
  await inside.run('DELETE FROM base')
  await inside.run('INSERT INTO base SELECT * FROM base_next')
  await inside.run('DELETE FROM base_next')
  await removeMeta(inside, 'rebuildCursor')
  await writeMeta(inside, 'cursor', cursor)
}

function toRow(change: Change) {
  if (change.type === 'gone') return null
  const { type, id, change: changeNo, fields } = change
  const place =
    change.type === 'building'
      ? { buildingId: id, beatId: change.fields.beatId }
      : change.type === 'sheet'
        ? { buildingId: id }
        : change.type === 'beat'
          ? { beatId: id }
          : { buildingId: change.fields.sheetId }
  return { type, id, change: changeNo, ...place, fields: JSON.stringify(fields) }
}

async function dropGone(inside: Statements, from: BaseTable, gone: readonly Change[]): Promise<void> {
  const rows = JSON.stringify(
    gone.flatMap((change) => (change.type === 'gone' ? [{ id: change.id, of: change.of, change: change.change }] : [])),
  )
  await inside.run(
    `INSERT INTO gone_sheet (id, change_no)
     SELECT value ->> 'id', value ->> 'change' FROM json_each(?) WHERE value ->> 'of' = 'sheet'
     ON CONFLICT (id) DO UPDATE SET change_no = max(change_no, excluded.change_no)`,
    [rows],
  )
  await inside.run(
    `DELETE FROM ${from} WHERE (type, id) IN (
       SELECT value ->> 'of', value ->> 'id' FROM json_each(?)
       JOIN ${from} AS held ON held.type = value ->> 'of' AND held.id = value ->> 'id' AND held.change_no < value ->> 'change')`,
    [rows],
  )
}

/** A photo that the server stored needs no place in the bag any more; one that it refused says why (U6). */
async function confirmPhotos(inside: Statements, changes: readonly Change[]): Promise<void> {
  const settled = changes.flatMap((change) =>
    change.type === 'photo' && (change.fields.state === 'stored' || change.fields.state === 'refused')
      ? [{ id: change.id, state: change.fields.state, refusal: change.fields.refusal }]
      : [],
  )
  if (settled.length === 0) return
  const rows = JSON.stringify(settled)
  await inside.run(
    `DELETE FROM photo WHERE is_removed = 0 AND photo_id IN (
       SELECT value ->> 'id' FROM json_each(?) WHERE value ->> 'state' = 'stored')`,
    [rows],
  )
  await inside.run(
    `UPDATE photo SET place = 'refused', refusal = said.value ->> 'refusal'
     FROM json_each(?) AS said WHERE said.value ->> 'id' = photo_id AND said.value ->> 'state' = 'refused'`,
    [rows],
  )
}

async function dropOtherBeats(inside: Statements, from: BaseTable, beatIds: readonly string[]): Promise<void> {
  const beats = JSON.stringify(beatIds)
  const others = `SELECT id FROM ${from} WHERE type = 'building' AND beat_id NOT IN (SELECT value FROM json_each(?))`
  await inside.run(`DELETE FROM ${from} WHERE type IN ('sheet', 'photo', 'conflict') AND building_id IN (${others})`, [
    beats,
  ])
  await inside.run(
    `DELETE FROM ${from} WHERE type IN ('beat', 'building') AND beat_id NOT IN (SELECT value FROM json_each(?))`,
    [beats],
  )
}
