import type { MutationOutcome } from '@/shared/schemas/sync'
import type { Problem } from '@/shared/schemas/problem'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import { syncDigest, type SyncDigest } from '@/shared/sync/syncDigest'
import { applyPage } from './applyPage'
import type { Driver, Statements } from './driver.types'
import { evictPhotos } from './evictPhotos'
import { makeBagFile, type BagOwner } from './makeBagFile'
import { markSurrendered } from './markSurrendered'
import { readMeta, removeMeta, writeMeta } from './metaTable'
import { idsToKeep } from './openWithTwin'
import type { PhotoFiles } from './photoFiles.types'
import { readColumn, type DraftRow, type OutboxRow, type PhotoRow } from './rows'
import type { StorageRoom } from './storageRoom'
import type { SyncStore, WaitingMutation } from './syncStore.types'
import type { Twin } from './twin.types'

export interface SyncStoreParts {
  readonly driver: Driver
  readonly photoFiles: PhotoFiles
  readonly twin: Twin
  readonly owner: BagOwner
  readonly readRoom: () => Promise<Pick<StorageRoom, 'level'>>
  readonly now: () => Date
  readonly changed: () => void
  readonly subscribe: (listener: () => void) => () => void
}

/** The device's database as handing in uses it. */
export function createSyncStore(parts: SyncStoreParts): SyncStore {
  const { driver, photoFiles, twin, owner, now, changed, subscribe } = parts
  /** Of the rows as they are; null after a page that may have changed them. */
  let digest: SyncDigest | null = null
  let lastBeats = ''
  const write = async (work: (inside: Statements) => Promise<void>): Promise<void> => {
    await driver.transaction(work)
    changed()
  }
  return {
    subscribe,
    nextBatch: (mostCount, mostBytes) => nextBatch(driver, mostCount, mostBytes),
    countWaiting: () => countWaiting(driver),
    settle: (outcomes) => write((inside) => settle(inside, outcomes, now())),
    setApart: (mutationId, problem) => write((inside) => setApart(inside, mutationId, problem, now())),
    async hasSeq(seq) {
      return (await driver.all('SELECT seq FROM outbox WHERE seq = ? AND status IS NULL', [seq])).length > 0
    },
    nextSeq: async () => Number((await readMeta(driver, 'nextSeq')) ?? '1'),
    beginRenewal: () => driver.transaction((inside) => writeMeta(inside, 'isRenewing', '1')),
    isRenewing: async () => (await readMeta(driver, 'isRenewing')) !== null,
    renumber: (deviceId) => write((inside) => renumber(inside, deviceId)),
    async readCursor() {
      const ofRebuild = await readMeta(driver, 'rebuildCursor')
      return ofRebuild === null ? readMeta(driver, 'cursor') : ofRebuild || null
    },
    async applyPage(page) {
      const beats = page.beatIds.join()
      if (page.changes.length > 0 || beats !== lastBeats) digest = null
      lastBeats = beats
      await write((inside) => applyPage(inside, page))
    },
    async dropConfirmed(ackSeq, at) {
      await write((inside) => dropConfirmed(inside, ackSeq, at))
      // what the twin holds too much is handed in once more at worst, and known there by its id
      await twin.keepOnly(await idsToKeep(driver)).catch(() => undefined)
    },
    async evictPhotos() {
      return (await parts.readRoom()).level === 'roomy' ? 0 : evictPhotos(driver, photoFiles)
    },
    makeBagFile: () => makeBagFile(driver, owner, now()),
    markSurrendered(sha256) {
      digest = null
      return write((inside) => markSurrendered(inside, sha256, now()))
    },
    readSurrendered: () => readMeta(driver, 'surrenderedAt'),
    isKeyEnrolled: async (deviceId) => (await readMeta(driver, 'keyEnrolledFor')) === deviceId,
    noteKeyEnrolled: (deviceId) => driver.transaction((inside) => writeMeta(inside, 'keyEnrolledFor', deviceId)),
    async baseDigest() {
      digest ??= syncDigest(
        await driver.all<{ id: string; change: number }>('SELECT id, change_no AS change FROM base'),
      )
      return digest
    },
    startRebuild() {
      digest = null
      return driver.transaction(async (inside) => {
        await inside.run('DELETE FROM base_next')
        await writeMeta(inside, 'rebuildCursor', '')
      })
    },
    async nextPhotos(most) {
      const rows = await driver.all<PhotoRow>(
        `SELECT * FROM photo WHERE place = 'kept-here' AND is_removed = 0 AND NOT EXISTS (
           SELECT 1 FROM outbox WHERE entity_id = photo_id AND status IS NULL)
         ORDER BY photo_id LIMIT ?`,
        [most],
      )
      return rows.map(({ meta }) => readColumn.photoMeta(meta))
    },
    readPhotoBytes: (sha256) => photoFiles.read(sha256),
    markPhoto: (photoId, place, refusal) =>
      write((inside) =>
        inside.run('UPDATE photo SET place = ?, refusal = ? WHERE photo_id = ?', [place, refusal, photoId]),
      ),
    keepEdition: (edition) => write((inside) => writeMeta(inside, 'edition', JSON.stringify(edition))),
    keepNextLooks: (lists) => write((inside) => writeMeta(inside, 'nextLook', JSON.stringify(lists))),
  }
}

async function nextBatch(inside: Statements, mostCount: number, mostBytes: number): Promise<WaitingMutation[]> {
  const rows = await inside.all<OutboxRow>('SELECT * FROM outbox WHERE status IS NULL ORDER BY seq LIMIT ?', [
    mostCount,
  ])
  const batch: WaitingMutation[] = []
  let bytes = 0
  for (const row of rows) {
    const size = new TextEncoder().encode(row.payload).length
    if (batch.length > 0 && bytes + size > mostBytes) break
    bytes += size
    batch.push({ mutationId: row.mutation_id, seq: row.seq, mutation: JSON.parse(row.payload), bytes: size })
  }
  return batch
}

async function countWaiting(inside: Statements) {
  const [row] = await inside.all<{ unanswered: number; unconfirmed: number; photos: number }>(
    `SELECT (SELECT count(*) FROM outbox WHERE status IS NULL) AS unanswered,
            (SELECT count(*) FROM outbox WHERE status IS NOT NULL) AS unconfirmed,
            (SELECT count(*) FROM photo WHERE place = 'kept-here' AND is_removed = 0) AS photos`,
  )
  return row ?? { unanswered: 0, unconfirmed: 0, photos: 0 }
}

async function settle(inside: Statements, outcomes: readonly MutationOutcome[], now: Date): Promise<void> {
  for (const { id, status, change, problem } of outcomes) {
    if (status === 'applied' || status === 'replay') {
      await inside.run('UPDATE outbox SET status = ?, change_no = ? WHERE mutation_id = ?', [
        status,
        change ?? null,
        id,
      ])
    } else {
      await setApart(inside, id, problem ?? unexplained(status), now)
    }
  }
}

function unexplained(status: string): Problem {
  return { type: 'about:blank', title: status, status: 422, code: status, detail: status, faults: [] }
}

/** Out of the bag, into quarantine, with all of its content. */
async function setApart(inside: Statements, mutationId: string, problem: Problem, now: Date): Promise<void> {
  await inside.run(
    `INSERT INTO quarantine (mutation_id, type, building_id, payload, problem, set_apart_at)
     SELECT mutation_id, type, building_id, payload, ?, ? FROM outbox WHERE mutation_id = ?
     ON CONFLICT (mutation_id) DO UPDATE SET problem = excluded.problem`,
    [JSON.stringify(problem), now.toISOString(), mutationId],
  )
  await returnToDraft(inside, mutationId, now)
  await refusePhoto(inside, mutationId, problem)
  await inside.run('DELETE FROM outbox WHERE mutation_id = ?', [mutationId])
}

/** A photo whose record was refused says why; one whose removal was refused is there again. */
async function refusePhoto(inside: Statements, mutationId: string, problem: Problem): Promise<void> {
  const entityOf = (op: string) =>
    `(SELECT entity_id FROM outbox WHERE mutation_id = ? AND type = 'photo' AND payload ->> 'op' = '${op}')`
  await inside.run(`UPDATE photo SET place = 'refused', refusal = ? WHERE photo_id = ${entityOf('set')}`, [
    problem.detail,
    mutationId,
  ])
  await inside.run(
    `DELETE FROM photo WHERE photo_id = ${entityOf('delete')} AND photo_id IN (SELECT id FROM base WHERE type = 'photo')`,
    [mutationId],
  )
  await inside.run(`UPDATE photo SET is_removed = 0 WHERE photo_id = ${entityOf('delete')} AND place <> 'refused'`, [
    mutationId,
  ])
}

/** What was refused opens in the form again, under what was written since, so that it can be mended. */
async function returnToDraft(inside: Statements, mutationId: string, now: Date): Promise<void> {
  const [refused] = await inside.all<OutboxRow>(
    "SELECT * FROM outbox WHERE mutation_id = ? AND type = 'sheet' AND payload ->> 'op' = 'set'",
    [mutationId],
  )
  if (!refused) return
  const { building_id: buildingId, payload } = refused
  const [draft] = await inside.all<DraftRow>('SELECT * FROM draft WHERE building_id = ?', [buildingId])
  const { set, seen } = JSON.parse(payload) as { set: SheetAnswers; seen: number }
  const later = await inside.all<{ key: string }>(
    "SELECT said.key FROM outbox, json_each(payload, '$.set') AS said WHERE outbox.type = 'sheet' AND building_id = ? AND seq > ?",
    [buildingId, refused.seq],
  )
  const answered = new Set(later.map(({ key }) => key))
  const standing = Object.entries(set).filter(([group]) => !answered.has(group))
  if (standing.length === 0) return
  const answers = { ...Object.fromEntries(standing), ...readColumn.draft(draft?.answers ?? '{}') }
  await inside.run(
    `INSERT INTO draft (building_id, answers, seen, kept_at) VALUES (?, ?, ?, ?)
     ON CONFLICT (building_id) DO UPDATE SET answers = excluded.answers`,
    [buildingId, JSON.stringify(answers), seen, now.toISOString()],
  )
}

/** Same work, same ids, numbers from 1: what the new device id hands in first (P4). */
async function renumber(inside: Statements, deviceId: string): Promise<void> {
  const rows = await inside.all<OutboxRow>('SELECT * FROM outbox ORDER BY seq')
  // upwards first, so that no number meets one that is still there
  await inside.run('UPDATE outbox SET seq = seq + 1000000000')
  for (const [index, row] of rows.entries()) {
    const payload = { ...(JSON.parse(row.payload) as Record<string, unknown>), seq: index + 1 }
    await inside.run('UPDATE outbox SET seq = ?, payload = ?, status = NULL, change_no = NULL WHERE mutation_id = ?', [
      index + 1,
      JSON.stringify(payload),
      row.mutation_id,
    ])
  }
  await writeMeta(inside, 'nextSeq', String(rows.length + 1))
  await writeMeta(inside, 'deviceId', deviceId)
  await removeMeta(inside, 'isRenewing')
}

async function dropConfirmed(inside: Statements, ackSeq: number, at: string): Promise<void> {
  const confirmed = await inside.all('SELECT 1 FROM outbox WHERE seq <= ? AND status IS NOT NULL LIMIT 1', [ackSeq])
  await inside.run('DELETE FROM outbox WHERE seq <= ? AND status IS NOT NULL', [ackSeq])
  await inside.run(
    'DELETE FROM photo WHERE is_removed = 1 AND photo_id NOT IN (SELECT entity_id FROM outbox WHERE type = ?)',
    ['photo'],
  )
  if (confirmed.length > 0) await writeMeta(inside, 'lastHandedInAt', at)
}
