import type { Scope } from '@/server/database'
import { Refusal } from '@/server/errors'

/** A phone sends one or two at a time; more are left behind by something that goes wrong. */
const MOST_UNFINISHED = 50

/**
 * Whether an upload may begin: within the room of the organisation, and not beside too many that never ended.
 *
 * @throws {Refusal} `no-room-left`, `too-many-unfinished`
 */
export async function requirePhotoRoom(scope: Scope, { photoId, bytes }: { photoId: string; bytes: number }) {
  const [row] = await scope.select<{ has_room: boolean; unfinished: number }>(
    `SELECT (SELECT coalesce(sum(bytes), 0) FROM photo WHERE organisation_id = $organisationId
         AND deleted_at IS NULL AND (state = 'stored' OR upload_at IS NOT NULL) AND photo_id <> $photoId) + $bytes
         <= photo_quota_bytes AS has_room,
       (SELECT count(*)::integer FROM photo WHERE organisation_id = $organisationId AND taken_by = $personId
         AND upload_at IS NOT NULL AND state IN ('declared', 'partial') AND photo_id <> $photoId) AS unfinished
     FROM organisation WHERE organisation_id = $organisationId`,
    { organisationId: scope.organisationId, personId: scope.personId, photoId, bytes },
  )
  if (!row?.has_room) throw noRoom()
  if (row.unfinished >= MOST_UNFINISHED) throw tooManyUnfinished()
}

const noRoom = () =>
  new Refusal(
    507,
    'no-room-left',
    'Your organisation has used its room for photos. The record is safe here, the photo on the device; ask your steward.',
    [],
    { 'Retry-After': '3600' },
  )
const tooManyUnfinished = () =>
  new Refusal(
    429,
    'too-many-unfinished',
    'Many photos of yours were begun and not ended. Nothing is lost; they end or are forgotten first, then this one goes on.',
    [],
    { 'Retry-After': '600' },
  )
