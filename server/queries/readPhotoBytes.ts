import type { Context } from '@/server/context'
import { notFound } from '@/server/errors'
import type { SignedIn } from '@/server/middleware/signedIn'

/**
 * Bytes of a stored photo: any of the organisation for a planner, those of one's own beats for a surveyor.
 *
 * @throws {Refusal} `not-found`, in the same words for what is not there, not stored, or not to be seen
 */
export async function readPhotoBytes(
  { database, photoStore, log }: Pick<Context, 'database' | 'photoStore' | 'log'>,
  signedIn: SignedIn,
  { photoId, size }: { photoId: string; size: 'full' | 'thumbnail' },
): Promise<Uint8Array> {
  const [row] = await database.withScope(
    signedIn,
    (scope) =>
      scope.select<{ sha256: string }>(
        `SELECT CASE WHEN $size = 'thumbnail' THEN coalesce(p.thumbnail_sha256, p.stored_sha256) ELSE p.stored_sha256 END AS sha256
         FROM photo p
         WHERE p.organisation_id = $organisationId AND p.photo_id = $photoId AND p.state = 'stored' AND p.deleted_at IS NULL
           AND ($isPlanner OR EXISTS (
             SELECT FROM beat b WHERE b.organisation_id = p.organisation_id AND b.beat_id = p.beat_id
               AND b.surveyor_id = $personId AND b.deleted_at IS NULL))`,
        {
          organisationId: signedIn.organisationId,
          personId: signedIn.personId,
          isPlanner: signedIn.roles.includes('planner'),
          photoId,
          size,
        },
      ),
    { readOnly: true },
  )
  if (!row) throw notFound('photo')
  const bytes = await photoStore.get(signedIn.organisationId, row.sha256)
  if (bytes) return bytes
  log.error({ photoId }, 'bytes of a stored photo are missing')
  throw notFound('photo')
}
