import type { Actor, Scope } from '@/server/database'
import { Refusal } from '@/server/errors'
import { readUploadPhoto } from '@/server/queries/readUploadPhoto'
import { retryOnContention } from './retryOnContention'
import { sha256Of, storePhoto, withRoom, type PhotoParts } from './storePhoto'

/** Most bytes of one chunk. */
export const LARGEST_CHUNK_BYTES = 262_144

export interface Chunk {
  readonly bytes: Uint8Array
  readonly offset: number
  /** SHA-256 of the chunk, hexadecimal. */
  readonly sha256: string
}
type UploadState = { state: 'stored' | 'partial' | 'refused'; offset: number }

/**
 * Appends a chunk at the offset the server has, and ends the upload with the last one (rules U3 to U7).
 *
 * @throws {Refusal} `not-found`, `checksum-wrong`, `offset-conflict`, `body-too-large`, `digest-wrong`, `no-room-left`
 */
export async function appendUpload(
  parts: PhotoParts,
  actor: Actor,
  photoId: string,
  chunk: Chunk,
): Promise<UploadState> {
  if (sha256Of(chunk.bytes) !== chunk.sha256) throw checksumWrong()
  const { photo, offset } = await retryOnContention(() =>
    parts.database.withScope(actor, async (scope) => {
      await lockUpload(scope, photoId)
      const found = await readUploadPhoto(scope, photoId)
      if (found.state === 'stored' || found.state === 'refused') return { photo: found, offset: found.bytes }
      const offset = await write(parts, actor, found, chunk)
      await noteUpload(scope, photoId, parts.now())
      return { photo: found, offset }
    }),
  )
  if (photo.state === 'stored' || photo.state === 'refused') return { state: photo.state, offset }
  if (offset < photo.bytes) return { state: 'partial', offset }
  return { state: await storePhoto(parts, actor, photo), offset }
}

/** One chunk of a photo at a time. Not a row lock: handing in must never wait for a disk. */
async function lockUpload(scope: Scope, photoId: string): Promise<void> {
  await scope.execute(`SET LOCAL lock_timeout = '2s'`)
  await scope.select('SELECT pg_advisory_xact_lock(hashtextextended($name, 0))', {
    name: `${scope.organisationId}/${photoId}`,
  })
}

/** After the disk, so that the row is not held while it writes. */
async function noteUpload(scope: Scope, photoId: string, now: Date): Promise<void> {
  await scope.execute(
    'UPDATE photo SET upload_at = $now WHERE organisation_id = $organisationId AND photo_id = $photoId',
    { organisationId: scope.organisationId, photoId, now },
  )
}

async function write(
  { photoStore }: PhotoParts,
  { organisationId }: Actor,
  photo: { photoId: string; bytes: number },
  chunk: Chunk,
): Promise<number> {
  const there = await photoStore.partialBytes(organisationId, photo.photoId)
  if (chunk.offset !== there) throw offsetConflict(there)
  const after = there + chunk.bytes.length
  if (after > photo.bytes) throw tooMany(photo.bytes)
  if (chunk.bytes.length > 0) {
    await withRoom(() => photoStore.appendPartial(organisationId, photo.photoId, there, chunk.bytes))
  }
  return after
}

const checksumWrong = () =>
  new Refusal(
    422,
    'checksum-wrong',
    'This piece of the photo was damaged on its way. Nothing of it was kept; send it again.',
    [{ pointer: '/headers/upload-checksum', code: 'checksum-wrong', detail: 'the SHA-256 of the piece differs' }],
  )
const offsetConflict = (expected: number) =>
  new Refusal(
    409,
    'offset-conflict',
    `The photo goes on at byte ${expected}. Nothing was changed; send from there.`,
    [],
    { 'Upload-Offset': String(expected) },
    expected,
  )
const tooMany = (bytes: number) =>
  new Refusal(
    413,
    'body-too-large',
    `The photo was announced with ${bytes} bytes; more came. Nothing of this piece was kept.`,
  )
