import { buildingLabel } from './buildingLabel'
import type { Statements } from './driver.types'
import type { BagContents, BagEntry, Place } from './fieldStore.types'
import { readMeta } from './metaTable'
import { readColumn, type OutboxRow, type PhotoRow, type QuarantineRow } from './rows'

interface Named {
  readonly fields: string | null
}

/** Everything that is not yet confirmed, what was refused, and how much is begun. */
export async function readBag(inside: Statements): Promise<BagContents> {
  const outbox = await inside.all<OutboxRow & Named>(
    `SELECT outbox.*, base.fields FROM outbox LEFT JOIN base ON base.type = 'building' AND base.id = outbox.building_id
     WHERE outbox.type = 'sheet' ORDER BY seq`,
  )
  const photos = await inside.all<PhotoRow & Named>(
    `SELECT photo.*, base.fields FROM photo LEFT JOIN base ON base.type = 'building' AND base.id = photo.sheet_id
     WHERE is_removed = 0 AND place <> 'refused' ORDER BY photo_id`,
  )
  const refused = await inside.all<QuarantineRow & Named>(
    `SELECT quarantine.*, base.fields FROM quarantine
     LEFT JOIN base ON base.type = 'building' AND base.id = quarantine.building_id ORDER BY set_apart_at`,
  )
  const [drafts] = await inside.all<{ count: number }>('SELECT count(*) AS count FROM draft')
  const sheetEntries = outbox.map((row): BagEntry => ({
    mutationId: row.mutation_id,
    kind: 'sheet',
    buildingId: row.building_id,
    label: labelOf(row, row.building_id),
    place: row.status === null ? 'kept-here' : 'sent',
    putInAt: row.put_in_at,
    bytes: row.payload.length,
  }))
  const photoEntries = photos.map((row): BagEntry => {
    const meta = readColumn.photoMeta(row.meta)
    const place: Place = row.place === 'sent' ? 'sent' : 'kept-here'
    return {
      mutationId: row.photo_id,
      kind: 'photo',
      buildingId: row.sheet_id,
      label: labelOf(row, row.sheet_id),
      place,
      putInAt: meta.takenAt ?? '',
      bytes: meta.bytes,
    }
  })
  return {
    entries: [...sheetEntries, ...photoEntries],
    sheetCount: new Set(sheetEntries.filter(isKeptHere).map(({ buildingId }) => buildingId)).size,
    photoCount: photoEntries.filter(isKeptHere).length,
    photoBytes: photoEntries.filter(isKeptHere).reduce((total, { bytes }) => total + bytes, 0),
    quarantined: refused.map((row) => ({
      mutationId: row.mutation_id,
      label: labelOf(row, row.building_id),
      problem: readColumn.problem(row.problem),
      buildingId: row.building_id,
    })),
    startedCount: drafts?.count ?? 0,
    lastHandedInAt: await readMeta(inside, 'lastHandedInAt'),
  }
}

function isKeptHere({ place }: BagEntry): boolean {
  return place === 'kept-here'
}

function labelOf({ fields }: Named, id: string): string {
  return fields === null ? id : buildingLabel(readColumn.building(fields).outline)
}
