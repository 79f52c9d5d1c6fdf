import { createHash } from 'node:crypto'
import { createDiskPhotoStore } from '@/server/photos/diskPhotoStore'
import { drawFacade, FACADE_SIZE } from './drawFacade'
import { insertRows } from './insertRows'
import { demoId, type SeededBuilding, type Seeding } from './seeding.types'

export interface PhotoPlace {
  readonly sheetId: string
  readonly beatId: string
  readonly personId: string
  readonly building: SeededBuilding
}

/** Drawn street fronts, so that a reviewer has something to look at; nothing is a photograph of anything. */
export async function seedPhotos(seeding: Seeding, places: readonly PhotoPlace[]): Promise<void> {
  const { sequelize, transaction, organisationId } = seeding
  const store = createDiskPhotoStore(seeding.photoRoot)
  const kept = new Map<string, { sha256: string; bytes: number }>()
  const rows: Record<string, unknown>[] = []
  for (const { sheetId, beatId, personId, building } of places) {
    const look = `${building.structure}/${building.storeys}`
    let drawn = kept.get(look)
    if (!drawn) {
      const bytes = await drawFacade(building)
      drawn = { sha256: createHash('sha256').update(bytes).digest('hex'), bytes: bytes.byteLength }
      await store.put(organisationId, drawn.sha256, bytes)
      kept.set(look, drawn)
    }
    rows.push({
      organisation_id: organisationId,
      photo_id: demoId('photo', sheetId),
      sheet_id: sheetId,
      beat_id: beatId,
      sha256: drawn.sha256,
      bytes: drawn.bytes,
      mime: 'image/jpeg',
      width_px: FACADE_SIZE.widthPx,
      height_px: FACADE_SIZE.heightPx,
      tag: 'street-front',
      taken_at: '2026-10-13T09:00:00Z',
      state: 'stored',
      stored_sha256: drawn.sha256,
      taken_by: personId,
      change_no: seeding.nextChange(),
    })
  }
  await insertRows(sequelize, transaction, 'photo', rows)
}
