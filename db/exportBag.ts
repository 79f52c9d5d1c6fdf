import type { Statements } from './driver.types'
import { readMeta } from './metaTable'
import type { DraftRow, OutboxRow, PhotoRow, QuarantineRow } from './rows'

/** All work that only this phone holds, word for word, as a file with its digest. */
export async function exportBag(inside: Statements, now: Date): Promise<{ fileName: string; json: string }> {
  const outbox = await inside.all<OutboxRow>('SELECT * FROM outbox ORDER BY seq')
  const drafts = await inside.all<DraftRow>('SELECT * FROM draft ORDER BY building_id')
  const photos = await inside.all<PhotoRow>('SELECT * FROM photo WHERE is_removed = 0 ORDER BY photo_id')
  const refused = await inside.all<QuarantineRow>('SELECT * FROM quarantine ORDER BY mutation_id')
  const bag = {
    deviceId: await readMeta(inside, 'deviceId'),
    mutations: outbox.map(({ payload }): unknown => JSON.parse(payload)),
    drafts: drafts.map(({ building_id, answers, seen, kept_at }) => ({
      buildingId: building_id,
      answers: JSON.parse(answers) as unknown,
      seen,
      keptAt: kept_at,
    })),
    photos: photos.map(({ meta, place }) => ({ photo: JSON.parse(meta) as unknown, place })),
    refused: refused.map(({ payload, problem }) => ({
      mutation: JSON.parse(payload) as unknown,
      problem: JSON.parse(problem) as unknown,
    })),
  }
  const sha256 = await sha256Hex(new TextEncoder().encode(JSON.stringify(bag)))
  const json = JSON.stringify(
    { format: 'tallystone-bag', version: 1, savedAt: now.toISOString(), sha256, bag },
    null,
    1,
  )
  return { fileName: `bag-${now.toISOString().slice(0, 16).replaceAll(':', '')}.json`, json }
}

/** SHA-256 of bytes as 64 hexadecimal digits. */
export async function sha256Hex(bytes: Uint8Array<ArrayBuffer>): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', bytes)
  return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, '0')).join('')
}
