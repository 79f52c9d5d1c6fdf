import { editionForDevice } from '@/shared/schemas/factorBook'
import { deviceLooksList } from '@/shared/schemas/nextLook'
import type { PhotoMeta, SheetAnswers } from '@/shared/schemas/sheet'
import { appendMutation, type Stamp } from './appendMutation'
import type { Driver, Statements } from './driver.types'
import { exportBag } from './exportBag'
import { NoRoomForPhotosError, type FieldStore, type StoredPhoto, type StoredSheet } from './fieldStore.types'
import { listConflicts, settleConflict } from './fieldConflicts'
import type { BagOwner } from './makeBagFile'
import { readMeta } from './metaTable'
import type { PhotoFiles } from './photoFiles.types'
import { readBag } from './readBag'
import { readBuildings } from './readBuildings'
import { readColumn, type BaseRow, type DraftRow, type OutboxRow, type PhotoRow } from './rows'
import { saveSafely } from './saveSafely'
import { changedGroups, standingAnswers } from './standingAnswers'
import type { StorageRoom } from './storageRoom'
import type { Twin } from './twin.types'

export interface FieldStoreParts {
  readonly driver: Driver
  readonly photoFiles: PhotoFiles
  readonly stamp: Stamp
  readonly twin: Twin
  readonly owner: BagOwner
  readonly readRoom: () => Promise<Pick<StorageRoom, 'level'>>
  /** Tells all listeners of this database. */
  readonly changed: () => void
  readonly subscribe: (listener: () => void) => () => void
}

/** The device's database as a surveyor uses it. */
export function createFieldStore(parts: FieldStoreParts): FieldStore {
  const { driver, photoFiles, stamp, twin, owner, changed, subscribe } = parts
  const save = saveSafely(driver, twin, stamp)
  const write = async <Result>(work: Parameters<typeof save<Result>>[0]): Promise<Result> => {
    const result = await save(work)
    changed()
    return result
  }
  return {
    subscribe,
    async listBeats() {
      const rows = await driver.all<BaseRow>("SELECT id, change_no, fields FROM base WHERE type = 'beat' ORDER BY id")
      return rows
        .map((row) => ({ beatId: row.id, beat: readColumn.beat(row.fields) }))
        .sort(({ beat: one }, { beat: other }) => other.startsOn.localeCompare(one.startsOn))
    },
    listBuildings: (beatId) => readBuildings(driver, 'beat_id = ?', beatId),
    readBuilding: async (buildingId) => (await readBuildings(driver, 'building_id = ?', buildingId))[0] ?? null,
    readSheet: (buildingId) => readSheet(driver, buildingId),
    keepDraft: (buildingId, draft) => write((inside) => keepDraft(inside, buildingId, draft, stamp)),
    putInBag: (buildingId) => write((inside, own) => putInBag(inside, buildingId, own)),
    async addPhoto(photo, bytes) {
      if ((await parts.readRoom()).level === 'full') throw new NoRoomForPhotosError()
      // the bytes first: a photo without its bytes must never be in the bag
      await photoFiles.write(photo.sha256, bytes)
      await write((inside, own) => addPhoto(inside, photo, own))
    },
    removePhoto: (photoId) => write((inside, own) => removePhoto(inside, photoId, own)),
    listPhotos: (sheetId) => listPhotos(driver, sheetId),
    readPhotoBytes: (sha256) => photoFiles.read(sha256),
    readBag: () => readBag(driver),
    exportBag: () => exportBag(driver, owner, stamp.now()),
    listConflicts: () => listConflicts(driver),
    settleConflict: (conflictId, choice) => write((inside, own) => settleConflict(inside, { conflictId, choice }, own)),
    async readEdition() {
      const text = await readMeta(driver, 'edition')
      return text === null ? null : editionForDevice.parse(JSON.parse(text))
    },
    async readNextLooks() {
      const text = await readMeta(driver, 'nextLook')
      return text === null ? [] : deviceLooksList.parse(JSON.parse(text))
    },
  }
}

async function keepDraft(inside: Statements, buildingId: string, draft: SheetAnswers, stamp: Stamp) {
  const keptAt = stamp.now().toISOString()
  if (Object.keys(draft).length === 0) {
    await inside.run('DELETE FROM draft WHERE building_id = ?', [buildingId])
    return { keptAt }
  }
  // `seen` stays what it was when the draft was begun
  await inside.run(
    `INSERT INTO draft (building_id, answers, seen, kept_at) VALUES (?, ?, ?, ?)
     ON CONFLICT (building_id) DO UPDATE SET answers = excluded.answers, kept_at = excluded.kept_at`,
    [buildingId, JSON.stringify(draft), await changeOnScreen(inside, buildingId), keptAt],
  )
  return { keptAt }
}

/** Change number of the sheet that is on the screen; that of a sheet that is gone; 0 for one made here. */
async function changeOnScreen(inside: Statements, buildingId: string): Promise<number> {
  const [row] = await inside.all<{ change_no: number }>(
    `SELECT change_no FROM base WHERE type = 'sheet' AND id = ?
     UNION ALL SELECT change_no FROM gone_sheet WHERE id = ? LIMIT 1`,
    [buildingId, buildingId],
  )
  return row?.change_no ?? 0
}

async function putInBag(inside: Statements, buildingId: string, stamp: Stamp): Promise<void> {
  const [draft] = await inside.all<DraftRow>('SELECT * FROM draft WHERE building_id = ?', [buildingId])
  if (!draft) return
  const confirmed = await confirmedSheet(inside, buildingId)
  const bag = await bagOf(inside, buildingId)
  const set = changedGroups(standingAnswers(confirmed?.answers ?? {}, bag), readColumn.draft(draft.answers))
  if (Object.keys(set).length > 0) {
    const change = { op: 'set', type: 'sheet', entity: buildingId, seen: draft.seen, set } as const
    await appendMutation(inside, change, buildingId, stamp)
    // its answers came back into the draft when it was refused, and go with this one
    await inside.run("DELETE FROM quarantine WHERE type = 'sheet' AND building_id = ?", [buildingId])
  }
  await inside.run('DELETE FROM draft WHERE building_id = ?', [buildingId])
}

async function confirmedSheet(inside: Statements, buildingId: string) {
  const [row] = await inside.all<BaseRow>("SELECT fields FROM base WHERE type = 'sheet' AND id = ?", [buildingId])
  return row ? readColumn.sheet(row.fields) : null
}

async function bagOf(inside: Statements, buildingId: string): Promise<SheetAnswers[]> {
  const rows = await inside.all<OutboxRow>(
    "SELECT * FROM outbox WHERE type = 'sheet' AND building_id = ? ORDER BY seq",
    [buildingId],
  )
  return rows.map(({ payload }) => readColumn.sheetSet(payload))
}

async function addPhoto(inside: Statements, photo: PhotoMeta, stamp: Stamp): Promise<void> {
  await inside.run("INSERT INTO photo (photo_id, sheet_id, meta, place) VALUES (?, ?, ?, 'kept-here')", [
    photo.photoId,
    photo.sheetId,
    JSON.stringify(photo),
  ])
  const change = { op: 'set', type: 'photo', entity: photo.photoId, seen: 0, set: photo } as const
  await appendMutation(inside, change, photo.sheetId, stamp)
}

async function removePhoto(inside: Statements, photoId: string, stamp: Stamp): Promise<void> {
  const [pulled] = await inside.all<BaseRow>("SELECT id, change_no, fields FROM base WHERE type = 'photo' AND id = ?", [
    photoId,
  ])
  const [own] = await inside.all<PhotoRow>('SELECT * FROM photo WHERE photo_id = ?', [photoId])
  const meta = own ? readColumn.photoMeta(own.meta) : pulled ? readColumn.photoMeta(pulled.fields) : null
  if (!meta || own?.is_removed === 1) return
  // a confirmed photo has no row of its own any more; this one hides it until pull says that it is gone
  await inside.run(
    `INSERT INTO photo (photo_id, sheet_id, meta, place, is_removed) VALUES (?, ?, ?, 'sent', 1)
     ON CONFLICT (photo_id) DO UPDATE SET is_removed = 1`,
    [photoId, meta.sheetId, JSON.stringify(meta)],
  )
  const change = { op: 'delete', type: 'photo', entity: photoId, seen: pulled?.change_no ?? 0 } as const
  await appendMutation(inside, change, meta.sheetId, stamp)
}

async function readSheet(driver: Driver, buildingId: string): Promise<StoredSheet | null> {
  const [building] = await readBuildings(driver, 'building_id = ?', buildingId)
  if (!building) return null
  const confirmed = await confirmedSheet(driver, buildingId)
  const [draft] = await driver.all<DraftRow>('SELECT * FROM draft WHERE building_id = ?', [buildingId])
  const bag = await bagOf(driver, buildingId)
  const conflicts = await driver.all<BaseRow>(
    "SELECT id, change_no, fields FROM base WHERE type = 'conflict' AND building_id = ?",
    [buildingId],
  )
  const isOpened = confirmed !== null && confirmed.review.state !== 'handed-in'
  return {
    building,
    confirmed,
    draft: draft ? readColumn.draft(draft.answers) : {},
    keptAt: draft?.kept_at ?? null,
    nextRevision: (confirmed?.revision ?? 1) + (isOpened && bag.length === 0 ? 1 : 0),
    conflicts: conflicts.map((row) => ({ ...readColumn.conflict(row.fields), conflictId: row.id })),
  }
}

async function listPhotos(driver: Driver, sheetId: string): Promise<StoredPhoto[]> {
  const own = await driver.all<PhotoRow>('SELECT * FROM photo WHERE sheet_id = ? ORDER BY photo_id', [sheetId])
  const pulled = await driver.all<BaseRow>(
    "SELECT id, change_no, fields FROM base WHERE type = 'photo' AND building_id = ? ORDER BY id",
    [sheetId],
  )
  const hidden = new Set(own.map(({ photo_id }) => photo_id))
  const local = own
    .filter(({ is_removed }) => is_removed === 0)
    .map((row): StoredPhoto => ({
      photo: readColumn.photoMeta(row.meta),
      place: row.place === 'sent' ? 'sent' : 'kept-here',
      state: row.place === 'refused' ? 'refused' : 'declared',
      refusal: row.refusal,
    }))
  const confirmed = pulled
    .filter(({ id }) => !hidden.has(id))
    .map((row): StoredPhoto => {
      const { state, refusal, ...photo } = readColumn.photo(row.fields)
      return { photo, place: 'confirmed', state, refusal }
    })
  return [...local, ...confirmed]
}
