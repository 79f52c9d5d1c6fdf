import type { Context } from '@/server/context'
import type { Scope } from '@/server/database'

/** How long deletions are remembered for devices that are away, and an unfinished upload is kept. */
export const TOMBSTONE_DAYS = 180
export const UPLOAD_DAYS = 14
const DAY_MS = 86_400_000
/** Nobody acts: row-level security asks for an organisation only. */
const NOBODY = '00000000-0000-0000-0000-000000000000'

export interface Tidied {
  readonly tombstones: number
  readonly uploads: number
  readonly photos: number
}

/**
 * Forgets what an organisation no longer needs: what left a beat or was deleted so long ago that a device which has not
 * asked since must begin from the start (410, L7), with the bytes of deleted photos; and the bytes of uploads that were
 * never ended, which their phone begins again. Sheets are never forgotten, deleted or not.
 */
export async function tidySync(
  { database, photoStore, now }: Pick<Context, 'database' | 'photoStore' | 'now'>,
  organisationId: string,
): Promise<Tidied> {
  const before = (days: number) => new Date(now().getTime() - days * DAY_MS)
  const actor = { organisationId, personId: NOBODY }
  const forgotten = await database.withScope(actor, (scope) => forgetTombstones(scope, before(TOMBSTONE_DAYS)))
  for (const sha256 of forgotten.unusedFiles) await photoStore.remove(organisationId, sha256)
  const expired = await database.withScope(actor, (scope) => expireUploads(scope, before(UPLOAD_DAYS)))
  for (const photoId of expired) await photoStore.dropPartial(organisationId, photoId)
  return { tombstones: forgotten.count, uploads: expired.length, photos: forgotten.unusedFiles.length }
}

/** The floor rises with what goes, in one transaction: no cursor is served that has missed some of it. */
async function forgetTombstones(scope: Scope, before: Date) {
  const { organisationId } = scope
  const exits = await scope.select<{ change_no: string }>(
    'DELETE FROM scope_exit WHERE organisation_id = $organisationId AND at < $before RETURNING change_no',
    { organisationId, before },
  )
  const photos = await scope.select<{ change_no: string; files: (string | null)[] }>(
    `DELETE FROM photo WHERE organisation_id = $organisationId AND deleted_at < $before
     RETURNING change_no, ARRAY[stored_sha256, thumbnail_sha256] AS files`,
    { organisationId, before },
  )
  const gone = [...exits, ...photos].map(({ change_no }) => Number(change_no))
  if (gone.length > 0) {
    await scope.execute(
      'UPDATE organisation SET floor = greatest(floor, $floor) WHERE organisation_id = $organisationId',
      { organisationId, floor: gone.reduce((highest, change) => Math.max(highest, change), 0) },
    )
  }
  const files = [...new Set(photos.flatMap(({ files: both }) => both.filter((sha256) => sha256 !== null)))]
  const unused = await scope.select<{ sha256: string }>(
    `SELECT f.sha256 FROM json_array_elements_text($files::json) AS f(sha256) WHERE NOT EXISTS (
       SELECT FROM photo WHERE organisation_id = $organisationId AND f.sha256 IN (stored_sha256, thumbnail_sha256))`,
    { organisationId, files: JSON.stringify(files) },
  )
  return { count: gone.length, unusedFiles: unused.map(({ sha256 }) => sha256) }
}

async function expireUploads(scope: Scope, before: Date): Promise<string[]> {
  const rows = await scope.select<{ photo_id: string }>(
    `UPDATE photo SET upload_at = NULL
     WHERE organisation_id = $organisationId AND upload_at < $before RETURNING photo_id`,
    { organisationId: scope.organisationId, before },
  )
  return rows.map(({ photo_id }) => photo_id)
}
